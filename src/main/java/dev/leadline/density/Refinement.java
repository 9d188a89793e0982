package dev.leadline.density;

import dev.leadline.problem.Refusal;
import java.math.BigDecimal;
import java.math.MathContext;
import java.util.ArrayList;
import java.util.List;

/// Halves the cells of a landscape until each is a polynomial to rounding error, relative to the mass of the
/// tail behind it, and holds no more than a few times that mass: so both tails keep their digits.
final class Refinement {
    /// Cells at most.
    static final int MOST = 20_000;

    private static final int PASSES = 120;

    /// Error of the mass of a cell, relative to the lesser tail.
    private static final double ERROR = 1e-14;

    /// Mass of a cell over that of the tail behind it.
    private static final double STEEPEST = 32;

    /// Tails are followed to this share of all.
    private static final double LEAST = 1e-300;

    /// An error of this share of all is allowed even where the tail is less.
    private static final double UNSEEN = 1e-19;

    /// What cannot be less than rounding errors: relative to the height, and to its logarithm.
    private static final double ROUNDING = 1e-15;

    /// Errors that do not fall when cells are halved are those of the formula, where they are as small as this.
    private static final double NOISE = 1e-6;

    /// Narrower cells, in units of the spacing of numbers, have no digits to tell where in it a node stands.
    private static final double SPARSE = 0x1p9;

    /// Points of a cell: its nodes, and one next to each end, since a jump or a bend between the last node and the end
    /// is seen by no node.
    private static final int POINTS = Chebyshev.POINTS + 2;

    /// Of half the width of a cell, how near to its ends the points stand, and the nodes.
    private static final double NEAR_END = 0x1p-33;

    private static final double LAST_NODE = 0.005;

    /// A cell in the making: the heights at its nodes, or the flank that it is.
    static final class Cell {
        final double low;
        final double high;
        final Flank flank;
        double[] heights;
        double[] coefficients;
        double mass;
        double highest;

        /// Error of the polynomial over its largest coefficient: its last coefficients, or how far it misses at the
        /// ends.
        double rough;

        boolean settled;

        Cell(double low, double high, Flank flank) {
            this.low = low;
            this.high = high;
            this.flank = flank;
            if (flank != null) {
                mass = flank.mass();
                settled = true;
            }
        }

        /// The nodes, then the points next to the lower and the upper end.
        double point(int j) {
            if (j < Chebyshev.POINTS) {
                return node(j);
            }
            double near = NEAR_END * 0.5 * (high - low);
            return j == Chebyshev.POINTS
                    ? Math.max(low + near, Math.nextUp(low))
                    : Math.min(high - near, Math.nextDown(high));
        }

        double node(int j) {
            double t = Chebyshev.NODES[j];
            double half = 0.5 * (high - low);
            return Math.clamp(t < 0 ? Math.fma(half, 1 + t, low) : Math.fma(-half, 1 - t, high), low, high);
        }

        void take(double[] all, int from) {
            heights = new double[Chebyshev.POINTS];
            System.arraycopy(all, from, heights, 0, Chebyshev.POINTS);
            coefficients = Chebyshev.coefficients(heights);
            if (0.5 * (high - low) > SPARSE * ulp()) {
                moveToNodes();
            }
            double sum = 0;
            double largest = 0;
            double last = 0;
            for (int j = 0; j < Chebyshev.POINTS; j++) {
                highest = Math.max(highest, heights[j]);
                sum = Math.fma(Chebyshev.WEIGHTS[j], heights[j], sum);
                largest = Math.max(largest, Math.abs(coefficients[j]));
                if (j >= Chebyshev.POINTS - 3) {
                    last = Math.max(last, Math.abs(coefficients[j]));
                }
            }
            mass = Math.max(0.5 * (high - low) * sum, 0);
            double atLow = all[from + Chebyshev.POINTS];
            double atHigh = all[from + Chebyshev.POINTS + 1];
            double miss = Math.max(
                    Math.abs(at(point(Chebyshev.POINTS)) - atLow), Math.abs(at(point(Chebyshev.POINTS + 1)) - atHigh));
            highest = Math.max(highest, Math.max(atLow, atHigh));
            rough = Math.max(last, LAST_NODE * miss) / Math.max(largest, Double.MIN_NORMAL);
            if (high - low <= 4 * ulp()) {
                flatten();
            }
        }

        /// From the heights at the numbers next to the nodes, which lie up to half an `ulp` beside them.
        private void moveToNodes() {
            var seen = heights.clone();
            double half = 0.5 * (high - low);
            for (int round = 0; round < 2; round++) {
                for (int j = 0; j < Chebyshev.POINTS; j++) {
                    double beside = from(node(j), j) / half;
                    heights[j] = Math.fma(Chebyshev.slope(coefficients, Chebyshev.NODES[j]), beside, seen[j]);
                }
                coefficients = Chebyshev.coefficients(heights);
            }
        }

        private double at(double x) {
            return Chebyshev.at(coefficients, Math.clamp(((x - low) - (high - x)) / (high - low), -1, 1));
        }

        private double ulp() {
            return Math.ulp(Math.max(Math.abs(low), Math.abs(high)));
        }

        /// How far a node lies above x, more exactly than numbers near the node are.
        double from(double x, int j) {
            double t = Chebyshev.NODES[j];
            double half = 0.5 * (high - low);
            return t < 0 ? Math.fma(half, 1 + t, low - x) : Math.fma(-half, 1 - t, high - x);
        }

