package dev.leadline.density;

import java.util.List;

/// Moments of a density by quadrature over its cells: about the middle of the mass first, then about the mean.
record PieceMoments(double mean, double variance, double skewness, double excessKurtosis) {
    private static final double[][] BINOMIAL = {{1}, {1, 1}, {1, 2, 1}, {1, 3, 3, 1}, {1, 4, 6, 4, 1}};

    PieceMoments(List<Refinement.Cell> cells, double total, TailOrders orders) {
        double mean = mean(cells, total, orders);
        double variance = !Double.isFinite(mean)
                ? Double.NaN
                : orders.least() > 2 ? about(mean, 2, cells) / total : Double.POSITIVE_INFINITY;
        boolean finite = Double.isFinite(variance);
        double sd = Math.sqrt(variance);
        this(
                mean,
                variance,
                finite && orders.least() > 3 ? about(mean, 3, cells) / total / (sd * sd * sd) : Double.NaN,
                !finite
                        ? Double.NaN
                        : orders.least() > 4
                                ? about(mean, 4, cells) / total / variance / variance - 3
                                : Double.POSITIVE_INFINITY);
    }

    private static double mean(List<Refinement.Cell> cells, double total, TailOrders orders) {
        boolean lower = orders.lower() <= 1;
        boolean upper = orders.upper() <= 1;
        if (lower || upper) {
            return lower && upper ? Double.NaN : lower ? Double.NEGATIVE_INFINITY : Double.POSITIVE_INFINITY;
        }
        double middle = middle(cells, total);
        return middle + about(middle, 1, cells) / total;
    }

    private static double middle(List<Refinement.Cell> cells, double total) {
        double below = 0;
        for (var cell : cells) {
            below += cell.mass;
            if (below >= 0.5 * total) {
                return Double.isFinite(cell.low) ? cell.low : cell.high;
            }
        }
        return 0;
    }

    private static double about(double centre, int order, List<Refinement.Cell> cells) {
        double sum = 0;
        for (var cell : cells) {
            if (cell.flank != null) {
                sum += about(centre, order, cell.flank);
            } else if (cell.mass > 0) {
                double half = 0.5 * (cell.high - cell.low);
                for (int j = 0; j < Chebyshev.POINTS; j++) {
                    double height = half * Chebyshev.WEIGHTS[j] * cell.heights[j];
                    sum += power(height, cell.node(j) - centre, order);
                }
            }
        }
        return sum;
    }

    private static double about(double centre, int order, Flank flank) {
        double sum = 0;
        for (int i = 0; i <= order; i++) {
            sum += power(BINOMIAL[order][i] * flank.moment(i), flank.anchor() - centre, order - i);
        }
        return sum;
    }

    private static double power(double factor, double x, int order) {
        double product = factor;
        for (int i = 0; i < order; i++) {
            product *= x;
        }
        return product;
    }
}
