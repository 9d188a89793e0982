package dev.leadline.density;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;

/// Builds the table of a shape, and measures it.
///
/// A cell's polynomial passes through the quantile at both ends of the cell and at the four Chebyshev-Lobatto points
/// between. It is anchored at the quantile of its first end, and its slope is trimmed by rounding errors until its last
/// value does not pass the quantile of the other end: so the table is monotone across cells. Where quantiles fall back
/// by rounding errors, the first of them counts, from the middle outwards.
///
/// A cell that misses is halved, and so on, until every part of it is hit. At a jump of the quantile that ends where
/// the part is narrower than the error that is allowed: any value between those of its ends is right there, and it gets
/// the value of its first end, so that no draw falls into the gap.
///
/// What is measured is how far the probability lies from what the drawn value, or a neighbour of it among the doubles,
/// stands for: near 1, say, a steep distribution cannot be hit more closely. Of a discrete shape that is how far it
/// lies outside what the drawn value covers, from the cdf before it to the cdf at it.
final class TableFit {
    /// Largest error in probability that a table may have.
    static final double U_ERROR = 1e-12;

    /// Largest error relative to the probability of the tail.
    private static final double RELATIVE = 1e-10;

    /// A few times the distance between neighbouring u.
    private static final double FEW_ULP = 1e-15;

    private static final int LEAST_BITS = 5;

    /// Up to here a plain table is tried before one of distances to both ends, which costs a tenth more.
    private static final int FEW_BITS = 6;

    private static final int MOST_BITS = 8;

    /// The probability of a draw in a cell of parts above which a table of more bits is faster; such a draw costs as
    /// much as ten others.
    private static final double SELDOM = 0.004;

    /// A cell that has more parts than this is not spoilt by a few kinks or jumps, but by noise.
    private static final int PARTS_OF_CELL = 400;

    /// As much memory as twice the cells of the smallest table.
    private static final int PARTS = 6_000;

    /// `(1 - cos(k pi / 5)) / 2`.
    private static final double[] LOBATTO = {
        0, 0.09549150281252627, 0.3454915028125263, 0.6545084971874737, 0.9045084971874737, 1
    };

    /// Where a cell is measured: its ends, and between the points it passes through.
    private static final double[] MEASURED = {0, 0.03, 0.22, 0.5, 0.78, 0.97, 1};

    /// From the coefficients of a polynomial of degree 4 to those in Bernstein's form: `C(i, j) / C(4, j)`.
    private static final double[][] BERNSTEIN = {
        {1}, {1, 1 / 4.0}, {1, 2 / 4.0, 1 / 6.0}, {1, 3 / 4.0, 3 / 6.0, 1 / 4.0}, {1, 1, 1, 1, 1}
    };

    private final Density shape;
    private final Link link;
    private final int bits;
    private final double[] cells;
    private final List<List<double[]>> parts = new ArrayList<>();
    private int partsInAll;
    private double worst;

    private TableFit(Density shape, Link link, int bits) {
        this.shape = shape;
        this.link = link;
        this.bits = bits;
        this.cells = Table.emptyCells(bits);
    }

    /// The smallest and fastest table that is accurate; where none is, one that has no cells.
    ///
    /// A shape that has a link is smooth through it: what its plain table misses, it misses by rounding, and
    /// parts would only hide that. Up to 7 bits its table is faster than an exponential function.
    static Table of(Density shape) {
        Optional<Table> table = Optional.empty();
        if (shape instanceof Linked linked) {
            table = least(shape, Link.NONE, LEAST_BITS, FEW_BITS, 0);
            if (table.isEmpty() && linked.link() == Link.LOGIT) {
                table = least(shape, Link.ENDS, LEAST_BITS, MOST_BITS, 0);
            }
            table = table.or(() -> least(shape, Link.NONE, FEW_BITS + 1, MOST_BITS - 1, 0))
                    .or(() -> least(shape, linked.link(), LEAST_BITS, MOST_BITS, 0));
        } else {
            table = least(shape, Link.NONE, LEAST_BITS, MOST_BITS, SELDOM);
        }
        return table.or(() -> new TableFit(shape, Link.NONE, MOST_BITS).table(1))
                .orElseGet(() -> slow(shape));
    }

    private static Optional<Table> least(Density shape, Link link, int from, int to, double most) {
        for (int bits = from; bits <= to; bits++) {
            var table = new TableFit(shape, link, bits).table(most);
            if (table.isPresent()) {
                return table;
            }
        }
        return Optional.empty();
    }

    /// Without cells: every draw costs a quantile.
    static Table slow(Density shape) {
        var slow = new Table(shape, Link.NONE, 0, new double[0], Parts.NONE, 0);
        return new Table(shape, Link.NONE, 0, slow.cells(), Parts.NONE, worst(shape, slow));
    }

