package dev.leadline.desktop.shell;

import dev.leadline.desktop.style.Styles;
import java.util.stream.Stream;
import javafx.beans.binding.Bindings;
import javafx.geometry.Pos;
import javafx.scene.control.Button;
import javafx.scene.control.Label;
import javafx.scene.control.ProgressBar;
import javafx.scene.control.Tooltip;
import javafx.scene.layout.HBox;
import javafx.scene.layout.Priority;
import javafx.scene.layout.Region;

/// The bottom of the window: the answer as it will be pasted, and how far the run has come.
final class AnswerLine extends HBox {
    private final WorkbenchViewModel model;
    private final ProgressBar bar = new ProgressBar();
    private final Button objections = new Button();

    AnswerLine(WorkbenchViewModel model, Runnable toGrounds, Runnable copy) {
        this.model = model;
        getStyleClass().add(Styles.ANSWER_LINE);
        setAlignment(Pos.CENTER_LEFT);
        var answer = new Label();
        answer.setId("answer");
        answer.getStyleClass().add(Styles.ANSWER);
        answer.textProperty().bind(model.answer().map(text -> text.isEmpty() ? "No answer yet" : text));
        answer.setMinWidth(60);
        var edited = new Label("edited since this run");
        edited.getStyleClass().add("badge");
        edited.setMinWidth(USE_PREF_SIZE);
        edited.setTooltip(new Tooltip("The answer belongs to the question as it was when Run was pressed"));
        edited.visibleProperty().bind(model.editedSinceRun());
        edited.managedProperty().bind(model.editedSinceRun());
        objections.getStyleClass().addAll("objections", Styles.LINK);
        objections.setTooltip(new Tooltip("Shows the grounds"));
        objections.setOnAction(_ -> toGrounds.run());
        objections.setMinWidth(USE_PREF_SIZE);
        var progress = new Label();
        progress.setId("progress");
        progress.getStyleClass().add(Styles.QUIET);
        progress.textProperty()
                .bind(Bindings.createStringBinding(
                        () -> beside(model),
                        model.progress(),
                        model.notice(),
                        model.run().state()));
        progress.setMinWidth(0);
        bar.setPrefWidth(120);
        bar.setAccessibleText("How far the run has come");
        var gap = new Region();
        HBox.setHgrow(gap, Priority.ALWAYS);
        var copyButton = new Button("Copy");
        copyButton.setId("copy");
        copyButton.setMinWidth(USE_PREF_SIZE);
        copyButton.setTooltip(new Tooltip("Copies the answer exactly as it stands here"));
        copyButton.setOnAction(_ -> copy.run());
        copyButton.disableProperty().bind(model.answer().isEmpty());
        getChildren().addAll(answer, edited, gap, progress, bar, objections, copyButton);
        model.run().state().addListener((_, _, _) -> update());
        model.grounds().addListener((_, _, _) -> update());
        update();
    }

    /// How far a run has come, else what was just done, else what repeats the run.
    private static String beside(WorkbenchViewModel model) {
        return Stream.of(
                        model.progress().get(),
                        model.notice().get(),
                        WorkbenchViewModel.seedOf(model.run().state().get()))
                .filter(text -> !text.isEmpty())
                .findFirst()
                .orElse("");
    }

    private void update() {
        var state = model.run().state().get();
        String count = WorkbenchViewModel.objectionsOf(state, model.lanes().selectedName());
        objections.setText(count);
        objections.setVisible(!count.isEmpty());
        objections.setManaged(!count.isEmpty());
        objections.pseudoClassStateChanged(
                javafx.css.PseudoClass.getPseudoClass("standing"), !count.isEmpty() && !count.startsWith("no"));
        double part = WorkbenchViewModel.partOf(state, model.lanes().selectedName());
        bar.setProgress(Double.isNaN(part) ? 0 : part);
        bar.setVisible(!Double.isNaN(part));
        bar.setManaged(!Double.isNaN(part));
    }
}
