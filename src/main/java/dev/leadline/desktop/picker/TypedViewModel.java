package dev.leadline.desktop.picker;

import dev.leadline.desktop.working.FormulasViewModel;
import dev.leadline.desktop.working.NumberText;
import dev.leadline.desktop.working.ProjectViewModel;
import dev.leadline.model.DensityDraft.Typed;
import java.util.ArrayList;
import java.util.List;
import java.util.OptionalDouble;
import java.util.function.UnaryOperator;
import java.util.stream.Collectors;

/// A density typed as a formula, up to a factor.
final class TypedViewModel {
    private static final Typed EMPTY =
            new Typed("", Double.NEGATIVE_INFINITY, Double.POSITIVE_INFINITY, List.of(), false);

    private final DensityAt at;

    TypedViewModel(DensityAt at) {
        this.at = at;
    }

    ProjectViewModel project() {
        return at.project();
    }

    /// The name by which the formula calls the value.
    String variable() {
        return at.of();
    }

    /// Whether one is written; before, the density is something else.
    boolean isTyped() {
        return at.now().of() instanceof Typed;
    }

    Typed typed() {
        return at.now().of() instanceof Typed typed ? typed : EMPTY;
    }

    void formula(String text) {
        edit(".formula", t -> new Typed(text, t.from(), t.to(), t.breaks(), t.log()));
    }

    void log(boolean log) {
        project().settle();
        edit(".log", t -> new Typed(t.formula(), t.from(), t.to(), t.breaks(), log));
    }

    void from(String text) {
        end(".from", text, (t, value) -> new Typed(t.formula(), value, t.to(), t.breaks(), t.log()));
    }

    void to(String text) {
        end(".to", text, (t, value) -> new Typed(t.formula(), t.from(), value, t.breaks(), t.log()));
    }

    String fromText() {
        return project().fieldText(at.path() + ".from", OptionalDouble.of(typed().from()));
    }

    String toText() {
        return project().fieldText(at.path() + ".to", OptionalDouble.of(typed().to()));
    }

    /// Numbers with blanks or semicolons between them.
    void breaks(String text) {
        var breaks = new ArrayList<Double>();
        for (String word : text.strip().split("[\\s;]+")) {
            var number = NumberText.read(word);
            if (number.isPresent()) {
                breaks.add(number.getAsDouble());
            } else if (!word.isEmpty()) {
                project()
                        .unread(
                                at.path() + ".breaks",
                                text,
                                NumberText.problem("a break of " + at.of(), word)
                                        .tryThis("Write blanks between them: 1.5 3 4.2"));
                return;
            }
        }
        project().forget(at.path() + ".breaks");
        edit(".breaks", t -> new Typed(t.formula(), t.from(), t.to(), breaks, t.log()));
    }

    String breaksText() {
        return project()
                .unreadText(at.path() + ".breaks")
                .orElseGet(() -> typed().breaks().stream().map(NumberText::show).collect(Collectors.joining(" ")));
    }

    boolean isFaulty(String field) {
        return !project().problemsAt(at.path() + "." + field).isEmpty();
    }

    List<FormulasViewModel.Fault> faults() {
        String text = typed().formula();
        return text.isBlank()
                ? List.of()
                : project().problemsAt(at.path() + ".formula").stream()
                        .map(p -> FormulasViewModel.fault(0, text, p))
                        .toList();
    }

    private interface End {
        Typed of(Typed typed, double value);
    }

    private void end(String field, String text, End change) {
        project()
                .typeNumber(
                        at.path() + field,
                        field.substring(1) + " of " + at.of(),
                        text,
                        (d, value) -> at.changed(
                                d,
                                old -> DensityAt.become(
                                        old, change.of(old.of() instanceof Typed t ? t : EMPTY, value))));
    }

    private void edit(String field, UnaryOperator<Typed> change) {
        at.edit(field, old -> DensityAt.become(old, change.apply(old.of() instanceof Typed t ? t : EMPTY)));
    }
}
