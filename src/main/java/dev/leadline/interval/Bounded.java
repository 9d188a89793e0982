package dev.leadline.interval;

import dev.leadline.estimate.Accumulator;
import dev.leadline.numeric.Shortest;
import java.util.Optional;

/// What the kinds for observations within known bounds share.
final class Bounded {
    private Bounded() {}

    /// Why there is no interval; empty where there is one.
    ///
    /// @param needed fewest observations
    static Optional<String> refusal(Accumulator sums, int k, int needed, double least, double most) {
        if (!(least < most && Double.isFinite(most - least))) {
            throw new IllegalArgumentException("bounds " + least + " and " + most);
        }
        if (sums.count() < needed) {
            return Optional.of("an interval needs at least %d %s; so far there %s %d"
                    .formatted(
                            needed,
                            needed == 1 ? "observation" : "observations",
                            sums.count() == 1 ? "is" : "are",
                            sums.count()));
        }
        double outside = sums.min(k) < least ? sums.min(k) : sums.max(k);
        return outside < least || outside > most
                ? Optional.of("the value %s was seen, outside the bounds %s and %s: state bounds that hold"
                        .formatted(Shortest.text(outside), Shortest.text(least), Shortest.text(most)))
                : Optional.empty();
    }

    static Interval interval(
            double mean, double half, double least, double most, double level, String kind, String assumption) {
        return new Interval(mean - half, mean + half, level, kind, assumption, Optional.empty()).within(least, most);
    }
}
