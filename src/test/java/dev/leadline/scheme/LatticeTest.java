package dev.leadline.scheme;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;
import static org.junit.jupiter.api.Assumptions.assumeTrue;

import dev.leadline.scheme.Replicates.PointFunction;
import dev.leadline.stream.Address;
import dev.leadline.stream.Purpose;
import dev.leadline.stream.Stream;
import java.util.Arrays;
import java.util.SplittableRandom;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvFileSource;
import org.junit.jupiter.params.provider.ValueSource;

class LatticeTest {
    /// The least shift there is.
    private static final double LEAST = 0x1p-53;

    private static final int LOWEST = 7;
    private static final int HIGHEST = 20;

    /// Points before they are shifted, exactly.
    private static double[] plain(int dimension, int n) {
        double[] x = new double[n];
        Lattice.dimension(dimension).shifted(LEAST).fill(x, 0, n);
        for (int i = 0; i < n; i++) {
            x[i] -= LEAST;
        }
        return x;
    }

    /// z / 2^20, which is point 2^19.
    private static double generator(int dimension) {
        double[] x = new double[1];
        Lattice.dimension(dimension).shifted(LEAST).fill(x, Lattice.POINTS / 2, 1);
        return x[0] - LEAST;
    }

    private static double b2(double x) {
        return x * (x - 1) + 1 / 6.;
    }

    /// Every dimension, on its own, has the multiples of 1/n.
    @Test
    void projectionsAreWhole() {
        for (int dimension = 1; dimension <= Lattice.DIMENSIONS; dimension++) {
            double[] x = plain(dimension, 1 << 13);
            for (int m = 0; m <= 13; m++) {
                int n = 1 << m;
                double[] first = Arrays.copyOf(x, n);
                Arrays.sort(first);
                assertArrayEquals(
                        IntStream.range(0, n).mapToDouble(k -> (double) k / n).toArray(), first);
            }
        }
    }

    @Test
    void noTwoDimensionsAreEqualOrOpposite() {
        double[] first = IntStream.rangeClosed(1, Lattice.DIMENSIONS)
                .mapToDouble(LatticeTest::generator)
                .map(x -> Math.min(x, 1 - x))
                .toArray();
        assertEquals(Lattice.DIMENSIONS, Arrays.stream(first).distinct().count());
    }

    /// Sums of points are points: the first 2^m are a lattice for each m.
    @Test
    void pointsAreALattice() {
        int[] dimensions = {1, 2, 30, 1010};
        double[][] x = Arrays.stream(dimensions)
                .mapToObj(dimension -> plain(dimension, 1 << HIGHEST))
                .toArray(double[][]::new);
        var random = new SplittableRandom(20261201);
        for (int m = LOWEST; m <= HIGHEST; m++) {
            for (int trial = 0; trial < 100; trial++) {
                int i = random.nextInt(1 << m);
                int k = random.nextInt(1 << m);
                int sum = Integer.reverse(Integer.reverse(i) + Integer.reverse(k));
                assertTrue(sum >= 0 && sum < 1 << m);
                for (double[] coordinate : x) {
                    assertEquals((coordinate[i] + coordinate[k]) % 1, coordinate[sum]);
                }
            }
        }
    }

    /// The errors that lattice_vector.py states, summed here point by point, with small sums kept apart from 1; the
    /// script sums numbers next to 1, each of them rounded by up to 2^-53.
    @ParameterizedTest
    @CsvFileSource(resources = "/scheme/lattice-errors.csv", numLinesToSkip = 3)
    void theVectorHasTheErrorItsScriptStates(int dimensions, int m, double error, double times) {
        assumeTrue((long) dimensions << m <= 1L << 24, "takes long");
        int n = 1 << m;
        double[] excess = new double[n];
        for (int j = 1; j <= dimensions; j++) {
            double[] x = plain(j, n);
            for (int i = 0; i < n; i++) {
                excess[i] += (1 + excess[i]) * (5. / (99 + j)) * b2(x[i]);
            }
        }
        double e = Math.sqrt(Arrays.stream(excess).sum() / n);
        assertEquals(error * error, Arrays.stream(excess).sum() / n, 2e-6 * error * error + 0x1p-53);
    }

