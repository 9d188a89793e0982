package dev.leadline.desktop.working;

import dev.leadline.desktop.style.Styles;
import dev.leadline.desktop.working.ReferenceViewModel.Kind;
import java.util.function.Consumer;
import javafx.geometry.Pos;
import javafx.scene.Node;
import javafx.scene.control.Button;
import javafx.scene.control.ComboBox;
import javafx.scene.control.Label;
import javafx.scene.control.Tooltip;
import javafx.scene.layout.HBox;
import javafx.scene.layout.VBox;

/// What the answer is compared with, folded away until used.
final class ReferenceView {
    private final ReferenceViewModel model;
    private final ComboBox<Kind> kind = new ComboBox<>();
    private final Field value;
    private final Field error;
    private final Field source;
    private final FormulaArea formula = new FormulaArea("closed form of the reference value", 1, false);
    private final Label formulaValue = text();
    private final Button seek = new Button("Compute now");
    private final Label found = text();
    private final VBox known;
    private final VBox closed;
    private final VBox integrated;
    private final Messages messages = new Messages();
    private final Fold fold;
    private boolean showing;

    ReferenceView(ReferenceViewModel model) {
        this.model = model;
        kind.getItems().setAll(Kind.values());
        kind.setId("reference-kind");
        kind.setAccessibleText("Where the reference value comes from");
        kind.setTooltip(
                new Tooltip("Known from elsewhere, a formula of constants, or the answer integrated by a rule"));
        kind.setOnAction(_ -> {
            if (!showing && kind.getValue() != null) {
                model.kind(kind.getValue());
            }
        });
        value = field("reference", "reference value", "A value known from elsewhere", 9, model::value);
        error = field("reference-error", "its error", "Its standard error or bound", 6, model::error);
        source = field("reference-source", "its source", "Where it comes from", 16, model::source)
                .prompt("where it comes from")
                .growing();
        formula.setId("reference-formula");
        formula.prompt("a formula of constants");
        formula.onTyped(model::formula);
        formula.focusedProperty().addListener((_, _, focused) -> {
            if (!focused) {
                model.project().settle();
            }
        });
        seek.setId("reference-seek");
        seek.setTooltip(new Tooltip("A run does so by itself"));
        seek.setOnAction(_ -> model.seek());
        found.setId("reference-found");
        found.textProperty().bind(model.found());
        known = new VBox(
                6, DemandsView.flow(DemandsView.pair("", value, ""), DemandsView.pair("\u00b1", error, "")), source);
        closed = new VBox(6, formula, formulaValue);
        var line = new HBox(8, seek, explanation());
        line.setAlignment(Pos.CENTER_LEFT);
        integrated = new VBox(6, line, found);
        fold = new Fold(
                "fold-reference",
                "reference value",
                "A value to compare the answer with",
                new VBox(6, kind, known, closed, integrated, messages));
        model.seeking().addListener((_, _, seeking) -> seek.setDisable(seeking || !model.canSeek()));
    }

    Node fold() {
        return fold;
    }

    void open() {
        fold.open();
        value.requestFocus();
    }

    void update() {
        var project = model.project();
        var colouring = Colouring.of(project.draft().get());
        showing = true;
        kind.setValue(model.kind());
        showing = false;
        see(known, model.kind() == Kind.VALUE);
        see(closed, model.kind() == Kind.FORMULA);
        see(integrated, model.kind() == Kind.QUADRATURE);
        value.show(model.valueText());
        value.showFault(!project.problemsAt("$.reference.value").isEmpty());
        error.show(model.errorText());
        error.showFault(!project.problemsAt("$.reference.error").isEmpty());
        source.show(model.sourceText());
        error.setDisable(!model.hasValue());
        source.setDisable(!model.hasValue());
        formula.show(model.formulaText());
        formulaValue.setText(model.formulaValue());
        seek.setDisable(!model.canSeek() || model.seeking().get());
        var problems = project.problemsAt("$.reference");
        formula.paint(
                colouring.of(model.formulaText()),
                problems.stream()
                        .flatMap(problem -> problem.place().span().stream())
                        .map(span -> new int[] {span.from(), span.to()})
                        .toList());
        messages.show(problems);
        fold.summary(model.summary());
        if (!problems.isEmpty()) {
            fold.open();
        }
    }

    private static void see(Node node, boolean isSeen) {
        node.setVisible(isSeen);
        node.setManaged(isSeen);
    }

    private Field field(String id, String name, String tip, int columns, Consumer<String> typed) {
        var field = new Field(name, tip, columns, typed, model.project()::settle);
        field.setId(id);
        return field;
    }

    private static Label explanation() {
        var label = new Label("over the densities of up to 4 inputs");
        label.getStyleClass().add(Styles.QUIET);
        return label;
    }

    private static Label text() {
        var label = new Label();
        label.setWrapText(true);
        label.managedProperty().bind(label.textProperty().isNotEmpty());
        return label;
    }
}
