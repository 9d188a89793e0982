package dev.leadline.desktop.working;

import dev.leadline.density.Catalogue;
import dev.leadline.density.Family;
import dev.leadline.density.Parameter;
import dev.leadline.desktop.style.Styles;
import dev.leadline.model.DensityDraft;
import dev.leadline.model.Draft.From;
import dev.leadline.model.Draft.InputDraft;
import dev.leadline.model.UnitWords;
import java.util.ArrayList;
import java.util.List;
import java.util.Objects;
import java.util.function.Consumer;
import javafx.css.PseudoClass;
import javafx.geometry.Pos;
import javafx.scene.Node;
import javafx.scene.control.Button;
import javafx.scene.control.ComboBox;
import javafx.scene.control.Label;
import javafx.scene.control.OverrunStyle;
import javafx.scene.control.ToggleButton;
import javafx.scene.control.Tooltip;
import javafx.scene.layout.FlowPane;
import javafx.scene.layout.GridPane;
import javafx.scene.layout.HBox;
import javafx.scene.layout.Priority;
import javafx.scene.layout.Region;
import javafx.scene.layout.VBox;

/// A row `name ~ family(parameters) unit` with a drawing of its density; opened, its fields stand below.
final class InputRow extends VBox {
    private final InputsViewModel model;
    private final int index;
    private final ToggleButton head = new ToggleButton();
    private final Label name = new Label();
    private final Label summary = new Label();
    private final Label unit = new Label();
    private final SketchView sketch;
    private final Messages messages = new Messages();
    private final VBox body = new VBox(6);
    private final List<Runnable> refreshers = new ArrayList<>();
    private Shape shape = new Shape(false, false, "", -1);

    /// What decides which fields there are.
    private record Shape(boolean range, boolean drawn, String family, int entry) {}

    InputRow(InputsViewModel model, int index, SketchView sketch, Consumer<InputRow> opened) {
        this.model = model;
        this.index = index;
        this.sketch = sketch;
        getStyleClass().add(Styles.ROW);
        name.getStyleClass().addAll(Styles.MATHS, "word-input");
        name.setMinWidth(Region.USE_PREF_SIZE);
        summary.getStyleClass().add(Styles.MATHS);
        summary.setTextOverrun(OverrunStyle.ELLIPSIS);
        summary.setMinWidth(0);
        unit.getStyleClass().add(Styles.QUIET);
        unit.setMinWidth(44);
        unit.setPrefWidth(44);
        var gap = new Region();
        HBox.setHgrow(gap, Priority.ALWAYS);
        var line = new HBox(name, summary, gap, sketch, unit);
        line.setAlignment(Pos.CENTER_LEFT);
        line.getStyleClass().add("line");
        head.setGraphic(line);
        head.getStyleClass().setAll(Styles.ROW_HEAD);
        head.setId("input-" + index);
        head.setMaxWidth(Double.MAX_VALUE);
        line.prefWidthProperty().bind(head.widthProperty().subtract(12));
        body.getStyleClass().add("body");
        body.visibleProperty().bind(head.selectedProperty());
        body.managedProperty().bind(head.selectedProperty());
        head.selectedProperty().addListener((_, _, open) -> {
            if (open) {
                build();
                opened.accept(this);
            }
        });
        getChildren().addAll(head, messages, body);
    }

    void open() {
        head.setSelected(true);
    }

    void close() {
        head.setSelected(false);
    }

    boolean isOpen() {
        return head.isSelected();
    }

    void focusHead() {
        head.requestFocus();
    }

    void update() {
        InputDraft in = model.inputs().get(index);
        name.setText(in.name().isEmpty() ? "?" : in.name());
        summary.setText(InputsViewModel.summary(in.from()));
        unit.setText(UnitWords.after(in.unit()).strip());
        sketch.show(in.from());
        head.setAccessibleText("Input " + in.name() + InputsViewModel.summary(in.from()) + " " + in.unit());
        String label = in.label().isEmpty() ? "no label yet" : in.label();
        head.setTooltip(new Tooltip(in.name() + InputsViewModel.summary(in.from()) + "\n" + label));
        var problems = model.project().problemsAt(InputsViewModel.path(index));
        boolean open = in.from() instanceof From.Density(var d) && d.isUnchosen();
        summary.pseudoClassStateChanged(PseudoClass.getPseudoClass("unchosen"), open);
        messages.show(open && !isOpen() ? List.of() : problems);
        if (isOpen()) {
            if (!shapeOf(in).equals(shape)) {
                build();
            }
            refreshers.forEach(Runnable::run);
        }
    }

    private Shape shapeOf(InputDraft in) {
        boolean range = in.from() instanceof From.Range;
        var density = InputsViewModel.densityOf(in.from());
        return new Shape(
                range,
                density.isPresent() || InputsViewModel.isUnbounded(in.from()),
                density.map(DensityDraft::kind).orElse(""),
                model.entryOf(index));
    }

