package dev.leadline.numeric;

import java.util.Arrays;

/// Powers, `x^y`, with the same bits on every machine and by every route: one value, a block, a block with a constant
/// exponent.
///
/// The logarithm is carried to about 66 bits (`log m = 2 s + 2/3 s^3 + …` with the first two terms as pairs of
/// doubles), multiplied by the exponent without rounding and handed to the exponential as a pair. Exponents that are
/// whole numbers to 16 in magnitude are products instead, carried as pairs, and exponent 1/2 is the square root; these
/// are faster, and every route uses them.
///
/// Special values are those of [Math#pow]: `x^0` is 1 even for NaN, otherwise a NaN gives NaN; a negative number to a
/// power that is not whole gives NaN; `(±1)^±∞` is NaN.
///
/// Error: 0.8 ulp; whole exponents to 16 in magnitude 0.51 ulp for bases from 2^-63 to 2^63 (`PowerTest`).
///
/// Source: arrangement and coefficients are our own; the pairs follow Dekker (1971), Numerische Mathematik 18,
/// 224-242, with fused multiplication.
public final class Power {
    private static final long ONE = 0x3ff0_0000_0000_0000L;
    private static final long SMALLEST_NORMAL = 0x0010_0000_0000_0000L;
    private static final long LARGEST_FINITE = 0x7fef_ffff_ffff_ffffL;

    /// As in [Log]: the place where the exponent changes, moved from 1 to `sqrt(1/2)`.
    private static final long SHIFT = ONE - 0x3fe6_a09e_667f_3bcdL;

    private static final long TWO_52 = 0x4330_0000_0000_0000L;
    private static final double BIAS = 0x1p52 + 1023;

    private static final double LN2 = 0.6931471805598903;
    private static final double LN2_TAIL = 5.497923018708371e-14;

    private static final double TWO_THIRDS = 0.6666666666666666;
    private static final double TWO_THIRDS_TAIL = 3.700743415417188e-17;
    private static final double C5 = 0.4000000000000128;
    private static final double C7 = 0.28571428570492347;
    private static final double C9 = 0.22222222458877042;
    private static final double C11 = 0.18181789127756634;
    private static final double C13 = 0.1538655861380651;
    private static final double C15 = 0.13261063052797079;
    private static final double C17 = 0.1315983090374653;

    /// Whole exponents up to this are products.
    private static final int LARGEST_PRODUCT = 16;

    /// Products of up to sixteen factors between these limits, and their reciprocals, are normal.
    private static final double LARGEST_FACTOR = 0x1p63;

    private static final double SMALLEST_FACTOR = 0x1p-63;
    private static final long LARGEST_FACTOR_BITS = Double.doubleToRawLongBits(LARGEST_FACTOR);
    private static final long SMALLEST_FACTOR_BITS = Double.doubleToRawLongBits(SMALLEST_FACTOR);

    /// Up to this magnitude of `y log x` the result is normal.
    private static final double TAME = 708;

    private static final long TAME_BITS = Double.doubleToRawLongBits(TAME);

    private Power() {}

    /// `x^y` of one pair.
    public static double pow(double x, double y) {
        if (y == 0.5) return root(x);
        return isProduct(y) ? product(x, (int) y) : general(x, y);
    }

    /// `x^y` of the first `n` pairs.
    ///
    /// @param x bases
    /// @param y exponents
    /// @param z results; may be `x` or `y`
    public static void pow(double[] x, double[] y, double[] z, int n) {
        Scratch scratch = Scratch.ofThread();
        for (int from = 0; from < n; from += Scratch.TILE) {
            int m = Math.min(Scratch.TILE, n - from);
            System.arraycopy(x, from, scratch.a, 0, m);
            System.arraycopy(y, from, scratch.b, 0, m);
            boolean reducible = anyHalfWhole(scratch.b, scratch.c, m);
            boolean rare = generalTile(scratch, m);
            if (reducible || rare) {
                for (int i = 0; i < m; i++) {
                    double base = x[from + i];
                    double exponent = y[from + i];
                    if (exponent == 0.5 || isProduct(exponent) || isRare(base, scratch.d[i])) {
                        scratch.a[i] = pow(base, exponent);
                    }
                }
            }
            System.arraycopy(scratch.a, 0, z, from, m);
        }
    }

