package dev.leadline.desktop.working;

import dev.leadline.desktop.background.Background;
import dev.leadline.model.Draft;
import dev.leadline.model.Draft.AskDraft;
import dev.leadline.model.Draft.ReferenceDraft;
import dev.leadline.model.Project;
import dev.leadline.model.Question;
import dev.leadline.model.Reference;
import dev.leadline.reference.Quadrature;
import dev.leadline.reference.ReferenceValue;
import dev.leadline.study.ReferenceText;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.concurrent.atomic.AtomicBoolean;
import javafx.beans.property.ReadOnlyBooleanProperty;
import javafx.beans.property.ReadOnlyBooleanWrapper;
import javafx.beans.property.ReadOnlyStringProperty;
import javafx.beans.property.ReadOnlyStringWrapper;

/// What the answer is compared with: a value known from elsewhere, a closed form, or what quadrature finds, which can
/// be
/// looked at before a run.
public final class ReferenceViewModel {
    private static final ReferenceDraft.Value NOTHING =
            new ReferenceDraft.Value(Double.NaN, OptionalDouble.empty(), "");

    /// Ways to have a reference.
    enum Kind {
        VALUE("a known value"),
        FORMULA("a closed form"),
        QUADRATURE("by quadrature");

        private final String words;

        Kind(String words) {
            this.words = words;
        }

        @Override
        public String toString() {
            return words;
        }
    }

    private final ProjectViewModel project;
    private final Background background;
    private final ReadOnlyStringWrapper found = new ReadOnlyStringWrapper("");
    private final ReadOnlyBooleanWrapper seeking = new ReadOnlyBooleanWrapper();

    /// Chosen, while the draft has no reference yet.
    private Kind chosen = Kind.VALUE;

    private AtomicBoolean cancelled = new AtomicBoolean();

    public ReferenceViewModel(ProjectViewModel project, Background background) {
        this.project = project;
        this.background = background;
        project.draft().addListener((_, _, _) -> forget());
    }

    ProjectViewModel project() {
        return project;
    }

    private Optional<ReferenceDraft> draft() {
        return project.draft().get().reference();
    }

    private Optional<ReferenceDraft.Value> stated() {
        return draft().filter(ReferenceDraft.Value.class::isInstance).map(ReferenceDraft.Value.class::cast);
    }

    Kind kind() {
        return draft().map(reference -> switch (reference) {
                    case ReferenceDraft.Value _ -> Kind.VALUE;
                    case ReferenceDraft.Formula _ -> Kind.FORMULA;
                    case ReferenceDraft.Quadrature _ -> Kind.QUADRATURE;
                })
                .orElse(chosen);
    }

    void kind(Kind kind) {
        if (kind == kind()) {
            return;
        }
        chosen = kind;
        project.forget("$.reference");
        project.settle();
        set("$.reference", kind == Kind.QUADRATURE ? Optional.of(new ReferenceDraft.Quadrature()) : Optional.empty());
    }

    private void set(String key, Optional<ReferenceDraft> reference) {
        project.edit(key, d -> Edits.reference(d, reference));
    }

    void value(String text) {
        project.typeOptionalNumber(
                "$.reference.value",
                "reference value",
                text,
                (d, value) -> Edits.reference(
                        d,
                        value.isEmpty()
                                ? Optional.empty()
                                : Optional.of(new ReferenceDraft.Value(
                                        value.getAsDouble(), given(d).error(), given(d).source()))));
    }

    private static ReferenceDraft.Value given(Draft d) {
        return d.reference()
                .filter(ReferenceDraft.Value.class::isInstance)
                .map(ReferenceDraft.Value.class::cast)
                .orElse(NOTHING);
    }

    String valueText() {
        return project.fieldText(
                "$.reference.value",
                stated().map(r -> OptionalDouble.of(r.value())).orElse(OptionalDouble.empty()));
    }

    boolean hasValue() {
        return stated().isPresent();
    }

    void error(String text) {
        project.typeOptionalNumber(
                "$.reference.error",
                "error of the reference value",
                text,
                (d, error) -> Edits.reference(
                        d, Optional.of(new ReferenceDraft.Value(given(d).value(), error, given(d).source()))));
    }

    String errorText() {
        return project.fieldText(
                "$.reference.error", stated().map(ReferenceDraft.Value::error).orElse(OptionalDouble.empty()));
    }

    void source(String source) {
        project.edit(
                "$.reference.source",
                d -> Edits.reference(
                        d, Optional.of(new ReferenceDraft.Value(given(d).value(), given(d).error(), source))));
    }

    String sourceText() {
        return stated().map(ReferenceDraft.Value::source).orElse("");
    }

    void formula(String text) {
        chosen = Kind.FORMULA;
        set("$.reference.formula", text.isBlank() ? Optional.empty() : Optional.of(new ReferenceDraft.Formula(text)));
    }

    String formulaText() {
        return draft().map(r -> r instanceof ReferenceDraft.Formula(var formula) ? formula : "")
                .orElse("");
    }

    /// What the closed form gives; empty where it is none, or faulty.
    String formulaValue() {
        return project.sound()
                .map(Project::question)
                .filter(question -> question.reference()
                        .filter(r -> r instanceof Reference.ClosedForm(var formula, double _)
                                && formula.equals(formulaText()))
                        .isPresent())
                .flatMap(ReferenceValue::of)
                .flatMap(ReferenceValue::known)
                .map(known -> "= " + ReferenceText.of(known, unit()))
                .orElse("");
    }

    private String unit() {
        var asks = project.draft().get().asks();
        return asks.isEmpty()
                ? ""
                : Optional.of(asks.getFirst()).map(AskDraft::unit).orElse("");
    }

    /// What quadrature found, in words; empty until it is looked for.
    ReadOnlyStringProperty found() {
        return found.getReadOnlyProperty();
    }

    ReadOnlyBooleanProperty seeking() {
        return seeking.getReadOnlyProperty();
    }

    boolean canSeek() {
        return kind() == Kind.QUADRATURE && project.sound().isPresent();
    }

    /// Looks for it now; a run does so by itself.
    void seek() {
        forget();
        var sound = project.sound();
        if (sound.isEmpty()) {
            return;
        }
        Question question = sound.get().question();
        String unit = unit();
        var turn = cancelled;
        seeking.set(true);
        background.run(
                () -> ReferenceText.of(Quadrature.of(question, turn::get), unit),
                text -> show(turn, text),
                failure -> show(turn, "It could not be computed: " + failure));
    }

    private void show(AtomicBoolean turn, String text) {
        if (turn == cancelled) {
            seeking.set(false);
            found.set(text);
        }
    }

    /// What was found holds for the question that it was looked for.
    private void forget() {
        cancelled.set(true);
        cancelled = new AtomicBoolean();
        seeking.set(false);
        found.set("");
    }

    String summary() {
        return draft().map(reference -> switch (reference) {
                    case ReferenceDraft.Value value -> NumberText.show(value.value());
                    case ReferenceDraft.Formula(var formula) -> formula;
                    case ReferenceDraft.Quadrature _ -> Kind.QUADRATURE.toString();
                })
                .orElse("none");
    }
}
