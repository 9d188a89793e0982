package dev.leadline.desktop.picker;

import dev.leadline.density.Catalogue;
import dev.leadline.density.Family;
import dev.leadline.desktop.style.Styles;
import javafx.scene.control.Label;
import javafx.scene.control.ListCell;
import javafx.scene.layout.VBox;

/// A family with what it is used for.
final class FamilyCell extends ListCell<String> {
    @Override
    protected void updateItem(String family, boolean empty) {
        super.updateItem(family, empty);
        if (empty || family == null) {
            setText(null);
            setGraphic(null);
            return;
        }
        var use = new Label(Catalogue.family(family).map(Family::use).orElse(""));
        use.getStyleClass().add(Styles.QUIET);
        setGraphic(new VBox(new Label(family), use));
    }
}
