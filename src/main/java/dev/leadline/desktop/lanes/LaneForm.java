package dev.leadline.desktop.lanes;

import dev.leadline.desktop.lanes.LanesViewModel.Known;
import dev.leadline.desktop.lanes.LanesViewModel.Source;
import dev.leadline.desktop.lanes.LanesViewModel.Sources;
import dev.leadline.desktop.style.Styles;
import dev.leadline.desktop.working.Field;
import dev.leadline.desktop.working.Messages;
import dev.leadline.model.DensityWords;
import dev.leadline.model.LaneDraft.Other;
import dev.leadline.model.Layouts;
import java.util.ArrayList;
import java.util.List;
import java.util.function.BiConsumer;
import java.util.function.Consumer;
import javafx.geometry.Pos;
import javafx.scene.Node;
import javafx.scene.control.Button;
import javafx.scene.control.CheckBox;
import javafx.scene.control.ComboBox;
import javafx.scene.control.Label;
import javafx.scene.control.MenuButton;
import javafx.scene.control.MenuItem;
import javafx.scene.control.Tooltip;
import javafx.scene.layout.FlowPane;
import javafx.scene.layout.HBox;
import javafx.scene.layout.Region;
import javafx.scene.layout.VBox;

/// How a lane samples, edited in place: its name, its points, what inputs are drawn from, control variates.
///
/// Built anew where a choice asks for other fields, else its fields are told what the draft says.
final class LaneForm extends VBox {
    private static final List<String> COUNTS = List.of("replicates", "cube", "particles", "repetitions");

    private final LanesViewModel model;
    private final BiConsumer<Integer, String> openDensity;
    private final List<Runnable> updates = new ArrayList<>();
    private final Messages messages = new Messages();
    private List<Object> key = List.of();
    private boolean showing;

    /// @param openDensity the density that an input is drawn from in a lane
    LaneForm(LanesViewModel model, BiConsumer<Integer, String> openDensity) {
        this.model = model;
        this.openDensity = openDensity;
        getStyleClass().add("lane-form");
        setId("lane-form");
    }

    void update() {
        int i = model.selected().get();
        if (!model.open().get()) {
            return;
        }
        var now = keyOf(i);
        if (!now.equals(key)) {
            key = now;
            build(i);
        }
        showing = true;
        updates.forEach(Runnable::run);
        showing = false;
        messages.show(model.problems(i));
    }

    /// What decides which fields there are.
    private List<Object> keyOf(int i) {
        var lane = model.lane(i);
        return List.of(
                i,
                lane.points(),
                model.sources(i),
                model.isWeighted(i),
                model.isAuditable(i),
                model.inputs(),
                model.drawnElsewhere(i),
                model.drawnElsewhere(i).stream()
                        .map(input -> Source.of(model.other(i, input)))
                        .toList(),
                lane.controls().stream().map(c -> Known.of(c.mean())).toList());
    }

    private void build(int i) {
        updates.clear();
        getChildren().clear();
        getChildren().addAll(points(i), use(i));
        Layouts.takes(model.lane(i).points()).stream()
                .filter("cells"::equals)
                .forEach(_ -> getChildren().add(cells(i)));
        getChildren().addAll(drawFrom(i), controls(i), messages);
    }

    // ---- points

    private Node points(int i) {
        var name = field("lane-name", "name of the lane", "1 to 20 letters or digits", 4, text -> model.name(i, text));
        updates.add(() -> name.show(model.lane(i).name()));
        fault(name, LanesViewModel.path(i) + ".name");
        var points = choice("lane-points", "layout of the points", Layouts.words(), word -> model.points(i, word));
        updates.add(() -> points.setValue(model.lane(i).points()));
        var line = flow(label("lane"), name, label("points"), points);
        var takes = Layouts.takes(model.lane(i).points());
        for (String word : COUNTS) {
            if (takes.contains(word)) {
                var count = field("lane-" + word, word, tip(word), 5, text -> model.count(i, word, text))
                        .prompt("usual");
                updates.add(() -> count.show(model.countText(i, word)));
                fault(count, LanesViewModel.path(i) + "." + word);
                line.getChildren().add(pair(word, count));
            }
        }
        if (takes.contains("scrambling")) {
            var scrambling = choice(
                    "lane-scrambling",
                    "scrambling",
                    List.of("nested", "digital-shift"),
                    word -> model.scrambling(i, word));
            updates.add(() -> scrambling.setValue(model.scramblingWord(i)));
            line.getChildren().add(pair("scrambling", scrambling));
        }
        var copy =
                link("duplicate-lane", "duplicate", "Another lane that samples as this one", () -> model.duplicate(i));
        var remove = link("remove-lane", "remove", "Removes the lane; Undo brings it back", () -> model.remove(i));
        updates.add(() -> {
            copy.setDisable(!model.canAdd());
            remove.setDisable(model.lanes().size() == 1);
        });
        line.getChildren().addAll(copy, remove);
        return line;
    }

