package dev.leadline.density;

import static dev.leadline.density.Rule.between;

import dev.leadline.numeric.Log;

/// An event that happens, 1, or does not, 0.
///
/// Probabilities 0 and 1 are allowed: then its value is fixed.
public record Bernoulli(double probability) implements WholeNumbers {
    private static final Entry ENTRY = Entry.of(
            v -> new Bernoulli(v[0]),
            between(0, 1, "probability", "chance that it happens", "A probability is a share of all cases."));

    static final Family FAMILY =
            new Described("bernoulli", "something that happens, 1, or does not, 0: a fault, a claim, rain", ENTRY);

    public Bernoulli {
        ENTRY.check(probability);
    }

    @Override
    public double logMass(double k) {
        return k == 0 ? StrictMath.log1p(-probability) : Log.log(probability);
    }

    @Override
    public double pdf(double x) {
        return x == 0 ? 1 - probability : x == 1 ? probability : Double.isNaN(x) ? x : 0;
    }

    @Override
    public double upTo(double k) {
        return 1 - probability;
    }

    @Override
    public double beyond(double k) {
        return probability;
    }

    @Override
    public double mean() {
        return probability;
    }

    @Override
    public double variance() {
        return probability * (1 - probability);
    }

    @Override
    public double skewness() {
        return variance() == 0 ? Double.NaN : (1 - 2 * probability) / Math.sqrt(variance());
    }

    @Override
    public double excessKurtosis() {
        return variance() == 0 ? Double.NaN : 1 / variance() - 6;
    }

    @Override
    public Support support() {
        return new Support(probability == 1 ? 1 : 0, probability == 0 ? 0 : 1);
    }
}
