package dev.leadline.density;

import dev.leadline.numeric.Exp2;

/// What is tabulated in place of a quantile.
enum Link {
    /// The quantile itself.
    NONE {
        @Override
        double tabulated(double linked) {
            throw new IllegalStateException();
        }
    },

    /// What it is more than 1, for shapes so narrow around 1 that rounding would spoil it. Told from its logarithm.
    ABOVE_ONE {
        @Override
        double tabulated(double log) {
            return StrictMath.expm1(log);
        }

        @Override
        double added() {
            return 1;
        }
    },

    /// Its binary logarithm, for shapes from 0 to infinity. Told from the natural one.
    LOG {
        @Override
        double tabulated(double log) {
            return Math.clamp(log / LN2, -FAR, FAR);
        }

        @Override
        boolean isSum() {
            return false;
        }

        @Override
        void invert(double[] x, int n, Columns columns) {
            Exp2.exp2(x, columns.a(), n);
        }
    },

    /// For shapes from 0 to 1, the quantile itself up to 1/2; beyond, what it is less than 1, with a minus sign. So
    /// rounding loses nothing near either end. Told from `log(x / (1 - x))`.
    ENDS {
        @Override
        double tabulated(double logit) {
            return logit < 0 ? IncompleteBeta.logistic(logit) : -IncompleteBeta.logistic(-logit);
        }

        @Override
        boolean isBeyond(double value) {
            return Double.doubleToRawLongBits(value) < 0;
        }

        @Override
        double nearer(double value) {
            return 1 + value;
        }

        @Override
        boolean isSum() {
            return false;
        }

        @Override
        void invert(double[] x, int n, Columns columns) {
            for (int i = 0; i < n; i++) {
                long beyond = Double.doubleToRawLongBits(x[i]) >> 63;
                x[i] += Double.longBitsToDouble(beyond & ONE);
            }
        }
    },

    /// For shapes from 0 to 1, the binary logarithm of the quantile up to 1/2; beyond, that of what it is less than 1,
    /// with the other sign. Told from `log(x / (1 - x))`.
    LOG_OF_ENDS {
        @Override
        double tabulated(double logit) {
            double distance = Math.abs(logit) + StrictMath.log1p(StrictMath.exp(-Math.abs(logit)));
            double log = Math.min(distance / LN2, FAR);
            return logit < 0 ? -log : log;
        }

        @Override
        boolean isBeyond(double value) {
            return Double.doubleToRawLongBits(value) >= 0;
        }

        @Override
        double nearer(double value) {
            return StrictMath.log1p(-StrictMath.exp(-value * LN2)) / LN2;
        }

        @Override
        boolean isSum() {
            return false;
        }

        @Override
        void invert(double[] x, int n, Columns columns) {
            double[] distance = columns.b();
            for (int i = 0; i < n; i++) {
                distance[i] = -Math.abs(x[i]);
            }
            Exp2.exp2(distance, columns.a(), n);
            for (int i = 0; i < n; i++) {
                double end = Math.signum(x[i]);
                x[i] = Math.fma(-end, distance[i], 0.5 * (1 + end));
            }
        }
    };

    private static final double LN2 = 0x1.62e42fefa39efp-1;

    /// A binary logarithm beyond it, on either side, is that of 0 or infinity as much as the next.
    private static final double FAR = 65_000;

    private static final long ONE = 0x3ff0_0000_0000_0000L;

    /// What is tabulated, from what a [linked][Linked] shape tells.
    abstract double tabulated(double linked);

    /// Whether a value is counted from the upper end.
    boolean isBeyond(double value) {
        return false;
    }

    /// A value that is counted from the upper end, as it were counted from the lower one.
    double nearer(double value) {
        return value;
    }

    /// Whether a, which is tabulated, stands for a smaller quantile than b.
    final boolean isBelow(double a, double b) {
        return isBeyond(a) == isBeyond(b) ? a < b : isBeyond(b);
    }

    /// What is tabulated at the points of one cell, in one form, so that a polynomial can pass through.
    final double[] smooth(double[] y) {
        var smooth = y.clone();
        if (isBeyond(y[0]) != isBeyond(y[y.length - 1])) {
            for (int i = 0; i < y.length; i++) {
                smooth[i] = isBeyond(y[i]) ? nearer(y[i]) : y[i];
            }
        }
        return smooth;
    }

    /// Whether the quantile is what is tabulated and [#added].
    boolean isSum() {
        return true;
    }

    double added() {
        return 0;
    }

    /// From what is tabulated, in `x`, to the quantiles, in place.
    void invert(double[] x, int n, Columns columns) {
        for (int i = 0; i < n; i++) {
            x[i] += added();
        }
    }
}
