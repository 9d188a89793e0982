package dev.leadline.interval;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.leadline.ReferenceValues;
import java.util.function.DoubleSupplier;
import java.util.random.RandomGenerator;
import java.util.stream.DoubleStream;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import tools.jackson.databind.JsonNode;

/// Ranks by hand, and the records of propagation by 400,000 seeded draws: mean and standard uncertainty
/// within four standard errors, ends of symmetric intervals within the order statistics at that level (a
/// chance of 6.3e-5 of a false alarm each). Ends of shortest intervals converge slowly: their length is
/// gated with the 2 % of the standard uncertainty that the record allows, and their content by as many
/// other draws.
class CoverageIntervalTest {
    private static final int DRAWS = 400_000;
    private static final double FOUR_ERRORS = 1 - 6.3e-5;

    private final RandomGenerator random = Observed.random(20261201);

    /// `q = p M`, or its integer part and a half more; `r = (M - q)/2`, or the integer part of `(M - q +
    /// 1)/2`.
    @ParameterizedTest
    @CsvSource({
        "1000, .95, 25, 975",
        "100, .95, 3, 98",
        "11, .95, 1, 11",
        "30, .95, 1, 30",
        "31, .95, 1, 30",
        "1000000, .99, 5000, 995000",
        "10, .5, 3, 8",
        "9, .5, 2, 7"
    })
    void ranksFollowTheSupplement(int values, double p, int low, int high) {
        double[] sorted = IntStream.rangeClosed(1, values).asDoubleStream().toArray();
        var interval = CoverageInterval.symmetric(sorted, p);
        assertEquals(low, interval.low());
        assertEquals(high, interval.high());
        assertEquals(low, interval.lowRank());
        assertEquals(high, interval.highRank());
        assertEquals(low, CoverageInterval.symmetricRank(values, p));
        assertEquals(high - low, CoverageInterval.reach(values, p));
    }

    @Test
    void theShortestIsTheFirstOfTheShortest() {
        var interval = CoverageInterval.shortest(new double[] {0, 4, 5, 6, 7, 9, 10, 11, 12, 20}, .3);
        assertEquals(4, interval.low());
        assertEquals(7, interval.high());
        assertEquals(2, interval.lowRank());
        assertEquals(5, interval.highRank());
    }

    @Test
    void needsValues() {
        var ten = CoverageInterval.symmetric(new double[10], .95);
        assertTrue(Double.isNaN(ten.low()) && Double.isNaN(ten.high()));
        assertEquals(
                "95 % of the values need at least 11 of them; so far there are 10",
                ten.note().orElseThrow());
        assertTrue(CoverageInterval.shortest(new double[0], .95).note().isPresent());
        assertEquals(501, needed(.999));
        assertTrue(CoverageInterval.symmetric(new double[501], .999).note().isEmpty());
        assertThrows(IllegalArgumentException.class, () -> CoverageInterval.reach(10, 1));
    }

    private static int needed(double p) {
        return Integer.parseInt(CoverageInterval.symmetric(new double[1], p)
                .note()
                .orElseThrow()
                .replaceAll(".*at least (\\d+) of.*", "$1"));
    }

    /// @param kurtosis of the outcome, at most
    private double[] draws(DoubleSupplier output, double mean, double u, double kurtosis) {
        double[] sorted = DoubleStream.generate(output).limit(DRAWS).sorted().toArray();
        var sums = Observed.sums(sorted);
        assertEquals(mean, sums.mean(0), 4 * u / Math.sqrt(DRAWS));
        assertEquals(1, Math.sqrt(sums.variance(0)) / u, 4 * Math.sqrt((kurtosis - 1) / (4 * DRAWS)));
        return sorted;
    }

