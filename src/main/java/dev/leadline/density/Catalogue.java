package dev.leadline.density;

import dev.leadline.problem.Nearest;
import dev.leadline.problem.Place;
import dev.leadline.problem.Problem;
import dev.leadline.problem.Refusal;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;

/// Every family that there is.
public final class Catalogue {
    private static final List<Family> FAMILIES = List.of(
            Uniform.FAMILY,
            Normal.FAMILY,
            Lognormal.FAMILY,
            Triangular.FAMILY,
            Exponential.FAMILY,
            Gamma.FAMILY,
            Beta.FAMILY,
            Weibull.FAMILY,
            Gumbel.FAMILY,
            GumbelMin.FAMILY,
            Frechet.FAMILY,
            GeneralizedExtremeValue.FAMILY,
            Pareto.FAMILY,
            GeneralizedPareto.FAMILY,
            InverseGamma.FAMILY,
            InverseGaussian.FAMILY,
            Rice.FAMILY,
            VonMises.FAMILY,
            JohnsonSu.FAMILY,
            Student.FAMILY,
            Trapezoidal.FAMILY,
            CurvilinearTrapezoid.FAMILY,
            Arcsine.FAMILY,
            Pert.FAMILY,
            HalfNormal.FAMILY,
            Rayleigh.FAMILY,
            ChiSquare.FAMILY,
            Fisher.FAMILY,
            Laplace.FAMILY,
            Logistic.FAMILY,
            LogLogistic.FAMILY,
            Cauchy.FAMILY,
            Bernoulli.FAMILY,
            Binomial.FAMILY,
            Poisson.FAMILY,
            Geometric.FAMILY,
            NegativeBinomial.FAMILY,
            Hypergeometric.FAMILY,
            DiscreteUniform.FAMILY);

    /// Families by other names that are in use.
    private static final Map<String, String> ALSO_CALLED = Map.ofEntries(
            Map.entry("gaussian", "normal"),
            Map.entry("gauss", "normal"),
            Map.entry("rectangular", "uniform"),
            Map.entry("triangle", "triangular"),
            Map.entry("log-normal", "lognormal"),
            Map.entry("galton", "lognormal"),
            Map.entry("t", "student"),
            Map.entry("student-t", "student"),
            Map.entry("extreme-value", "gumbel"),
            Map.entry("gev1", "gumbel"));

    private Catalogue() {}

    public static List<Family> families() {
        return FAMILIES;
    }

    public static Optional<Family> family(String name) {
        return families().stream().filter(f -> f.name().equals(name)).findFirst();
    }

    /// @throws Refusal where there is none of this name, at the path `family`
    public static Family named(String name) {
        return family(name).orElseThrow(() -> new Refusal(noFamily(name).at(Place.of("family"))));
    }

    private static Problem noFamily(String name) {
        List<String> names = families().stream().map(Family::name).toList();
        Problem problem = Problem.of(
                        name.isEmpty() ? "no family is chosen" : "the family \"%s\" is not available".formatted(name))
                .because("Families are %s.".formatted(String.join(", ", names)));
        return Optional.ofNullable(ALSO_CALLED.get(name.toLowerCase(Locale.ROOT)))
                .or(() -> Nearest.to(name, names))
                .map(near -> problem.tryThis("Was \"%s\" meant?".formatted(near)))
                .orElse(
                        name.isEmpty()
                                ? problem
                                : problem.tryThis("Choose one of these; leadline families says what for."));
    }
}
