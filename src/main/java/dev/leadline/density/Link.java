package dev.leadline.density;

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

    /// Its 1024th root, for shapes from 0 to infinity. Told from its logarithm.
    ///
    /// As smooth as the logarithm, and undone by squaring.
    ROOT {
        @Override
        double tabulated(double log) {
            return root(log);
        }

        @Override
        boolean isSum() {
            return false;
        }

        @Override
        void invert(double[] x, int n, double location, double scale) {
            for (int i = 0; i < n; i++) {
                x[i] = Math.fma(scale, power(x[i]), location);
            }
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
            return isNegative(value);
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
        void invert(double[] x, int n, double location, double scale) {
            for (int i = 0; i < n; i++) {
                double end = Math.max(-Math.signum(x[i]), 0);
                x[i] = Math.fma(scale, end + x[i], location);
            }
        }
    },

    /// For shapes from 0 to 1, the 1024th root of the quantile up to 1/2; beyond, that of what it is less than 1, with
    /// a minus sign. Told from `log(x / (1 - x))`.
    ROOT_OF_ENDS {
        @Override
        double tabulated(double logit) {
            double distance = -(Math.abs(logit) + StrictMath.log1p(StrictMath.exp(-Math.abs(logit))));
            return logit < 0 ? root(distance) : -root(distance);
        }

        @Override
        boolean isBeyond(double value) {
            return isNegative(value);
        }

        /// Less by more than the rounding errors of two powers, so that what follows is not less.
        @Override
        double nearer(double value) {
            return (1 - 0x1p-51) * root(StrictMath.log1p(-power(Math.abs(value))));
        }

        @Override
        boolean isSum() {
            return false;
        }

        @Override
        void invert(double[] x, int n, double location, double scale) {
            for (int i = 0; i < n; i++) {
                double side = Math.signum(x[i]);
                double value = Math.fma(side, power(Math.abs(x[i])), 0.5 - 0.5 * side);
                x[i] = Math.fma(scale, value, location);
            }
        }
    };

    private static final int ROOT_OF = 1024;

    /// The power of what is less is less than half the smallest number.
    private static final double LEAST = StrictMath.pow(2, -1076.0 / ROOT_OF);

    /// A logarithm beyond it, on either side, is that of 0 or infinity as much as the next.
    private static final double FAR = 45_000;

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

    /// From what is tabulated, in `x`, to the quantiles at a location and scale, in place.
    void invert(double[] x, int n, double location, double scale) {
        for (int i = 0; i < n; i++) {
            x[i] = Math.fma(scale, x[i] + added(), location);
        }
    }

    private static double root(double log) {
        return StrictMath.exp(Math.clamp(log, -FAR, FAR) / ROOT_OF);
    }

    /// The 1024th power, monotone to the last bit.
    ///
    /// What would vanish is 0 from the start: processors take several times as long over underflow.
    ///
    /// Error: relative 3e-13, that of the rounding of a root included, in gradual underflow the smallest number
    /// (`LinkTest`).
    private static double power(double root) {
        double kept = root * (0.5 + 0.5 * Math.signum(root - LEAST));
        double y = kept * kept;
        y *= y;
        y *= y;
        y *= y;
        y *= y;
        y *= y;
        y *= y;
        y *= y;
        y *= y;
        return y * y;
    }

    private static boolean isNegative(double value) {
        return Double.doubleToRawLongBits(value) < 0;
    }
}
