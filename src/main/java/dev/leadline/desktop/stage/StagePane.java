package dev.leadline.desktop.stage;

import dev.leadline.chart.PictureKind;
import dev.leadline.chart.Reading;
import dev.leadline.chart.View;
import dev.leadline.desktop.style.Styles;
import javafx.beans.binding.Bindings;
import javafx.geometry.Pos;
import javafx.scene.Node;
import javafx.scene.control.Button;
import javafx.scene.control.Label;
import javafx.scene.control.ToggleButton;
import javafx.scene.control.ToggleGroup;
import javafx.scene.control.Tooltip;
import javafx.scene.layout.BorderPane;
import javafx.scene.layout.HBox;
import javafx.scene.layout.Priority;
import javafx.scene.layout.Region;
import javafx.scene.layout.StackPane;

/// The centre of the window: the picture, and the lanes under it.
public final class StagePane extends BorderPane {
    private final Label reading = new Label();
    private final StageViewModel model;

    /// @param lanes what stands under the picture
    public StagePane(StageViewModel model, Node lanes) {
        this.model = model;
        getStyleClass().addAll(Styles.PANE, Styles.STAGE);
        reading.getStyleClass().add(Styles.READING);
        reading.setId("reading");
        reading.setMinWidth(0);
        var gap = new Region();
        HBox.setHgrow(gap, Priority.ALWAYS);
        var scales = new ToggleGroup();
        var log = scaleButton("log", "Draws on a logarithmic axis", scales);
        log.setId("axis-log");
        var linear = scaleButton("linear", "Draws on a linear axis", scales);
        linear.setId("axis-linear");
        scales.selectToggle(model.logDraws().get() ? log : linear);
        scales.selectedToggleProperty().addListener((_, old, chosen) -> {
            if (chosen == null) {
                scales.selectToggle(old);
            } else {
                model.logDraws().set(chosen == log);
            }
        });
        var pair = new HBox(log, linear);
        pair.getStyleClass().add("pair");
        var follow = new Button("follow");
        follow.setId("follow");
        follow.getStyleClass().addAll("small");
        follow.setMinWidth(USE_PREF_SIZE);
        follow.setTooltip(new Tooltip("Both axes follow the run again (double-click the picture)"));
        follow.setOnAction(_ -> model.reset());
        follow.disableProperty()
                .bind(Bindings.createBooleanBinding(
                        () -> isFollowing(model.view().get()), model.view()));
        pair.disableProperty().bind(model.kind().isNotEqualTo(PictureKind.SETTLING));
        var head = new HBox(10, tabs(), reading, gap, follow, pair);
        head.setAlignment(Pos.CENTER_LEFT);
        head.getStyleClass().add(Styles.STAGE_HEAD);
        var picture = new PictureView(
                model, found -> reading.setText(found.map(Reading::text).orElse("")));
        var empty = new Label("The picture appears once the question is complete.");
        empty.getStyleClass().add(Styles.QUIET);
        empty.setMouseTransparent(true);
        empty.visibleProperty()
                .bind(Bindings.createBooleanBinding(() -> model.drawn().get().isEmpty(), model.drawn()));
        setTop(head);
        setCenter(new StackPane(picture, empty));
        setBottom(lanes);
        setMinWidth(420);
    }

    /// The names of the pictures, the one that is shown pressed.
    private Node tabs() {
        var tabs = new HBox(2);
        tabs.getStyleClass().add("stage-tabs");
        tabs.setMinWidth(USE_PREF_SIZE);
        var group = new ToggleGroup();
        for (var kind : PictureKind.values()) {
            var tab = new ToggleButton(kind.title());
            tab.setId("view-" + kind.word());
            tab.getStyleClass().setAll("stage-tab");
            tab.setMinWidth(USE_PREF_SIZE);
            tab.setToggleGroup(group);
            tab.setTooltip(new Tooltip(kind.title() + ": " + kind.shows()));
            tab.setSelected(kind == model.kind().get());
            tab.setOnAction(_ -> {
                tab.setSelected(true);
                model.kind().set(kind);
            });
            model.kind().addListener((_, _, now) -> tab.setSelected(now == kind));
            tab.visibleProperty()
                    .bind(Bindings.createBooleanBinding(
                            () -> model.isSeen(kind) || model.kind().get() == kind, model.run(), model.kind()));
            tab.managedProperty().bind(tab.visibleProperty());
            tabs.getChildren().add(tab);
        }
        return tabs;
    }

    private static boolean isFollowing(View view) {
        return view.draws().isEmpty() && view.values().isEmpty();
    }

    private static ToggleButton scaleButton(String text, String tip, ToggleGroup group) {
        var button = new ToggleButton(text);
        button.getStyleClass().add("small");
        button.setToggleGroup(group);
        button.setTooltip(new Tooltip(tip));
        button.setMinWidth(USE_PREF_SIZE);
        return button;
    }
}
