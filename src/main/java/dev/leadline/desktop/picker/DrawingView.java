package dev.leadline.desktop.picker;

import dev.leadline.desktop.style.Pixels;
import java.util.List;
import java.util.Optional;
import java.util.function.Consumer;
import javafx.scene.AccessibleRole;
import javafx.scene.image.ImageView;
import javafx.scene.input.KeyEvent;
import javafx.scene.input.MouseEvent;
import javafx.scene.layout.Region;
import javafx.scene.shape.Line;
import javafx.stage.Window;

/// Shows the drawing as large as there is room, with a line at the value that is read.
final class DrawingView extends Region {
    private static final double STEP = 8;

    private final PickerViewModel model;
    private final ImageView image = new ImageView();
    private final Line line = new Line();
    private final Consumer<String> reading;
    private double x = Double.NaN;

    DrawingView(PickerViewModel model, Consumer<String> reading) {
        this.model = model;
        this.reading = reading;
        setId("density");
        setFocusTraversable(true);
        setAccessibleRole(AccessibleRole.IMAGE_VIEW);
        setAccessibleText("The density; left and right arrows read its values");
        setMinSize(200, 150);
        image.setSmooth(false);
        line.getStyleClass().add("cross");
        line.setVisible(false);
        for (var n : List.of(image, line)) {
            n.setMouseTransparent(true);
            n.setManaged(false);
        }
        getChildren().addAll(image, line);
        model.drawn().addListener((_, _, drawn) -> show(drawn));
        model.outdated().addListener((_, _, outdated) -> image.setOpacity(outdated ? .45 : 1));
        widthProperty().addListener((_, _, _) -> resized());
        heightProperty().addListener((_, _, _) -> resized());
        sceneProperty().flatMap(s -> s.windowProperty()).addListener((_, _, window) -> follow(window));
        addEventHandler(MouseEvent.MOUSE_MOVED, e -> read(e.getX()));
        addEventHandler(MouseEvent.MOUSE_DRAGGED, e -> read(e.getX()));
        addEventHandler(MouseEvent.MOUSE_EXITED, _ -> unread());
        addEventHandler(MouseEvent.MOUSE_PRESSED, _ -> requestFocus());
        addEventHandler(KeyEvent.KEY_PRESSED, this::pressed);
    }

    private void follow(Window window) {
        if (window != null) {
            window.renderScaleXProperty().addListener((_, _, _) -> resized());
            resized();
        }
    }

    private void resized() {
        double scale = getScene() == null || getScene().getWindow() == null
                ? 1
                : getScene().getWindow().getRenderScaleX();
        model.size((int) getWidth(), (int) getHeight(), scale);
    }

    private void show(Optional<PickerViewModel.Drawn> drawn) {
        image.setVisible(drawn.isPresent());
        drawn.ifPresent(d -> {
            image.setImage(Pixels.shared(d.image()));
            image.setFitWidth(d.image().getWidth() / d.scale());
            image.setFitHeight(d.image().getHeight() / d.scale());
        });
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
        line.setVisible(true);
        line.setStartX(shown);
        line.setEndX(shown);
        line.setStartY(plot.get().getMinY());
        line.setEndY(plot.get().getMaxY());
        reading.accept(model.reading(at, y).orElse(""));
    }

    private void unread() {
        x = Double.NaN;
        line.setVisible(false);
        reading.accept("");
    }
}
