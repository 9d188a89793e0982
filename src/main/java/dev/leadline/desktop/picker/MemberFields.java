package dev.leadline.desktop.picker;

import dev.leadline.density.Family;
import dev.leadline.density.Parameter;
import dev.leadline.desktop.working.Field;
import java.util.ArrayList;
import java.util.List;
import javafx.scene.control.ComboBox;
import javafx.scene.layout.FlowPane;
import javafx.scene.layout.VBox;

/// The parameters of a member of a family, and the way in which they are entered.
final class MemberFields extends VBox {
    private final MemberViewModel model;
    private final String id;
    private final List<Runnable> refreshers = new ArrayList<>();
    private Shape shape = new Shape("", -1);

    /// What decides which fields there are.
    private record Shape(String family, int entry) {}

    /// @param id prefix of the fields' ids
    MemberFields(MemberViewModel model, String id) {
        super(6);
        this.model = model;
        this.id = id;
    }

    void update() {
        var family = model.family();
        var now = new Shape(family.map(Family::name).orElse(""), model.entry());
        if (!now.equals(shape)) {
            shape = now;
            refreshers.clear();
            getChildren().clear();
            family.ifPresent(this::build);
        }
        refreshers.forEach(Runnable::run);
    }

    private void build(Family family) {
        var entries = family.entries();
        if (entries.size() > 1) {
            var entry = new ComboBox<Integer>();
            entry.setId(id + "-entry");
            entry.setAccessibleText("Entered by");
            entry.setMaxWidth(Double.MAX_VALUE);
            for (int k = 0; k < entries.size(); k++) {
                entry.getItems().add(k);
            }
            entry.setConverter(new EntryWords(entries));
            entry.setValue(shape.entry);
            entry.setOnAction(_ -> {
                if (entry.getValue() != null && entry.getValue() != shape.entry) {
                    model.entry(entry.getValue());
                }
            });
            getChildren().add(entry);
        }
        var flow = new FlowPane(12, 6);
        flow.setPrefWrapLength(230);
        for (Parameter p : entries.get(shape.entry)) {
            var field = new Field(
                    p.name(),
                    p.use() + (p.rule().isEmpty() ? "" : "; must be " + p.rule()),
                    6,
                    t -> model.parameter(p.name(), t),
                    model.project()::settle);
            field.setId(id + "-" + p.name());
            if (p.optional()) {
                field.prompt("optional");
            }
            refreshers.add(() -> {
                field.show(model.parameterText(p.name()));
                field.showFault(model.isFaulty(p.name()));
            });
            flow.getChildren().add(Labels.line(Labels.of(p.name()), field));
        }
        getChildren().add(flow);
    }
}
