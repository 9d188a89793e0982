package dev.leadline.chart;

import dev.leadline.interval.Interval;
import dev.leadline.trace.Answer;
import dev.leadline.trace.Trace;
import java.util.List;
import java.util.Optional;
import java.util.OptionalLong;

/// One answer of one lane, as a picture needs it.
///
/// @param lane its name
/// @param scheme in words
/// @param points by growing number of draws
/// @param hits seen so far, for probabilities under unweighted draws
/// @param nonFinite evaluations left out so far
/// @param provisional whether the latest value, or a limit of it, is known to lie between two outcomes only
public record Series(
        String lane, String scheme, List<Point> points, OptionalLong hits, long nonFinite, boolean provisional) {
    public Series {
        points = List.copyOf(points);
    }

    /// Of values that are found.
    public Series(String lane, String scheme, List<Point> points, OptionalLong hits, long nonFinite) {
        this(lane, scheme, points, hits, nonFinite, false);
    }

    /// @param answer index among the things asked
    public static Series of(Trace trace, int answer) {
        var points = trace.marks().stream()
                .map(mark -> {
                    var it = mark.answers().get(answer);
                    return new Point(
                            mark.draws(),
                            it.estimate(),
                            it.interval().low(),
                            it.interval().high(),
                            it.band().map(Interval::low).orElse(Double.NaN),
                            it.band().map(Interval::high).orElse(Double.NaN));
                })
                .toList();
        Optional<Answer> latest = trace.last().map(mark -> mark.answers().get(answer));
        return new Series(
                trace.lane(),
                trace.scheme().inWords(),
                points,
                latest.map(Answer::hits).orElse(OptionalLong.empty()),
                latest.map(Answer::nonFinite).orElse(0L),
                latest.map(Answer::provisional).orElse(false));
    }

    public Optional<Point> last() {
        return points.isEmpty() ? Optional.empty() : Optional.of(points.getLast());
    }

    /// Whether an any-time band is kept.
    public boolean banded() {
        return points.stream().anyMatch(point -> Double.isFinite(point.bandHigh() - point.bandLow()));
    }

    /// Whether draws were made and none was a hit: the upper limit alone is known.
    public boolean withoutHit() {
        return !points.isEmpty() && hits.isPresent() && hits.getAsLong() == 0;
    }
}