    /// The same power of the first `n` values.
    ///
    /// @param x bases
    /// @param exponent the one exponent
    /// @param z results; may be `x`
    public static void pow(double[] x, double exponent, double[] z, int n) {
        if (exponent == 0.5) {
            rootBlock(x, z, n);
        } else if (isProduct(exponent)) {
            productBlock(x, (int) exponent, z, n);
        } else {
            generalBlock(x, exponent, z, n);
        }
    }

    private static void generalBlock(double[] x, double exponent, double[] z, int n) {
        Scratch scratch = Scratch.ofThread();
        for (int from = 0; from < n; from += Scratch.TILE) {
            int m = Math.min(Scratch.TILE, n - from);
            System.arraycopy(x, from, scratch.a, 0, m);
            Arrays.fill(scratch.b, 0, m, exponent);
            if (generalTile(scratch, m)) {
                for (int i = 0; i < m; i++) {
                    if (isRare(x[from + i], scratch.d[i])) scratch.a[i] = general(x[from + i], exponent);
                }
            }
            System.arraycopy(scratch.a, 0, z, from, m);
        }
    }

    // whole exponents and the square root

    private static boolean isProduct(double y) {
        return y == Math.rint(y) && Math.abs(y) <= LARGEST_PRODUCT;
    }

    /// `+0` for `-0` and `+∞` for `-∞`, unlike the square root.
    private static double root(double x) {
        return x == Double.NEGATIVE_INFINITY ? Double.POSITIVE_INFINITY : Math.sqrt(x) + 0.0;
    }

    private static void rootBlock(double[] x, double[] z, int n) {
        long signs = 0;
        for (int i = 0; i < n; i++) signs |= Double.doubleToRawLongBits(x[i]);
        if (signs < 0) {
            for (int i = 0; i < n; i++) z[i] = root(x[i]);
        } else {
            for (int i = 0; i < n; i++) z[i] = Math.sqrt(x[i]) + 0.0;
        }
    }

    private static double product(double x, int k) {
        switch (k) {
            case 0:
                return 1;
            case 1:
                return x;
            case 2:
                return x * x;
            case -1:
                return 1 / x;
            default:
        }
        if (!(Math.abs(x) <= LARGEST_FACTOR && Math.abs(x) >= SMALLEST_FACTOR)) return general(x, k);
        int size = Math.abs(k);
        double high = x;
        double low = 0;
        for (int bit = Integer.highestOneBit(size) >> 1; bit != 0; bit >>= 1) {
            double square = high * high;
            low = squareTail(high, low, square);
            high = square;
            if ((size & bit) != 0) {
                double next = high * x;
                low = productTail(high, low, x, next);
                high = next;
            }
        }
        return k > 0 ? high + low : reciprocal(high, low);
    }

    private static void productBlock(double[] x, int k, double[] z, int n) {
        switch (k) {
            case 0:
                Arrays.fill(z, 0, n, 1);
                return;
            case 1:
                System.arraycopy(x, 0, z, 0, n);
                return;
            case 2:
                for (int i = 0; i < n; i++) z[i] = x[i] * x[i];
                return;
            case -1:
                for (int i = 0; i < n; i++) z[i] = 1 / x[i];
                return;
            default:
        }
        Scratch scratch = Scratch.ofThread();
        for (int from = 0; from < n; from += Scratch.TILE) {
            int m = Math.min(Scratch.TILE, n - from);
            System.arraycopy(x, from, scratch.a, 0, m);
            boolean rare = anyBeyondFactors(scratch.a, m);
            productTile(scratch.a, k, scratch.b, scratch.c, m);
            if (rare) {
                for (int i = 0; i < m; i++) {
                    double magnitude = Math.abs(scratch.a[i]);
                    if (!(magnitude <= LARGEST_FACTOR && magnitude >= SMALLEST_FACTOR)) {
                        scratch.b[i] = general(scratch.a[i], k);
                    }
                }
            }
            System.arraycopy(scratch.b, 0, z, from, m);
        }
    }

