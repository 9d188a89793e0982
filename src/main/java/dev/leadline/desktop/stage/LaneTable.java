package dev.leadline.desktop.stage;

import dev.leadline.chart.LaneLook;
import dev.leadline.desktop.style.Styles;
import java.util.List;
import java.util.Locale;
import javafx.geometry.HPos;
import javafx.scene.Node;
import javafx.scene.control.Label;
import javafx.scene.control.Tooltip;
import javafx.scene.layout.ColumnConstraints;
import javafx.scene.layout.GridPane;
import javafx.scene.layout.Priority;
import javafx.scene.layout.Region;
import javafx.scene.shape.Circle;
import javafx.scene.shape.Polygon;
import javafx.scene.shape.Rectangle;
import javafx.scene.shape.Shape;

/// Lanes as rows under the picture, so that their columns compare.
final class LaneTable extends GridPane {
    private static final List<String> HEADS = List.of("lane", "", "value", "\u00b1", "draws", "left", "why");
    private List<LaneRows.Row> shown;
    private String valueHead;

    LaneTable() {
        getStyleClass().add(Styles.LANES);
        setId("lanes");
        setHgap(14);
        for (int c = 0; c < HEADS.size(); c++) {
            var column = new ColumnConstraints();
            column.setHalignment(c >= 2 && c <= 5 ? HPos.RIGHT : HPos.LEFT);
            if (c == HEADS.size() - 1) {
                column.setHgrow(Priority.ALWAYS);
            }
            getColumnConstraints().add(column);
        }
        show(List.of(), "value");
    }

    void show(List<LaneRows.Row> rows, String newValueHead) {
        if (rows.equals(shown) && newValueHead.equals(valueHead)) {
            return;
        }
        shown = rows;
        valueHead = newValueHead;
        getChildren().clear();
        heads();
        for (int r = 0; r < rows.size(); r++) {
            var row = rows.get(r);
            String lane = (row.lane() + "  " + row.of()).strip();
            add(cell(lane, "lane-name"), 0, r + 1);
            if (!row.lane().isEmpty()) {
                add(marker(row.look()), 1, r + 1);
            }
            add(cell(row.value(), "figure"), 2, r + 1);
            add(cell(row.plusMinus(), "figure"), 3, r + 1);
            add(cell(row.draws(), "figure"), 4, r + 1);
            add(cell(row.left(), "figure"), 5, r + 1);
            var why = cell(row.why(), Styles.QUIET);
            why.setMinWidth(0);
            why.setTooltip(new Tooltip(row.why()));
            add(why, 6, r + 1);
        }
        if (rows.isEmpty()) {
            var none = cell("no lane has run yet", Styles.QUIET);
            add(none, 0, 1, HEADS.size(), 1);
        }
    }

    private void heads() {
        for (int c = 0; c < HEADS.size(); c++) {
            add(cell(c == 2 ? valueHead : HEADS.get(c), "head"), c, 0);
        }
    }

    private static Label cell(String text, String style) {
        var label = new Label(text);
        label.getStyleClass().add(style);
        label.setMinWidth(Region.USE_PREF_SIZE);
        return label;
    }

    private static Node marker(LaneLook look) {
        Shape shape = switch (look) {
            case FIRST -> new Rectangle(9, 9);
            case SECOND -> new Polygon(0, 6, 6, 0, 12, 6, 6, 12);
            case THIRD -> new Polygon(0, 10, 6, 0, 12, 10);
            case FOURTH -> new Circle(5);
        };
        shape.getStyleClass().add("lane-" + look.name().toLowerCase(Locale.ROOT));
        return shape;
    }
}
