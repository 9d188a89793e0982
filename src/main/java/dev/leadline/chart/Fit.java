package dev.leadline.chart;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.stream.DoubleStream;

/// The ranges of a picture that follows the run.
///
/// **Draws**: on a logarithmic axis the last four decades, on a linear one everything from 0.
///
/// **Values**: all limits and estimates that each lane has shown since it had one twenty-fifth of its draws. There an
/// interval is about five times its present length, so the latest one takes about a fifth of the height whatever the
/// first ones were: wild early intervals leave the picture above and below instead of flattening it, while a jump of
/// the estimate in the later part always stays in sight. The strip is taken in where that no more than doubles the
/// height, and
/// so is the reference value; one that is farther away is named at the edge instead ([Picture]).
/// The range is then widened to half steps of the axis, so that it does not tremble with every new mark.
final class Fit {
    private static final double LATER_PART = 1.0 / 25;
    private static final double DECADES = 1e4;

    /// Ends of a value axis beyond which a length would overflow.
    private static final double MOST = 1e307;

    private Fit() {}

    static Range draws(Settling settling, boolean log) {
        var last = settling.lanes().stream()
                .flatMap(lane -> lane.last().stream())
                .mapToLong(Point::draws)
                .max();
        var first = settling.lanes().stream()
                .filter(lane -> !lane.points().isEmpty())
                .mapToLong(lane -> lane.points().getFirst().draws())
                .min();
        if (last.isEmpty()) {
            return log ? new Range(1, 1000) : new Range(0, 1000);
        }
        double to = Math.max(1, last.getAsLong());
        if (!log) {
            return new Range(0, to * 1.03);
        }
        double from = Math.max(Math.max(1, first.getAsLong()), to / DECADES);
        return from < to ? new Range(from, to * Math.pow(to / from, .03)) : new Range(to / 2, to * 2);
    }

    static Range values(Settling settling) {
        var seen = hull(settling.lanes().stream().flatMapToDouble(Fit::laterPart));
        var reference = settling.reference().map(r -> List.of(r.value() - r.error(), r.value() + r.error()));
        if (seen.isEmpty()) {
            return reference
                    .flatMap(r -> hull(r.stream().mapToDouble(v -> v)))
                    .map(Fit::roomy)
                    .orElse(new Range(0, 1));
        }
        var range = seen.get();
        for (var more : wishes(settling, reference)) {
            double low = Math.min(range.low(), more.low());
            double high = Math.max(range.high(), more.high());
            if (high - low <= 2 * seen.get().length()) {
                range = new Range(low, high);
            }
        }
        return roomy(range);
    }

    private static List<Range> wishes(Settling settling, Optional<List<Double>> reference) {
        var wishes = new ArrayList<Range>();
        settling.strip().ifPresent(wishes::add);
        reference.flatMap(r -> hull(r.stream().mapToDouble(v -> v))).ifPresent(wishes::add);
        return wishes;
    }

    private static DoubleStream laterPart(Series lane) {
        double since = lane.last().map(point -> point.draws() * LATER_PART).orElse(0.0);
        return lane.points().stream()
                .filter(point -> point.draws() >= since)
                .flatMapToDouble(point -> DoubleStream.of(point.estimate(), point.low(), point.high()))
                .filter(Double::isFinite);
    }

    /// From the least to the greatest of the finite values; about a single value, a range in proportion to it.
    private static Optional<Range> hull(DoubleStream values) {
        var all = values.filter(Double::isFinite)
                .map(v -> Math.clamp(v, -MOST, MOST))
                .summaryStatistics();
        if (all.getCount() == 0) {
            return Optional.empty();
        }
        double least = 1e-9 * Math.max(Math.abs(all.getMin()), Math.abs(all.getMax()));
        if (all.getMax() - all.getMin() > least) {
            return Optional.of(new Range(all.getMin(), all.getMax()));
        }
        double around = all.getMin() == 0 ? 1 : Math.max(Math.abs(all.getMin()) * .1, Double.MIN_NORMAL);
        return Optional.of(new Range(all.getMin() - around, all.getMax() + around));
    }

    private static Range roomy(Range range) {
        double step = halfStep(range.length() * 1.06);
        double low = step * Math.floor((range.low() - .03 * range.length()) / step);
        double high = step * Math.ceil((range.high() + .03 * range.length()) / step);
        return low < high && Double.isFinite(high - low) ? new Range(low, high) : range;
    }

    /// Half of the distance between labels that a picture of ordinary height would have.
    private static double halfStep(double length) {
        double power = Math.pow(10, Math.floor(Math.log10(length)));
        double lead = length / power;
        return power * (lead < 2 ? .1 : lead < 5 ? .25 : .5);
    }
}
