package dev.leadline.desktop.run;

import dev.leadline.desktop.background.Background;
import dev.leadline.desktop.working.Edits;
import dev.leadline.model.DataFiles;
import dev.leadline.model.Draft;
import dev.leadline.model.Project;
import dev.leadline.problem.Problem;
import dev.leadline.problem.Refusal;
import dev.leadline.study.StudyState;
import dev.leadline.study.StudyState.Activity;
import java.util.Optional;
import java.util.OptionalLong;
import java.util.function.Consumer;
import javafx.beans.property.IntegerProperty;
import javafx.beans.property.ReadOnlyObjectProperty;
import javafx.beans.property.ReadOnlyObjectWrapper;
import javafx.beans.property.SimpleIntegerProperty;

/// A run of the project: started from a snapshot of it, which later edits do not touch.
public final class RunViewModel {
    public sealed interface State {
        /// Nothing was run yet.
        record Ready() implements State {}

        /// Checking the snapshot and building tables.
        record Starting() implements State {}

        /// Under way, paused or finished, as its newest state says.
        record Shown(Project project, StudyState study) implements State {}

        /// Ended by a fault, or refused before it began.
        record Failed(Problem problem) implements State {}
    }

    /// One run; what it reports is heard only while it is the newest.
    private static final class Turn {
        volatile Studies.Going going; // set by the worker that starts it
        boolean left;
    }

    private final Studies studies;
    private final Background background;
    private final ReadOnlyObjectWrapper<State> state = new ReadOnlyObjectWrapper<>(new State.Ready());
    private final IntegerProperty threads =
            new SimpleIntegerProperty(Runtime.getRuntime().availableProcessors());
    private Turn turn = new Turn();

    public RunViewModel(Studies studies, Background background) {
        this.studies = studies;
        this.background = background;
    }

    public ReadOnlyObjectProperty<State> state() {
        return state.getReadOnlyProperty();
    }

    /// Workers of the next run; the digits do not depend on it.
    public IntegerProperty threads() {
        return threads;
    }

    public static boolean canStart(State state) {
        return switch (state) {
            case State.Ready _, State.Failed _ -> true;
            case State.Starting _ -> false;
            case State.Shown(var _, StudyState study) -> study.ended();
        };
    }

    public static boolean isUnderWay(State state) {
        return switch (state) {
            case State.Ready _, State.Failed _, State.Starting _ -> false;
            case State.Shown(var _, StudyState study) -> !study.ended();
        };
    }

    public static boolean isPaused(State state) {
        return state instanceof State.Shown(var _, StudyState study) && study.activity() == Activity.PAUSED;
    }

    /// What the pictures show, where anything was run.
    public static Optional<State.Shown> shown(State state) {
        return state instanceof State.Shown shown ? Optional.of(shown) : Optional.empty();
    }

    /// Whether the question or its demands were edited since this run started. Title, notes and seed do not count.
    public static boolean isEditedSince(State state, Draft now) {
        return shown(state)
                .map(s -> !asked(s.project.draft()).equals(asked(now)))
                .orElse(false);
    }

    /// Runs the draft as it stands now.
    ///
    /// @param files where its data come from
    public void start(Draft draft, DataFiles files) {
        if (!canStart(state.get())) {
            return;
        }
        var mine = new Turn();
        turn = mine;
        state.set(new State.Starting());
        int workers = threads.get();
        background.run(
                () -> {
                    var project = Project.of(draft, files);
                    mine.going = studies.start(project, workers, heard(mine, project));
                    return mine.going;
                },
                going -> {
                    if (mine.left) {
                        close(going);
                    } else {
                        watch(mine, going);
                    }
                },
                failure -> fail(mine, failure));
    }

    public void pauseOrResume() {
        if (turn.going != null && isUnderWay(state.get())) {
            if (isPaused(state.get())) {
                turn.going.resume();
            } else {
                turn.going.pause();
            }
        }
    }

    public void stop() {
        if (turn.going != null && isUnderWay(state.get())) {
            turn.going.stop();
        }
    }

    /// Forgets the run, as when another project is opened.
    public void leave() {
        turn.left = true;
        if (turn.going != null) {
            close(turn.going);
        }
        turn = new Turn();
        state.set(new State.Ready());
    }

    private Consumer<StudyState> heard(Turn mine, Project project) {
        return background.latest(study -> {
            if (mine == turn && !mine.left && study.activity() != Activity.FAILED) {
                state.set(new State.Shown(project, study));
            }
        });
    }

    /// A run that fails tells nobody but who waits for it.
    private void watch(Turn mine, Studies.Going going) {
        background.run(
                () -> {
                    going.await();
                    return going;
                },
                _ -> {},
                failure -> fail(mine, failure));
    }

    private void fail(Turn mine, Throwable failure) {
        if (mine == turn && !mine.left) {
            state.set(new State.Failed(problemOf(failure)));
        }
    }

    private static Problem problemOf(Throwable failure) {
        if (failure instanceof Refusal refusal) {
            return refusal.problems().getFirst();
        }
        return Problem.of("The run ended with a fault: " + failure)
                .because("This is a fault of the program, not of the project.")
                .tryThis("Save the project, and send it with this line to those who maintain the program.");
    }

    private void close(Studies.Going going) {
        background.run(
                () -> {
                    going.close();
                    return going;
                },
                _ -> {},
                _ -> {});
    }

    /// What a run depends on.
    private static Draft asked(Draft d) {
        return Edits.seed(Edits.safety(Edits.notes(Edits.title(d, ""), ""), false), OptionalLong.empty());
    }
}
