package dev.leadline.desktop.shell;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.leadline.desktop.Drafts;
import dev.leadline.desktop.background.HeldBackground;
import dev.leadline.desktop.run.HeldStudies;
import dev.leadline.desktop.shell.Dialogs.Unsaved;
import dev.leadline.desktop.working.Edits;
import dev.leadline.ground.Ground;
import dev.leadline.model.DataFiles;
import dev.leadline.model.LaneDraft;
import dev.leadline.project.ProjectFile;
import dev.leadline.scheme.Independent;
import dev.leadline.scheme.Scheme;
import dev.leadline.study.LaneState;
import dev.leadline.study.StudyState;
import dev.leadline.study.StudyState.Activity;
import dev.leadline.trace.Trace;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Optional;
import java.util.OptionalLong;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class WorkbenchViewModelTest {
    private final HeldStudies studies = new HeldStudies();
    private final RecordedDialogs dialogs = new RecordedDialogs();
    private final HeldBackground background = new HeldBackground();
    private final WorkbenchViewModel model = new WorkbenchViewModel(studies, dialogs, background);

    @TempDir
    Path folder;

    private Path written() {
        Path file = folder.resolve("twice.leadline");
        ProjectFile.write(file, Drafts.mean());
        return file;
    }

    private void opened() {
        model.open(written());
        background.finishAll();
    }

    private void edit() {
        model.project().edit("$.title", d -> Edits.title(d, "Thrice"));
        background.finishAll();
    }

    @Test
    void moreDrawsRunAgainWithALargerBudget() {
        opened();
        model.runLonger(OptionalLong.of(5_000_000));
        background.finishAll();
        assertEquals(
                OptionalLong.of(5_000_000),
                model.project().draft().get().stop().orElseThrow().draws());
        assertFalse(model.canRun().get(), "it runs");
        model.project().undo();
        assertEquals(
                OptionalLong.of(20_000),
                model.project().draft().get().stop().orElseThrow().draws());
    }

    @Test
    void opensAFile() {
        assertFalse(model.started().get());
        opened();
        assertTrue(model.started().get());
        assertEquals("Twice", model.title().get());
        assertTrue(model.canRun().get());
        assertEquals(List.of(), dialogs.heard);
    }

    @Test
    void aFileThatIsNoProjectIsToldAndChangesNothing() throws IOException {
        opened();
        Path bad = Files.writeString(folder.resolve("bad.leadline"), "{\"leadline\": 1, \"colour\": 2}");
        model.open(bad);
        background.finishAll();
        assertEquals(List.of("bad.leadline cannot be opened"), dialogs.heard);
        assertEquals("Twice", model.title().get());
    }

    @Test
    void asksBeforeEditsAreLost() {
        opened();
        edit();
        model.newProject("mean");
        assertEquals(List.of("unsaved Thrice"), dialogs.heard);
        assertEquals("Thrice", model.title().get());
        dialogs.unsaved = Unsaved.DISCARD;
        model.newProject("mean");
        assertEquals("Untitled", model.title().get());
    }

    @Test
    void savesFirstThenLeaves() {
        opened();
        edit();
        dialogs.unsaved = Unsaved.SAVE;
        var left = new boolean[1];
        model.leaving(() -> left[0] = true);
        assertFalse(left[0]);
        background.finishAll();
        assertTrue(left[0]);
        assertEquals(
                "Thrice", ProjectFile.read(folder.resolve("twice.leadline")).title());
    }

    @Test
    void asksBeforeAFileGetsAnotherNumberThanItsFieldShows() throws IOException {
        opened();
        model.project().typeNumber("$.inputs[0].low", "low of x", "1..5", (d, _) -> d);
        var file = folder.resolve("other.leadline");
        dialogs.file = Optional.of(file);
        model.saveAs();
        background.finishAll();
        assertEquals(List.of("Save the last numbers of these fields?"), dialogs.heard);
        assertFalse(Files.exists(file));
        dialogs.agrees = true;
        model.saveAs();
        background.finishAll();
        assertTrue(Files.exists(file));
    }

    @Test
    void asksBeforeATextThatIsNoNumberIsLost() {
        opened();
        model.project().typeNumber("$.inputs[0].low", "low of x", "1..5", (d, _) -> d);
        model.newProject("mean");
        assertEquals(List.of("unsaved Twice"), dialogs.heard);
        assertEquals("Twice", model.title().get());
    }

    @Test
    void aFailedSaveIsToldAndLeavesNothing() {
        opened();
        edit();
        dialogs.unsaved = Unsaved.SAVE;
        dialogs.file = Optional.of(folder.resolve("missing").resolve("twice.leadline"));
        model.saveAs();
        background.finishAll();
        assertEquals("twice.leadline could not be saved; the project is still here", dialogs.heard.getLast());
        assertTrue(model.project().edited().get());
    }

    /// A sample's data come along, and a second copy brings them from the first.
    @Test
    void dataGoWhereTheProjectGoes() throws IOException {
        model.openSample("berth-delay");
        background.finishAll();
        Path first = Files.createDirectory(folder.resolve("first")).resolve("mine.leadline");
        dialogs.file = Optional.of(first);
        model.saveAs();
        background.finishAll();
        assertEquals("Saved in mine.leadline, with waits.csv", model.notice().get());
        Path second = Files.createDirectory(folder.resolve("second")).resolve("mine.leadline");
        dialogs.file = Optional.of(second);
        model.saveAs();
        background.finishAll();
        assertEquals(-1, Files.mismatch(first.resolveSibling("waits.csv"), second.resolveSibling("waits.csv")));
        Files.writeString(second.resolveSibling("waits.csv"), "call,hours\n1,2\n2,3\n");
        model.saveAs();
        background.finishAll();
        assertEquals("Saved in mine.leadline", model.notice().get());
        assertEquals("call,hours\n1,2\n2,3\n", Files.readString(second.resolveSibling("waits.csv")));
    }

    @Test
    void saveAsGivesTheExtensionAndReopensEqual() {
        opened();
        edit();
        dialogs.file = Optional.of(folder.resolve("other"));
        model.saveAs();
        background.finishAll();
        assertEquals("save as twice.leadline", dialogs.heard.getLast());
        assertFalse(model.project().edited().get());
        assertEquals(model.project().draft().get(), ProjectFile.read(folder.resolve("other.leadline")));
        assertEquals("Saved in other.leadline", model.notice().get());
    }

    @Test
    void aNewQuestionIsSavedUnderItsTitle() {
        model.newProject("probability");
        model.project().edit("$.title", d -> Edits.title(d, "Line at berth 4, in a gust"));
        model.save();
        assertEquals("save as line-at-berth-4-in-a-gust.leadline", dialogs.heard.getLast());
    }

    @Test
    void anIncompleteQuestionCannotRunAndSaysWhy() {
        model.newProject("mean");
        background.finishAll();
        assertFalse(model.canRun().get());
        assertTrue(
                model.whyNotRun().get().startsWith("Cannot run yet: "),
                model.whyNotRun().get());
        model.startRun();
        assertEquals(List.of(), studies.heard);
    }

    @Test
    void countsObjections() {
        opened();
        model.startRun();
        background.finishAll();
        assertEquals("", model.answer().get());
        studies.listener.accept(new StudyState(
                Activity.RUNNING,
                List.of(new LaneState(
                        new Trace("A", Scheme.of(new Independent()), List.of(), List.of(), List.of(), Optional.empty()),
                        List.of())),
                List.of()));
        background.finishAll();
        assertEquals("", WorkbenchViewModel.objectionsOf(model.run().state().get(), "A"));
        assertEquals("0 draws", model.progress().get());
        assertEquals("seed 7", WorkbenchViewModel.seedOf(model.run().state().get()));
        assertEquals(
                List.<Ground>of(),
                WorkbenchViewModel.groundsOf(model.run().state().get(), "A"));
    }

    @Test
    void aSeedIsAWholeNumber() {
        opened();
        dialogs.text = Optional.of("20261201");
        model.askSeed();
        assertEquals(OptionalLong.of(20261201), model.project().draft().get().seed());
        dialogs.text = Optional.of("-3");
        model.askSeed();
        assertEquals("The seed stays as it was", dialogs.heard.getLast());
        assertEquals(OptionalLong.of(20261201), model.project().draft().get().seed());
        dialogs.text = Optional.of("9223372036854775808");
        model.askSeed();
        assertEquals(OptionalLong.of(20261201), model.project().draft().get().seed());
        dialogs.text = Optional.of(" ");
        model.askSeed();
        assertEquals(OptionalLong.empty(), model.project().draft().get().seed());
    }

    @Test
    void exportsThePictureInPrintColours() {
        opened();
        dialogs.file = Optional.of(folder.resolve("picture.svg"));
        model.dark().set(true);
        model.exportFigure("svg");
        background.finishAll();
        assertEquals("figure twice-settling.svg", dialogs.heard.getLast());
        assertTrue(Files.exists(folder.resolve("picture.svg")));
    }

    @Test
    void everySampleProjectOpens() {
        for (String name : Samples.TITLES.keySet()) {
            model.openSample(name);
            background.finishAll();
            assertEquals(List.of(), dialogs.heard, name);
            assertEquals(List.of(), model.project().problems().get(), name);
            assertTrue(model.project().file().get().isEmpty(), name);
        }
    }

    @Test
    void sentenceAnswerAndGroundsSpeakOfTheSelectedLane() {
        model.project().replace(Drafts.mean(), Optional.empty(), DataFiles.NONE);
        assertFalse(model.sentence().get().text().contains("lane"));
        model.project()
                .edit(
                        "$.lanes",
                        d -> Edits.lanes(
                                d, List.of(LaneDraft.of("A", "independent"), LaneDraft.of("B", "antithetic"))));
        model.lanes().select(1);
        assertTrue(model.sentence().get().text().endsWith(", by lane B."));
        assertEquals("lane B", model.groundsOf().get());
        model.lanes().select(0);
        assertEquals("lane A", model.groundsOf().get());
    }
}
