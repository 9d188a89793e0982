package dev.leadline.numeric;

/// The standard normal distribution: density, distribution function and quantile, with the same bits on every machine.
///
/// `Φ(x) = e^(-x^2/2) S(-x/√2) / 2` for `x <= 0`, with [a polynomial for `S`][NormalTail] and half the square carried
/// as a pair of doubles, and `1 - Φ(-x)` above. The upper tail is `cdf(-x)`.
///
/// Special values: `cdf(-∞)` is 0, `cdf(+∞)` is 1, `pdf(±∞)` is 0, NaN gives NaN. `cdf` is subnormal below
/// -37.519 and 0 below -38.486, `pdf` subnormal beyond 37.616 and 0 beyond 38.581. `quantile(0)` is -∞, `quantile(1)`
/// is +∞, outside 0 to 1 it is NaN.
///
/// Error: `cdf` 5 ulp, `pdf` 2 ulp, `quantile` 5 ulp (`NormalTest`).
public final class Normal {
    private static final double ROOT_HALF = 0.7071067811865476;

    /// `1 / sqrt(2 π)`.
    private static final double PEAK = 0.3989422804014327;

    /// Beyond this the density is 0; half its square is not yet too much for the exponential.
    private static final double FAR = 39.5;

    private Normal() {}

    /// The distribution function `Φ` of one value; relatively accurate in the lower tail.
    public static double cdf(double x) {
        double distance = Math.min(Math.abs(x), FAR);
        double half = 0.5 * distance * distance;
        double tail = 0.5 * NormalTail.of(distance * ROOT_HALF, half, Math.fma(0.5 * distance, distance, -half));
        double sign = -Math.copySign(1, x);
        return Math.fma(sign, tail, 0.5 - 0.5 * sign);
    }

    /// The density of one value.
    public static double pdf(double x) {
        double distance = Math.min(Math.abs(x), FAR);
        double half = 0.5 * distance * distance;
        double halfTail = Math.fma(0.5 * distance, distance, -half);
        double t = Math.fma(-half, Exp.PER_LN2, Exp.ROUND);
        long bits = Double.doubleToRawLongBits(t);
        double e = Exp.reduced(-half, -halfTail, t - Exp.ROUND);
        return e * PEAK * Exp.half(bits) * Exp.otherHalf(bits);
    }

    /// The value below which a part `p` of the distribution lies; `±∞` at 0 and 1, NaN outside.
    public static double quantile(double p) {
        return NormalQuantile.quantile(p);
    }

    /// The value above which a part `q` of the distribution lies; as accurate for a tiny `q` as for any.
    public static double upperQuantile(double q) {
        return 0 - NormalQuantile.quantile(q);
    }

    /// [#quantile(double)] of the first `n` values.
    ///
    /// @param p parts, between 0 and 1
    /// @param z results; may be `p`
    public static void quantile(double[] p, double[] z, int n) {
        NormalQuantile.quantile(p, z, n);
    }

    /// [#upperQuantile(double)] of the first `n` values.
    ///
    /// @param q parts, between 0 and 1
    /// @param z results; may be `q`
    public static void upperQuantile(double[] q, double[] z, int n) {
        NormalQuantile.quantile(q, z, n);
        for (int i = 0; i < n; i++) z[i] = 0 - z[i];
    }

    /// `Φ` of the first `n` values.
    ///
    /// @param x arguments
    /// @param y results; may be `x`
    public static void cdf(double[] x, double[] y, int n) {
        Scratch scratch = Scratch.ofThread();
        double[] a = scratch.a;
        double[] b = scratch.b;
        double[] c = scratch.c;
        double[] sign = scratch.e;
        for (int from = 0; from < n; from += Scratch.TILE) {
            int m = Math.min(Scratch.TILE, n - from);
            System.arraycopy(x, from, a, 0, m);
            ErrorFunction.signs(a, sign, m);
            for (int i = 0; i < m; i++) {
                double distance = Math.min(Math.abs(a[i]), FAR);
                double half = 0.5 * distance * distance;
                a[i] = distance * ROOT_HALF;
                b[i] = half;
                c[i] = Math.fma(0.5 * distance, distance, -half);
            }
            NormalTail.tile(a, b, c, scratch.d, m);
            for (int i = 0; i < m; i++) a[i] = Math.fma(-sign[i], 0.5 * a[i], 0.5 + 0.5 * sign[i]);
            System.arraycopy(a, 0, y, from, m);
        }
    }

    /// The density of the first `n` values.
    ///
    /// @param x arguments
    /// @param y results; may be `x`
    public static void pdf(double[] x, double[] y, int n) {
        Scratch scratch = Scratch.ofThread();
        double[] a = scratch.a;
        double[] b = scratch.b;
        double[] c = scratch.c;
        for (int from = 0; from < n; from += Scratch.TILE) {
            int m = Math.min(Scratch.TILE, n - from);
            System.arraycopy(x, from, a, 0, m);
            for (int i = 0; i < m; i++) {
                double distance = Math.min(Math.abs(a[i]), FAR);
                double half = 0.5 * distance * distance;
                double halfTail = Math.fma(0.5 * distance, distance, -half);
                double t = Math.fma(-half, Exp.PER_LN2, Exp.ROUND);
                b[i] = t;
                a[i] = Exp.reduced(-half, -halfTail, t - Exp.ROUND);
            }
            for (int i = 0; i < m; i++) c[i] = Exp.half(Double.doubleToRawLongBits(b[i]));
            for (int i = 0; i < m; i++) b[i] = Exp.otherHalf(Double.doubleToRawLongBits(b[i]));
            for (int i = 0; i < m; i++) a[i] = a[i] * PEAK * c[i] * b[i];
            System.arraycopy(a, 0, y, from, m);
        }
    }
}
