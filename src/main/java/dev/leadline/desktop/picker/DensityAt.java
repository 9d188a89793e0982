package dev.leadline.desktop.picker;

import dev.leadline.density.Catalogue;
import dev.leadline.density.Parameter;
import dev.leadline.desktop.working.Edits;
import dev.leadline.desktop.working.ProjectViewModel;
import dev.leadline.model.DensityDraft;
import dev.leadline.model.DensityDraft.Member;
import dev.leadline.model.DensityDraft.Mixture;
import dev.leadline.model.DensityDraft.Part;
import dev.leadline.model.Draft;
import dev.leadline.model.Draft.From;
import dev.leadline.model.Draft.InputDraft;
import dev.leadline.model.LaneDraft;
import dev.leadline.model.LaneDraft.DrawFrom;
import dev.leadline.model.LaneDraft.Other;
import java.util.LinkedHashMap;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.function.BiFunction;
import java.util.function.Function;
import java.util.function.UnaryOperator;

/// Where a density stands in the draft: that of an input, one that a lane draws it from, or a part of a mixture.
///
/// @param input index of the input
/// @param path its JSON path
/// @param isOwn whether it is that of the input itself, with the sentence of where it comes from
/// @param of whose density it is, in words
record DensityAt(
        ProjectViewModel project,
        int input,
        boolean isOwn,
        String path,
        String of,
        Function<Draft, Optional<DensityDraft>> get,
        BiFunction<Draft, DensityDraft, Draft> set) {

    /// The density that an input has or, over a range, is drawn from.
    static DensityAt input(ProjectViewModel project, int index) {
        var input = project.draft().get().inputs().get(index);
        String field = input.from() instanceof From.Range ? ".drawFrom" : ".density";
        return new DensityAt(
                project,
                index,
                true,
                "$.inputs[" + index + "]" + field,
                input.name(),
                d -> index < d.inputs().size() ? of(d.inputs().get(index).from()) : Optional.empty(),
                (d, density) -> Edits.inputs(d, Edits.changed(d.inputs(), index, in -> with(in, density))));
    }

    /// The density that a lane draws an input from.
    static DensityAt lane(ProjectViewModel project, int lane, int index) {
        String input = project.draft().get().inputs().get(index).name();
        return new DensityAt(
                project,
                index,
                false,
                "$.lanes[" + lane + "].drawFrom." + input,
                input,
                d -> lane < d.lanes().size() ? of(d.lanes().get(lane), input) : Optional.empty(),
                (d, density) ->
                        Edits.lanes(d, Edits.changed(d.lanes(), lane, written -> with(written, input, density))));
    }

    private static Optional<DensityDraft> of(LaneDraft lane, String input) {
        return lane.drawFrom() instanceof DrawFrom.Inputs(var others)
                        && others.get(input) instanceof Other.Another(var density)
                ? Optional.of(density)
                : Optional.empty();
    }

    private static LaneDraft with(LaneDraft lane, String input, DensityDraft density) {
        var others = new LinkedHashMap<String, Other>();
        if (lane.drawFrom() instanceof DrawFrom.Inputs(var before)) {
            others.putAll(before);
        }
        others.put(input, new Other.Another(density));
        return lane.with(new DrawFrom.Inputs(others));
    }

    private static Optional<DensityDraft> of(From from) {
        return switch (from) {
            case From.Density(var density) -> Optional.of(density);
            case From.Range(var _, var _, var drawFrom) -> drawFrom;
        };
    }

    private static InputDraft with(InputDraft in, DensityDraft density) {
        From from = switch (in.from()) {
            case From.Density _ -> new From.Density(density);
            case From.Range(double low, double high, var _) -> new From.Range(low, high, Optional.of(density));
        };
        return new InputDraft(in.name(), in.unit(), in.label(), in.provenance(), from);
    }

    /// A part of the mixture that stands here.
    DensityAt part(int k) {
        return new DensityAt(
                project,
                input,
                isOwn,
                path + ".mixture[" + k + "]",
                "part " + (k + 1) + " of " + of,
                d -> get.apply(d)
                        .flatMap(DensityAt::mixture)
                        .map(Mixture::parts)
                        .filter(parts -> k < parts.size())
                        .map(parts -> parts.get(k).density()),
                (d, density) -> changed(
                        d,
                        whole -> mixture(whole)
                                .map(m -> whole.with(new Mixture(
                                        Edits.changed(m.parts(), k, part -> new Part(part.weight(), density)))))
                                .orElse(whole)));
    }

    static Optional<Mixture> mixture(DensityDraft density) {
        return density.of() instanceof Mixture mixture ? Optional.of(mixture) : Optional.empty();
    }

    DensityDraft now() {
        return get.apply(project.draft().get()).orElse(DensityDraft.unchosen());
    }

    /// A sentence that was made for the density before goes with it.
    Draft changed(Draft d, UnaryOperator<DensityDraft> change) {
        var before = get.apply(d).orElse(DensityDraft.unchosen());
        var after = change.apply(before);
        var drawn = set.apply(d, after);
        boolean lost = isOwn
                && !after.of().equals(before.of())
                && project.isSuggested(drawn.inputs().get(input).provenance());
        return lost ? with(drawn, "") : drawn;
    }

    private Draft with(Draft d, String provenance) {
        if (!isOwn) {
            return d;
        }
        return Edits.inputs(
                d,
                Edits.changed(
                        d.inputs(),
                        input,
                        in -> new InputDraft(in.name(), in.unit(), in.label(), provenance, in.from())));
    }

    void edit(String key, UnaryOperator<DensityDraft> change) {
        project.edit(path + key, d -> changed(d, change));
    }

    /// The density made of something else and the sentence of where it comes from, as one edit.
    void edit(String key, DensityDraft.Of of, String provenance) {
        project.suggested(provenance);
        project.edit(path + key, d -> with(changed(d, old -> become(old, of)), provenance));
    }

    /// The density made of something else. It stays cut where it was; it stays shifted and scaled unless the family has
    /// parameters of these names, which a file could not tell apart.
    static DensityDraft become(DensityDraft old, DensityDraft.Of of) {
        return new DensityDraft(of, kept(of, "shift", old.shift()), kept(of, "scale", old.scale()), old.truncate());
    }

    private static OptionalDouble kept(DensityDraft.Of of, String change, OptionalDouble value) {
        return takes(of, change) ? OptionalDouble.empty() : value;
    }

    /// Whether the family has a parameter of that name.
    static boolean takes(DensityDraft.Of of, String change) {
        return of instanceof Member(String family, var _)
                && Catalogue.family(family)
                        .filter(f -> f.entries().stream()
                                .flatMap(entry -> entry.stream())
                                .map(Parameter::name)
                                .anyMatch(change::equals))
                        .isPresent();
    }
}
