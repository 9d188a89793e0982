package dev.leadline.interval;

import dev.leadline.numeric.Shortest;
import java.util.Optional;

/// The any-time band of the mean of observations that lie between known bounds: exact, it holds at all n at
/// once with at least its level. It is an empirical Bernstein band: its width goes with the variance seen.
///
/// Why it may be made from the sums of whole items: for `X` between `a` and `b` of mean μ, any forecast `m`
/// of it that was made before it, and `0 <= λ < 1/c` with `c = b - a`, the mean of `exp(λ (X - μ) - ψ(λ) (X -
/// m)²)` is at most 1, with `ψ(λ) = (-ln(1 - c λ) - c λ) / c²`: `exp(y - ψ y²) <= 1 + y` for `y >= -1` leaves
/// `(1 + λ (μ - m)) exp(-λ (μ - m)) <= 1`. So the products are supermartingales whatever the forecasts, as
/// long as each was there before its observation; nothing asks that it be the newest mean. Here it is the
/// mean of all earlier items (see [BoundedSums]), the same for all observations of an item. The other side is
/// the same with signs changed, and each side is missed with at most `α/2`.
///
/// Source: Howard, Ramdas, McAuliffe and Sekhon (2021), Annals of Statistics 49, 1055-1080, theorem 4.
///
/// @param side bound of the sum of deviations, which it crosses on either side with at most half of what is
///     left to the level
/// @param level of confidence of both sides together
public record AnyTimeBounded(GammaMixture side, double level) {
    /// Word of the project file and of the commands.
    public static final String KIND = "any-time-bounded";

    private static final String ASSUMPTION = "The observations are independent and lie between the bounds stated;"
            + " nothing else is taken for granted, and the band holds at all n at once.";

    /// Nearly the tightest at n observations that spread evenly between the bounds.
    public static AnyTimeBounded tunedTo(double n, double least, double most, double level) {
        Level.check(level);
        double length = most - least;
        return new AnyTimeBounded(GammaMixture.tunedTo(n * length * length / 12, length, (1 + level) / 2), level);
    }

    /// Half the width at n observations whose standard deviation is `sd`.
    public double halfWidth(double sd, double n) {
        return side.bound(n * sd * sd) / n;
    }

    public Interval of(BoundedSums sums) {
        if (sums.n() == 0) {
            return none("an interval needs at least 1 observation");
        }
        if (!sums.areWithin()) {
            return none("values from %s to %s were seen, which are not within the bounds %s and %s"
                    .formatted(
                            Shortest.text(sums.seenLeast()),
                            Shortest.text(sums.seenMost()),
                            Shortest.text(sums.least()),
                            Shortest.text(sums.most())));
        }
        double half = side.bound(sums.squares()) / sums.n();
        return new Interval(sums.mean() - half, sums.mean() + half, level, KIND, ASSUMPTION, Optional.empty())
                .within(sums.least(), sums.most());
    }

    private Interval none(String note) {
        return Interval.none(level, KIND, ASSUMPTION, note);
    }
}
