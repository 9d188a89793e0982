package dev.leadline.desktop.picker;

import dev.leadline.desktop.working.Field;
import dev.leadline.desktop.working.Fold;
import java.util.function.Consumer;
import java.util.function.Supplier;
import javafx.scene.Node;
import javafx.scene.layout.HBox;
import javafx.scene.layout.VBox;

/// Cut, moved, multiplied: folded away until used.
final class ChangesForm implements Form {
    private final ChangesViewModel model;
    private final Field low;
    private final Field high;
    private final Field shift;
    private final Field scale;
    private final HBox shiftLine;
    private final HBox scaleLine;
    private final Fold fold;

    ChangesForm(ChangesViewModel model) {
        this.model = model;
        low = field("cut-low", "lowest value kept", "Values below are left out; empty: none are", model::low)
                .prompt("-inf");
        high = field("cut-high", "highest value kept", "Values above are left out; empty: none are", model::high)
                .prompt("inf");
        scale = field("change-scale", "factor", "Every value is multiplied by it", model::scale)
                .prompt("1");
        shift = field("change-shift", "shift", "Added to every value, after the factor", model::shift)
                .prompt("0");
        scaleLine = Labels.line(Labels.of("times"), scale);
        shiftLine = Labels.line(Labels.of("plus"), shift);
        var cut = Labels.line(Labels.of("kept from"), low, Labels.of("to"), high);
        var moved = Labels.line(scaleLine, shiftLine);
        fold = new Fold(
                "fold-changes",
                "cut, factor, shift",
                "Leave values out beyond a limit; multiply; add",
                new VBox(6, moved, cut));
    }

    private Field field(String id, String name, String tip, Consumer<String> typed) {
        var field = new Field(name, tip, 6, typed, model.project()::settle);
        field.setId(id);
        return field;
    }

    @Override
    public Node node() {
        return fold;
    }

    @Override
    public void update() {
        show(low, model::lowText, "truncate");
        show(high, model::highText, "truncate");
        show(shift, model::shiftText, "shift");
        show(scale, model::scaleText, "scale");
        Labels.see(shiftLine, !model.isTaken("shift"));
        Labels.see(scaleLine, !model.isTaken("scale"));
        fold.summary(model.summary());
        if (!model.summary().equals("as it is")) {
            fold.open();
        }
    }

    private void show(Field field, Supplier<String> text, String path) {
        field.show(text.get());
        field.showFault(model.isFaulty(path));
    }
}
