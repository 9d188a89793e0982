package dev.leadline.density;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.leadline.density.CatalogueTest.Case;
import java.math.BigDecimal;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.SplittableRandom;
import java.util.function.DoubleUnaryOperator;
import java.util.stream.IntStream;
import java.util.stream.Stream;
import org.apache.commons.math3.analysis.integration.gauss.GaussIntegratorFactory;
import org.apache.commons.statistics.distribution.BinomialDistribution;
import org.apache.commons.statistics.distribution.DiscreteDistribution;
import org.apache.commons.statistics.distribution.GeometricDistribution;
import org.apache.commons.statistics.distribution.HypergeometricDistribution;
import org.apache.commons.statistics.distribution.PascalDistribution;
import org.apache.commons.statistics.distribution.PoissonDistribution;
import org.apache.commons.statistics.distribution.UniformDiscreteDistribution;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.MethodSource;

/// What every discrete density promises beyond what `CatalogueTest` asks of all: the same hand-picked members
/// and random ones, whose seed is part of their name.
class DiscreteCatalogueTest {
    private static final double[] MASSES = {
        1e-300, 1e-200, 1e-100, 1e-30, 0x1p-53, 1e-10, 0.001, 0.1, 0.3, 0.5, 0.7, 0.9, 0.999
    };

    /// As many values as a test looks at one by one.
    private static final int MANY = 3_000_000;

    private static final long SEED = 20261201;

    static Stream<Case> discrete() {
        return CatalogueTest.discrete();
    }

    static Stream<Case> narrow() {
        return discrete().filter(c -> !isWide(c.density()));
    }

    static Stream<Case> wide() {
        return discrete().filter(c -> isWide(c.density()));
    }

    private static boolean isWide(Density d) {
        return d.upperQuantile(1e-20) - d.quantile(1e-20) > MANY;
    }

    /// Those from the first to the last that has a probability of `tail` beyond it, at most so many.
    private static double[] values(Density d, double tail, int most) {
        var shape = (Discrete) d.standardised().shape();
        double location = d.standardised().location();
        double last = d.upperQuantile(tail);
        var values = new ArrayList<Double>();
        for (double x = d.quantile(tail); values.size() < most; x = location + shape.next(x - location)) {
            values.add(x);
            if (x >= last) {
                break;
            }
        }
        return values.stream().mapToDouble(x -> x).toArray();
    }

    @ParameterizedTest(name = "{0}")
    @MethodSource("discrete")
    void endsOfTheSupport(Case c) {
        var d = c.density();
        var support = d.support();
        assertTrue(support.low() <= support.high());
        assertEquals(support.low(), d.quantile(0));
        assertEquals(support.high(), d.quantile(1));
        assertEquals(support.high(), d.upperQuantile(0));
        assertEquals(support.low(), d.upperQuantile(1));
        for (double x : new double[] {Math.nextDown(support.low()), support.low() - 1, Double.NEGATIVE_INFINITY}) {
            assertEquals(0, d.cdf(x), 0.0);
            assertEquals(1, d.survival(x), 0.0);
            assertEquals(0, d.pdf(x), 0.0);
            assertEquals(Double.NEGATIVE_INFINITY, d.logPdf(x));
        }
        for (double x : new double[] {support.high(), 1e300, Double.MAX_VALUE, Double.POSITIVE_INFINITY}) {
            assertEquals(1, d.cdf(x), 0.0);
            assertEquals(0, d.survival(x), 0.0);
        }
        for (double x : new double[] {Math.nextUp(support.high()), Double.POSITIVE_INFINITY}) {
            assertEquals(0, d.pdf(x), 0.0);
            assertEquals(Double.NEGATIVE_INFINITY, d.logPdf(x));
        }
    }

    @ParameterizedTest(name = "{0}")
    @MethodSource("discrete")
    void flatBetweenValuesAndRightContinuous(Case c) {
        var d = c.density();
        for (double x : spread(d)) {
            for (double between : new double[] {Math.nextUp(x), Math.nextDown(x)}) {
                assertEquals(0, d.pdf(between), 0.0, () -> "at " + between);
                assertEquals(Double.NEGATIVE_INFINITY, d.logPdf(between));
            }
            assertEquals(d.cdf(x), d.cdf(Math.nextUp(x)), 0.0);
            assertEquals(d.survival(x), d.survival(Math.nextUp(x)), 0.0);
        }
    }

    private static double[] spread(Density d) {
        return Arrays.stream(MASSES)
                .flatMap(p -> Arrays.stream(new double[] {d.quantile(p), d.upperQuantile(p)}))
                .distinct()
                .toArray();
    }

