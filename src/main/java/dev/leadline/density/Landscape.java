package dev.leadline.density;

import dev.leadline.problem.Refusal;
import java.util.ArrayList;
import java.util.List;
import java.util.TreeMap;
import java.util.TreeSet;

/// A first grid that is fine where a density is high: edges at distances of powers of 2 from every mark, probe and
/// peak, and a power law next to the marks and at infinity.
final class Landscape {
    /// Mass that is negligible, as a power of 2: about `1e-290` of all.
    private static final int NEGLIGIBLE = 965;

    /// Where a power of the distance may have become too large for a number, and the height 0.
    private static final int UNDERFLOW = -500;

    /// A logarithm that bends by more than this between octaves next to a mark is that of no power.
    private static final double CURVED = 0x1p-4;

    /// Exponents of the mass may not come nearer to 0.
    private static final double LEAST_EXPONENT = 0.02;

    private final Relief relief;
    private final Support range;
    private final Peaks peaks;
    private final TreeSet<Double> edges = new TreeSet<>();
    private final TreeMap<Double, Flank> flanks = new TreeMap<>();
    private double greatest = Double.NEGATIVE_INFINITY;

    /// Mass of the flank at an end, and its order there.
    private double lowerOrder = Double.POSITIVE_INFINITY;

    private double upperOrder = Double.POSITIVE_INFINITY;

    private Landscape(Relief relief, Support range, Peaks peaks) {
        this.relief = relief;
        this.range = range;
        this.peaks = peaks;
    }

    static Landscape of(Relief relief, Support range, double[] breaks, double[] probes) {
        var landscape = new Landscape(relief, range, Peaks.of(relief, range, breaks, probes));
        landscape.grade();
        return landscape;
    }

    double top() {
        return peaks.top();
    }

    TreeSet<Double> edges() {
        return edges;
    }

    /// By lower end.
    TreeMap<Double, Flank> flanks() {
        return flanks;
    }

    TailOrders orders() {
        return new TailOrders(lowerOrder, upperOrder);
    }

    private List<Side> sides() {
        var sides = new ArrayList<Side>();
        var centres = peaks.centres();
        for (double centre : centres) {
            boolean mark = peaks.isMark(centre);
            Double below = centres.lower(centre);
            Double above = centres.higher(centre);
            if (centre > range.low()) {
                double reach = below == null ? Double.POSITIVE_INFINITY : 0.5 * (centre - below);
                sides.add(new Side(relief, top(), centre, -1, mark, reach));
            }
            if (centre < range.high()) {
                double reach = above == null ? Double.POSITIVE_INFINITY : 0.5 * (above - centre);
                sides.add(new Side(relief, top(), centre, 1, mark, reach));
            }
        }
        return sides;
    }

    private void grade() {
        var sides = sides();
        for (Side side : sides) {
            for (int i = 0; i < side.size(); i++) {
                if (side.mass(i) > greatest) {
                    greatest = side.mass(i);
                }
            }
        }
        edges.addAll(peaks.centres());
        for (Side side : sides) {
            int to = side.endless ? towardsInfinity(side) : side.size() - 1;
            int from = peaks.isMark(side.centre) ? nearMark(side) : nearPeak(side);
            for (int i = from; i <= to; i++) {
                edges.add(side.x(i));
            }
        }
        peaks.refuseBad(this::isGraded);
    }

    private boolean isGraded(int i) {
        double x = peaks.point(i);
        var flank = flanks.floorEntry(x);
        return !peaks.isLost(i)
                || x >= edges.first()
                        && x <= edges.last()
                        && (flank == null || x >= flank.getValue().high());
    }

    private boolean isNegligible(Side side, int i) {
        return side.isNegligible(i, greatest - NEGLIGIBLE);
    }

    /// Nearer than this the height hardly changes.
    private int nearPeak(Side side) {
        double height = relief.at(side.centre);
        for (int i = 0; i < side.height.length; i++) {
            double change = relief.log() ? side.height[i] - height : (side.height[i] - height) / height;
            if (!(Math.abs(change) < 0.05)) {
                return Math.max(i - 1, 0);
            }
        }
        return side.height.length - 1;
    }

    /// The index of the first edge; what is nearer to the mark is a flank, if there is any mass.
    private int nearMark(Side side) {
        int from = side.most();
        if (side.isBad(from)) {
            throw new Refusal(relief.bad(side.x(from), side.height[from]));
        }
        while (from > 0 && !side.isBad(from - 1) && !isNegligible(side, from - 1)) {
            from--;
        }
        if (from > side.trusted && side.isBad(from - 1)) {
            if (side.height[from - 1] == Double.POSITIVE_INFINITY) {
                refuseHeavy(side, 1 + side.freedSlope(from));
            }
            refuseUnlessUnseen(side, from, from - 1);
        }
        boolean hole = from > 0
                && side.level[from - 1] == Double.NEGATIVE_INFINITY
                && side.mass(from) > greatest - NEGLIGIBLE + 2 * Peaks.UNSEEN;
        if (hole || isNegligible(side, from)) {
            return Math.max(leaveLost(side, from), from - 1);
        }
        if (from == 0 && side.size() > 4 && bendsGently(side)) {
            return 0;
        }
        from = straightest(side, from);
        while (from + 3 < side.size() && side.isPower(from) && side.isPower(from + 1)) {
            from++;
        }
        double slope = side.freedSlope(from);
        refuseHeavy(side, 1 + slope);
        put(side, from, snapped(1 + slope));
        return from;
    }

