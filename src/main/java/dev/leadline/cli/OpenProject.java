package dev.leadline.cli;

import dev.leadline.model.Draft;
import dev.leadline.model.Project;
import dev.leadline.problem.Problem;
import dev.leadline.problem.Refusal;
import dev.leadline.project.ProjectFile;
import dev.leadline.project.Reading;
import java.nio.file.Path;
import java.util.List;
import java.util.Optional;

/// A project read from a file. What is wrong with it is thrown as [Wrong], which knows the texts to point at.
record OpenProject(Path file, Project project) {

    /// Wrong input of a file.
    static final class Wrong extends RuntimeException {
        private static final long serialVersionUID = 1;
        private final transient List<Problem> problems;
        private final transient Path file;
        private final transient Optional<Draft> draft;

        private Wrong(Path file, Refusal refusal, Optional<Draft> draft) {
            super(refusal);
            this.file = file;
            this.problems = refusal.problems();
            this.draft = draft;
        }

        List<Problem> problems() {
            return problems;
        }

        String text() {
            return ProblemText.of(String.valueOf(file.getFileName()), problems, draft);
        }
    }

    /// @throws Wrong with every problem
    static OpenProject of(Path file) {
        Reading reading;
        try {
            reading = ProjectFile.examine(file);
        } catch (Refusal refusal) {
            throw new Wrong(file, refusal, Optional.empty());
        }
        try {
            return new OpenProject(file, reading.project());
        } catch (Refusal refusal) {
            throw new Wrong(file, refusal, Optional.of(reading.draft()));
        }
    }

    String name() {
        String title = project.question().title();
        return title.isEmpty() ? String.valueOf(file.getFileName()) : title;
    }

    /// Prints what is no fault but may surprise.
    void printNotes(Console console, boolean quiet) {
        if (!quiet) {
            project.notes().forEach(note -> console.err().print(ProblemText.note(note)));
            console.err().flush();
        }
    }
}
