package dev.leadline.chart;

import java.awt.Graphics2D;
import java.awt.RenderingHints;
import java.awt.geom.AffineTransform;
import java.awt.image.BufferedImage;

/// A transparent image to draw into, and the graphics that draw into it smoothly.
///
/// @param image premultiplied
record Canvas(BufferedImage image, Graphics2D graphics) {
    /// @param scale pixels of the image for one of the picture
    static Canvas of(int width, int height, double scale) {
        var image = new BufferedImage(
                (int) Math.round(width * scale), (int) Math.round(height * scale), BufferedImage.TYPE_INT_ARGB_PRE);
        var g = image.createGraphics();
        g.transform(AffineTransform.getScaleInstance(scale, scale));
        g.setRenderingHint(RenderingHints.KEY_ANTIALIASING, RenderingHints.VALUE_ANTIALIAS_ON);
        g.setRenderingHint(RenderingHints.KEY_TEXT_ANTIALIASING, RenderingHints.VALUE_TEXT_ANTIALIAS_ON);
        g.setRenderingHint(RenderingHints.KEY_FRACTIONALMETRICS, RenderingHints.VALUE_FRACTIONALMETRICS_ON);
        g.setRenderingHint(RenderingHints.KEY_STROKE_CONTROL, RenderingHints.VALUE_STROKE_PURE);
        return new Canvas(image, g);
    }
}