    private static String tip(String word) {
        return switch (word) {
            case "replicates" -> "Independent repetitions of the points; the error is judged by how far they differ";
            case "cube" -> "Points of one Latin hypercube; empty leaves it to the number of draws";
            case "particles" -> "Copies that climb together; more make a repetition surer and longer";
            default -> "Independent climbs; the error is judged by how far they differ";
        };
    }

    private Node use(int i) {
        var use = quiet("");
        updates.add(() -> use.setText(PointsUse.of(model.lane(i).points())));
        return use;
    }

    private Node cells(int i) {
        var line = flow(label("cells of"));
        for (String input : model.inputs()) {
            var cells = field(
                            "cells-" + input,
                            "cells of " + input,
                            "Parts of the range of " + input + ", drawn equally often; empty: not cut",
                            3,
                            text -> model.cells(i, input, text))
                    .prompt("1");
            updates.add(() -> cells.show(model.cellsText(i, input)));
            fault(cells, LanesViewModel.path(i) + ".cells." + input);
            line.getChildren().add(pair(input, cells));
        }
        var allocation = choice(
                "lane-allocation",
                "draws shared equally, or by a pilot: more in cells where outcomes vary more",
                Layouts.allocations(),
                word -> model.allocation(i, word));
        updates.add(() -> allocation.setValue(model.allocationWord(i)));
        line.getChildren().add(pair("allocation", allocation));
        return line;
    }

    // ---- what inputs are drawn from

    private Node drawFrom(int i) {
        var box = new VBox(4);
        var sources = choice(
                "lane-sources",
                "what inputs are drawn from",
                List.of(Sources.values()),
                chosen -> model.sources(i, chosen));
        updates.add(() -> sources.setValue(model.sources(i)));
        var line = flow(label("draw from"), sources);
        if (model.isWeighted(i)) {
            var share = field(
                            "nominal-share",
                            "nominal share",
                            "Part of the draws from the inputs' own densities, which keeps weights small",
                            4,
                            text -> model.nominalShare(i, text))
                    .prompt("0.1");
            updates.add(() -> share.show(model.nominalShareText(i)));
            fault(share, LanesViewModel.path(i) + ".nominalShare");
            line.getChildren().add(pair("nominal share", share));
            if (model.sources(i) == Sources.STATED) {
                var self = new CheckBox("self-normalised");
                self.setId("self-normalised");
                self.setTooltip(new Tooltip("Divides by the mean of the weights: for densities known up to a factor;"
                        + " slightly biased"));
                self.setOnAction(_ -> told(() -> model.selfNormalised(i, self.isSelected())));
                updates.add(() -> self.setSelected(model.lane(i).selfNormalised()));
                line.getChildren().add(self);
            }
        }
        if (model.isAuditable(i)) {
            var audit = field(
                            "lane-audit",
                            "draws of the audit",
                            "Independent draws from the inputs' own densities that the answer is compared with; they"
                                    + " enter no interval",
                            7,
                            text -> model.audit(i, text))
                    .prompt("none");
            updates.add(() -> audit.show(model.auditText(i)));
            fault(audit, LanesViewModel.path(i) + ".audit");
            line.getChildren().add(pair("audit draws", audit));
        }
        box.getChildren().add(line);
        if (model.sources(i) == Sources.STATED) {
            line.getChildren().add(elsewhere(i));
            model.drawnElsewhere(i).forEach(input -> box.getChildren().add(source(i, input)));
        }
        return box;
    }

    /// The inputs that are still drawn from their own densities.
    private Node elsewhere(int i) {
        var menu = new MenuButton("+ input");
        menu.setId("draw-elsewhere");
        menu.getStyleClass().add("small-menu");
        menu.setMinWidth(USE_PREF_SIZE);
        menu.setTooltip(new Tooltip("An input to draw from another density than its own"));
        var drawn = model.drawnElsewhere(i);
        for (String input : model.inputs()) {
            if (!drawn.contains(input)) {
                var item = new MenuItem(input);
                item.setOnAction(_ -> choose(i, input, Source.ANOTHER));
                menu.getItems().add(item);
            }
        }
        menu.setDisable(menu.getItems().isEmpty());
        return menu;
    }

