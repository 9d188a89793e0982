package dev.leadline.desktop.shell;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.leadline.desktop.Drafts;
import dev.leadline.desktop.background.FxBackground;
import dev.leadline.desktop.run.RunViewModel;
import dev.leadline.desktop.run.Studies;
import dev.leadline.desktop.shell.Dialogs.Unsaved;
import dev.leadline.project.ProjectFile;
import java.nio.file.Path;
import java.util.Optional;
import java.util.concurrent.Callable;
import java.util.concurrent.TimeUnit;
import java.util.concurrent.TimeoutException;
import javafx.scene.control.Button;
import javafx.scene.control.Label;
import javafx.scene.control.Labeled;
import javafx.scene.control.TextField;
import javafx.scene.input.Clipboard;
import javafx.scene.input.KeyCode;
import javafx.stage.Stage;
import javafx.stage.WindowEvent;
import org.fxmisc.richtext.StyleClassedTextArea;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.extension.ExtendWith;
import org.junit.jupiter.api.io.TempDir;
import org.testfx.api.FxRobot;
import org.testfx.framework.junit5.ApplicationExtension;
import org.testfx.framework.junit5.Start;
import org.testfx.util.WaitForAsyncUtils;

/// The window with real nodes and the real engine, on the headless platform.
@ExtendWith(ApplicationExtension.class)
class WindowTest {
    private final RecordedDialogs dialogs = new RecordedDialogs();
    private WorkbenchViewModel model;
    private Stage stage;

    @TempDir
    Path folder;

    @Start
    void open(Stage newStage) {
        stage = newStage;
        var background = new FxBackground();
        model = new WorkbenchViewModel(Studies.engine(), dialogs, background);
        Program.show(stage, model, background);
    }

    private static void await(Callable<Boolean> condition) throws TimeoutException {
        WaitForAsyncUtils.waitFor(60, TimeUnit.SECONDS, condition);
        WaitForAsyncUtils.waitForFxEvents();
    }

    private void opened(FxRobot robot, dev.leadline.model.Draft draft) throws TimeoutException {
        Path file = folder.resolve("project.leadline");
        ProjectFile.write(file, draft);
        robot.interact(() -> model.open(file));
        await(() -> model.canRun().get());
    }

    private boolean isEnded() {
        return RunViewModel.shown(model.run().state().get())
                .filter(s -> s.study().ended())
                .isPresent();
    }

    @Test
    void aSampleOpensFromTheStartPage(FxRobot robot) throws TimeoutException {
        await(() -> robot.lookup("#sample-dredging-volume").tryQuery().isPresent());
        robot.interact(() ->
                robot.lookup("#sample-dredging-volume").queryAs(Button.class).fire());
        await(() ->
                model.started().get() && !model.project().draft().get().inputs().isEmpty());
        assertTrue(robot.lookup("#steps")
                .queryAs(StyleClassedTextArea.class)
                .getText()
                .contains("="));
    }

    @Test
    void runGivesAnAnswerThatCopiesAsItStands(FxRobot robot) throws TimeoutException {
        opened(robot, Drafts.mean());
        robot.clickOn("#run");
        await(this::isEnded);
        String answer = robot.lookup("#answer").queryAs(Label.class).getText();
        assertTrue(answer.matches("(0\\.99|1\\.00)\\d+ \u00b1 0\\.00\\d+ m \\(95 %, lane A\\)"), answer);
        robot.clickOn("#copy");
        String[] pasted = new String[1];
        robot.interact(() -> pasted[0] = Clipboard.getSystemClipboard().getString());
        assertEquals(answer, pasted[0]);
        assertFalse(robot.lookup(".lanes .figure").queryAll().isEmpty());
        assertFalse(robot.lookup(".ground").queryAll().isEmpty());
    }

    @Test
    void aWrongFormulaIsToldWithACaretUnderTheFault(FxRobot robot) throws TimeoutException {
        opened(robot, Drafts.mean());
        robot.clickOn("#ask-0").push(KeyCode.SHORTCUT, KeyCode.A).write("twice + foo");
        await(() -> robot.lookup(".message .excerpt").tryQuery().isPresent());
        assertEquals(
                "twice + foo\n        ^",
                robot.lookup(".message .excerpt").queryAs(Label.class).getText());
        assertTrue(robot.lookup("#run").queryButton().isDisabled());
        assertEquals(
                "make an input of foo",
                robot.lookup("#make-inputs").queryAs(Labeled.class).getText());
        robot.push(KeyCode.SHORTCUT, KeyCode.Z);
        await(() -> model.canRun().get());
        assertEquals("twice", model.project().draft().get().asks().getFirst().formula());
    }

