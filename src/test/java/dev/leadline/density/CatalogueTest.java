package dev.leadline.density;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.leadline.problem.Refusal;
import java.util.Arrays;
import java.util.LinkedHashMap;
import java.util.Map;
import java.util.Optional;
import java.util.SplittableRandom;
import java.util.stream.DoubleStream;
import java.util.stream.IntStream;
import java.util.stream.Stream;
import org.apache.commons.math3.analysis.UnivariateFunction;
import org.apache.commons.math3.analysis.integration.gauss.GaussIntegratorFactory;
import org.apache.commons.statistics.distribution.BetaDistribution;
import org.apache.commons.statistics.distribution.CauchyDistribution;
import org.apache.commons.statistics.distribution.ChiSquaredDistribution;
import org.apache.commons.statistics.distribution.ContinuousDistribution;
import org.apache.commons.statistics.distribution.ExponentialDistribution;
import org.apache.commons.statistics.distribution.FDistribution;
import org.apache.commons.statistics.distribution.FoldedNormalDistribution;
import org.apache.commons.statistics.distribution.GammaDistribution;
import org.apache.commons.statistics.distribution.GumbelDistribution;
import org.apache.commons.statistics.distribution.LaplaceDistribution;
import org.apache.commons.statistics.distribution.LogNormalDistribution;
import org.apache.commons.statistics.distribution.LogisticDistribution;
import org.apache.commons.statistics.distribution.NakagamiDistribution;
import org.apache.commons.statistics.distribution.NormalDistribution;
import org.apache.commons.statistics.distribution.ParetoDistribution;
import org.apache.commons.statistics.distribution.TDistribution;
import org.apache.commons.statistics.distribution.TrapezoidalDistribution;
import org.apache.commons.statistics.distribution.TriangularDistribution;
import org.apache.commons.statistics.distribution.UniformContinuousDistribution;
import org.apache.commons.statistics.distribution.WeibullDistribution;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/// What every density promises, held against every family: hand-picked members and random ones, whose seed is part of
/// their name. What only discrete ones promise is in `DiscreteCatalogueTest`.
class CatalogueTest {
    private static final int SEED = 20261201;
    private static final int RANDOM_MEMBERS = 6;
    private static final int RANDOM_COMPOSITES = 20;
    private static final double[] MASSES = {0x1p-53, 1e-10, 0.001, 0.1, 0.3, 0.5, 0.7, 0.9, 0.999};
    private static final double[] FAR_MASSES = {1e-300, 1e-200, 1e-100, 1e-30};

    record Case(String name, Density density) {
        double down(double x) {
            return Math.min(Math.nextDown(Math.nextDown(x)), x - 2 * locationStep());
        }

        double up(double x) {
            return Math.max(Math.nextUp(Math.nextUp(x)), x + 2 * locationStep());
        }

        private double locationStep() {
            double location = density.standardised().location();
            return location == 0 ? 0 : Math.ulp(location);
        }

        @Override
        public String toString() {
            return name;
        }
    }

    static Stream<Case> continuous() {
        return densities().filter(c -> !c.density.isDiscrete());
    }

    static Stream<Case> discrete() {
        return densities().filter(c -> c.density.isDiscrete());
    }

    static Stream<Case> densities() {
        return Stream.concat(
                Stream.concat(Examples.all(), TypedTest.densities())
                        .map(density -> new Case(density.toString(), density)),
                Catalogue.families().stream()
                        .flatMap(family -> IntStream.range(0, RANDOM_MEMBERS).mapToObj(i -> random(family, SEED + i))));
    }

    /// Those of which the tests below ask nothing that a fixed quadrature must integrate over kinks and gaps.
    static Stream<Case> withComposites() {
        return Stream.concat(
                densities(),
                Stream.concat(
                        Composites.all().map(density -> new Case(density.toString(), density)),
                        IntStream.range(0, RANDOM_COMPOSITES).map(i -> SEED + i).mapToObj(seed -> {
                            var density = Composites.random(seed);
                            return new Case(density + ", seed " + seed, density);
                        })));
    }

