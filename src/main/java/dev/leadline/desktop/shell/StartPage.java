package dev.leadline.desktop.shell;

import dev.leadline.desktop.background.Background;
import dev.leadline.desktop.style.Styles;
import dev.leadline.model.Sentence;
import java.util.List;
import javafx.geometry.Pos;
import javafx.scene.control.Button;
import javafx.scene.control.Label;
import javafx.scene.layout.FlowPane;
import javafx.scene.layout.StackPane;
import javafx.scene.layout.VBox;

/// What the window shows while no project is open.
final class StartPage extends StackPane {
    private final FlowPane samples = new FlowPane(12, 12);
    private final WorkbenchViewModel model;

    StartPage(WorkbenchViewModel model, Background background) {
        this.model = model;
        getStyleClass().add(Styles.START);
        var heading = new Label("What is the number, and how well is it known?");
        heading.getStyleClass().add("heading");
        var text =
                new Label("Expected values, integrals and chances by random sampling, with an interval you can sign.");
        text.getStyleClass().add(Styles.QUIET);
        var formula = door(
                "start-formula", "I have a formula", "Its mean over uncertain inputs", () -> model.newProject("mean"));
        var limit = door(
                "start-limit",
                "I have a limit",
                "The chance that it is exceeded",
                () -> model.newProject("probability"));
        var area = door(
                "start-integral",
                "I have an integral",
                "Its value, with an interval",
                () -> model.newProject("integral"));
        var open = new Button("Open a project\u2026");
        open.setId("start-open");
        open.setOnAction(_ -> model.open());
        var doors = new FlowPane(12, 12, formula, limit, area);
        var title = new Label("Sample projects, from an invented harbour");
        title.getStyleClass().add(Styles.PANE_TITLE);
        var box = new VBox(14, heading, text, doors, open, title, samples);
        box.setMaxWidth(760);
        box.setMaxHeight(USE_PREF_SIZE);
        box.setAlignment(Pos.CENTER_LEFT);
        samples.setPrefWrapLength(760);
        getChildren().add(box);
        background.run(Samples::all, this::fill, _ -> fill(List.of()));
    }

    private void fill(List<Samples.Sample> all) {
        if (all.isEmpty()) {
            samples.getChildren().setAll(new Label("This build came without its sample projects."));
        }
        for (var sample : all) {
            samples.getChildren().add(card(sample));
        }
    }

    private Button card(Samples.Sample sample) {
        var title = new Label(sample.draft().title());
        title.getStyleClass().add("card-title");
        title.setWrapText(true);
        var sentence = new Label(Sentence.of(sample.draft()).text());
        sentence.getStyleClass().add(Styles.QUIET);
        sentence.setWrapText(true);
        var card = card("sample-" + sample.name(), title, sentence, 374, 96, () -> model.openSample(sample.name()));
        card.setAccessibleText("Open the sample project " + sample.draft().title());
        return card;
    }

    private static Button door(String id, String name, String use, Runnable action) {
        var title = new Label(name);
        title.getStyleClass().add("card-title");
        var text = new Label(use);
        text.getStyleClass().add(Styles.QUIET);
        return card(id, title, text, 245, 66, action);
    }

    private static Button card(String id, Label title, Label text, double width, double height, Runnable action) {
        var box = new VBox(4, title, text);
        box.setMaxWidth(width - 30);
        box.setPrefWidth(width - 30);
        var card = new Button();
        card.setId(id);
        card.setGraphic(box);
        card.getStyleClass().setAll(Styles.CARD);
        card.setMinSize(width, height);
        card.setPrefSize(width, height);
        card.setMaxSize(width, height);
        card.setOnAction(_ -> action.run());
        return card;
    }
}
