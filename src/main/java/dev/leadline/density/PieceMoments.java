package dev.leadline.density;

import java.util.List;

/// Moments of a density by quadrature over its cells, in units of the distance of its quartiles: about the median
/// first, then about the mean.
final class PieceMoments {
    private static final double[][] BINOMIAL = {{1}, {1, 1}, {1, 2, 1}, {1, 3, 3, 1}, {1, 4, 6, 4, 1}};

    private PieceMoments() {}

    /// @param total mass of all cells
    /// @param median may be about right only
    /// @param unit a length of the order of the standard deviation
    static Moments.Four of(List<Refinement.Cell> cells, double total, TailOrders orders, double median, double unit) {
        double least = orders.least();
        if (least <= 1) {
            return new Moments.Four(Moments.infinite(orders, 1), Double.NaN, Double.NaN, Double.NaN);
        }
        double mean = median + unit * (about(median, unit, 1, cells) / total);
        if (least <= 2) {
            return new Moments.Four(mean, Double.POSITIVE_INFINITY, Double.NaN, Double.NaN);
        }
        double second = about(mean, unit, 2, cells) / total;
        return new Moments.Four(
                mean,
                second * unit * unit,
                least > 3
                        ? about(mean, unit, 3, cells) / total / (second * Math.sqrt(second))
                        : Moments.infinite(orders, 3),
                least > 4 ? about(mean, unit, 4, cells) / total / second / second - 3 : Double.POSITIVE_INFINITY);
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
                    sum += times(mass, cell.from(centre, j) / unit, order);
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
