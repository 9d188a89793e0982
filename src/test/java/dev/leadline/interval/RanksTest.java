package dev.leadline.interval;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.leadline.ReferenceValues;
import dev.leadline.estimate.Quantile;
import java.util.Arrays;
import java.util.Random;
import java.util.function.DoubleSupplier;
import java.util.function.DoubleUnaryOperator;
import java.util.stream.DoubleStream;
import org.apache.commons.statistics.distribution.BinomialDistribution;
import org.apache.commons.statistics.distribution.NormalDistribution;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvFileSource;
import org.junit.jupiter.params.provider.CsvSource;

class RanksTest {
    private static final double STATED_ERROR = 1e-12;
    private static final String RECORD = "quant-order-statistic-ranks";

    /// Record quant-order-statistic-ranks.
    @Test
    void agreesWithTheRecord() {
        int checked = 0;
        for (var entry : ReferenceValues.record(RECORD).required("cases")) {
            var parts =
                    entry.required("label").asString().replaceAll("[a-z= ]", "").split(",");
            var ranks = Ranks.of(
                    Long.parseLong(parts[0]), Double.parseDouble(parts[1]), Double.parseDouble(parts[2]), Sides.BOTH);
            assertEquals((long) ReferenceValues.expected(entry, "lower_rank"), ranks.low());
            assertEquals(ReferenceValues.expected(entry, "coverage"), ranks.coverage(), 1e-12);
            if (parts[0].equals("200")) {
                assertFalse(ranks.hasHigh());
            } else {
                assertEquals((long) ReferenceValues.expected(entry, "upper_rank"), ranks.high());
            }
            checked++;
        }
        assertEquals(10, checked);
    }

    /// The published table of the median in record quant-order-statistic-ranks, whose ranks are those
    /// nearest to 95 % and not always at least 95 %: the coverage of those ranks.
    @Test
    void coverageAgreesWithThePublishedTable() {
        int checked = 0;
        for (var row : ReferenceValues.record(RECORD).required("data").required("median_table")) {
            long n = row.required("n").asLong();
            long low = row.required("lower").asLong();
            long high = row.required("upper").asLong();
            double covered = 1 - BinomialTail.atMost(low - 1, n, .5) - BinomialTail.atLeast(high, n, .5);
            assertEquals(row.required("exact_percent").asDouble(), 100 * covered, 1e-11);
            var ranks = Ranks.of(n, .5, .95, Sides.BOTH);
            assertTrue(ranks.low() <= low && ranks.high() >= high);
            checked++;
        }
        assertEquals(16, checked);
    }

    /// Enumerated apart from this code.
    @ParameterizedTest
    @CsvSource({
        "100, .5, 40, 61, .96480",
        "1000, .95, 936, 964, .95810",
        "1000, .99, 983, 997, .97609",
        "10000, .999, 9983, 9997, .97546"
    })
    void agreesWithFiguresFoundBefore(long n, double q, long low, long high, double coverage) {
        var ranks = Ranks.of(n, q, .95, Sides.BOTH);
        assertEquals(low, ranks.low());
        assertEquals(high, ranks.high());
        assertEquals(coverage, ranks.coverage(), 5e-6);
    }

    /// Made by `fixed_draws.py` with 40 digits: ranks to the unit, to 1e13 draws; coverage with the error
    /// stated.
    @ParameterizedTest(name = "n = {0}, q = {1}, level {2}")
    @CsvFileSource(resources = "/interval/ranks.csv", numLinesToSkip = 2)
    void agreesToTheUnit(long n, double q, double level, long low, long high, double coverage) {
        var ranks = Ranks.of(n, q, level, Sides.BOTH);
        assertEquals(low, ranks.low());
        assertEquals(high, ranks.high());
        assertEquals(1 - coverage, 1 - ranks.coverage(), STATED_ERROR * (1 - coverage) + 2e-16);
    }