    /// Leaves `x^k` in `high`.
    private static void productTile(double[] x, int k, double[] high, double[] low, int m) {
        int size = Math.abs(k);
        System.arraycopy(x, 0, high, 0, m);
        Arrays.fill(low, 0, m, 0);
        for (int bit = Integer.highestOneBit(size) >> 1; bit != 0; bit >>= 1) {
            for (int i = 0; i < m; i++) {
                double square = high[i] * high[i];
                low[i] = squareTail(high[i], low[i], square);
                high[i] = square;
            }
            if ((size & bit) == 0) continue;
            for (int i = 0; i < m; i++) {
                double next = high[i] * x[i];
                low[i] = productTail(high[i], low[i], x[i], next);
                high[i] = next;
            }
        }
        if (k > 0) {
            for (int i = 0; i < m; i++) high[i] = high[i] + low[i];
        } else {
            for (int i = 0; i < m; i++) high[i] = reciprocal(high[i], low[i]);
        }
    }

    private static double squareTail(double high, double low, double square) {
        return Math.fma(2 * high, low, Math.fma(high, high, -square));
    }

    private static double productTail(double high, double low, double x, double product) {
        return Math.fma(low, x, Math.fma(high, x, -product));
    }

    private static double reciprocal(double high, double low) {
        double q = 1 / high;
        return Math.fma(q, Math.fma(-q, low, Math.fma(-q, high, 1)), q);
    }

    private static boolean anyBeyondFactors(double[] x, int m) {
        long signs = 0;
        for (int i = 0; i < m; i++) {
            long magnitude = Double.doubleToRawLongBits(x[i]) & Long.MAX_VALUE;
            signs |= (LARGEST_FACTOR_BITS - magnitude) | (magnitude - SMALLEST_FACTOR_BITS);
        }
        return signs < 0;
    }

    private static boolean anyHalfWhole(double[] y, double[] t, int m) {
        for (int i = 0; i < m; i++) {
            double twice = 2 * y[i];
            t[i] = ((twice + Exp.ROUND) - Exp.ROUND) - twice;
        }
        long signs = 0;
        for (int i = 0; i < m; i++) signs |= (Double.doubleToRawLongBits(t[i]) & Long.MAX_VALUE) - 1;
        return signs < 0;
    }

    // any exponent

    private static double general(double x, double y) {
        if (Double.isNaN(x) || Double.isNaN(y)) return Double.NaN;
        if (y == 0) return 1;
        double base = Math.abs(x);
        boolean negative = Double.doubleToRawLongBits(x) < 0;
        if (negative && base > 0 && base <= Double.MAX_VALUE && y != Math.rint(y)) return Double.NaN;
        double sign = negative && isOdd(y) ? -1 : 1;
        if (Math.abs(y) > Double.MAX_VALUE) {
            if (base == 1) return Double.NaN;
            return base > 1 == y > 0 ? Double.POSITIVE_INFINITY : 0;
        }
        if (base == 0) return sign * (y > 0 ? 0 : Double.POSITIVE_INFINITY);
        if (base > Double.MAX_VALUE) return sign * (y > 0 ? Double.POSITIVE_INFINITY : 0);
        boolean subnormal = base < Double.MIN_NORMAL;
        long shifted = Double.doubleToRawLongBits(subnormal ? base * 0x1p54 : base) + SHIFT;
        double k = Double.longBitsToDouble(exponent(shifted)) - BIAS - (subnormal ? 54 : 0);
        double m = Double.longBitsToDouble(mantissa(shifted));
        double s = ratio(m);
        double leading = leading(k, s);
        double rest = rest(k, s, ratioTail(m, s));
        double high = leading + rest;
        double low = (leading - high) + rest;
        double product = y * high;
        if (product > 710) return sign * Double.POSITIVE_INFINITY;
        if (product < -746) return sign * 0;
        double tail = Math.fma(y, low, Math.fma(y, high, -product));
        double t = Math.fma(product, Exp.PER_LN2, Exp.ROUND);
        long bits = Double.doubleToRawLongBits(t);
        return sign * (Exp.reduced(product, tail, t - Exp.ROUND) * Exp.half(bits) * Exp.otherHalf(bits));
    }

    private static boolean isOdd(double y) {
        return y == Math.rint(y) && Math.abs(y) < 0x1p53 && ((long) y & 1) != 0;
    }

