package dev.leadline.model;

import dev.leadline.density.Catalogue;
import dev.leadline.density.Density;
import dev.leadline.model.DensityDraft.Data;
import dev.leadline.model.DensityDraft.Member;
import dev.leadline.model.DensityDraft.Mixture;
import dev.leadline.model.DensityDraft.Typed;
import dev.leadline.model.DensityDraft.Values;
import dev.leadline.problem.Problem;
import java.util.Optional;

/// Makes densities of their drafts.
final class Densities {

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
            case Data data -> new DataDensities(files, this, findings).of(data, path);
            case Values _, Mixture _, Typed _ -> unavailable(path);
        };
    }

    private Optional<Density> unavailable(String path) {
        findings.add(path, Problem.of("this density is not available"));
        return Optional.empty();
    }

    private Optional<Density> member(Member member, String path) {
        return made(path, () -> Catalogue.named(member.family()).of(member.parameters()));
    }

    private Optional<Density> made(String path, java.util.function.Supplier<Density> density) {
        return findings.made(within -> within.isEmpty() ? path : path + "." + within, density);
    }
}