    @Test
    void editsGoToTheFileAndComeBack(FxRobot robot) throws TimeoutException {
        opened(robot, Drafts.mean());
        robot.interact(() -> robot.lookup("#input-0")
                .queryAs(javafx.scene.control.ToggleButton.class)
                .fire());
        var to = robot.lookup("#parameter-to").queryAs(TextField.class);
        robot.interact(to::selectAll);
        robot.clickOn(to).push(KeyCode.SHORTCUT, KeyCode.A).write("2.5");
        await(() -> model.canRun().get() && model.project().edited().get());
        assertTrue(stage.getTitle().contains("edited"));
        dialogs.file = Optional.of(folder.resolve("other.leadline"));
        robot.push(KeyCode.SHORTCUT, KeyCode.SHIFT, KeyCode.S);
        await(() -> !model.project().edited().get());
        assertEquals(2.5, parameter(ProjectFile.read(folder.resolve("other.leadline"))));
        assertEquals(model.project().draft().get(), ProjectFile.read(folder.resolve("other.leadline")));
    }

    @Test
    void aHalfTypedNumberIsToldWhereverOneLooks(FxRobot robot) throws TimeoutException {
        opened(robot, Drafts.mean());
        robot.interact(() -> robot.lookup("#input-0")
                .queryAs(javafx.scene.control.ToggleButton.class)
                .fire());
        robot.interact(
                () -> robot.lookup("#parameter-to").queryAs(TextField.class).selectAll());
        robot.clickOn("#parameter-to").push(KeyCode.SHORTCUT, KeyCode.A).write("5,5");
        robot.push(KeyCode.ESCAPE);
        await(() -> model.inputs().opened().get().isEmpty());
        String sentence = "To of x is \u201c5,5\u201d but must be a number";
        assertTrue(robot.lookup("#run").queryButton().isDisabled());
        assertEquals(
                "Cannot run yet: " + sentence,
                robot.lookup("#to-mend").queryAs(Label.class).getText());
        assertTrue(robot.lookup(".input-row .message .primary").queryAllAs(Label.class).stream()
                .anyMatch(label -> label.getText().equals(sentence)));
        robot.interact(() -> robot.lookup("#input-0")
                .queryAs(javafx.scene.control.ToggleButton.class)
                .fire());
        var to = robot.lookup("#parameter-to").queryAs(TextField.class);
        assertEquals("5,5", to.getText());
        assertTrue(to.getPseudoClassStates().stream()
                .anyMatch(c -> c.getPseudoClassName().equals("faulty")));
        assertEquals(1, parameter(model.project().draft().get()));
        robot.clickOn(to).push(KeyCode.SHORTCUT, KeyCode.A).write("5.5");
        await(() -> model.canRun().get());
        assertEquals("", robot.lookup("#to-mend").queryAs(Label.class).getText());
        assertEquals(5.5, parameter(model.project().draft().get()));
    }

    private static double parameter(dev.leadline.model.Draft draft) {
        return draft.inputs().getFirst().from() instanceof dev.leadline.model.Draft.From.Density(var density)
                ? density.member().orElseThrow().parameters().get("to")
                : Double.NaN;
    }

    @Test
    void pausesResumesAndStops(FxRobot robot) throws TimeoutException {
        opened(robot, ProjectFile.parse("""
                {"leadline": 1, "inputs": [{"name": "x", "density": {"family": "uniform", "from": 0, "to": 1}}],
                 "ask": {"mean": "x"}, "stop": {"rule": "fixed", "draws": 100000000000}, "seed": 7}
                """));
        robot.clickOn("#run");
        await(() -> !model.answer().get().isEmpty());
        robot.clickOn("#pause");
        await(() -> RunViewModel.isPaused(model.run().state().get()));
        assertEquals("Resume", robot.lookup("#pause").queryButton().getText());
        assertTrue(robot.lookup("#progress").queryAs(Label.class).getText().startsWith("paused after "));
        robot.clickOn("#pause");
        await(() -> !RunViewModel.isPaused(model.run().state().get()));
        robot.clickOn("#stop");
        await(this::isEnded);
        assertFalse(robot.lookup("#run").queryButton().isDisabled());
    }

