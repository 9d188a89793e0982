package dev.leadline.density;

import dev.leadline.problem.Refusal;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.Comparator;
import java.util.TreeMap;
import java.util.TreeSet;
import java.util.function.IntPredicate;
import java.util.stream.DoubleStream;
import java.util.stream.IntStream;

/// Where a density is high, and a first grid that is fine there: edges at distances of powers of 2 from every mark,
/// probe and peak, and a power law next to the marks and at infinity.
///
/// Peaks are found by looking at points near every mark and probe, at distances of all orders of magnitude, and at
/// evenly spaced ones, and by climbing from the highest. A peak that is 0 at all of these points stays unseen.
final class Landscape {
    private static final int PEAKS = 24;
    private static final int EVEN = 1000;
    private static final int CLIMBS = 20;
    private static final int STEPS = 16;

    /// Octaves of a distance from a mark that is not 0: nearer, `x` has too few digits to tell the height.
    private static final int DIGITS = 28;

    /// Mass that is negligible, as a power of 2: about `1e-290` of all.
    private static final int NEGLIGIBLE = 965;

    /// Mass that may stand behind a place where the formula fails: about `1e-20`.
    private static final int UNSEEN = 66;

    /// Heights below this power of 2 have too few digits to tell a slope.
    private static final int SUBNORMAL = -1000;

    /// Where a power of the distance may have become too large for a number, and the height 0.
    private static final int UNDERFLOW = -500;

    /// Exponents of the mass may not come nearer to 0.
    private static final double LEAST_EXPONENT = 0.02;

    private static final int FIRST = -1020;
    private static final int LAST = 1022;

    private final Relief relief;
    private final Support range;
    private final TreeSet<Double> marks = new TreeSet<>();
    private final TreeSet<Double> centres = new TreeSet<>();
    private final TreeSet<Double> edges = new TreeSet<>();
    private final TreeMap<Double, Flank> flanks = new TreeMap<>();

    /// Points looked at, and their heights.
    private double[] points;

    private double[] heights;
    private double top;
    private double greatest = Double.NEGATIVE_INFINITY;

    /// Mass of the flank at an end, and its order there.
    private double lowerOrder = Double.POSITIVE_INFINITY;

    private double upperOrder = Double.POSITIVE_INFINITY;

    /// A side of a centre: heights at distances `2^j`.
    private final class Side {
        final double centre;
        final int side;
        final int first;
        final boolean endless;
        final double[] height;
        final double[] level;

        Side(double centre, int side, double reach) {
            this.centre = centre;
            this.side = side;
            this.endless = reach == Double.POSITIVE_INFINITY;
            int last = endless ? LAST : exponent(reach);
            this.first = Math.min(first(last), last);
            double[] x =
                    IntStream.rangeClosed(first, last).mapToDouble(j -> at(j)).toArray();
            this.height = relief.at(x);
            this.level = new double[x.length];
            for (int i = 0; i < x.length; i++) {
                level[i] = isBad(i) ? Double.NaN : relief.level(height[i]);
                if (!relief.log() && level[i] < SUBNORMAL) {
                    level[i] = Double.NEGATIVE_INFINITY;
                }
            }
        }

        private int first(int last) {
            if (centre == 0) {
                return FIRST;
            }
            int least = exponent(centre) - 50;
            return marks.contains(centre) ? Math.max(least, Math.min(exponent(centre) - DIGITS, last - 12)) : least;
        }

        double at(int j) {
            return centre + side * StrictMath.scalb(1.0, j);
        }

        boolean isBad(int i) {
            return relief.isBad(height[i], top);
        }

        /// Whether the formula gives no number, as `0 * inf`.
        boolean isLost(int i) {
            return Double.isNaN(height[i]) || height[i] == Double.POSITIVE_INFINITY;
        }

        /// As a power of 2, about the mass at this distance; `-∞` or `NaN` where there is none.
        double mass(int i) {
            return level[i] + first + i;
        }

        /// Where the mass is greatest.
        int most() {
            int most = 0;
            for (int i = 1; i < level.length; i++) {
                if (mass(i) > mass(most) || Double.isNaN(mass(most))) {
                    most = i;
                }
            }
            return most;
        }

        boolean isNegligible(int i) {
            return !(mass(i) >= greatest - NEGLIGIBLE);
        }

        /// By how much the logarithm of the height grows from one octave to the next.
        double slope(int i) {
            return level[i + 1] - level[i];
        }

        /// Whether the slope is the same from octave i on as from the next.
        boolean isPower(int i) {
            return Math.abs(slope(i + 1) - slope(i)) <= 1e-14 * (1 + Math.abs(level[i]));
        }
    }

    private Landscape(Relief relief, Support range) {
        this.relief = relief;
        this.range = range;
    }

    static Landscape of(Relief relief, Support range, double[] breaks, double[] probes) {
        var landscape = new Landscape(relief, range);
        landscape.look(breaks, probes);
        landscape.climb();
        landscape.grade();
        return landscape;
    }

