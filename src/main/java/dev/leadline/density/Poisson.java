package dev.leadline.density;

import static dev.leadline.density.Rule.between;

import dev.leadline.numeric.GammaFunction;
import dev.leadline.numeric.Log;

/// How many events there are, of any number that could be, none minding the others.
///
/// Mean 0 is allowed: then there are none.
///
/// Error: relative 1e-12 in both tails (`DensityTablesTest`).
///
/// Source: Loader (2000), Fast and accurate computation of binomial probabilities. From memory.
public record Poisson(double mean) implements WholeNumbers {
    private static final double HALF_LOG_2PI = 0.9189385332046728;

    private static final Entry ENTRY = Entry.of(
            v -> new Poisson(v[0]),
            between(
                    0,
                    1e12,
                    "mean",
                    "mean number of events",
                    "A number of events is not negative, and beyond 1e12 a normal density is the same."));

    static final Family FAMILY =
            new Described("poisson", "how many events in a time or an area: failures, arrivals, defects", ENTRY);

    public Poisson {
        ENTRY.check(mean);
    }

    @Override
    public double logMass(double k) {
        return k == 0
                ? -mean
                : -Deviance.of(k, mean, mean - k) - GammaFunction.stirlingError(k) - 0.5 * Log.log(k) - HALF_LOG_2PI;
    }

    @Override
    public double upTo(double k) {
        return IncompleteGamma.of(k + 1).upper(mean);
    }

    @Override
    public double beyond(double k) {
        return IncompleteGamma.of(k + 1).lower(mean);
    }

    @Override
    public double variance() {
        return mean;
    }

    @Override
    public double skewness() {
        return mean == 0 ? Double.NaN : 1 / Math.sqrt(mean);
    }

    @Override
    public double excessKurtosis() {
        return mean == 0 ? Double.NaN : 1 / mean;
    }

    @Override
    public Support support() {
        return new Support(0, mean == 0 ? 0 : Double.POSITIVE_INFINITY);
    }
}
