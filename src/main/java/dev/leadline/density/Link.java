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
    },

    /// For shapes from 0 to 1, the quantile itself up to 1/2; beyond, what it is less than 1, with a minus sign. So
    /// rounding loses nothing near either end.
    ENDS {
        @Override
        double tabulated(double logit) {
            return logit < 0 ? IncompleteBeta.logistic(logit) : -IncompleteBeta.logistic(-logit);
        }

        @Override
        boolean isBelow(double a, double b) {
            return isBeyond(a) == isBeyond(b) ? a < b : isBeyond(b);
        }

        @Override
        double[] smooth(double[] y) {
            if (isBeyond(y[0]) == isBeyond(y[y.length - 1])) {
                return y;
            }
            var x = y.clone();
            invert(x, x.length);
            return x;
        }

        @Override
        void invert(double[] x, int n) {
            for (int i = 0; i < n; i++) {
                long beyond = Double.doubleToRawLongBits(x[i]) >> 63;
                x[i] += Double.longBitsToDouble(beyond & ONE);
            }
        }

        private static boolean isBeyond(double value) {
            return Double.doubleToRawLongBits(value) < 0;
        }
    };

    private static final long ONE = 0x3ff0_0000_0000_0000L;

    /// What is tabulated, from what a [linked][Linked] shape tells.
    double tabulated(double linked) {
        return linked;
    }

    /// Whether a, which is tabulated, stands for a smaller quantile than b.
    boolean isBelow(double a, double b) {
        return a < b;
    }

    /// What is tabulated at the points of one cell, in one form, so that a polynomial can pass through.
    double[] smooth(double[] y) {
        return y;
    }

    /// From what is tabulated, in `x`, to the quantiles, in place.
    abstract void invert(double[] x, int n);
}
