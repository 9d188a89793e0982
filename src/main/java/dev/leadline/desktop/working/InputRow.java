package dev.leadline.desktop.working;

import dev.leadline.desktop.style.Styles;
import dev.leadline.model.Draft.From;
import dev.leadline.model.Draft.InputDraft;
import dev.leadline.model.UnitWords;
import java.util.ArrayList;
import java.util.List;
import java.util.OptionalInt;
import java.util.function.Consumer;
import java.util.function.Function;
import javafx.css.PseudoClass;
import javafx.geometry.Pos;
import javafx.scene.Node;
import javafx.scene.control.Button;
import javafx.scene.control.Label;
import javafx.scene.control.OverrunStyle;
import javafx.scene.control.ToggleButton;
import javafx.scene.control.Tooltip;
import javafx.scene.layout.GridPane;
import javafx.scene.layout.HBox;
import javafx.scene.layout.Priority;
import javafx.scene.layout.Region;
import javafx.scene.layout.VBox;

/// A row `name ~ family(parameters) unit` with a drawing of its density; opened, its fields stand below, and its
/// density where the picture was.
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
    private boolean range;
    private Field named;

    InputRow(InputsViewModel model, int index, SketchView sketch) {
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
                model.open(index);
            } else if (model.opened().get().equals(OptionalInt.of(index))) {
                model.close();
            }
            if (index < model.inputs().size()) {
                update();
            }
        });
        model.opened().addListener((_, _, now) -> head.setSelected(now.equals(OptionalInt.of(index))));
        getChildren().addAll(head, messages, body);
    }

    void open() {
        head.setSelected(true);
    }

    boolean isOpen() {
        return head.isSelected();
    }

    void focusHead() {
        head.requestFocus();
    }

    /// For a new row, whose name is but a proposal.
    void focusName() {
        named.requestFocus();
        named.selectAll();
    }

    void update() {
        InputDraft in = model.inputs().get(index);
        name.setText(in.name().isEmpty() ? "?" : in.name());
        summary.setText(InputsViewModel.summary(in.from()));
        unit.setText(UnitWords.after(in.unit()).strip());
        sketch.show(model.project().draft().get(), index, model.project().files());
        head.setAccessibleText("Input " + in.name() + InputsViewModel.summary(in.from()) + " " + in.unit());
        String label = in.label().isEmpty() ? "no label yet" : in.label();
        head.setTooltip(new Tooltip(in.name() + InputsViewModel.summary(in.from()) + "\n" + label));
        var problems = model.project().problemsAt(InputsViewModel.path(index));
        boolean open = in.from() instanceof From.Density(var d) && d.isUnchosen();
        summary.pseudoClassStateChanged(PseudoClass.getPseudoClass("unchosen"), open);
        // while the row is open, what is wrong with its density stands beside the density
        String density = model.densityPath(index);
        messages.show(
                isOpen()
                        ? problems.stream()
                                .filter(p -> !p.place().path().startsWith(density))
                                .toList()
                        : open ? List.of() : problems);
        if (isOpen()) {
            if (range != in.from() instanceof From.Range) {
                build();
            }
            refreshers.forEach(Runnable::run);
        }
    }

    private void build() {
        InputDraft in = model.inputs().get(index);
        range = in.from() instanceof From.Range;
        refreshers.clear();
        body.getChildren().clear();
        var grid = new GridPane(8, 6);
        grid.getStyleClass().add("grid");
        named = field("name", "How formulas call it", 9, ".name", InputDraft::name, t -> model.name(index, t));
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
        if (range) {
            grid.addRow(2, label("range"), line(rangeEnd(true), label("to"), rangeEnd(false)));
        }
        var from = field(
                        "known from",
                        "Where this density comes from: data, certificate, judgement",
                        12,
                        ".provenance",
                        InputDraft::provenance,
                        t -> model.provenance(index, t))
                .growing();
        grid.addRow(3, label("known from"), from);
        var remove = new Button("Remove this input");
        remove.getStyleClass().add(Styles.LINK);
        remove.setTooltip(new Tooltip("Takes the input out of the question; Undo brings it back"));
        remove.setOnAction(_ -> model.remove(index));
        body.getChildren().addAll(grid, remove);
        refreshers.forEach(Runnable::run);
    }

    private Field field(
            String what, String tip, int columns, String path, Function<InputDraft, String> get, Consumer<String> set) {
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
