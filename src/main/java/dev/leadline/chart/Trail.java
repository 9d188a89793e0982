package dev.leadline.chart;

import java.awt.geom.Path2D;
import java.awt.geom.Rectangle2D;

/// Marks joined by straight lines, in pixels. A mark that is not a number leaves a gap.
///
/// Marks less than half a pixel from the last one drawn are skipped, which nobody can see and which keeps a file
/// small.
final class Trail {
    /// A pixel this far away stands for everything beyond it.
    private static final double FAR = 1e6;

    private static final double APART = .5;

    private final Path2D.Double path = new Path2D.Double();
    private final Rectangle2D sight;
    private double lastX = Double.NaN;
    private double lastY = Double.NaN;
    private double endX = Double.NaN;
    private double endY = Double.NaN;

    private Trail(Rectangle2D sight) {
        this.sight = sight;
    }

    /// A line cut at `sight`, so that a dash is never laid over a stretch that nobody sees.
    static Path2D line(double[] x, double[] y, Rectangle2D sight) {
        var trail = new Trail(sight);
        for (int i = 0; i < x.length; i++) {
            trail.to(x[i], y[i], i == x.length - 1 || Double.isNaN(y[i + 1]));
        }
        return trail.path;
    }

    /// The area between two trails over the same marks, where both are numbers.
    static Path2D between(double[] x, double[] low, double[] high) {
        var path = new Path2D.Double(Path2D.WIND_NON_ZERO);
        int from = 0;
        while (from < x.length) {
            int to = from;
            while (to < x.length && !Double.isNaN(low[to]) && !Double.isNaN(high[to])) {
                to++;
            }
            if (to - from >= 2) {
                fill(path, x, low, high, from, to);
            }
            from = to + 1;
        }
        return path;
    }

    private static void fill(Path2D path, double[] x, double[] low, double[] high, int from, int to) {
        path.moveTo(near(x[from]), near(high[from]));
        side(path, x, high, from, to, 1);
        path.lineTo(near(x[to - 1]), near(low[to - 1]));
        side(path, x, low, from, to, -1);
        path.closePath();
    }

    /// Appends the inner points of one side; `way` 1 from left to right, -1 back.
    private static void side(Path2D path, double[] x, double[] y, int from, int to, int way) {
        int first = way > 0 ? from + 1 : to - 2;
        int last = way > 0 ? to - 1 : from;
        double px = Double.NEGATIVE_INFINITY;
        double py = 0;
        for (int i = first; way > 0 ? i <= last : i >= last; i += way) {
            double nx = near(x[i]);
            double ny = near(y[i]);
            if (i == last || Math.abs(nx - px) + Math.abs(ny - py) >= APART) {
                path.lineTo(nx, ny);
                px = nx;
                py = ny;
            }
        }
    }

    private void to(double rawX, double rawY, boolean lastOfRun) {
        double x = near(rawX);
        double y = near(rawY);
        if (Double.isNaN(x) || Double.isNaN(y)) {
            lastX = Double.NaN;
            return;
        }
        if (!Double.isNaN(lastX)) {
            if (!lastOfRun && Math.abs(x - lastX) + Math.abs(y - lastY) < APART) {
                return;
            }
            segment(lastX, lastY, x, y);
        }
        lastX = x;
        lastY = y;
    }

    /// Liang and Barsky (1984), ACM Transactions on Graphics 3, 1-22: the part of a segment inside a rectangle.
    private void segment(double x0, double y0, double x1, double y1) {
        double dx = x1 - x0;
        double dy = y1 - y0;
        double[] towards = {-dx, dx, -dy, dy};
        double[] room = {x0 - sight.getMinX(), sight.getMaxX() - x0, y0 - sight.getMinY(), sight.getMaxY() - y0};
        double enter = 0;
        double leave = 1;
        for (int side = 0; side < 4; side++) {
            if (towards[side] == 0) {
                if (room[side] < 0) {
                    return;
                }
            } else if (towards[side] < 0) {
                enter = Math.max(enter, room[side] / towards[side]);
            } else {
                leave = Math.min(leave, room[side] / towards[side]);
            }
        }
        if (enter > leave) {
            return;
        }
        double fromX = x0 + enter * dx;
        double fromY = y0 + enter * dy;
        if (!(fromX == endX && fromY == endY)) {
            path.moveTo(fromX, fromY);
        }
        endX = leave == 1 ? x1 : x0 + leave * dx;
        endY = leave == 1 ? y1 : y0 + leave * dy;
        path.lineTo(endX, endY);
    }

    private static double near(double pixel) {
        return Double.isNaN(pixel) ? pixel : Math.clamp(pixel, -FAR, FAR);
    }
}
