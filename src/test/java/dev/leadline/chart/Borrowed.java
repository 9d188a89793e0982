package dev.leadline.chart;

import dev.leadline.density.Density;
import dev.leadline.density.Standardised;
import dev.leadline.density.Support;
import org.apache.commons.statistics.distribution.ContinuousDistribution;

/// A density lent by the library of distributions.
record Borrowed(ContinuousDistribution of) implements Density {
    @Override
    public double pdf(double x) {
        return of.density(x);
    }

    @Override
    public double logPdf(double x) {
        return of.logDensity(x);
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

    @Override
    public Standardised standardised() {
        throw new UnsupportedOperationException("only drawn, never sampled");
    }
}
