package dev.leadline.chart;

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
public record Series(String lane, String scheme, List<Point> points, OptionalLong hits, long nonFinite) {
    public Series {
        points = List.copyOf(points);
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
                            it.interval().high());
                })
                .toList();
        Optional<Answer> latest = trace.last().map(mark -> mark.answers().get(answer));
        return new Series(
                trace.lane(),
                trace.scheme().inWords(),
                points,
                latest.map(Answer::hits).orElse(OptionalLong.empty()),
                latest.map(Answer::nonFinite).orElse(0L));
    }

    public Optional<Point> last() {
        return points.isEmpty() ? Optional.empty() : Optional.of(points.getLast());
    }

    /// Whether draws were made and none was a hit: the upper limit alone is known.
    public boolean withoutHit() {
        return !points.isEmpty() && hits.isPresent() && hits.getAsLong() == 0;
    }
}
