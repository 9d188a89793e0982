package dev.leadline.interval;

import dev.leadline.density.Deviance;
import dev.leadline.numeric.GammaFunction;
import dev.leadline.numeric.Log;
import java.util.Locale;
import java.util.Optional;

/// The any-time band of a probability, from hits among independent draws: a p is in it while the mixture of
/// the likelihood over a beta prior, divided by the likelihood of p itself, is below `1/α`. The ratio is a
/// martingale under p and seldom reaches that (Ville), so the band is exact: it holds at all n at once with
/// at least its level.
///
/// Each p has a prior of its own, of mean p and the same weight for all. A limit of one side alone is that of
/// both: each side may be missed with the whole of what is left to the level.
///
/// Error of the limits: a relative 1e-10, to 1e13 draws (`AnyTimeChanceTest`). Cost: 4 to 10 µs.
///
/// Source: Robbins (1970), Annals of Mathematical Statistics 41, 1397-1409; the prior by Howard, Ramdas,
/// McAuliffe and Sekhon (2021), Annals of Statistics 49, 1055-1080.
///
/// @param weight of the prior: the two parameters together
/// @param level of confidence, between 0 and 1
public record AnyTimeChance(double weight, double level) {
    /// Word of the project file and of the commands.
    public static final String KIND = "any-time-chance";

    private static final String ASSUMPTION =
            "The draws are independent; nothing else is taken for granted, and the band holds at all n at once.";

    /// However early it is to be tight.
    private static final double LEAST_WEIGHT = 1e-3;

    private static final double USUAL_VARIANCE = .05 * .95;

    /// Of the log-odds of a limit.
    private static final double NEAR = 1e-13;

    public AnyTimeChance {
        Level.check(level);
        if (!(weight > 0)) {
            throw new IllegalArgumentException("weight " + weight + " is not above 0");
        }
    }

    /// Nearly the tightest at n draws.
    public static AnyTimeChance tunedTo(double n, double level) {
        Level.check(level);
        return new AnyTimeChance(Math.max(NormalMixture.rho(n, 1 - level) - 1, LEAST_WEIGHT), level);
    }

    /// For an absolute tolerance: nearly the tightest where a chance of .05, or of .95, reaches it. One of .5
    /// then takes some 10 % more draws than by a band tuned to it, one of .005 some 50 %.
    public static AnyTimeChance forTolerance(double absolute, double level) {
        Level.check(level);
        if (!(absolute > 0)) {
            throw new IllegalArgumentException("tolerance " + absolute);
        }
        double needed = (1 + AnyTimeMean.excess(-2 * Log.log(1 - level))) * USUAL_VARIANCE / (absolute * absolute);
        return tunedTo(needed, level);
    }

    /// The band after n draws. With failed evaluations it holds whatever those would have been: its lower
    /// limit takes them for misses, its upper one for hits.
    ///
    /// @param hits among the draws that could be evaluated
    /// @param n draws that could be evaluated
    /// @param failed draws that could not
    public Interval of(long hits, long n, long failed) {
        if (hits < 0 || hits > n || failed < 0) {
            throw new IllegalArgumentException(hits + " hits of " + n + " draws, " + failed + " failed");
        }
        long all = n + failed;
        if (all == 0) {
            return Interval.none(level, KIND, ASSUMPTION, "an interval needs at least 1 draw");
        }
        Optional<String> note = failed == 0
                ? Optional.empty()
                : Optional.of(String.format(
                        Locale.ROOT,
                        "%,d failed evaluations count as misses in the lower limit and as hits in the upper one",
                        failed));
        return new Interval(
                chance(logOdds(hits, all)), chance(-logOdds(all - hits - failed, all)), level, KIND, ASSUMPTION, note);
    }

    /// The log-odds of the lower limit, `-∞` where that is 0: with one hit the ratio stays below 1 down to p
    /// = 0.
    private double logOdds(long hits, long n) {
        if (hits < 2) {
            return Double.NEGATIVE_INFINITY;
        }
        double most = -Log.log(1 - level);
        double start = Log.log((hits + 0.5) / (n - hits + 0.5));
        double width = 4 * Math.sqrt(1 / (hits + 0.5) + 1 / (n - hits + 0.5));
        double high = start;
        double low = start - width;
        while (log(hits, n, low) < most) {
            high = low;
            width *= 2;
            low -= width;
        }
        return Crossing.between(s -> log(hits, n, s) - most, high, low, NEAR * Math.max(1, Math.abs(low)));
    }

    /// The logarithm of the ratio at a p given by its log-odds.
    private double log(long hits, long n, double logOdds) {
        return log(hits, n, chance(logOdds), chance(-logOdds));
    }

    /// The logarithm of the ratio, which is compared with `-ln α`: `B(A + k, B + n - k) / (B(A, B) p^k
    /// q^(n-k))` with `A = p weight`, `B = q weight`. Stirling's formula turns it into deviances, where
    /// nothing large cancels.
    ///
    /// @param q `1 - p`, which a caller knows better than the subtraction would where p is near 1
    double log(long hits, long n, double p, double q) {
        double a = p * weight;
        double b = q * weight;
        double all = weight + n;
        double over = p <= q ? Math.fma(n, p, -hits) : -Math.fma(n, q, -(n - hits));
        return Deviance.of(a + hits, p * all, over)
                + Deviance.of(b + (n - hits), q * all, -over)
                + 0.5 * (Log.log(a / (a + hits)) + Log.log(b / (b + (n - hits))) + Log.log(all / weight))
                + (GammaFunction.stirlingError(a + hits) - GammaFunction.stirlingError(a))
                + (GammaFunction.stirlingError(b + (n - hits)) - GammaFunction.stirlingError(b))
                - (GammaFunction.stirlingError(all) - GammaFunction.stirlingError(weight));
    }

    private static double chance(double logOdds) {
        return 1 / (1 + StrictMath.exp(-logOdds));
    }
}
