package dev.leadline.density;

import static java.util.Map.entry;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;
import static org.junit.jupiter.params.provider.Arguments.arguments;

import dev.leadline.ReferenceValues;
import dev.leadline.problem.Refusal;
import java.util.List;
import java.util.Map;
import java.util.Set;
import java.util.function.Function;
import java.util.stream.Collectors;
import java.util.stream.Stream;
import java.util.stream.StreamSupport;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.function.Executable;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.Arguments;
import org.junit.jupiter.params.provider.MethodSource;
import tools.jackson.databind.JsonNode;

/// Every figure of every distribution of `reference-values.json`, at the tolerance of its record.
///
/// The records without cases, `dist-normal-standard` and `dist-edge-cases`, have tests of their own.
class ReferenceDistributionsTest {
    private static final String NORMAL = "dist-normal-standard";
    private static final String EDGES = "dist-edge-cases";

    /// What the set calls a distribution, and ours, from its parameters.
    private static final Map<String, Function<JsonNode, Density>> OURS = Map.ofEntries(
            entry("normal", p -> new Normal(value(p, "mean"), value(p, "sd"))),
            entry(
                    "truncated normal",
                    p -> Truncated.of(
                            new Normal(value(p, "mean"), value(p, "sd")), value(p, "lower"), value(p, "upper"))),
            entry("lognormal", p -> new Lognormal(value(p, "mu"), value(p, "sigma"))),
            entry("uniform", p -> new Uniform(value(p, "a"), value(p, "b"))),
            entry("triangular", p -> new Triangular(value(p, "a"), value(p, "mode"), value(p, "b"))),
            entry("trapezoidal", p -> new Trapezoidal(value(p, "a"), value(p, "b"), value(p, "c"), value(p, "d"))),
            entry(
                    "curvilinear trapezoid CTrap",
                    p -> new CurvilinearTrapezoid(value(p, "a"), value(p, "b"), value(p, "d"))),
            entry("beta", p -> Beta.of(value(p, "alpha"), value(p, "beta"))),
            entry("PERT", p -> new Pert(value(p, "min"), value(p, "mode"), value(p, "max"), value(p, "lambda"))),
            entry("arcsine/U-shaped", p -> new Arcsine(value(p, "a"), value(p, "b"))),
            entry("exponential", p -> new Exponential(1 / value(p, "rate"))),
            entry("gamma", p -> new Gamma(value(p, "shape"), value(p, "scale"))),
            entry("chi-square", p -> new ChiSquare(value(p, "df"))),
            entry("F", p -> new Fisher(value(p, "d1"), value(p, "d2"))),
            entry("student-t", p -> new Student(value(p, "df"), value(p, "location"), value(p, "scale"))),
            entry("weibull", p -> new Weibull(value(p, "shape"), value(p, "scale"), 0)),
            entry("rayleigh", p -> new Rayleigh(value(p, "sigma"))),
            entry("gumbel-max", p -> new Gumbel(value(p, "location"), value(p, "scale"))),
            entry("GEV", p -> new GeneralizedExtremeValue(value(p, "location"), value(p, "scale"), value(p, "xi"))),
            entry(
                    "generalised Pareto",
                    p -> new GeneralizedPareto(value(p, "location"), value(p, "scale"), value(p, "xi"))),
            entry("pareto", p -> new Pareto(value(p, "minimum"), value(p, "alpha"))),
            entry("inverse-gaussian", p -> new InverseGaussian(value(p, "mean"), value(p, "lambda"))),
            entry("inverse-gamma", p -> new InverseGamma(value(p, "shape"), value(p, "scale"))),
            entry("log-logistic", p -> new LogLogistic(value(p, "shape"), value(p, "scale"))),
            entry("logistic", p -> new Logistic(value(p, "location"), value(p, "scale"))),
            entry("laplace", p -> new Laplace(value(p, "location"), value(p, "scale"))),
            entry("cauchy", p -> new Cauchy(value(p, "location"), value(p, "scale"))),
            entry("binomial", p -> new Binomial(value(p, "n"), value(p, "p"))),
            entry("poisson", p -> new Poisson(value(p, "mean"))),
            entry("geometric", p -> new Geometric(value(p, "p"))));

    private record Case(String record, String label, JsonNode json) {
        /// What the set calls the distribution.
        String name() {
            String before = label.substring(0, label.indexOf('('));
            return label.contains(" truncated to ") ? "truncated " + before : before;
        }

