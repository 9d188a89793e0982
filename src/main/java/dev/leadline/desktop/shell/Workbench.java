package dev.leadline.desktop.shell;

import dev.leadline.desktop.background.Background;
import dev.leadline.desktop.grounds.GroundsPane;
import dev.leadline.desktop.lanes.LanesPane;
import dev.leadline.desktop.picker.PickerPane;
import dev.leadline.desktop.stage.StagePane;
import dev.leadline.desktop.style.Styles;
import dev.leadline.desktop.working.SketchView;
import dev.leadline.desktop.working.WorkingPane;
import dev.leadline.ground.Action;
import dev.leadline.model.Sentence;
import java.util.Arrays;
import java.util.List;
import java.util.Map;
import javafx.scene.Node;
import javafx.scene.control.Label;
import javafx.scene.control.SplitPane;
import javafx.scene.input.Clipboard;
import javafx.scene.input.DataFormat;
import javafx.scene.input.KeyCode;
import javafx.scene.input.KeyEvent;
import javafx.scene.layout.BorderPane;
import javafx.scene.layout.VBox;

/// The window's content: menus, sentence, working, stage, grounds and answer line; or the start page.
public final class Workbench extends BorderPane {
    private static final String SAFETY = "Results support, and do not replace, the judgement of a licensed engineer or"
            + " qualified professional; applicable local codes and standards govern. A sampled probability rests on the"
            + " stated densities.";

    /// From here on a density and its form find room beside the grounds.
    private static final double WIDE = 1500;

    /// Least widths; a window that is made narrow later takes room from the grounds.
    private static final double PICKER = 420;

    private static final double PICKER_BESIDE_GROUNDS = 700;

    private final WorkbenchViewModel model;
    private final WorkingPane working;
    private final GroundsPane grounds = new GroundsPane(this::act);
    private final VBox top;
    private final VBox bottom;
    private final SplitPane panes;
    private final StagePane picture;
    private final PickerPane picker;
    private double[] dividers = {};
    private final StartPage start;

    public Workbench(WorkbenchViewModel model, Background background, Runnable quit) {
        this.model = model;
        getStyleClass().add("workbench");
        working = new WorkingPane(
                model.project(),
                model.inputs(),
                model.achieved(),
                model.reference(),
                model.look(),
                () -> new SketchView(model.dark(), background));
        var menus = Menus.of(model, this::copyAnswer, working::openLook, working::openAbout, quit);
        var sentence = new SentenceView(this::openDoor);
        sentence.show(model.sentence().get());
        model.sentence().addListener((_, _, s) -> sentence.show(s));
        top = new VBox(new TitleRow(model), sentence);
        var safety = new Label(SAFETY);
        safety.setId("safety-line");
        safety.getStyleClass().add(Styles.SAFETY);
        safety.setWrapText(true);
        safety.setMinHeight(USE_PREF_SIZE);
        safety.setMaxWidth(Double.MAX_VALUE);
        safety.managedProperty().bind(safety.visibleProperty());
        safety.visibleProperty().bind(model.project().draft().map(d -> d.safety()));
        bottom = new VBox(safety, new AnswerLine(model, () -> showGrounds(grounds::reveal), this::copyAnswer));
        picture = new StagePane(
                model.stage(),
                new LanesPane(
                        model.lanes(),
                        model.suggestion(),
                        (lane, input) -> model.picker().openFor(lane, input)));
        picker = new PickerPane(model.picker(), model::chooseData);
        panes = new SplitPane(working, picture, grounds);
        panes.setDividerPositions(.325, .79);
        model.picker().opened().addListener((_, _, picking) -> stage(picking));
        SplitPane.setResizableWithParent(working, false);
        SplitPane.setResizableWithParent(grounds, false);
        start = new StartPage(model, background);
        setTop(new VBox(menus, top));
        model.grounds().addListener((_, _, shown) -> grounds.show(shown));
        grounds.lane().bind(model.groundsOf());
        model.started().addListener((_, _, started) -> arrange(started));
        arrange(model.started().get());
        model.dark().addListener((_, _, dark) -> recolour(dark));
        recolour(model.dark().get());
        addEventFilter(KeyEvent.KEY_PRESSED, this::undoEverywhere);
        addEventHandler(KeyEvent.KEY_PRESSED, this::leaveWithEscape);
    }

    private void arrange(boolean started) {
        top.setVisible(started);
        top.setManaged(started);
        setCenter(started ? panes : start);
        setBottom(started ? bottom : null);
        if (started && model.project().draft().get().asks().getFirst().formula().isBlank()) {
            working.focusFormula();
        }
    }

    /// The picker takes the place of the picture, and that of the grounds too where the window is narrow.
    private void stage(boolean picking) {
        List<Node> shown = !picking
                ? List.of(working, picture, grounds)
                : getWidth() < WIDE ? List.of(working, picker) : List.of(working, picker, grounds);
        if (panes.getItems().equals(shown)) {
            return;
        }
        picker.setMinWidth(shown.contains(grounds) ? PICKER_BESIDE_GROUNDS : PICKER);
        double[] now = panes.getDividerPositions();
        dividers = now.length == 2 ? now : new double[] {now[0], dividers[1]};
        panes.getItems().setAll(shown);
        panes.setDividerPositions(Arrays.copyOf(dividers, shown.size() - 1));
    }

    private void showGrounds(Runnable reveal) {
        model.picker().close();
        reveal.run();
    }

    private void leaveWithEscape(KeyEvent e) {
        if (e.getCode() == KeyCode.ESCAPE && model.picker().opened().get()) {
            model.picker().close();
            e.consume();
        }
    }

    private void recolour(boolean dark) {
        if (dark) {
            getStyleClass().add(Styles.DARK);
        } else {
            getStyleClass().remove(Styles.DARK);
        }
    }

    private void openDoor(Sentence.Door door) {
        switch (door) {
            case FORMULA -> working.focusFormula();
            case LEVEL -> working.focusLevel();
            case UNIT -> working.focusUnit();
            case INPUTS -> working.focusInputs();
            case DEMANDS -> working.focusTolerance();
            case LANE -> {
                model.picker().close();
                model.lanes().open().set(true);
            }
        }
    }

    /// Does what a ground offers.
    private void act(Action action) {
        switch (action) {
            case Action.MoreDraws(var inAll) -> model.runLonger(inAll);
            case Action.DrawWider _ -> {
                model.lanes().open().set(true);
                model.suggestion().search();
            }
            case Action.AddReference _ -> working.openReference();
            case Action.Rehearse _ -> {}
            case Action.RunOtherSeed _ -> model.runWithOtherSeed();
            case Action.LookAtDraw(long draw) -> working.openLookAt(draw);
            case Action.AskAnother _ -> working.focusFormula();
        }
    }

    private void copyAnswer() {
        String text = model.answer().get();
        if (!text.isEmpty()) {
            Clipboard.getSystemClipboard().setContent(Map.of(DataFormat.PLAIN_TEXT, text));
            model.copied();
        }
    }

    /// Fields and editors have an undo of their own, which would part from the project's.
    private void undoEverywhere(KeyEvent e) {
        if (!e.isShortcutDown()) {
            return;
        }
        if (e.getCode() == KeyCode.Z && !e.isShiftDown()) {
            model.project().undo();
            e.consume();
        } else if (e.getCode() == KeyCode.Y || e.getCode() == KeyCode.Z) {
            model.project().redo();
            e.consume();
        }
    }
}