        private void flatten() {
            settled = true;
            coefficients = new double[] {mass / (high - low)};
        }

        boolean isEmpty() {
            return mass == 0 && highest == 0;
        }

        double middle() {
            return low + 0.5 * (high - low);
        }

        /// @param total mass of all cells
        /// @param origin where the piece takes its places from
        Piece piece(double total, double origin) {
            if (flank != null) {
                return new Flank(
                        flank.anchor() - origin, flank.side(), flank.edge(), flank.exponent(), flank.mass() / total);
            }
            var scaled = coefficients.clone();
            for (int k = 0; k < scaled.length; k++) {
                scaled[k] /= total;
            }
            return Smooth.of(low - origin, high - origin, scaled);
        }
    }

    private final Relief relief;
    private final double top;
    private List<Cell> cells = new ArrayList<>();

    private Refinement(Relief relief, Landscape landscape) {
        this.relief = relief;
        this.top = landscape.top();
        Double before = null;
        for (double edge : landscape.edges()) {
            if (before != null) {
                var flank = landscape.flanks().get(before);
                cells.add(new Cell(before, edge, flank != null && flank.high() == edge ? flank : null));
            }
            before = edge;
        }
    }

    /// The cells in order, each next to the other.
    static List<Cell> of(Relief relief, Landscape landscape) {
        var refinement = new Refinement(relief, landscape);
        refinement.evaluate(
                refinement.cells.stream().filter(c -> c.flank == null).toList());
        for (int pass = 0; pass < PASSES && refinement.halve(); pass++) {}
        refinement.refusePoles();
        return refinement.cells;
    }

    private void evaluate(List<Cell> some) {
        var x = new double[some.size() * POINTS];
        for (int i = 0; i < x.length; i++) {
            x[i] = some.get(i / POINTS).point(i % POINTS);
        }
        double[] all = relief.relative(x, top);
        for (int i = 0; i < some.size(); i++) {
            some.get(i).take(all, i * POINTS);
        }
    }

    /// Whether any cell was halved.
    private boolean halve() {
        int n = cells.size();
        var above = new double[n + 1];
        for (int i = n - 1; i >= 0; i--) {
            above[i] = above[i + 1] + cells.get(i).mass;
        }
        double total = above[0];
        double below = 0;
        var next = new ArrayList<Cell>(n);
        var halves = new ArrayList<Cell>();
        for (int i = 0; i < n; i++) {
            var cell = cells.get(i);
            double tail = Math.max(Math.min(below, above[i + 1]), LEAST * total);
            if (isFine(cell, tail, total)) {
                next.add(cell);
            } else {
                halves.add(new Cell(cell.low, cell.middle(), null));
                halves.add(new Cell(cell.middle(), cell.high, null));
                next.addAll(halves.subList(halves.size() - 2, halves.size()));
                halves.get(halves.size() - 2).rough = cell.rough;
            }
            below += cell.mass;
        }
        if (halves.isEmpty()) {
            return false;
        }
        if (next.size() > MOST) {
            throw new Refusal(relief.rough(halves.getFirst().low));
        }
        var before = new double[halves.size() / 2];
        for (int i = 0; i < before.length; i++) {
            before[i] = halves.get(2 * i).rough;
        }
        evaluate(halves);
        for (int i = 0; i < before.length; i++) {
            var left = halves.get(2 * i);
            var right = halves.get(2 * i + 1);
            if (before[i] < NOISE && left.rough > 0.1 * before[i] && right.rough > 0.1 * before[i]) {
                left.rough = 0;
                right.rough = 0;
            }
        }
        cells = next;
        return true;
    }

    private boolean isFine(Cell cell, double tail, double total) {
        if (cell.settled || cell.isEmpty()) {
            return true;
        }
        double noise = ROUNDING * (16 + Math.abs(relief.level(relief.log() ? 0 : cell.highest)));
        double error = cell.rough * cell.highest * (cell.high - cell.low);
        return cell.mass <= STEEPEST * tail && (error <= Math.max(ERROR * tail, UNSEEN * total) || cell.rough <= noise)
                || cell.highest * (cell.high - cell.low) <= ERROR * LEAST;
    }

    /// A cell as narrow as numbers get that is higher than the cells some way off on both sides.
    private void refusePoles() {
        for (int i = 0; i < cells.size(); i++) {
            var cell = cells.get(i);
            if (cell.flank != null || !cell.settled || cell.isEmpty()) {
                continue;
            }
            double away = 64 * Math.ulp(cell.low);
            double low = cell.low - away;
            double high = cell.high + away;
            if (low > cells.getFirst().low && high < cells.getLast().high) {
                double[] near = relief.relative(new double[] {low, high}, top);
                if (cell.highest > 1.05 * Math.max(near[0], near[1])) {
                    throw new Refusal(relief.pole(shortest(low, high)));
                }
            }
        }
    }

    /// The number with the fewest digits between two.
    private static double shortest(double low, double high) {
        for (int digits = 1; digits < 17; digits++) {
            var x = new BigDecimal(0.5 * (low + high))
                    .round(new MathContext(digits))
                    .doubleValue();
            if (x >= low && x <= high) {
                return x;
            }
        }
        return 0.5 * (low + high);
    }
}
