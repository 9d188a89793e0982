package dev.leadline.density;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertNotEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.Arrays;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.SplittableRandom;
import java.util.stream.IntStream;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/// Draws against the distribution function, at points that the building of the table did not choose.
class InversionTest {
    private static final long SEED = 20261201;
    private static final int BLOCK = 1024;

    /// So that each table is built once for all the tests.
    private static final Map<Density, Inversion> IN_USE = new HashMap<>();

    private static Inversion inversion(Density density) {
        return IN_USE.computeIfAbsent(density, Inversion::of);
    }

    /// Kinks at probabilities that are borders of cells and at others, a gap in the middle, gaps of all sizes,
    /// a spike, a faint part.
    private static final List<Density> BROKEN = List.of(
            new StepDensity(List.of(0.0, 1.0, 10.0, 11.0), List.of(0.5, 0.0, 0.5)),
            new StepDensity(List.of(0.0, 1.0, 1e6, 1e6 + 1), List.of(0.3, 0.0, 0.7)),
            new StepDensity(List.of(0.0, 1.0, 1.0 + 1e-6, 2.0), List.of(0.375, 0.0, 0.625)),
            new StepDensity(List.of(-1.0, 0.0, 1e-9, 3.0), List.of(0.2, 1e-6, 0.799999)),
            new StepDensity(List.of(0.0, 1.0, 2.0, 3.0), List.of(1e-9, 0.999999998, 1e-9)),
            new StepDensity(
                    IntStream.rangeClosed(0, 10).mapToObj(i -> (double) i).toList(),
                    List.of(0.02, 0.05, 0.0, 0.13, 0.2, 0.2, 0.17, 0.0, 0.13, 0.1)));

    static Stream<Density> densities() {
        return Stream.of(Examples.all(), Composites.all(), BROKEN.stream(), TypedTest.densities())
                .flatMap(densities -> densities);
    }

    /// The error is measured in the tail's own probability, down to the smallest that is drawn; a value is as good as
    /// the doubles two below and two above, since the value of the shape is rounded, then shifted and scaled.
    @ParameterizedTest
    @MethodSource("densities")
    void hitsTheProbability(Density density) {
        var inversion = inversion(density);
        assertTrue(inversion.uError() <= 1e-12, () -> "stated " + inversion.uError());
        var random = new SplittableRandom(SEED);
        var u = new double[BLOCK];
        var x = new double[BLOCK];
        for (int block = 0; block < 6; block++) {
            for (int i = 0; i < BLOCK; i++) {
                u[i] = block % 2 == 0 ? anywhere(random) : inTail(random);
            }
            inversion.fill(u, x, BLOCK);
            for (int i = 0; i < BLOCK; i++) {
                boolean lower = u[i] <= 0.5;
                double p = lower ? u[i] : 1 - u[i];
                double slack = Math.min(1e-12, 1e-9 * p);
                double below = neighbour(density, x[i], -1);
                double above = neighbour(density, x[i], 1);
                double least = lower ? density.cdf(below) : density.survival(above);
                double most = lower ? density.cdf(above) : density.survival(below);
                assertTrue(
                        p >= least - slack && p <= most + slack,
                        density + ", seed " + SEED + ": u " + u[i] + " gives " + x[i] + ", probabilities " + least
                                + " to " + most);
            }
        }
    }

    /// Two doubles away, or four where the ends of an interval or the places of parts are rounded too; at least two
    /// roundings of the location.
    private static double neighbour(Density density, double from, int direction) {
        double x = from;
        int steps = density instanceof Truncated || density instanceof Mixture ? 4 : 2;
        double location = density.standardised().location();
        double away = x + direction * steps * (location == 0 ? 0 : Math.ulp(location));
        for (int i = 0; i < steps; i++) {
            x = direction < 0 ? Math.nextDown(x) : Math.nextUp(x);
        }
        return direction < 0 ? Math.min(x, away) : Math.max(x, away);
    }

    /// Around every border of every cell, and at random neighbours.
    @ParameterizedTest
    @MethodSource("densities")
    void neverFallsBack(Density density) {
        var inversion = inversion(density);
        var border = new double[3 * 2 * 52 * 64 + 1];
        int n = 0;
        for (int octave = 2; octave <= 53; octave++) {
            for (int cell = 0; cell < 64; cell++) {
                double p = StrictMath.scalb(1 + cell / 64.0, -octave);
                for (double q : new double[] {p, 1 - p}) {
                    border[n++] = q;
                    border[n++] = Math.nextDown(q);
                    border[n++] = Math.nextUp(q);
                }
            }
        }
        border[n++] = 0.5;
        var u = Arrays.stream(border, 0, n).filter(v -> v < 1).sorted().toArray();
        increasing(inversion, density, u);

        var random = new SplittableRandom(SEED);
        for (int block = 0; block < 20; block++) {
            var near = new double[BLOCK];
            near[0] = block % 2 == 0 ? anywhere(random) : inTail(random);
            for (int i = 1; i < BLOCK; i++) {
                near[i] = near[i - 1] + Math.max(0x1p-53, Math.ulp(near[i - 1]));
            }
            increasing(
                    inversion, density, Arrays.stream(near).filter(v -> v < 1).toArray());
        }
    }

    private static void increasing(Inversion inversion, Density density, double[] u) {
        var x = new double[u.length];
        inversion.fill(u, x, u.length);
        for (int i = 1; i < u.length; i++) {
            int k = i;
            assertTrue(
                    x[i] >= x[i - 1],
                    () -> density + ": u " + u[k - 1] + ", " + u[k] + " give " + x[k - 1] + ", " + x[k]);
        }
    }

