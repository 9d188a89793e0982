package dev.leadline.desktop.lanes;

import dev.leadline.chart.LaneLook;
import dev.leadline.desktop.style.Styles;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import javafx.css.PseudoClass;
import javafx.geometry.HPos;
import javafx.geometry.Pos;
import javafx.scene.Node;
import javafx.scene.control.Label;
import javafx.scene.control.ToggleButton;
import javafx.scene.control.Tooltip;
import javafx.scene.layout.ColumnConstraints;
import javafx.scene.layout.GridPane;
import javafx.scene.layout.HBox;
import javafx.scene.layout.Priority;
import javafx.scene.layout.Region;
import javafx.scene.shape.Circle;
import javafx.scene.shape.Polygon;
import javafx.scene.shape.Rectangle;
import javafx.scene.shape.Shape;

/// Lanes as rows under the picture, so that their columns compare. Rows stay while their figures change, so that a
/// field under them keeps the keyboard.
final class LaneTable extends GridPane {
    private static final PseudoClass SPOKEN_OF = PseudoClass.getPseudoClass("spoken-of");
    private static final List<String> HEADS = List.of("", "scheme", "value", "\u00b1", "draws", "left", "why");
    private static final int SCHEME = 1;
    private static final int VALUE = 2;
    private static final int LEFT = 5;
    private static final int WHY = 6;

    private final LanesViewModel model;
    private final Node form;
    private final Label valueHead = cell("value", "head");
    private final List<Line> lines = new ArrayList<>();
    private List<Key> keys = List.of();
    private int marked = -1;

    /// What decides the rows, but not what stands in them.
    private record Key(int lane, boolean first, LaneLook look, boolean open) {}

    /// The cells of a row whose texts change.
    private final class Line {
        private final Label name = cell("", "lane-name");
        private final Label scheme = cell("", "scheme");
        private final List<Label> figures = new ArrayList<>();
        private final Label why = cell("", Styles.QUIET);

        Line(Key key, int r, boolean several) {
            if (key.first) {
                var head = new ToggleButton();
                head.setId("lane-" + key.lane);
                head.getStyleClass().setAll("lane-head");
                var box = new HBox(6, marker(key.look), name);
                box.setAlignment(Pos.CENTER_LEFT);
                head.setGraphic(box);
                head.setMinWidth(USE_PREF_SIZE);
                head.setSelected(key.open);
                head.setTooltip(new Tooltip("Speaks of this lane, and shows how it samples"));
                head.setOnAction(_ -> {
                    boolean same = model.selected().get() == key.lane;
                    model.select(key.lane);
                    model.open().set(!same || !model.open().get());
                    head.setSelected(model.open().get());
                });
                head.pseudoClassStateChanged(
                        SPOKEN_OF, several && model.selected().get() == key.lane);
                add(head, 0, r);
            }
            scheme.setMinWidth(60);
            scheme.setWrapText(true);
            scheme.setMinHeight(USE_PREF_SIZE);
            scheme.setOnMouseClicked(_ -> model.select(key.lane));
            add(scheme, SCHEME, r);
            for (int c = VALUE; c <= LEFT; c++) {
                var figure = cell("", "figure");
                figure.setOnMouseClicked(_ -> model.select(key.lane));
                figures.add(figure);
                add(figure, c, r);
            }
            why.setMinWidth(60);
            why.setWrapText(true);
            why.setMinHeight(USE_PREF_SIZE);
            add(why, WHY, r);
        }

        void show(LaneRows.Row row) {
            name.setText(row.name());
            String words = row.of().isEmpty() ? row.scheme() : (row.scheme() + "  " + row.of()).strip();
            set(scheme, words);
            figures.get(0).setText(row.value());
            figures.get(1).setText(row.plusMinus());
            figures.get(2).setText(row.draws());
            figures.get(3).setText(row.left());
            set(why, row.why());
        }

        private static void set(Label label, String text) {
            if (!text.equals(label.getText())) {
                label.setText(text);
                label.setTooltip(text.isEmpty() ? null : new Tooltip(text));
            }
        }
    }

    /// @param form of the lane that is open
    LaneTable(LanesViewModel model, Node form) {
        this.model = model;
        this.form = form;
        getStyleClass().add(Styles.LANES);
        setId("lanes");
        setHgap(10);
        for (int c = 0; c < HEADS.size(); c++) {
            var column = new ColumnConstraints();
            column.setHalignment(c >= VALUE && c <= LEFT ? HPos.RIGHT : HPos.LEFT);
            if (c == SCHEME || c == WHY) {
                column.setHgrow(Priority.ALWAYS);
                column.setMinWidth(c == SCHEME ? 110 : 100);
            }
            getColumnConstraints().add(column);
        }
    }

    void show(List<LaneRows.Row> rows, String newValueHead) {
        valueHead.setText(newValueHead);
        var newKeys = rows.stream()
                .map(row -> new Key(
                        row.lane(),
                        !row.name().isEmpty() || row.of().isEmpty(),
                        row.look(),
                        model.open().get() && model.selected().get() == row.lane()))
                .toList();
        if (!newKeys.equals(keys)
                || lines.isEmpty()
                || marked != model.selected().get()) {
            keys = newKeys;
            marked = model.selected().get();
            build();
        }
        for (int r = 0; r < rows.size(); r++) {
            lines.get(r).show(rows.get(r));
        }
    }

    private void build() {
        getChildren().clear();
        lines.clear();
        for (int c = 0; c < HEADS.size(); c++) {
            add(c == VALUE ? valueHead : cell(HEADS.get(c), "head"), c, 0);
        }
        boolean several = keys.stream().anyMatch(key -> key.lane > 0);
        int r = 1;
        for (int k = 0; k < keys.size(); k++) {
            var key = keys.get(k);
            lines.add(new Line(key, r++, several));
            boolean last = k == keys.size() - 1 || keys.get(k + 1).lane != key.lane;
            if (key.open && last) {
                add(form, 0, r++, HEADS.size(), 1);
            }
        }
    }

    private static Label cell(String text, String style) {
        var label = new Label(text);
        label.getStyleClass().add(style);
        label.setMinWidth(Region.USE_PREF_SIZE);
        return label;
    }

    static Node marker(LaneLook look) {
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
