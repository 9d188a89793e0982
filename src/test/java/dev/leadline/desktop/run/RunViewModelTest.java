package dev.leadline.desktop.run;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertInstanceOf;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.leadline.desktop.Drafts;
import dev.leadline.desktop.background.HeldBackground;
import dev.leadline.desktop.run.RunViewModel.State;
import dev.leadline.desktop.working.Edits;
import dev.leadline.model.DataFiles;
import dev.leadline.study.StudyState;
import dev.leadline.study.StudyState.Activity;
import java.util.List;
import org.junit.jupiter.api.Test;

class RunViewModelTest {
    private final HeldStudies studies = new HeldStudies();
    private final HeldBackground background = new HeldBackground();
    private final RunViewModel run = new RunViewModel(studies, background);

    private void show(Activity activity) {
        studies.listener.accept(new StudyState(activity, List.of(), List.of()));
        background.finishAll();
    }

    private void start() {
        run.start(Drafts.mean(), DataFiles.NONE);
        background.finishAll();
    }

    @Test
    void goesFromReadyThroughRunningToFinished() {
        assertTrue(RunViewModel.canStart(run.state().get()));
        run.threads().set(3);
        run.start(Drafts.mean(), DataFiles.NONE);
        assertInstanceOf(State.Starting.class, run.state().get());
        assertFalse(RunViewModel.canStart(run.state().get()));
        background.finishAll();
        assertEquals(List.of("start on 3"), studies.heard);
        show(Activity.RUNNING);
        assertTrue(RunViewModel.isUnderWay(run.state().get()));
        assertFalse(RunViewModel.canStart(run.state().get()));
        show(Activity.FINISHED);
        assertFalse(RunViewModel.isUnderWay(run.state().get()));
        assertTrue(RunViewModel.canStart(run.state().get()));
    }

    @Test
    void theSameButtonPausesAndResumes() {
        start();
        show(Activity.RUNNING);
        run.pauseOrResume();
        show(Activity.PAUSED);
        assertTrue(RunViewModel.isPaused(run.state().get()));
        run.pauseOrResume();
        run.stop();
        assertEquals(List.of("start on " + run.threads().get(), "pause", "resume", "stop"), studies.heard);
    }

    @Test
    void showsTheNewestOfMany() {
        start();
        studies.listener.accept(new StudyState(Activity.PREPARING, List.of(), List.of()));
        studies.listener.accept(new StudyState(Activity.RUNNING, List.of(), List.of()));
        studies.listener.accept(new StudyState(Activity.PAUSED, List.of(), List.of()));
        assertEquals(1, background.waiting());
        background.finishAll();
        assertTrue(RunViewModel.isPaused(run.state().get()));
    }

    @Test
    void aRunThatWasLeftIsClosedAndNotHeardAnyMore() {
        start();
        show(Activity.RUNNING);
        var old = studies.listener;
        run.leave();
        background.finishAll();
        old.accept(new StudyState(Activity.FINISHED, List.of(), List.of()));
        background.finishAll();
        assertInstanceOf(State.Ready.class, run.state().get());
        assertTrue(studies.heard.contains("close"));
    }

    @Test
    void leavingWhileItStartsClosesItOnceItHasStarted() {
        run.start(Drafts.mean(), DataFiles.NONE);
        run.leave();
        background.finishAll();
        assertInstanceOf(State.Ready.class, run.state().get());
        assertEquals("close", studies.heard.getLast());
    }

    @Test
    void aFaultIsTold() {
        studies.fault = new IllegalStateException("the run ended by a fault");
        start();
        var failed = assertInstanceOf(State.Failed.class, run.state().get());
        assertTrue(failed.problem().primary().contains("the run ended by a fault"));
        assertTrue(RunViewModel.canStart(failed));
    }

    @Test
    void aWrongQuestionIsRefusedNotRun() {
        run.start(Edits.asking("mean"), DataFiles.NONE);
        background.finishAll();
        assertInstanceOf(State.Failed.class, run.state().get());
        assertEquals(List.of(), studies.heard);
    }

    @Test
    void editsOfTheQuestionAreSeenTitleAndNotesAreNot() {
        start();
        show(Activity.RUNNING);
        var draft = Drafts.mean();
        assertFalse(RunViewModel.isEditedSince(run.state().get(), draft));
        assertFalse(RunViewModel.isEditedSince(run.state().get(), Edits.title(draft, "Other")));
        assertTrue(RunViewModel.isEditedSince(run.state().get(), Drafts.integral()));
    }
}