    /// Parameters of any sign and several orders of magnitude, drawn again until the family takes them.
    private static Case random(Family family, int seed) {
        var random = new SplittableRandom(seed);
        for (int trial = 0; trial < 10_000; trial++) {
            var entry = family.entries().get(random.nextInt(family.entries().size()));
            var parameters = new LinkedHashMap<String, Double>();
            for (var parameter : entry) {
                double size = StrictMath.exp(random.nextDouble(-3, 4));
                double value = random.nextBoolean() ? size : -size;
                boolean isWhole = parameter.rule().startsWith("a whole number");
                parameters.put(parameter.name(), isWhole ? Math.rint(value) : value);
            }
            try {
                var density = family.of(parameters);
                return new Case(density + ", seed " + seed, density);
            } catch (Refusal _) {
                continue;
            }
        }
        throw new AssertionError(family.name() + ": no member found, seed " + seed);
    }

    @ParameterizedTest(name = "{0}")
    @MethodSource("withComposites")
    void nanStaysNan(Case c) {
        var d = c.density;
        for (double value : new double[] {
            d.pdf(Double.NaN),
            d.logPdf(Double.NaN),
            d.cdf(Double.NaN),
            d.survival(Double.NaN),
            d.quantile(Double.NaN),
            d.upperQuantile(Double.NaN),
            d.quantile(-0.1),
            d.quantile(1.1),
            d.upperQuantile(-1e-300),
            d.upperQuantile(Math.nextUp(1.0))
        }) {
            assertTrue(Double.isNaN(value));
        }
    }

    @ParameterizedTest(name = "{0}")
    @MethodSource("continuous")
    void endsOfTheSupport(Case c) {
        var d = c.density;
        var support = d.support();
        assertTrue(support.low() < support.high());
        assertEquals(support.low(), d.quantile(0));
        assertEquals(support.high(), d.quantile(1));
        assertEquals(support.high(), d.upperQuantile(0));
        assertEquals(support.low(), d.upperQuantile(1));
        for (double x : new double[] {support.low(), Math.nextDown(support.low()), Double.NEGATIVE_INFINITY}) {
            assertEquals(0, d.cdf(x), 0.0);
            assertEquals(1, d.survival(x), 0.0);
        }
        for (double x : new double[] {support.high(), Math.nextUp(support.high()), Double.POSITIVE_INFINITY}) {
            assertEquals(1, d.cdf(x), 0.0);
            assertEquals(0, d.survival(x), 0.0);
        }
        double width = Double.isFinite(support.high() - support.low()) ? support.high() - support.low() : 1;
        for (double x : new double[] {
            support.low() - width, support.high() + width, Double.NEGATIVE_INFINITY, Double.POSITIVE_INFINITY
        }) {
            assertEquals(0, d.pdf(x), 0.0, () -> "pdf at " + x);
            assertEquals(Double.NEGATIVE_INFINITY, d.logPdf(x), () -> "log pdf at " + x);
        }
    }

    /// To 1e-12 of the mass, or to the doubles two steps away; steps of the location where that is larger, since a
    /// value is rounded when it is added.
    @ParameterizedTest(name = "{0}")
    @MethodSource("continuous")
    void thereAndBack(Case c) {
        for (double p : both(MASSES, FAR_MASSES)) {
            double x = c.density.quantile(p);
            if (Double.isFinite(x) && !isTooSmall(x)) {
                holds(p, c.density.cdf(c.down(x)), c.density.cdf(c.up(x)), c + ": quantile of " + p + " is " + x);
            }
            double y = c.density.upperQuantile(p);
            if (Double.isFinite(y) && !isTooSmall(y)) {
                holds(
                        p,
                        c.density.survival(c.up(y)),
                        c.density.survival(c.down(y)),
                        c + ": upper quantile of " + p + " is " + y);
            }
        }
    }