    private void build() {
        InputDraft in = model.inputs().get(index);
        shape = shapeOf(in);
        refreshers.clear();
        body.getChildren().clear();
        var grid = new GridPane(8, 6);
        grid.getStyleClass().add("grid");
        var named = field("name", "How formulas call it", 9, ".name", InputDraft::name, t -> model.name(index, t));
        var united =
                field("unit", "Its unit, as m/s; 1 for none", 7, ".unit", InputDraft::unit, t -> model.unit(index, t));
        grid.addRow(0, label("name"), line(named, label("unit"), united));
        var labelled = field(
                        "label",
                        "What it is, in a few words",
                        12,
                        ".label",
                        InputDraft::label,
                        t -> model.label(index, t))
                .growing();
        grid.addRow(1, label("is"), labelled);
        GridPane.setHgrow(labelled, Priority.ALWAYS);
        if (shape.range) {
            grid.addRow(2, label("range"), line(rangeEnd(true), label("to"), rangeEnd(false)));
        }
        if (!shape.range || shape.drawn) {
            grid.addRow(3, label(shape.range ? "drawn from" : "density"), families());
            Catalogue.family(shape.family).ifPresent(f -> grid.addRow(4, label(""), parameters(f)));
        }
        var from = field(
                        "known from",
                        "Where this density comes from: data, certificate, judgement",
                        12,
                        ".provenance",
                        InputDraft::provenance,
                        t -> model.provenance(index, t))
                .growing();
        grid.addRow(5, label("known from"), from);
        var remove = new Button("Remove this input");
        remove.getStyleClass().add(Styles.LINK);
        remove.setTooltip(new Tooltip("Takes the input out of the question; Undo brings it back"));
        remove.setOnAction(_ -> model.remove(index));
        body.getChildren().addAll(grid, remove);
        refreshers.forEach(Runnable::run);
    }

    private Field field(
            String what,
            String tip,
            int columns,
            String path,
            java.util.function.Function<InputDraft, String> get,
            Consumer<String> set) {
        var field = new Field(what + " of the input", tip, columns, set, model.project()::settle);
        refreshers.add(() -> {
            field.show(get.apply(model.inputs().get(index)));
            field.showFault(faulty(path));
        });
        return field;
    }

    private Field rangeEnd(boolean low) {
        var field = new Field(
                low ? "lower end" : "upper end",
                "A number, or " + (low ? "-inf" : "inf"),
                8,
                t -> model.rangeEnd(index, low, t),
                model.project()::settle);
        refreshers.add(() -> {
            field.show(model.rangeText(index, low));
            field.showFault(faulty(".range[" + (low ? 0 : 1) + "]"));
        });
        return field;
    }

    private Node families() {
        var choice = new ComboBox<String>();
        choice.setId("family-" + index);
        choice.setAccessibleText("Family of the density");
        choice.setPromptText("choose a family");
        choice.getItems().setAll(Catalogue.families().stream().map(Family::name).toList());
        choice.setValue(shape.family.isEmpty() ? null : shape.family);
        choice.setVisibleRowCount(14);
        choice.setCellFactory(_ -> new FamilyCell());
        choice.setOnAction(_ -> {
            if (choice.getValue() != null && !Objects.equals(choice.getValue(), shape.family)) {
                model.family(index, choice.getValue());
            }
        });
        var use = new Label(Catalogue.family(shape.family).map(Family::use).orElse("what is known about it?"));
        use.getStyleClass().add(Styles.QUIET);
        use.setWrapText(true);
        use.setMinHeight(Region.USE_PREF_SIZE);
        use.setMaxWidth(250);
        return new VBox(3, choice, use);
    }

    private Node parameters(Family family) {
        var flow = new FlowPane(10, 6);
        flow.setPrefWrapLength(240);
        var entries = family.entries();
        if (entries.size() > 1) {
            var entry = new ComboBox<Integer>();
            entry.setAccessibleText("Entered by");
            for (int k = 0; k < entries.size(); k++) {
                entry.getItems().add(k);
            }
            entry.setConverter(new EntryWords(entries));
            entry.setValue(shape.entry);
            entry.setOnAction(_ -> {
                if (entry.getValue() != shape.entry) {
                    model.entry(index, entry.getValue());
                }
            });
            flow.getChildren().add(entry);
        }
        for (Parameter p : entries.get(shape.entry)) {
            var rule = p.rule().isEmpty() ? "" : "; must be " + p.rule();
            var field = new Field(
                    p.name(), p.use() + rule, 6, t -> model.parameter(index, p.name(), t), model.project()::settle);
            field.setId("parameter-" + index + "-" + p.name());
            if (p.optional()) {
                field.prompt("optional");
            }
            refreshers.add(() -> {
                field.show(model.parameterText(index, p.name()));
                field.showFault(!model.project()
                        .problemsAt(model.densityPath(index) + "." + p.name())
                        .isEmpty());
            });
            var pair = new HBox(5, label(p.name()), field);
            pair.setAlignment(Pos.CENTER_LEFT);
            flow.getChildren().add(pair);
        }
        return flow;
    }

    private boolean faulty(String path) {
        return !model.project().problemsAt(InputsViewModel.path(index) + path).isEmpty();
    }

    private static HBox line(Node... nodes) {
        var line = new HBox(8, nodes);
        line.setAlignment(Pos.CENTER_LEFT);
        return line;
    }

    private static Label label(String text) {
        var label = new Label(text);
        label.getStyleClass().add(Styles.FIELD_LABEL);
        label.setMinWidth(Region.USE_PREF_SIZE);
        return label;
    }
}
