package dev.leadline.desktop.picker;

import dev.leadline.desktop.style.Styles;
import javafx.geometry.Pos;
import javafx.scene.Node;
import javafx.scene.control.Button;
import javafx.scene.control.Label;
import javafx.scene.control.Tooltip;
import javafx.scene.layout.HBox;
import javafx.scene.layout.Region;

/// Small texts beside fields.
final class Labels {
    private Labels() {}

    static Label of(String text) {
        var label = new Label(text);
        label.getStyleClass().add(Styles.FIELD_LABEL);
        label.setMinWidth(Region.USE_PREF_SIZE);
        return label;
    }

    /// As many lines as it takes.
    static Label wrapped(String text) {
        var label = new Label(text);
        label.getStyleClass().add(Styles.QUIET);
        label.setWrapText(true);
        label.setMinHeight(Region.USE_PREF_SIZE);
        return label;
    }

    static HBox line(Node... nodes) {
        var line = new HBox(6, nodes);
        line.setAlignment(Pos.CENTER_LEFT);
        return line;
    }

    static Button link(String text, String tip, Runnable action) {
        var button = new Button(text);
        button.getStyleClass().setAll("button", Styles.LINK);
        button.setTooltip(new Tooltip(tip));
        button.setMinWidth(Region.USE_PREF_SIZE);
        button.setOnAction(_ -> action.run());
        return button;
    }

    static void see(Node node, boolean seen) {
        node.setVisible(seen);
        node.setManaged(seen);
    }
}