    /// Tails of Commons Statistics, to 1e6 draws, which are off by 1.4e-11 themselves.
    @Test
    void tailsAgreeWithALibrary() {
        var random = new Random(20261201);
        for (int i = 0; i < 300; i++) {
            int n = (int) Math.exp(random.nextDouble() * 13.8);
            double q = i % 3 == 0 ? random.nextDouble() : Math.exp(-8 * random.nextDouble());
            var binomial = BinomialDistribution.of(n, q);
            double mean = n * q;
            double sd = Math.sqrt(mean * (1 - q));
            int k = (int) Math.clamp(mean + sd * random.nextGaussian() * 3, 0, n);
            double least = binomial.cumulativeProbability(k);
            double most = binomial.survivalProbability(k - 1);
            assertEquals(least, BinomialTail.atMost(k, n, q), 1e-10 * least);
            assertEquals(most, BinomialTail.atLeast(k, n, q), 1e-10 * most);
        }
    }

    /// Level and tail are binary fractions: of 5 draws the least is below the median with probability
    /// 31/32, exactly.
    @Test
    void aTailThatIsJustLeftOutCounts() {
        assertEquals(1, Ranks.of(5, .5, 1 - 2.0 / 32, Sides.BOTH).low());
        assertEquals(0, Ranks.of(5, .5, 1 - 1.9999 / 32, Sides.BOTH).low());
        assertEquals(5, Ranks.of(5, .5, 1 - 2.0 / 32, Sides.BOTH).high());
        assertEquals(5, Ranks.of(5, .5, 1 - 1.0 / 32, Sides.UPPER).high());
    }

    /// Record int-wilks: the largest of n as a limit, and both the least and the largest, which have the
    /// size of the second largest. The five sizes at 95 %/95 % are common practice.
    /// Where ranks come from an expansion, the exact tails say the same.
    @Test
    void manyDrawsHaveTheRanksThatTheTailsSay() {
        var random = new Random(20261201);
        for (int i = 0; i < 400; i++) {
            double q = Math.pow(10, -4 * random.nextDouble());
            q = i % 2 == 0 ? Math.min(q, .5) : 1 - Math.min(q, .5);
            long n = (long) (Math.pow(10, 5 + 7 * random.nextDouble()) / (q * (1 - q)));
            double level = 1 - Math.pow(10, -1 - 3 * random.nextDouble());
            double tail = (1 - level) / 2;
            var ranks = Ranks.of(n, q, level, Sides.BOTH);
            String at = n + " draws, quantile " + q + ", level " + level;
            assertTrue(BinomialTail.atMost(ranks.low() - 1, n, q) <= tail * (1 + 1e-11), at);
            assertTrue(BinomialTail.atMost(ranks.low(), n, q) > tail, at);
            assertTrue(BinomialTail.atLeast(ranks.high(), n, q) <= tail * (1 + 1e-11), at);
            assertTrue(BinomialTail.atLeast(ranks.high() - 1, n, q) > tail, at);
        }
    }

    @Test
    void sizesAreWilks() {
        assertEquals(expected("one_sided_95_95"), Ranks.drawsForUpper(.95, .95, 1));
        assertEquals(expected("one_sided_95_99"), Ranks.drawsForUpper(.95, .99, 1));
        assertEquals(expected("one_sided_99_95"), Ranks.drawsForUpper(.99, .95, 1));
        assertEquals(expected("one_sided_90_95"), Ranks.drawsForUpper(.90, .95, 1));
        assertEquals(expected("two_sided_95_95"), Ranks.drawsForUpper(.95, .95, 2));
        assertEquals(expected("two_sided_99_95"), Ranks.drawsForUpper(.99, .95, 2));
        long[] sizes = {59, 93, 124, 153, 181};
        for (int r = 1; r <= 5; r++) {
            assertEquals(sizes[r - 1], Ranks.drawsForUpper(.95, .95, r));
            assertEquals(sizes[r - 1], Ranks.drawsForLower(.05, .95, r));
            assertEquals(
                    sizes[r - 1] - r + 1,
                    Ranks.of(sizes[r - 1], .95, .95, Sides.UPPER).high());
            assertEquals(
                    sizes[r - 1] - r + 1,
                    Ranks.of(sizes[r - 1] - 1, .95, .95, Sides.UPPER).high());
        }
    }

