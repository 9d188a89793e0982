package dev.leadline.density;

import static java.util.Map.entry;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.leadline.ReferenceValues;
import java.util.List;
import java.util.Map;
import java.util.Set;
import java.util.TreeSet;
import java.util.function.Function;
import java.util.stream.Stream;
import java.util.stream.StreamSupport;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;
import tools.jackson.databind.JsonNode;

/// Every figure of every distribution of `reference-values.json`, at the tolerance of its record.
///
/// The records without cases, `dist-normal-standard` and `dist-edge-cases`, are in `DensityTablesTest`.
class ReferenceDistributionsTest {
    /// What the set calls a distribution, and ours, from its parameters.
    private static final Map<String, Function<JsonNode, Density>> OURS = Map.ofEntries(
            entry("normal", p -> new Normal(value(p, "mean"), value(p, "sd"))),
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

    /// What there is no family of.
    private static final Set<String> MISSING = Set.of("truncated normal");

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
        return parameters.required(name).asDouble();
    }

    private static Stream<Case> cases() {
        return ReferenceValues.ids(Set.of("distribution")).stream()
                .filter(id -> ReferenceValues.record(id).has("cases"))
                .flatMap(id -> StreamSupport.stream(
                                ReferenceValues.record(id).required("cases").spliterator(), false)
                        .map(json -> new Case(id, json.required("label").asString(), json)));
    }

    static Stream<Case> ours() {
        return cases().filter(c -> OURS.containsKey(c.name()));
    }

    @Test
    void knowsWhatItLeavesOut() {
        var missing = new TreeSet<String>();
        cases().map(Case::name).filter(name -> !OURS.containsKey(name)).forEach(missing::add);
        assertEquals(new TreeSet<>(MISSING), missing);
    }

    @ParameterizedTest(name = "{0}")
    @MethodSource("ours")
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
                    // the set has 1e-51 where the value is 0
                    assertEquals(number, got, relative * Math.abs(number) + 1e-50, what);
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
}
