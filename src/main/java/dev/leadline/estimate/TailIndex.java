package dev.leadline.estimate;

import dev.leadline.numeric.Exp;
import dev.leadline.numeric.Log;
import java.util.Arrays;

/// How heavy the tail of the largest of many values is: the shape of the generalized Pareto density that
/// fits what they exceed a cut-off by. Moments of order `1 / shape` and above are infinite for values that
/// go on like that: from 1/2 on the variance, from 1 on the mean.
///
/// @param shape with a weak prior, as of ten values more, of shape 1/2; `NaN` where there is no tail
/// @param raw the shape before that
/// @param scale of the density, in the unit of the values
/// @param values beyond the cut-off
///
/// Source: Zhang and Stephens (2009), Technometrics 51, 316-325; Vehtari, Simpson, Gelman, Yao and Gabry
/// (2024), JMLR 25(72), for the prior, the number of values and 30 points more in the grid.
///
/// Error: a relative 1e-9 in shape and scale against the same formulas in another language (`TailIndexTest`).
/// Cost: .04 ms for 95 values, .26 ms for 4,095.
public record TailIndex(double shape, double raw, double scale, int values) {
    /// No tail: the largest values are equal, or are few.
    public static final TailIndex NONE = new TailIndex(Double.NaN, Double.NaN, Double.NaN, 0);

    private static final int GRID = 30;
    private static final double PRIOR_VALUES = 10;
    private static final double PRIOR_SHAPE = .5;

    /// So many values beyond the cut-off, and so many different ones, there must be.
    private static final int FEWEST = 5;

    /// Of the size of the largest value: excesses up to it are rounding.
    private static final double ROUNDING = 1e-12;

    /// Factors are multiplied before a logarithm is taken of them: this many at most, and their binary
    /// exponents.
    private static final int MOST_FACTORS = 32;

    private static final int MOST_EXPONENT = 900;

    public boolean exists() {
        return !Double.isNaN(shape);
    }

    /// How many of `n` values make the tail: `⌈min(n / 5, 3 √n)⌉`.
    public static int length(long n) {
        return (int) Math.ceil(Math.min(.2 * n, 3 * Math.sqrt(n)));
    }

    /// @param falling the largest of the values, the largest first; as many as are kept
    /// @param n of all values
    public static TailIndex of(double[] falling, long n) {
        int length = Math.min(length(n), falling.length - 1);
        if (length < FEWEST || !(falling[0] - falling[length] > ROUNDING * Math.abs(falling[0]))) {
            return NONE;
        }
        double cut = falling[length];
        double[] rising = new double[length];
        int count = 0;
        int different = 0;
        for (int i = length - 1; i >= 0; i--) {
            if (falling[i] > cut) {
                rising[count++] = falling[i] - cut;
                different += falling[i] > falling[i + 1] ? 1 : 0;
            }
        }
        return different < FEWEST ? NONE : fit(Arrays.copyOf(rising, count));
    }

    /// @param rising positive values, the smallest first; not changed
    static TailIndex fit(double[] rising) {
        int n = rising.length;
        double largest = rising[n - 1];
        double[] x = new double[n];
        Arrays.setAll(x, i -> rising[i] / largest);
        double quartile = x[(int) (n / 4.0 + .5) - 1];
        int points = GRID + (int) Math.sqrt(n);
        double[] slopes = new double[points];
        double[] likelihoods = new double[points];
        double[] scratch = new double[n];
        for (int j = 0; j < points; j++) {
            slopes[j] = 1 + (1 - Math.sqrt(points / (j + .5))) / (3 * quartile);
            double shape = meanLog(x, slopes[j], scratch);
            likelihoods[j] = n * (Log.log(-slopes[j] / shape) - shape - 1);
        }
        double slope = mean(slopes, likelihoods);
        double raw = meanLog(x, slope, scratch);
        return Double.isFinite(raw)
                ? new TailIndex(
                        (n * raw + PRIOR_VALUES * PRIOR_SHAPE) / (n + PRIOR_VALUES), raw, -raw / slope * largest, n)
                : NONE;
    }

    /// By the posterior, where every slope was as likely before.
    private static double mean(double[] slopes, double[] likelihoods) {
        double most = Arrays.stream(likelihoods).max().orElseThrow();
        double sum = 0;
        double weight = 0;
        for (int j = 0; j < slopes.length; j++) {
            double w = Exp.exp(likelihoods[j] - most);
            sum += w * slopes[j];
            weight += w;
        }
        return sum / weight;
    }

    /// The mean of `log(1 - slope x)`.
    private static double meanLog(double[] x, double slope, double[] products) {
        int factors = Math.clamp(MOST_EXPONENT / (1 + Math.max(9, Math.getExponent(1 - slope))), 1, MOST_FACTORS);
        int n = Math.ceilDiv(x.length, factors);
        Arrays.fill(products, 0, n, 1);
        for (int from = 0; from < x.length; from += n) {
            int rows = Math.min(n, x.length - from);
            for (int i = 0; i < rows; i++) {
                products[i] *= Math.fma(-slope, x[from + i], 1);
            }
        }
        Log.log(products, products, n);
        double sum = 0;
        for (int i = 0; i < n; i++) {
            sum += products[i];
        }
        return sum / x.length;
    }
}
