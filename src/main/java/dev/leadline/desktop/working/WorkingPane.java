package dev.leadline.desktop.working;

import dev.leadline.desktop.style.Styles;
import dev.leadline.model.Draft;
import dev.leadline.problem.Problem;
import java.util.ArrayList;
import java.util.List;
import java.util.function.IntFunction;
import java.util.function.Supplier;
import javafx.scene.Node;
import javafx.scene.control.Button;
import javafx.scene.control.Label;
import javafx.scene.control.ScrollPane;
import javafx.scene.control.Tooltip;
import javafx.scene.layout.BorderPane;
import javafx.scene.layout.HBox;
import javafx.scene.layout.Priority;
import javafx.scene.layout.Region;
import javafx.scene.layout.VBox;

/// The left of the window: formulas, inputs, constants, and what is asked of the answer.
public final class WorkingPane extends BorderPane {
    private final ProjectViewModel project;
    private final FormulasViewModel formulas;
    private final FormulaArea steps = new FormulaArea("Steps, one formula to a line", 2, true);
    private final Messages stepMessages = new Messages();
    private final Messages generalMessages = new Messages();
    private final VBox askRows = new VBox(8);
    private final VBox inputRows = new VBox();
    private final VBox constantRows = new VBox();
    private final List<AskRow> asks = new ArrayList<>();
    private final List<InputRow> rows = new ArrayList<>();
    private final List<ConstantRow> constants = new ArrayList<>();
    private final InputsViewModel inputsModel;
    private final ConstantsViewModel constantsModel;
    private final Supplier<SketchView> sketches;
    private final TiedView tied;
    private final DemandsView demands;
    private final ReferenceView reference;
    private final LookView look;
    private final AboutView about;
    private final ScrollPane scroll;
    private final Button unknown;

    public WorkingPane(
            ProjectViewModel project,
            InputsViewModel inputs,
            AchievedViewModel achieved,
            ReferenceViewModel referenceModel,
            LookViewModel lookModel,
            Supplier<SketchView> sketches) {
        this.project = project;
        this.sketches = sketches;
        inputsModel = inputs;
        constantsModel = new ConstantsViewModel(project);
        formulas = new FormulasViewModel(project, inputsModel);
        tied = new TiedView(new TiedViewModel(project), achieved);
        demands = new DemandsView(new DemandsViewModel(project));
        reference = new ReferenceView(referenceModel);
        look = new LookView(lookModel);
        about = new AboutView(project);
        getStyleClass().addAll(Styles.PANE, "working");

        steps.setId("steps");
        steps.prompt("name = formula   # unit");
        steps.onTyped(formulas::typeSteps);
        steps.onPasted(formulas::makeInputsOfUnknownNames);
        steps.focusedProperty().addListener((_, _, focused) -> {
            if (!focused) {
                project.settle();
            }
        });

        var moreAsks = link("+ answer", "Asks for another answer from the same draws", formulas::addAsk);
        moreAsks.setId("add-ask");
        unknown = link("", "Adds a row for each, its density still to be chosen", formulas::makeInputsOfUnknownNames);
        unknown.setId("make-inputs");
        unknown.setMinWidth(0);
        unknown.setWrapText(true);
        var addInput = link(
                "+ random input", "A named variable with a density", () -> openNew(inputsModel.addRandom(fresh("x"))));
        addInput.setId("add-input");
        var addRange = link(
                "+ integration variable",
                "A variable with a range; legal under an integral",
                () -> openNew(inputsModel.addRange(fresh("x"))));
        addRange.setId("add-range");
        var addConstant = link("+ constant", "A named number with its unit", () -> {
            int row = constantsModel.add(fresh("c"));
            constants.get(row).focusName();
        });
        addConstant.setId("add-constant");

        var folds = new VBox(tied.fold(), demands.folds(), reference.fold(), look.fold(), about.fold());
        folds.getStyleClass().add("folds");
        var content = new VBox(
                section("steps", new Label()),
                steps,
                stepMessages,
                section("asked", moreAsks),
                askRows,
                unknown,
                generalMessages,
                section("inputs", addInput, addRange),
                inputRows,
                section("constants", addConstant),
                constantRows,
                folds);
        content.getStyleClass().add("content");
        scroll = new ScrollPane(content);
        scroll.setFitToWidth(true);
        scroll.setHbarPolicy(ScrollPane.ScrollBarPolicy.NEVER);
        setCenter(scroll);

        project.draft().addListener((_, _, _) -> update());
        project.problems().addListener((_, _, _) -> update());
        formulas.stepsText().addListener((_, _, _) -> paintSteps());
        update();
    }

    public void focusFormula() {
        reveal(askRows);
        asks.getFirst().focusFormula();
    }

    public void focusLevel() {
        reveal(askRows);
        asks.stream().filter(AskRow::hasLevel).findFirst().ifPresent(AskRow::focusLevel);
    }

    public void focusUnit() {
        reveal(askRows);
        asks.getFirst().focusUnit();
    }

    public void focusInputs() {
        reveal(inputRows);
        if (!rows.isEmpty()) {
            rows.getFirst().focusHead();
        }
    }

