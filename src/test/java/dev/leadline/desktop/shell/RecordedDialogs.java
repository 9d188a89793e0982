package dev.leadline.desktop.shell;

import dev.leadline.problem.Problem;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/// Answers as the test says, and keeps what was asked and told.
public final class RecordedDialogs implements Dialogs {
    public final List<String> heard = new ArrayList<>();
    public Optional<Path> file = Optional.empty();
    public Unsaved unsaved = Unsaved.CANCEL;
    public Optional<String> text = Optional.empty();
    public boolean agrees;

    @Override
    public Optional<Path> chooseProject() {
        heard.add("open");
        return file;
    }

    @Override
    public Optional<Path> chooseWhereToSave(String suggestedName) {
        heard.add("save as " + suggestedName);
        return file;
    }

    @Override
    public Optional<Path> chooseFigure(String suggestedName, String extension) {
        heard.add("figure " + suggestedName);
        return file;
    }

    @Override
    public Optional<Path> chooseData(Optional<Path> folder) {
        return Optional.empty();
    }

    @Override
    public Unsaved askAboutUnsaved(String title) {
        heard.add("unsaved " + title);
        return unsaved;
    }

    @Override
    public Optional<String> askText(String heading, String explanation, String value) {
        heard.add(heading + " " + value);
        return text;
    }

    @Override
    public boolean agree(String heading, String action, List<Problem> problems) {
        heard.add(heading);
        return agrees;
    }

    @Override
    public void tell(String heading, List<Problem> problems) {
        heard.add(heading);
    }

    @Override
    public void about() {
        heard.add("about");
    }
}
