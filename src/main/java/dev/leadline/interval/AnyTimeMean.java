package dev.leadline.interval;

import dev.leadline.density.Deviance;
import dev.leadline.estimate.Estimate;
import dev.leadline.numeric.Log;
import dev.leadline.numeric.Normal;

/// The any-time band of a mean, or of any estimate that is one in the limit: an asymptotic confidence
/// sequence. It holds at all n at once, so that looking does no harm; from how many draws on is what [Guard]
/// watches over.
///
/// How often it misses at any n from there to 1e5, of 5 %: normal 3.0 %, exponential 3.1 %, lognormal (σ = 1)
/// 3.8 %, Pareto (2.5) 6.3 %, lognormal (σ = 2) 14.7 % (`EverMissTest`). Each side alone may be missed with
/// the whole of that.
///
/// Source: Waudby-Smith, Arbour, Sinha, Kennedy and Ramdas (2024), Annals of Statistics 52, 2613-2640, arXiv
/// 2103.06476. The variance of the mixture is one over the rho of [NormalMixture].
///
/// @param mixture of the sum of values of standard deviation 1
public record AnyTimeMean(NormalMixture mixture) {
    /// Word of the project file and of the commands.
    public static final String KIND = "any-time-mean";

    /// Where it is tightest for independent draws.
    public static final double DRAWS = 1e4;

    /// Where it is tightest, in observations of several draws each: passes, pairs, Latin hypercubes.
    public static final double OBSERVATIONS = 1000;

    private static final String ASSUMPTION = "The mean of the observations strays like that of normal ones from the"
            + " first look on, which needs a finite variance; then the band holds at all n at once.";

    /// Tightest at n observations: `n/rho` is u with `u - ln(1 + u) = -2 ln α`, which is `-1 - W₋₁(-α²/e)`.
    ///
    /// Error of rho: a relative 1e-12 (`AnyTimeMeanTest`).
    public static AnyTimeMean tunedTo(double n, double level) {
        Level.check(level);
        return new AnyTimeMean(new NormalMixture(n / excess(-2 * Log.log(1 - level)), level));
    }

    /// The positive u with `u - ln(1 + u) = loss`, by Newton's method from above; the left side is convex.
    static double excess(double loss) {
        double u = loss + Math.sqrt(2 * loss) + 1;
        double step;
        do {
            step = (Deviance.of(1, 1 + u, u) - loss) * (1 + u) / u;
            u -= step;
        } while (Math.abs(step) > 1e-9 * u);
        return u;
    }

    public double level() {
        return mixture.level();
    }

    /// Half the width at n observations, in standard deviations of one of them.
    public double unit(double n) {
        return mixture.bound(n) / n;
    }

    /// How many times as wide as the interval for n observations fixed beforehand.
    public double overFixed(double n) {
        return unit(n) * Math.sqrt(n) / Normal.upperQuantile((1 - level()) / 2);
    }

    /// The band at n observations. Widened on either side by what the estimate may be off beside chance.
    ///
    /// @param n observations the estimate is made of
    public Interval of(Estimate estimate, long n) {
        return Around.of(estimate, n, Math.sqrt(n) * unit(n), level(), KIND, ASSUMPTION);
    }
}
