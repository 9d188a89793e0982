package dev.leadline.estimate;

import static org.junit.jupiter.api.Assertions.assertAll;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.leadline.ReferenceValues;
import java.util.Arrays;
import java.util.OptionalLong;
import java.util.SplittableRandom;
import java.util.stream.DoubleStream;
import org.apache.commons.math3.stat.correlation.Covariance;
import org.apache.commons.math3.stat.descriptive.DescriptiveStatistics;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

class AccumulatorTest {
    private static Accumulator of(double... values) {
        return ofColumns(values);
    }

    private static Accumulator ofColumns(double[]... columns) {
        var sums = new Accumulator(columns.length);
        sums.add(columns, 0, columns[0].length);
        return sums;
    }

    private static void within(double relative, double expected, double actual) {
        assertEquals(expected, actual, relative * Math.abs(expected));
    }

    private static double sd(Accumulator sums) {
        return Math.sqrt(sums.variance(0));
    }

    // ---- published figures -------------------------------------------------------------------------------------

    private static double[] numAcc(double first, double low, double high) {
        var values = new double[1_001];
        for (int i = 0; i < values.length; i++) {
            values[i] = i == 0 ? first : i % 2 == 1 ? low : high;
        }
        return values;
    }

    /// NIST StRD NumAcc1 to NumAcc4 (record acc-nist-numacc): the certified mean, and the deviation of the data as they
    /// can be stored.
    @ParameterizedTest(name = "NumAcc{0}")
    @ValueSource(ints = {1, 2, 3, 4})
    void agreesWithNistOnConstructedData(int which) {
        var values = switch (which) {
            case 1 -> new double[] {10000001, 10000003, 10000002};
            case 2 -> numAcc(1.2, 1.1, 1.3);
            case 3 -> numAcc(1000000.2, 1000000.1, 1000000.3);
            default -> numAcc(10000000.2, 10000000.1, 10000000.3);
        };
        var certified = ReferenceValues.caseOf("acc-nist-numacc", "NumAcc" + which);
        var sums = of(values);
        within(1e-15, ReferenceValues.expected(certified, "mean"), sums.mean(0));
        within(1e-12, ReferenceValues.expected(certified, "sd_of_the_stored_doubles"), sd(sums));
    }

    /// NIST StRD Michelso and Mavro (record acc-nist-michelso-mavro).
    @ParameterizedTest
    @ValueSource(strings = {"Michelso", "Mavro"})
    void agreesWithNistOnObservedData(String name) {
        var record = ReferenceValues.record("acc-nist-michelso-mavro");
        var certified = ReferenceValues.caseOf("acc-nist-michelso-mavro", name);
        var sums = of(ReferenceValues.numbers(record.required("data").required(name)));
        within(1e-12, ReferenceValues.expected(certified, "mean"), sums.mean(0));
        within(1e-12, ReferenceValues.expected(certified, "sd"), sd(sums));
    }

    /// Record acc-moments-merge: however ten numbers are divided, G1 and G2 of Joanes and Gill.
    @ParameterizedTest(name = "parts of {0}, {1}, …")
    @CsvSource({"10, 0", "3, 7", "7, 3", "1, 1", "2, 5"})
    void mergesParts(int first, int then) {
        var id = "acc-moments-merge";
        var data = ReferenceValues.numbers(ReferenceValues.record(id).required("data"));
        var sums = new Accumulator(1);
        for (int from = 0, n = first; from < data.length; from += n, n = then) {
            sums.merge(of(Arrays.copyOfRange(data, from, Math.min(from + (from == 0 ? first : then), data.length))));
        }
        double tolerance = ReferenceValues.relativeTolerance(id);
        assertEquals(10, sums.count());
        within(tolerance, ReferenceValues.expected(id, "mean"), sums.mean(0));
        within(tolerance, ReferenceValues.expected(id, "variance_n_minus_1"), sums.variance(0));
        within(tolerance, ReferenceValues.expected(id, "G1"), sums.skewness(0));
        within(tolerance, ReferenceValues.expected(id, "G2"), sums.excessKurtosis(0));
        assertEquals(2, sums.min(0));
        assertEquals(144, sums.max(0));
    }

