package dev.leadline.scheme;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.leadline.ReferenceValues;
import dev.leadline.stream.Address;
import dev.leadline.stream.Purpose;
import dev.leadline.stream.Stream;
import java.util.Arrays;
import java.util.BitSet;
import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvFileSource;
import org.junit.jupiter.params.provider.EnumSource;

class SobolTest {
    private static final String POINTS = "qmc-sobol-points";
    private static final DigitalShift NONE = new DigitalShift(0, 0);

    /// The first 32 digits of points, as a whole number.
    private static long[] digits(Coordinate coordinate, long first, int rows) {
        double[] u = new double[rows];
        coordinate.fill(u, first, rows);
        return Arrays.stream(u).mapToLong(x -> (long) (x * 0x1p32)).toArray();
    }

    private static long digits(Coordinate coordinate, long point) {
        return digits(coordinate, point, 1)[0];
    }

    private static Coordinate plain(int dimension) {
        return Sobol.dimension(dimension).randomised(NONE);
    }

    private static Coordinate randomised(int dimension, Scrambling scrambling) {
        return Sobol.dimension(dimension)
                .randomised(scrambling, Stream.at(new Address(20261201, Purpose.RUN, "A", 3, "x" + dimension, 0)));
    }

    private static long gray(long i) {
        return i ^ (i >> 1);
    }

    /// Record qmc-sobol-points (a): points are in Gray order there.
    @Test
    void firstPointsAreThoseOfJoeAndKuo() {
        var rows = ReferenceValues.record(POINTS).required("expected").get(0).required("value");
        for (int dimension = 1; dimension <= 8; dimension++) {
            long[] points = digits(plain(dimension), 0, 32);
            for (int i = 0; i < 32; i++) {
                assertEquals(
                        rows.get(i).get(dimension - 1).asLong(),
                        points[(int) gray(i)] >> 27,
                        "point " + i + ", dimension " + dimension);
            }
        }
    }

    /// Record qmc-sobol-points (b).
    @Test
    void farDimensionsAreThoseOfJoeAndKuo() {
        int[] dimensions = {1, 2, 10, 50, 100, 500, 1000, 1111};
        int seen = 0;
        for (var expected : ReferenceValues.record(POINTS).required("expected")) {
            String name = expected.required("name").asString();
            if (name.startsWith("x*2^32 i=")) {
                long i = Long.parseLong(name.substring("x*2^32 i=".length()));
                double[] answers = ReferenceValues.numbers(expected.required("value"));
                for (int j = 0; j < dimensions.length; j++) {
                    assertEquals((long) answers[j], digits(plain(dimensions[j]), gray(i)), name + " " + dimensions[j]);
                    seen++;
                }
            }
        }
        assertEquals(48, seen);
    }

    /// All 32 direction numbers of all dimensions, by scipy (sobol_points.py).
    @ParameterizedTest
    @CsvFileSource(resources = "/scheme/sobol-points.csv", numLinesToSkip = 2)
    void everyDirectionNumberIsThatOfJoeAndKuo(int dimension, long ofLast, long ofEverySecond) {
        assertEquals(ofLast, digits(plain(dimension), 0xffffffffL));
        assertEquals(ofEverySecond, digits(plain(dimension), 0x55555555L));
    }

    /// Scrambled points by whole numbers of Python (sobol_points.py).
    @ParameterizedTest
    @CsvFileSource(resources = "/scheme/nested.csv", numLinesToSkip = 2)
    void nestedScramblingHasTheseBits(int dimension, long point, long seed, long shift, long next, long answer) {
        double[] u = new double[1];
        Sobol.dimension(dimension)
                .randomised(new NestedScrambling((int) seed, (int) shift, (int) next))
                .fill(u, point, 1);
        assertEquals(answer * 0x1p-53, u[0]);
    }

    /// Any 2^m points from a multiple of 2^m on, at the beginning and late.
    @ParameterizedTest
    @EnumSource
    void everyIntervalHoldsOnePoint(Scrambling scrambling) {
        for (int dimension = 1; dimension <= Sobol.DIMENSIONS; dimension++) {
            var coordinate = randomised(dimension, scrambling);
            for (long first : new long[] {0, 5L << 20, Sobol.POINTS - 1024}) {
                long[] points = digits(coordinate, first, 1024);
                for (int m = 0; m <= 10; m++) {
                    var held = new BitSet();
                    for (int i = 0; i < 1 << m; i++) {
                        held.set((int) (points[i] >> (32 - m)));
                    }
                    assertEquals(1 << m, held.cardinality(), "dimension " + dimension + ", 2^" + m + " from " + first);
                }
            }
        }
    }

    @Test
    void everyIntervalHoldsOneOfMoreThanAThousandPoints() {
        for (int dimension : new int[] {1, 2, 7, 400, 1010}) {
            var held = new BitSet();
            for (long point : digits(randomised(dimension, Scrambling.NESTED), 0, 1 << 20)) {
                held.set((int) (point >> 12));
            }
            assertEquals(1 << 20, held.cardinality(), "dimension " + dimension);
        }
    }

