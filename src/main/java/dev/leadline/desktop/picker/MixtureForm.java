package dev.leadline.desktop.picker;

import dev.leadline.density.Catalogue;
import dev.leadline.density.Family;
import dev.leadline.desktop.style.Styles;
import dev.leadline.desktop.working.Field;
import dev.leadline.model.DensityDraft;
import dev.leadline.model.DensityWords;
import java.util.ArrayList;
import java.util.List;
import javafx.scene.Node;
import javafx.scene.control.Button;
import javafx.scene.control.ComboBox;
import javafx.scene.control.Label;
import javafx.scene.control.Tooltip;
import javafx.scene.layout.VBox;

/// Parts with their weights, each a member of a family.
final class MixtureForm implements Form {
    private final MixtureViewModel model;
    private final VBox rows = new VBox(10);
    private final List<PartRow> shown = new ArrayList<>();
    private final VBox start;
    private final VBox all;
    private final Button add;

    MixtureForm(MixtureViewModel model) {
        this.model = model;
        var split = new Button("Make it the first of two parts");
        split.setId("split");
        split.getStyleClass().add("small");
        split.setOnAction(_ -> model.split());
        start = new VBox(
                6,
                Labels.wrapped("Values come now from one part, now from another: ordinary days and storms, two"
                        + " suppliers, a gross error now and then. Weights count against one another."),
                split);
        add = Labels.link("+ part", "Another part", model::add);
        add.setId("add-part");
        all = new VBox(8, start, rows, add);
    }

    @Override
    public Node node() {
        return all;
    }

    @Override
    public void update() {
        int parts = model.parts().size();
        Labels.see(start, !model.isMixture());
        Labels.see(add, model.isMixture());
        while (shown.size() > parts) {
            rows.getChildren().remove(shown.removeLast());
        }
        while (shown.size() < parts) {
            shown.add(new PartRow(shown.size()));
            rows.getChildren().add(shown.getLast());
        }
        shown.forEach(PartRow::update);
    }

    private final class PartRow extends VBox {
        private final int index;
        private final Field weight;
        private final ComboBox<String> family = new ComboBox<>();
        private final MemberViewModel member;
        private final MemberFields fields;
        private final Label other = new Label();
        private boolean showing;

        PartRow(int index) {
            super(4);
            this.index = index;
            getStyleClass().add("part");
            member = new MemberViewModel(model.part(index));
            fields = new MemberFields(member, "part-" + index);
            weight = new Field(
                    "weight of part " + (index + 1),
                    "How often values come from this part, against the others",
                    4,
                    t -> model.weight(index, t),
                    model.project()::settle);
            weight.setId("weight-" + index);
            family.setId("part-family-" + index);
            family.setAccessibleText("Family of part " + (index + 1));
            family.setPromptText("choose a family");
            family.getItems()
                    .setAll(Catalogue.families().stream().map(Family::name).toList());
            family.setCellFactory(_ -> new FamilyCell());
            family.setVisibleRowCount(12);
            family.setMinWidth(60);
            family.setOnAction(_ -> {
                if (!showing && family.getValue() != null) {
                    member.family(family.getValue());
                }
            });
            var remove = new Button("\u00d7");
            remove.getStyleClass().addAll(Styles.LINK, "remove");
            remove.setAccessibleText("Remove part " + (index + 1));
            remove.setTooltip(new Tooltip("Takes this part out; Undo brings it back"));
            remove.setOnAction(_ -> model.remove(index));
            other.getStyleClass().add(Styles.QUIET);
            other.setWrapText(true);
            getChildren().addAll(Labels.line(weight, Labels.of("\u00d7"), family, remove), other, fields);
        }

        void update() {
            weight.show(model.weightText(index));
            weight.showFault(model.isWeightFaulty(index));
            DensityDraft density = model.parts().get(index).density();
            boolean plain = density.member().isPresent()
                    && density.shift().isEmpty()
                    && density.scale().isEmpty()
                    && density.truncate().isEmpty();
            showing = true;
            family.setValue(density.member()
                    .map(m -> m.family())
                    .filter(f -> !f.isEmpty())
                    .orElse(null));
            showing = false;
            Labels.see(other, !plain);
            other.setText(plain ? "" : DensityWords.of(density));
            fields.update();
        }
    }
}
