package dev.leadline.density;

import dev.leadline.problem.Nearest;
import dev.leadline.problem.Problem;
import dev.leadline.problem.Refusal;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.Comparator;
import java.util.List;
import java.util.Map;

/// Families fitted to values by maximum likelihood. Advice: which of them is right, the values alone do not say.
///
/// @param fits those fitted to all values first, by Akaike's criterion; only they can be compared with one another
/// @param refused the families that cannot be fitted, and why
/// @param sorted the values
public record Fits(List<Fit> fits, List<Refused> refused, List<Double> sorted) {

    /// @param given parameters that are not to be fitted
    public record Wanted(String family, Map<String, Double> given) {
        public Wanted {
            given = Map.copyOf(given);
        }
    }

    public record Refused(String family, Problem why) {}

    public Fits {
        fits = List.copyOf(fits);
        refused = List.copyOf(refused);
        sorted = List.copyOf(sorted);
    }

    /// The families that there are ways to fit.
    public static List<String> families() {
        return Catalogue.families().stream()
                .map(Family::name)
                .filter(Likelihoods::has)
                .toList();
    }

    /// @param wanted empty for every family that can be fitted without a given parameter
    /// @throws Refusal where there are too few values for any fit, or no such family
    public static Fits of(double[] values, List<Wanted> wanted) {
        if (Arrays.stream(values).distinct().limit(2).count() < 2) {
            throw new Refusal(Problem.of("there is only one value to fit to")
                    .because("Location and spread need at least two different values.")
                    .tryThis("See whether another column was meant."));
        }
        double[] sorted = values.clone();
        Arrays.sort(sorted);
        List<Fit> fits = new ArrayList<>();
        List<Refused> refused = new ArrayList<>();
        List<Wanted> all = wanted.isEmpty()
                ? families().stream().map(name -> new Wanted(name, Map.of())).toList()
                : wanted;
        for (Wanted one : all) {
            known(one.family);
            try {
                fits.add(Likelihoods.fit(one, sorted));
            } catch (Refusal refusal) {
                refused.add(new Refused(one.family, refusal.problems().getFirst()));
            }
        }
        fits.sort(Comparator.<Fit>comparingInt(fit -> -fit.used()).thenComparingDouble(Fit::aic));
        return new Fits(fits, refused, Arrays.stream(sorted).boxed().toList());
    }

    private static void known(String name) {
        List<String> families = families();
        if (families.contains(name)) {
            return;
        }
        boolean exists = Catalogue.family(name).isPresent();
        var problem = Problem.of(
                        exists
                                ? "the family %s is not fitted".formatted(name)
                                : "the family \"%s\" is not available".formatted(name))
                .because("Families that are fitted are %s.".formatted(String.join(", ", families)));
        throw new Refusal(
                exists
                        ? problem
                        : Nearest.to(name, families)
                                .map(near -> problem.tryThis("Was \"%s\" meant?".formatted(near)))
                                .orElse(problem));
    }
}