    /// The probability of a value is the step of both tails there: where these are not too coarse to show it.
    @ParameterizedTest(name = "{0}")
    @MethodSource("discrete")
    void aProbabilityIsAStepOfBothTails(Case c) {
        var d = c.density();
        for (double x : spread(d)) {
            double before = Math.nextDown(x);
            double mass = d.pdf(x);
            double lower = d.cdf(x);
            assertEquals(mass, lower - d.cdf(before), 2e-12 * lower, () -> "cdf at " + x);
            double upper = d.survival(before);
            assertEquals(mass, upper - d.survival(x), 2e-12 * upper, () -> "survival at " + x);
        }
    }

    @ParameterizedTest(name = "{0}")
    @MethodSource("narrow")
    void probabilitiesAddUp(Case c) {
        var d = c.density();
        double[] x = values(d, 1e-20, MANY + 1);
        double below = d.cdf(Math.nextDown(x[0]));
        int step = Math.max(1, x.length / 1000);
        for (int i = 0; i < x.length; i++) {
            below += d.pdf(x[i]);
            if (i % step == 0) {
                double at = x[i];
                assertEquals(below, d.cdf(at), 2e-12 * below, () -> "cdf at " + at);
            }
        }
        double above = d.survival(x[x.length - 1]);
        for (int i = x.length - 1; i > 0; i--) {
            above += d.pdf(x[i]);
            if (i % step == 0) {
                double at = x[i - 1];
                assertEquals(above, d.survival(at), 2e-12 * above, () -> "survival at " + at);
            }
        }
    }

    /// Mean, variance, skewness and kurtosis by their definitions; what lies beyond 1e-20 counts less than rounding.
    @ParameterizedTest(name = "{0}")
    @MethodSource("narrow")
    void momentsBySums(Case c) {
        var d = c.density();
        double[] x = values(d, 1e-25, 2 * MANY);
        double[] mass = Arrays.stream(x).map(d::pdf).toArray();
        double total = sum(mass, i -> 1);
        double mean = sum(mass, i -> x[(int) i]) / total;
        double variance = sum(mass, i -> StrictMath.pow(x[(int) i] - mean, 2)) / total;
        assertEquals(1, total, 1e-12);
        assertEquals(mean, d.mean(), 1e-12 * Math.max(Math.abs(mean), Math.sqrt(variance)));
        if (x.length == 1) {
            assertEquals(0, d.variance(), 0.0);
            assertTrue(Double.isNaN(d.skewness()) && Double.isNaN(d.excessKurtosis()));
            return;
        }
        double sd = Math.sqrt(variance);
        double third = sum(mass, i -> StrictMath.pow((x[(int) i] - mean) / sd, 3)) / total;
        double fourth = sum(mass, i -> StrictMath.pow((x[(int) i] - mean) / sd, 4)) / total;
        double rounding = 1e-15 * Math.abs(mean) / sd;
        assertEquals(variance, d.variance(), (1e-11 + 10 * rounding) * variance);
        assertEquals(third, d.skewness(), (1e-11 + 30 * rounding) * Math.max(1, Math.abs(third)));
        assertEquals(fourth - 3, d.excessKurtosis(), (1e-11 + 100 * rounding) * fourth);
    }

    private static double sum(double[] mass, DoubleUnaryOperator f) {
        var sum = BigDecimal.ZERO;
        for (int i = 0; i < mass.length; i++) {
            sum = sum.add(new BigDecimal(mass[i] * f.applyAsDouble(i)));
        }
        return sum.doubleValue();
    }

    /// Those with too many values to add: with `p = exp(-s) / 2`, the integral of `f(quantile(p)) p` over s.
    @ParameterizedTest(name = "{0}")
    @MethodSource("wide")
    void momentsFromTheQuantiles(Case c) {
        var d = c.density();
        double mean = d.mean();
        double sd = Math.sqrt(d.variance());
        var rule = new GaussIntegratorFactory().legendre(8, 0, 1);
        var moments = new double[5];
        for (double from = 0; from < 200; from += from < 8 ? 0.125 : 2) {
            double step = from < 8 ? 0.125 : 2;
            for (int j = 0; j < rule.getNumberOfPoints(); j++) {
                double p = 0.5 * StrictMath.exp(-(from + step * rule.getPoint(j)));
                double weight = step * rule.getWeight(j) * p;
                for (double x : new double[] {d.quantile(p), d.upperQuantile(p)}) {
                    for (int order = 1; order <= 4; order++) {
                        moments[order] += weight * StrictMath.pow((x - mean) / sd, order);
                    }
                }
            }
        }
        double slack = 1e-5 + 10 / sd;
        assertEquals(0, moments[1], slack, "mean");
        assertEquals(1, moments[2], slack, "variance");
        assertEquals(d.skewness(), moments[3], 10 * slack, "skewness");
        assertEquals(d.excessKurtosis(), moments[4] - 3, 100 * slack, "kurtosis");
    }

