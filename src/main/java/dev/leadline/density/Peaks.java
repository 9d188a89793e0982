package dev.leadline.density;

import dev.leadline.numeric.Shortest;
import dev.leadline.problem.Refusal;
import java.util.Arrays;
import java.util.Comparator;
import java.util.TreeSet;
import java.util.function.IntPredicate;
import java.util.stream.DoubleStream;
import java.util.stream.IntStream;

/// Where a density is high: the marks, which are finite ends and breaks, the probes, and the peaks that are found.
///
/// Peaks are found by looking at points near every mark and probe, at distances of all orders of magnitude, and at
/// evenly spaced ones, and by climbing from the highest. A peak that is 0 at all of these points stays unseen.
final class Peaks {
    private static final int PEAKS = 24;
    private static final int EVEN = 1000;
    private static final int CLIMBS = 20;
    private static final int STEPS = 16;

    /// Mass that may stand behind a place where the formula fails, as a power of 2: about `1e-20`.
    static final int UNSEEN = 66;

    private final Relief relief;
    private final Support range;
    private final TreeSet<Double> marks = new TreeSet<>();
    private final TreeSet<Double> centres = new TreeSet<>();

    /// Points looked at, and their heights.
    private double[] points;

    private double[] heights;
    private double top;

    private Peaks(Relief relief, Support range) {
        this.relief = relief;
        this.range = range;
    }

    static Peaks of(Relief relief, Support range, double[] breaks, double[] probes) {
        var peaks = new Peaks(relief, range);
        peaks.look(breaks, probes);
        peaks.climb();
        return peaks;
    }

    /// The greatest height seen.
    double top() {
        return top;
    }

    boolean isMark(double centre) {
        return marks.contains(centre);
    }

    /// Marks, probes and peaks, rising.
    TreeSet<Double> centres() {
        return centres;
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
            int first = centre == 0 ? Side.FIRST : Math.getExponent(centre) - 50;
            int last = centre == 0 || outermost ? Side.LAST : Math.getExponent(centre) + 2;
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
    void refuseBad(IntPredicate counts) {
        IntStream.range(0, points.length)
                .filter(i -> relief.isBad(heights[i], Math.max(top, 0)) && counts.test(i))
                .boxed()
                .min(Comparator.comparing((Integer i) -> heights[i] == Double.NEGATIVE_INFINITY)
                        .thenComparingInt(i -> Shortest.text(points[i]).length()))
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
        int octave = Math.getExponent(distance > 0 && distance < Double.POSITIVE_INFINITY ? distance : points[i]);
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

    double point(int i) {
        return points[i];
    }

    /// Whether the formula gives no number at a point, as `0 * inf`.
    boolean isLost(int i) {
        return Double.isNaN(heights[i]) || heights[i] == Double.POSITIVE_INFINITY;
    }
}
