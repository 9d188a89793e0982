package dev.leadline.interval;

import dev.leadline.estimate.Accumulator;

/// What an any-time band of bounded observations needs: how many there are, their mean, and how far they lay
/// from what was foreseen, squared and added. The mean of all earlier items of work foresees each observation
/// of the next, the middle of the bounds those of the first. So what an item adds follows from its count, its
/// mean and its variance alone, `Σ (x - m)² = (n - 1) s² + n (x̄ - m)²`, and items must be added in their
/// order.
///
/// @param least what no observation can be below
/// @param most what none can be above
/// @param seenLeast the smallest one seen; `∞` where there is none
/// @param seenMost the largest one seen
/// @param n observations
/// @param mean the middle of the bounds where there is none
/// @param squares the squared distances from what was foreseen, added
public record BoundedSums(
        double least, double most, double seenLeast, double seenMost, long n, double mean, double squares) {
    public BoundedSums {
        if (!(least < most && most - least < Double.POSITIVE_INFINITY)) {
            throw new IllegalArgumentException("bounds " + least + " and " + most);
        }
    }

    /// Before the first item.
    public static BoundedSums within(double least, double most) {
        return new BoundedSums(
                least, most, Double.POSITIVE_INFINITY, Double.NEGATIVE_INFINITY, 0, least + (most - least) / 2, 0);
    }

    /// With one more item: component k of its sums.
    public BoundedSums and(Accumulator item, int k) {
        long more = item.count();
        if (more == 0) {
            return this;
        }
        double off = item.mean(k) - mean;
        double within = more > 1 && item.variance(k) > 0 ? (more - 1) * item.variance(k) : 0;
        long all = n + more;
        return new BoundedSums(
                least,
                most,
                Math.min(seenLeast, item.min(k)),
                Math.max(seenMost, item.max(k)),
                all,
                n == 0 ? item.mean(k) : mean + off * ((double) more / all),
                squares + within + more * off * off);
    }

    /// Whether every observation lies within the bounds.
    public boolean areWithin() {
        return n == 0 || seenLeast >= least && seenMost <= most;
    }
}