    /// Subnormal: shifting and scaling loses its digits.
    private static boolean isTooSmall(double x) {
        return Math.abs(x) < 1e-300;
    }

    private static void holds(double p, double least, double most, String what) {
        assertTrue(p >= least * (1 - 1e-12) && p <= most * (1 + 1e-12), () -> what + ": " + least + " to " + most);
    }

    private static double[] both(double[] a, double[] b) {
        return Stream.of(a, b).flatMapToDouble(Arrays::stream).toArray();
    }

    /// Next to 0 and far out, where quotients overflow: a search for quantiles passes there. No density is much larger
    /// than one over the distance from its pole.
    @ParameterizedTest(name = "{0}")
    @MethodSource("continuous")
    void numbersNextToZeroAndFarOut(Case c) {
        var d = c.density;
        for (double size : new double[] {3e-308, 1e-300, 1e-200, 1e200, 1e300}) {
            for (double x : new double[] {size, -size}) {
                assertEquals(1, d.cdf(x) + d.survival(x), 1e-13, () -> "masses at " + x);
                assertTrue(d.pdf(x) >= 0, () -> "density at " + x);
                assertTrue(d.logPdf(x) < 750, () -> "logarithm of the density at " + x);
            }
        }
    }

    @ParameterizedTest(name = "{0}")
    @MethodSource("withComposites")
    void quantilesRise(Case c) {
        double last = c.density.support().low();
        for (int i = 1; i < 4096; i++) {
            double x = c.density.quantile(i / 4096.0);
            assertTrue(x >= last, "at " + i + " of 4096");
            assertEquals(1, c.density.cdf(x) + c.density.survival(x), 1e-13, () -> "at " + x);
            last = x;
        }
    }

    @ParameterizedTest(name = "{0}")
    @MethodSource("withComposites")
    void logOfTheDensity(Case c) {
        var x = Arrays.stream(both(MASSES, FAR_MASSES))
                .flatMap(p -> Arrays.stream(new double[] {c.density.quantile(p), c.density.upperQuantile(p)}))
                .filter(Double::isFinite)
                .toArray();
        var logs = new double[x.length];
        c.density.logPdf(x, logs, x.length);
        for (int i = 0; i < x.length; i++) {
            double log = c.density.logPdf(x[i]);
            assertEquals(Double.doubleToRawLongBits(log), Double.doubleToRawLongBits(logs[i]), "block, at " + x[i]);
            double pdf = c.density.pdf(x[i]);
            if (pdf > 1e-300 && pdf < 1e300) {
                assertEquals(StrictMath.log(pdf), log, 1e-13 * Math.max(1, Math.abs(log)), "at " + x[i]);
            }
        }
        c.density.logPdf(x, x, x.length);
        assertTrue(Arrays.equals(logs, x));
    }