    /// Whether the height is one all the way to the mark that pieces can follow, and no power of the distance.
    private boolean bendsGently(Side side) {
        double there = relief.at(side.centre);
        if (side.centre == 0 || relief.isBad(there, top()) || relief.level(there) == Double.NEGATIVE_INFINITY) {
            return false;
        }
        boolean tendsToOne = snapped(1 + side.freedSlope(0)) == 1;
        return tendsToOne && !side.isPower(0) || side.bend(0) > CURVED;
    }

    /// Of the octaves that only some formulas can tell the height in, the one up to which the mass is a power best: as
    /// near to the mark as the formula has digits.
    private static int straightest(Side side, int from) {
        int best = from;
        for (int i = from + 1; i <= side.trusted && i + 4 < side.size() && !side.isBad(i + 4); i++) {
            if (side.miss(i) < side.miss(best)) {
                best = i;
            }
        }
        return best;
    }

    private void refuseHeavy(Side side, double exponent) {
        if (!(exponent >= LEAST_EXPONENT)) {
            throw new Refusal(relief.noMassNear(side.centre, exponent));
        }
    }

    /// Where the formula gives 0 and, nearer to the mark, no number at all, there is no mass.
    ///
    /// @return the index of the first number; 0 where all are
    private int leaveLost(Side side, int from) {
        int first = from;
        while (first > 0 && !side.isLost(first - 1)) {
            first--;
        }
        if (first > 0) {
            flanks.put(
                    Math.min(side.centre, side.x(first)),
                    new Flank(side.centre, side.side, side.distance(first), 1, 0));
            edges.add(side.x(first));
        }
        return first;
    }

    private void refuseUnlessUnseen(Side side, int good, int bad) {
        if (side.mass(good) > greatest - Peaks.UNSEEN) {
            throw new Refusal(relief.bad(side.x(bad), side.height[bad]));
        }
    }

    /// The index of the last edge; what is farther is a flank, if there is any mass.
    private int towardsInfinity(Side side) {
        int n = side.size();
        int last = 0;
        for (int i = 0; i < n && (i == 0 || !failsAfterZero(side, i)); i++) {
            if (!side.isBad(i) && !isNegligible(side, i)) {
                last = i;
            }
        }
        if (isNegligible(side, last)) {
            return last;
        }
        boolean power = last > 8 && side.isPower(last - 4) && side.isPower(last - 5);
        boolean steepens = last > 11 && side.slope(last - 3) < side.slope(last - 11) - 1e-9;
        boolean overflows = side.level[last] < UNDERFLOW && !steepens;
        if (last + 1 < n && !overflows) {
            if (!side.isBad(last + 1)) {
                return last + 1;
            }
            if (side.height[n - 1] == Double.POSITIVE_INFINITY) {
                throw new Refusal(relief.noMassTowards(side.side, 1 + side.slope(last - 1)));
            }
            refuseUnlessUnseen(side, last, last + 1);
        }
        int edge = overflows ? last - 2 : last;
        while (power && edge > 3 && side.isPower(edge - 2) && side.isPower(edge - 3)) {
            edge--;
        }
        double slope = edge > 0 ? side.slope(edge - 1) : 0;
        double exponent = snapped(1 + slope);
        if (!(exponent <= -LEAST_EXPONENT)) {
            throw new Refusal(relief.noMassTowards(side.side, 1 + slope));
        }
        if (!steepens) {
            double order = power ? -exponent : limit(-exponent);
            if (side.side < 0) {
                lowerOrder = order;
            } else {
                upperOrder = order;
            }
        }
        put(side, edge, exponent);
        return edge;
    }

    /// The order that one which changes slowly, as by a logarithm, may tend to.
    private static double limit(double order) {
        double whole = Math.rint(order);
        return Math.abs(order - whole) < 0.05 ? whole : order;
    }

    /// Whether the formula gives no number behind places where it gave 0.
    private static boolean failsAfterZero(Side side, int i) {
        return side.isLost(i) && side.level[i - 1] == Double.NEGATIVE_INFINITY;
    }

    /// Exponents are usually simple fractions.
    private static double snapped(double exponent) {
        double simple = Math.rint(exponent * 60) / 60;
        return Math.abs(exponent - simple) <= 1e-10 ? simple : exponent;
    }

    private void put(Side side, int i, double exponent) {
        double distance = side.distance(i);
        double height = relief.relative(new double[] {side.x(i)}, top())[0];
        var flank = new Flank(side.centre, side.side, distance, exponent, height * distance / Math.abs(exponent));
        if (Double.isInfinite(flank.low()) || Double.isInfinite(flank.high())) {
            edges.add(flank.low());
            edges.add(flank.high());
        }
        flanks.put(flank.low(), flank);
    }
}