    public void focusTolerance() {
        demands.openTolerance();
        reveal(demands.folds());
    }

    public void openReference() {
        reference.open();
        reveal(reference.fold());
    }

    /// @param draw its index
    public void openLookAt(long draw) {
        openLook();
        look.show(draw);
    }

    public void openLook() {
        look.open();
        reveal(look.fold());
    }

    public void openAbout() {
        about.open();
        reveal(about.fold());
    }

    private void update() {
        Draft d = project.draft().get();
        refill(asks, askRows, d.asks().size(), i -> new AskRow(formulas, i));
        refill(rows, inputRows, d.inputs().size(), i -> new InputRow(inputsModel, i, sketches.get()));
        refill(constants, constantRows, d.constants().size(), i -> new ConstantRow(constantsModel, i));
        var colouring = Colouring.of(d);
        asks.forEach(row -> row.update(colouring));
        rows.forEach(InputRow::update);
        tied.update();
        constants.forEach(ConstantRow::update);
        demands.update();
        reference.update();
        about.update();
        paintSteps();
        generalMessages.show(unplaced());
        var names = formulas.unknownNames();
        unknown.setText((names.size() == 1 ? "make an input of " : "make inputs of ") + String.join(", ", names));
        unknown.setVisible(!names.isEmpty());
        unknown.setManaged(!names.isEmpty());
    }

    private void paintSteps() {
        String text = formulas.stepsText().get();
        steps.show(text);
        var faults = formulas.stepFaults();
        var marks = new ArrayList<int[]>();
        var lines = text.split("\n", -1);
        int start = 0;
        for (int line = 0; line < lines.length; line++) {
            for (var f : faults) {
                if (f.line() == line && f.problem().place().span().isPresent()) {
                    marks.add(new int[] {start + f.from(), start + f.to()});
                }
            }
            start += lines[line].length() + 1;
        }
        steps.paint(Colouring.of(project.draft().get()).of(text), marks);
        stepMessages.showIn(faults, text);
    }

    /// Problems that no field and no formula shows; none while nothing was written yet.
    private List<Problem> unplaced() {
        var d = project.draft().get();
        if (d.steps().isEmpty() && d.formulas().stream().allMatch(String::isBlank)) {
            return List.of();
        }
        return project.problems().get().stream()
                .filter(p -> !p.place().path().startsWith("$.lanes")) // stand with their lane
                .filter(p -> !(p.place().path().equals("$.inputs")
                        && !formulas.unknownNames().isEmpty()))
                .filter(p -> !FormulasViewModel.isInFormulas(p.place())
                        && !p.place().path().matches("\\$\\.(inputs|constants)\\[.*")
                        && !p.place()
                                .path()
                                .matches("\\$\\.(tolerance|confidence|interval|bounds|stop|reference|dependence).*"))
                .toList();
    }

    private static <R extends Node> void refill(List<R> rows, VBox box, int size, IntFunction<R> row) {
        while (rows.size() > size) {
            box.getChildren().remove(rows.removeLast());
        }
        while (rows.size() < size) {
            rows.add(row.apply(rows.size()));
            box.getChildren().add(rows.getLast());
        }
    }

    private void openNew(int row) {
        rows.get(row).open();
        rows.get(row).focusName();
        revealWhole(rows.get(row));
    }

    /// A name that nothing has yet.
    private String fresh(String stem) {
        var known = InputsViewModel.known(project.draft().get());
        String name = stem;
        for (int i = 1; known.contains(name); i++) {
            name = stem + i;
        }
        return name;
    }

    private void reveal(Node node) {
        scroll.applyCss();
        scroll.layout();
        var content = scroll.getContent();
        double hidden = content.getLayoutBounds().getHeight()
                - scroll.getViewportBounds().getHeight();
        if (hidden > 0) {
            double y = content.sceneToLocal(node.localToScene(0, 0)).getY();
            scroll.setVvalue(Math.clamp((y - 24) / hidden, 0, 1));
        }
    }

    /// Scrolls only where a part of the node is out of sight.
    private void revealWhole(Node node) {
        scroll.applyCss();
        scroll.layout();
        var shown = scroll.sceneToLocal(node.localToScene(node.getLayoutBounds()));
        if (shown.getMinY() < 0 || shown.getMaxY() > scroll.getHeight()) {
            reveal(node);
        }
    }

    private static Node section(String title, Node... actions) {
        var label = new Label(title);
        label.setMinWidth(USE_PREF_SIZE);
        var rule = new Region();
        rule.getStyleClass().add("rule");
        rule.setMaxHeight(1);
        HBox.setHgrow(rule, Priority.ALWAYS);
        var box = new HBox(8, label, rule);
        box.getChildren().addAll(actions);
        box.getStyleClass().add(Styles.SECTION);
        return box;
    }

    private static Button link(String text, String tip, Runnable action) {
        var button = new Button(text);
        button.getStyleClass().setAll("button", Styles.LINK);
        button.setTooltip(new Tooltip(tip));
        button.setMinWidth(USE_PREF_SIZE);
        button.setOnAction(_ -> action.run());
        return button;
    }
}