    /// Gauss-Legendre quadrature of the density between quantiles, after a substitution that spreads the decades:
    /// logistic where both ends are near, exponential with one, hyperbolic sine with none.
    @ParameterizedTest(name = "{0}")
    @MethodSource("continuous")
    void densityIsTheSlopeOfTheDistribution(Case c) {
        var d = c.density;
        double low = d.support().low();
        double high = d.support().high();
        var standardised = d.standardised();
        double[] p = {0.02, 0.05, 0.1, 0.2, 0.35, 0.5, 0.65, 0.8, 0.9, 0.95, 0.98};
        for (int i = 1; i < p.length; i++) {
            double a = d.quantile(p[i - 1]);
            double b = d.quantile(p[i]);
            if (b - a < 1e-6 * Math.max(Math.abs(a), Math.abs(b))
                    || kinks(d).anyMatch(kink -> a < kink && b > kink)
                    || !(a - low > 1e-250)
                    || a - low < 1e-9 * Math.min(high - low, Math.abs(low))
                    || high - b < 1e-9 * Math.min(high - low, Math.abs(high))) {
                continue;
            }
            boolean lowIsNear = a - low < 1e4 * (b - a);
            boolean highIsNear = high - b < 1e4 * (b - a);
            UnivariateFunction f;
            double from;
            double to;
            if (lowIsNear && highIsNear) {
                f = w -> {
                    double z = 1 / (1 + StrictMath.exp(-w));
                    return d.pdf(low + (high - low) * z) * (high - low) * z * (1 - z);
                };
                from = StrictMath.log((a - low) / (high - a));
                to = StrictMath.log((b - low) / (high - b));
            } else if (lowIsNear) {
                f = w -> d.pdf(low + StrictMath.exp(w)) * StrictMath.exp(w);
                from = StrictMath.log(a - low);
                to = StrictMath.log(b - low);
            } else if (highIsNear) {
                f = w -> d.pdf(high - StrictMath.exp(-w)) * StrictMath.exp(-w);
                from = -StrictMath.log(high - a);
                to = -StrictMath.log(high - b);
            } else {
                double location = standardised.location();
                double scale = standardised.scale();
                f = w -> d.pdf(location + scale * StrictMath.sinh(w)) * scale * StrictMath.cosh(w);
                from = areaSinh((a - location) / scale);
                to = areaSinh((b - location) / scale);
            }
            double sum = 0;
            int parts = 16;
            for (int k = 0; k < parts; k++) {
                sum += new GaussIntegratorFactory()
                        .legendre(20, from + (to - from) * k / parts, from + (to - from) * (k + 1) / parts)
                        .integrate(f);
            }
            double mass = d.cdf(b) - d.cdf(a);
            assertEquals(mass, sum, 1e-9 * mass, "between " + a + " and " + b);
        }
    }

    /// Where the density bends or jumps between its ends.
    private static DoubleStream kinks(Density density) {
        return switch (density) {
            case Triangular d -> DoubleStream.of(d.mode());
            case Laplace d -> DoubleStream.of(d.location());
            case Trapezoidal d -> DoubleStream.of(d.flatFrom(), d.flatTo());
            case CurvilinearTrapezoid d -> DoubleStream.of(d.from() + d.inexact(), d.to() - d.inexact());
            case Integrated _ -> DoubleStream.of(0.3, 0.30001, 1, 2, 3, 5, 6);
            default -> DoubleStream.empty();
        };
    }

    private static double areaSinh(double y) {
        return Math.copySign(StrictMath.log(Math.abs(y) + Math.sqrt(Math.fma(y, y, 1))), y);
    }

    /// Mean and variance from the quantiles of both tails: with `p = exp(-s) / 2`, the integral of `quantile(p) p` over
    /// s, to `p = 1e-300`. Typed densities have gaps and several humps, which this rule does not see; theirs
    /// are held against a table (`TypedTest`).
    @ParameterizedTest(name = "{0}")
    @MethodSource("continuous")
    void momentsFromTheQuantiles(Case c) {
        var d = c.density;
        double mean = d.mean();
        double variance = d.variance();
        if (!Double.isFinite(variance)
                || d instanceof Integrated
                || d.tailOrders().least() < 2.5
                || variance < 1e-290
                || d.upperQuantile(1e-299) > 1e150) {
            return;
        }
        double sd = Math.sqrt(variance);
        double[] moments = moments(d, mean, sd);
        double rounding = 1e-15 * Math.abs(mean) / sd;
        assertEquals(0, moments[1], 1e-6 + 4 * rounding, "mean");
        assertEquals(1, moments[2], 1e-6 + 8 * rounding, "variance");
    }

