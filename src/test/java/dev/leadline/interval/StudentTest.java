package dev.leadline.interval;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.leadline.ReferenceValues;
import dev.leadline.estimate.Accumulator;
import org.apache.commons.statistics.distribution.BinomialDistribution;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvFileSource;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

class StudentTest {
    private static final double STATED_ERROR = 1e-14;

    private static void within(double relative, double expected, double actual) {
        assertEquals(expected, actual, relative * Math.abs(expected));
    }

    /// Record int-student-quantiles: entries `t(p,df)` with one-sided p, whose level 2p - 1 is not exact.
    @Test
    void agreesWithTheTable() {
        var entries = ReferenceValues.record("int-student-quantiles").required("expected");
        assertTrue(entries.size() >= 40);
        for (var entry : entries) {
            var name = entry.required("name").asString();
            var parts = name.substring(2, name.length() - 1).split(",");
            double level = 2 * Double.parseDouble(parts[0]) - 1;
            double t = Student.quantile(Long.parseLong(parts[1].strip()), level);
            within(STATED_ERROR, entry.required("value").asDouble(), t);
        }
    }

    /// Made by `limits.py` with 50 digits; the error that [Student] states.
    @ParameterizedTest(name = "{0} degrees, level {1}")
    @CsvFileSource(resources = "/interval/student.csv", numLinesToSkip = 2)
    void agreesWithFiftyDigits(long degrees, double level, double t) {
        within(STATED_ERROR, t, Student.quantile(degrees, level));
    }

    /// Record int-common-practice: the normal multipliers, from which t differs by a relative `(z² + 1)/(4 ν)`.
    @ParameterizedTest
    @CsvSource({"z_975, .95", "z_95, .9", "z_995, .99"})
    void isNormalWithManyDegrees(String name, double level) {
        within(3e-12, ReferenceValues.expected("int-common-practice", name), Student.quantile(1e12, level));
    }

    /// Records of Wald's interval, int-binomial-coverage and three figures enumerated apart from this code: on hits
    /// Student's is nearly the same, and covers as badly. That is why no event has it. Probabilities are those of
    /// Commons Statistics.
    @ParameterizedTest(name = "n = {0}, p = {1}")
    @CsvSource({
        "20, 0.1, 0.8760372560005, 1e-10",
        "50, 0.02, 0.6353521026987, 1e-10",
        "100, 0.5, 0.9431120663590, 1e-10",
        "1000, 0.001, 0.6317165051273, 1e-10",
        "1000, 1e-4, .0952, 5e-5",
        "1000, 5e-3, .8707, 5e-5",
        "10000, 1e-3, .9259, 5e-5"
    })
    void coversAsBadlyAsWaldsOnHits(int n, double p, double coverage, double tolerance) {
        var counts = BinomialDistribution.of(n, p);
        double sum = 0;
        for (int k = 0; k <= n; k++) {
            double share = (double) k / n;
            var interval = Student.of(share, Math.sqrt(share * (1 - share) / (n - 1)), n, .95);
            sum += interval.low() <= p && p <= interval.high() ? counts.probability(k) : 0;
        }
        assertEquals(coverage, sum, tolerance);
    }

    /// Record prop-gum-h1: the multiplier of its expanded uncertainty.
    @Test
    void agreesWithTheEndGauge() {
        within(1e-10, ReferenceValues.expected("prop-gum-h1", "t_99_16"), Student.quantile(16, .99));
    }

    /// Record int-student-zarr13: the summary of 195 readings.
    @Test
    void makesTheIntervalOfASummary() {
        var id = "int-student-zarr13";
        var interval = Student.of(9.261460, 0.022789 / Math.sqrt(195), 195, 0.95);
        double tolerance = ReferenceValues.relativeTolerance(id);
        within(tolerance, ReferenceValues.expected(id, "low"), interval.low());
        within(tolerance, ReferenceValues.expected(id, "high"), interval.high());
        assertEquals("student", interval.kind());
        assertEquals(.95, interval.level());
        assertTrue(interval.note().isEmpty());
    }

    @ParameterizedTest
    @CsvSource({"0, there are 0", "1, there is 1"})
    void needsTwoObservations(long n, String found) {
        var interval = Student.of(3, Double.NaN, n, .95);
        assertTrue(Double.isNaN(interval.low()) && Double.isNaN(interval.high()));
        assertEquals(
                "an interval needs at least 2 observations; so far " + found,
                interval.note().orElseThrow());
    }

    @Test
    void isNeverZeroWide() {
        var sums = new Accumulator(1);
        var values = new double[1_000];
        java.util.Arrays.fill(values, .1);
        sums.add(new double[][] {values}, 0, 1_000);
        var interval = Student.of(sums, 0, .95);
        assertTrue(Double.isNaN(interval.low()) && Double.isNaN(interval.high()));
        assertEquals(
                "every value seen so far is equal (0.1): no spread to build an interval from; at most a part of"
                        + " probability below 3/n = 0.0030 may be unseen",
                interval.note().orElseThrow());
    }

    @Test
    void saysWhenTheSquaresOverflow() {
        var sums = new Accumulator(1);
        sums.add(new double[][] {{1e200, 2e200, 4e200}}, 0, 3);
        var interval = Student.of(sums, 0, .95);
        assertTrue(Double.isNaN(interval.low()));
        assertTrue(interval.note().orElseThrow().contains("overflow"));
    }

    @Test
    void saysWhenTheSquaresUnderflow() {
        var sums = new Accumulator(1);
        sums.add(new double[][] {{1e-200, 2e-200, 4e-200}}, 0, 3);
        var interval = Student.of(sums, 0, .95);
        assertTrue(Double.isNaN(interval.low()));
        assertTrue(interval.note().orElseThrow().contains("underflow"));
    }

    @ParameterizedTest
    @ValueSource(doubles = {0, 1, -1, 95, Double.NaN})
    void refusesWhatIsNoLevel(double level) {
        assertThrows(IllegalArgumentException.class, () -> Student.of(0, 1, 10, level));
    }
}