    double top() {
        return top;
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

    private static int exponent(double x) {
        return Math.getExponent(x);
    }

    private boolean isInside(double x) {
        return x > range.low() && x < range.high();
    }

    private void look(double[] breaks, double[] probes) {
        for (double end : new double[] {range.low(), range.high()}) {
            if (Double.isFinite(end)) {
                marks.add(end);
            }
        }
        Arrays.stream(breaks).forEach(marks::add);
        centres.addAll(marks);
        Arrays.stream(probes).filter(this::isInside).forEach(centres::add);
        if (isInside(0)) {
            centres.add(0.0);
        }
        points = points();
        heights = relief.at(points);
        top = relief.log() ? Double.NEGATIVE_INFINITY : 0;
        for (double height : heights) {
            if (height < Double.POSITIVE_INFINITY) {
                top = Math.max(top, height);
            }
        }
        if (isZero(top)) {
            refuseBad(_ -> true);
            throw new Refusal(relief.zero());
        }
    }

    /// At distances of all orders of magnitude from the centres, and evenly spaced between them.
    private double[] points() {
        var x = DoubleStream.builder();
        Double before = null;
        for (double centre : centres) {
            x.add(centre);
            boolean outermost = centre == centres.first() || centre == centres.last();
            int first = centre == 0 ? FIRST : exponent(centre) - 50;
            int last = centre == 0 || outermost ? LAST : exponent(centre) + 2;
            for (int j = first; j <= last; j++) {
                int parts = Math.abs(j) <= 64 ? 4 : 1;
                for (int part = 0; part < parts; part++) {
                    double distance = StrictMath.scalb(1 + 0.25 * part, j);
                    x.add(centre - distance);
                    x.add(centre + distance);
                }
            }
            for (int i = 1; before != null && i < EVEN; i++) {
                x.add(before + (centre - before) * (i / (double) EVEN));
            }
            before = centre;
        }
        return x.build()
                .filter(v -> isInside(v) && !marks.contains(v))
                .sorted()
                .distinct()
                .toArray();
    }

    /// The bad point that is shortest to write.
    private void refuseBad(IntPredicate counts) {
        IntStream.range(0, points.length)
                .filter(i -> relief.isBad(heights[i], Math.max(top, 0)) && counts.test(i))
                .boxed()
                .min(Comparator.comparing((Integer i) -> heights[i] == Double.NEGATIVE_INFINITY)
                        .thenComparingInt(i -> Rule.number(points[i]).length()))
                .ifPresent(i -> {
                    throw new Refusal(relief.bad(points[i], heights[i]));
                });
    }

    private boolean isZero(double height) {
        return height == (relief.log() ? Double.NEGATIVE_INFINITY : 0);
    }

    /// From the highest points that are higher than their neighbours, except next to a mark, which is a centre anyway,
    /// and where hardly any mass can stand.
    private void climb() {
        double most = IntStream.range(0, points.length)
                .mapToDouble(this::reach)
                .filter(mass -> !Double.isNaN(mass))
                .max()
                .orElseThrow();
        IntStream.range(1, points.length - 1)
                .filter(i -> reach(i) > most - UNSEEN)
                .filter(i -> !(heights[i - 1] >= heights[i]) && !(heights[i + 1] > heights[i]))
                .filter(i -> marks.subSet(points[i - 1], points[i + 1]).isEmpty())
                .boxed()
                .sorted(Comparator.comparingDouble((Integer i) -> -heights[i]).thenComparingInt(i -> i))
                .limit(PEAKS)
                .toList()
                .forEach(this::climb);
    }

    /// As a power of 2, the mass if the height stayed the same up to the nearest centre; `NaN` where it is bad.
    private double reach(int i) {
        double height = heights[i];
        if (relief.isBad(height, top)) {
            return Double.NaN;
        }
        double distance = Math.min(
                distance(centres.floor(points[i]), points[i]), distance(centres.ceiling(points[i]), points[i]));
        int octave = exponent(distance > 0 && distance < Double.POSITIVE_INFINITY ? distance : points[i]);
        return relief.level(height) + octave;
    }

    private static double distance(Double centre, double x) {
        return centre == null ? Double.POSITIVE_INFINITY : Math.abs(x - centre);
    }

    private void climb(int start) {
        double x = points[start];
        double height = heights[start];
        double from = points[start - 1];
        double to = points[start + 1];
        for (int climb = 0; climb < CLIMBS && to - from > 4 * Math.ulp(x); climb++) {
            var near = new double[STEPS + 1];
            for (int i = 0; i <= STEPS; i++) {
                near[i] = from + (to - from) * (i / (double) STEPS);
            }
            double[] found = relief.at(near);
            double step = (to - from) / STEPS;
            for (int i = 1; i < STEPS; i++) {
                if (found[i] > height && found[i] < Double.POSITIVE_INFINITY) {
                    height = found[i];
                    x = near[i];
                }
            }
            from = Math.max(from, x - step);
            to = Math.min(to, x + step);
        }
        top = Math.max(top, height);
        double distance = Math.min(distance(centres.floor(x), x), distance(centres.ceiling(x), x));
        if (distance > 0x1p-40 * Math.abs(x)) {
            centres.add(x);
        }
    }

    private void grade() {
        var sides = new ArrayList<Side>();
        for (double centre : centres) {
            Double below = centres.lower(centre);
            Double above = centres.higher(centre);
            if (centre > range.low()) {
                sides.add(new Side(centre, -1, below == null ? Double.POSITIVE_INFINITY : 0.5 * (centre - below)));
            }
            if (centre < range.high()) {
                sides.add(new Side(centre, 1, above == null ? Double.POSITIVE_INFINITY : 0.5 * (above - centre)));
            }
        }
        for (Side side : sides) {
            for (int i = 0; i < side.level.length; i++) {
                if (side.mass(i) > greatest) {
                    greatest = side.mass(i);
                }
            }
        }
        edges.addAll(centres);
        for (Side side : sides) {
            int to = side.endless ? towardsInfinity(side) : side.level.length - 1;
            int from = marks.contains(side.centre) ? nearMark(side) : nearPeak(side);
            for (int i = from; i <= to; i++) {
                edges.add(side.at(side.first + i));
            }
        }
        refuseBad(this::isGraded);
    }

    private boolean isGraded(int i) {
        double x = points[i];
        var flank = flanks.floorEntry(x);
        boolean lost = Double.isNaN(heights[i]) || heights[i] == Double.POSITIVE_INFINITY;
        return !lost
                || x >= edges.first()
                        && x <= edges.last()
                        && (flank == null || x >= flank.getValue().high());
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
        int n = side.level.length;
        int from = side.most();
        if (side.isBad(from)) {
            throw new Refusal(relief.bad(side.at(side.first + from), side.height[from]));
        }
        while (from > 0 && !side.isBad(from - 1) && !side.isNegligible(from - 1)) {
            from--;
        }
        if (from > 0 && side.isBad(from - 1)) {
            if (side.height[from - 1] == Double.POSITIVE_INFINITY) {
                refuseHeavy(side, 1 + slope(side, from));
            }
            refuseUnlessUnseen(side, from, from - 1);
        }
        boolean hole = from > 0
                && side.level[from - 1] == Double.NEGATIVE_INFINITY
                && side.mass(from) > greatest - NEGLIGIBLE + 2 * UNSEEN;
        if (hole || side.isNegligible(from)) {
            return Math.max(leaveLost(side, from), from - 1);
        }
        while (from + 3 < n && side.isPower(from) && side.isPower(from + 1)) {
            from++;
        }
        double slope = slope(side, from);
        refuseHeavy(side, 1 + slope);
        put(side, from, snapped(1 + slope));
        return from;
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
                    Math.min(side.centre, side.at(side.first + first)),
                    new Flank(side.centre, side.side, StrictMath.scalb(1.0, side.first + first), 1, 0));
            edges.add(side.at(side.first + first));
        }
        return first;
    }

    private void refuseUnlessUnseen(Side side, int good, int bad) {
        if (side.mass(good) > greatest - UNSEEN) {
            throw new Refusal(relief.bad(side.at(side.first + bad), side.height[bad]));
        }
    }

    /// The index of the last edge; what is farther is a flank, if there is any mass.
    private int towardsInfinity(Side side) {
        int n = side.level.length;
        int last = 0;
        for (int i = 0; i < n && (i == 0 || !failsAfterZero(side, i)); i++) {
            if (!side.isBad(i) && !side.isNegligible(i)) {
                last = i;
            }
        }
        if (side.isNegligible(last)) {
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

    /// The slope at octave i, freed from its change in proportion to the distance where enough octaves are known.
    private static double slope(Side side, int i) {
        if (i + 6 < side.level.length) {
            double near = (side.level[i + 3] - side.level[i]) / 3;
            double far = (side.level[i + 6] - side.level[i + 3]) / 3;
            double freed = near - (far - near) / 7;
            if (Double.isFinite(freed)) {
                return freed;
            }
        }
        return i + 1 < side.level.length ? side.slope(i) : 0;
    }

    /// Exponents are usually simple fractions.
    private static double snapped(double exponent) {
        double simple = Math.rint(exponent * 60) / 60;
        return Math.abs(exponent - simple) <= 1e-10 ? simple : exponent;
    }

    private void put(Side side, int i, double exponent) {
        double distance = StrictMath.scalb(1.0, side.first + i);
        double height = relief.relative(new double[] {side.at(side.first + i)}, top)[0];
        var flank = new Flank(side.centre, side.side, distance, exponent, height * distance / Math.abs(exponent));
        if (Double.isInfinite(flank.low()) || Double.isInfinite(flank.high())) {
            edges.add(flank.low());
            edges.add(flank.high());
        }
        flanks.put(flank.low(), flank);
    }
}
