package dev.leadline.desktop.working;

import dev.leadline.desktop.style.Styles;
import javafx.scene.Node;
import javafx.scene.control.CheckBox;
import javafx.scene.control.Label;
import javafx.scene.control.TextArea;
import javafx.scene.control.Tooltip;
import javafx.scene.layout.VBox;

/// Title, notes and whether safety depends on the answer.
final class AboutView {
    private final ProjectViewModel project;
    private final Field title;
    private final TextArea notes = new TextArea();
    private final CheckBox safety = new CheckBox("safety depends on the answer");
    private final Fold fold;
    private boolean showing;

    AboutView(ProjectViewModel project) {
        this.project = project;
        title = new Field(
                        "title",
                        "What the project is called",
                        20,
                        t -> project.edit("$.title", d -> Edits.title(d, t)),
                        project::settle)
                .growing();
        title.setId("title");
        notes.setId("notes");
        notes.setAccessibleText("notes");
        notes.setPromptText("background, assumptions, who asked");
        notes.setWrapText(true);
        notes.setPrefRowCount(6);
        notes.textProperty().addListener((_, _, text) -> {
            if (!showing) {
                project.edit("$.notes", d -> Edits.notes(d, text));
            }
        });
        notes.focusedProperty().addListener((_, _, focused) -> {
            if (!focused) {
                project.settle();
            }
        });
        safety.setId("safety");
        safety.setTooltip(new Tooltip("Window and report then carry a sentence on what the result can stand for"));
        safety.setOnAction(_ -> {
            project.settle();
            project.edit("$.safety", d -> Edits.safety(d, safety.isSelected()));
        });
        fold = new Fold(
                "fold-about",
                "about this project",
                "Title, notes, safety",
                new VBox(6, label("title"), title, label("notes"), notes, safety));
    }

    Node fold() {
        return fold;
    }

    void open() {
        fold.open();
        title.requestFocus();
    }

    void update() {
        var d = project.draft().get();
        title.show(d.title());
        if (!notes.getText().equals(d.notes())) {
            showing = true;
            notes.setText(d.notes());
            showing = false;
        }
        safety.setSelected(d.safety());
        fold.summary(d.notes().isBlank() ? "no notes yet" : d.notes().replaceAll("\\s+", " "));
    }

    private static Label label(String text) {
        var label = new Label(text);
        label.getStyleClass().add(Styles.FIELD_LABEL);
        return label;
    }
}
