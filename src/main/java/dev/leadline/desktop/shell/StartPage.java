package dev.leadline.desktop.shell;

import dev.leadline.desktop.background.Background;
import dev.leadline.desktop.style.Styles;
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
        var empty = new Button("New question");
        empty.setId("start-new");
        empty.getStyleClass().add(Styles.RUN);
        empty.setOnAction(_ -> model.newProject());
        var open = new Button("Open a project\u2026");
        open.setId("start-open");
        open.setOnAction(_ -> model.open());
        var doors = new FlowPane(10, 10, empty, open);
        var title = new Label("Sample projects, from an invented harbour");
        title.getStyleClass().add(Styles.PANE_TITLE);
        var box = new VBox(14, heading, text, doors, title, samples);
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
        var box = new VBox(4, title, sentence);
        box.setPrefWidth(350);
        var card = new Button();
        card.setId("sample-" + sample.name());
        card.setGraphic(box);
        card.getStyleClass().setAll(Styles.CARD);
        card.setAccessibleText("Open the sample project " + sample.draft().title());
        card.setOnAction(_ -> model.openSample(sample.name()));
        return card;
    }
}