    /// Record acc-cancellation.
    @Test
    void keepsItsDigitsUnderCancellation() {
        var id = "acc-cancellation";
        var shifted = of(1e9 + 4, 1e9 + 7, 1e9 + 13, 1e9 + 16);
        assertEquals(ReferenceValues.expected(id, "a_mean"), shifted.mean(0));
        within(1e-14, ReferenceValues.expected(id, "a_variance"), shifted.variance(0));
        assertEquals(ReferenceValues.expected(id, "e"), of(1e308, 1e308).mean(0));
        within(1e-14, 1.1e308, of(1e308, 1.2e308).mean(0));
        assertTrue(Double.isNaN(of(7).variance(0)), "the variance of one value is not 0");
    }

    // ---- error ---------------------------------------------------------------------------------------------------

    /// Numbers `shift + m / 2^16` with integers m of deviation about 2^16, so that their sums are exact in integers.
    private record Exact(double[] values, double mean, double variance) {
        static Exact of(double shift, int n, long seed) {
            var random = new SplittableRandom(seed);
            var values = new double[n];
            long sum = 0;
            long squares = 0;
            for (int i = 0; i < n; i++) {
                long m = Math.round(random.nextGaussian() * (1 << 16));
                values[i] = shift + m * 0x1p-16;
                sum += m;
                squares += m * m;
            }
            double centred = squares - (double) sum * sum / n;
            return new Exact(values, shift + sum * 0x1p-16 / n, centred * 0x1p-32 / (n - 1));
        }
    }

    /// The error that [Accumulator] states; seen are 1.4e-15 in the variance and no difference in the mean.
    @ParameterizedTest(name = "mean {0}, standard deviation 1")
    @ValueSource(doubles = {0, 1e4, 1e8})
    void hasTheStatedError(double shift) {
        for (int seed = 1; seed <= 5; seed++) {
            var exact = Exact.of(shift, 1_000_000, seed);
            var sums = of(exact.values);
            double error = Math.abs(sums.variance(0) / exact.variance - 1);
            assertTrue(error <= 1e-14, "variance off by " + error + " with seed " + seed);
            double off = Math.abs(sums.mean(0) - exact.mean);
            assertTrue(off <= 1e-18 + Math.ulp(shift), "mean off by " + off + " with seed " + seed);
        }
    }

    /// The same observations in one call, in calls of odd sizes, and in parts merged one by one.
    @ParameterizedTest(name = "mean {0}, standard deviation 1")
    @ValueSource(doubles = {0, 1e4, 1e8})
    void hardlyDependsOnTheDivision(double shift) {
        var values = Exact.of(shift, 100_000, 11).values;
        var whole = of(values);
        var sizes = new SplittableRandom(12);
        var calls = new Accumulator(1);
        var parts = new Accumulator(1);
        for (int from = 0; from < values.length; ) {
            int to = Math.min(values.length, from + 1 + sizes.nextInt(2_000));
            calls.add(new double[][] {values}, from, to);
            parts.merge(of(Arrays.copyOfRange(values, from, to)));
            from = to;
        }
        for (var other : new Accumulator[] {calls, parts}) {
            assertEquals(whole.count(), other.count());
            assertEquals(whole.mean(0), other.mean(0), 1e-18 + Math.ulp(shift));
            within(1e-14, whole.variance(0), other.variance(0));
            assertEquals(whole.skewness(0), other.skewness(0), 1e-14);
            assertEquals(whole.excessKurtosis(0), other.excessKurtosis(0), 1e-13);
        }
    }

    @Test
    void repeatsItsBits() {
        var values = Exact.of(3, 10_000, 5).values;
        var once = of(values);
        var again = of(values);
        assertEquals(Double.doubleToLongBits(once.mean(0)), Double.doubleToLongBits(again.mean(0)));
        assertEquals(Double.doubleToLongBits(once.variance(0)), Double.doubleToLongBits(again.variance(0)));
        assertEquals(Double.doubleToLongBits(once.skewness(0)), Double.doubleToLongBits(again.skewness(0)));
    }

    /// A block repeated 100,000 times: its mean to the last bit, its variance and skewness to one rounding a merge.
    @Test
    void doesNotDriftOverManyEqualBlocks() {
        var block = of(Exact.of(1e4, 1_000, 6).values);
        var sums = new Accumulator(1);
        for (int i = 0; i < 100_000; i++) {
            sums.merge(block);
        }
        assertEquals(100_000_000, sums.count());
        assertEquals(block.mean(0), sums.mean(0));
        within(100_000 * 0x1p-53, block.variance(0) * 999e5 / (1e8 - 1), sums.variance(0));
        within(3 * 100_000 * 0x1p-53, block.skewness(0) * 998 / Math.sqrt(999e3) * (1 + 1.5e-8), sums.skewness(0));
    }

