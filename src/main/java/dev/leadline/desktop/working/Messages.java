package dev.leadline.desktop.working;

import dev.leadline.desktop.style.Styles;
import dev.leadline.problem.Problem;
import java.util.List;
import javafx.scene.control.Label;
import javafx.scene.layout.VBox;

/// What is wrong, under the place where it is.
public final class Messages extends VBox {
    private static final int AT_MOST = 3;
    private static final int WINDOW = 44;

    private List<?> shown = List.of();

    public Messages() {
        getStyleClass().add(Styles.MESSAGE);
        hide();
    }

    private void hide() {
        setVisible(false);
        setManaged(false);
    }

    public void show(List<Problem> problems) {
        if (!problems.equals(shown)) {
            shown = problems;
            getChildren().clear();
            problems.stream().limit(AT_MOST).forEach(this::add);
            finish(problems.size());
        }
    }

    /// With the line and a caret under the fault.
    public void showIn(List<FormulasViewModel.Fault> faults, String text) {
        var key = List.of(faults, text);
        if (!key.equals(shown)) {
            shown = key;
            getChildren().clear();
            var lines = text.split("\n", -1);
            faults.stream().limit(AT_MOST).forEach(f -> {
                if (f.problem().place().span().isPresent() && f.line() < lines.length) {
                    getChildren().add(excerpt(lines[f.line()], f.from()));
                }
                add(f.problem());
            });
            finish(faults.size());
        }
    }

    private void finish(int size) {
        if (size > AT_MOST) {
            getChildren().add(line("and " + (size - AT_MOST) + " more", Styles.QUIET));
        }
        setVisible(size > 0);
        setManaged(size > 0);
    }

    private void add(Problem p) {
        getChildren().add(line(p.primary(), "primary"));
        p.detail().ifPresent(d -> addOnce(d, "detail"));
        p.hint().ifPresent(h -> addOnce(h, "hint"));
    }

    /// Three unknown names need the same advice only once.
    private void addOnce(String text, String style) {
        if (getChildren().stream()
                .noneMatch(n -> n instanceof Label l && l.getText().equals(text))) {
            getChildren().add(line(text, style));
        }
    }

    private static Label line(String text, String style) {
        var label = new Label(text);
        label.setWrapText(true);
        label.setMinHeight(USE_PREF_SIZE);
        label.getStyleClass().add(style);
        return label;
    }

    /// The stretch of a line around `at`, and a caret under that place.
    public static Label excerpt(String line, int at) {
        int start = line.length() <= WINDOW ? 0 : Math.clamp(at - WINDOW / 2, 0, line.length() - WINDOW);
        int end = Math.min(line.length(), start + WINDOW);
        String before = start > 0 ? "\u2026" : "";
        String after = end < line.length() ? "\u2026" : "";
        var label = new Label(before + line.substring(start, end).replace('\t', ' ') + after + "\n"
                + " ".repeat(before.length() + at - start) + "^");
        label.setMinHeight(USE_PREF_SIZE);
        label.getStyleClass().add(Styles.EXCERPT);
        return label;
    }
}