    /// Kolmogorov-Smirnov: false alarms in one of 10^6 runs of a density; it notices a shift of the distribution
    /// function by .038. The mass between two doubles is not counted: some densities have half of theirs below the
    /// smallest.
    @ParameterizedTest
    @MethodSource("densities")
    void drawsFollowTheDensity(Density density) {
        int n = 20_000;
        var random = new SplittableRandom(SEED);
        var x = new double[n];
        for (int i = 0; i < n; i++) {
            x[i] = anywhere(random);
        }
        inversion(density).fill(x, x, n);
        Arrays.sort(x);
        double distance = 0;
        for (int i = 0; i < n; i++) {
            double below = density.cdf(Math.nextDown(x[i]));
            double above = density.cdf(Math.nextUp(x[i]));
            distance = Math.max(distance, Math.max((i + 1.0) / n - above, below - (double) i / n));
        }
        double limit = Math.sqrt(Math.log(2e6) / (2.0 * n));
        double seen = distance;
        assertTrue(distance < limit, () -> density + ", seed " + SEED + ": distance " + seen + ", limit " + limit);
    }

    @ParameterizedTest
    @MethodSource("densities")
    void sameTableTwice(Density density) {
        assertEquals(
                Curves.build(density.standardised().shape()).hash(),
                inversion(density).hash());
    }

    /// A draw costs a quantile where there are no cells: only for discrete densities with more values than are kept.
    @ParameterizedTest
    @MethodSource("densities")
    void everyDensityHasATable(Density density) {
        inversion(density);
        if (Curves.of(density.standardised().shape()) instanceof Table table) {
            boolean isWide = density.isDiscrete()
                    && density.upperQuantile(0x1p-53) - density.quantile(0x1p-53) >= Staircase.MOST;
            assertEquals(!isWide, table.cells().length > 0, density::toString);
        }
    }

    /// At a jump a draw is one of the values beside it.
    @Test
    void drawsDoNotFallIntoAGap() {
        var u = new double[] {Math.nextDown(0.3), 0.3, Math.nextUp(0.3), 0.3 + 1e-13};
        Inversion.of(BROKEN.get(1)).fill(u, u, u.length);
        for (double x : u) {
            assertTrue(x <= 1 || x >= 1e6, () -> x + " lies in the gap");
        }
    }

    @Test
    void hashTellsShapesApart() {
        assertNotEquals(
                Inversion.of(new Exponential(1)).hash(),
                Inversion.of(new Normal(0, 1)).hash());
        assertNotEquals(
                Inversion.of(new Triangular(0, 1, 3)).hash(),
                Inversion.of(new Triangular(0, 2, 3)).hash());
    }

    @Test
    void membersOfOneShapeShareATable() {
        assertTrue(Curves.of(new Normal(3, 4).standard()) == Curves.of(new Normal(-1, 0.1).standard()));
    }

    /// As the lanes of a run do, one after the other, with more inputs than are kept.
    @Test
    void aTableInUseIsNotBuiltAgain() {
        var first = new Triangular(0, 1, 3).standard();
        var inUse = Curves.of(first);
        for (int i = 2; i < 300; i++) {
            Curves.of(new Triangular(0, i, 300).standard());
        }
        assertTrue(inUse == Curves.of(first));
    }

    /// Moving a probability by less than 1.1e-16 stays far within the error that a table may have.
    @Test
    void probabilitiesNearerTheEndsThanAnyDrawnCountAsTheNearestDrawn() {
        var u = new double[] {0, 1e-300, 0x1p-60, 0x1p-53, 0.5, 1 - 0x1p-53, 1};
        var normal = new Normal(0, 1);
        var x = new double[u.length];
        Inversion.of(normal).fill(u, x, u.length);
        double smallest = normal.quantile(0x1p-53);
        for (int i = 0; i < 4; i++) {
            assertEquals(smallest, x[i], 1e-12, "u = " + u[i]);
        }
        assertEquals(0, x[4], 1e-16);
        assertEquals(-smallest, x[5], 1e-12);
        assertEquals(-smallest, x[6], 1e-12);
    }

    @Test
    void fillsInPlaceAndNoFurther() {
        var u = new double[] {0.25, 0.5, 0.75, 0.125};
        var x = new double[4];
        var inversion = Inversion.of(new Gumbel(0, 1));
        inversion.fill(u, x, 3);
        assertEquals(0, x[3]);
        inversion.fill(u, u, 3);
        assertEquals(0.125, u[3]);
        assertTrue(Arrays.equals(x, 0, 3, u, 0, 3));
    }

    /// Ten of them would take twice what is kept.
    @Test
    void forgetsWhatTakesTooMuch() {
        for (int i = 0; i < 10; i++) {
            Inversion.of(new Poisson(2e9 + i));
            assertTrue(Curves.bytes() <= 1L << 27, () -> Curves.bytes() + " bytes");
        }
        var last = new Poisson(2e9 + 9);
        assertTrue(Curves.of(last) == Curves.of(last));
    }

    private static double anywhere(SplittableRandom random) {
        return ((random.nextLong() >>> 12) + 0.5) * 0x1p-52;
    }

    /// A probability near 0 or 1, all orders of magnitude alike.
    private static double inTail(SplittableRandom random) {
        double p = StrictMath.scalb(1 + random.nextDouble(), -2 - random.nextInt(52));
        return random.nextBoolean() ? p : 1 - p;
    }
}
