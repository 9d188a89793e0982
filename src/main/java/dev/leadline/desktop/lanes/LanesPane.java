package dev.leadline.desktop.lanes;

import dev.leadline.desktop.run.RunViewModel;
import dev.leadline.desktop.style.Styles;
import dev.leadline.study.Comparison;
import java.util.List;
import java.util.function.BiConsumer;
import javafx.beans.binding.Bindings;
import javafx.geometry.Pos;
import javafx.scene.Node;
import javafx.scene.control.Button;
import javafx.scene.control.CheckBox;
import javafx.scene.control.Label;
import javafx.scene.control.ScrollPane;
import javafx.scene.control.Tooltip;
import javafx.scene.layout.HBox;
import javafx.scene.layout.Priority;
import javafx.scene.layout.Region;
import javafx.scene.layout.VBox;

/// What stands under the picture: the lanes, how they compare, and schemes that may be worth a lane.
public final class LanesPane extends VBox {
    /// The picture keeps the rest.
    private static final double MOST_HEIGHT = 330;

    private final LanesViewModel model;
    private final LaneForm form;
    private final LaneTable table;
    private final VBox sentences = new VBox(2);
    private final Button add = link("add-lane", "+ lane", "Another scheme on the same question, at most four");
    private final CheckBox shares = new CheckBox("common random numbers");
    private List<Comparison> compared = List.of();

    /// @param openDensity the density that an input is drawn from in a lane
    public LanesPane(LanesViewModel model, SuggestionViewModel suggestion, BiConsumer<Integer, String> openDensity) {
        this.model = model;
        getStyleClass().add("lanes-pane");
        form = new LaneForm(model, openDensity);
        table = new LaneTable(model, form);
        sentences.setId("comparison");
        sentences.getStyleClass().add("comparison");
        add.setOnAction(_ -> {
            model.add();
            model.open().set(true);
        });
        shares.setId("common-random-numbers");
        shares.setMinWidth(USE_PREF_SIZE);
        shares.setTooltip(new Tooltip(
                "Lanes draw the same random numbers: their difference is then known better than" + " each of them"));
        shares.setOnAction(_ -> model.shares(shares.isSelected()));
        var suggest = link(
                "suggest",
                "suggest a scheme",
                "Tries the schemes that apply in short pilots, each timed beside plain draws");
        suggest.setOnAction(_ -> suggestion.search());
        suggest.disableProperty()
                .bind(Bindings.createBooleanBinding(
                        () -> model.project().sound().isEmpty()
                                || suggestion.state().get() instanceof SuggestionViewModel.State.Trying,
                        suggestion.state(),
                        model.project().check(),
                        model.project().problems()));
        var gap = new Region();
        HBox.setHgrow(gap, Priority.ALWAYS);
        var below = new HBox(10, add, suggest, gap, shares);
        below.setAlignment(Pos.CENTER_LEFT);
        below.getStyleClass().add("below-lanes");
        var all = new VBox(table, sentences, below, new SuggestionView(suggestion));
        getChildren().add(new Fitting(all));
        model.project().draft().addListener((_, _, _) -> update());
        model.project().problems().addListener((_, _, _) -> update());
        model.selected().addListener((_, _, _) -> update());
        model.open().addListener((_, _, _) -> update());
        model.run().state().addListener((_, _, _) -> showRun());
        update();
    }

    /// As high as what is in it, up to a limit; from there on it scrolls.
    private static final class Fitting extends ScrollPane {
        private final Region content;

        Fitting(Region content) {
            super(content);
            this.content = content;
            setFitToWidth(true);
            setHbarPolicy(ScrollBarPolicy.NEVER);
            setMinHeight(USE_PREF_SIZE);
            setMaxHeight(USE_PREF_SIZE);
        }

        @Override
        protected double computePrefHeight(double width) {
            return Math.min(MOST_HEIGHT, Math.ceil(content.prefHeight(getWidth())) + 2);
        }
    }

    private void update() {
        add.setDisable(!model.canAdd());
        boolean several = model.lanes().size() > 1;
        see(shares, several || model.isShared());
        shares.setSelected(model.isShared());
        openWhereFaulty();
        showRun();
        form.update();
    }

    /// A fault is never folded away.
    private void openWhereFaulty() {
        if (model.open().get()) {
            return;
        }
        for (int i = 0; i < model.lanes().size(); i++) {
            if (!model.problems(i).isEmpty()) {
                model.select(i);
                model.open().set(true);
                return;
            }
        }
    }

    private void showRun() {
        var run = RunViewModel.shown(model.run().state().get());
        table.show(LaneRows.of(model.lanes(), run), LaneRows.valueHead(run));
        var comparisons = model.comparisons();
        if (!comparisons.equals(compared)) {
            compared = comparisons;
            sentences
                    .getChildren()
                    .setAll(comparisons.stream().map(LanesPane::sentence).toList());
        }
        see(sentences, !comparisons.isEmpty());
    }

    private static Node sentence(Comparison comparison) {
        var label = new Label(comparison.sentence());
        label.setWrapText(true);
        label.setMinHeight(USE_PREF_SIZE);
        if (!comparison.notes().isEmpty()) {
            label.setTooltip(new Tooltip(String.join("\n", comparison.notes())));
        }
        return label;
    }

    private static void see(Node node, boolean seen) {
        node.setVisible(seen);
        node.setManaged(seen);
    }

    private static Button link(String id, String text, String tip) {
        var button = new Button(text);
        button.setId(id);
        button.getStyleClass().setAll("button", Styles.LINK);
        button.setMinWidth(USE_PREF_SIZE);
        button.setTooltip(new Tooltip(tip));
        return button;
    }
}
