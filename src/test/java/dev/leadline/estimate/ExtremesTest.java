package dev.leadline.estimate;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.leadline.estimate.Extremes.Floor;
import java.util.Arrays;
import java.util.Random;
import org.junit.jupiter.api.Test;

class ExtremesTest {
    private static double[] cauchys(int n) {
        return new Random(3).doubles(n).map(u -> Math.tan(Math.PI * (u - .5))).toArray();
    }

    private static double[] sortedDown(double[] values) {
        return Arrays.stream(values)
                .map(x -> -x)
                .sorted()
                .map(x -> -x)
                .limit(Extremes.KEPT)
                .toArray();
    }

    private static Outermost.Component look(Extremes extremes) {
        extremes.look();
        return extremes.outermost().weights();
    }

    /// Against all values, sorted, however they are divided, and whatever floor of the values before them
    /// parts are told.
    @Test
    void keepsTheOutermost() {
        double[] x = cauchys(100_000);
        var all = new Extremes(1);
        var floor = Floor.OPEN;
        for (int from = 0, size = 1, parts = 0; from < x.length; from += size, size = size * 3 % 7919 + 1, parts++) {
            var part = new Extremes(1);
            double[] some = Arrays.copyOfRange(x, from, Math.min(from + size, x.length));
            part.clear(floor);
            part.add(new double[][] {some}, some.length);
            floor = parts % 3 == 0 ? all.floor() : floor;
            all.merge(part);
        }
        assertTrue(all.floor().above()[0] > 0 && all.floor().below()[0] > 0);
        var seen = look(all);
        assertEquals(x.length, all.outermost().draws());
        assertEquals(x.length, seen.nonzero());
        double[] up = sortedDown(x);
        double[] down = sortedDown(Arrays.stream(x).map(v -> -v).toArray());
        assertArrayEquals(up, seen.greatest());
        assertEquals(TailIndex.of(up, x.length), seen.above());
        assertEquals(TailIndex.of(down, x.length), seen.below());
        double size = Arrays.stream(x).map(Math::abs).sum();
        assertEquals(Math.max(up[0], down[0]) / size, seen.largestShare(), 1e-12);
        double squares = Arrays.stream(x).map(v -> v * v).sum();
        assertEquals(size * size / squares, seen.effective(), 1e-9 * x.length);
    }

    /// Sums come from an accumulator that took in the same block, where there is one.
    @Test
    void sumsOfTheSameBlock() {
        for (double shift : new double[] {0, 200, -200}) {
            double[] x = cauchys(1000);
            double[] moved = Arrays.stream(x)
                    .map(v -> Math.max(-100, Math.min(v, 100)) + shift)
                    .toArray();
            var sums = new Accumulator(1);
            sums.add(new double[][] {moved}, 0, 1000);
            var one = new Extremes(1);
            one.add(new double[][] {moved}, 1000);
            var other = new Extremes(1);
            other.add(new double[][] {moved}, 1000, sums);
            var expected = look(one);
            var found = look(other);
            assertEquals(expected.size(), found.size(), 1e-12 * expected.size());
            assertEquals(expected.squares(), found.squares(), 1e-12 * expected.squares());
            assertEquals(expected.nonzero(), found.nonzero());
            assertEquals(expected.largest(), found.largest());
            assertArrayEquals(expected.greatest(), found.greatest());
            assertEquals(expected.below(), found.below());
        }
    }

    @Test
    void countsNothingThatIsNotFinite() {
        double[][] values = {{1, Double.NaN, Double.POSITIVE_INFINITY, 0, -3}};
        var sums = new Accumulator(1);
        sums.add(values, 0, 5);
        var seen = new Extremes(1);
        seen.add(values, 5, sums);
        var found = look(seen);
        assertEquals(5, seen.outermost().draws());
        assertEquals(2, found.nonzero());
        assertArrayEquals(new double[] {1, 0, -3}, found.greatest());
        assertEquals(3, found.largest());
        assertEquals(.75, found.largestShare());
        seen.clear(Floor.OPEN);
        assertEquals(0, seen.outermost().draws() + look(seen).nonzero());
    }

    /// Values far from 0 have the tail of what they vary by.
    @Test
    void tailsOfShiftedValues() {
        double[] x = new Random(5)
                .doubles(100_000)
                .map(u -> Math.pow(u, -1 / 1.5) - 1000)
                .toArray();
        var seen = new Extremes(1);
        for (int from = 0; from < x.length; from += 1000) {
            seen.add(new double[][] {Arrays.copyOfRange(x, from, from + 1000)}, 1000);
        }
        assertEquals(1 / 1.5, look(seen).tail().shape(), .15);
        assertEquals(look(seen).above(), look(seen).tail());
    }
}