    /// The means of the powers of `(x - mean) / sd` up to the fourth.
    private static double[] moments(Density d, double mean, double sd) {
        var rule = new GaussIntegratorFactory().legendre(8, 0, 1);
        double[] moments = new double[5];
        for (double from = 0; from < 680; from += from < 8 ? 0.0625 : 2) {
            double step = from < 8 ? 0.0625 : 2;
            for (int j = 0; j < rule.getNumberOfPoints(); j++) {
                double p = 0.5 * StrictMath.exp(-(from + step * rule.getPoint(j)));
                for (double x : new double[] {d.quantile(p), d.upperQuantile(p)}) {
                    double power = step * rule.getWeight(j) * p;
                    for (int k = 0; k < moments.length; k++) {
                        moments[k] += power;
                        power *= (x - mean) / sd;
                    }
                }
            }
        }
        return moments;
    }

    /// Skewness and excess kurtosis against their definition, by quadrature over the quantiles; to what the
    /// tails beyond and the rounding of the mean leave.
    @ParameterizedTest(name = "{0}")
    @MethodSource("continuous")
    void higherMomentsFromTheQuantiles(Case c) {
        var d = c.density;
        double sd = Math.sqrt(d.variance());
        if (d instanceof Integrated
                || d.tailOrders().least() < 5
                || !Double.isFinite(sd)
                || d.upperQuantile(1e-299) > 1e75
                || sd < 1e-75) {
            return;
        }
        double rounding = 1e-15 * (1 + Math.abs(d.mean()) / sd);
        double skewness = d.skewness();
        double kurtosis = d.excessKurtosis();
        double[] moments = moments(d, d.mean(), sd);
        assertEquals(moments[3], skewness, 1e-6 * (1 + Math.abs(skewness)) + 10 * rounding, "skewness");
        assertEquals(moments[4] - 3, kurtosis, 1e-6 * (3 + kurtosis) + 40 * rounding, "kurtosis");
    }

    /// A second oracle, itself good to about 1e-13 here, and not asked where it is not.
    @ParameterizedTest(name = "{0}")
    @MethodSource("continuous")
    void agreesWithALibrary(Case c) {
        var d = c.density;
        var named = library(d);
        if (named.isEmpty()) {
            return;
        }
        var library = named.get();
        for (double p : new double[] {1e-8, 0.001, 0.1, 0.3, 0.5, 0.7, 0.9, 0.999}) {
            double x = d.quantile(p);
            if (x <= 1e-300 && x >= 0 || x >= Math.nextDown(d.support().high())) {
                continue;
            }
            double slack = 1e-9 + 1e-15 * Math.abs(x) * d.pdf(x) / Math.min(p, 1 - p);
            assertEquals(library.cumulativeProbability(x), d.cdf(x), slack * p + 1e-15, () -> "cdf at " + x);
            assertEquals(
                    library.survivalProbability(x), d.survival(x), slack * (1 - p) + 1e-15, () -> "survival at " + x);
        }
    }

    /// The distribution of the library; shifted and scaled to ours by hand where it has no such parameters. Empty for
    /// families that the library lacks.
    private static Optional<ContinuousDistribution> library(Density density) {
        return Optional.ofNullable(
                switch (density) {
                    case Uniform d -> UniformContinuousDistribution.of(d.from(), d.to());
                    case Normal d -> NormalDistribution.of(d.mean(), d.sd());
                    case Lognormal d -> LogNormalDistribution.of(d.mu(), d.sigma());
                    case Triangular d -> TriangularDistribution.of(d.from(), d.mode(), d.to());
                    case Exponential d -> new Shifted(ExponentialDistribution.of(d.mean() - d.from()), d.from(), 1);
                    case Gamma d -> GammaDistribution.of(d.shape(), d.scale());
                    case Beta d -> new Shifted(BetaDistribution.of(d.alpha(), d.beta()), d.from(), d.to() - d.from());
                    case Weibull d -> new Shifted(WeibullDistribution.of(d.shape(), d.scale()), d.from(), 1);
                    case Gumbel d -> GumbelDistribution.of(d.location(), d.scale());
                    case Pareto d -> ParetoDistribution.of(d.from(), d.shape());
                    case Student d -> new Shifted(TDistribution.of(d.dof()), d.location(), d.scale());
                    case Trapezoidal d -> TrapezoidalDistribution.of(d.from(), d.flatFrom(), d.flatTo(), d.to());
                    case Arcsine d -> new Shifted(BetaDistribution.of(0.5, 0.5), d.from(), d.to() - d.from());
                    case Pert d ->
                        new Shifted(
                                BetaDistribution.of(
                                        1 + d.emphasis() * (d.mode() - d.from()) / (d.to() - d.from()),
                                        1 + d.emphasis() * (d.to() - d.mode()) / (d.to() - d.from())),
                                d.from(),
                                d.to() - d.from());
                    case HalfNormal d -> FoldedNormalDistribution.of(0, d.sigma());
                    case Rayleigh d -> NakagamiDistribution.of(1, 2 * d.sigma() * d.sigma());
                    case ChiSquare d -> ChiSquaredDistribution.of(d.dof());
                    case Fisher d -> FDistribution.of(d.dof1(), d.dof2());
                    case Laplace d -> LaplaceDistribution.of(d.location(), d.scale());
                    case Logistic d -> LogisticDistribution.of(d.location(), d.scale());
                    case Cauchy d -> CauchyDistribution.of(d.location(), d.scale());
                    default -> null;
                });
    }

