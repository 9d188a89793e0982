package dev.leadline.desktop.shell;

import dev.leadline.desktop.style.Styles;
import dev.leadline.problem.Problem;
import dev.leadline.project.ProjectFile;
import java.io.File;
import java.nio.file.Path;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import javafx.scene.Node;
import javafx.scene.control.ButtonBar.ButtonData;
import javafx.scene.control.ButtonType;
import javafx.scene.control.Dialog;
import javafx.scene.control.DialogPane;
import javafx.scene.control.Label;
import javafx.scene.control.TextField;
import javafx.scene.layout.VBox;
import javafx.stage.FileChooser;
import javafx.stage.FileChooser.ExtensionFilter;
import javafx.stage.Stage;

/// Dialogs of the platform over a window.
final class StageDialogs implements Dialogs {
    private static final double WIDTH = 460;

    private final Stage stage;
    private Optional<File> folder = Optional.empty();

    StageDialogs(Stage stage) {
        this.stage = stage;
    }

    @Override
    public Optional<Path> chooseProject() {
        var chooser = chooser("Open a project", new ExtensionFilter("Leadline projects", "*" + ProjectFile.EXTENSION));
        chooser.getExtensionFilters().add(new ExtensionFilter("All files", "*"));
        return chosen(chooser.showOpenDialog(stage));
    }

    @Override
    public Optional<Path> chooseWhereToSave(String suggestedName) {
        var chooser =
                chooser("Save the project", new ExtensionFilter("Leadline projects", "*" + ProjectFile.EXTENSION));
        chooser.setInitialFileName(suggestedName);
        return chosen(chooser.showSaveDialog(stage));
    }

    @Override
    public Optional<Path> chooseFigure(String suggestedName, String extension) {
        var chooser = chooser(
                "Export the picture",
                new ExtensionFilter(extension.toUpperCase(Locale.ROOT) + " pictures", "*." + extension));
        chooser.setInitialFileName(suggestedName);
        return chosen(chooser.showSaveDialog(stage));
    }

    @Override
    public Optional<Path> chooseData(Optional<Path> below) {
        var chooser = chooser("Choose data", new ExtensionFilter("Text files", "*.csv", "*.txt", "*.tsv", "*.dat"));
        chooser.getExtensionFilters().add(new ExtensionFilter("All files", "*"));
        below.map(Path::toFile).filter(File::isDirectory).ifPresent(chooser::setInitialDirectory);
        return Optional.ofNullable(chooser.showOpenDialog(stage)).map(File::toPath);
    }

    private FileChooser chooser(String title, ExtensionFilter filter) {
        var chooser = new FileChooser();
        chooser.setTitle(title);
        chooser.getExtensionFilters().add(filter);
        folder.filter(File::isDirectory).ifPresent(chooser::setInitialDirectory);
        return chooser;
    }

    private Optional<Path> chosen(File file) {
        if (file == null) {
            return Optional.empty();
        }
        folder = Optional.ofNullable(file.getParentFile());
        return Optional.of(file.toPath());
    }

    @Override
    public Unsaved askAboutUnsaved(String title) {
        var save = new ButtonType("Save", ButtonData.YES);
        var discard = new ButtonType("Do not save", ButtonData.NO);
        var cancel = new ButtonType("Cancel", ButtonData.CANCEL_CLOSE);
        var dialog = this.<ButtonType>dialog("Save the edits to \u201c" + title + "\u201d?", save, discard, cancel);
        dialog.getDialogPane().setContent(text("They are in no file yet, and would be lost.", ""));
        var answer = dialog.showAndWait().orElse(cancel);
        return answer == save ? Unsaved.SAVE : answer == discard ? Unsaved.DISCARD : Unsaved.CANCEL;
    }

    @Override
    public Optional<String> askText(String heading, String explanation, String value) {
        var dialog = this.<String>dialog(heading, ButtonType.OK, ButtonType.CANCEL);
        var field = new TextField(value);
        field.setAccessibleText(heading);
        dialog.getDialogPane().setContent(new VBox(10, text(explanation, ""), field));
        dialog.setResultConverter(button -> button == ButtonType.OK ? field.getText() : null);
        dialog.setOnShown(_ -> field.requestFocus());
        return dialog.showAndWait();
    }

    @Override
    public boolean agree(String heading, String action, List<Problem> problems) {
        var goOn = new ButtonType(action, ButtonData.YES);
        var dialog = this.<ButtonType>dialog(heading, goOn, ButtonType.CANCEL);
        dialog.getDialogPane().setContent(listed(problems));
        return dialog.showAndWait().filter(goOn::equals).isPresent();
    }

    @Override
    public void tell(String heading, List<Problem> problems) {
        var dialog = this.<ButtonType>dialog(heading, ButtonType.CLOSE);
        dialog.getDialogPane().setContent(listed(problems));
        dialog.showAndWait();
    }

    private static Node listed(List<Problem> problems) {
        var box = new VBox(4);
        problems.stream().limit(6).forEach(p -> {
            box.getChildren().add(text(p.primary(), "primary"));
            p.detail().ifPresent(d -> box.getChildren().add(text(d, "detail")));
            p.hint().ifPresent(h -> box.getChildren().add(text(h, "hint")));
        });
        if (problems.size() > 6) {
            box.getChildren().add(text("and " + (problems.size() - 6) + " more", Styles.QUIET));
        }
        return box;
    }

    @Override
    public void about() {
        var dialog = this.<ButtonType>dialog("Leadline " + version(), ButtonType.CLOSE);
        dialog.getDialogPane()
                .setContent(new VBox(
                        10,
                        text(
                                "Expected values, integrals and event probabilities by random sampling, with intervals"
                                        + " that hold. Named after the weighted, marked line that sailors drop to learn"
                                        + " a depth by sampling it.",
                                ""),
                        text("What an interval does not say", "primary"),
                        text(
                                "It covers sampling error only; it says nothing about whether the densities and the"
                                        + " formula are right.",
                                ""),
                        text("Where safety depends on the answer", "primary"),
                        text(
                                "Results support, and do not replace, the judgement of a licensed engineer or qualified"
                                        + " professional; applicable local codes and standards govern. A sampled"
                                        + " probability rests on the stated densities.",
                                ""),
                        text("Apache License 2.0", Styles.QUIET)));
        dialog.showAndWait();
    }

    private static String version() {
        String version = StageDialogs.class.getPackage().getImplementationVersion();
        return version == null ? "" : version;
    }

    private <R> Dialog<R> dialog(String heading, ButtonType... buttons) {
        var dialog = new Dialog<R>();
        dialog.initOwner(stage);
        dialog.setTitle("Leadline");
        dialog.setHeaderText(heading);
        DialogPane pane = dialog.getDialogPane();
        pane.getButtonTypes().setAll(buttons);
        pane.getStylesheets().setAll(stage.getScene().getStylesheets());
        pane.getStyleClass().add("workbench");
        if (stage.getScene().getRoot().getStyleClass().contains(Styles.DARK)) {
            pane.getStyleClass().add(Styles.DARK);
        }
        pane.setPrefWidth(WIDTH);
        return dialog;
    }

    private static Node text(String text, String style) {
        var label = new Label(text);
        label.setWrapText(true);
        label.setMaxWidth(WIDTH - 40);
        label.setMinHeight(javafx.scene.layout.Region.USE_PREF_SIZE);
        if (!style.isEmpty()) {
            label.getStyleClass().add(style);
        }
        return label;
    }
}
