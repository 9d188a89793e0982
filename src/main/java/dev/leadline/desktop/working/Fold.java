package dev.leadline.desktop.working;

import dev.leadline.desktop.style.Styles;
import javafx.geometry.Pos;
import javafx.scene.Node;
import javafx.scene.control.Label;
import javafx.scene.control.OverrunStyle;
import javafx.scene.control.ToggleButton;
import javafx.scene.control.Tooltip;
import javafx.scene.layout.HBox;
import javafx.scene.layout.Priority;
import javafx.scene.layout.VBox;

/// A part of the working pane that is folded away until it is used; folded, its head says what is in it.
public final class Fold extends VBox {
    private final ToggleButton head;
    private final Label name = new Label();
    private final Label summary = new Label();
    private final Label arrow = new Label("\u25b8");

    public Fold(String id, String title, String tip, Node content) {
        getStyleClass().add(Styles.FOLD);
        name.setText(title);
        summary.getStyleClass().add(Styles.QUIET);
        summary.setTextOverrun(OverrunStyle.ELLIPSIS);
        summary.setMinWidth(0);
        HBox.setHgrow(summary, Priority.ALWAYS);
        name.setMinWidth(USE_PREF_SIZE);
        arrow.setMinWidth(14);
        var line = new HBox(4, arrow, name, summary);
        line.setAlignment(Pos.BASELINE_LEFT);
        head = new ToggleButton();
        head.setId(id);
        head.setGraphic(line);
        head.setMaxWidth(Double.MAX_VALUE);
        line.prefWidthProperty().bind(head.widthProperty().subtract(16));
        head.getStyleClass().setAll(Styles.FOLD_HEAD);
        head.setAccessibleText(title);
        head.setTooltip(new Tooltip(tip));
        content.visibleProperty().bind(head.selectedProperty());
        content.managedProperty().bind(head.selectedProperty());
        content.getStyleClass().add("fold-content");
        head.selectedProperty().addListener((_, _, open) -> arrow.setText(open ? "\u25be" : "\u25b8"));
        getChildren().addAll(head, content);
    }

    public void summary(String text) {
        summary.setText(text);
        head.setAccessibleHelp(text);
    }

    public void title(String text) {
        name.setText(text);
        head.setAccessibleText(text);
    }

    public ToggleButton head() {
        return head;
    }

    public void open() {
        head.setSelected(true);
    }
}
