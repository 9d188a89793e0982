package dev.leadline.density;

import dev.leadline.numeric.Exp;
import java.util.function.DoublePredicate;

/// A density of whole numbers, all those of its support: what a family says of a whole number k becomes what a density
/// says of any x.
interface WholeNumbers extends Discrete {
    /// No member has a tail beyond this that a double could hold.
    double FAR = 1e18;

    Normal.Standard NORMAL = new Normal.Standard();

    /// The logarithm of the probability of k, which is in the support.
    double logMass(double k);

    /// `P(X <= k)` for k in the support, below its end.
    double upTo(double k);

    /// `P(X > k)` for k in the support, below its end.
    double beyond(double k);

    /// Near the value that has the normal deviate z: Cornish and Fisher's first correction.
    default double near(double z) {
        double sd = Math.sqrt(variance());
        return sd > 0 ? mean() + sd * (z + skewness() * (z * z - 1) / 6) : mean();
    }

    @Override
    default double next(double x) {
        return x + 1;
    }

    @Override
    default double pdf(double x) {
        return Double.isNaN(x) ? x : isValue(x) ? Exp.exp(logMass(x)) : 0;
    }

    @Override
    default double logPdf(double x) {
        return Double.isNaN(x) ? x : isValue(x) ? logMass(x) : Double.NEGATIVE_INFINITY;
    }

    private boolean isValue(double x) {
        return support().contains(x) && x == Math.rint(x) && x < FAR;
    }

    @Override
    default double cdf(double x) {
        double k = Math.floor(x);
        return k >= support().low() && k < Math.min(support().high(), FAR) ? upTo(k) : ends(x, 0, 1);
    }

    @Override
    default double survival(double x) {
        double k = Math.floor(x);
        return k >= support().low() && k < Math.min(support().high(), FAR) ? beyond(k) : ends(x, 1, 0);
    }

    private double ends(double x, double before, double from) {
        return x < support().low() ? before : Double.isNaN(x) ? x : from;
    }

    @Override
    default double inner(double p) {
        return p <= 0.5 ? smallest(k -> cdf(k) >= p * (1 - ROUNDING), near(NORMAL.quantile(p))) : upperInner(1 - p);
    }

    @Override
    default double upperInner(double q) {
        return q <= 0.5
                ? smallest(k -> survival(k) <= q * (1 + ROUNDING), near(NORMAL.upperQuantile(q)))
                : inner(1 - q);
    }

    /// The smallest value for which something holds that holds for all later ones: by doubled strides from a guess,
    /// then by halving.
    private double smallest(DoublePredicate holds, double guess) {
        double low = support().low();
        double high = support().high();
        double from = Math.min(Math.max(Math.rint(guess), low), high);
        double stride = 1;
        double no;
        double yes;
        if (holds.test(from)) {
            yes = from;
            no = from - 1;
            while (no >= low && holds.test(no)) {
                yes = no;
                stride *= 2;
                no = Math.max(yes - stride, low - 1);
            }
        } else {
            no = from;
            yes = from + 1;
            while (!holds.test(yes)) {
                no = yes;
                stride *= 2;
                yes = Math.min(no + stride, high);
            }
        }
        while (yes - no > 1) {
            double middle = no + Math.floor(0.5 * (yes - no));
            if (holds.test(middle)) {
                yes = middle;
            } else {
                no = middle;
            }
        }
        return yes;
    }
}
