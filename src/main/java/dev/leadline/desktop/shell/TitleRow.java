package dev.leadline.desktop.shell;

import dev.leadline.desktop.run.RunViewModel;
import dev.leadline.desktop.style.Styles;
import javafx.beans.binding.Bindings;
import javafx.geometry.Pos;
import javafx.scene.Node;
import javafx.scene.control.Button;
import javafx.scene.control.Label;
import javafx.scene.control.Tooltip;
import javafx.scene.layout.HBox;
import javafx.scene.layout.Priority;
import javafx.scene.layout.Region;
import javafx.scene.layout.StackPane;

/// The project's title, and what starts, pauses and stops a run.
final class TitleRow extends HBox {
    /// Of the row's width, so that the title keeps its room.
    private static final double TO_MEND = .45;

    TitleRow(WorkbenchViewModel model) {
        getStyleClass().add(Styles.TITLE_ROW);
        setAlignment(Pos.CENTER_LEFT);
        var title = new Label();
        title.getStyleClass().add(Styles.TITLE);
        title.textProperty().bind(model.title());
        title.setMinWidth(40);
        var edited = new Label("\u00b7 edited");
        edited.setId("edited");
        edited.getStyleClass().add(Styles.QUIET);
        edited.setMinWidth(USE_PREF_SIZE);
        edited.visibleProperty().bind(model.project().edited());
        var gap = new Region();
        HBox.setHgrow(gap, Priority.ALWAYS);

        var toMend = new Label();
        toMend.setId("to-mend");
        toMend.getStyleClass().add("to-mend");
        toMend.textProperty().bind(model.toMend());
        toMend.managedProperty().bind(toMend.textProperty().isNotEmpty());
        toMend.maxWidthProperty().bind(widthProperty().multiply(TO_MEND));
        toMend.setMinWidth(0);
        toMend.setTooltip(new Tooltip());
        toMend.getTooltip().textProperty().bind(toMend.textProperty());

        var state = model.run().state();
        var run = new Button("Run");
        run.setId("run");
        run.getStyleClass().add(Styles.RUN);
        run.setOnAction(_ -> model.startRun());
        run.disableProperty().bind(model.canRun().not());
        var why = new Tooltip();
        why.textProperty().bind(model.whyNotRun());
        var pause = new Button();
        pause.setId("pause");
        pause.textProperty().bind(state.map(s -> RunViewModel.isPaused(s) ? "Resume" : "Pause"));
        pause.setOnAction(_ -> model.run().pauseOrResume());
        pause.setTooltip(
                new Tooltip("Keeps what was drawn; resuming gives the same digits as if nothing had happened"));
        pause.disableProperty().bind(Bindings.createBooleanBinding(() -> !RunViewModel.isUnderWay(state.get()), state));
        var stop = new Button("Stop");
        stop.setId("stop");
        stop.setOnAction(_ -> model.run().stop());
        stop.setTooltip(new Tooltip("Ends the run with what was drawn"));
        stop.disableProperty().bind(pause.disableProperty());
        getChildren().addAll(title, edited, gap, toMend, told(run, why), pause, stop);
        pause.setMinWidth(76);
        run.setMinWidth(64);
        stop.setMinWidth(64);
    }

    /// A disabled button shows no tooltip, so its place does.
    private static Node told(Button button, Tooltip tip) {
        var place = new StackPane(button);
        Tooltip.install(place, tip);
        return place;
    }
}