    private static void symmetric(double[] sorted, double p, double low, double high) {
        var interval = CoverageInterval.symmetric(sorted, p);
        double tail = (1 - p) / 2;
        var below = Ranks.of(DRAWS, tail, FOUR_ERRORS, Sides.BOTH).interval(sorted);
        var above = Ranks.of(DRAWS, 1 - tail, FOUR_ERRORS, Sides.BOTH).interval(sorted);
        assertTrue(below.low() <= low && low <= below.high(), low + " in " + below);
        assertTrue(above.low() <= high && high <= above.high(), high + " in " + above);
        assertTrue(below.low() <= interval.low() && interval.low() <= below.high());
        assertTrue(above.low() <= interval.high() && interval.high() <= above.high());
    }

    private static void shortest(double[] sorted, DoubleSupplier output, double u, double low, double high) {
        var interval = CoverageInterval.shortest(sorted, .95);
        assertEquals(high - low, interval.high() - interval.low(), .02 * u);
        long within = DoubleStream.generate(output)
                .limit(DRAWS)
                .filter(y -> interval.low() <= y && y <= interval.high())
                .count();
        assertEquals(.95, (double) within / DRAWS, 4 * Math.sqrt(2 * .95 * .05 / DRAWS));
    }

    private double rectangular(double from, double to) {
        return from + (to - from) * random.nextDouble();
    }

    /// Record prop-jcgm101-additive.
    @Test
    void additiveModels() {
        var record = ReferenceValues.record("prop-jcgm101-additive");
        double root = Math.sqrt(3);
        additive(record, "a", () -> normals(4), 3);
        additive(record, "b", () -> rectangulars(4, root), 3);
        additive(record, "c", () -> rectangulars(3, root) + rectangular(-10 * root, 10 * root), 3);
    }

    private void additive(JsonNode record, String part, DoubleSupplier output, double kurtosis) {
        double half = ReferenceValues.expected(record, part + "_half_width_95");
        double u = ReferenceValues.expected(record, part + "_u");
        double[] sorted = draws(output, 0, u, kurtosis);
        symmetric(sorted, .95, -half, half);
        shortest(sorted, output, u, -half, half);
    }

    private double normals(int count) {
        double sum = 0;
        for (int i = 0; i < count; i++) {
            sum += random.nextGaussian();
        }
        return sum;
    }

    private double rectangulars(int count, double half) {
        double sum = 0;
        for (int i = 0; i < count; i++) {
            sum += rectangular(-half, half);
        }
        return sum;
    }

    /// Record prop-jcgm101-mass.
    @Test
    void massCalibration() {
        var record = ReferenceValues.record("prop-jcgm101-mass");
        DoubleSupplier output = () -> {
            double masses = (1e5 + .05 * random.nextGaussian()) + (1.234 + .02 * random.nextGaussian());
            double air = rectangular(1.1, 1.3) - 1.2;
            return masses * (1 + air * (1 / rectangular(7000, 9000) - 1 / rectangular(7950, 8050))) - 1e5;
        };
        double low = ReferenceValues.expected(record, "interval_95_low");
        double high = ReferenceValues.expected(record, "interval_95_high");
        double u = ReferenceValues.expected(record, "u");
        double[] sorted = draws(output, ReferenceValues.expected(record, "mean"), u, 4);
        symmetric(sorted, .95, low, high);
        shortest(sorted, output, u, low, high);
    }

    /// Record prop-jcgm101-comparison-loss.
    @ParameterizedTest
    @CsvSource({"0, 0", "0.01, 0", "0.05, 0", "0, 0.9", "0.01, 0.9", "0.05, 0.9"})
    void comparisonLoss(double x1, double rho) {
        var entry = ReferenceValues.caseOf(
                "prop-jcgm101-comparison-loss",
                "x1=" + (x1 == 0 ? "0" : Double.toString(x1)) + ", rho=" + (rho == 0 ? "0" : "0.9"));
        DoubleSupplier output = () -> {
            double z = random.nextGaussian();
            double a = x1 + .005 * z;
            double b = .005 * (rho * z + Math.sqrt(1 - rho * rho) * random.nextGaussian());
            return 1e6 * (a * a + b * b);
        };
        double u = ReferenceValues.expected(entry, "u_1e6");
        double[] sorted = draws(output, ReferenceValues.expected(entry, "mean_1e6"), u, 15);
        symmetric(
                sorted,
                .95,
                ReferenceValues.expected(entry, "symmetric95_low_1e6"),
                ReferenceValues.expected(entry, "symmetric95_high_1e6"));
        shortest(
                sorted,
                output,
                u,
                ReferenceValues.expected(entry, "shortest95_low_1e6"),
                ReferenceValues.expected(entry, "shortest95_high_1e6"));
    }

