package dev.leadline.desktop.shell;

import dev.leadline.desktop.style.Styles;
import dev.leadline.model.Sentence;
import java.util.function.Consumer;
import javafx.scene.control.Hyperlink;
import javafx.scene.control.Tooltip;
import javafx.scene.text.Text;
import javafx.scene.text.TextFlow;

/// The question in words; its doors are links.
final class SentenceView extends TextFlow {
    private final Consumer<Sentence.Door> opened;

    SentenceView(Consumer<Sentence.Door> opened) {
        this.opened = opened;
        getStyleClass().add(Styles.SENTENCE);
        setId("sentence");
    }

    void show(Sentence sentence) {
        getChildren().clear();
        for (var part : sentence.parts()) {
            part.door().ifPresentOrElse(door -> getChildren().add(link(part.text(), door)), () -> {
                var words = new Text(part.text());
                words.getStyleClass().add("words");
                getChildren().add(words);
            });
        }
        setAccessibleText(sentence.text());
    }

    private Hyperlink link(String text, Sentence.Door door) {
        var link = new Hyperlink(text);
        link.getStyleClass().setAll(Styles.DOOR);
        if (door == Sentence.Door.FORMULA) {
            link.getStyleClass().add(Styles.MATHS);
        }
        link.setTooltip(new Tooltip("Edit"));
        link.setOnAction(_ -> {
            link.setVisited(false);
            opened.accept(door);
        });
        return link;
    }
}
