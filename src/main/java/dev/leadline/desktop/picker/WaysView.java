package dev.leadline.desktop.picker;

import dev.leadline.desktop.style.Styles;
import java.util.Locale;
import java.util.function.Consumer;
import javafx.geometry.Insets;
import javafx.scene.control.Button;
import javafx.scene.control.Label;
import javafx.scene.layout.VBox;

/// The question what is known, and every answer there is to it.
final class WaysView extends VBox {
    WaysView(Consumer<Way> chosen) {
        super(1);
        setId("ways");
        var title = new Label("What is known about it?");
        title.getStyleClass().add(Styles.PANE_TITLE);
        setMargin(title, new Insets(0, 0, 5, 0));
        getChildren().add(title);
        for (Way way : Way.all()) {
            if (way == Way.Given.DATA) {
                var or = Labels.of("or it is given by");
                or.getStyleClass().add("catalogue-group");
                getChildren().add(or);
            }
            var button = new Button(way.title());
            button.setId("way-"
                    + (way instanceof Way.Known(var k)
                            ? k.word()
                            : ((Way.Given) way).name().toLowerCase(Locale.ROOT)));
            button.getStyleClass().setAll("button", "choice");
            button.setWrapText(true);
            button.setMaxWidth(Double.MAX_VALUE);
            button.setMinHeight(USE_PREF_SIZE);
            button.setOnAction(_ -> chosen.accept(way));
            getChildren().add(button);
        }
    }
}
