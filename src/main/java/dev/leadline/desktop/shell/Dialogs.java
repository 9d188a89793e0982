package dev.leadline.desktop.shell;

import dev.leadline.problem.Problem;
import java.nio.file.Path;
import java.util.List;
import java.util.Optional;

/// Questions to the person at the window. Each call waits for its answer.
public interface Dialogs {
    /// What to do about edits that no file holds yet.
    enum Unsaved {
        SAVE,
        DISCARD,
        CANCEL
    }

    Optional<Path> chooseProject();

    Optional<Path> chooseWhereToSave(String suggestedName);

    /// @param extension without the dot, as `png`
    Optional<Path> chooseFigure(String suggestedName, String extension);

    /// @param folder of the project, below which data are read
    Optional<Path> chooseData(Optional<Path> folder);

    Unsaved askAboutUnsaved(String title);

    /// Whether to go on in spite of these.
    ///
    /// @param action the button that goes on
    boolean agree(String heading, String action, List<Problem> problems);

    /// @param explanation what belongs here and why one would change it
    Optional<String> askText(String heading, String explanation, String value);

    void tell(String heading, List<Problem> problems);

    void about();
}
