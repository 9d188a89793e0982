package dev.leadline.chart;

import dev.leadline.reference.ReferenceValue.Known;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.stream.DoubleStream;

/// The ranges of a picture that follows the run.
///
/// **Draws**: on a logarithmic axis the last four decades, on a linear one everything from 0.
///
/// **Values**: all limits and estimates of each lane's later part, which is the stretch of marks up to the latest
/// in which the interval was at most five times as long as it is now. So the latest interval takes about a fifth of
/// the height, whatever the first ones were and however fast the scheme settles: wild early intervals leave the
/// picture above and below instead of flattening it, while a jump of the estimate in the later part stays in sight.
/// The strip of the tolerance, the latest any-time band and the reference value are taken in where that does not more
/// than double the height;
/// a reference value farther away is named in the key instead. The range is then widened to half steps of the axis,
/// so that it does not tremble with every new mark, but not far below 0 where nothing is negative.
final class Framing {
    private static final double LONGER = 5;
    private static final double DECADES = 1e4;

    /// Ends of a value axis beyond which a length would overflow.
    private static final double MOST = 1e307;

    /// A length below which nothing can be told apart.
    static final double LEAST = 1e-300;

    private Framing() {}

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
        return from < to ? new Range(from, to * StrictMath.pow(to / from, .03)) : new Range(to / 2, to * 2);
    }

    static Range values(Settling settling) {
        var seen = hull(settling.lanes().stream().flatMapToDouble(Framing::laterPart));
        if (seen.isEmpty()) {
            return settling.reference()
                    .flatMap(Framing::about)
                    .map(Framing::roomy)
                    .orElse(new Range(0, 1));
        }
        var reference = settling.reference().map(r -> List.of(r.value() - r.error(), r.value() + r.error()));
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

    /// Before the first draw: a tenth of the reference value to each side, or more, so that its error is a strip in the
    /// picture and does not fill it.
    private static Optional<Range> about(Known reference) {
        double around = Math.max(.1 * Math.abs(reference.value()), 5 * reference.error());
        return hull(DoubleStream.of(reference.value() - around, reference.value() + around));
    }

    /// As far out as a person may zoom or pan: ten times the stretch that holds everything a lane ever showed.
    static Range outermost(Settling settling) {
        var all = hull(settling.lanes().stream()
                        .flatMap(lane -> lane.points().stream())
                        .flatMapToDouble(Framing::valuesOf))
                .map(values(settling)::with)
                .orElseGet(() -> values(settling));
        double more = Math.min(4.5 * all.length(), MOST);
        return new Range(all.low() - more, all.high() + more);
    }

    private static List<Range> wishes(Settling settling, Optional<List<Double>> reference) {
        var wishes = new ArrayList<Range>();
        settling.strip().ifPresent(wishes::add);
        hull(settling.lanes().stream()
                        .flatMap(lane -> lane.last().stream())
                        .flatMapToDouble(point -> DoubleStream.of(point.bandLow(), point.bandHigh())))
                .filter(_ -> settling.lanes().stream().anyMatch(Series::banded))
                .ifPresent(wishes::add);
        reference.flatMap(r -> hull(r.stream().mapToDouble(v -> v))).ifPresent(wishes::add);
        return wishes;
    }

    private static DoubleStream laterPart(Series lane) {
        var points = lane.points();
        return points.subList(start(points), points.size()).stream().flatMapToDouble(Framing::valuesOf);
    }

    private static DoubleStream valuesOf(Point point) {
        return DoubleStream.of(point.estimate(), point.low(), point.high());
    }

    /// Index of the first mark of the later part; 0 where no interval can be told from the others by its length.
    private static int start(List<Point> points) {
        double latest = Double.NaN;
        for (int i = points.size() - 1; i >= 0; i--) {
            double length = points.get(i).high() - points.get(i).low();
            if (Double.isNaN(latest) && Double.isFinite(length)) {
                latest = length;
            }
            if (latest > 0 && length > LONGER * latest) {
                return i + 1;
            }
        }
        return 0;
    }

    /// From the least to the greatest of the finite values; about a single value, a range in proportion to it.
    private static Optional<Range> hull(DoubleStream values) {
        var all = values.filter(Double::isFinite)
                .map(v -> Math.clamp(v, -MOST, MOST))
                .summaryStatistics();
        if (all.getCount() == 0) {
            return Optional.empty();
        }
        double least = Math.max(LEAST, 1e-9 * Math.max(Math.abs(all.getMin()), Math.abs(all.getMax())));
        if (all.getMax() - all.getMin() > least) {
            return Optional.of(new Range(all.getMin(), all.getMax()));
        }
        double around = all.getMin() == 0 ? 1 : Math.max(Math.abs(all.getMin()) * .1, LEAST);
        return Optional.of(new Range(all.getMin() - around, all.getMax() + around));
    }

    private static Range roomy(Range range) {
        double step = halfStep(range.length() * 1.06);
        double low = step * Math.floor((range.low() - .03 * range.length()) / step);
        double high = step * Math.ceil((range.high() + .03 * range.length()) / step);
        if (range.low() >= 0 && low < 0) {
            low = -.03 * high;
        }
        return low < high && Double.isFinite(high - low) ? new Range(low, high) : range;
    }

    /// Half of the distance between labels that a picture of ordinary height would have.
    private static double halfStep(double length) {
        double power = StrictMath.pow(10, Math.floor(StrictMath.log10(length)));
        double lead = length / power;
        return power * (lead < 2 ? .1 : lead < 5 ? .25 : .5);
    }
}