    /// Empty as soon as cells of more probability than `most` are missed, or a cell cannot be mended by parts.
    private Optional<Table> table(double most) {
        fillMedian();
        var whole = new Table(shape, link, bits, cells, Parts.NONE, 0);
        var missed = new ArrayList<Cell>();
        double mass = 0;
        double[] limits = {value(0.5, 0), value(0.5, 1)};
        for (int octave = Table.OCTAVES - 1; octave >= 0; octave--) {
            for (int tail = 0; tail < 2; tail++) {
                double first = within(value(StrictMath.scalb(1.0, octave - 53), tail), limits[tail], tail);
                double last = limits[tail];
                limits[tail] = first;
                for (var cell : fit(whole, octave, tail, first, last)) {
                    missed.add(cell);
                    mass += cell.width(bits);
                    if (mass > most) {
                        return Optional.empty();
                    }
                }
            }
        }
        for (var cell : missed) {
            if (!split(cell)) {
                return Optional.empty();
            }
        }
        return Optional.of(new Table(shape, link, bits, cells, Parts.of(parts, StrictMath.scalb(1.0, -bits)), worst));
    }

    /// A value, or the limit that it must not pass on the way to the middle.
    private double within(double value, double limit, int tail) {
        boolean passes = tail == 0 ? link.isBelow(limit, value) : link.isBelow(value, limit);
        return passes ? limit : value;
    }

    /// @param octave counted from the smallest probability
    /// @param first what is tabulated at its smallest probability
    /// @param last what is tabulated where the next begins
    private record Cell(int octave, int cell, int tail, double first, double last) {
        /// The probability at which the octave begins.
        double base() {
            return StrictMath.scalb(1.0, octave - 53);
        }

        /// In probability.
        double width(int bits) {
            return StrictMath.scalb(1.0, octave - 53 - bits);
        }

        int index(int bits) {
            return Table.index(bits, tail, octave, cell);
        }
    }

    private void fillMedian() {
        for (int tail = 0; tail < 2; tail++) {
            cells[Table.index(bits, tail, Table.OCTAVES, 0)] = value(0.5, tail);
        }
    }

    /// What is tabulated: the quantile of the tail, or its link.
    private double value(double p, int tail) {
        if (link == Link.NONE) {
            return tail == 0 ? shape.quantile(p) : shape.upperQuantile(p);
        }
        var linked = (Linked) shape;
        return link.tabulated(tail == 0 ? linked.linked(p) : linked.upperLinked(p));
    }

    /// Fits the cells of an octave.
    ///
    /// @return those that were missed
    private List<Cell> fit(Table table, int octave, int tail, double first, double last) {
        var missed = new ArrayList<Cell>();
        var ends = new double[(1 << bits) + 1];
        ends[0] = first;
        double width = StrictMath.scalb(1.0, -bits);
        for (int number = 0; number < 1 << bits; number++) {
            var cell = new Cell(octave, number, tail, ends[number], last);
            var t = new double[LOBATTO.length];
            var y = new double[LOBATTO.length];
            points(cell, 0, width, cell.first(), last, t, y);
            ends[number + 1] = y[t.length - 1];
            var c = through(t, link.smooth(y), tail)
                    .filter(c_ -> !(shape instanceof Linked) || isMonotone(c_, width, tail));
            if (c.isPresent()) {
                System.arraycopy(c.get(), 0, cells, cell.index(bits), Table.STRIDE);
            } else {
                Arrays.fill(cells, cell.index(bits), cell.index(bits) + Table.STRIDE, Double.NaN);
            }
        }
        double[] errors = errors(shape, table, octave, bits, tail);
        for (int number = 0; number < errors.length; number++) {
            if (errors[number] <= U_ERROR) {
                worst = Math.max(worst, errors[number]);
            } else {
                missed.add(new Cell(octave, number, tail, ends[number], ends[number + 1]));
            }
        }
        return missed;
    }

    /// The points that a part of a cell passes through.
    ///
    /// @param from where it begins, in units of the octave's first probability
    /// @param y what is tabulated there; the first is `first`, none is before that or beyond `last`
    private void points(Cell cell, double from, double width, double first, double last, double[] t, double[] y) {
        double before = StrictMath.scalb(cell.cell(), -bits) + from;
        for (int j = 0; j < t.length; j++) {
            double p = cell.base() * (1 + before + LOBATTO[j] * width);
            t[j] = p / cell.base() - 1 - before;
            y[j] = j == 0 ? first : within(within(value(p, cell.tail()), y[j - 1], 1 - cell.tail()), last, cell.tail());
        }
    }

    /// Halves a cell until all of its parts are hit. False where too many would be needed.
    private boolean split(Cell cell) {
        var ofCell = new ArrayList<double[]>();
        if (!halve(cell, 0, StrictMath.scalb(1.0, -bits), cell.first(), cell.last(), ofCell)) {
            return false;
        }
        int k = cell.index(bits);
        Arrays.fill(cells, k, k + Table.STRIDE, Double.NaN);
        cells[k] = parts.size();
        parts.add(ofCell);
        partsInAll += ofCell.size();
        return true;
    }

