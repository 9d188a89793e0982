package dev.leadline.density;

import dev.leadline.numeric.Log;

/// How far a Poisson mean `a` lies from `x`: `a log(a / x) + x - a`, which is 0 at `x = a` and positive elsewhere. The
/// exponents of gamma and beta densities lose no digits in this form.
///
/// Source: Loader (2000), Fast and accurate computation of binomial probabilities. From memory.
public final class Deviance {
    private Deviance() {}

    /// `a log(a / x) + x - a`.
    ///
    /// @param difference `x - a`, which a caller may know better than the subtraction would
    public static double of(double a, double x, double difference) {
        double u = difference / a;
        return Math.abs(u) < 0.5 ? -a * logOnePlusLess(u) : difference - a * Log.log(x / a);
    }

    /// `log(1 + u) - u` for `|u| <= 1/2`.
    public static double logOnePlusLess(double u) {
        double r = u / (2 + u);
        double square = r * r;
        double sum = 0;
        for (int k = 39; k >= 3; k -= 2) {
            sum = Math.fma(sum, square, 1.0 / k);
        }
        return r * (2 * square * sum - u);
    }
}