    private Node source(int i, String input) {
        var name = new Label(input);
        name.getStyleClass().addAll(Styles.MATHS, "word-input");
        name.setMinWidth(Region.USE_PREF_SIZE);
        var sources = choice(
                "source-" + input,
                "what " + input + " is drawn from",
                List.of(Source.values()),
                chosen -> choose(i, input, chosen));
        updates.add(() -> sources.setValue(Source.of(model.other(i, input))));
        var line = new HBox(5, name, sources);
        line.setAlignment(Pos.CENTER_LEFT);
        switch (Source.of(model.other(i, input))) {
            case OWN, ADAPT -> {}
            case ANOTHER -> {
                var open = link("density-of-" + input, "", "Opens the density", () -> openDensity.accept(i, input));
                updates.add(() -> model.other(i, input)
                        .filter(Other.Another.class::isInstance)
                        .map(o -> ((Other.Another) o).density())
                        .ifPresent(d -> open.setText(d.isUnchosen() ? "choose" : DensityWords.of(d))));
                line.getChildren().add(open);
            }
            case SHIFT, WIDEN, TILT -> {
                var by = field("amount-" + input, "by how much", "A number", 5, text -> model.amount(i, input, text));
                updates.add(() -> by.show(model.amountText(i, input)));
                fault(by, LanesViewModel.otherPath(i, input));
                line.getChildren().add(by);
            }
        }
        return line;
    }

    private void choose(int i, String input, Source source) {
        model.source(i, input, source);
        if (source == Source.ANOTHER) {
            openDensity.accept(i, input);
        }
    }

    // ---- control variates

    private Node controls(int i) {
        var box = new VBox(4);
        var add = link(
                "add-control",
                "+ control variate",
                "A formula whose mean is known: what its draws miss tells" + " what the outcome's miss",
                () -> model.addControl(i));
        box.getChildren().add(flow(label("control variates"), add));
        for (int c = 0; c < model.lane(i).controls().size(); c++) {
            box.getChildren().add(control(i, c));
        }
        return box;
    }

    private Node control(int i, int c) {
        var formula = field(
                "control-" + c,
                "formula of the control variate",
                "A formula of inputs and steps",
                14,
                text -> model.controlFormula(i, c, text));
        formula.getStyleClass().add(Styles.MATHS);
        updates.add(() -> formula.show(
                c < model.lane(i).controls().size()
                        ? model.lane(i).controls().get(c).formula()
                        : ""));
        fault(formula, LanesViewModel.controlPath(i, c) + ".formula");
        var known = choice(
                "control-mean-" + c,
                "how its mean is known",
                List.of(Known.values()),
                chosen -> model.controlMean(i, c, chosen));
        var mean = Known.of(model.lane(i).controls().get(c).mean());
        updates.add(() -> known.setValue(mean));
        var line = new HBox(6, formula, label("its mean"), known);
        line.setAlignment(Pos.CENTER_LEFT);
        if (mean == Known.STATED) {
            var value = field("control-value-" + c, "its mean", "A number", 7, text -> model.controlValue(i, c, text));
            updates.add(() -> value.show(model.controlValueText(i, c)));
            fault(value, LanesViewModel.controlPath(i, c) + ".mean");
            line.getChildren().add(value);
        }
        var remove = link(
                "remove-control-" + c, "\u00d7", "Removes it; Undo brings it back", () -> model.removeControl(i, c));
        line.getChildren().add(remove);
        return line;
    }

    // ---- parts

    private Field field(String id, String name, String tip, int columns, Consumer<String> typed) {
        var field = new Field(name, tip, columns, typed, model.project()::settle);
        field.setId(id);
        return field;
    }

    private void fault(Field field, String path) {
        updates.add(() -> field.showFault(!model.project().problemsAt(path).isEmpty()));
    }

    private <T> ComboBox<T> choice(String id, String name, List<T> all, Consumer<T> chosen) {
        var box = new ComboBox<T>();
        box.setId(id);
        box.getItems().setAll(all);
        box.setAccessibleText(name);
        box.setTooltip(new Tooltip(name));
        box.setMinWidth(USE_PREF_SIZE);
        box.setOnAction(_ -> told(() -> {
            if (box.getValue() != null) {
                chosen.accept(box.getValue());
            }
        }));
        return box;
    }

    private void told(Runnable action) {
        if (!showing) {
            action.run();
        }
    }

    private static Button link(String id, String text, String tip, Runnable action) {
        var button = new Button(text);
        button.setId(id);
        button.getStyleClass().setAll("button", Styles.LINK);
        button.setMinWidth(USE_PREF_SIZE);
        button.setTooltip(new Tooltip(tip));
        button.setOnAction(_ -> action.run());
        return button;
    }

    private static FlowPane flow(Node... nodes) {
        var flow = new FlowPane(8, 4, nodes);
        flow.setRowValignment(javafx.geometry.VPos.CENTER);
        flow.setPrefWrapLength(520);
        return flow;
    }

    private static HBox pair(String before, Node node) {
        var box = new HBox(5, label(before), node);
        box.setAlignment(Pos.CENTER_LEFT);
        return box;
    }

    private static Label label(String text) {
        var label = new Label(text);
        label.getStyleClass().add(Styles.FIELD_LABEL);
        label.setMinWidth(USE_PREF_SIZE);
        return label;
    }

    private static Label quiet(String text) {
        var label = new Label(text);
        label.getStyleClass().add(Styles.QUIET);
        label.setWrapText(true);
        label.setMinHeight(USE_PREF_SIZE);
        return label;
    }
}
