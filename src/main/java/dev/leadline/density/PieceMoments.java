package dev.leadline.density;

import java.util.List;

/// Moments of a density by quadrature over its cells, in units of the distance of its quartiles: about the
/// median first, then about the mean.
record PieceMoments(double mean, double variance, double skewness, double excessKurtosis) {
    private static final double[][] BINOMIAL = {{1}, {1, 1}, {1, 2, 1}, {1, 3, 3, 1}, {1, 4, 6, 4, 1}};

    /// @param total mass of all cells
    /// @param median may be about right only
    /// @param unit a length of the order of the standard deviation
    PieceMoments(List<Refinement.Cell> cells, double total, TailOrders orders, double median, double unit) {
        double least = orders.least();
        double shift = least > 1 ? about(median, unit, 1, cells) / total : Double.NaN;
        double mean = least > 1 ? median + unit * shift : infinite(orders);
        double second = least > 2 ? about(mean, unit, 2, cells) / total : Double.POSITIVE_INFINITY;
        double third = least > 3 ? about(mean, unit, 3, cells) / total : Double.NaN;
        double fourth = least > 4 ? about(mean, unit, 4, cells) / total : Double.POSITIVE_INFINITY;
        this(
                mean,
                least > 1 ? second * unit * unit : Double.NaN,
                third / (second * Math.sqrt(second)),
                least > 2 ? fourth / second / second - 3 : Double.NaN);
    }

    /// A mean that no number is.
    private static double infinite(TailOrders orders) {
        boolean lower = orders.lower() <= 1;
        boolean upper = orders.upper() <= 1;
        return lower && upper ? Double.NaN : lower ? Double.NEGATIVE_INFINITY : Double.POSITIVE_INFINITY;
    }

    /// The mean of a power of the distance from the centre, in the unit, times the mass of all.
    private static double about(double centre, double unit, int order, List<Refinement.Cell> cells) {
        double sum = 0;
        for (var cell : cells) {
            if (cell.flank != null) {
                sum += about(centre, unit, order, cell.flank);
            } else if (cell.mass > 0) {
                double half = 0.5 * (cell.high - cell.low);
                for (int j = 0; j < Chebyshev.POINTS; j++) {
                    double mass = half * Chebyshev.WEIGHTS[j] * cell.heights[j];
                    sum += times(mass, (cell.node(j) - centre) / unit, order);
                }
            }
        }
        return sum;
    }

    private static double about(double centre, double unit, int order, Flank flank) {
        double sum = 0;
        for (int i = 0; i <= order && flank.mass() > 0; i++) {
            double far = BINOMIAL[order][i] * flank.moment(i, unit);
            sum += times(far, (flank.anchor() - centre) / unit, order - i);
        }
        return sum;
    }

    private static double times(double factor, double x, int order) {
        double product = factor;
        for (int i = 0; i < order; i++) {
            product *= x;
        }
        return product;
    }
}
