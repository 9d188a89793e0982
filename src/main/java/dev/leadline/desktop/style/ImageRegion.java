package dev.leadline.desktop.style;

import java.awt.geom.Rectangle2D;
import java.awt.image.BufferedImage;
import javafx.scene.AccessibleRole;
import javafx.scene.image.ImageView;
import javafx.scene.layout.Region;
import javafx.scene.shape.Line;
import javafx.stage.Window;

/// Shows an image that is drawn for its size and for the pixels of its window, and a line across it where it is read.
public abstract class ImageRegion extends Region {
    private final ImageView image = new ImageView();
    private final Line cross = new Line();

    @SuppressWarnings("this-escape") // of its listeners, none is called before a scene shows it
    protected ImageRegion(String id, String accessibleText, double leastWidth, double leastHeight) {
        setId(id);
        setFocusTraversable(true);
        setAccessibleRole(AccessibleRole.IMAGE_VIEW);
        setAccessibleText(accessibleText);
        setMinSize(leastWidth, leastHeight);
        image.setSmooth(false);
        image.setMouseTransparent(true);
        image.setManaged(false);
        cross.getStyleClass().add("cross");
        cross.setVisible(false);
        cross.setMouseTransparent(true);
        cross.setManaged(false);
        getChildren().addAll(image, cross);
        widthProperty().addListener((_, _, _) -> resized());
        heightProperty().addListener((_, _, _) -> resized());
        sceneProperty().flatMap(s -> s.windowProperty()).addListener((_, _, window) -> follow(window));
    }

    /// The size to draw for has changed.
    ///
    /// @param scale pixels of the screen to one of the window
    protected abstract void sized(int width, int height, double scale);

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
        sized((int) getWidth(), (int) getHeight(), scale);
    }

    /// @param drawn at `scale` pixels to one of the window
    protected final void show(BufferedImage drawn, double scale) {
        image.setVisible(true);
        image.setImage(Pixels.shared(drawn));
        image.setFitWidth(drawn.getWidth() / scale);
        image.setFitHeight(drawn.getHeight() / scale);
    }

    protected final void hideImage() {
        image.setVisible(false);
    }

    protected final void fade(boolean faded) {
        image.setOpacity(faded ? .45 : 1);
    }

    /// From the top of the plot to its bottom.
    protected final void cross(double x, Rectangle2D plot) {
        cross.setVisible(true);
        cross.setStartX(x);
        cross.setEndX(x);
        cross.setStartY(plot.getMinY());
        cross.setEndY(plot.getMaxY());
    }

    protected final void hideCross() {
        cross.setVisible(false);
    }
}
