package dev.leadline.desktop.grounds;

import dev.leadline.desktop.style.Styles;
import dev.leadline.ground.Action;
import dev.leadline.ground.Ground;
import java.util.List;
import java.util.Locale;
import java.util.function.Consumer;
import javafx.beans.property.SimpleStringProperty;
import javafx.beans.property.StringProperty;
import javafx.geometry.Pos;
import javafx.scene.Node;
import javafx.scene.control.Button;
import javafx.scene.control.Label;
import javafx.scene.control.ScrollPane;
import javafx.scene.control.Tooltip;
import javafx.scene.layout.BorderPane;
import javafx.scene.layout.HBox;
import javafx.scene.layout.Priority;
import javafx.scene.layout.VBox;

/// The right of the window: the reasons for and against signing.
public final class GroundsPane extends BorderPane {
    private final VBox list = new VBox();
    private final ScrollPane scroll = new ScrollPane(list);
    private final StringProperty lane = new SimpleStringProperty("");
    private final Consumer<Action> taken;
    private List<Ground> shown = List.of();

    /// @param taken what a person chose to do about a doubt
    public GroundsPane(Consumer<Action> taken) {
        this.taken = taken;
        getStyleClass().addAll(Styles.PANE, "grounds");
        var title = new Label();
        title.getStyleClass().add(Styles.PANE_TITLE);
        title.textProperty().bind(lane.map(of -> of.isEmpty() ? "Grounds" : "Grounds \u00b7 " + of));
        list.getStyleClass().add("content");
        list.setId("grounds");
        scroll.setFitToWidth(true);
        scroll.setHbarPolicy(ScrollPane.ScrollBarPolicy.NEVER);
        setTop(title);
        setCenter(scroll);
        fill();
    }

    /// Which lane they speak of, as `lane B`; empty where there is only one.
    public StringProperty lane() {
        return lane;
    }

    /// @param grounds strongest doubts first
    public void show(List<Ground> grounds) {
        if (!grounds.equals(shown)) {
            shown = grounds;
            fill();
        }
    }

    public void reveal() {
        scroll.setVvalue(0);
        scroll.requestFocus();
    }

    private void fill() {
        list.getChildren().clear();
        if (shown.isEmpty()) {
            list.getChildren()
                    .add(wrapped(
                            "Reasons for and against signing appear here once a run shows something.", Styles.QUIET));
        }
        for (var status : List.of(Ground.Status.DOUBTED, Ground.Status.SHOWN, Ground.Status.NOT_DONE)) {
            var some = shown.stream().filter(g -> g.status() == status).toList();
            if (!some.isEmpty()) {
                var head = new Label(words(status));
                head.getStyleClass().addAll(Styles.STATUS, style(status));
                list.getChildren().add(head);
                some.forEach(g -> list.getChildren().add(row(g)));
            }
        }
    }

    private Node row(Ground g) {
        var mark = new Label(mark(g));
        mark.getStyleClass().addAll(Styles.GROUND_MARK, style(g.status()));
        mark.setMinWidth(14);
        var texts = new VBox(2);
        g.strength().ifPresent(s -> texts.getChildren().add(strength(s)));
        texts.getChildren().add(wrapped(g.text(), "ground-text"));
        g.remedy().ifPresent(r -> texts.getChildren().add(wrapped(r, "remedy")));
        g.actions().stream()
                .filter(GroundsPane::isOffered)
                .forEach(a -> texts.getChildren().add(button(a)));
        HBox.setHgrow(texts, Priority.ALWAYS);
        var row = new HBox(6, mark, texts);
        row.getStyleClass().add(Styles.GROUND);
        row.setAccessibleText(words(g.status()) + ": " + g.text());
        return row;
    }

    private Button button(Action action) {
        var button = new Button(action.words());
        button.getStyleClass().addAll("small", "ground-action");
        button.setWrapText(true);
        button.setAlignment(Pos.CENTER_LEFT);
        button.setMinHeight(USE_PREF_SIZE);
        button.setMaxWidth(Double.MAX_VALUE);
        button.setTooltip(new Tooltip(tip(action)));
        button.setOnAction(_ -> taken.accept(action));
        return button;
    }

    private static boolean isOffered(Action action) {
        return !(action instanceof Action.Rehearse);
    }

    private static String tip(Action action) {
        return switch (action) {
            case Action.MoreDraws _ -> "Allows so many draws and runs again; a longer run begins with the same draws";
            case Action.DrawWider _ -> "Looks for a lane that draws what counts more often, and shows what it found";
            case Action.AddReference _ -> "Goes to where a reference value is written";
            case Action.Rehearse _ -> "Runs the same set-up many times over";
            case Action.RunOtherSeed _ -> "Runs again with fresh draws";
            case Action.LookAtDraw _ -> "Shows every input, step and outcome of it";
            case Action.AskAnother _ ->
                "Goes to what is asked. Another question has another answer: it does not mend this one";
        };
    }

    private static Label strength(Ground.Strength strength) {
        String word = strength.name().toLowerCase(Locale.ROOT);
        var label = new Label(word);
        label.getStyleClass().addAll("strength", word);
        return label;
    }

    private static Label wrapped(String text, String style) {
        var label = new Label(text);
        label.setWrapText(true);
        label.setMinHeight(USE_PREF_SIZE);
        label.getStyleClass().add(style);
        return label;
    }

    private static String words(Ground.Status status) {
        return switch (status) {
            case SHOWN -> "shown";
            case DOUBTED -> "doubted";
            case NOT_DONE -> "not done";
        };
    }

    private static String style(Ground.Status status) {
        return switch (status) {
            case SHOWN -> "shown";
            case DOUBTED -> "doubted";
            case NOT_DONE -> "not-done";
        };
    }

    /// Told apart without colour.
    private static String mark(Ground g) {
        return switch (g.status()) {
            case SHOWN -> "\u2022";
            case DOUBTED -> "!";
            case NOT_DONE -> "\u25cb";
        };
    }
}
