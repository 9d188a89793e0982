package dev.leadline.numeric;

/// The exponential function, `e^x`, with the same bits on every machine.
///
/// `x = k ln 2 + r` with `|r| <= ln(2)/2` by two fused Cody-Waite steps, a polynomial of degree 11 for `e^r` whose
/// first two terms are added without rounding error, then two multiplications by powers of two whose product is `2^k`;
/// only the second can round.
///
/// Special values: `exp(NaN)` is NaN, `exp(-∞)` is 0, `exp(+∞)` is +∞, `exp(±0)` is 1; above 709.7827 the result is
/// +∞, below -745.1332 it is 0, between there and -708.3964 it is subnormal.
///
/// Error: 0.7 ulp, in gradual underflow 0.8 of the smallest subnormal (`ExpTest`).
///
/// Source: method of Cody and Waite (1980), Software Manual for the Elementary Functions; coefficients are our own
/// minimax fit.
public final class Exp {
    /// Adding this to a double of modest size rounds it to an integer, which then stands in the low mantissa bits.
    static final double ROUND = 0x1.8p52;

    static final double PER_LN2 = 1.4426950408889634;
    private static final double LN2 = 0x1.62e42fefa39efp-1;
    private static final double LN2_TAIL = 0x1.abc9e3b39803fp-56;

    /// Beyond these the result is 0 or infinite whatever follows.
    private static final double LOWEST = -746;

    private static final double HIGHEST = 710;

    /// Up to this magnitude the result is normal.
    private static final long TAME = Double.doubleToRawLongBits(708);

    private static final double C3 = 0.16666666666666674;
    private static final double C4 = 0.041666666666604964;
    private static final double C5 = 0.008333333333320115;
    private static final double C6 = 0.0013888888926488945;
    private static final double C7 = 0.00019841269894142437;
    private static final double C8 = 2.4801508986022504e-05;
    private static final double C9 = 2.755723412085881e-06;
    private static final double C10 = 2.762508907320238e-07;
    private static final double C11 = 2.5112906174795947e-08;

    private static final long ONE = 0x3ff0_0000_0000_0000L;

    private Exp() {}

    /// `e^x` of one value.
    public static double exp(double x) {
        double inside = clamp(x);
        double t = Math.fma(inside, PER_LN2, ROUND);
        long bits = Double.doubleToRawLongBits(t);
        return reduced(inside, t - ROUND) * half(bits) * otherHalf(bits);
    }

    /// `e^x` of the first `n` values.
    ///
    /// @param x arguments
    /// @param y results; may be `x`
    public static void exp(double[] x, double[] y, int n) {
        Scratch scratch = Scratch.ofThread();
        for (int from = 0; from < n; from += Scratch.TILE) {
            int m = Math.min(Scratch.TILE, n - from);
            System.arraycopy(x, from, scratch.a, 0, m);
            tile(scratch.a, scratch.b, scratch.c, m);
            System.arraycopy(scratch.a, 0, y, from, m);
        }
    }

    /// Replaces `a` by `e^a`; `t` and `u` are overwritten.
    static void tile(double[] a, double[] t, double[] u, int m) {
        if (anyExtreme(a, m)) {
            extremeTile(a, t, u, m);
            return;
        }
        for (int i = 0; i < m; i++) {
            double shifted = Math.fma(a[i], PER_LN2, ROUND);
            t[i] = shifted;
            a[i] = reduced(a[i], shifted - ROUND);
        }
        for (int i = 0; i < m; i++) {
            long k = Double.doubleToRawLongBits(t[i]) << 52;
            a[i] = Double.longBitsToDouble(Double.doubleToRawLongBits(a[i]) + k);
        }
    }

    /// The same where some results may be zero, subnormal, infinite or NaN.
    private static void extremeTile(double[] a, double[] t, double[] u, int m) {
        for (int i = 0; i < m; i++) {
            double inside = clamp(a[i]);
            double shifted = Math.fma(inside, PER_LN2, ROUND);
            t[i] = shifted;
            a[i] = reduced(inside, shifted - ROUND);
        }
        for (int i = 0; i < m; i++) u[i] = otherHalf(Double.doubleToRawLongBits(t[i]));
        for (int i = 0; i < m; i++) t[i] = half(Double.doubleToRawLongBits(t[i]));
        for (int i = 0; i < m; i++) a[i] = a[i] * t[i] * u[i];
    }

    private static boolean anyExtreme(double[] a, int m) {
        long signs = 0;
        for (int i = 0; i < m; i++) signs |= TAME - (Double.doubleToRawLongBits(a[i]) & Long.MAX_VALUE);
        return signs < 0;
    }

    private static double clamp(double x) {
        return Math.max(LOWEST, Math.min(HIGHEST, x));
    }

    /// `e^(x - k ln 2)`, the difference carried to twice the working precision.
    private static double reduced(double x, double k) {
        double r1 = Math.fma(k, -LN2, x);
        double r = Math.fma(k, -LN2_TAIL, r1);
        double tail = Math.fma(k, -LN2_TAIL, r1 - r);
        double high = 1 + r;
        return high + Math.fma(r * r, series(r), Math.fma(tail, high, (1 - high) + r));
    }

    /// `e^(x + xTail - k ln 2)`, where `xTail` may be so large that only its square is negligible.
    static double reduced(double x, double xTail, double k) {
        double r1 = Math.fma(k, -LN2, x);
        double r = Math.fma(k, -LN2_TAIL, r1);
        double tail = Math.fma(k, -LN2_TAIL, r1 - r) + xTail;
        double high = 1 + r;
        double low = Math.fma(r * r, series(r), (1 - high) + r);
        return high + Math.fma(tail, high + low, low);
    }

    /// `(e^r - 1 - r) / r^2` for `|r| <= ln(2)/2`.
    private static double series(double r) {
        double p = Math.fma(C11, r, C10);
        p = Math.fma(p, r, C9);
        p = Math.fma(p, r, C8);
        p = Math.fma(p, r, C7);
        p = Math.fma(p, r, C6);
        p = Math.fma(p, r, C5);
        p = Math.fma(p, r, C4);
        p = Math.fma(p, r, C3);
        return Math.fma(p, r, 0.5);
    }

    /// `2^floor(k/2)`, where `k` stands in the low bits.
    static double half(long bits) {
        return Double.longBitsToDouble(((bits >>> 1) << 52) + ONE);
    }

    /// `2^(k - floor(k/2))`.
    static double otherHalf(long bits) {
        return Double.longBitsToDouble(((bits - (bits >>> 1)) << 52) + ONE);
    }
}
