package dev.leadline.density;

import dev.leadline.numeric.Exp;

/// What is tabulated in place of a quantile.
enum Link {
    /// The quantile itself.
    NONE {
        @Override
        void invert(double[] x, int n) {}
    },

    /// Its logarithm, for shapes from 0 to infinity.
    LOG {
        @Override
        void invert(double[] x, int n) {
            Exp.exp(x, x, n);
        }
    },

    /// `log(x / (1 - x))`, for shapes from 0 to 1.
    LOGIT {
        @Override
        void invert(double[] x, int n) {
            for (int i = 0; i < n; i++) {
                x[i] = Math.min(x[i], ONE);
            }
            Exp.exp(x, x, n);
            for (int i = 0; i < n; i++) {
                x[i] /= 1 + x[i];
            }
        }
    };

    /// From here on `e^y / (1 + e^y)` is 1.
    private static final double ONE = 40;

    /// From the links in `x` to the quantiles, in place.
    abstract void invert(double[] x, int n);
}
