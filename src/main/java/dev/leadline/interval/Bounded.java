package dev.leadline.interval;

import dev.leadline.estimate.Accumulator;
import dev.leadline.numeric.Shortest;
import java.util.Optional;
import java.util.function.DoubleUnaryOperator;

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

    /// The limits wanted of `mean ± half`, as far as they lie within the bounds.
    ///
    /// @param half half the length at a level
    static Interval interval(
            double mean,
            DoubleUnaryOperator half,
            double least,
            double most,
            double level,
            Sides sides,
            String kind,
            String assumption) {
        return sides.of(
                        level,
                        twoSided -> new Interval(
                                mean - half.applyAsDouble(twoSided),
                                mean + half.applyAsDouble(twoSided),
                                twoSided,
                                kind,
                                assumption,
                                Optional.empty()))
                .within(least, most);
    }
}
