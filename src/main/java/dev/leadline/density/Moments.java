package dev.leadline.density;

import dev.leadline.numeric.Exp;
import java.util.ArrayList;
import java.util.function.DoubleUnaryOperator;

/// Moments of a density that has no formula for them, from the quantiles of both tails.
///
/// With `p = exp(-s) / 2` the moment is the integral of `f(quantile(p)) p` over s, here to `p = 1e-300`, by
/// Gauss-Legendre quadrature.
final class Moments {
    /// Nodes and weights of the rule of eight points on `[-1, 1]`: Abramowitz and Stegun, table 25.4.
    private static final double[] NODES = {
        0.1834346424956498, 0.5255324099163290, 0.7966664774136267, 0.9602898564975363
    };

    private static final double[] WEIGHTS = {
        0.3626837833783620, 0.3137066458778873, 0.2223810344533745, 0.1012285362903763
    };

    private static final double NEAR = 8;
    private static final double END = 690;
    private static final double FINITE_END = 50;

    private Moments() {}

    static double skewness(Density density) {
        if (!Double.isFinite(density.variance())) {
            return Double.NaN;
        }
        var tails = density.tailOrders();
        if (tails.lower() > 3) {
            return tails.upper() > 3 ? standardised(density, 3) : Double.POSITIVE_INFINITY;
        }
        return tails.upper() > 3 ? Double.NEGATIVE_INFINITY : Double.NaN;
    }

    static double excessKurtosis(Density density) {
        double variance = density.variance();
        if (!Double.isFinite(variance)) {
            return Double.NaN;
        }
        return density.tailOrders().least() > 4 ? standardised(density, 4) - 3 : Double.POSITIVE_INFINITY;
    }

    private static double standardised(Density density, int order) {
        double mean = density.mean();
        double sd = Math.sqrt(density.variance());
        return expectation(density, x -> {
            double z = (x - mean) / sd;
            return order == 3 ? z * z * z : z * z * z * z;
        });
    }

    /// The first four.
    record Four(double mean, double variance, double skewness, double excessKurtosis) {
        static Four of(Density density) {
            return new Four(density.mean(), density.variance(), density.skewness(), density.excessKurtosis());
        }
    }

    /// All four from the quantiles; `NaN` or infinite where the tails say so.
    static Four four(Density density) {
        double order = density.tailOrders().least();
        if (!(order > 1)) {
            var orders = density.tailOrders();
            double mean = orders.lower() > 1
                    ? Double.POSITIVE_INFINITY
                    : orders.upper() > 1 ? Double.NEGATIVE_INFINITY : Double.NaN;
            return new Four(mean, Double.NaN, Double.NaN, Double.NaN);
        }
        if (density.isDiscrete()) {
            double[] values = Staircase.values(density);
            if (values.length <= Staircase.MOST) {
                return added(density, values);
            }
        }
        var lower =
                Nodes.of(density::quantile, Double.isInfinite(density.support().low()));
        var upper = Nodes.of(
                density::upperQuantile, Double.isInfinite(density.support().high()));
        double middle = density.quantile(0.5);
        double mean = middle + lower.mean(x -> x - middle) + upper.mean(x -> x - middle);
        if (!(order > 2)) {
            return new Four(mean, Double.POSITIVE_INFINITY, Double.NaN, Double.NaN);
        }
        DoubleUnaryOperator square = x -> (x - mean) * (x - mean);
        double variance = lower.mean(square) + upper.mean(square);
        double sd = Math.sqrt(variance);
        DoubleUnaryOperator cube = x -> cube((x - mean) / sd);
        DoubleUnaryOperator fourth = x -> cube((x - mean) / sd) * ((x - mean) / sd);
        return new Four(
                mean,
                variance,
                order > 3 ? lower.mean(cube) + upper.mean(cube) : Double.NaN,
                order > 4 ? lower.mean(fourth) + upper.mean(fourth) - 3 : Double.POSITIVE_INFINITY);
    }

    /// Over the values of a discrete density that are drawn.
    private static Four added(Density density, double[] values) {
        double middle = density.quantile(0.5);
        double mean = middle + mean(density, values, x -> x - middle);
        double variance = mean(density, values, x -> (x - mean) * (x - mean));
        double sd = Math.sqrt(variance);
        return new Four(
                mean,
                variance,
                mean(density, values, x -> cube((x - mean) / sd)),
                mean(density, values, x -> cube((x - mean) / sd) * ((x - mean) / sd)) - 3);
    }

    private static double mean(Density density, double[] values, DoubleUnaryOperator f) {
        var sum = new Sum(0);
        for (double x : values) {
            sum.add(density.pdf(x) * f.applyAsDouble(x));
        }
        return sum.value();
    }

    /// The quantiles of one tail at the points of the quadrature, with their weights.
    private record Nodes(double[] x, double[] weight) {
        /// @param isInfinite where the tail ends, nothing counts that is rarer than what one double is to another
        static Nodes of(DoubleUnaryOperator quantile, boolean isInfinite) {
            var x = new ArrayList<Double>();
            var weight = new ArrayList<Double>();
            double step;
            for (double from = 0; from < (isInfinite ? END : FINITE_END); from += step) {
                step = from < NEAR ? 0.0625 : 2;
                for (int j = 0; j < NODES.length; j++) {
                    for (int side = -1; side <= 1; side += 2) {
                        double p = 0.5 * Exp.exp(-(from + 0.5 * step * (1 + side * NODES[j])));
                        x.add(quantile.applyAsDouble(p));
                        weight.add(0.5 * step * WEIGHTS[j] * p);
                    }
                }
            }
            return new Nodes(
                    x.stream().mapToDouble(v -> v).toArray(),
                    weight.stream().mapToDouble(v -> v).toArray());
        }

        double mean(DoubleUnaryOperator f) {
            double sum = 0;
            for (int i = 0; i < x.length; i++) {
                sum = Math.fma(weight[i], f.applyAsDouble(x[i]), sum);
            }
            return sum;
        }
    }

    private static double cube(double z) {
        return z * z * z;
    }

    /// The mean of `f` of a value of the density.
    static double expectation(Density density, DoubleUnaryOperator f) {
        double sum = 0;
        for (double from = 0; from < END; ) {
            double step = from < NEAR ? 0.0625 : 2;
            for (int j = 0; j < NODES.length; j++) {
                for (int side = -1; side <= 1; side += 2) {
                    double p = 0.5 * Exp.exp(-(from + 0.5 * step * (1 + side * NODES[j])));
                    double both = f.applyAsDouble(density.quantile(p)) + f.applyAsDouble(density.upperQuantile(p));
                    sum += 0.5 * step * WEIGHTS[j] * p * both;
                }
            }
            from += step;
        }
        return sum;
    }
}
