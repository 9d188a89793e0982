package dev.leadline.chart;

import dev.leadline.density.Portrait;
import dev.leadline.density.Portrait.Bar;
import dev.leadline.density.Support;
import java.awt.AlphaComposite;
import java.awt.Graphics2D;
import java.awt.Shape;
import java.awt.geom.Path2D;
import java.awt.geom.Rectangle2D;
import java.util.List;

/// The outline of a density over a stretch: a curve, or bars.
///
/// The height of a curve is the probability that falls on a pixel's width, not the density at a point, so a peak
/// without bound is as high as what it holds.
///
/// @param bars stretches of a curve or bars of a discrete density, from the lower end
/// @param highest height that fills the plot: of a curve a density, of bars a probability
record Silhouette(List<Bar> bars, boolean discrete, double highest) {
    /// A higher peak is seen to leave the plot.
    private static final double BEYOND = 1.5;

    /// Of the height of the plot: a smaller change is no jump.
    private static final double JUMP = 0.04;

    /// Of a jump: how much the density may change beside it.
    private static final double STEADY = 0.15;

    private static final float FILL = .18f;

    /// @param peak a higher peak of a curve is cut, at so many times the mean height
    static Silhouette of(Portrait portrait, Support over, int columns, double peak) {
        if (portrait.isDiscrete()) {
            var bars = portrait.bars();
            return new Silhouette(
                    bars, true, bars.stream().mapToDouble(Bar::chance).max().orElse(1));
        }
        var support = portrait.support();
        var curve = portrait.curve(over, Math.max(2, columns)).stream()
                .filter(bar -> bar.to() > support.low() && bar.from() < support.high())
                .map(bar ->
                        new Bar(Math.max(bar.from(), support.low()), Math.min(bar.to(), support.high()), bar.chance()))
                .filter(bar -> bar.to() > bar.from())
                .toList();
        double length = over.high() - over.low();
        double highest = curve.stream().mapToDouble(Silhouette::height).max().orElse(1);
        return new Silhouette(curve, false, highest > 0 ? Math.min(peak / length, highest) : 1);
    }

    /// Of a curve the mean density of the stretch.
    private static double height(Bar bar) {
        return bar.chance() / (bar.to() - bar.from());
    }

    /// With the colour and the stroke that are set.
    void draw(Graphics2D g, Rectangle2D plot, Support over) {
        if (discrete) {
            bars.forEach(bar -> g.fill(block(bar, plot, over)));
            return;
        }
        var curve = curve(plot, over);
        var filled = new Path2D.Double(curve);
        filled.closePath();
        var composite = g.getComposite();
        g.setComposite(AlphaComposite.SrcOver.derive(FILL));
        g.fill(filled);
        g.setComposite(composite);
        g.draw(curve);
    }

    /// Upright at both ends of the support and where the density jumps.
    Path2D curve(Rectangle2D plot, Support over) {
        var path = new Path2D.Double();
        path.moveTo(plot.getMinX(), plot.getMaxY());
        if (bars.isEmpty()) {
            path.lineTo(plot.getMaxX(), plot.getMaxY());
            return path;
        }
        double from = x(bars.getFirst().from(), plot, over);
        path.lineTo(from, plot.getMaxY());
        path.lineTo(from, y(height(bars.getFirst()), plot));
        for (int k = 0; k < bars.size(); k++) {
            if (isJump(k)) {
                var bar = bars.get(k);
                double before = height(bars.get(k - 1));
                double after = height(bars.get(k + 1));
                double share = (after - height(bar)) / (after - before);
                double at = x(bar.from() + share * (bar.to() - bar.from()), plot, over);
                path.lineTo(at, y(before, plot));
                path.lineTo(at, y(after, plot));
            } else {
                path.lineTo(x(bars.get(k).middle(), plot, over), y(height(bars.get(k)), plot));
            }
        }
        double to = x(bars.getLast().to(), plot, over);
        path.lineTo(to, y(height(bars.getLast()), plot));
        path.lineTo(to, plot.getMaxY());
        path.lineTo(plot.getMaxX(), plot.getMaxY());
        return path;
    }

    private double y(double height, Rectangle2D plot) {
        return plot.getMaxY() - Math.min(BEYOND, height / highest) * (plot.getHeight() - 1);
    }

    /// Whether the density jumps within a stretch: on both sides it changes little from one to the next, and here much.
    private boolean isJump(int k) {
        if (k < 2 || k > bars.size() - 3) {
            return false;
        }
        double before = height(bars.get(k - 1));
        double after = height(bars.get(k + 1));
        double jump = Math.abs(after - before);
        double here = height(bars.get(k));
        return jump > JUMP * highest
                && Math.abs(before - height(bars.get(k - 2))) < STEADY * jump
                && Math.abs(after - height(bars.get(k + 2))) < STEADY * jump
                && (here - before) * (after - here) >= 0
                && Math.abs(here - after) > 1e-9 * jump;
    }

    private Shape block(Bar bar, Rectangle2D plot, Support over) {
        double scale = plot.getWidth() / (over.high() - over.low());
        double gap = bars.size() > 1 ? (bars.get(1).middle() - bars.get(0).middle()) * scale : plot.getWidth() / 4;
        double thick = bar.to() > bar.from()
                ? Math.max(.6, (bar.to() - bar.from()) * scale - (gap > 4 ? 1 : 0))
                : Math.clamp(.55 * gap, 1, plot.getHeight() < 40 ? 4 : 14);
        double height = bar.chance() / highest * (plot.getHeight() - 1);
        return new Rectangle2D.Double(x(bar.middle(), plot, over) - thick / 2, plot.getMaxY() - height, thick, height);
    }

    static double x(double value, Rectangle2D plot, Support over) {
        return plot.getMinX() + plot.getWidth() * ((value - over.low()) / (over.high() - over.low()));
    }
}