    private static long expected(String name) {
        return (long) ReferenceValues.expected("int-wilks", name);
    }

    /// The notes of record quant-order-statistic-ranks; 59 draws have a one-sided limit at 95 %, and no
    /// two-sided one.
    @Test
    void saysWhichLimitIsMissingAndHowManyDrawsHaveIt() {
        var few = new double[200];
        Arrays.setAll(few, i -> i);
        var interval = Ranks.of(200, .99, .95, Sides.BOTH).interval(few);
        assertEquals(194, interval.low());
        assertTrue(Double.isNaN(interval.high()));
        assertEquals(
                "no upper limit of the 0.99 quantile at this n (200); needs n = 368",
                interval.note().orElseThrow());
        assertFalse(Ranks.of(367, .99, .95, Sides.BOTH).hasHigh());
        assertTrue(Ranks.of(368, .99, .95, Sides.BOTH).hasHigh());
        assertFalse(Ranks.of(59, .95, .95, Sides.BOTH).hasHigh());
        var upper = Ranks.of(59, .95, .95, Sides.UPPER).interval(few);
        assertEquals(58, upper.high());
        assertEquals(Double.NEGATIVE_INFINITY, upper.low());
        assertTrue(upper.note().isEmpty());
        assertEquals(
                "no upper limit of the 0.95 quantile at this n (58); needs n = 59",
                Ranks.of(58, .95, .95, Sides.UPPER).interval(few).note().orElseThrow());
        assertTrue(Ranks.of(58, .95, .95, Sides.LOWER).interval(few).note().isEmpty());
        assertEquals(
                "no lower limit of the 0.5 quantile at this n (0); needs n = 6; no upper limit of the 0.5 quantile at"
                        + " this n (0); needs n = 6",
                Ranks.of(0, .5, .95, Sides.BOTH).interval(few).note().orElseThrow());
    }

    /// Sizes to 1e13 draws and more: `ln(.025) / ln(q)`, rounded up.
    @Test
    void sizesOfRareQuantilesAreExact() {
        for (double q : new double[] {.999, .999999, 1 - 1e-9, 1 - 1e-12}) {
            double size = Math.log(.025) / Math.log1p(-(1 - q));
            assertEquals(Math.ceil(size), Ranks.drawsForUpper(q, .975, 1), 1e-12 * size);
        }
    }

    /// Intervals of seeded draws hold the median as often as they say, and more often where values repeat.
    @Test
    void coversAsItSays() {
        var random = Observed.random(20261201);
        int repetitions = 4_000;
        var ranks = Ranks.of(100, .5, .95, Sides.BOTH);
        int covered = 0;
        int ofWhole = 0;
        for (int r = 0; r < repetitions; r++) {
            double[] sorted = Observed.EXPONENTIAL.draws(random, 100);
            Arrays.sort(sorted);
            var interval = ranks.interval(sorted);
            covered += interval.low() <= Math.log(2) && Math.log(2) <= interval.high() ? 1 : 0;
            double[] whole = Arrays.stream(sorted).map(Math::ceil).toArray();
            var another = ranks.interval(whole);
            ofWhole += another.low() <= 1 && 1 <= another.high() ? 1 : 0;
        }
        double error = Math.sqrt(ranks.coverage() * (1 - ranks.coverage()) / repetitions);
        assertEquals(ranks.coverage(), (double) covered / repetitions, 4 * error);
        assertTrue(ofWhole >= covered);
    }

