package dev.leadline.chart;

import static org.junit.jupiter.api.Assertions.assertTrue;

import java.awt.Color;
import java.awt.Stroke;
import java.awt.geom.AffineTransform;
import java.awt.geom.Line2D;
import java.awt.image.BufferedImage;
import java.util.function.Function;
import org.junit.jupiter.api.Test;

/// Lanes must be told apart without colour: by dash on lines and on edges, and by marker.
class LaneLookTest {
    /// Smallest share of the inked pixels in which two looks must differ.
    private static final double APART = .2;

    @Test
    void lanesDifferWithoutColour() {
        for (var one : LaneLook.values()) {
            for (var other : LaneLook.values()) {
                if (one != other) {
                    differ(one, other, look -> dashed(look.line()), "line");
                    differ(one, other, look -> dashed(look.edge()), "edge");
                    differ(one, other, LaneLookTest::marked, "marker");
                }
            }
        }
    }

    private static void differ(LaneLook one, LaneLook other, Function<LaneLook, BufferedImage> drawn, String what) {
        var a = drawn.apply(one);
        var b = drawn.apply(other);
        int inked = 0;
        int different = 0;
        for (int y = 0; y < a.getHeight(); y++) {
            for (int x = 0; x < a.getWidth(); x++) {
                boolean inA = a.getRGB(x, y) != -1;
                boolean inB = b.getRGB(x, y) != -1;
                inked += inA || inB ? 1 : 0;
                different += inA != inB ? 1 : 0;
            }
        }
        assertTrue(inked > 0 && different >= APART * inked, one + " and " + other + ": " + what);
    }

    private static BufferedImage dashed(Stroke stroke) {
        return image(g -> {
            g.setStroke(stroke);
            g.draw(new Line2D.Double(0, 10, 200, 10));
        });
    }

    private static BufferedImage marked(LaneLook look) {
        return image(g -> g.fill(AffineTransform.getTranslateInstance(100, 10).createTransformedShape(look.marker(8))));
    }

    private static BufferedImage image(java.util.function.Consumer<java.awt.Graphics2D> drawing) {
        var image = new BufferedImage(200, 22, BufferedImage.TYPE_BYTE_BINARY);
        var g = image.createGraphics();
        g.setColor(Color.WHITE);
        g.fillRect(0, 0, 200, 22);
        g.setColor(Color.BLACK);
        drawing.accept(g);
        g.dispose();
        return image;
    }
}
