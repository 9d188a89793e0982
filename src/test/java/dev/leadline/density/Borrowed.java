package dev.leadline.density;

import org.apache.commons.statistics.distribution.ContinuousDistribution;
import org.apache.commons.statistics.distribution.DiscreteDistribution;

/// A density lent by the library of distributions: only looked at, never sampled.
public sealed interface Borrowed extends Density {
    static Density of(ContinuousDistribution of) {
        return new Continuous(of);
    }

    static Density of(DiscreteDistribution of) {
        return new Counts(of);
    }

    @Override
    default double logPdf(double x) {
        return StrictMath.log(pdf(x));
    }

    @Override
    default double skewness() {
        return Double.NaN;
    }

    @Override
    default double excessKurtosis() {
        return Double.NaN;
    }

    @Override
    default Standardised standardised() {
        throw new UnsupportedOperationException("only looked at, never sampled");
    }

    /// @see Borrowed#of(ContinuousDistribution)
    record Continuous(ContinuousDistribution of) implements Borrowed {
        @Override
        public double pdf(double x) {
            return of.density(x);
        }

        @Override
        public double cdf(double x) {
            return of.cumulativeProbability(x);
        }

        @Override
        public double survival(double x) {
            return of.survivalProbability(x);
        }

        @Override
        public double quantile(double p) {
            return of.inverseCumulativeProbability(p);
        }

        @Override
        public double upperQuantile(double q) {
            return of.inverseSurvivalProbability(q);
        }

        @Override
        public double mean() {
            return of.getMean();
        }

        @Override
        public double variance() {
            return of.getVariance();
        }

        @Override
        public Support support() {
            return new Support(of.getSupportLowerBound(), of.getSupportUpperBound());
        }
    }

    /// @see Borrowed#of(DiscreteDistribution)
    record Counts(DiscreteDistribution of) implements Borrowed {
        @Override
        public double pdf(double x) {
            return x == Math.rint(x) ? of.probability((int) x) : 0;
        }

        @Override
        public double cdf(double x) {
            return of.cumulativeProbability((int) Math.floor(x));
        }

        @Override
        public double survival(double x) {
            return of.survivalProbability((int) Math.floor(x));
        }

        @Override
        public double quantile(double p) {
            return of.inverseCumulativeProbability(p);
        }

        @Override
        public double upperQuantile(double q) {
            return of.inverseSurvivalProbability(q);
        }

        @Override
        public double mean() {
            return of.getMean();
        }

        @Override
        public double variance() {
            return of.getVariance();
        }

        @Override
        public boolean isDiscrete() {
            return true;
        }

        @Override
        public Support support() {
            return new Support(of.getSupportLowerBound(), of.getSupportUpperBound());
        }
    }
}
