package dev.leadline.density;

import static dev.leadline.density.Rule.between;

import dev.leadline.numeric.Exp;
import dev.leadline.numeric.Log;

/// How many trials fail before the first success: 0, 1, 2 … The success itself is not counted.
///
/// Probability 1 is allowed: then none fails.
///
/// Error: relative 1e-12 in both tails (`DensityTablesTest`).
public record Geometric(double probability) implements WholeNumbers {
    private static final Entry ENTRY = Entry.of(
            v -> new Geometric(v[0]),
            between(
                    1e-12,
                    1,
                    "probability",
                    "chance that one trial succeeds",
                    "It must be possible; below 1e-12 take an exponential density."));

    private static final Entry BY_MEAN = Entry.of(
            v -> ofMean(v[0]),
            between(
                    0,
                    999_999_999_999.0,
                    "mean",
                    "mean number of failures before the first success",
                    "A number of failures is not negative; beyond 1e12 take an exponential density."));

    static final Family FAMILY = new Described(
            "geometric", "how many fail before the first success: trials until it works, less one", ENTRY, BY_MEAN);

    public Geometric {
        ENTRY.check(probability);
    }

    public static Geometric ofMean(double mean) {
        BY_MEAN.check(mean);
        return new Geometric(1 / (1 + mean));
    }

    private double logOfFailure() {
        return StrictMath.log1p(-probability);
    }

    @Override
    public double logMass(double k) {
        return k == 0 ? Log.log(probability) : Math.fma(k, logOfFailure(), Log.log(probability));
    }

    @Override
    public double upTo(double k) {
        return -StrictMath.expm1((k + 1) * logOfFailure());
    }

    @Override
    public double beyond(double k) {
        return Exp.exp((k + 1) * logOfFailure());
    }

    /// From the deviate's own probability.
    @Override
    public double near(double z) {
        return StrictMath.log(NORMAL.survival(z)) / logOfFailure();
    }

    @Override
    public double mean() {
        return (1 - probability) / probability;
    }

    @Override
    public double variance() {
        return mean() / probability;
    }

    @Override
    public double skewness() {
        return probability == 1 ? Double.NaN : (2 - probability) / Math.sqrt(1 - probability);
    }

    @Override
    public double excessKurtosis() {
        return probability == 1 ? Double.NaN : 6 + probability * probability / (1 - probability);
    }

    @Override
    public Support support() {
        return new Support(0, probability == 1 ? 0 : Double.POSITIVE_INFINITY);
    }
}
