package dev.leadline.desktop.working;

import dev.leadline.desktop.style.Styles;
import java.util.function.Consumer;
import javafx.beans.binding.Bindings;
import javafx.beans.property.SimpleStringProperty;
import javafx.beans.property.StringProperty;
import javafx.css.PseudoClass;
import javafx.scene.control.TextField;
import javafx.scene.control.Tooltip;

/// A text field that tells what was typed in it and, between two keystrokes, shows what it is told.
public final class Field extends TextField {
    private static final PseudoClass FAULTY = PseudoClass.getPseudoClass("faulty");

    /// Longer texts may be cut, so the tooltip shows them in full.
    private static final int COLUMNS_SEEN = 12;

    private final Consumer<String> typed;
    private final StringProperty tip = new SimpleStringProperty();
    private boolean showing;

    /// @param name accessible name
    /// @param tip what belongs here
    /// @param columns width in digits
    public Field(String name, String tip, int columns, Consumer<String> typed, Runnable left) {
        this.typed = typed;
        this.tip.set(tip);
        setAccessibleText(name);
        var tooltip = new Tooltip();
        tooltip.textProperty()
                .bind(Bindings.createStringBinding(
                        () -> getText().length() > COLUMNS_SEEN ? getText() + "\n" + this.tip.get() : this.tip.get(),
                        textProperty(),
                        this.tip));
        setTooltip(tooltip);
        setPrefColumnCount(columns);
        setMinWidth(USE_PREF_SIZE);
        getStyleClass().add(Styles.FLAT_FIELD);
        textProperty().addListener((_, _, text) -> {
            if (!showing) {
                this.typed.accept(text);
            }
        });
        focusedProperty().addListener((_, _, focused) -> {
            if (!focused) {
                left.run();
            }
        });
    }

    public Field prompt(String prompt) {
        setPromptText(prompt);
        return this;
    }

    /// Another word on what belongs here.
    public void tip(String text) {
        tip.set(text);
    }

    /// Takes what room there is.
    public Field growing() {
        setMinWidth(60);
        setMaxWidth(Double.MAX_VALUE);
        return this;
    }

    public void show(String text) {
        if (!text.equals(getText()) && !(isFocused() && sameNumber(text))) {
            showing = true;
            setText(text);
            showing = false;
        }
    }

    public void showFault(boolean faulty) {
        pseudoClassStateChanged(FAULTY, faulty);
    }

    /// While it is being typed, `2.60` stays as it is although `2.6` says the same.
    private boolean sameNumber(String text) {
        var mine = NumberText.read(getText());
        return mine.isPresent() && mine.equals(NumberText.read(text));
    }
}
