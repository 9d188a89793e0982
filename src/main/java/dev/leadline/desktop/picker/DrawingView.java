package dev.leadline.desktop.picker;

import dev.leadline.desktop.style.ImageRegion;
import java.util.Optional;
import java.util.function.Consumer;
import javafx.scene.input.KeyEvent;
import javafx.scene.input.MouseEvent;

/// Shows the drawing as large as there is room, with a line at the value that is read.
final class DrawingView extends ImageRegion {
    private static final double STEP = 8;

    private final PickerViewModel model;
    private final Consumer<String> reading;
    private double x = Double.NaN;

    DrawingView(PickerViewModel model, Consumer<String> reading) {
        super("density", "The density; left and right arrows read its values", 200, 150);
        this.model = model;
        this.reading = reading;
        model.drawn().addListener((_, _, drawn) -> show(drawn));
        model.outdated().addListener((_, _, outdated) -> fade(outdated));
        addEventHandler(MouseEvent.MOUSE_MOVED, e -> read(e.getX()));
        addEventHandler(MouseEvent.MOUSE_DRAGGED, e -> read(e.getX()));
        addEventHandler(MouseEvent.MOUSE_EXITED, _ -> unread());
        addEventHandler(MouseEvent.MOUSE_PRESSED, _ -> requestFocus());
        addEventHandler(KeyEvent.KEY_PRESSED, this::pressed);
    }

    @Override
    protected void sized(int width, int height, double scale) {
        model.size(width, height, scale);
    }

    private void show(Optional<PickerViewModel.Drawn> drawn) {
        drawn.ifPresentOrElse(d -> show(d.image(), d.scale()), this::hideImage);
        if (!Double.isNaN(x)) {
            read(x);
        }
    }

    private void pressed(KeyEvent e) {
        double start = Double.isNaN(x) ? getWidth() / 2 : x;
        switch (e.getCode()) {
            case LEFT -> read(start - STEP);
            case RIGHT -> read(start + STEP);
            default -> {
                return;
            }
        }
        e.consume();
    }

    private void read(double at) {
        var plot = model.drawn().get().map(d -> d.picture().plot());
        if (plot.isEmpty()) {
            return;
        }
        double y = plot.get().getCenterY();
        var value = model.drawn().get().orElseThrow().picture().valueAt(at, y);
        if (value.isEmpty()) {
            unread();
            return;
        }
        x = at;
        double shown = model.drawn().get().orElseThrow().picture().xOf(value.getAsDouble());
        cross(shown, plot.get());
        reading.accept(model.reading(at, y).orElse(""));
    }

    private void unread() {
        x = Double.NaN;
        hideCross();
        reading.accept("");
    }
}
