package dev.leadline.numeric;

/// The natural logarithm with the same bits on every machine.
///
/// `x = 2^k m` with `m` between `sqrt(1/2)` and `sqrt(2)`; with `f = m - 1` and `s = f / (2 + f)`,
/// `log m = 2 artanh s` from a polynomial in `s^2`, arranged so that `f` itself is the leading term.
///
/// Special values: `log(NaN)` and the logarithm of a negative number are NaN, `log(±0)` is -∞, `log(+∞)` is +∞,
/// `log(1)` is +0. Subnormal arguments are as accurate as the others.
///
/// Error: 0.85 ulp (`LogTest`).
///
/// Source: the arrangement of the terms is that of FDLIBM (Sun Microsystems, 1993), from memory; coefficients are our
/// own minimax fit.
public final class Log {
    private static final long SMALLEST_NORMAL = 0x0010_0000_0000_0000L;
    private static final long LARGEST_FINITE = 0x7fef_ffff_ffff_ffffL;
    private static final long ONE = 0x3ff0_0000_0000_0000L;

    /// Bits of 1 less the bits of `sqrt(1/2)`: shifts the place where the exponent changes to `sqrt(1/2)`.
    private static final long SHIFT = ONE - 0x3fe6_a09e_667f_3bcdL;

    /// With these bits in front, an integer below 2^52 in the mantissa is the double `2^52 + integer`.
    private static final long TWO_52 = 0x4330_0000_0000_0000L;

    private static final double BIAS = 0x1p52 + 1023;

    /// The first 42 bits of `ln 2`: a multiple by an exponent is exact.
    private static final double LN2 = 0.6931471805598903;

    private static final double LN2_TAIL = 5.497923018708371e-14;

    private static final double C1 = 0.6666666666666687;
    private static final double C2 = 0.3999999999966228;
    private static final double C3 = 0.2857142869554265;
    private static final double C4 = 0.2222220282293314;
    private static final double C5 = 0.18183364258027074;
    private static final double C6 = 0.15318765322192887;
    private static final double C7 = 0.1475196837103893;

    private Log() {}

    /// The natural logarithm of one value.
    public static double log(double x) {
        if (x >= Double.MIN_NORMAL && x <= Double.MAX_VALUE) return ofNormal(x, 0);
        if (x == 0) return Double.NEGATIVE_INFINITY;
        if (x > Double.MAX_VALUE) return x;
        if (x > 0) return ofNormal(x * 0x1p54, 54);
        return Double.NaN;
    }

    private static double ofNormal(double x, int scaling) {
        long shifted = Double.doubleToRawLongBits(x) + SHIFT;
        double k = Double.longBitsToDouble(exponent(shifted)) - BIAS - scaling;
        return combine(k, Double.longBitsToDouble(mantissa(shifted)));
    }

    /// The natural logarithm of the first `n` values.
    ///
    /// @param x arguments
    /// @param y results; may be `x`
    public static void log(double[] x, double[] y, int n) {
        Scratch scratch = Scratch.ofThread();
        double[] a = scratch.a;
        for (int from = 0; from < n; from += Scratch.TILE) {
            int m = Math.min(Scratch.TILE, n - from);
            System.arraycopy(x, from, a, 0, m);
            boolean rare = anyRare(a, m);
            tile(a, scratch.b, m);
            if (rare) {
                for (int i = 0; i < m; i++) {
                    if (isRare(Double.doubleToRawLongBits(x[from + i]))) a[i] = log(x[from + i]);
                }
            }
            System.arraycopy(a, 0, y, from, m);
        }
    }

    /// Replaces `a`, all normal and positive, by its logarithm; `t` is overwritten.
    static void tile(double[] a, double[] t, int m) {
        for (int i = 0; i < m; i++) {
            long shifted = Double.doubleToRawLongBits(a[i]) + SHIFT;
            t[i] = Double.longBitsToDouble(exponent(shifted));
            a[i] = Double.longBitsToDouble(mantissa(shifted));
        }
        for (int i = 0; i < m; i++) a[i] = combine(t[i] - BIAS, a[i]);
    }

    private static boolean anyRare(double[] a, int m) {
        long signs = 0;
        for (int i = 0; i < m; i++) {
            long bits = Double.doubleToRawLongBits(a[i]);
            signs |= bits | (bits - SMALLEST_NORMAL) | (LARGEST_FINITE - bits);
        }
        return signs < 0;
    }

    /// Whether the bits are not those of a normal positive number.
    private static boolean isRare(long bits) {
        return bits < SMALLEST_NORMAL || bits > LARGEST_FINITE;
    }

    private static long exponent(long shifted) {
        return (shifted >>> 52) | TWO_52;
    }

    private static long mantissa(long shifted) {
        return (shifted & 0x000f_ffff_ffff_ffffL) + (ONE - SHIFT);
    }

    /// `k ln 2 + log m`.
    private static double combine(double k, double m) {
        double f = m - 1;
        double s = f / (2 + f);
        double z = s * s;
        double p = Math.fma(C7, z, C6);
        p = Math.fma(p, z, C5);
        p = Math.fma(p, z, C4);
        p = Math.fma(p, z, C3);
        p = Math.fma(p, z, C2);
        p = Math.fma(p, z, C1);
        double square = 0.5 * f * f;
        double correction = Math.fma(s, Math.fma(p, z, square), k * LN2_TAIL);
        return Math.fma(k, LN2, f - (square - correction));
    }
}