    private boolean halve(Cell cell, double from, double width, double first, double last, List<double[]> ofCell) {
        double half = 0.5 * width;
        double p = cell.base() * (1 + StrictMath.scalb(cell.cell(), -bits) + from + half);
        double middle = within(within(value(p, cell.tail()), first, 1 - cell.tail()), last, cell.tail());
        boolean isWide = cell.base() * half > 0.5 * Math.min(U_ERROR, RELATIVE * p);
        for (int side = 0; side < 2; side++) {
            double begin = from + side * half;
            double a = side == 0 ? first : middle;
            double b = side == 0 ? middle : last;
            if (!isHit(cell, begin, half, a, b, isWide, ofCell)
                    && !(isWide && halve(cell, begin, half, a, b, ofCell))) {
                return false;
            }
            if (ofCell.size() > PARTS_OF_CELL || partsInAll + ofCell.size() > PARTS) {
                return false;
            }
        }
        return true;
    }

    /// Adds a part, if one polynomial, or at a jump one value, is right for all of it.
    private boolean isHit(
            Cell cell, double from, double width, double first, double last, boolean isWide, List<double[]> ofCell) {
        var t = new double[LOBATTO.length];
        var y = new double[LOBATTO.length];
        points(cell, from, width, first, last, t, y);
        var c = through(t, link.smooth(y), cell.tail()).filter(c_ -> isMonotone(c_, width, cell.tail()));
        double error = c.isPresent() ? error(cell, from, width, c.get()) : Double.POSITIVE_INFINITY;
        if (!(error <= U_ERROR) && !isWide) {
            c = Optional.of(new double[] {first, 0, 0, 0, 0, 0});
            error = error(cell, from, width, c.get());
        }
        if (!(error <= U_ERROR)) {
            return false;
        }
        worst = Math.max(worst, error);
        var part = Arrays.copyOf(c.get(), Table.STRIDE + 1);
        part[Table.STRIDE] = from;
        ofCell.add(part);
        return true;
    }

    /// Whether the Bernstein coefficients of the slope have one sign, which is enough.
    private static boolean isMonotone(double[] c, double width, int tail) {
        var slope = new double[5];
        double power = width;
        for (int j = 0; j < 5; j++) {
            slope[j] = (j + 1) * c[j + 1] * power;
            power *= width;
        }
        double sign = tail == 0 ? 1 : -1;
        for (int i = 0; i < 5; i++) {
            double sum = 0;
            for (int j = 0; j <= i; j++) {
                sum += BERNSTEIN[i][j] * slope[j];
            }
            if (!(sign * sum >= 0)) {
                return false;
            }
        }
        return true;
    }

    private double error(Cell cell, double from, double width, double[] c) {
        int n = MEASURED.length;
        var x = new double[n];
        var p = new double[n];
        double before = StrictMath.scalb(cell.cell(), -bits) + from;
        for (int i = 0; i < n; i++) {
            p[i] = cell.base() * (1 + before + MEASURED[i] * width);
            x[i] = at(c, p[i] / cell.base() - 1 - before);
        }
        link.invert(x, n);
        double largest = 0;
        for (int i = 0; i < n; i++) {
            double error = error(shape, x[i], p[i], cell.tail());
            if (!(error <= RELATIVE * p[i])) {
                return Double.POSITIVE_INFINITY;
            }
            largest = Math.max(largest, error);
        }
        return largest;
    }

    /// Newton's divided differences, expanded; then the trim, if that succeeds.
    private static Optional<double[]> through(double[] t, double[] y, int tail) {
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
                return Optional.of(c);
            }
            c[1] -= sign * Math.max(excess, Math.ulp(end)) / last;
        }
        return Optional.empty();
    }

    private static double at(double[] c, double t) {
        double y = Math.fma(c[5], t, c[4]);
        y = Math.fma(y, t, c[3]);
        y = Math.fma(y, t, c[2]);
        y = Math.fma(y, t, c[1]);
        return Math.fma(y, t, c[0]);
    }

    /// Largest error of a curve that has no cells, measured where those of a table would be.
    static double worst(Density shape, Curve curve) {
        double worst = 0;
        for (int octave = 0; octave < Table.OCTAVES; octave++) {
            for (int tail = 0; tail < 2; tail++) {
                worst = Math.max(
                        worst,
                        Arrays.stream(errors(shape, curve, octave, 2, tail))
                                .max()
                                .orElseThrow());
            }
        }
        return worst;
    }

    /// Largest error of each cell; infinite where an error is too large for its tail.
    private static double[] errors(Density shape, Curve curve, int octave, int bits, int tail) {
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
        var largest = new double[1 << bits];
        for (int i = 0; i < n; i++) {
            int cell = i / MEASURED.length;
            double p = tail == 0 ? u[i] : 1 - u[i];
            double error =
                    largest[cell] < Double.POSITIVE_INFINITY ? error(shape, x[i], p, tail) : Double.POSITIVE_INFINITY;
            largest[cell] = error <= RELATIVE * p ? Math.max(largest[cell], error) : Double.POSITIVE_INFINITY;
        }
        return largest;
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