        /// How much less our values are: the set counts the trial that succeeds, we those before it.
        double before() {
            return name().equals("geometric") ? 1 : 0;
        }

        @Override
        public String toString() {
            return label;
        }
    }

    private static double value(JsonNode parameters, String name) {
        return Double.parseDouble(parameters.required(name).asString());
    }

    static Stream<Case> cases() {
        return ReferenceValues.ids(Set.of("distribution")).stream()
                .filter(id -> ReferenceValues.record(id).has("cases"))
                .flatMap(id -> StreamSupport.stream(
                                ReferenceValues.record(id).required("cases").spliterator(), false)
                        .map(json -> new Case(id, json.required("label").asString(), json)));
    }

    @Test
    void hasEveryDistributionOfTheSet() {
        assertEquals(
                List.of(),
                cases().map(Case::name).filter(name -> !OURS.containsKey(name)).toList());
        assertEquals(
                Set.of(NORMAL, EDGES),
                ReferenceValues.ids(Set.of("distribution")).stream()
                        .filter(id -> !ReferenceValues.record(id).has("cases"))
                        .collect(Collectors.toSet()));
    }

    @ParameterizedTest(name = "{0}")
    @MethodSource("cases")
    void agrees(Case c) {
        var density = OURS.get(c.name()).apply(c.json.required("params"));
        double relative = ReferenceValues.relativeTolerance(c.record);
        int checked = 0;
        for (JsonNode expected : c.json.required("expected")) {
            String name = expected.required("name").asString();
            double got = figure(density, name, c.before());
            String what = c.label + ", " + name;
            switch (expected.required("text").asString()) {
                case "infinite" -> infinite(density, name, got, what);
                case "undefined" -> assertTrue(Double.isNaN(got), () -> what + " is " + got);
                default -> {
                    double number = expected.required("value").asDouble();
                    // the set has 1e-51 where the value is 0; the skewness of a truncated one is a quadrature
                    double rounding = density instanceof Truncated && name.equals("skewness") ? 1e-15 : 1e-50;
                    assertEquals(number, got, relative * Math.abs(number) + rounding, what);
                }
            }
            checked++;
        }
        assertTrue(checked >= 10, () -> c.label + ": only a few figures were found");
    }

    /// Skewness and kurtosis without a variance the set calls infinite here and undefined there; for us they are
    /// undefined, being ratios of infinite numbers.
    private static void infinite(Density density, String name, double got, String what) {
        boolean isRatio = List.of("skewness", "excess_kurtosis").contains(name);
        assertEquals(
                isRatio && !Double.isFinite(density.variance()) ? Double.NaN : Double.POSITIVE_INFINITY, got, what);
        assertFalse(Double.isFinite(got), what);
    }

    /// What a record calls `cdf(-5)` and the like.
    private static double figure(Density density, String name, double before) {
        int bracket = name.indexOf('(');
        double argument =
                bracket < 0 ? Double.NaN : Double.parseDouble(name.substring(bracket + 1, name.length() - 1)) - before;
        return switch (bracket < 0 ? name : name.substring(0, bracket)) {
            case "mean" -> density.mean() + before;
            case "variance" -> density.variance();
            case "skewness" -> density.skewness();
            case "excess_kurtosis" -> density.excessKurtosis();
            case "pdf", "pmf" -> density.pdf(argument);
            case "cdf" -> density.cdf(argument);
            case "sf" -> density.survival(argument);
            case "quantile" -> density.quantile(argument + before) + before;
            case "upper_quantile" -> density.upperQuantile(argument + before) + before;
            default -> throw new AssertionError(name);
        };
    }

    static Stream<Arguments> ofNormal() {
        return figures(NORMAL);
    }

    static Stream<Arguments> ofEdges() {
        return figures(EDGES);
    }

    private static Stream<Arguments> figures(String record) {
        return StreamSupport.stream(
                        ReferenceValues.record(record).required("expected").spliterator(), false)
                .map(node -> arguments(
                        node.required("name").asString(), node.required("value").asDouble()));
    }

