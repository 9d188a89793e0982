package dev.leadline.chart;

import java.awt.BasicStroke;
import java.awt.Shape;
import java.awt.Stroke;
import java.awt.geom.Ellipse2D;
import java.awt.geom.Path2D;
import java.awt.geom.Rectangle2D;

/// Marker and dash of a lane, by its place in the question. Colours alone are alike in grey, so no lane is ever drawn
/// without them.
public enum LaneLook {
    /// Squares on a solid line.
    FIRST(null, 2.0) {
        @Override
        Shape marker(double r) {
            return new Rectangle2D.Double(-.88 * r, -.88 * r, 1.76 * r, 1.76 * r);
        }
    },
    /// Diamonds on dashes.
    SECOND(new float[] {8, 4}, 2.0) {
        @Override
        Shape marker(double r) {
            return closed(0, -1.3 * r, 1.3 * r, 0, 0, 1.3 * r, -1.3 * r, 0);
        }
    },
    /// Triangles on dots.
    THIRD(new float[] {2, 3}, 2.0) {
        @Override
        Shape marker(double r) {
            return closed(0, -1.2 * r, 1.15 * r, .85 * r, -1.15 * r, .85 * r);
        }
    },
    /// Rings on long dashes with two dots.
    FOURTH(new float[] {14, 3, 2, 3, 2, 3}, 2.0) {
        @Override
        Shape marker(double r) {
            var ring = new Path2D.Double(Path2D.WIND_EVEN_ODD);
            ring.append(new Ellipse2D.Double(-1.1 * r, -1.1 * r, 2.2 * r, 2.2 * r), false);
            ring.append(new Ellipse2D.Double(-.5 * r, -.5 * r, r, r), false);
            return ring;
        }
    };

    private final float[] dash;
    private final double width;

    LaneLook(float[] dash, double width) {
        this.dash = dash;
        this.width = width;
    }

    /// About the origin, reaching about `r` to each side.
    abstract Shape marker(double r);

    Stroke line() {
        return stroke(width);
    }

    /// The same dash, thinner, for the edges of a band.
    Stroke edge() {
        return stroke(1);
    }

    private Stroke stroke(double w) {
        return dash == null
                ? new BasicStroke((float) w, BasicStroke.CAP_BUTT, BasicStroke.JOIN_ROUND)
                : new BasicStroke((float) w, BasicStroke.CAP_BUTT, BasicStroke.JOIN_ROUND, 1, dash, 0);
    }

    private static Shape closed(double... xy) {
        var path = new Path2D.Double();
        path.moveTo(xy[0], xy[1]);
        for (int i = 2; i < xy.length; i += 2) {
            path.lineTo(xy[i], xy[i + 1]);
        }
        path.closePath();
        return path;
    }
}