    private record Shifted(ContinuousDistribution of, double location, double scale) implements ContinuousDistribution {
        @Override
        public double density(double x) {
            return of.density((x - location) / scale) / scale;
        }

        @Override
        public double cumulativeProbability(double x) {
            return of.cumulativeProbability((x - location) / scale);
        }

        @Override
        public double survivalProbability(double x) {
            return of.survivalProbability((x - location) / scale);
        }

        @Override
        public double inverseCumulativeProbability(double p) {
            return location + scale * of.inverseCumulativeProbability(p);
        }

        @Override
        public double getMean() {
            return location + scale * of.getMean();
        }

        @Override
        public double getVariance() {
            return scale * scale * of.getVariance();
        }

        @Override
        public double getSupportLowerBound() {
            return location + scale * of.getSupportLowerBound();
        }

        @Override
        public double getSupportUpperBound() {
            return location + scale * of.getSupportUpperBound();
        }

        @Override
        public Sampler createSampler(org.apache.commons.rng.UniformRandomProvider random) {
            throw new UnsupportedOperationException();
        }
    }

    @Test
    void momentsThatDoNotExist() {
        assertTrue(Double.isNaN(new Student(1, 0, 1).mean()));
        assertTrue(Double.isNaN(new Student(1, 0, 1).variance()));
        assertEquals(0, new Student(2, 0, 1).mean());
        assertEquals(Double.POSITIVE_INFINITY, new Student(2, 0, 1).variance());
    }

    @Test
    void logarithmWhereTheDensityUnderflows() {
        assertEquals(-5_000.918938533205, new Normal(0, 1).logPdf(100), 1e-9);
        assertEquals(-10_000, new Exponential(1).logPdf(10_000));
        assertEquals(0, new Normal(0, 1).pdf(100));
    }

    @Test
    void namesAreUniqueAndFindTheirFamily() {
        var names = Catalogue.families().stream().map(Family::name).toList();
        assertEquals(names.size(), names.stream().distinct().count());
        for (var family : Catalogue.families()) {
            assertEquals(family, Catalogue.family(family.name()).orElseThrow());
            assertFalse(family.use().isEmpty());
        }
        assertTrue(Catalogue.family("gaussian").isEmpty());
    }

    @Test
    void optionalParametersHaveTheirDefaults() {
        assertEquals(new Weibull(2, 3, 0), member("weibull", Map.of("shape", 2.0, "scale", 3.0)));
        assertEquals(Beta.of(2, 3), member("beta", Map.of("alpha", 2.0, "beta", 3.0)));
        assertEquals(new Student(4, 0, 1), member("student", Map.of("dof", 4.0)));
    }

    private static Density member(String family, Map<String, Double> parameters) {
        return Catalogue.family(family).orElseThrow().of(parameters);
    }
}
