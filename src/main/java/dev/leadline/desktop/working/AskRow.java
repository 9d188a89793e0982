package dev.leadline.desktop.working;

import dev.leadline.desktop.style.Styles;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import javafx.geometry.Pos;
import javafx.scene.Node;
import javafx.scene.control.Button;
import javafx.scene.control.ComboBox;
import javafx.scene.control.Label;
import javafx.scene.control.Tooltip;
import javafx.scene.layout.HBox;
import javafx.scene.layout.Priority;
import javafx.scene.layout.VBox;
import javafx.util.StringConverter;

/// One thing asked: its kind, formulas, unit and label.
final class AskRow extends VBox {
    private static final Map<String, String> KINDS = Map.of(
            "mean", "the mean of",
            "integral", "the integral of",
            "probability", "the chance that",
            "quantile", "a quantile of",
            "tailMean", "the tail mean of",
            "ratio", "the ratio of",
            "standardDeviation", "the std. deviation of",
            "distribution", "the distribution of");

    private static final List<String> IN_ORDER = List.of(
            "probability", "mean", "quantile", "tailMean", "distribution", "standardDeviation", "ratio", "integral");

    private final FormulasViewModel model;
    private final int index;
    private final ComboBox<String> kind = new ComboBox<>();
    private final FormulaArea formula;
    private final FormulaArea divisor;
    private final HBox to;
    private final Field part;
    private final Label before = new Label();
    private final Label after = new Label();
    private final HBox partLine;
    private final Field unit;
    private final Field label;
    private final Button remove = new Button("\u00d7");
    private final Messages partMessages = new Messages();
    private final Messages messages = new Messages();
    private final Messages divisorMessages = new Messages();
    private boolean showing;

    AskRow(FormulasViewModel model, int index) {
        this.model = model;
        this.index = index;
        setSpacing(4);
        kind.getItems().setAll(IN_ORDER);
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
                .prompt("name")
                .growing();
        HBox.setHgrow(label, Priority.ALWAYS);
        remove.getStyleClass().addAll(Styles.LINK, "remove");
        remove.setAccessibleText("Remove this answer");
        remove.setTooltip(new Tooltip("Asks for this no longer; Undo brings it back"));
        remove.setOnAction(_ -> model.removeAsk(index));
        kind.setMinWidth(USE_PREF_SIZE);
        var line = new HBox(6, kind, label, new Label("in"), unit, remove);
        line.setAlignment(Pos.CENTER_LEFT);
        part = new Field("probability", "A probability, in per cent", 5, t -> model.part(index, t), left);
        part.setId("ask-part-" + index);
        before.getStyleClass().add(Styles.FIELD_LABEL);
        after.getStyleClass().add(Styles.FIELD_LABEL);
        before.setMinWidth(USE_PREF_SIZE);
        partLine = new HBox(5, before, part, after);
        partLine.setAlignment(Pos.CENTER_LEFT);
        formula = area("Formula that is asked", 0);
        formula.setId("ask-" + index);
        formula.prompt("a formula in inputs, constants and steps");
        divisor = area("Formula whose mean divides the other", 1);
        divisor.setId("ask-divisor-" + index);
        divisor.prompt("the formula whose mean divides it");
        var word = new Label("to");
        word.getStyleClass().add(Styles.FIELD_LABEL);
        word.setMinWidth(USE_PREF_SIZE);
        HBox.setHgrow(divisor, Priority.ALWAYS);
        to = new HBox(6, word, divisor);
        to.setAlignment(Pos.BASELINE_LEFT);
        getChildren().addAll(line, partLine, partMessages, formula, messages, to, divisorMessages);
    }

    private FormulaArea area(String name, int which) {
        var area = new FormulaArea(name, 1, false);
        area.onTyped(t -> model.typeFormula(index, which, t));
        area.onPasted(model::makeInputsOfUnknownNames);
        area.focusedProperty().addListener((_, _, focused) -> {
            if (!focused) {
                model.project().settle();
            }
        });
        return area;
    }

    void update(Colouring colouring) {
        var ask = model.asks().get(index);
        showing = true;
        kind.setValue(ask.estimand());
        showing = false;
        unit.show(ask.unit());
        label.show(ask.label());
        remove.setVisible(model.asks().size() > 1);
        remove.setManaged(model.asks().size() > 1);
        var words = PartWords.of(ask.estimand());
        words.ifPresent(w -> {
            before.setText(w.before());
            after.setText(w.after());
            part.setAccessibleText(w.name());
            part.tip(w.tip());
            part.show(model.partText(index));
        });
        show(partLine, words.isPresent());
        var partProblems = model.partProblems(index);
        part.showFault(!partProblems.isEmpty());
        partMessages.show(partProblems);
        show(formula, messages, 0, colouring);
        show(to, ask.formulas().size() > 1);
        if (ask.formulas().size() > 1) {
            show(divisor, divisorMessages, 1, colouring);
        } else {
            divisorMessages.show(List.of());
        }
    }

    private void show(FormulaArea area, Messages below, int which, Colouring colouring) {
        String text = model.asks().get(index).formulas().get(which);
        area.show(text);
        var faults = text.isBlank() ? List.<FormulasViewModel.Fault>of() : model.askFaults(index, which);
        area.paint(
                colouring.of(text),
                faults.stream()
                        .filter(f -> f.problem().place().span().isPresent())
                        .map(f -> new int[] {f.from(), f.to()})
                        .toList());
        below.showIn(faults, text);
    }

    private static void show(Node node, boolean shown) {
        node.setVisible(shown);
        node.setManaged(shown);
    }

    void focusFormula() {
        formula.requestFocus();
    }

    boolean hasLevel() {
        return partLine.isVisible();
    }

    void focusLevel() {
        part.requestFocus();
    }

    void focusUnit() {
        unit.requestFocus();
    }

    /// What is said about the part of the outcomes that a kind of answer speaks of.
    private record PartWords(String before, String after, String name, String tip) {
        static Optional<PartWords> of(String estimand) {
            return switch (estimand) {
                case "quantile" ->
                    Optional.of(new PartWords(
                            "that",
                            "% of the outcomes do not exceed",
                            "probability of the quantile, in per cent",
                            "Part of the outcomes that the quantile is not exceeded by, in per cent: 99 of 99 in 100"));
                case "tailMean" ->
                    Optional.of(new PartWords(
                            "beyond the quantile at",
                            "%",
                            "probability of the quantile where the tail begins, in per cent",
                            "The mean of the worst outcomes: at 95, of the worst 5 in 100"));
                case "distribution" ->
                    Optional.of(new PartWords(
                            "and where",
                            "% of the outcomes lie",
                            "coverage of the intervals of the outcome, in per cent",
                            "Part of the outcomes that the coverage intervals hold; it is not the confidence"));
                default -> Optional.empty();
            };
        }
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
