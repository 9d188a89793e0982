package dev.leadline.density;

import java.util.ArrayList;
import java.util.EnumMap;
import java.util.List;
import java.util.Map;

/// Families that serve alike, so that a catalogue can be read.
public enum FamilyGroup {
    BOUNDED(
            "between two limits",
            "uniform",
            "triangular",
            "pert",
            "trapezoidal",
            "curvilinear-trapezoid",
            "arcsine",
            "von-mises",
            "beta",
            "kumaraswamy"),
    MIDDLE(
            "on both sides of a middle",
            "normal",
            "student",
            "logistic",
            "laplace",
            "cauchy",
            "exponential-power",
            "johnson-su",
            "skew-normal"),
    POSITIVE(
            "positive",
            "lognormal",
            "exponential",
            "gamma",
            "weibull",
            "rayleigh",
            "rice",
            "maxwell",
            "half-normal",
            "chi-square",
            "f",
            "log-logistic",
            "inverse-gamma",
            "inverse-gaussian",
            "birnbaum-saunders"),
    EXTREME(
            "extremes and heavy tails",
            "gumbel",
            "gumbel-min",
            "frechet",
            "generalized-extreme-value",
            "generalized-pareto",
            "pareto",
            "burr"),
    COUNT(
            "counts and whole numbers",
            "bernoulli",
            "binomial",
            "poisson",
            "negative-binomial",
            "geometric",
            "hypergeometric",
            "discrete-uniform"),
    OTHER("others");

    private final String title;
    private final List<String> names;

    FamilyGroup(String title, String... names) {
        this.title = title;
        this.names = List.of(names);
    }

    public String title() {
        return title;
    }

    /// In the order of the groups; those that have none are left out.
    public static Map<FamilyGroup, List<Family>> of(List<Family> families) {
        var groups = new EnumMap<FamilyGroup, List<Family>>(FamilyGroup.class);
        for (var family : families) {
            groups.computeIfAbsent(of(family), _ -> new ArrayList<>()).add(family);
        }
        return groups;
    }

    private static FamilyGroup of(Family family) {
        for (var group : values()) {
            if (group.names.contains(family.name())) {
                return group;
            }
        }
        return OTHER;
    }
}
