package dev.leadline.density;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;

/// Builds the table of a shape, and measures it.
///
/// A polynomial passes through the quantile at both ends of its cell and at the Chebyshev-Lobatto points between. It is
/// anchored at the quantile of its first end, and its slope is trimmed by rounding errors until its last value does not
/// pass the quantile of the other end: so the table is monotone across cells. Where quantiles fall back by rounding
/// errors, the first of them counts, from the middle outwards.
///
/// A cell that misses is cut in two, four, and so on. At a kink or a jump that does not end: once what is missed is
/// seldom drawn, it gets parts, each halved until it is hit. At a jump that ends where the part is narrower than the
/// error that is allowed: any value between those of its ends is right there, and it gets the value of its first end,
/// so that no draw falls into the gap.
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

    /// A table whose cells are cut this often is as fast with all cells alike.
    private static final int FEW_CUTS = 2;

    private static final int MOST_CUTS = 8;

    /// A cell may have parts once what is missed has this probability, and is such a part of the cell.
    private static final double SELDOM = 0x1p-14;

    private static final double FEW = 1 / 8.0;

    /// Coefficients of a part so narrow that rounding spoils more of them.
    private static final int LOWER = 5;

    /// What has more parts than this is not spoilt by a few kinks or jumps, but by noise.
    private static final int PARTS = 400;

    /// Enough for what is smooth.
    private static final int FEW_PARTS = 8;

    /// As much memory as ten times the smallest table.
    private static final int PARTS_IN_ALL = 4_000;

    private final Density shape;
    private final Link link;
    private final int bits;
    private final int cuts;
    private final boolean isCut;

    /// Coefficients of each cell, or of those that it is cut into.
    private final double[][] cells;

    private final List<List<double[]>> parts = new ArrayList<>();
    private int partsInAll;
    private int mostCut;
    private double worst;

    /// @param cuts a cell that misses is halved as often, if need be
    /// @param isCut whether cells may have parts
    private TableFit(Density shape, Link link, int bits, int cuts, boolean isCut) {
        this.shape = shape;
        this.link = link;
        this.bits = bits;
        this.cuts = cuts;
        this.isCut = isCut;
        this.cells = new double[Table.numberOfCells(bits)][Table.STRIDE];
        for (int i = 0; i < 2 * Table.DEEP; i++) {
            parts.add(new ArrayList<>());
        }
    }

    /// The smallest and fastest table that is accurate; where none is, one that has no cells.
    ///
    /// A shape that has a link is smooth through it: what its plain table misses, it misses by rounding, and
    /// parts would only hide that. Of few cuts a plain table is faster than a power.
    static Table of(Density shape) {
        Optional<Table> table = Optional.empty();
        if (shape instanceof Linked linked) {
            table = smooth(shape, Link.NONE, 1);
            if (table.isEmpty() && linked.link() == Link.ROOT_OF_ENDS) {
                table = smooth(shape, Link.ENDS, 3);
            }
            if (table.isEmpty() && linked.link() == Link.ROOT && shape.quantile(0x1p-53) > 0.5) {
                table = smooth(shape, Link.ABOVE_ONE, 1);
            }
            table = table.or(() -> smooth(shape, Link.NONE, FEW_CUTS)).or(() -> smooth(shape, linked.link(), 3));
        }
        return table.or(() -> broken(shape)).orElseGet(() -> slow(shape));
    }

    private static Optional<Table> smooth(Density shape, Link link, int cuts) {
        return whole(shape, link, new TableFit(shape, link, Table.SMALLEST_BITS, cuts, false));
    }

    private static Optional<Table> broken(Density shape) {
        return whole(shape, Link.NONE, new TableFit(shape, Link.NONE, Table.SMALLEST_BITS, MOST_CUTS, true));
    }

    private static Optional<Table> whole(Density shape, Link link, TableFit fit) {
        var table = fit.table();
        boolean isSmooth = fit.parts.size() == 2 * Table.DEEP;
        return table.isPresent() && fit.mostCut > 0 && fit.mostCut <= FEW_CUTS && isSmooth
                ? new TableFit(shape, link, Table.SMALLEST_BITS + fit.mostCut, 0, false)
                        .table()
                        .or(() -> table)
                : table;
    }

    /// Without cells: every draw costs a quantile.
    static Table slow(Density shape) {
        var slow = new Table(shape, Link.NONE, 0, new int[0], new double[0], Parts.NONE, 0);
        return new Table(shape, Link.NONE, 0, slow.grades(), slow.cells(), Parts.NONE, worst(shape, slow));
    }

    /// Empty as soon as something is missed for good.
    private Optional<Table> table() {
        double median = value(0.5, 0);
        double[] limits = {median, median};
        cells[Table.median(bits)][0] = median;
        for (int tail = 0; tail < 2; tail++) {
            mark(cells[Table.below(bits, tail)], 0);
        }
        for (int octave = Table.OCTAVES - 1; octave >= -Table.DEEP; octave--) {
            double base = StrictMath.scalb(1.0, octave - 16);
            for (int tail = 0; tail < 2; tail++) {
                double first = within(value(base, tail), limits[tail], tail);
                boolean isHit = octave < 0
                        ? deep(octave, new Cell(base, 0, 1, tail, first, limits[tail]))
                        : fit(octave, new Cell(base, 0, 1, tail, first, limits[tail]));
                if (!isHit) {
                    return Optional.empty();
                }
                limits[tail] = first;
            }
        }
        return Optional.of(mostCut == 0 && parts.size() == 2 * Table.DEEP ? alike() : graded());
    }

    private Table alike() {
        var all = new double[cells.length * Table.STRIDE];
        for (int i = 0; i < cells.length; i++) {
            System.arraycopy(cells[i], 0, all, i * Table.STRIDE, Table.STRIDE);
        }
        return new Table(shape, link, bits, new int[0], all, Parts.of(parts), worst);
    }

    private Table graded() {
        var all = new double[Arrays.stream(cells).mapToInt(c -> c.length).sum()];
        var grades = new int[cells.length];
        int from = 0;
        for (int i = 0; i < cells.length; i++) {
            int cut = Integer.numberOfTrailingZeros(cells[i].length / Table.STRIDE);
            grades[i] = Table.grade(i, cut, from / Table.STRIDE);
            System.arraycopy(cells[i], 0, all, from, cells[i].length);
            from += cells[i].length;
        }
        return new Table(shape, link, bits, grades, all, Parts.of(parts), worst);
    }

    /// A value, or the limit that it must not pass on the way to the middle.
    private double within(double value, double limit, int tail) {
        boolean passes = tail == 0 ? link.isBelow(limit, value) : link.isBelow(value, limit);
        return passes ? limit : value;
    }

    /// A stretch of one tail.
    ///
    /// @param base the probability at which its octave begins
    /// @param from where it begins in the octave, in units of the base
    /// @param width in the same units
    /// @param first what is tabulated where it begins
    /// @param last what no value of it passes; where it is known what is tabulated where it ends, that
    private record Cell(double base, double from, double width, int tail, double first, double last) {
        double p(double part) {
            return base * (1 + from + part * width);
        }

        /// What a polynomial is asked with.
        double argument(double p) {
            return p / base - 1 - from;
        }

        double mass() {
            return base * width;
        }

        /// Whether it can be halved, and has to.
        boolean isWide() {
            return mass() > 0.5 * Math.min(U_ERROR, RELATIVE * p(0));
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

    /// Fits the cells of an octave. False where one is missed for good.
    private boolean fit(int octave, Cell whole) {
        double width = StrictMath.scalb(1.0, -bits);
        double first = whole.first();
        for (int cell = 0; cell < 1 << bits; cell++) {
            int number = Table.number(bits, whole.tail(), octave, cell);
            var stretch = new Cell(whole.base(), cell * width, width, whole.tail(), first, whole.last());
            boolean isHit = false;
            for (int cut = 0; cut <= cuts && !isHit; cut++) {
                var missed = new ArrayList<Integer>();
                var ends = new double[(1 << cut) + 1];
                cells[number] = cut(stretch, cut, ends, missed);
                isHit = missed.isEmpty();
                first = ends[1 << cut];
                if (!isHit && isCut && (cut == cuts || isSeldom(missed.size(), cut, stretch))) {
                    for (int k : missed) {
                        if (!part(cells[number], k, piece(stretch, cut, k, ends[k], ends[k + 1]))) {
                            return false;
                        }
                    }
                    isHit = true;
                }
                mostCut = isHit ? Math.max(mostCut, cut) : mostCut;
            }
            if (!isHit) {
                return false;
            }
        }
        return true;
    }

    /// Whether what is missed of a cell that is cut may have parts.
    private static boolean isSeldom(int missed, int cut, Cell cell) {
        double mass = StrictMath.scalb(cell.mass(), -cut) * missed;
        return mass <= SELDOM && missed <= StrictMath.scalb(FEW, cut);
    }

    private static Cell piece(Cell whole, int cut, int number, double first, double last) {
        double width = StrictMath.scalb(whole.width(), -cut);
        return new Cell(whole.base(), whole.from() + number * width, width, whole.tail(), first, last);
    }

    /// The polynomials of a cell that is cut.
    ///
    /// @param ends filled with what is tabulated where those it is cut into begin, and where the last ends
    /// @param missed filled with the numbers of those whose polynomial misses
    private double[] cut(Cell whole, int cut, double[] ends, List<Integer> missed) {
        var all = new double[Table.STRIDE << cut];
        ends[0] = whole.first();
        for (int k = 0; k < 1 << cut; k++) {
            var piece = piece(whole, cut, k, ends[k], whole.last());
            var nodes = new Nodes(piece, Table.STRIDE);
            ends[k + 1] = nodes.end();
            var c = nodes.through().filter(c_ -> !(shape instanceof Linked) || isMonotone(c_, piece));
            double error = c.isPresent() ? error(piece, c.get()) : Double.POSITIVE_INFINITY;
            if (error <= U_ERROR) {
                worst = Math.max(worst, error);
                System.arraycopy(c.get(), 0, all, k * Table.STRIDE, Table.STRIDE);
            } else {
                missed.add(k);
            }
        }
        return all;
    }

    /// Gives parts to one of the cells whose coefficients are given.
    private boolean part(double[] c, int number, Cell cell) {
        int from = number * Table.STRIDE;
        Arrays.fill(c, from, from + Table.STRIDE, 0);
        c[from] = parts.size();
        mark(c, from);
        parts.add(new ArrayList<>());
        return cover(cell, cell.from(), PARTS, parts.getLast());
    }

    private static void mark(double[] c, int from) {
        c[from + Table.STRIDE - 1] = Table.MARKED;
    }

    private boolean deep(int octave, Cell whole) {
        return cover(whole, 0, isCut ? PARTS : FEW_PARTS, parts.get(whole.tail() * Table.DEEP + octave + Table.DEEP));
    }

    /// Adds parts until all of a cell is hit. False where too many would be needed.
    ///
    /// @param from where the whole begins that has the parts
    private boolean cover(Cell cell, double from, int most, List<double[]> ofWhole) {
        var hit = hit(cell);
        if (hit.isPresent()) {
            var part = Arrays.copyOf(hit.get(), Parts.STRIDE + 1);
            part[Parts.STRIDE] = cell.from() - from;
            ofWhole.add(part);
            partsInAll++;
            return true;
        }
        if (!cell.isWide() || ofWhole.size() >= most || partsInAll >= PARTS_IN_ALL) {
            return false;
        }
        double p = cell.p(0.5);
        double middle = within(within(value(p, cell.tail()), cell.first(), 1 - cell.tail()), cell.last(), cell.tail());
        return cover(piece(cell, 1, 0, cell.first(), middle), from, most, ofWhole)
                && cover(piece(cell, 1, 1, middle, cell.last()), from, most, ofWhole);
    }

    /// A polynomial for all of a cell, one of a lower degree, or at a jump, or where values differ by rounding errors,
    /// one value.
    private Optional<double[]> hit(Cell cell) {
        return hit(cell, new Nodes(cell, Parts.STRIDE).through())
                .or(() -> hit(cell, new Nodes(cell, LOWER).through()))
                .or(() -> hit(cell, Optional.of(new double[] {cell.first()})));
    }

    private Optional<double[]> hit(Cell cell, Optional<double[]> c) {
        double error =
                c.filter(c_ -> isMonotone(c_, cell)).map(c_ -> error(cell, c_)).orElse(Double.NaN);
        if (!(error <= U_ERROR)) {
            return Optional.empty();
        }
        worst = Math.max(worst, error);
        return c;
    }

    /// Whether the Bernstein coefficients of the slope have one sign, which is enough.
    private static boolean isMonotone(double[] c, Cell cell) {
        int degree = c.length - 2;
        double sign = cell.tail() == 0 ? 1 : -1;
        for (int i = 0; i <= degree; i++) {
            double sum = 0;
            double weight = cell.width();
            for (int j = 0; j <= i; j++) {
                sum += weight * (j + 1) * c[j + 1];
                weight *= cell.width() * (i - j) / (degree - j);
            }
            if (!(sign * sum >= 0)) {
                return false;
            }
        }
        return true;
    }

    /// As the table computes it: a cell, or a part.
    private static double at(double[] c, double t) {
        return c.length == Table.STRIDE ? Table.polynomial(c, 0, t) : Parts.polynomial(c, 0, c.length, t);
    }

    private double error(Cell cell, double[] c) {
        double[] measured = Lobatto.measured(c.length);
        var x = new double[measured.length];
        for (int i = 0; i < x.length; i++) {
            x[i] = at(c, cell.argument(cell.p(measured[i])));
        }
        link.invert(x, x.length, 0, 1);
        double largest = 0;
        for (int i = 0; i < x.length; i++) {
            double p = cell.p(measured[i]);
            double error = error(shape, x[i], p, cell.tail(), 1);
            if (!(error <= RELATIVE * p)) {
                return Double.POSITIVE_INFINITY;
            }
            largest = Math.max(largest, error);
        }
        return largest;
    }

    /// What a polynomial of `n` coefficients passes through: arguments, and what is tabulated there.
    private final class Nodes {
        private final Cell cell;
        private final double[] t;
        private final double[] y;

        Nodes(Cell cell, int n) {
            this.cell = cell;
            this.t = new double[n];
            this.y = new double[n];
            double[] nodes = Lobatto.nodes(n);
            y[0] = cell.first();
            for (int j = 1; j < n; j++) {
                double p = cell.p(nodes[j]);
                t[j] = cell.argument(p);
                y[j] = within(within(value(p, cell.tail()), y[j - 1], 1 - cell.tail()), cell.last(), cell.tail());
            }
        }

        double end() {
            return y[y.length - 1];
        }

        /// Newton's divided differences, expanded; then the trim, if that succeeds.
        Optional<double[]> through() {
            int n = t.length;
            double[] smooth = link.smooth(y);
            var difference = smooth.clone();
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
            c[0] = smooth[0];
            c[n - 1] = unmarked(c[n - 1]);
            return trimmed(c, smooth[n - 1]);
        }

        private static double unmarked(double coefficient) {
            return Double.longBitsToDouble(Double.doubleToRawLongBits(coefficient) & ~Table.MARK);
        }

        private Optional<double[]> trimmed(double[] c, double end) {
            double last = t[t.length - 1] - 0x1p-52;
            double sign = cell.tail() == 0 ? 1 : -1;
            for (int trial = 0; trial < 8; trial++) {
                double excess = sign * (at(c, last) - end);
                if (excess <= 0) {
                    return Optional.of(c);
                }
                c[1] -= sign * Math.max(excess, Math.ulp(end)) / last;
            }
            return Optional.empty();
        }
    }

    /// Largest error of a curve that has no cells, measured in each octave.
    static double worst(Density shape, Curve curve) {
        double worst = 0;
        for (int octave = 0; octave < Table.OCTAVES + Table.DEEP; octave++) {
            for (int tail = 0; tail < 2; tail++) {
                worst = Math.max(worst, worst(shape, curve, octave, tail));
            }
        }
        return worst;
    }

    /// At four times the points of a cell; infinite where an error is too large for its tail.
    private static double worst(Density shape, Curve curve, int octave, int tail) {
        double base = StrictMath.scalb(1.0, octave - 53);
        double[] measured = Lobatto.measured(Table.STRIDE);
        var u = new double[4 * measured.length];
        for (int i = 0; i < u.length; i++) {
            double p = base * (1 + (i / measured.length + measured[i % measured.length] * (1 - 0x1p-40)) / 4);
            u[i] = tail == 0 ? p : 1 - p;
        }
        var x = new double[u.length];
        curve.fill(u, x, u.length, 0, 1);
        double worst = 0;
        for (int i = 0; i < u.length; i++) {
            double p = tail == 0 ? u[i] : 1 - u[i];
            double error = error(shape, x[i], p, tail, 8);
            if (!(error <= RELATIVE * p)) {
                return Double.POSITIVE_INFINITY;
            }
            worst = Math.max(worst, error);
        }
        return worst;
    }

    /// How far p lies from the probabilities between the neighbours of x, one step away; where the error is as small as
    /// that of u itself, more.
    private static double error(Density shape, double x, double p, int tail, int steps) {
        double plain = Math.abs(mass(shape, x, tail) - p);
        if (plain <= 1e-14 * p) {
            return plain;
        }
        double below = x;
        double above = x;
        for (int i = 0; i < (plain <= FEW_ULP ? steps : 1); i++) {
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
