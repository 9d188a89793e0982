package dev.leadline.desktop.working;

import dev.leadline.desktop.style.Styles;
import java.util.List;
import javafx.geometry.HPos;
import javafx.geometry.Pos;
import javafx.scene.Node;
import javafx.scene.control.Label;
import javafx.scene.layout.ColumnConstraints;
import javafx.scene.layout.GridPane;
import javafx.scene.layout.HBox;
import javafx.scene.layout.Priority;
import javafx.scene.layout.Region;
import javafx.scene.layout.VBox;

/// Every input, step and outcome of one draw.
final class LookView {
    private final Fold fold;
    private final GridPane table = new GridPane(10, 2);
    private final Messages messages = new Messages();
    private final Label why = new Label();
    private final Field draw;

    LookView(LookViewModel model) {
        draw = new Field(
                        "index of the draw",
                        "Index of a draw from 0; empty for the nominal one",
                        9,
                        model::draw,
                        () -> {})
                .prompt("nominal");
        draw.setId("look-draw");
        var label = new Label("draw");
        label.getStyleClass().add(Styles.FIELD_LABEL);
        label.setMinWidth(Region.USE_PREF_SIZE);
        var hint = new Label("empty: all at their medians");
        hint.getStyleClass().add(Styles.QUIET);
        var line = new HBox(6, label, draw, hint);
        line.setAlignment(Pos.CENTER_LEFT);
        why.getStyleClass().add(Styles.QUIET);
        why.setWrapText(true);
        var name = new ColumnConstraints();
        var value = new ColumnConstraints();
        value.setHalignment(HPos.RIGHT);
        var unit = new ColumnConstraints();
        unit.setHgrow(Priority.ALWAYS);
        table.getColumnConstraints().addAll(name, value, unit);
        table.setId("look-table");
        fold = new Fold(
                "fold-look",
                "look at a draw",
                "Every input, step and outcome of one draw",
                new VBox(6, line, why, messages, table));
        fold.summary("inputs, steps and outcome of one draw");
        fold.head().selectedProperty().addListener((_, _, open) -> model.open(open));
        model.state().addListener((_, _, state) -> show(state));
    }

    Node fold() {
        return fold;
    }

    void open() {
        fold.open();
        draw.requestFocus();
    }

    void show(long index) {
        draw.setText(Long.toString(index));
    }

    private void show(LookViewModel.State state) {
        table.getChildren().clear();
        why.setManaged(state instanceof LookViewModel.State.Empty);
        why.setVisible(state instanceof LookViewModel.State.Empty);
        switch (state) {
            case LookViewModel.State.Empty(String reason) -> {
                why.setText(reason);
                messages.show(List.of());
            }
            case LookViewModel.State.Refused(var problem) -> messages.show(List.of(problem));
            case LookViewModel.State.Seen(var rows) -> {
                messages.show(List.of());
                for (int i = 0; i < rows.size(); i++) {
                    var row = rows.get(i);
                    table.addRow(
                            i,
                            cell(row.name(), "word-" + row.kind()),
                            value(row.value()),
                            cell(row.remark(), Styles.QUIET));
                }
            }
        }
    }

    private static Label value(String value) {
        var label = cell(value, "look-value");
        label.setMinWidth(Region.USE_PREF_SIZE);
        return label;
    }

    private static Label cell(String text, String style) {
        var label = new Label(text);
        label.getStyleClass().addAll(Styles.MATHS, style);
        return label;
    }
}
