package dev.leadline.numeric;

/// Sine, cosine and tangent of an angle in radians, with the same bits on every machine.
///
/// `x = n π + r` with `|r| <= π/2` and `n` an integer (sine) or half an odd integer (cosine), `r` carried to twice the
/// working precision; then one odd polynomial whose first two terms are added without rounding error, and a sign.
/// Beyond `|x| = 2^28` the values are those of [StrictMath].
///
/// Special values: an infinite or NaN argument gives NaN; `sin(±0)` and `tan(±0)` are `±0`; `cos(±0)` is 1.
///
/// Error: sine and cosine 0.85 ulp to `|x| = 2^28`, 1 ulp beyond; tangent 2 ulp (`TrigonometryTest`).
///
/// Source: reduction after Cody and Waite (1980), Software Manual for the Elementary Functions, with fused steps;
/// coefficients are our own minimax fit.
public final class Trigonometry {
    private static final double LARGEST = 0x1p28;
    private static final long LARGEST_BITS = Double.doubleToRawLongBits(LARGEST);
    private static final long MAGNITUDE = Long.MAX_VALUE;

    private static final double PER_PI = 0.3183098861837907;

    /// `π` as the sum of three doubles.
    private static final double PI_1 = 3.141592653589793;

    private static final double PI_2 = 1.2246467991473532e-16;
    private static final double PI_3 = -2.9947698097183397e-33;

    /// One sixth as the sum of two doubles.
    private static final double SIXTH = 0.16666666666666666;

    private static final double SIXTH_TAIL = 9.25185853854297e-18;

    private static final double C5 = 0.008333333333333328;
    private static final double C7 = -0.00019841269841257725;
    private static final double C9 = 2.755731921919471e-06;
    private static final double C11 = -2.505210758004603e-08;
    private static final double C13 = 1.6058973671073846e-10;
    private static final double C15 = -7.643835618636701e-13;
    private static final double C17 = 2.7296701908427476e-15;

    private Trigonometry() {}

    /// Sine of one value.
    public static double sin(double x) {
        if (isRare(Double.doubleToRawLongBits(x))) return x == 0 ? x : StrictMath.sin(x);
        double t = Math.fma(x, PER_PI, Exp.ROUND);
        double n = t - Exp.ROUND;
        return flip(reducedSine(n, x), t);
    }

    /// Cosine of one value.
    public static double cos(double x) {
        if (isRare(Double.doubleToRawLongBits(x))) return x == 0 ? 1 : StrictMath.cos(x);
        double t = Math.fma(x, PER_PI, -0.5) + Exp.ROUND;
        double n = (t - Exp.ROUND) + 0.5;
        return flip(-reducedSine(n, x), t);
    }

    /// Tangent of one value.
    public static double tan(double x) {
        return sin(x) / cos(x);
    }

    /// Sine of the first `n` values.
    ///
    /// @param x arguments
    /// @param y results; may be `x`
    public static void sin(double[] x, double[] y, int n) {
        Scratch scratch = Scratch.ofThread();
        double[] a = scratch.a;
        for (int from = 0; from < n; from += Scratch.TILE) {
            int m = Math.min(Scratch.TILE, n - from);
            System.arraycopy(x, from, a, 0, m);
            sineTile(a, scratch.b, m);
            System.arraycopy(a, 0, y, from, m);
        }
    }

    /// Cosine of the first `n` values.
    ///
    /// @param x arguments
    /// @param y results; may be `x`
    public static void cos(double[] x, double[] y, int n) {
        Scratch scratch = Scratch.ofThread();
        double[] a = scratch.a;
        for (int from = 0; from < n; from += Scratch.TILE) {
            int m = Math.min(Scratch.TILE, n - from);
            System.arraycopy(x, from, a, 0, m);
            cosineTile(a, scratch.b, m);
            System.arraycopy(a, 0, y, from, m);
        }
    }