    /// The value's cdf reaches p, and that of no value before it does, to the rounding that `Discrete` states.
    @ParameterizedTest(name = "{0}")
    @MethodSource("discrete")
    void quantilesAreTheSmallestValues(Case c) {
        var d = c.density();
        for (double p : MASSES) {
            double x = d.quantile(p);
            assertTrue(d.pdf(x) > 0, () -> x + " is no value");
            assertTrue(reaches(d, x, p), () -> "quantile of " + p + " is " + x + ", too small");
            assertTrue(!reaches(d, Math.nextDown(x), p), () -> "quantile of " + p + " is " + x + ", too large");
            double y = d.upperQuantile(p);
            assertTrue(d.pdf(y) > 0, () -> y + " is no value");
            assertTrue(covers(d, y, p), () -> "upper quantile of " + p + " is " + y + ", too small");
            assertTrue(!covers(d, Math.nextDown(y), p), () -> "upper quantile of " + p + " is " + y + ", too large");
        }
    }

    private static boolean reaches(Density d, double x, double p) {
        return p <= 0.5 ? d.cdf(x) >= p * (1 - Discrete.ROUNDING) : d.survival(x) <= (1 - p) * (1 + Discrete.ROUNDING);
    }

    private static boolean covers(Density d, double x, double q) {
        return q <= 0.5 ? d.survival(x) <= q * (1 + Discrete.ROUNDING) : d.cdf(x) >= (1 - q) * (1 - Discrete.ROUNDING);
    }

    @ParameterizedTest(name = "{0}")
    @MethodSource("discrete")
    void thereAndBack(Case c) {
        var d = c.density();
        int there = 0;
        for (double x : spread(d)) {
            double cdf = d.cdf(x);
            double survival = d.survival(x);
            if (cdf <= 0.5 && d.pdf(x) > 1e-12 * cdf) {
                assertEquals(x, d.quantile(cdf), () -> "quantile of " + cdf);
                there++;
            }
            if (survival <= 0.5 && survival > 0 && d.pdf(x) > 1e-12 * survival) {
                assertEquals(x, d.upperQuantile(survival), () -> "upper quantile of " + survival);
                there++;
            }
        }
        assertTrue(there > 0 || d.variance() == 0);
    }

    @ParameterizedTest(name = "{0}")
    @MethodSource("inTheLibrary")
    void agreesWithALibrary(Case c) {
        var d = c.density();
        var library = library(d);
        for (double p : new double[] {1e-8, 0.001, 0.1, 0.3, 0.5, 0.7, 0.9, 0.999}) {
            int k = (int) d.quantile(p);
            double slack = 1e-9 + 1e-15 * Math.abs(k) * d.pdf(k) / Math.min(p, 1 - p);
            assertEquals(library.probability(k), d.pdf(k), slack * d.pdf(k), () -> "probability of " + k);
            assertEquals(library.cumulativeProbability(k), d.cdf(k), slack * d.cdf(k), () -> "cdf at " + k);
            double survival = d.survival(k);
            assertEquals(library.survivalProbability(k), survival, slack * survival + 1e-15, () -> "survival at " + k);
        }
    }

    /// What the library has: whole numbers of 32 bits, more values than one, sizes that are whole,
    /// and no probability so near 1 that what it lacks has lost digits.
    static Stream<Case> inTheLibrary() {
        return discrete()
                .filter(c -> !(c.density() instanceof ValueTable))
                .filter(c -> !(c.density() instanceof NegativeBinomial d)
                        || d.size() == Math.rint(d.size()) && d.size() < 1e6 * d.mean())
                .filter(c -> c.density().variance() > 0 && c.density().upperQuantile(1e-300) <= Integer.MAX_VALUE);
    }

    private static DiscreteDistribution library(Density density) {
        return switch (density) {
            case Bernoulli d -> BinomialDistribution.of(1, d.probability());
            case Binomial d -> BinomialDistribution.of((int) d.trials(), d.probability());
            case Poisson d -> PoissonDistribution.of(d.mean());
            case Geometric d -> GeometricDistribution.of(d.probability());
            case NegativeBinomial d -> PascalDistribution.of((int) d.size(), d.size() / (d.size() + d.mean()));
            case Hypergeometric d ->
                HypergeometricDistribution.of((int) d.population(), (int) d.marked(), (int) d.drawn());
            case DiscreteUniform d -> UniformDiscreteDistribution.of((int) d.from(), (int) d.to());
            default -> throw new AssertionError("no library distribution named for " + density);
        };
    }

