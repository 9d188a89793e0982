package dev.leadline.estimate;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;

import java.util.Arrays;
import java.util.Random;
import org.junit.jupiter.api.Test;

class ExtremesTest {
    private static double[] normals(int n) {
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

    /// Against all values, sorted, however they are divided.
    @Test
    void keepsTheOutermost() {
        double[] x = normals(50_000);
        var all = new Extremes(2);
        for (int from = 0, size = 1; from < x.length; from += size, size = size * 3 % 7919 + 1) {
            var part = new Extremes(2);
            double[] some = Arrays.copyOfRange(x, from, Math.min(from + size, x.length));
            part.add(new double[][] {some, new double[some.length]}, some.length);
            all.merge(part);
        }
        assertEquals(x.length, all.draws());
        assertEquals(x.length, all.nonzero(0));
        assertEquals(0, all.nonzero(1));
        double[] up = sortedDown(Arrays.stream(x).filter(v -> v > 0).toArray());
        double[] down =
                sortedDown(Arrays.stream(x).filter(v -> v < 0).map(v -> -v).toArray());
        assertArrayEquals(up, all.greatest(0));
        assertArrayEquals(down, all.copy().greatestBelow(0));
        double size = Arrays.stream(x).map(Math::abs).sum();
        assertEquals(Math.max(up[0], down[0]) / size, all.largestShare(0), 1e-12);
        assertEquals(size * size / Arrays.stream(x).map(v -> v * v).sum(), all.effective(0), 1e-9 * x.length);
    }

    @Test
    void countsNothingThatIsNotFinite() {
        var seen = new Extremes(1);
        seen.add(new double[][] {{1, Double.NaN, Double.POSITIVE_INFINITY, 0, -3}}, 5);
        assertEquals(5, seen.draws());
        assertEquals(2, seen.nonzero(0));
        assertArrayEquals(new double[] {1}, seen.greatest(0));
        assertArrayEquals(new double[] {3}, seen.greatestBelow(0));
        assertEquals(.75, seen.largestShare(0));
        seen.clear();
        assertEquals(0, seen.draws() + seen.nonzero(0) + seen.greatest(0).length);
    }
}
