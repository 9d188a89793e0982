package dev.leadline.estimate;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.stream.IntStream;

/// The mean of a component, corrected by others whose means are known to be 0, where each observation is
/// corrected with coefficients that were fitted to other observations. That has no bias, and no gain from
/// the fit's own noise:
///
/// `Σ n_k (ȳ_k - β_k c̄_k) / n`, with the means of fold k and the coefficients of all folds but k.
///
/// The standard error is that of the corrected outcomes, `n - q - 1` degrees of freedom.
///
/// Against [Regression] with exp(Z) controlled by Z and Z², standard deviation of the estimate 1.13 times
/// as large with 200 observations, 1.03 times with 1,000 (`CrossFitTest`).
///
/// Source: Avramidis and Wilson (1993), Operations Research Letters 14, 187-198.
public final class CrossFit {
    /// At most.
    private static final int FOLDS = 8;

    private final List<Accumulator> folds;
    private final int k;
    private final int first;
    private final int controls;

    /// @param blocks independent of each other
    /// @param k the component sought
    /// @param first component of the first control; the others follow
    /// @param controls how many
    public CrossFit(List<Accumulator> blocks, int k, int first, int controls) {
        this.folds = dealt(blocks);
        this.k = k;
        this.first = first;
        this.controls = controls;
    }

    /// The largest first, each to the fold that has the fewest observations.
    private static List<Accumulator> dealt(List<Accumulator> blocks) {
        var folds = new ArrayList<Accumulator>();
        blocks.stream()
                .filter(block -> block.count() > 0)
                .sorted(Comparator.comparingLong(Accumulator::count).reversed())
                .forEach(block -> {
                    if (folds.size() < FOLDS) {
                        folds.add(block.copy());
                    } else {
                        folds.stream()
                                .min(Comparator.comparingLong(Accumulator::count))
                                .orElseThrow()
                                .merge(block);
                    }
                });
        return folds;
    }

    /// Observations that the smallest fit has.
    public long fewest() {
        long all = folds.stream().mapToLong(Accumulator::count).sum();
        return folds.stream().mapToLong(fold -> all - fold.count()).min().orElse(0);
    }

    /// @param errors bounds of the errors of the controls' means
    public Estimate estimate(double[] errors) {
        int size = folds.size();
        double[] means = new double[size];
        double within = 0;
        double bias = 0;
        double n = folds.stream().mapToLong(Accumulator::count).sum();
        for (int f = 0; f < size; f++) {
            var fold = folds.get(f);
            double[] coefficients = new Regression(others(f), k, first, controls).coefficients();
            means[f] = fold.mean(k);
            for (int c = 0; c < controls; c++) {
                means[f] -= coefficients[c] * fold.mean(first + c);
                bias += fold.count() / n * Math.abs(coefficients[c]) * errors[c];
            }
            within += squares(fold, coefficients);
        }
        double mean = IntStream.range(0, size)
                .mapToDouble(f -> folds.get(f).count() / n * means[f])
                .sum();
        double between = IntStream.range(0, size)
                .mapToDouble(f -> folds.get(f).count() * (means[f] - mean) * (means[f] - mean))
                .sum();
        long degrees = (long) n - controls - 1;
        return new Estimate(mean, Math.sqrt((within + between) / degrees / n), degrees, bias);
    }

    private Accumulator others(int without) {
        var others = new Accumulator(folds.getFirst().components());
        for (int f = 0; f < folds.size(); f++) {
            if (f != without) {
                others.merge(folds.get(f));
            }
        }
        return others;
    }

    /// Squares of the corrected outcomes of a fold about their mean, summed.
    private double squares(Accumulator fold, double[] coefficients) {
        if (fold.count() < 2) {
            return 0;
        }
        double variance = fold.covariance(k, k);
        for (int c = 0; c < controls; c++) {
            variance -= 2 * coefficients[c] * fold.covariance(k, first + c);
            for (int d = 0; d < controls; d++) {
                variance += coefficients[c] * coefficients[d] * fold.covariance(first + c, first + d);
            }
        }
        return Math.max(variance, 0) * (fold.count() - 1);
    }
}
