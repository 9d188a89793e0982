package dev.leadline.interval;

import dev.leadline.density.Deviance;
import dev.leadline.density.Gamma;
import dev.leadline.numeric.Exp;
import dev.leadline.numeric.GammaFunction;
import dev.leadline.numeric.Log;

/// A bound that a sum of steps of mean 0, which have a rare large step on this side, crosses at no time, with
/// the level for probability: the mixture of sub-exponential martingales over a gamma density, cut where they
/// end.
///
/// Beyond a shape of 1e6 the incomplete gamma function in it is replaced by Chernoff's bound, by which the
/// bound is at most a relative 1e-3 wider.
///
/// Source: Howard, Ramdas, McAuliffe and Sekhon (2021), Annals of Statistics 49, 1055-1080, proposition 9.
///
/// @param rho in the unit of the variance: the smaller, the earlier the bound is tight
/// @param scale length of the largest step
/// @param level of confidence of this one side
record GammaMixture(double rho, double scale, double level) {
    private static final double LARGEST_SHAPE = 1e6;

    GammaMixture {
        Level.check(level);
        if (!(rho > 0 && scale > 0)) {
            throw new IllegalArgumentException("rho " + rho + ", scale " + scale);
        }
    }

    /// Nearly the tightest at this variance of the sum.
    static GammaMixture tunedTo(double variance, double scale, double level) {
        return new GammaMixture(NormalMixture.rho(variance, Math.min(0.5, 2 * (1 - level))), scale, level);
    }

    /// Which the sum crosses at no time.
    ///
    /// @param variance of the sum so far
    double bound(double variance) {
        double square = scale * scale;
        double prior = rho / square;
        double all = (variance + rho) / square;
        double start = 0.5 * Log.log(all / prior)
                + GammaFunction.stirlingError(prior)
                - GammaFunction.stirlingError(all)
                + logBelow(prior, 0)
                - Log.log(1 - level);
        // What the sum adds: all (u - ln(1 + u)) + ln P(all, all (1 + u)) for u = d / all.
        double high = Math.sqrt(2 * all * (start + 1)) + 2 * (start + 1);
        return scale
                * Crossing.between(d -> Deviance.of(all, all + d, d) + logBelow(all, d) - start, 0, high, 1e-13 * high);
    }

    /// `ln P(a, a + d)`, or less.
    private static double logBelow(double a, double d) {
        if (a > LARGEST_SHAPE) {
            return Log.log(Math.max(0.5, 1 - Exp.exp(-Deviance.of(a, a + d, d))));
        }
        return Log.log(new Gamma(a, 1).cdf(a + d));
    }
}