    /// Of N midpoints of equal strata, a value gets as many as its probability says, give or take one.
    @ParameterizedTest(name = "{0}")
    @MethodSource("discrete")
    void stratifiedDrawsAreCounted(Case c) {
        var d = c.density();
        int n = 1 << 18;
        var x = IntStream.range(0, n).mapToDouble(i -> (i + 0.5) / n).toArray();
        Inversion.of(d).fill(x, x, n);
        int from = 0;
        for (int i = 1; i <= n; i++) {
            if (i == n || x[i] != x[from]) {
                double value = x[from];
                assertEquals(n * d.pdf(value), i - from, 1 + 1e-6, () -> "times " + value);
                from = i;
            }
        }
    }

    /// Just below and just above the probability where a value begins, in both tails; elsewhere what the quantile says.
    @ParameterizedTest(name = "{0}")
    @MethodSource("discrete")
    void drawsAreTheQuantiles(Case c) {
        var d = c.density();
        var u = new ArrayList<Double>();
        for (double x : values(d, 0x1p-53, 500)) {
            u.add(d.cdf(x) * (1 - 1e-12));
            u.add(d.cdf(x) * (1 + 1e-12));
            u.add(1 - d.survival(x) * (1 - 1e-12));
            u.add(1 - d.survival(x) * (1 + 1e-12));
        }
        var random = new SplittableRandom(SEED);
        for (int i = 0; i < 1000; i++) {
            double p = StrictMath.scalb(1 + random.nextDouble(), -1 - random.nextInt(52));
            u.add(random.nextBoolean() ? p : 1 - p);
        }
        var p = u.stream()
                .mapToDouble(v -> v)
                .filter(v -> v >= 0x1p-53 && v <= 1 - 0x1p-53)
                .toArray();
        var x = new double[p.length];
        Inversion.of(d).fill(p, x, p.length);
        for (int i = 0; i < p.length; i++) {
            double before = Math.nextDown(x[i]);
            boolean isLower = p[i] <= 0.5;
            double mass = isLower ? p[i] : 1 - p[i];
            double slack = 5e-13 * mass;
            double least = isLower ? d.cdf(before) : d.survival(x[i]);
            double most = isLower ? d.cdf(x[i]) : d.survival(before);
            int k = i;
            assertTrue(
                    mass >= least - slack && mass <= most + slack,
                    () -> "seed " + SEED + ": u " + p[k] + " gives " + x[k] + ": " + least + " to " + most);
        }
    }

    /// Coins and dice whose cdf is a double, by exact arithmetic: the quantile of that double is the value itself.
    @ParameterizedTest
    @CsvSource({"1, .5", "5, .5", "17, .5", "53, .5", "26, .25", "26, .75", "13, .0625", "17, .875", "53, .3", "40, .01"
    })
    void quantileOfAnExactCdf(int trials, double probability) {
        var d = new Binomial(trials, probability);
        var p = new BigDecimal(probability);
        var cdf = BigDecimal.ZERO;
        for (int k = 0; k < trials; k++) {
            var choose = binomial(trials, k);
            cdf = cdf.add(choose.multiply(p.pow(k))
                    .multiply(BigDecimal.ONE.subtract(p).pow(trials - k)));
            double nearest = cdf.doubleValue();
            double below = new BigDecimal(nearest).compareTo(cdf) > 0 ? Math.nextDown(nearest) : nearest;
            double rest = BigDecimal.ONE.subtract(cdf).doubleValue();
            int value = k;
            if (below <= 0.5) {
                assertEquals(k, d.quantile(below), () -> "quantile of P(X <= " + value + ")");
                assertEquals(k + 1, d.quantile(nearest * (1 + 1e-12)), () -> "just above P(X <= " + value + ")");
            } else if (new BigDecimal(nearest).compareTo(cdf) == 0) {
                assertEquals(k, d.quantile(nearest), () -> "quantile of P(X <= " + value + ")");
            }
            if (rest <= 0.5) {
                assertEquals(k, d.upperQuantile(rest), () -> "upper quantile of P(X > " + value + ")");
                assertEquals(k + 1, d.upperQuantile(rest * (1 - 1e-12)), () -> "just below P(X > " + value + ")");
            }
        }
    }

    private static BigDecimal binomial(int n, int k) {
        var result = BigDecimal.ONE;
        for (int i = 1; i <= k; i++) {
            result = result.multiply(BigDecimal.valueOf(n - k + i)).divide(BigDecimal.valueOf(i));
        }
        return result;
    }
}