    /// Tangent of the first `n` values.
    ///
    /// @param x arguments
    /// @param y results; may be `x`
    public static void tan(double[] x, double[] y, int n) {
        Scratch scratch = Scratch.ofThread();
        double[] a = scratch.a;
        double[] c = scratch.c;
        for (int from = 0; from < n; from += Scratch.TILE) {
            int m = Math.min(Scratch.TILE, n - from);
            System.arraycopy(x, from, a, 0, m);
            System.arraycopy(x, from, c, 0, m);
            sineTile(a, scratch.b, m);
            cosineTile(c, scratch.b, m);
            for (int i = 0; i < m; i++) a[i] = a[i] / c[i];
            System.arraycopy(a, 0, y, from, m);
        }
    }

    private static void sineTile(double[] a, double[] t, int m) {
        if (anyRare(a, m)) {
            for (int i = 0; i < m; i++) a[i] = sin(a[i]);
            return;
        }
        for (int i = 0; i < m; i++) {
            double shifted = Math.fma(a[i], PER_PI, Exp.ROUND);
            double n = shifted - Exp.ROUND;
            t[i] = shifted;
            a[i] = reducedSine(n, a[i]);
        }
        for (int i = 0; i < m; i++) a[i] = flip(a[i], t[i]);
    }

    private static void cosineTile(double[] a, double[] t, int m) {
        if (anyRare(a, m)) {
            for (int i = 0; i < m; i++) a[i] = cos(a[i]);
            return;
        }
        for (int i = 0; i < m; i++) {
            double shifted = Math.fma(a[i], PER_PI, -0.5) + Exp.ROUND;
            double n = (shifted - Exp.ROUND) + 0.5;
            t[i] = shifted;
            a[i] = -reducedSine(n, a[i]);
        }
        for (int i = 0; i < m; i++) a[i] = flip(a[i], t[i]);
    }

    private static boolean anyRare(double[] a, int m) {
        long signs = 0;
        for (int i = 0; i < m; i++) {
            long magnitude = Double.doubleToRawLongBits(a[i]) & MAGNITUDE;
            signs |= (LARGEST_BITS - magnitude) | (magnitude - 1);
        }
        return signs < 0;
    }

    /// Whether the bits are those of a zero or lie beyond the reduction.
    private static boolean isRare(long bits) {
        long magnitude = bits & MAGNITUDE;
        return magnitude == 0 || magnitude > LARGEST_BITS;
    }

    /// `-value` where the lowest bit of `counter` is set, else `value`.
    private static double flip(double value, double counter) {
        return Double.longBitsToDouble(Double.doubleToRawLongBits(value) ^ (Double.doubleToRawLongBits(counter) << 63));
    }

    /// `sin(x - n π)`, where that difference is at most `π/2` in magnitude.
    private static double reducedSine(double n, double x) {
        double r1 = Math.fma(n, -PI_1, x);
        double lost = x - Math.fma(n, PI_1, r1);
        // r1 may all but cancel against this product, so the product is carried exactly
        double product = n * PI_2;
        double r = r1 - product;
        double tail = Math.fma(n, -PI_3, ((r1 - r) - product) - Math.fma(n, PI_2, -product)) + lost;

        double z = r * r;
        double u = r * z;
        double uTail = Math.fma(r, Math.fma(r, r, -z), Math.fma(r, z, -u));
        double high = Math.fma(u, -SIXTH, r);
        double low = Math.fma(u, -SIXTH, r - high);

        double p = Math.fma(C17, z, C15);
        p = Math.fma(p, z, C13);
        p = Math.fma(p, z, C11);
        p = Math.fma(p, z, C9);
        p = Math.fma(p, z, C7);
        p = Math.fma(p, z, C5);
        p = Math.fma(p, z, -SIXTH_TAIL);
        low = Math.fma(u, p, low);
        low = Math.fma(uTail, -SIXTH, low);
        // cos r to two digits is enough for the tail
        low = Math.fma(tail, Math.fma(z, Math.fma(z, 0.0384, -0.5), 1), low);
        return high + low;
    }
}
