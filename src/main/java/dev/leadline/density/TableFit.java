package dev.leadline.density;

import java.util.Optional;

/// Builds the table of a shape, and measures it.
///
/// A cell's polynomial passes through the quantile at both ends of the cell and at the four Chebyshev-Lobatto points
/// between. It is anchored at the quantile of its first end, and its slope is trimmed by rounding errors until its last
/// value does not pass the quantile of the other end: so the table is monotone across cells.
///
/// What is measured is how far the probability lies from what the drawn value, or a neighbour of it among the doubles,
/// stands for: near 1, say, a steep distribution cannot be hit more closely.
final class TableFit {
    /// Largest error in probability that a table may have.
    static final double U_ERROR = 1e-12;

    /// Largest error relative to the probability of the tail.
    private static final double RELATIVE = 1e-10;

    /// A few times the distance between neighbouring u.
    private static final double FEW_ULP = 1e-15;

    /// `(1 - cos(k pi / 5)) / 2`.
    private static final double[] LOBATTO = {
        0, 0.09549150281252627, 0.3454915028125263, 0.6545084971874737, 0.9045084971874737, 1
    };

    /// Where a cell is measured: its ends, and between the points it passes through.
    private static final double[] MEASURED = {0, 0.03, 0.22, 0.5, 0.78, 0.97, 1};

    private final Density shape;
    private final Link link;
    private final int bits;
    private final double[] cells;
    private double worst;

    private TableFit(Density shape, Link link, int bits) {
        this.shape = shape;
        this.link = link;
        this.bits = bits;
        this.cells = Table.emptyCells(bits);
    }

    /// The smallest and fastest table that is accurate; where none is, one that has no cells.
    static Table of(Density shape) {
        for (int bits = 5; bits <= 8; bits++) {
            var plain = new TableFit(shape, Link.NONE, bits).table();
            if (plain.isPresent()) {
                return plain.get();
            }
            if (bits > 5 && shape instanceof Linked linked) {
                for (int linkedBits = 5; linkedBits <= 8; linkedBits++) {
                    var table = new TableFit(shape, linked.link(), linkedBits).table();
                    if (table.isPresent()) {
                        return table.get();
                    }
                }
            }
        }
        var slow = new Table(shape, Link.NONE, 0, new double[0], 0);
        return new Table(shape, Link.NONE, 0, slow.cells(), worst(shape, slow));
    }

    /// Empty as soon as an octave is not accurate enough.
    private Optional<Table> table() {
        var table = new Table(shape, link, bits, cells, 0);
        fillMedian();
        for (int octave = Table.OCTAVES - 1; octave >= 0; octave--) {
            for (int tail = 0; tail < 2; tail++) {
                if (!fit(octave, tail) || !measure(table, octave, tail)) {
                    return Optional.empty();
                }
            }
        }
        return Optional.of(new Table(shape, link, bits, cells, worst));
    }

    private int index(int octave, int cell, int tail) {
        return Table.index(bits, tail, octave, cell);
    }

    private void fillMedian() {
        for (int tail = 0; tail < 2; tail++) {
            cells[index(Table.OCTAVES, 0, tail)] = value(0.5, tail);
        }
    }

    /// What is tabulated: the quantile of the tail, or its link.
    private double value(double p, int tail) {
        if (link == Link.NONE) {
            return tail == 0 ? shape.quantile(p) : shape.upperQuantile(p);
        }
        var linked = (Linked) shape;
        return tail == 0 ? linked.linked(p) : linked.upperLinked(p);
    }

    private boolean fit(int octave, int tail) {
        double width = StrictMath.scalb(1.0, -bits);
        double base = StrictMath.scalb(1.0, octave - 53);
        var t = new double[LOBATTO.length];
        var y = new double[LOBATTO.length];
        double atEnd = value(base, tail);
        for (int cell = 0; cell < 1 << bits; cell++) {
            for (int j = 0; j < t.length; j++) {
                double p = base * (1 + cell * width + LOBATTO[j] * width);
                t[j] = p / base - 1 - cell * width;
                y[j] = j == 0 ? atEnd : value(p, tail);
            }
            atEnd = y[t.length - 1];
            if (!put(t, y, index(octave, cell, tail), tail)) {
                return false;
            }
        }
        return true;
    }

