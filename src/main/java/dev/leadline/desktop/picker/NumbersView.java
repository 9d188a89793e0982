package dev.leadline.desktop.picker;

import dev.leadline.density.Portrait;
import dev.leadline.density.PortraitText;
import dev.leadline.density.PortraitText.Row;
import dev.leadline.desktop.style.Styles;
import java.util.List;
import java.util.Optional;
import javafx.geometry.HPos;
import javafx.scene.control.Label;
import javafx.scene.control.Tooltip;
import javafx.scene.layout.ColumnConstraints;
import javafx.scene.layout.GridPane;
import javafx.scene.layout.HBox;
import javafx.scene.layout.Priority;
import javafx.scene.layout.VBox;

/// Moments, quantiles, and what is worth knowing of the tails, as tables and sentences.
final class NumbersView extends VBox {
    private final GridPane moments = table();
    private final GridPane quantiles = table();
    private final VBox sentences = new VBox(3);

    NumbersView() {
        super(8);
        setId("density-numbers");
        getStyleClass().add("density-numbers");
        var left = new VBox(8, moments, sentences);
        HBox.setHgrow(left, Priority.ALWAYS);
        left.setMinWidth(150);
        quantiles.setMinWidth(GridPane.USE_PREF_SIZE);
        getChildren().add(new HBox(22, left, quantiles));
    }

    void show(Optional<Portrait> portrait, String unit) {
        setVisible(portrait.isPresent());
        portrait.ifPresent(p -> {
            fill(moments, "moments", "", PortraitText.moments(p));
            fill(quantiles, p.isDiscrete() ? "chance up to" : "chance below", unit, PortraitText.quantiles(p));
            sentences.getChildren().clear();
            p.warnings().forEach(words -> sentences.getChildren().add(sentence(words, "density-warning")));
            p.tails().forEach(words -> sentences.getChildren().add(sentence(words, Styles.QUIET)));
        });
    }

    private static Label sentence(String words, String style) {
        var label = Labels.wrapped(PortraitText.sentence(words));
        label.getStyleClass().setAll("label", style);
        return label;
    }

    private static GridPane table() {
        var grid = new GridPane(10, 1);
        var name = new ColumnConstraints();
        var value = new ColumnConstraints();
        value.setHalignment(HPos.RIGHT);
        grid.getColumnConstraints().addAll(name, value);
        return grid;
    }

    private static void fill(GridPane grid, String head, String unit, List<Row> rows) {
        grid.getChildren().clear();
        grid.addRow(0, Labels.of(head), Labels.of(unit));
        int r = 1;
        for (var row : rows) {
            var name = Labels.of(row.name());
            var value = new Label(row.value());
            value.getStyleClass().add("figure");
            value.setMinWidth(Label.USE_PREF_SIZE);
            if (!row.remark().isEmpty()) {
                name.setTooltip(new Tooltip(row.remark()));
                value.setTooltip(new Tooltip(row.remark()));
            }
            grid.addRow(r++, name, value);
        }
    }
}