    /// A subnormal result may be off by its own rounding, and what is 0 by that of `p`.
    @ParameterizedTest(name = "{0}")
    @MethodSource("ofNormal")
    void standardNormal(String name, double expected) {
        var normal = new Normal(0, 1);
        int bracket = name.indexOf('(');
        String argument = name.substring(bracket + 1, name.length() - 1);
        double relative = ReferenceValues.relativeTolerance(NORMAL);
        switch (name.substring(0, bracket)) {
            case "cdf" -> {
                double x = Double.parseDouble(argument);
                double slack = Math.max(relative * expected, 0x1p-1070);
                assertEquals(expected, normal.cdf(x), slack);
                assertEquals(expected, normal.survival(-x), slack);
            }
            case "quantile" -> {
                double p = probability(argument);
                double slack = relative * Math.abs(expected) + 1e-16;
                assertEquals(expected, normal.quantile(p), slack);
                assertEquals(-expected, normal.upperQuantile(p), slack);
            }
            case "log_cdf" -> {
                double x = Double.parseDouble(argument);
                assertEquals(expected, normal.logPdf(x) + logOfRatio(x), relative * Math.abs(expected));
                assertEquals(0, normal.cdf(x), "what no double holds");
            }
            default -> throw new AssertionError(name);
        }
    }

    private static double probability(String text) {
        return switch (text) {
            case "1-2^-53" -> 1 - 0x1p-53;
            case "2^-1074, smallest positive double" -> Double.MIN_VALUE;
            default -> Double.parseDouble(text);
        };
    }

    /// A density has no logarithm of its cdf, but one of its pdf. Their difference far below 0: Abramowitz and Stegun
    /// (1964), 26.2.12, from memory; the first term left out is less than 1e-15 for `x <= -40`.
    private static double logOfRatio(double x) {
        double t = 1 / (x * x);
        return Math.log1p(-t * (1 - t * (3 - t * (15 - t * (105 - t * 945))))) - Math.log(-x);
    }

    @ParameterizedTest(name = "{0}")
    @MethodSource("ofEdges")
    void edges(String name, double expected) {
        var lognormal = Lognormal.ofMeanAndSd(100, 50);
        double got = switch (name) {
            case "mu_for_mean100_sd50" -> lognormal.mu();
            case "sigma_for_mean100_sd50" -> lognormal.sigma();
            case "smallest_53bit_midpoint_quantile" -> new Normal(0, 1).quantile(0x1p-54);
            case "largest_abs_normal_from_53bit_midpoints" -> new Normal(0, 1).upperQuantile(0x1p-54);
            default -> throw new AssertionError(name);
        };
        within(ReferenceValues.relativeTolerance(EDGES), expected, got, name);
    }

    @Test
    void lognormalHasTheMeanAndSdItWasGiven() {
        var density = Lognormal.ofMeanAndSd(100, 50);
        within(1e-13, 100, density.mean(), "mean");
        within(1e-13, 2500, density.variance(), "variance");
    }

    /// Facts of `dist-edge-cases`: of densities without spread the continuous ones are refused, with the advice to use
    /// a constant, the discrete ones are not.
    @Test
    void densitiesWithoutSpread() {
        for (Executable made : List.<Executable>of(() -> new Normal(3, 0), () -> new Uniform(3, 3))) {
            assertEquals(
                    "For a fixed value use a constant.",
                    assertThrows(Refusal.class, made)
                            .problems()
                            .getFirst()
                            .hint()
                            .orElseThrow());
        }
        for (Density density : List.of(new Binomial(7, 0), new Binomial(0, 0.4), new Poisson(0))) {
            assertEquals(new Support(0, 0), density.support(), density::toString);
            assertEquals(0, density.variance(), density::toString);
        }
        assertEquals(new Support(7, 7), new Binomial(7, 1).support());
    }

    @ParameterizedTest
    @MethodSource("sameDensities")
    void oneDensityByTwoNames(Density one, Density other) {
        for (double p : new double[] {1e-10, 0.01, 0.3, 0.5, 0.9}) {
            double x = one.quantile(p);
            within(1e-13, x, other.quantile(p), one + ", quantile of " + p);
            within(1e-13, one.cdf(x), other.cdf(x), one + ", cdf at " + x);
            within(1e-13, one.survival(x), other.survival(x), one + ", survival at " + x);
        }
    }

    static Stream<Arguments> sameDensities() {
        return Stream.of(
                arguments(new Weibull(1, 3, 0), new Exponential(3)),
                arguments(new Gamma(1, 3), new Exponential(3)),
                arguments(Beta.of(1, 1), new Uniform(0, 1)),
                arguments(new Student(1, 0, 1), new Cauchy(0, 1)),
                arguments(new Gamma(3.5, 2), new ChiSquare(7)));
    }

    private static void within(double relative, double expected, double got, String what) {
        assertEquals(expected, got, relative * Math.abs(expected), what);
    }
}