    /// Against Commons Math, which computes them in other ways.
    @ParameterizedTest(name = "{0} observations")
    @ValueSource(ints = {4, 5, 6, 7, 1023, 1024, 1025, 5000})
    void agreesWithCommonsMath(int n) {
        var random = new SplittableRandom(n);
        var columns = new double[3][n];
        for (int i = 0; i < n; i++) {
            columns[0][i] = random.nextDouble();
            columns[1][i] = random.nextExponential() - columns[0][i];
            columns[2][i] = columns[0][i] < .3 ? 1 : 0;
        }
        var sums = ofColumns(columns);
        for (int k = 0; k < 3; k++) {
            var library = new DescriptiveStatistics(columns[k]);
            within(1e-14, library.getMean(), sums.mean(k));
            within(1e-13, library.getVariance(), sums.variance(k));
            assertEquals(library.getSkewness(), sums.skewness(k), 1e-11);
            assertEquals(library.getKurtosis(), sums.excessKurtosis(k), 1e-11);
            assertEquals(library.getMin(), sums.min(k));
            assertEquals(library.getMax(), sums.max(k));
            for (int j = 0; j < 3; j++) {
                double covariance = new Covariance().covariance(columns[j], columns[k]);
                assertEquals(covariance, sums.covariance(j, k), 1e-13);
                assertEquals(sums.covariance(j, k), sums.covariance(k, j));
            }
        }
    }

    // ---- events --------------------------------------------------------------------------------------------------

    @Test
    void countsHitsExactly() {
        var random = new SplittableRandom(3);
        var values = random.doubles(100_000).map(u -> u < .01 ? 1 : 0).toArray();
        long hits = (long) DoubleStream.of(values).sum();
        var sums = of(values);
        double p = hits / 100_000.0;
        assertEquals(OptionalLong.of(hits), sums.hits(0));
        within(1e-15, p, sums.mean(0));
        within(1e-13, p * (1 - p) * 100_000 / 99_999, sums.variance(0));
    }

    @Test
    void countsHitsOnlyOfEvents() {
        assertEquals(OptionalLong.of(2), of(1, 0, 1, -0.0).hits(0));
        assertEquals(OptionalLong.of(0), new Accumulator(1).hits(0));
        assertEquals(OptionalLong.empty(), of(0, 1, .5).hits(0));
        assertEquals(OptionalLong.empty(), of(0, 1, Double.MIN_VALUE).hits(0));
        assertEquals(OptionalLong.empty(), of(0, 1, Math.nextDown(1)).hits(0));
        assertEquals(OptionalLong.empty(), of(0, 1, 2).hits(0));
        var sums = of(1, 1);
        sums.merge(of(3));
        assertEquals(OptionalLong.empty(), sums.hits(0));
    }

    // ---- no spread, nothing, too much ------------------------------------------------------------------------------

    @Test
    void equalValuesHaveNoSpread() {
        var values = new double[5_000];
        Arrays.fill(values, .1);
        var sums = of(values);
        sums.merge(of(values));
        assertTrue(sums.constant(0));
        assertEquals(.1, sums.mean(0));
        assertEquals(0, sums.variance(0));
        assertEquals(0, sums.standardError(0));
        assertTrue(Double.isNaN(sums.skewness(0)));
        assertTrue(Double.isNaN(sums.excessKurtosis(0)));
        sums.merge(of(.1000000001));
        assertFalse(sums.constant(0));
        assertTrue(sums.variance(0) > 0);
    }

    @Test
    void saysNothingOfNothing() {
        var sums = new Accumulator(2);
        sums.add(new double[2][0], 0, 0);
        sums.merge(new Accumulator(2));
        assertAll(
                () -> assertEquals(0, sums.count()),
                () -> assertTrue(Double.isNaN(sums.mean(0))),
                () -> assertTrue(Double.isNaN(sums.variance(1))),
                () -> assertTrue(Double.isNaN(sums.covariance(0, 1))),
                () -> assertTrue(Double.isNaN(sums.standardError(0))),
                () -> assertFalse(sums.constant(0)));
    }

