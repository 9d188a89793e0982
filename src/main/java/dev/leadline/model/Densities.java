package dev.leadline.model;

import dev.leadline.density.Catalogue;
import dev.leadline.density.Density;
import dev.leadline.density.Shifted;
import dev.leadline.density.Truncated;
import dev.leadline.density.TypedText;
import dev.leadline.density.ValueTable;
import dev.leadline.model.DensityDraft.Data;
import dev.leadline.model.DensityDraft.Member;
import dev.leadline.model.DensityDraft.Mixture;
import dev.leadline.model.DensityDraft.Typed;
import dev.leadline.model.DensityDraft.Values;
import dev.leadline.numeric.Significant;
import dev.leadline.problem.Problem;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Optional;
import java.util.SequencedMap;
import java.util.function.Supplier;

/// Makes densities of their drafts.
final class Densities {

    /// A truncated density that keeps less is noted.
    private static final double RARE = 1e-3;

    private final DataFiles files;
    private final SequencedMap<String, Double> constants;
    private final Findings findings;

    /// @param constants what typed densities may speak of
    Densities(DataFiles files, SequencedMap<String, Double> constants, Findings findings) {
        this.files = files;
        this.constants = constants;
        this.findings = findings;
    }

    /// @param variable what a typed density calls its values by
    /// @param path of the density in the project
    Optional<Density> of(DensityDraft draft, String variable, String path) {
        return plain(draft.of(), variable, path)
                .flatMap(density -> moved(density, draft, path))
                .flatMap(density -> truncated(density, draft, path));
    }

    private Optional<Density> plain(DensityDraft.Of of, String variable, String path) {
        return switch (of) {
            case Member member -> member(member, path);
            case Values(var values, var probabilities) ->
                made(path, () -> ValueTable.of(numbers(values), numbers(probabilities)));
            case Mixture(var parts) -> mixture(parts, variable, path);
            case Typed typed -> typed(typed, variable, path);
            case Data data -> new DataDensities(files, this, findings).of(data, path);
        };
    }

    private Optional<Density> member(Member member, String path) {
        var made = made(path, () -> Catalogue.named(member.family()).of(member.parameters()));
        made.ifPresent(_ -> note(Catalogue.named(member.family()).notes(member.parameters()), path));
        return made;
    }

    private void note(List<Problem> notes, String path) {
        notes.forEach(note -> findings.note(path + "." + note.place().path(), note));
    }

    private Optional<Density> mixture(List<DensityDraft.Part> drafts, String variable, String path) {
        var parts = new ArrayList<dev.leadline.density.Mixture.Part>();
        for (int i = 0; i < drafts.size(); i++) {
            double weight = drafts.get(i).weight();
            of(drafts.get(i).density(), variable, path + ".mixture[" + i + "]")
                    .ifPresent(density -> parts.add(new dev.leadline.density.Mixture.Part(weight, density)));
        }
        return parts.size() == drafts.size()
                ? findings.made(within -> path + ".mixture" + within, () -> new dev.leadline.density.Mixture(parts))
                : Optional.empty();
    }

    private Optional<Density> typed(Typed typed, String variable, String path) {
        var text = new TypedText(typed.formula(), typed.from(), typed.to(), typed.breaks(), typed.log());
        var others = new LinkedHashMap<>(constants);
        others.remove(variable);
        var made = findings.made(
                within -> path + "." + within, () -> dev.leadline.density.Typed.of(text, variable, others));
        made.ifPresent(density -> note(density.notes(), path));
        return made.map(dev.leadline.density.Typed::density);
    }

    private Optional<Density> moved(Density density, DensityDraft draft, String path) {
        boolean stays = draft.shift().isEmpty() && draft.scale().isEmpty();
        return stays
                ? Optional.of(density)
                : made(
                        path,
                        () -> new Shifted(
                                density, draft.shift().orElse(0), draft.scale().orElse(1)));
    }

    private Optional<Density> truncated(Density density, DensityDraft draft, String path) {
        if (draft.truncate().isEmpty()) {
            return Optional.of(density);
        }
        var ends = draft.truncate().get();
        var made = findings.made(_ -> path + ".truncate", () -> Truncated.of(density, ends.low(), ends.high()));
        made.filter(truncated -> truncated.keptMass() < RARE)
                .ifPresent(truncated -> findings.note(
                        path + ".truncate",
                        Problem.of("truncate keeps %s of the density"
                                        .formatted(Significant.text(truncated.keptMass(), 2)))
                                .because("All draws come from this small part.")
                                .tryThis("Check the unit of the ends.")));
        return made.map(truncated -> truncated);
    }

    private Optional<Density> made(String path, Supplier<Density> density) {
        return findings.made(within -> within.isEmpty() ? path : path + "." + within, density);
    }

    private static double[] numbers(List<Double> list) {
        return list.stream().mapToDouble(Double::doubleValue).toArray();
    }
}