    /// Newton's divided differences, expanded; then the trim.
    private boolean put(double[] t, double[] y, int k, int tail) {
        int n = t.length;
        var difference = y.clone();
        for (int order = 1; order < n; order++) {
            for (int j = n - 1; j >= order; j--) {
                difference[j] = (difference[j] - difference[j - 1]) / (t[j] - t[j - order]);
            }
        }
        var c = new double[n];
        for (int j = n - 1; j >= 0; j--) {
            for (int i = n - 1; i > 0; i--) {
                c[i] = c[i - 1] - t[j] * c[i];
            }
            c[0] = difference[j] - t[j] * c[0];
        }
        c[0] = y[0];
        double end = y[n - 1];
        double last = t[n - 1] - 0x1p-52;
        double sign = tail == 0 ? 1 : -1;
        for (int trial = 0; trial < 8; trial++) {
            double excess = sign * (at(c, last) - end);
            if (excess <= 0) {
                System.arraycopy(c, 0, cells, k, n);
                return true;
            }
            c[1] -= sign * Math.max(excess, Math.ulp(end)) / last;
        }
        return false;
    }

    private static double at(double[] c, double t) {
        double y = Math.fma(c[5], t, c[4]);
        y = Math.fma(y, t, c[3]);
        y = Math.fma(y, t, c[2]);
        y = Math.fma(y, t, c[1]);
        return Math.fma(y, t, c[0]);
    }

    private boolean measure(Table table, int octave, int tail) {
        double octaveWorst = worst(shape, table, octave, bits, tail);
        worst = Math.max(worst, octaveWorst);
        return octaveWorst <= U_ERROR;
    }

    /// Largest error of a curve that has no cells, measured where those of a table would be.
    static double worst(Density shape, Curve curve) {
        double worst = 0;
        for (int octave = 0; octave < Table.OCTAVES; octave++) {
            for (int tail = 0; tail < 2; tail++) {
                worst = Math.max(worst, worst(shape, curve, octave, 2, tail));
            }
        }
        return worst;
    }

    /// Infinite where an error is too large for its tail.
    private static double worst(Density shape, Curve curve, int octave, int bits, int tail) {
        double base = StrictMath.scalb(1.0, octave - 53);
        int n = MEASURED.length << bits;
        var u = new double[n];
        for (int i = 0; i < n; i++) {
            double cell = i / MEASURED.length + MEASURED[i % MEASURED.length] * (1 - 0x1p-40);
            double p = base * (1 + StrictMath.scalb(cell, -bits));
            u[i] = tail == 0 ? p : 1 - p;
        }
        var x = new double[n];
        curve.fill(u, x, n, 0, 1);
        double worst = 0;
        for (int i = 0; i < n; i++) {
            double p = tail == 0 ? u[i] : 1 - u[i];
            double error = error(shape, x[i], p, tail);
            if (!(error <= RELATIVE * p)) {
                return Double.POSITIVE_INFINITY;
            }
            worst = Math.max(worst, error);
        }
        return worst;
    }

    /// How far p lies from the probabilities between the neighbours of x, one step away; where the error is as small as
    /// that of u itself, eight.
    private static double error(Density shape, double x, double p, int tail) {
        double plain = Math.abs(mass(shape, x, tail) - p);
        if (plain <= 1e-14 * p) {
            return plain;
        }
        double below = x;
        double above = x;
        for (int i = 0; i < (plain <= FEW_ULP ? 8 : 1); i++) {
            below = Math.nextDown(below);
            above = Math.nextUp(above);
        }
        double a = mass(shape, below, tail);
        double b = mass(shape, above, tail);
        double beyond = Math.max(Math.min(a, b) - p, p - Math.max(a, b));
        return Double.isNaN(beyond) ? beyond : Math.min(plain, Math.max(beyond, 0));
    }

    private static double mass(Density shape, double x, int tail) {
        return tail == 0 ? shape.cdf(x) : shape.survival(x);
    }
}