    @Test
    void anEditDuringTheRunLeavesTheRunItsOwnQuestion(FxRobot robot) throws TimeoutException {
        opened(robot, Drafts.probability());
        robot.clickOn("#run");
        await(this::isEnded);
        String answer = model.answer().get();
        robot.clickOn("#ask-0").push(KeyCode.SHORTCUT, KeyCode.A).write("x > 0.5");
        await(() -> model.canRun().get() && model.editedSinceRun().get());
        assertEquals(answer, model.answer().get());
        assertTrue(robot.lookup(".badge").query().isVisible());
        assertTrue(robot.lookup("#safety-line").query().isVisible());
    }

    @Test
    void closingAsksAboutEdits(FxRobot robot) throws TimeoutException {
        opened(robot, Drafts.mean());
        robot.interact(() -> model.project().edit("$.title", d -> dev.leadline.desktop.working.Edits.title(d, "New")));
        robot.interact(() -> stage.fireEvent(new WindowEvent(stage, WindowEvent.WINDOW_CLOSE_REQUEST)));
        assertEquals("unsaved New", dialogs.heard.getLast());
        assertTrue(stage.isShowing());
        dialogs.unsaved = Unsaved.SAVE;
        robot.interact(() -> stage.fireEvent(new WindowEvent(stage, WindowEvent.WINDOW_CLOSE_REQUEST)));
        await(() -> !stage.isShowing());
        assertEquals("New", ProjectFile.read(folder.resolve("project.leadline")).title());
    }

    @Test
    void looksAtADraw(FxRobot robot) throws TimeoutException {
        opened(robot, Drafts.mean());
        robot.interact(() -> robot.lookup("#fold-look")
                .queryAs(javafx.scene.control.ToggleButton.class)
                .fire());
        await(() -> robot.lookup("#look-table .look-value").queryAll().size() == 3);
        // x, twice, outcome: the median of x is a half
        assertEquals(
                java.util.List.of("0.5", "1", "1"),
                robot.lookup("#look-table .look-value").queryAllAs(Label.class).stream()
                        .map(Labeled::getText)
                        .toList());
    }

    @Test
    void anOpenedRowPutsItsDensityInPlaceOfThePicture(FxRobot robot) throws TimeoutException {
        opened(robot, Drafts.mean());
        assertTrue(robot.lookup("#picture").tryQuery().isPresent());
        robot.clickOn("#input-0");
        await(() -> robot.lookup("#picker").tryQuery().isPresent());
        assertTrue(robot.lookup("#picture").tryQuery().isEmpty());
        robot.clickOn("#other-ways").clickOn("#way-limits");
        robot.clickOn("#known-low").write("2").clickOn("#known-high").write("6");
        await(() -> model.canRun().get());
        var input = model.project().draft().get().inputs().getFirst();
        assertEquals(6.0, parameter(model.project().draft().get()));
        assertTrue(input.provenance().contains("between 2 and 6"), input.provenance());
        robot.push(KeyCode.ESCAPE);
        await(() -> robot.lookup("#picture").tryQuery().isPresent());
        assertTrue(robot.lookup("#picker").tryQuery().isEmpty());
        assertTrue(model.inputs().opened().get().isEmpty());
    }

    @Test
    void aWideWindowKeepsTheGroundsBesideADensity(FxRobot robot) throws TimeoutException {
        opened(robot, Drafts.mean());
        for (double width : new double[] {1280, 1600}) {
            robot.interact(() -> stage.setWidth(width));
            await(() -> stage.getScene().getWidth() > width - 50);
            double working = widthOf(robot, ".working");
            robot.interact(() -> model.inputs().open(0));
            await(() -> robot.lookup("#picker").tryQuery().isPresent());
            assertEquals(width > 1500, robot.lookup("#grounds").tryQuery().isPresent());
            assertEquals(working, widthOf(robot, ".working"), 4);
            assertTrue(widthOf(robot, "#picker") > 700);
            robot.interact(() -> model.inputs().close());
            await(() -> robot.lookup("#grounds").tryQuery().isPresent());
            assertEquals(working, widthOf(robot, ".working"), 4);
        }
    }

    private static double widthOf(FxRobot robot, String what) {
        WaitForAsyncUtils.waitForFxEvents();
        return robot.lookup(what).query().getBoundsInLocal().getWidth();
    }

    @Test
    void arrowsReadTheDensity(FxRobot robot) throws TimeoutException {
        opened(robot, Drafts.mean());
        robot.interact(() -> model.inputs().open(0));
        await(() -> robot.lookup("#density").tryQuery().isPresent());
        await(() -> !robot.lookup("#density-numbers .figure").queryAll().isEmpty());
        robot.clickOn("#density").push(KeyCode.RIGHT);
        String reading = robot.lookup("#density-reading").queryAs(Label.class).getText();
        assertTrue(reading.contains(" % below, "), reading);
    }
}