    /// Record quant-asymptotic-variance: of 10,000 values at the middles of equal shares of the probability
    /// the length of the 95 % interval is that of the limit, within the 20 % of the record.
    @ParameterizedTest(name = "{0}, q = {1}")
    @CsvSource({
        "normal, .5",
        "normal, .95",
        "normal, .99",
        "exponential(1), .5",
        "exponential(1), .95",
        "exponential(1), .99",
        "'lognormal(0,1)', .5",
        "'lognormal(0,1)', .95",
        "'lognormal(0,1)', .99",
        "'uniform(0,1)', .5",
        "'uniform(0,1)', .95",
        "'uniform(0,1)', .99",
        "cauchy, .5",
        "cauchy, .95",
        "cauchy, .99"
    })
    void isAsLongAsTheAsymptoticVarianceSays(String density, double q) {
        var id = "quant-asymptotic-variance";
        int n = 10_000;
        DoubleUnaryOperator quantile = switch (density) {
            case "normal" -> NormalDistribution.of(0, 1)::inverseCumulativeProbability;
            case "exponential(1)" -> u -> -Math.log1p(-u);
            case "lognormal(0,1)" -> u -> Math.exp(NormalDistribution.of(0, 1).inverseCumulativeProbability(u));
            case "uniform(0,1)" -> u -> u;
            default -> u -> Math.tan(Math.PI * (u - .5));
        };
        var values = new double[n];
        Arrays.setAll(values, i -> quantile.applyAsDouble((i + .5) / n));
        var interval = Ranks.of(n, q, .95, Sides.BOTH).interval(values);
        double limit = Math.sqrt(ReferenceValues.expected(id, density + " n*Var limit at " + q) / n);
        assertEquals(1, interval.halfWidth() / 1.96 / limit, .2);
        double sought = ReferenceValues.expected(id, density + " quantile(" + q + ")");
        assertEquals(sought, values[(int) Quantile.rank(n, q) - 1], limit / 5);
    }

    /// Record quant-closed-form-outputs: by 100,000 seeded draws, at four standard errors (a chance of
    /// 6.3e-5 of a false alarm for each).
    @ParameterizedTest
    @CsvSource({
        "0.95 quantile of U1+U2, .95",
        "0.99 quantile of sum of 5 Exp(1), .99",
        "0.999 quantile of Z1^2+Z2^2, .999",
        "0.975 quantile of product of exp(0.3*z1)*exp(0.4*z2), .975",
        "'0.9 quantile of max of 12 U(0,1)', .9",
        "0.975 quantile of Z1/Z2 (Cauchy), .975"
    })
    void holdsQuantilesInClosedForm(String name, double q) {
        var random = Observed.random(20261201);
        DoubleSupplier output = switch (name.split(" of ", 2)[1]) {
            case "U1+U2" -> () -> random.nextDouble() + random.nextDouble();
            case "sum of 5 Exp(1)" ->
                () -> random.doubles(5).map(u -> -Math.log(u)).sum();
            case "Z1^2+Z2^2" -> () -> Math.pow(random.nextGaussian(), 2) + Math.pow(random.nextGaussian(), 2);
            case "product of exp(0.3*z1)*exp(0.4*z2)" ->
                () -> Math.exp(.3 * random.nextGaussian() + .4 * random.nextGaussian());
            case "max of 12 U(0,1)" -> () -> random.doubles(12).max().orElseThrow();
            default -> () -> random.nextGaussian() / random.nextGaussian();
        };
        double[] sorted = DoubleStream.generate(output).limit(100_000).sorted().toArray();
        var interval = Ranks.of(sorted.length, q, 1 - 6.3e-5, Sides.BOTH).interval(sorted);
        double sought = ReferenceValues.expected("quant-closed-form-outputs", name);
        assertTrue(interval.low() <= sought && sought <= interval.high(), interval + " and " + sought);
        assertTrue(interval.halfWidth() < .15 * sought);
    }

    @Test
    void refusesWhatIsNoQuantile() {
        assertThrows(IllegalArgumentException.class, () -> Ranks.of(10, 0, .95, Sides.BOTH));
        assertThrows(IllegalArgumentException.class, () -> Ranks.of(10, 1, .95, Sides.BOTH));
        assertThrows(IllegalArgumentException.class, () -> Ranks.of(10, .5, 1, Sides.BOTH));
    }
}
