package dev.leadline.desktop.working;

import dev.leadline.desktop.background.Background;
import dev.leadline.engine.Look;
import dev.leadline.model.Project;
import dev.leadline.problem.Problem;
import dev.leadline.problem.Refusal;
import dev.leadline.study.LookRow;
import java.util.List;
import java.util.Optional;
import java.util.function.Supplier;
import javafx.beans.property.ReadOnlyObjectProperty;
import javafx.beans.property.ReadOnlyObjectWrapper;

/// One draw looked at: the nominal one, with every input at its median, or the one with a given index.
public final class LookViewModel {
    public sealed interface State {
        /// Folded away, or the project cannot be run.
        record Empty(String why) implements State {}

        record Seen(List<LookRow> rows) implements State {}

        record Refused(Problem problem) implements State {}
    }

    private final ProjectViewModel project;
    private final Supplier<Optional<Project>> ran;
    private final Background background;
    private final ReadOnlyObjectWrapper<State> state = new ReadOnlyObjectWrapper<>(new State.Empty(""));
    private boolean open;
    private String draw = "";
    private long newest;

    /// @param ran the project of the run that is shown, where the question is still the same: its draws are looked at,
    ///     also where its seed was drawn
    public LookViewModel(ProjectViewModel project, Supplier<Optional<Project>> ran, Background background) {
        this.project = project;
        this.ran = ran;
        this.background = background;
        project.check().addListener((_, _, _) -> look());
    }

    ReadOnlyObjectProperty<State> state() {
        return state.getReadOnlyProperty();
    }

    /// Nothing is looked at while the fold is closed.
    void open(boolean isOpen) {
        open = isOpen;
        look();
    }

    /// @param text index of the draw from 0; blank for the nominal one
    void draw(String text) {
        draw = text.strip();
        look();
    }

    private void look() {
        if (!open) {
            return;
        }
        long turn = ++newest;
        Optional<Project> sound = ran.get().or(project::sound);
        if (sound.isEmpty()) {
            state.set(new State.Empty("To be seen once the question is complete."));
            return;
        }
        if (!draw.isEmpty() && !draw.matches("\\d{1,12}")) {
            state.set(new State.Refused(Problem.of("\u201c" + draw + "\u201d is no index of a draw")
                    .tryThis("Give a whole number from 0, or leave it empty to see every input at its median.")));
            return;
        }
        Project p = sound.get();
        String which = draw;
        background.run(
                () -> LookRow.of(p.question(), which.isEmpty() ? nominal(p) : at(p, Long.parseLong(which))),
                rows -> {
                    if (turn == newest) {
                        state.set(new State.Seen(rows));
                    }
                },
                failure -> {
                    if (turn == newest) {
                        state.set(new State.Refused(
                                failure instanceof Refusal refused
                                        ? refused.problems().getFirst()
                                        : Problem.of("This draw cannot be looked at: " + failure)));
                    }
                });
    }

    private static Look nominal(Project p) {
        return Look.nominal(p.question());
    }

    private static Look at(Project p, long draw) {
        return Look.at(p.question(), p.plan().settled().getFirst(), p.plan().seed(), draw);
    }
}
