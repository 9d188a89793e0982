package dev.leadline.desktop.working;

import dev.leadline.desktop.style.Styles;
import java.util.ArrayList;
import java.util.Collection;
import java.util.List;
import java.util.Locale;
import java.util.function.Consumer;
import javafx.geometry.Pos;
import javafx.scene.AccessibleRole;
import javafx.scene.TraversalDirection;
import javafx.scene.control.Label;
import javafx.scene.input.KeyCode;
import javafx.scene.input.KeyEvent;
import org.fxmisc.richtext.StyleClassedTextArea;
import org.fxmisc.richtext.model.StyleSpans;
import org.fxmisc.richtext.model.StyleSpansBuilder;
import org.fxmisc.richtext.util.UndoUtils;
import org.fxmisc.undo.UndoManager;

/// An editor of formulas: coloured words, faults underlined, as high as its text. Undo belongs to the project.
public final class FormulaArea extends StyleClassedTextArea {
    private static final double LINE = 20;
    private static final double PADDING = 12;

    private final int leastLines;
    private Consumer<String> typed = _ -> {};
    private Runnable pasted = () -> {};
    private boolean showing;
    private List<Colouring.Stretch> words = List.of();
    private List<int[]> faults = List.of();

    public FormulaArea(String name, int leastLines, boolean manyLines) {
        super(false);
        this.leastLines = leastLines;
        UndoManager<?> none = UndoUtils.noOpUndoManager();
        setUndoManager(none);
        setWrapText(true);
        getStyleClass().add(Styles.FORMULA);
        setAccessibleRole(AccessibleRole.TEXT_AREA);
        setAccessibleText(name);
        addEventFilter(KeyEvent.KEY_PRESSED, e -> {
            boolean leaves = e.getCode() == KeyCode.TAB || (e.getCode() == KeyCode.ENTER && !manyLines);
            if (leaves && !e.isControlDown() && !e.isAltDown()) {
                e.consume();
                if (e.getCode() == KeyCode.TAB) {
                    requestFocusTraversal(e.isShiftDown() ? TraversalDirection.PREVIOUS : TraversalDirection.NEXT);
                }
            }
        });
        textProperty().addListener((_, _, text) -> {
            if (!showing) {
                typed.accept(text);
            }
        });
        totalHeightEstimateProperty().addListener((_, _, _) -> fit());
        fit();
    }

    public void prompt(String text) {
        var prompt = new Label(text);
        prompt.getStyleClass().addAll(Styles.QUIET, "formula-prompt");
        setPlaceholder(prompt, Pos.TOP_LEFT);
    }

    public void onTyped(Consumer<String> consumer) {
        typed = consumer;
    }

    public void onPasted(Runnable action) {
        pasted = action;
    }

    @Override
    public void paste() {
        super.paste();
        pasted.run();
    }

    public void show(String text) {
        if (!text.equals(getText())) {
            showing = true;
            replaceText(text);
            showing = false;
        }
    }

    /// @param newFaults pairs of places, `from` inclusive, `to` exclusive
    public void paint(List<Colouring.Stretch> newWords, List<int[]> newFaults) {
        words = newWords;
        faults = newFaults;
        if (getLength() > 0) {
            setStyleSpans(0, spans());
        }
    }

    private StyleSpans<Collection<String>> spans() {
        int length = getLength();
        var colours = new StyleSpansBuilder<Collection<String>>();
        int at = 0;
        for (var w : words) {
            if (w.to() > length) {
                break;
            }
            colours.add(List.of(), w.from() - at);
            colours.add(List.of("word-" + w.word().name().toLowerCase(Locale.ROOT)), w.to() - w.from());
            at = w.to();
        }
        colours.add(List.of(), length - at);
        var spans = colours.create();
        for (int[] f : faults) {
            int from = Math.clamp(f[0], 0, Math.max(0, length - 1));
            int to = Math.clamp(Math.max(f[1], from + 1), from, length);
            if (to > from) {
                var mark = new StyleSpansBuilder<Collection<String>>()
                        .add(List.of(), from)
                        .add(List.of("fault"), to - from)
                        .add(List.of(), length - to)
                        .create();
                spans = spans.overlay(mark, FormulaArea::both);
            }
        }
        return spans;
    }

    private static Collection<String> both(Collection<String> a, Collection<String> b) {
        if (b.isEmpty()) {
            return a;
        }
        var all = new ArrayList<>(a);
        all.addAll(b);
        return all;
    }

    private void fit() {
        double text = getTotalHeightEstimate();
        double height = Math.max(leastLines * LINE, Math.min(text, 14 * LINE)) + PADDING;
        setPrefHeight(height);
        setMinHeight(Math.min(height, leastLines * LINE + PADDING));
        setMaxHeight(height);
    }
}
