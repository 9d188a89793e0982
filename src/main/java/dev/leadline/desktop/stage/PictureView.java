package dev.leadline.desktop.stage;

import dev.leadline.chart.Picture;
import dev.leadline.chart.PictureKind;
import dev.leadline.chart.Reading;
import dev.leadline.desktop.style.ImageRegion;
import java.util.Optional;
import java.util.function.Consumer;
import javafx.scene.input.KeyEvent;
import javafx.scene.input.MouseButton;
import javafx.scene.input.MouseEvent;
import javafx.scene.input.ScrollEvent;
import javafx.scene.shape.Circle;

/// Shows the drawn picture as large as there is room, and answers to mouse and keys.
final class PictureView extends ImageRegion {
    private static final double STEP = .8;

    private final StageViewModel model;
    private final Circle at = new Circle(5);
    private final Consumer<Optional<Reading>> reading;
    private Optional<Drag> drag = Optional.empty();

    private record Drag(Picture picture, double x, double y) {}

    PictureView(StageViewModel model, Consumer<Optional<Reading>> reading) {
        super("picture", words(model.kind().get()), Picture.LEAST_WIDTH, Picture.LEAST_HEIGHT);
        this.model = model;
        this.reading = reading;
        at.getStyleClass().add("cross-point");
        at.setVisible(false);
        at.setMouseTransparent(true);
        at.setManaged(false);
        getChildren().add(at);
        model.drawn().addListener((_, _, drawn) -> show(drawn));
        model.kind().addListener((_, _, kind) -> {
            unread();
            setAccessibleText(words(kind));
        });
        addEventHandler(ScrollEvent.SCROLL, this::scrolled);
        addEventHandler(MouseEvent.MOUSE_MOVED, e -> read(e.getX(), e.getY()));
        addEventHandler(MouseEvent.MOUSE_EXITED, _ -> unread());
        addEventHandler(MouseEvent.MOUSE_PRESSED, this::pressed);
        addEventHandler(MouseEvent.MOUSE_DRAGGED, this::dragged);
        addEventHandler(MouseEvent.MOUSE_RELEASED, _ -> drag = Optional.empty());
        addEventHandler(MouseEvent.MOUSE_CLICKED, e -> {
            if (e.getButton() == MouseButton.PRIMARY && e.getClickCount() == 2) {
                model.reset();
            }
        });
        addEventHandler(KeyEvent.KEY_PRESSED, this::pressed);
    }

    private static String words(PictureKind kind) {
        return kind.title() + ": " + kind.shows();
    }

    @Override
    protected void sized(int width, int height, double scale) {
        model.size(width, height, scale);
    }

    private void show(Optional<StageViewModel.Drawn> drawn) {
        drawn.ifPresentOrElse(d -> show(d.image(), d.scale()), this::hideImage);
    }

    private void scrolled(ScrollEvent e) {
        double notches = e.getDeltaY() / 40;
        if (notches != 0) {
            model.zoom(e.getX(), e.getY(), StrictMath.pow(STEP, Math.clamp(notches, -3, 3)));
            e.consume();
        }
    }

    private void pressed(MouseEvent e) {
        requestFocus();
        if (e.getButton() == MouseButton.PRIMARY) {
            drag = model.drawn().get().map(d -> new Drag(d.picture(), e.getX(), e.getY()));
        }
    }

    private void dragged(MouseEvent e) {
        unread();
        drag.ifPresent(d -> model.pan(d.picture, e.getX() - d.x, e.getY() - d.y));
    }

    private void pressed(KeyEvent e) {
        double x = getWidth() / 2;
        double y = getHeight() / 2;
        var picture = model.drawn().get().map(StageViewModel.Drawn::picture);
        switch (e.getCode()) {
            case PLUS, EQUALS, ADD -> model.zoom(x, y, STEP);
            case MINUS, SUBTRACT -> model.zoom(x, y, 1 / STEP);
            case LEFT -> picture.ifPresent(p -> model.pan(p, 40, 0));
            case RIGHT -> picture.ifPresent(p -> model.pan(p, -40, 0));
            case UP -> picture.ifPresent(p -> model.pan(p, 0, 40));
            case DOWN -> picture.ifPresent(p -> model.pan(p, 0, -40));
            case HOME, DIGIT0 -> model.reset();
            default -> {
                return;
            }
        }
        e.consume();
    }

    private void read(double x, double y) {
        var found = model.at(x, y);
        reading.accept(found);
        var lane = found.flatMap(r -> r.lanes().stream().findFirst());
        var plot = model.drawn().get().map(d -> d.picture().plot());
        hideCross();
        at.setVisible(
                lane.filter(l -> plot.orElseThrow().contains(l.x(), l.y())).isPresent());
        lane.ifPresent(l -> {
            cross(l.x(), plot.orElseThrow());
            at.setCenterX(l.x());
            at.setCenterY(l.y());
        });
    }

    private void unread() {
        hideCross();
        at.setVisible(false);
        reading.accept(Optional.empty());
    }
}
