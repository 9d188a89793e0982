package dev.leadline.interval;

/// How likely a binomial number B, of n draws with probability q each, is at most or at least a number: the
/// tails of a beta variable.
///
/// Error: a relative 1e-12 down to 1e-9, to 1e13 draws (`RanksTest`).
final class BinomialTail {
    private BinomialTail() {}

    /// `P(B <= k)`.
    static double atMost(long k, long n, double q) {
        return k < 0 ? 0 : k >= n ? 1 : LogOdds.beyond(k + 1.0, n - k, logOdds(k, n, q));
    }

    /// `P(B >= k)`.
    static double atLeast(long k, long n, double q) {
        return k > n ? 0 : k <= 0 ? 1 : LogOdds.beyond(n - k + 1.0, k, -logOdds(k - 1, n, q));
    }

    /// `ln(q/(1-q)) - ln(a/b)` with `a = k + 1` and `b = n - k`, from the difference of `q b` and `(1-q)
    /// a`.
    private static double logOdds(long k, long n, double q) {
        double a = k + 1.0;
        double b = n - k;
        double off = Math.fma(n + 1.0, q, -a) / ((1 - q) * a);
        return Math.abs(off) < 0.5 ? StrictMath.log1p(off) : StrictMath.log(q / (1 - q) * (b / a));
    }
}
