package dev.leadline.desktop.lanes;

import dev.leadline.desktop.background.Background;
import dev.leadline.desktop.working.ProjectViewModel;
import dev.leadline.model.Project;
import dev.leadline.problem.Problem;
import dev.leadline.problem.Refusal;
import dev.leadline.study.Suggestion;
import java.util.concurrent.CancellationException;
import java.util.function.Consumer;
import javafx.beans.property.ReadOnlyObjectProperty;
import javafx.beans.property.ReadOnlyObjectWrapper;

/// Which scheme the question is worth, found in the background by short pilots.
public final class SuggestionViewModel {
    /// Where suggestions come from.
    public interface Suggestions {
        /// @param listener gets the name of each scheme before it is tried; what it throws ends the search
        Suggestion of(Project project, Consumer<String> listener) throws InterruptedException;

        /// By pilots on this machine; one thread, since a run may be under way.
        static Suggestions engine() {
            return (project, listener) ->
                    Suggestion.of(project, project.plan().seed(), Suggestion.USUAL_DRAWS, 1, listener);
        }
    }

    public sealed interface State {
        record Idle() implements State {}

        /// @param scheme that is being tried
        record Trying(String scheme) implements State {}

        record Found(Suggestion suggestion) implements State {}

        record Failed(Problem problem) implements State {}
    }

    /// One search; it ends at the next scheme once it is cancelled.
    private static final class Turn {
        volatile boolean cancelled;
    }

    private final ProjectViewModel project;
    private final LanesViewModel lanes;
    private final Suggestions suggestions;
    private final Background background;
    private final ReadOnlyObjectWrapper<State> state = new ReadOnlyObjectWrapper<>(new State.Idle());
    private Turn turn = new Turn();

    public SuggestionViewModel(
            ProjectViewModel project, LanesViewModel lanes, Suggestions suggestions, Background background) {
        this.project = project;
        this.lanes = lanes;
        this.suggestions = suggestions;
        this.background = background;
    }

    public ReadOnlyObjectProperty<State> state() {
        return state.getReadOnlyProperty();
    }

    LanesViewModel lanes() {
        return lanes;
    }

    ProjectViewModel project() {
        return project;
    }

    public void search() {
        var sound = project.sound();
        if (sound.isEmpty() || state.get() instanceof State.Trying) {
            return;
        }
        var mine = new Turn();
        turn = mine;
        state.set(new State.Trying("plain draws"));
        Consumer<String> heard = background.latest(scheme -> {
            if (mine == turn && state.get() instanceof State.Trying) {
                state.set(new State.Trying(scheme));
            }
        });
        background.run(
                () -> suggestions.of(sound.get(), scheme -> {
                    if (mine.cancelled) {
                        throw new CancellationException();
                    }
                    heard.accept(scheme);
                }),
                found -> end(mine, new State.Found(found)),
                failure -> end(mine, new State.Failed(problemOf(failure))));
    }

    private void end(Turn mine, State end) {
        if (mine == turn && !mine.cancelled) {
            state.set(end);
        }
    }

    /// Ends a search, or puts its table away.
    public void leave() {
        turn.cancelled = true;
        state.set(new State.Idle());
    }

    /// The lane of a row, under the next free name.
    void add(Suggestion.Row row) {
        lanes.add(row.lane());
        leave();
    }

    private static Problem problemOf(Throwable failure) {
        return failure instanceof Refusal refusal
                ? refusal.problems().getFirst()
                : Problem.of("No scheme could be suggested: " + failure)
                        .because("This is a fault of the program, not of the project.");
    }
}
