package dev.leadline.density;

import dev.leadline.numeric.Exp;
import dev.leadline.numeric.GaussLegendre;
import java.util.Arrays;
import java.util.function.DoubleUnaryOperator;
import java.util.stream.DoubleStream;

/// Moments of a density that has no formula for them: sums over the values of a discrete one, as far as these can be
/// kept, else from the quantiles of both tails.
///
/// With `p = exp(-s) / 2` the moment is the integral of `f(quantile(p)) p` over s, by Gauss-Legendre quadrature: to
/// `p = 1e-300` in an infinite tail, in one that ends to what a double notices.
final class Moments {
    private static final GaussLegendre RULE = GaussLegendre.of(8);
    private static final double NEAR = 8;
    private static final double END = 690;
    private static final double FINITE_END = 50;

    private Moments() {}

    /// The first four.
    record Four(double mean, double variance, double skewness, double excessKurtosis) {
        static Four of(Density density) {
            return new Four(density.mean(), density.variance(), density.skewness(), density.excessKurtosis());
        }
    }

    static double skewness(Density density) {
        double variance = density.variance();
        return Double.isFinite(variance)
                ? third(density.tailOrders(), Weighed.of(density), density.mean(), Math.sqrt(variance))
                : Double.NaN;
    }

    static double excessKurtosis(Density density) {
        double variance = density.variance();
        return Double.isFinite(variance)
                ? fourth(density.tailOrders(), Weighed.of(density), density.mean(), Math.sqrt(variance))
                : Double.NaN;
    }

    static Four four(Density density) {
        var orders = density.tailOrders();
        if (orders.least() <= 1) {
            return new Four(infinite(orders, 1), Double.NaN, Double.NaN, Double.NaN);
        }
        var values = Weighed.of(density);
        double middle = density.quantile(0.5);
        double mean = middle + values.mean(x -> x - middle);
        if (orders.least() <= 2) {
            return new Four(mean, Double.POSITIVE_INFINITY, Double.NaN, Double.NaN);
        }
        double variance = values.mean(x -> (x - mean) * (x - mean));
        double sd = Math.sqrt(variance);
        return new Four(mean, variance, third(orders, values, mean, sd), fourth(orders, values, mean, sd));
    }

    private static double third(TailOrders orders, Weighed values, double mean, double sd) {
        return orders.least() > 3 ? values.mean(x -> cube((x - mean) / sd)) : infinite(orders, 3);
    }

    private static double fourth(TailOrders orders, Weighed values, double mean, double sd) {
        return orders.least() > 4
                ? values.mean(x -> cube((x - mean) / sd) * ((x - mean) / sd)) - 3
                : Double.POSITIVE_INFINITY;
    }

    private static double cube(double z) {
        return z * z * z;
    }

    /// A moment of odd order that is infinite in one tail; `NaN` where it is in both.
    static double infinite(TailOrders orders, int order) {
        return orders.lower() > order
                ? Double.POSITIVE_INFINITY
                : orders.upper() > order ? Double.NEGATIVE_INFINITY : Double.NaN;
    }

    /// Values with their weights, which add up to 1.
    private record Weighed(double[] x, double[] weight) {
        static Weighed of(Density density) {
            if (density.isDiscrete()) {
                double[] values = Staircase.values(density);
                if (values.length <= Staircase.MOST) {
                    return new Weighed(
                            values, Arrays.stream(values).map(density::pdf).toArray());
                }
            }
            var x = DoubleStream.builder();
            var weight = DoubleStream.builder();
            tail(density::quantile, Double.isInfinite(density.support().low()), x, weight);
            tail(density::upperQuantile, Double.isInfinite(density.support().high()), x, weight);
            return new Weighed(x.build().toArray(), weight.build().toArray());
        }

        private static void tail(
                DoubleUnaryOperator quantile, boolean isInfinite, DoubleStream.Builder x, DoubleStream.Builder weight) {
            double step;
            for (double from = 0; from < (isInfinite ? END : FINITE_END); from += step) {
                step = from < NEAR ? 0.0625 : 2;
                for (int j = 0; j < RULE.nodes().length; j++) {
                    double p = 0.5 * Exp.exp(-(from + 0.5 * step * (1 + RULE.nodes()[j])));
                    x.add(quantile.applyAsDouble(p));
                    weight.add(0.5 * step * RULE.weights()[j] * p);
                }
            }
        }

        double mean(DoubleUnaryOperator f) {
            var sum = new Sum(0);
            for (int i = 0; i < x.length; i++) {
                sum.add(weight[i] * f.applyAsDouble(x[i]));
            }
            return sum.value();
        }
    }
}
