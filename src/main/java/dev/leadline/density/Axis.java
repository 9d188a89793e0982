package dev.leadline.density;

import dev.leadline.numeric.Exp;
import dev.leadline.numeric.GaussKronrod;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.TreeSet;

/// One variable of an [Expectation]: the points that it is looked at, with their probabilities.
sealed interface Axis {
    /// Values of a discrete density looked at, at most.
    int MOST_VALUES = 100_000;

    /// Beyond it no value is drawn: `e^-36.7 / 2` is less than the smallest probability.
    double DRAWN = 36.7;

    /// @param lines continuous variables of the whole integrand: of one, more points are looked at from the start
    static Axis of(Density density, int lines) {
        if (density.isDiscrete()) {
            return new Steps(density, Atoms.all(density, MOST_VALUES).orElse(new double[0]));
        }
        return new Line(density, lines);
    }

    /// Points at least.
    long points();

    /// Values with a probability each.
    ///
    /// @param values empty where they are too many
    record Steps(Density density, double[] values) implements Axis {
        @Override
        public long points() {
            return values.length == 0 ? Long.MAX_VALUE : values.length;
        }

        boolean isWhole() {
            var support = density.support();
            return values[0] <= support.low() && values[values.length - 1] >= support.high();
        }
    }

    /// A coordinate s from `-end` to `end`, with `e^-|s| / 2` the probability beyond it in its tail.
    final class Line implements Axis {
        private static final double[][] EDGES = {
            {0, 0.25, 0.5, 0.75, 1, 1.5, 2, 2.5, 3, 3.5, 4, 5, 6, 7, 8, 10, 12, 14, 16, 20, 30, 40},
            {0, 1, 2, 4, 8, 16},
            {0, 2, 6, 16}
        };

        /// Where a tail goes on as far as doubles do, and where it ends at a number that is not 0.
        private static final double[] LONG = {60, 70, 80};
        private static final double[] SHORT = {26, 36};

        /// Width of each of the two last panels.
        private static final double LAST = 10;

        /// Nodes of the rule, and the two ends of the panel.
        static final int POINTS = GaussKronrod.POINTS + 2;

        private final Density density;
        private final int lines;
        private final double[] edges;
        private final Map<Panel, Nodes> nodes = new HashMap<>();
        private Grid grid;

        private record Panel(double from, double to) {}

        /// @param inside whether a point may be drawn and is no end of the support
        record Nodes(
                double from,
                double to,
                double[] x,
                double[] chance,
                double[] kronrod,
                double[] gauss,
                boolean[] inside) {
            /// Whether it lies in the last panel of its tail (1), or in the one before it (2); else 0.
            int last(Line line) {
                double middle = 0.5 * (from + to);
                double left = (middle < 0 ? -line.edges[0] : line.edges[line.edges.length - 1]) - Math.abs(middle);
                return left < LAST ? 1 : left < 2 * LAST ? 2 : 0;
            }
        }

        private Line(Density density, int lines) {
            this.density = density;
            this.lines = Math.min(lines, EDGES.length);
            var edges = new ArrayList<Double>();
            side(density.support().low()).forEach(s -> edges.addFirst(-s));
            side(density.support().high()).stream().skip(1).forEach(edges::add);
            this.edges = edges.stream().mapToDouble(Double::doubleValue).toArray();
        }

        private List<Double> side(double end) {
            var edges = new ArrayList<Double>();
            boolean isLong = lines < EDGES.length && (Double.isInfinite(end) || end == 0);
            double[] last = isLong ? LONG : SHORT;
            for (double s : EDGES[lines - 1]) {
                if (s < last[0]) {
                    edges.add(s);
                }
            }
            for (double s : last) {
                edges.add(s);
            }
            return edges;
        }

        @Override
        public long points() {
            return (long) POINTS * (edges.length - 1);
        }

        List<Nodes> first() {
            var panels = new ArrayList<Nodes>();
            for (int i = 1; i < edges.length; i++) {
                panels.add(nodes(edges[i - 1], edges[i]));
            }
            return panels;
        }

        Nodes nodes(double from, double to) {
            return nodes.computeIfAbsent(new Panel(from, to), _ -> made(from, to));
        }

        private Nodes made(double from, double to) {
            int n = POINTS;
            var made = new Nodes(from, to, new double[n], new double[n], new double[n], new double[n], new boolean[n]);
            double half = 0.5 * (to - from);
            for (int i = 0; i < n; i++) {
                boolean isNode = i < GaussKronrod.POINTS;
                double s = isNode
                        ? from + half * (1 + GaussKronrod.node(i))
                        : i == GaussKronrod.POINTS ? Math.nextUp(from) : Math.nextDown(to);
                double p = 0.5 * Exp.exp(-Math.abs(s));
                double x = from < 0 ? density.quantile(p) : density.upperQuantile(p);
                made.x[i] = x;
                made.chance[i] = p;
                made.kronrod[i] = isNode ? half * GaussKronrod.kronrod(i) * p : 0;
                made.gauss[i] = isNode ? half * GaussKronrod.gauss(i) * p : 0;
                made.inside[i] = isInside(s, x);
            }
            return made;
        }

        /// The value at a coordinate.
        double at(double s) {
            double p = 0.5 * Exp.exp(-Math.abs(s));
            return s < 0 ? density.quantile(p) : density.upperQuantile(p);
        }

        /// Whether a value may be drawn and is no end of the support.
        boolean isInside(double s, double x) {
            var support = density.support();
            return Math.abs(s) < DRAWN && x > support.low() && x < support.high();
        }

        /// Where an event is looked at.
        ///
        /// @param places rising: nodes and ends of the first panels, or of their halves
        record Grid(double[] places, double[] values) {}

        Grid grid() {
            if (grid == null) {
                double[] places = places();
                grid = new Grid(places, Arrays.stream(places).map(this::at).toArray());
            }
            return grid;
        }

        private double[] places() {
            var places = new TreeSet<Double>();
            for (int i = 1; i < edges.length; i++) {
                int parts = lines < EDGES.length ? 2 : 1;
                double half = 0.5 * (edges[i] - edges[i - 1]) / parts;
                for (int part = 0; part < parts; part++) {
                    double from = edges[i - 1] + 2 * half * part;
                    places.add(from);
                    for (int k = 0; k < GaussKronrod.POINTS; k++) {
                        places.add(from + half * (1 + GaussKronrod.node(k)));
                    }
                }
            }
            places.add(edges[edges.length - 1]);
            return places.stream().mapToDouble(Double::doubleValue).toArray();
        }
    }
}