    /// Record prop-jcgm101-gauge-block.
    @Test
    void gaugeBlock() {
        var record = ReferenceValues.record("prop-jcgm101-gauge-block");
        DoubleSupplier output = () -> {
            double length = 50_000_623 + 25 * student(18);
            double others = 215 + 6 * student(24) + 4 * student(5) + 7 * student(8);
            double alpha = rectangular(9.5e-6, 13.5e-6);
            double theta = -.1 + .2 * random.nextGaussian() + .5 * Math.cos(Math.PI * random.nextDouble());
            double ofAlpha = trapezoid(-1e-6, 1e-6, .1e-6);
            double ofTheta = trapezoid(-.05, .05, .025);
            return length + others - length * (ofAlpha * theta + alpha * ofTheta) - 50_000_000;
        };
        double[] sorted =
                draws(output, ReferenceValues.expected(record, "mean"), ReferenceValues.expected(record, "u"), 4);
        symmetric(
                sorted,
                .99,
                ReferenceValues.expected(record, "interval_99_low"),
                ReferenceValues.expected(record, "interval_99_high"));
        symmetric(
                sorted,
                .95,
                ReferenceValues.expected(record, "interval_95_low"),
                ReferenceValues.expected(record, "interval_95_high"));
    }

    private double student(int degrees) {
        double square = degrees % 2 == 0 ? 0 : Math.pow(random.nextGaussian(), 2);
        for (int i = 0; i < degrees / 2; i++) {
            square += 2 * random.nextExponential();
        }
        return random.nextGaussian() / Math.sqrt(square / degrees);
    }

    /// JCGM 101:2008, 6.4.3: limits known to `± off`.
    private double trapezoid(double from, double to, double off) {
        double low = rectangular(from - off, from + off);
        return rectangular(low, from + to - low);
    }

    /// Record prop-product-power, and prop-gum-h1 with terms of the second order, its inputs taken for
    /// normal.
    @Test
    void productsAndPowers() {
        var record = ReferenceValues.record("prop-product-power");
        moments(record, "a", () -> (10 + random.nextGaussian()) * (5 + 2 * random.nextGaussian()), 4);
        moments(record, "b", () -> Math.pow(1 + random.nextGaussian(), 2), 15);
        moments(record, "c", () -> Math.exp(.5 * random.nextGaussian()), 15);
        moments(
                record,
                "d",
                () -> Math.PI * Math.pow(2 + .1 * random.nextGaussian(), 2) * (10 + .2 * random.nextGaussian()),
                4);
        var gauge = ReferenceValues.record("prop-gum-h1");
        draws(
                () -> {
                    double length = 50_000_623 + 25 * random.nextGaussian();
                    double alpha = 11.5e-6 + 1.2e-6 * random.nextGaussian();
                    double theta = -.1 + .41 * random.nextGaussian();
                    double ofAlpha = .58e-6 * random.nextGaussian();
                    double ofTheta = .029 * random.nextGaussian();
                    return length + 215 + 9.7 * random.nextGaussian() - length * (ofAlpha * theta + alpha * ofTheta);
                },
                ReferenceValues.expected(gauge, "l"),
                ReferenceValues.expected(gauge, "uc_with_second_order"),
                5);
    }

    private void moments(JsonNode record, String part, DoubleSupplier output, double kurtosis) {
        draws(
                output,
                ReferenceValues.expected(record, part + "_mean"),
                Math.sqrt(ReferenceValues.expected(record, part + "_variance")),
                kurtosis);
    }
}
