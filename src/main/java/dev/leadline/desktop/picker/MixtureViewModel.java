package dev.leadline.desktop.picker;

import dev.leadline.desktop.working.Edits;
import dev.leadline.desktop.working.ProjectViewModel;
import dev.leadline.model.DensityDraft;
import dev.leadline.model.DensityDraft.Mixture;
import dev.leadline.model.DensityDraft.Part;
import java.util.List;
import java.util.OptionalDouble;
import java.util.function.UnaryOperator;

/// A density of several parts, each with its weight.
final class MixtureViewModel {
    private static final double FIRST_WEIGHT = .9;
    private static final double NEXT_WEIGHT = .1;

    private final DensityAt at;

    MixtureViewModel(DensityAt at) {
        this.at = at;
    }

    ProjectViewModel project() {
        return at.project();
    }

    boolean isMixture() {
        return DensityAt.mixture(at.now()).isPresent();
    }

    List<Part> parts() {
        return DensityAt.mixture(at.now()).map(Mixture::parts).orElse(List.of());
    }

    /// The density there is becomes the first of two parts.
    void split() {
        project().settle();
        at.edit(
                "",
                old -> DensityDraft.of(new Mixture(
                        List.of(new Part(FIRST_WEIGHT, old), new Part(NEXT_WEIGHT, DensityDraft.unchosen())))));
        project().settle();
    }

    void add() {
        edit(parts -> Edits.with(parts, new Part(NEXT_WEIGHT, DensityDraft.unchosen())));
    }

    void remove(int k) {
        project().forget(at.path());
        edit(parts -> Edits.without(parts, k));
    }

    private void edit(UnaryOperator<List<Part>> change) {
        project().settle();
        at.edit(
                ".mixture",
                old -> old.with(new Mixture(
                        change.apply(DensityAt.mixture(old).orElseThrow().parts()))));
        project().settle();
    }

    void weight(int k, String text) {
        project()
                .typeNumber(
                        weightPath(k),
                        "weight of part " + (k + 1),
                        text,
                        (d, value) -> at.changed(
                                d,
                                old -> old.with(new Mixture(Edits.changed(
                                        DensityAt.mixture(old).orElseThrow().parts(),
                                        k,
                                        part -> new Part(value, part.density()))))));
    }

    String weightText(int k) {
        return project()
                .fieldText(weightPath(k), OptionalDouble.of(parts().get(k).weight()));
    }

    boolean isWeightFaulty(int k) {
        return !project().problemsAt(weightPath(k)).isEmpty();
    }

    private String weightPath(int k) {
        return at.path() + ".mixture[" + k + "].weight";
    }

    DensityAt part(int k) {
        return at.part(k);
    }
}
