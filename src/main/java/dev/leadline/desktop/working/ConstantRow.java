package dev.leadline.desktop.working;

import dev.leadline.desktop.style.Styles;
import javafx.geometry.Pos;
import javafx.scene.control.Button;
import javafx.scene.control.Label;
import javafx.scene.control.Tooltip;
import javafx.scene.layout.HBox;
import javafx.scene.layout.Priority;
import javafx.scene.layout.VBox;

/// A row `name = value unit`, with what it is.
final class ConstantRow extends VBox {
    private final ConstantsViewModel model;
    private final int index;
    private final Field name;
    private final Field value;
    private final Field unit;
    private final Field label;
    private final Messages messages = new Messages();

    ConstantRow(ConstantsViewModel model, int index) {
        this.model = model;
        this.index = index;
        Runnable left = model.project()::settle;
        name = new Field("name of the constant", "How formulas call it", 7, t -> model.name(index, t), left);
        name.setId("constant-" + index);
        name.getStyleClass().addAll(Styles.MATHS, "word-constant");
        value = new Field("value of the constant", "A number", 6, t -> model.value(index, t), left);
        value.setId("constant-value-" + index);
        value.getStyleClass().add(Styles.MATHS);
        unit = new Field("unit of the constant", "Its unit, as m2; 1 for none", 4, t -> model.unit(index, t), left)
                .prompt("unit");
        label = new Field("what the constant is", "What it is, in a few words", 8, t -> model.label(index, t), left)
                .prompt("what it is")
                .growing();
        HBox.setHgrow(label, Priority.ALWAYS);
        var remove = new Button("\u00d7");
        remove.getStyleClass().addAll(Styles.LINK, "remove");
        remove.setAccessibleText("Remove this constant");
        remove.setTooltip(new Tooltip("Takes the constant out of the question; Undo brings it back"));
        remove.setOnAction(_ -> model.remove(index));
        var equals = new Label("=");
        equals.getStyleClass().add(Styles.MATHS);
        equals.setMinWidth(USE_PREF_SIZE);
        var line = new HBox(3, name, equals, value, unit, label, remove);
        line.setAlignment(Pos.CENTER_LEFT);
        getStyleClass().add(Styles.ROW);
        getChildren().addAll(line, messages);
    }

    void update() {
        var c = model.constants().get(index);
        name.show(c.name());
        value.show(model.valueText(index));
        unit.show(c.unit());
        label.show(c.label());
        var path = ConstantsViewModel.path(index);
        var problems = model.project().problemsAt(path);
        messages.show(problems);
        name.showFault(!model.project().problemsAt(path + ".name").isEmpty());
        value.showFault(!model.project().problemsAt(path + ".value").isEmpty());
    }

    void focusName() {
        name.requestFocus();
        name.selectAll();
    }
}