    /// Trigonometric polynomials: one whose frequencies h have h.z divisible by n is summed to its shifted
    /// self, every other one to 0.
    @ParameterizedTest
    @ValueSource(ints = {7, 10, 14})
    void productsOfCosinesAreIntegratedExactly(int m) {
        int n = 1 << m;
        var random = new SplittableRandom(m);
        int dual = 0;
        for (int trial = 0; trial < 300; trial++) {
            int[] dimensions = {random.nextInt(1, 11), random.nextInt(11, 101), random.nextInt(101, 1011)};
            int[] h = {random.nextInt(1, 20), random.nextInt(1, 20), random.nextInt(1, 20)};
            var coordinates = Replicates.coordinates(
                    Arrays.stream(dimensions)
                            .mapToObj(Lattice::dimension)
                            .map(lattice -> (Replicates.Dimension) lattice::shifted)
                            .toArray(Replicates.Dimension[]::new),
                    8,
                    trial);
            double[][] x = Arrays.stream(dimensions).mapToObj(j -> plain(j, n)).toArray(double[][]::new);
            double[] shift = new double[3];
            double[] u = new double[1];
            for (int j = 0; j < 3; j++) {
                coordinates[j].fill(u, 0, 1);
                shift[j] = u[0];
            }
            double expected = 0;
            for (int signs = 0; signs < 4; signs++) {
                int[] f = {h[0], (signs & 1) == 0 ? h[1] : -h[1], (signs & 2) == 0 ? h[2] : -h[2]};
                // Point 2^(m-1) is the generator z/n: the whole lattice is its multiples.
                double generator = f[0] * x[0][n / 2] + f[1] * x[1][n / 2] + f[2] * x[2][n / 2];
                if (generator == Math.rint(generator)) {
                    dual++;
                    expected += Math.cos(2 * Math.PI * (f[0] * shift[0] + f[1] * shift[1] + f[2] * shift[2])) / 4;
                }
            }
            PointFunction cosines = (p, i) -> Math.cos(2 * Math.PI * h[0] * p[0][i])
                    * Math.cos(2 * Math.PI * h[1] * p[1][i])
                    * Math.cos(2 * Math.PI * h[2] * p[2][i]);
            assertEquals(expected, Replicates.mean(coordinates, n, cosines), 1e-13);
        }
        if (m == LOWEST) {
            assertTrue(dual > 0, "no frequencies of the dual lattice were met");
        }
    }

    /// One dimension: the mean of x is off by a number uniform in 1/n.
    @ParameterizedTest
    @ValueSource(ints = {16, 128, 1024})
    void oneDimensionHasTheExactVariance(int n) {
        PointFunction f = (u, i) -> u[0][i];
        var replicates = Replicates.of(10_000, n, Replicates.lattice(1), 9, f);
        replicates.assertVariance(1 / (12. * n * n), "x");
        replicates.assertMean(.5, "x");
    }

    /// Sloan and Joe (1994), Lattice Methods for Multiple Integration: the variance is the sum of the squares
    /// of the Fourier coefficients over the dual lattice, here a mean of products of Bernoulli polynomials.
    @ParameterizedTest
    @ValueSource(ints = {7, 10, 12})
    void twoDimensionsHaveTheExactVariance(int m) {
        int n = 1 << m;
        double[] x = plain(1, n);
        double[] y = plain(2, n);
        double variance = IntStream.range(0, n)
                        .mapToDouble(i -> b2(x[i]) / 2 * b2(y[i]) / 2)
                        .sum()
                / n;
        PointFunction f = (u, i) -> (u[0][i] - .5) * (u[1][i] - .5);
        var replicates = Replicates.of(10_000, n, Replicates.lattice(2), 10, f);
        replicates.assertVariance(variance, "(x-1/2)(y-1/2)");
        replicates.assertMean(0, "(x-1/2)(y-1/2)");
    }

    @Test
    void replicatesOfManyInputsAreNotBiased() {
        PointFunction f = (u, i) -> {
            double product = 1;
            for (double[] coordinate : u) {
                product *= Math.exp(coordinate[i]) / (Math.E - 1);
            }
            return product;
        };
        Replicates.of(2000, 256, Replicates.lattice(5), 11, f).assertMean(1, "product of e^u");
    }

    @Test
    void whatThereIsNotIsRefused() {
        assertThrows(IllegalArgumentException.class, () -> Lattice.dimension(0));
        assertThrows(IllegalArgumentException.class, () -> Lattice.dimension(1011));
        var coordinate = Lattice.dimension(1).shifted(Stream.at(new Address(1, Purpose.RUN, "A", 0, "x", 0)));
        double[] u = new double[2];
        coordinate.fill(u, (1 << 20) - 2, 2);
        assertThrows(IllegalArgumentException.class, () -> coordinate.fill(u, (1 << 20) - 1, 2));
        assertThrows(IllegalArgumentException.class, () -> coordinate.fill(u, 1L << 40, 2));
        assertThrows(IllegalArgumentException.class, () -> coordinate.fill(u, -1, 2));
    }
}
