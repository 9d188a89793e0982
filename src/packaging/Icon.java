import java.awt.BasicStroke;
import java.awt.Color;
import java.awt.Graphics2D;
import java.awt.RenderingHints;
import java.awt.Shape;
import java.awt.geom.Area;
import java.awt.geom.Ellipse2D;
import java.awt.geom.Line2D;
import java.awt.geom.Path2D;
import java.awt.geom.RoundRectangle2D;
import java.awt.image.BufferedImage;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import javax.imageio.ImageIO;
import org.jfree.svg.SVGGraphics2D;

/// Draws the program's icon, a lead on its marked line, as `leadline.svg` and as pictures of the usual sizes:
/// `java -Djava.awt.headless=true -cp 'target/program/*' src/packaging/Icon.java icons`
public final class Icon {
    private static final Color WATER = new Color(0x0F6E75);
    private static final Color AIR = new Color(0xD9E8E6);
    private static final Color MARK = new Color(0xB04A10);
    private static final Color LEAD = new Color(0xFBF7EF);

    /// The drawing is made on a square of 64 units.
    private static final double SIDE = 64;

    private Icon() {}

    public static void main(String[] args) throws IOException {
        var folder = Path.of(args[0]);
        for (int pixels : new int[] {16, 24, 32, 48, 64, 128, 256, 512}) {
            var image = new BufferedImage(pixels, pixels, BufferedImage.TYPE_INT_ARGB);
            var g = image.createGraphics();
            g.setRenderingHint(RenderingHints.KEY_ANTIALIASING, RenderingHints.VALUE_ANTIALIAS_ON);
            g.setRenderingHint(RenderingHints.KEY_STROKE_CONTROL, RenderingHints.VALUE_STROKE_PURE);
            g.scale(pixels / SIDE, pixels / SIDE);
            draw(g, pixels < 48);
            ImageIO.write(
                    image, "png", folder.resolve("leadline-" + pixels + ".png").toFile());
        }
        var svg = new SVGGraphics2D(SIDE, SIDE);
        svg.setDefsKeyPrefix("leadline");
        draw(svg, false);
        Files.writeString(folder.resolve("leadline.svg"), svg.getSVGElement() + "\n");
    }

    /// On few pixels one mark is left out and the rest is drawn heavier.
    private static void draw(Graphics2D g, boolean few) {
        var card = new RoundRectangle2D.Double(2, 2, 60, 60, 16, 16);
        fill(g, AIR, card);
        var below = new Area(water());
        below.intersect(new Area(card));
        fill(g, WATER, below);
        double thick = few ? 5 : 2.4;
        stroke(g, WATER, thick, new Line2D.Double(32, 2, 32, 16.5));
        stroke(g, LEAD, thick, new Line2D.Double(32, 16.5, 32, 42));
        if (few) {
            mark(g, 20, 17, 9);
        } else {
            mark(g, 17.5, 11, 5);
            mark(g, 27, 16, 5);
        }
        fill(g, LEAD, lead(few));
        fill(g, MARK, new Ellipse2D.Double(28.8, 53.5, 6.4, 3.6));
    }

    /// A strip of cloth tied into the line and streaming to the right of it, its end cut to a swallowtail.
    private static void mark(Graphics2D g, double y, double length, double height) {
        double end = 32 + length;
        var strip = new Path2D.Double();
        strip.moveTo(29.5, y);
        strip.lineTo(end, y);
        strip.lineTo(end - height / 2, y + height / 2);
        strip.lineTo(end, y + height);
        strip.lineTo(29.5, y + height);
        strip.closePath();
        stroke(g, LEAD, 2, strip);
        fill(g, MARK, strip);
    }

    private static Shape water() {
        var surface = new Path2D.Double();
        surface.moveTo(0, 14);
        surface.curveTo(8, 10.5, 14, 10.5, 21.5, 14);
        surface.curveTo(29, 17.5, 35, 17.5, 42.5, 14);
        surface.curveTo(50, 10.5, 56, 10.5, 64, 14);
        surface.lineTo(64, 64);
        surface.lineTo(0, 64);
        surface.closePath();
        return surface;
    }

    /// The weight: narrow where the line holds it, widest just above its foot, with a hollow below for the tallow.
    private static Shape lead(boolean few) {
        double w = few ? 1.3 : 1;
        var body = new Path2D.Double();
        body.moveTo(32 - 3 * w, 38.5);
        body.curveTo(32 - 2.6 * w, 35.6, 32 + 2.6 * w, 35.6, 32 + 3 * w, 38.5);
        body.curveTo(32 + 4.6 * w, 43, 32 + 7.4 * w, 48, 32 + 7.4 * w, 55);
        body.curveTo(32 + 7.4 * w, 59.2, 32 - 7.4 * w, 59.2, 32 - 7.4 * w, 55);
        body.curveTo(32 - 7.4 * w, 48, 32 - 4.6 * w, 43, 32 - 3 * w, 38.5);
        body.closePath();
        return body;
    }

    private static void fill(Graphics2D g, Color colour, Shape shape) {
        g.setColor(colour);
        g.fill(shape);
    }

    private static void stroke(Graphics2D g, Color colour, double width, Shape shape) {
        g.setStroke(new BasicStroke((float) width, BasicStroke.CAP_BUTT, BasicStroke.JOIN_ROUND));
        g.setColor(colour);
        g.draw(shape);
    }
}
