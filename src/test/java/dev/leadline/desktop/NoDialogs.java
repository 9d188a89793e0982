package dev.leadline.desktop;

import dev.leadline.desktop.shell.Dialogs;
import dev.leadline.problem.Problem;
import java.nio.file.Path;
import java.util.List;
import java.util.Optional;

/// Nobody is there to answer.
final class NoDialogs implements Dialogs {
    @Override
    public Optional<Path> chooseProject() {
        return Optional.empty();
    }

    @Override
    public Optional<Path> chooseWhereToSave(String suggestedName) {
        return Optional.empty();
    }

    @Override
    public Optional<Path> chooseFigure(String suggestedName, String extension) {
        return Optional.empty();
    }

    @Override
    public Optional<Path> chooseData(Optional<Path> folder) {
        return Optional.empty();
    }

    @Override
    public Unsaved askAboutUnsaved(String title) {
        return Unsaved.DISCARD;
    }

    @Override
    public Optional<String> askText(String heading, String explanation, String value) {
        return Optional.empty();
    }

    @Override
    public boolean agree(String heading, String action, List<Problem> problems) {
        return false;
    }

    @Override
    public void tell(String heading, List<Problem> problems) {
        throw new IllegalStateException(heading + ": " + problems);
    }

    @Override
    public void about() {}
}
