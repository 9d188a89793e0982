package dev.leadline.model;

import dev.leadline.density.Catalogue;
import dev.leadline.density.Density;
import dev.leadline.density.Family;
import dev.leadline.model.DensityDraft.Data;
import dev.leadline.model.DensityDraft.Member;
import dev.leadline.model.DensityDraft.Mixture;
import dev.leadline.model.DensityDraft.Typed;
import dev.leadline.model.DensityDraft.Values;
import dev.leadline.problem.Nearest;
import dev.leadline.problem.Problem;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;

/// Makes densities of their drafts.
final class Densities {

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

    private final DataFiles files;
    private final Findings findings;

    Densities(DataFiles files, Findings findings) {
        this.files = files;
        this.findings = findings;
    }

    /// @param path of the density in the project
    Optional<Density> of(DensityDraft draft, String path) {
        if (draft.shift().isPresent()
                || draft.scale().isPresent()
                || draft.truncate().isPresent()) {
            return unavailable(path);
        }
        return switch (draft.of()) {
            case Member member -> member(member, path);
            case Values _, Mixture _, Typed _, Data _ -> unavailable(path);
        };
    }

    private Optional<Density> unavailable(String path) {
        findings.add(path, Problem.of("this density is not available"));
        return Optional.empty();
    }

    private Optional<Density> member(Member member, String path) {
        var family = Catalogue.family(member.family());
        if (family.isEmpty()) {
            findings.add(path + ".family", noFamily(member.family()));
            return Optional.empty();
        }
        return made(path, () -> family.get().of(member.parameters()));
    }

    private Optional<Density> made(String path, java.util.function.Supplier<Density> density) {
        return findings.made(within -> within.isEmpty() ? path : path + "." + within, density);
    }

    private static Problem noFamily(String name) {
        List<String> names = Catalogue.families().stream().map(Family::name).toList();
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
