package dev.leadline.desktop.picker;

import dev.leadline.desktop.style.Styles;
import javafx.scene.Node;
import javafx.scene.control.Label;
import javafx.scene.control.TextArea;
import javafx.scene.layout.VBox;

/// Values and their probabilities as two columns of text.
final class ValuesForm implements Form {
    private final ValuesViewModel model;
    private final TextArea text = new TextArea();
    private final Label sum = Labels.wrapped("");
    private final VBox all;
    private boolean showing;

    ValuesForm(ValuesViewModel model) {
        this.model = model;
        text.setId("values");
        text.setAccessibleText("Values and their probabilities, two numbers to a line");
        text.setPromptText("0 0.5\n1 0.3\n2 0.2");
        text.getStyleClass().add(Styles.MATHS);
        text.setPrefRowCount(9);
        text.textProperty().addListener((_, _, typed) -> {
            if (!showing) {
                model.type(typed);
            }
        });
        text.focusedProperty().addListener((_, _, focused) -> {
            if (!focused) {
                model.project().settle();
            }
        });
        all = new VBox(
                6,
                Labels.wrapped("A value and its probability to a line; two columns of a spreadsheet can be pasted."),
                text,
                sum);
    }

    @Override
    public Node node() {
        return all;
    }

    @Override
    public void focus() {
        text.requestFocus();
    }

    @Override
    public void update() {
        if (!model.says(text.getText())) {
            showing = true;
            text.setText(model.text());
            showing = false;
        }
        sum.setText(model.sum());
    }
}
