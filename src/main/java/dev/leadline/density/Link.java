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

    /// `log(x / (1 - x))`, for shapes from 0 to 1; the smaller of `x` and `1 - x` is computed first.
    LOGIT {
        @Override
        void invert(double[] x, int n) {
            var e = new double[n];
            for (int i = 0; i < n; i++) {
                e[i] = -Math.abs(x[i]);
            }
            Exp.exp(e, e, n);
            for (int i = 0; i < n; i++) {
                long upper = ~(Double.doubleToRawLongBits(x[i]) >> 63);
                x[i] = Math.abs(e[i] / (1 + e[i]) - Double.longBitsToDouble(upper & ONE));
            }
        }
    };

    private static final long ONE = 0x3ff0_0000_0000_0000L;

    /// From the links in `x` to the quantiles, in place.
    abstract void invert(double[] x, int n);
}
