package dev.leadline.desktop.picker;

import dev.leadline.desktop.working.NumberText;
import dev.leadline.desktop.working.ProjectViewModel;
import dev.leadline.model.DensityDraft;
import dev.leadline.model.DensityDraft.Ends;
import java.util.ArrayList;
import java.util.Optional;
import java.util.OptionalDouble;

/// What is done to the values of a density: multiplied, moved, cut.
final class ChangesViewModel {
    private final DensityAt at;

    ChangesViewModel(DensityAt at) {
        this.at = at;
    }

    ProjectViewModel project() {
        return at.project();
    }

    /// Whether a family has a parameter of that name itself.
    boolean isTaken(String change) {
        return DensityAt.takes(at.now().of(), change);
    }

    void shift(String text) {
        type("shift", text, (old, value) -> new DensityDraft(old.of(), value, old.scale(), old.truncate()));
    }

    void scale(String text) {
        type("scale", text, (old, value) -> new DensityDraft(old.of(), old.shift(), value, old.truncate()));
    }

    void low(String text) {
        type("truncate[0]", text, (old, value) -> cut(old, value.orElse(Double.NEGATIVE_INFINITY), high(old)));
    }

    void high(String text) {
        type("truncate[1]", text, (old, value) -> cut(old, low(old), value.orElse(Double.POSITIVE_INFINITY)));
    }

    String shiftText() {
        return project().fieldText(at.path() + ".shift", at.now().shift());
    }

    String scaleText() {
        return project().fieldText(at.path() + ".scale", at.now().scale());
    }

    String lowText() {
        return project().fieldText(at.path() + ".truncate[0]", finite(low(at.now())));
    }

    String highText() {
        return project().fieldText(at.path() + ".truncate[1]", finite(high(at.now())));
    }

    boolean isFaulty(String field) {
        return !project().problemsAt(at.path() + "." + field).isEmpty();
    }

    /// As `cut to 0 to 40, times 2`.
    String summary() {
        var now = at.now();
        var words = new ArrayList<String>();
        now.scale().ifPresent(v -> words.add("times " + NumberText.show(v)));
        now.shift().ifPresent(v -> words.add("plus " + NumberText.show(v)));
        now.truncate()
                .ifPresent(e -> words.add("from " + NumberText.show(e.low()) + " to " + NumberText.show(e.high())));
        return words.isEmpty() ? "as it is" : String.join(", ", words);
    }

    private static OptionalDouble finite(double end) {
        return Double.isFinite(end) ? OptionalDouble.of(end) : OptionalDouble.empty();
    }

    private static double low(DensityDraft density) {
        return density.truncate().map(Ends::low).orElse(Double.NEGATIVE_INFINITY);
    }

    private static double high(DensityDraft density) {
        return density.truncate().map(Ends::high).orElse(Double.POSITIVE_INFINITY);
    }

    private static DensityDraft cut(DensityDraft old, double low, double high) {
        boolean whole = low == Double.NEGATIVE_INFINITY && high == Double.POSITIVE_INFINITY;
        return new DensityDraft(
                old.of(), old.shift(), old.scale(), whole ? Optional.empty() : Optional.of(new Ends(low, high)));
    }

    private interface Change {
        DensityDraft of(DensityDraft old, OptionalDouble value);
    }

    private void type(String field, String text, Change change) {
        project()
                .typeOptionalNumber(
                        at.path() + "." + field,
                        field.replaceAll("\\[.*", "") + " of " + at.of(),
                        text,
                        (d, value) -> at.changed(d, old -> change.of(old, value)));
    }
}
