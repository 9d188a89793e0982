package dev.leadline.interval;

import java.util.Optional;
import java.util.Set;

/// What all marks so far say together: where a band is exact, it holds at all marks at once, and so does what
/// they have in common, which is narrower. Only exact bands may be intersected; in one that holds in the
/// limit alone, an early miss would stay for good.
///
/// @param interval the latest band of a mark, with the limits that all have in common
public record RunningIntersection(Interval interval) {
    private static final Set<String> EXACT = Set.of(AnyTimeChance.KIND, AnyTimeBounded.KIND, AnyTimeQuantile.KIND);

    /// Whether a band holds at all n, not in the limit alone.
    public static boolean isExact(Interval band) {
        return EXACT.contains(band.kind());
    }

    public RunningIntersection {
        if (!isExact(interval)) {
            throw new IllegalArgumentException(interval.kind() + " is not exact");
        }
    }

    /// With the band of the next mark. Where nothing is left in common, at least one mark has missed, and
    /// there is no interval any more.
    public RunningIntersection and(Interval next) {
        if (!next.kind().equals(interval.kind()) || next.level() != interval.level()) {
            throw new IllegalArgumentException(next.kind() + " " + next.level() + " after " + interval);
        }
        if (contradicts(interval)) {
            return this;
        }
        double low = later(interval.low(), next.low(), true);
        double high = later(interval.high(), next.high(), false);
        boolean empty = low > high;
        return new RunningIntersection(new Interval(
                empty ? Double.NaN : low,
                empty ? Double.NaN : high,
                next.level(),
                next.kind(),
                next.assumption(),
                empty ? Optional.of(CONTRADICTION) : next.note()));
    }

    private static final String CONTRADICTION =
            "the bands of the marks so far have nothing in common: at least one of them has missed";

    private static boolean contradicts(Interval interval) {
        return interval.note().filter(CONTRADICTION::equals).isPresent();
    }

    /// The tighter of two limits, of which either may not exist yet.
    private static double later(double before, double now, boolean low) {
        return Double.isNaN(before)
                ? now
                : Double.isNaN(now) ? before : low ? Math.max(before, now) : Math.min(before, now);
    }
}
