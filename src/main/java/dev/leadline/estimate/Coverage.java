package dev.leadline.estimate;

/// What a distribution of outcomes is besides its mean.
///
/// @param coverage part of the outcomes that both intervals hold
/// @param standardUncertainty standard deviation of the outcomes
/// @param symmetricLow below it lies half of what the interval leaves out
/// @param symmetricHigh above it lies as much
/// @param shortestLow lower end of the shortest interval with this coverage
/// @param shortestHigh its upper end
public record Coverage(
        double coverage,
        double standardUncertainty,
        double symmetricLow,
        double symmetricHigh,
        double shortestLow,
        double shortestHigh) {
    /// Of so many outcomes, those by which the ends of an interval lie apart in rank: JCGM 101:2008, 7.7.2.
    static long span(long n, double coverage) {
        return Math.clamp((long) Math.floor(coverage * n + 0.5), 1, Math.max(1, n - 1));
    }

    /// Rank of the lower end of the interval that leaves out as many below as above.
    static long symmetricRank(long n, long span) {
        return Math.max(1, (n - span + 1) / 2);
    }
}