    /// Replaces `a` by `a^b`; leaves `b log a` in `d`. Whether some of the results are wrong: those for which
    /// [#isRare] holds.
    private static boolean generalTile(Scratch scratch, int m) {
        double[] a = scratch.a;
        double[] b = scratch.b;
        double[] c = scratch.c;
        double[] d = scratch.d;
        double[] e = scratch.e;
        long signs = 0;
        for (int i = 0; i < m; i++) {
            long bits = Double.doubleToRawLongBits(a[i]);
            signs |= bits | (bits - SMALLEST_NORMAL) | (LARGEST_FINITE - bits);
        }
        for (int i = 0; i < m; i++) {
            long shifted = Double.doubleToRawLongBits(a[i]) + SHIFT;
            c[i] = Double.longBitsToDouble(exponent(shifted));
            a[i] = Double.longBitsToDouble(mantissa(shifted));
        }
        for (int i = 0; i < m; i++) {
            double s = ratio(a[i]);
            e[i] = ratioTail(a[i], s);
            a[i] = s;
        }
        for (int i = 0; i < m; i++) {
            double k = c[i] - BIAS;
            double leading = leading(k, a[i]);
            e[i] = rest(k, a[i], e[i]);
            a[i] = leading;
        }
        for (int i = 0; i < m; i++) {
            double high = a[i] + e[i];
            double low = (a[i] - high) + e[i];
            double product = b[i] * high;
            c[i] = Math.fma(b[i], low, Math.fma(b[i], high, -product));
            d[i] = product;
        }
        for (int i = 0; i < m; i++) {
            double t = Math.fma(d[i], Exp.PER_LN2, Exp.ROUND);
            b[i] = t;
            a[i] = Exp.reduced(d[i], c[i], t - Exp.ROUND);
        }
        for (int i = 0; i < m; i++) {
            long k = Double.doubleToRawLongBits(b[i]) << 52;
            a[i] = Double.longBitsToDouble(Double.doubleToRawLongBits(a[i]) + k);
        }
        for (int i = 0; i < m; i++) signs |= TAME_BITS - (Double.doubleToRawLongBits(d[i]) & Long.MAX_VALUE);
        return signs < 0;
    }

    private static boolean isRare(double base, double product) {
        return !(base >= Double.MIN_NORMAL && base <= Double.MAX_VALUE && Math.abs(product) <= TAME);
    }

    private static long exponent(long shifted) {
        return (shifted >>> 52) | TWO_52;
    }

    private static long mantissa(long shifted) {
        return (shifted & 0x000f_ffff_ffff_ffffL) + (ONE - SHIFT);
    }

    // log x = k ln 2 + log m, in steps small enough to be vectorised each

    /// `artanh`'s argument `s = f / (2 + f)`, `f = m - 1`.
    private static double ratio(double m) {
        return (m - 1) * (1 / (2 + (m - 1)));
    }

    /// What `s` misses of the quotient.
    private static double ratioTail(double m, double s) {
        double f = m - 1;
        double d = 2 + f;
        return Math.fma(-s, f - (d - 2), Math.fma(-s, d, f)) * (1 / d);
    }

    /// `k ln 2 + 2 s + 2/3 s^3`, rounded.
    private static double leading(double k, double s) {
        return k * LN2 + (2 * s + s * (s * s) * TWO_THIRDS);
    }

    /// All of the logarithm that is not in [#leading].
    private static double rest(double k, double s, double sTail) {
        double z = s * s;
        double zTail = Math.fma(2 * s, sTail, Math.fma(s, s, -z));
        double cube = s * z;
        double cubeTail = Math.fma(s, zTail, Math.fma(sTail, z, Math.fma(s, z, -cube)));
        double w = cube * TWO_THIRDS;
        double wTail = Math.fma(cubeTail, TWO_THIRDS, Math.fma(cube, TWO_THIRDS_TAIL, Math.fma(cube, TWO_THIRDS, -w)));
        double p = Math.fma(C17, z, C15);
        p = Math.fma(p, z, C13);
        p = Math.fma(p, z, C11);
        p = Math.fma(p, z, C9);
        p = Math.fma(p, z, C7);
        p = Math.fma(p, z, C5);
        double tail = Math.fma(cube * z, p, wTail);
        double high = 2 * s + w;
        // the tail of s reaches the terms behind s^3 too: 2 z^2 + …
        double low = ((2 * s - high) + w) + Math.fma(Math.fma(2 * z, z, 2), sTail, tail);
        double whole = k * LN2;
        return Math.fma(k, LN2_TAIL, ((whole - (whole + high)) + high) + low);
    }
}
