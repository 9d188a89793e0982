package dev.leadline.desktop.working;

import dev.leadline.desktop.style.Styles;
import java.util.List;
import java.util.Map;
import javafx.geometry.Pos;
import javafx.scene.control.Button;
import javafx.scene.control.ComboBox;
import javafx.scene.control.Label;
import javafx.scene.control.Tooltip;
import javafx.scene.layout.HBox;
import javafx.scene.layout.Priority;
import javafx.scene.layout.VBox;
import javafx.util.StringConverter;

/// One thing asked: its kind, formula, unit and label.
final class AskRow extends VBox {
    private static final Map<String, String> KINDS =
            Map.of("mean", "the mean of", "integral", "the integral of", "probability", "the chance that");

    private final FormulasViewModel model;
    private final int index;
    private final ComboBox<String> kind = new ComboBox<>();
    private final FormulaArea formula;
    private final Field unit;
    private final Field label;
    private final Button remove = new Button("\u00d7");
    private final Messages messages = new Messages();
    private boolean showing;

    AskRow(FormulasViewModel model, int index) {
        this.model = model;
        this.index = index;
        setSpacing(4);
        kind.getItems().setAll("probability", "mean", "integral");
        kind.setId("ask-kind-" + index);
        kind.setAccessibleText("Kind of answer");
        kind.setTooltip(new Tooltip("What is asked of the formula below"));
        kind.setConverter(new KindWords());
        kind.setOnAction(_ -> {
            if (!showing && kind.getValue() != null) {
                model.kind(index, kind.getValue());
            }
        });
        Runnable left = model.project()::settle;
        unit = new Field(
                        "unit of the answer",
                        "Unit of the answer, as 1/a for per year",
                        4,
                        t -> model.unit(index, t),
                        left)
                .prompt("unit");
        unit.setId("ask-unit-" + index);
        label = new Field("name of the answer", "What to call the answer", 8, t -> model.label(index, t), left)
                .prompt("what to call it")
                .growing();
        HBox.setHgrow(label, Priority.ALWAYS);
        remove.getStyleClass().addAll(Styles.LINK, "remove");
        remove.setAccessibleText("Remove this answer");
        remove.setTooltip(new Tooltip("Asks for this no longer; Undo brings it back"));
        remove.setOnAction(_ -> model.removeAsk(index));
        kind.setMinWidth(USE_PREF_SIZE);
        var line = new HBox(6, kind, label, new Label("in"), unit, remove);
        line.setAlignment(Pos.CENTER_LEFT);
        formula = new FormulaArea("Formula that is asked", 1, false);
        formula.setId("ask-" + index);
        formula.prompt("a formula in inputs, constants and steps");
        formula.onTyped(t -> model.typeFormula(index, t));
        formula.onPasted(model::makeInputsOfUnknownNames);
        formula.focusedProperty().addListener((_, _, focused) -> {
            if (!focused) {
                left.run();
            }
        });
        getChildren().addAll(line, formula, messages);
    }

    void update(Colouring colouring) {
        var ask = model.asks().get(index);
        showing = true;
        kind.setValue(ask.estimand());
        showing = false;
        formula.show(ask.formula());
        unit.show(ask.unit());
        label.show(ask.label());
        remove.setVisible(model.asks().size() > 1);
        remove.setManaged(model.asks().size() > 1);
        var faults = ask.formula().isBlank() ? List.<FormulasViewModel.Fault>of() : model.askFaults(index);
        formula.paint(
                colouring.of(ask.formula()),
                faults.stream()
                        .filter(f -> f.problem().place().span().isPresent())
                        .map(f -> new int[] {f.from(), f.to()})
                        .toList());
        messages.showIn(faults, ask.formula());
    }

    void focusFormula() {
        formula.requestFocus();
    }

    void focusUnit() {
        unit.requestFocus();
    }

    private static final class KindWords extends StringConverter<String> {
        @Override
        public String toString(String word) {
            return word == null ? "" : KINDS.getOrDefault(word, word);
        }

        @Override
        public String fromString(String text) {
            throw new UnsupportedOperationException("kinds are chosen, not typed");
        }
    }
}
