package dev.leadline.density;

import static dev.leadline.density.Rule.between;
import static dev.leadline.density.Rule.whole;

import dev.leadline.numeric.Exp;
import dev.leadline.numeric.GammaFunction;
import dev.leadline.numeric.Log;

/// How many of so many trials succeed, each with the same probability and none minding the others.
///
/// No trials, and probabilities 0 and 1, are allowed: then its value is fixed.
///
/// Error: relative 1e-12 in both tails (`DensityTablesTest`).
///
/// Source: Loader (2000), Fast and accurate computation of binomial probabilities. From memory.
public record Binomial(double trials, double probability) implements WholeNumbers {
    private static final double HALF_LOG_2PI = 0.9189385332046728;

    private static final Entry ENTRY = Entry.of(
            v -> new Binomial(v[0], v[1]),
            whole(
                    0,
                    1e9,
                    "trials",
                    "how many are tried",
                    "Beyond that its tails would take too long; take a normal or a Poisson density."),
            between(0, 1, "probability", "chance that one succeeds", "A probability is a share of all cases."));

    static final Family FAMILY = new Described(
            "binomial", "how many of a known number fail, pass, or answer yes; each with the same chance", ENTRY);

    public Binomial {
        ENTRY.check(trials, probability);
    }

    private double otherwise() {
        return 1 - probability;
    }

    @Override
    public double logMass(double k) {
        double rest = trials - k;
        if (k == 0 || rest == 0) {
            return trials == 0 ? 0 : trials * (k == 0 ? StrictMath.log1p(-probability) : logOf(probability));
        }
        double excess = Math.fma(trials, probability, -k);
        return 0.5 * (Log.log(trials / k / rest))
                - HALF_LOG_2PI
                + (GammaFunction.stirlingError(trials)
                        - GammaFunction.stirlingError(k)
                        - GammaFunction.stirlingError(rest))
                - (Deviance.of(k, trials * probability, excess) + Deviance.of(rest, trials * otherwise(), -excess));
    }

    /// Near 1 from what is missing, whose rounding counts less.
    private static double logOf(double p) {
        return p > 0.5 ? StrictMath.log1p(-(1 - p)) : Log.log(p);
    }

    @Override
    public double upTo(double k) {
        double rest = trials - k;
        return IncompleteBeta.isBelow(rest, k + 1, otherwise())
                ? prefix(k) * IncompleteBeta.fraction(rest, k + 1, otherwise(), probability, -excess(k))
                : 1 - beyond(k);
    }

    @Override
    public double beyond(double k) {
        double rest = trials - k;
        return IncompleteBeta.isBelow(rest, k + 1, otherwise())
                ? 1 - upTo(k)
                : prefix(k) * IncompleteBeta.fraction(k + 1, rest, probability, otherwise(), excess(k));
    }

    /// `p^(k+1) q^(n-k) / B(k + 1, n - k)`.
    private double prefix(double k) {
        return Exp.exp(logMass(k)) * (trials - k) * probability;
    }

    /// `(n - k) p - (k + 1) q`.
    private double excess(double k) {
        return Math.fma(trials + 1, probability, -(k + 1));
    }

    @Override
    public double mean() {
        return trials * probability;
    }

    @Override
    public double variance() {
        return mean() * otherwise();
    }

    @Override
    public double skewness() {
        return variance() == 0 ? Double.NaN : (1 - 2 * probability) / Math.sqrt(variance());
    }

    @Override
    public double excessKurtosis() {
        return variance() == 0 ? Double.NaN : (1 / variance() - 6 / trials);
    }

    @Override
    public Support support() {
        return new Support(probability == 1 ? trials : 0, probability == 0 ? 0 : trials);
    }
}
