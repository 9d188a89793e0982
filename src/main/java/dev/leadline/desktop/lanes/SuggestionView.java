package dev.leadline.desktop.lanes;

import dev.leadline.desktop.lanes.SuggestionViewModel.State;
import dev.leadline.desktop.style.Figures;
import dev.leadline.desktop.style.Styles;
import dev.leadline.desktop.working.Messages;
import dev.leadline.study.RatioText;
import dev.leadline.study.Suggestion;
import java.util.List;
import javafx.geometry.Pos;
import javafx.scene.Node;
import javafx.scene.control.Button;
import javafx.scene.control.Label;
import javafx.scene.control.Tooltip;
import javafx.scene.layout.HBox;
import javafx.scene.layout.Priority;
import javafx.scene.layout.Region;
import javafx.scene.layout.VBox;

/// Schemes that were tried, the most that is certain first.
final class SuggestionView extends VBox {
    private final SuggestionViewModel model;

    SuggestionView(SuggestionViewModel model) {
        this.model = model;
        setId("suggestion");
        getStyleClass().add("suggestion");
        model.state().addListener((_, _, state) -> show(state));
        model.project().draft().addListener((_, _, _) -> show(model.state().get()));
        show(model.state().get());
    }

    private void show(State state) {
        getChildren()
                .setAll(
                        switch (state) {
                            case State.Idle _ -> List.of();
                            case State.Trying(String scheme) ->
                                List.of(line(
                                        quiet("Trying " + scheme + "\u2026"),
                                        button("stop", "Ends the search", model::leave)));
                            case State.Failed(var problem) -> List.of(told(problem));
                            case State.Found(var suggestion) -> found(suggestion);
                        });
        setVisible(!getChildren().isEmpty());
        setManaged(!getChildren().isEmpty());
    }

    private static Node told(dev.leadline.problem.Problem problem) {
        var messages = new Messages();
        messages.show(List.of(problem));
        return messages;
    }

    private List<Node> found(Suggestion suggestion) {
        var head =
                quiet("Times less time than plain draws, in pilots of " + Figures.count(suggestion.draws()) + " draws");
        var table = new VBox(4);
        table.setId("suggestion-table");
        for (int r = 0; r < suggestion.rows().size(); r++) {
            table.getChildren().add(row(r, suggestion));
        }
        return List.of(line(head, button("close", "Puts the table away", model::leave)), table);
    }

    private Node row(int r, Suggestion suggestion) {
        var row = suggestion.rows().get(r);
        boolean recommended = row.equals(suggestion.recommended());
        var times = new Label(row.efficiencyRatio().map(RatioText::of).orElse("?"));
        times.getStyleClass().add("figure");
        times.setMinWidth(USE_PREF_SIZE);
        var scheme = new Label(row.scheme() + (recommended ? " (recommended)" : ""));
        scheme.setMinWidth(0);
        scheme.setTooltip(new Tooltip(row.scheme()));
        scheme.getStyleClass().add(recommended ? "primary" : "scheme");
        var gap = new Region();
        HBox.setHgrow(gap, Priority.ALWAYS);
        var add = button(
                "add as lane " + model.lanes().nextName(), "Samples so in a lane of its own", () -> model.add(row));
        add.setId("add-suggested-" + r);
        add.setDisable(!model.lanes().canAdd());
        var reason = quiet(row.reason());
        reason.setWrapText(true);
        reason.setMinHeight(USE_PREF_SIZE);
        return new VBox(line(times, scheme, gap, add), reason);
    }

    private static Label quiet(String text) {
        var label = new Label(text);
        label.getStyleClass().add(Styles.QUIET);
        label.setMinWidth(0);
        return label;
    }

    private static HBox line(Node... nodes) {
        var line = new HBox(8, nodes);
        line.setAlignment(Pos.CENTER_LEFT);
        return line;
    }

    private static Button button(String text, String tip, Runnable action) {
        var button = new Button(text);
        button.getStyleClass().setAll("button", Styles.LINK);
        button.setMinWidth(Region.USE_PREF_SIZE);
        button.setTooltip(new Tooltip(tip));
        button.setOnAction(_ -> action.run());
        return button;
    }
}
