package dev.leadline.desktop.picker;

import dev.leadline.desktop.working.Field;
import java.util.ArrayList;
import java.util.List;
import javafx.geometry.HPos;
import javafx.scene.Node;
import javafx.scene.control.Label;
import javafx.scene.layout.ColumnConstraints;
import javafx.scene.layout.GridPane;
import javafx.scene.layout.Priority;
import javafx.scene.layout.VBox;

/// A few numbers that are known, and the density that follows from them.
final class KnownForm implements Form {
    private final KnownViewModel model;
    private final Label sentence = Labels.wrapped("");
    private final List<Runnable> refreshers = new ArrayList<>();
    private final VBox all;
    private Node first;

    KnownForm(KnownViewModel model, Runnable settle) {
        this.model = model;
        var grid = new GridPane(8, 6);
        var names = new ColumnConstraints();
        names.setHgrow(Priority.ALWAYS);
        var values = new ColumnConstraints();
        values.setHalignment(HPos.RIGHT);
        grid.getColumnConstraints().addAll(names, values);
        first = grid;
        int row = 0;
        for (var p : model.knowledge().parameters()) {
            var field = new Field(p.use(), p.name() + ": " + p.rule(), 8, t -> type(p.name(), t), settle);
            field.setId("known-" + p.name());
            refreshers.add(() -> {
                field.show(model.text(p.name()));
                field.showFault(model.isFaulty(p.name()));
            });
            if (first == grid) {
                first = field;
            }
            var label = Labels.wrapped(p.use());
            label.setLabelFor(field);
            grid.addRow(row++, label, field);
        }
        sentence.setId("suggestion");
        all = new VBox(8, grid, sentence);
    }

    private void type(String name, String text) {
        model.type(name, text);
        update();
    }

    @Override
    public Node node() {
        return all;
    }

    @Override
    public void focus() {
        first.requestFocus();
    }

    @Override
    public void update() {
        model.follow();
        refreshers.forEach(Runnable::run);
        sentence.setText(model.sentence());
    }
}
