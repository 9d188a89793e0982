package dev.leadline.numeric;

/// The error function and its complement, with the same bits on every machine.
///
/// `erfc(x) = e^(-x^2) S(x)` for `x >= 0`, with [a polynomial for `S`][NormalTail] and the square carried as a pair of
/// doubles; `erf` is an odd polynomial below 1 and `1 - erfc` above.
///
/// Special values: `erf(±0)` is `±0`, `erf(±∞)` is ±1, `erfc(+∞)` is 0, `erfc(-∞)` is 2, NaN gives NaN. `erfc` is
/// subnormal from 26.5433 on and 0 from 27.2265 on.
///
/// Error: `erf` 2 ulp, `erfc` 5 ulp, `erfcx` 5 ulp where `x >= 0` (`ErrorFunctionTest`).
public final class ErrorFunction {
    private static final long SIGN = Long.MIN_VALUE;
    private static final long ONE = 0x3ff0_0000_0000_0000L;

    private static final double PER_ROOT_PI = 0.5641895835477563;

    private static final double C0 = 1.1283791670955126;
    private static final double C1 = -0.3761263890318355;
    private static final double C2 = 0.11283791670945252;
    private static final double C3 = -0.026866170643275983;
    private static final double C4 = 0.005223977607421778;
    private static final double C5 = -0.0008548325989628574;
    private static final double C6 = 0.00012055295318818887;
    private static final double C7 = -1.492474463738959e-05;
    private static final double C8 = 1.6447517425080417e-06;
    private static final double C9 = -1.6209174424050597e-07;
    private static final double C10 = 1.3722971515330743e-08;
    private static final double C11 = -7.801182742825681e-10;

    private ErrorFunction() {}

    /// The error function of one value.
    public static double erf(double x) {
        double distance = Math.abs(x);
        return distance < 1 ? near(x) : Math.copySign(1 - tail(distance), x);
    }

    /// One less the error function of one value, accurate where that difference is small.
    public static double erfc(double x) {
        double sign = Math.copySign(1, x);
        return Math.fma(sign, tail(Math.abs(x)), 1 - sign);
    }

    /// `e^(x^2) erfc(x)`, without overflow or underflow where `x >= 0`.
    public static double erfcx(double x) {
        if (x < 0) return 2 * Exp.exp(x * x) - erfcx(-x);
        if (x <= NormalTail.FAR || Double.isNaN(x)) return NormalTail.of(x, 0, 0);
        double half = 0.5 / (x * x);
        double series = 1 - half * (1 - 3 * half * (1 - 5 * half * (1 - 7 * half * (1 - 9 * half))));
        return PER_ROOT_PI / x * series;
    }

    /// The error function of the first `n` values.
    ///
    /// @param x arguments
    /// @param y results; may be `x`
    public static void erf(double[] x, double[] y, int n) {
        Scratch scratch = Scratch.ofThread();
        double[] a = scratch.a;
        double[] near = scratch.e;
        for (int from = 0; from < n; from += Scratch.TILE) {
            int m = Math.min(Scratch.TILE, n - from);
            System.arraycopy(x, from, a, 0, m);
            for (int i = 0; i < m; i++) near[i] = near(a[i]);
            tailTile(scratch, m);
            for (int i = 0; i < m; i++) a[i] = 1 - a[i];
            System.arraycopy(x, from, scratch.b, 0, m);
            select(a, near, scratch.b, m);
            System.arraycopy(a, 0, y, from, m);
        }
    }

    /// One less the error function of the first `n` values.
    ///
    /// @param x arguments
    /// @param y results; may be `x`
    public static void erfc(double[] x, double[] y, int n) {
        Scratch scratch = Scratch.ofThread();
        double[] a = scratch.a;
        double[] sign = scratch.e;
        for (int from = 0; from < n; from += Scratch.TILE) {
            int m = Math.min(Scratch.TILE, n - from);
            System.arraycopy(x, from, a, 0, m);
            signs(a, sign, m);
            tailTile(scratch, m);
            for (int i = 0; i < m; i++) a[i] = Math.fma(sign[i], a[i], 1 - sign[i]);
            System.arraycopy(a, 0, y, from, m);
        }
    }

    /// `sign` becomes 1 with the sign of `x`.
    static void signs(double[] x, double[] sign, int m) {
        for (int i = 0; i < m; i++) {
            sign[i] = Double.longBitsToDouble((Double.doubleToRawLongBits(x[i]) & SIGN) | ONE);
        }
    }

    /// `erf` for magnitudes below 1.
    private static double near(double x) {
        double z = x * x;
        double p = Math.fma(C11, z, C10);
        p = Math.fma(p, z, C9);
        p = Math.fma(p, z, C8);
        p = Math.fma(p, z, C7);
        p = Math.fma(p, z, C6);
        p = Math.fma(p, z, C5);
        p = Math.fma(p, z, C4);
        p = Math.fma(p, z, C3);
        p = Math.fma(p, z, C2);
        p = Math.fma(p, z, C1);
        return x * Math.fma(p, z, C0);
    }

    private static double tail(double distance) {
        double x = Math.min(distance, NormalTail.FAR);
        double square = x * x;
        return NormalTail.of(x, square, Math.fma(x, x, -square));
    }

    /// Replaces `a` of the scratch by `erfc` of its magnitude; `b`, `c` and `d` are overwritten.
    private static void tailTile(Scratch scratch, int m) {
        double[] a = scratch.a;
        double[] b = scratch.b;
        double[] c = scratch.c;
        for (int i = 0; i < m; i++) {
            double x = Math.min(Math.abs(a[i]), NormalTail.FAR);
            double square = x * x;
            a[i] = x;
            b[i] = square;
            c[i] = Math.fma(x, x, -square);
        }
        NormalTail.tile(a, b, c, scratch.d, m);
    }

    /// `far` with the sign of `x` where `x` is 1 or more in magnitude, else `near`; left in `far`.
    private static void select(double[] far, double[] near, double[] x, int m) {
        for (int i = 0; i < m; i++) {
            long bits = Double.doubleToRawLongBits(x[i]);
            long isNear = -(((bits & ~SIGN) - ONE) >>> 63); // all ones or all zeros
            long signed = Double.doubleToRawLongBits(far[i]) | (bits & SIGN);
            far[i] = Double.longBitsToDouble((Double.doubleToRawLongBits(near[i]) & isNear) | (signed & ~isNear));
        }
    }
}
