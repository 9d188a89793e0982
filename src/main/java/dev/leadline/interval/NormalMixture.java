package dev.leadline.interval;

import dev.leadline.numeric.Log;
import dev.leadline.numeric.Normal;

/// A bound that a sum of steps of mean 0 crosses at no time, with the level for probability: the mixture,
/// over normal slopes of precision `rho`, of the exponential martingales of a Brownian motion with the same
/// variance.
///
/// Source: Robbins (1970), Annals of Mathematical Statistics 41, 1397-1409; Howard, Ramdas, McAuliffe and
/// Sekhon (2021), Annals of Statistics 49, 1055-1080.
///
/// @param rho in the unit of the variance: the smaller, the earlier the bound is tight
/// @param level of confidence, between 0 and 1
public record NormalMixture(double rho, double level) {
    public NormalMixture {
        Level.check(level);
        if (!(rho > 0)) {
            throw new IllegalArgumentException("rho " + rho + " is not above 0");
        }
    }

    /// Nearly the tightest at this variance of the sum, where both sides are bounded.
    public static NormalMixture tunedTo(double variance, double level) {
        return new NormalMixture(rho(variance, 1 - level), level);
    }

    /// The rho that is nearly best at a variance. A bound of one side takes twice its alpha here.
    static double rho(double variance, double alpha) {
        double twice = -2 * Log.log(alpha);
        return variance / (twice + StrictMath.log1p(twice));
    }

    /// Which the size of the sum crosses at no time.
    ///
    /// @param variance of the sum so far
    public double bound(double variance) {
        double all = variance + rho;
        return Math.sqrt(all * (StrictMath.log1p(variance / rho) - 2 * Log.log(1 - level)));
    }

    /// Which the sum itself crosses at no time; below it may go where it will.
    public double oneSided(double variance) {
        double all = variance + rho;
        double needed = -Log.log(1 - level) - 0.5 * Log.log(4 * rho / all);
        // Φ lies between 1/2 and 1: the two ends differ by ln 2.
        double low = Math.sqrt(2 * Math.max(0, needed));
        double high = Math.sqrt(2 * Math.max(0, needed + Log.log(2)));
        double z = Crossing.between(x -> x * x / 2 + Log.log(Normal.cdf(x)) - needed, low, high, 1e-14 * high);
        return z * Math.sqrt(all);
    }
}
