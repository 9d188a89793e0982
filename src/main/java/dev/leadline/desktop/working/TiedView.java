package dev.leadline.desktop.working;

import dev.leadline.desktop.style.Styles;
import dev.leadline.study.TieRow;
import java.util.ArrayList;
import java.util.List;
import java.util.function.Consumer;
import javafx.geometry.Pos;
import javafx.scene.Node;
import javafx.scene.control.Button;
import javafx.scene.control.CheckBox;
import javafx.scene.control.ComboBox;
import javafx.scene.control.Label;
import javafx.scene.control.Tooltip;
import javafx.scene.layout.GridPane;
import javafx.scene.layout.HBox;
import javafx.scene.layout.Region;
import javafx.scene.layout.VBox;

/// Pairs of inputs that are not independent, folded away until there are some.
final class TiedView {
    private final TiedViewModel model;
    private final VBox rows = new VBox(4);
    private final List<Row> shown = new ArrayList<>();
    private final Button add = new Button("+ pair");
    private final ComboBox<String> copula = new ComboBox<>();
    private final Field dof;
    private final HBox dofPair;
    private final CheckBox repair = new CheckBox("take the nearest that are possible");
    private final VBox choices;
    private final Messages messages = new Messages();
    private final GridPane seen = new GridPane(10, 1);
    private final Fold fold;
    private boolean showing;

    /// One pair.
    private final class Row extends HBox {
        private final int index;
        private final ComboBox<String> one;
        private final ComboBox<String> other;
        private final ComboBox<String> measure;
        private final Field value;

        Row(int index) {
            super(4);
            this.index = index;
            setAlignment(Pos.CENTER_LEFT);
            one = choice("first input of the pair", "An input", name -> model.one(index, name));
            one.setId("tied-one-" + index);
            other = choice("second input of the pair", "The input it is tied to", name -> model.other(index, name));
            other.setId("tied-other-" + index);
            measure = choice(
                    "measure of correlation",
                    "spearman: of ranks; kendall: of orders; pearson: of the values themselves",
                    word -> model.measure(index, word));
            measure.setId("tied-measure-" + index);
            measure.getItems().setAll(TiedViewModel.MEASURES);
            value = new Field(
                    "correlation",
                    "From -1 to 1; 0 for none",
                    4,
                    text -> model.value(index, text),
                    model.project()::settle);
            value.setId("tied-value-" + index);
            var remove = new Button("\u00d7");
            remove.getStyleClass().addAll(Styles.LINK, "remove");
            remove.setAccessibleText("Untie this pair");
            remove.setTooltip(new Tooltip("Makes the two independent again; Undo brings it back"));
            remove.setOnAction(_ -> model.remove(index));
            getChildren().addAll(one, other, measure, value, remove);
        }

        void update() {
            var pair = model.tied().pairs().get(index);
            showing = true;
            one.getItems().setAll(model.names());
            one.setValue(pair.one());
            other.getItems().setAll(model.names());
            other.setValue(pair.other());
            measure.setValue(pair.measure());
            showing = false;
            value.show(model.valueText(index));
            value.showFault(
                    !model.project().problemsAt(TiedViewModel.pairPath(index)).isEmpty());
        }
    }

    TiedView(TiedViewModel model, AchievedViewModel achieved) {
        this.model = model;
        add.setId("add-pair");
        add.getStyleClass().setAll("button", Styles.LINK);
        add.setTooltip(new Tooltip("Ties two inputs: a correlation between them"));
        add.setOnAction(_ -> model.add());
        copula.getItems().setAll(TiedViewModel.COPULAS);
        copula.setId("copula");
        copula.setAccessibleText("copula");
        copula.setTooltip(new Tooltip("gaussian: extremes come almost singly; student: extremes come together"));
        copula.setOnAction(_ -> {
            if (!showing && copula.getValue() != null) {
                model.copula(copula.getValue());
            }
        });
        dof = new Field(
                "degrees of freedom of the copula",
                "The fewer, the more extremes come together",
                4,
                model::dof,
                model.project()::settle);
        dof.setId("copula-dof");
        dofPair = line(dof, label("degrees of freedom"));
        repair.setTooltip(new Tooltip("Else correlations that no draws can have are refused"));
        repair.setOnAction(_ -> {
            if (!showing) {
                model.repair(repair.isSelected());
            }
        });
        choices = new VBox(4, line(label("copula"), copula, dofPair), repair);
        fold = new Fold(
                "fold-tied",
                "tied inputs",
                "Inputs that rise and fall together",
                new VBox(6, rows, add, choices, messages, seen));
        fold.head().selectedProperty().addListener((_, _, open) -> achieved.open(open));
        achieved.rows().addListener((_, _, found) -> show(found));
        show(List.of());
    }

    private void show(List<TieRow> found) {
        seen.getChildren().clear();
        if (!found.isEmpty()) {
            seen.add(label("seen in draws of their own"), 0, 0, 2, 1);
        }
        for (int k = 0; k < found.size(); k++) {
            var value = new Label(found.get(k).achieved());
            value.getStyleClass().add("figure");
            value.setWrapText(true);
            value.setMinHeight(Region.USE_PREF_SIZE);
            var of = label(found.get(k).of());
            of.setTooltip(new Tooltip(found.get(k).target()));
            seen.addRow(2 * k + 1, of, value);
            if (found.get(k).isRepaired()) {
                seen.add(label(found.get(k).target()), 0, 2 * k + 2, 2, 1);
            }
        }
        see(seen, !found.isEmpty());
    }

    private ComboBox<String> choice(String name, String tip, Consumer<String> chosen) {
        var box = new ComboBox<String>();
        box.setAccessibleText(name);
        box.setTooltip(new Tooltip(tip));
        box.setMinWidth(56);
        box.setPrefWidth(Region.USE_COMPUTED_SIZE);
        box.setOnAction(_ -> {
            if (!showing && box.getValue() != null) {
                chosen.accept(box.getValue());
            }
        });
        return box;
    }

    Node fold() {
        return fold;
    }

    void update() {
        var pairs = model.tied().pairs();
        while (shown.size() > pairs.size()) {
            rows.getChildren().remove(shown.removeLast());
        }
        while (shown.size() < pairs.size()) {
            shown.add(new Row(shown.size()));
            rows.getChildren().add(shown.getLast());
        }
        shown.forEach(Row::update);
        showing = true;
        copula.setValue(model.tied().copula());
        repair.setSelected(model.tied().repair());
        showing = false;
        dof.show(model.dofText());
        dof.showFault(!model.project().problemsAt("$.dependence.dof").isEmpty());
        see(dofPair, model.tied().copula().equals("student"));
        see(choices, !pairs.isEmpty());
        add.setDisable(!model.canAdd());
        var problems = model.project().problemsAt("$.dependence");
        messages.show(problems);
        fold.title("tied inputs (" + pairs.size() + ")");
        fold.summary(model.summary());
        if (!problems.isEmpty()) {
            fold.open();
        }
    }

    private static void see(Node node, boolean seen) {
        node.setVisible(seen);
        node.setManaged(seen);
    }

    private static HBox line(Node... nodes) {
        var line = new HBox(6, nodes);
        line.setAlignment(Pos.CENTER_LEFT);
        return line;
    }

    private static Label label(String text) {
        var label = new Label(text);
        label.getStyleClass().add(Styles.FIELD_LABEL);
        label.setMinWidth(Region.USE_PREF_SIZE);
        return label;
    }
}