    @ParameterizedTest
    @ValueSource(doubles = {Double.NaN, Double.POSITIVE_INFINITY, Double.NEGATIVE_INFINITY})
    void leavesAnObservationOutWhole(double failed) {
        var a = new double[] {1, 2, failed, 4, 5, 7};
        var b = new double[] {3, failed, 5, 6, failed, 9};
        var sums = ofColumns(a, b);
        var finite = ofColumns(new double[] {1, 4, 7}, new double[] {3, 6, 9});
        assertEquals(3, sums.excluded());
        assertEquals(3, sums.count());
        for (int k = 0; k < 2; k++) {
            assertEquals(finite.mean(k), sums.mean(k));
            assertEquals(finite.variance(k), sums.variance(k));
            assertEquals(finite.max(k), sums.max(k));
        }
        assertEquals(finite.covariance(0, 1), sums.covariance(0, 1));
        var merged = sums.copy();
        merged.merge(sums);
        assertEquals(6, merged.excluded());
        assertEquals(3, sums.excluded(), "a copy is apart");
    }

    @Test
    void leavesOutWhatFailedWhereverItStands() {
        var values = new SplittableRandom(8).doubles(4_000).toArray();
        for (int i : new int[] {0, 1023, 1024, 2047, 3999}) {
            values[i] = Double.NaN;
        }
        var sums = of(values);
        assertEquals(5, sums.excluded());
        assertEquals(3_995, sums.count());
        within(1e-14, DoubleStream.of(values).filter(Double::isFinite).average().orElseThrow(), sums.mean(0));
        var none = of(Double.NaN, Double.NaN);
        assertEquals(2, none.excluded());
        assertEquals(0, none.count());
    }

    /// Fourth powers overflow from 1e77, cubes from 1e102, squares from 1e154: what needs them is then not said, and
    /// what does not need them stays right.
    @Test
    void overflowsFromTheTop() {
        var hundred = of(1e100, -1e100, 3e100, 4e100);
        within(1e-15, 1.75e100, hundred.mean(0));
        within(1e-14, 59e200 / 12, hundred.variance(0));
        assertTrue(Double.isFinite(hundred.skewness(0)));
        assertTrue(Double.isNaN(hundred.excessKurtosis(0)));
        var twoHundred = of(1e200, -1e200, 3e200, 4e200);
        within(1e-15, 1.75e200, twoHundred.mean(0));
        assertEquals(Double.POSITIVE_INFINITY, twoHundred.variance(0));
        assertTrue(Double.isNaN(twoHundred.skewness(0)));
        var ends = of(Double.MAX_VALUE, -Double.MAX_VALUE, Double.MAX_VALUE);
        assertEquals(0, ends.excluded());
        within(1e-15, Double.MAX_VALUE / 3, ends.mean(0));
        assertEquals(Double.POSITIVE_INFINITY, ends.variance(0));
        var merged = of(Double.MAX_VALUE);
        merged.merge(of(-Double.MAX_VALUE));
        assertEquals(0, merged.mean(0));
        assertEquals(Double.POSITIVE_INFINITY, merged.variance(0));
    }

    @Test
    void underflowsWithoutInventingAShape() {
        var tiny = of(1e-100, 2e-100, 4e-100, 9e-100);
        within(1e-14, 38e-200 / 3, tiny.variance(0));
        assertTrue(Double.isNaN(tiny.skewness(0)));
        assertTrue(Double.isNaN(tiny.excessKurtosis(0)));
        // The squares of 5e-163 are one smallest number, or none.
        for (double unit : new double[] {1e-151, 1e-162, 1e-300}) {
            var tinier = of(unit, 2 * unit, 4 * unit, 9 * unit);
            assertTrue(Double.isNaN(tinier.variance(0)) && Double.isNaN(tinier.standardError(0)), "unit " + unit);
            within(1e-15, 4 * unit, tinier.mean(0));
        }
    }

    @Test
    void readsOnlyTheRowsAskedFor() {
        var sums = new Accumulator(1);
        sums.add(new double[][] {{Double.NaN, 1, 2, 3, Double.NaN}}, 1, 4);
        assertEquals(0, sums.excluded());
        assertEquals(2, sums.mean(0));
    }

    @Test
    void refusesAnotherNumberOfComponents() {
        assertThrows(IllegalArgumentException.class, () -> new Accumulator(0));
        assertThrows(IllegalArgumentException.class, () -> new Accumulator(2).add(new double[1][3], 0, 3));
        assertThrows(IllegalArgumentException.class, () -> new Accumulator(2).merge(new Accumulator(1)));
    }
}