    /// Of 2^m points in two dimensions each box of area 2^(t-m) holds 2^t, and not so for any smaller t: the
    /// quality parameters are from ranks of scipy's generating matrices (sobol_points.py).
    @ParameterizedTest
    @CsvFileSource(resources = "/scheme/sobol-pairs.csv", numLinesToSkip = 2)
    void scrambledPairsKeepTheirQuality(int first, int second, int m, int t) {
        long[] x = digits(randomised(first, Scrambling.NESTED), 0, 1 << m);
        long[] y = digits(randomised(second, Scrambling.NESTED), 0, 1 << m);
        assertTrue(balanced(x, y, m, t));
        assertTrue(t == 0 || !balanced(x, y, m, t - 1));
    }

    private static boolean balanced(long[] x, long[] y, int m, int t) {
        for (int wide = 0; wide <= m - t; wide++) {
            int high = m - t - wide;
            int[] held = new int[1 << (m - t)];
            for (int i = 0; i < x.length; i++) {
                held[(int) (x[i] >>> (32 - wide) << high | y[i] >>> (32 - high))]++;
            }
            if (!Arrays.stream(held).allMatch(count -> count == 1 << t)) {
                return false;
            }
        }
        return true;
    }

    /// Points that share exactly r digits before scrambling do so afterwards.
    @Test
    void scramblingIsNested() {
        var random = new SplittableRandom(20261201);
        for (int trial = 0; trial < 20_000; trial++) {
            int dimension = random.nextInt(1, Sobol.DIMENSIONS + 1);
            long first = random.nextLong(Sobol.POINTS);
            long second = first ^ (1L << random.nextInt(32));
            var before = plain(dimension);
            var after = randomised(dimension, Scrambling.NESTED);
            assertEquals(
                    Long.numberOfLeadingZeros(digits(before, first) ^ digits(before, second)),
                    Long.numberOfLeadingZeros(digits(after, first) ^ digits(after, second)));
        }
    }

    /// Digit by digit; a digit behind those that tell the points apart is fair for each point on its own, and
    /// for two points together.
    @Test
    void everyDigitIsFair() {
        int replicates = 20_000;
        int[][] ones = new int[2][52];
        int[] equal = new int[52];
        long[] points = {0, 1_234_567};
        var sobol = Sobol.dimension(4);
        for (int r = 0; r < replicates; r++) {
            var coordinate =
                    sobol.randomised(Scrambling.NESTED, Stream.at(new Address(20261202, Purpose.RUN, "A", r, "x4", 0)));
            long[] cells = new long[2];
            for (int p = 0; p < 2; p++) {
                double[] u = new double[1];
                coordinate.fill(u, points[p], 1);
                cells[p] = (long) (u[0] * 0x1p52);
            }
            for (int k = 0; k < 52; k++) {
                for (int p = 0; p < 2; p++) {
                    ones[p][k] += (int) (cells[p] >> (51 - k) & 1);
                }
                equal[k] += (int) (~(cells[0] ^ cells[1]) >> (51 - k) & 1);
            }
        }
        int apart = Long.numberOfLeadingZeros(digits(plain(4), points[0]) ^ digits(plain(4), points[1])) - 32;
        double gate = 4 * Math.sqrt(replicates * .25);
        for (int k = 0; k < 52; k++) {
            assertEquals(replicates * .5, ones[0][k], gate, "digit " + (k + 1) + " of point 0");
            assertEquals(replicates * .5, ones[1][k], gate, "digit " + (k + 1) + " of the other");
            if (k > apart) {
                assertEquals(replicates * .5, equal[k], gate, "digit " + (k + 1) + " of both");
            } else {
                assertEquals(k < apart ? replicates : 0, equal[k], "digit " + (k + 1) + " of both");
            }
        }
    }

    /// Every 52-digit point shifted alike: the exclusive or of two points is that of the unshifted.
    @Test
    void aDigitalShiftIsTheSameForEveryPoint() {
        long[] before = digits(plain(9), 0, 4096);
        long[] after = digits(randomised(9, Scrambling.DIGITAL_SHIFT), 0, 4096);
        assertArrayEquals(Arrays.stream(before).map(x -> x ^ after[0]).toArray(), after);
    }

    @Test
    void whatThereIsNotIsRefused() {
        assertThrows(IllegalArgumentException.class, () -> Sobol.dimension(0));
        assertThrows(IllegalArgumentException.class, () -> Sobol.dimension(1112));
        var coordinate = randomised(1, Scrambling.NESTED);
        double[] u = new double[2];
        coordinate.fill(u, (1L << 32) - 2, 2);
        assertThrows(IllegalArgumentException.class, () -> coordinate.fill(u, (1L << 32) - 1, 2));
        assertThrows(IllegalArgumentException.class, () -> coordinate.fill(u, -1, 2));
    }
}
