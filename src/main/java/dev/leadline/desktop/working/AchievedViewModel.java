package dev.leadline.desktop.working;

import dev.leadline.desktop.background.Background;
import dev.leadline.engine.Achieved;
import dev.leadline.model.Project;
import dev.leadline.study.TieRow;
import java.util.List;
import javafx.beans.property.ReadOnlyObjectProperty;
import javafx.beans.property.ReadOnlyObjectWrapper;

/// The correlations that draws of the tied inputs have, looked at while the fold is open.
public final class AchievedViewModel {
    private final ProjectViewModel project;
    private final Background background;
    private final ReadOnlyObjectWrapper<List<TieRow>> rows = new ReadOnlyObjectWrapper<>(List.of());
    private boolean open;
    private long newest;

    public AchievedViewModel(ProjectViewModel project, Background background) {
        this.project = project;
        this.background = background;
        project.check().addListener((_, _, _) -> look());
    }

    /// One for each pair; none while the project cannot be run.
    ReadOnlyObjectProperty<List<TieRow>> rows() {
        return rows.getReadOnlyProperty();
    }

    /// Nothing is looked at while the fold is closed.
    void open(boolean isOpen) {
        open = isOpen;
        look();
    }

    private void look() {
        long turn = ++newest;
        var sound = project.sound().filter(p -> p.question().dependence().isPresent());
        if (!open || sound.isEmpty()) {
            rows.set(List.of());
            return;
        }
        background.run(
                () -> rows(sound.get()),
                found -> {
                    if (turn == newest) {
                        rows.set(found);
                    }
                },
                failure -> System.getLogger(AchievedViewModel.class.getName())
                        .log(System.Logger.Level.WARNING, "achieved correlations could not be seen", failure));
    }

    private static List<TieRow> rows(Project project) {
        var question = project.question();
        return TieRow.of(question, Achieved.of(question, project.plan().seed()));
    }
}
