package dev.leadline.numeric;

/// The power `2^x` to 13 digits, with the same bits on every machine, for `x` between -65,000 and 65,000, which is all
/// that underflows and overflows.
///
/// `x/64 = k + f` with an integer `k` and `|f| <= 1/2`, a polynomial of degree 11 for `2^f`, `k` added to the exponent,
/// then six squarings. So nothing has to be compared or clamped on the way, and nothing is subnormal before the last
/// operation. `f` is rounded to multiples of `2^-50`, whose powers lie further apart than their rounding errors: the
/// result never falls back where x rises.
///
/// Error: relative 5e-14, in gradual underflow the smallest subnormal (`Exp2Test`).
///
/// Source: coefficients are our own minimax fit, the first of them fixed at 1.
public final class Exp2 {
    /// Adding and subtracting it rounds what is less than 1 to multiples of `2^-50`.
    private static final double COARSE = 6;

    private static final double C1 = 0.6931471805599457;
    private static final double C2 = 0.24022650695910097;
    private static final double C3 = 0.05550410866479039;
    private static final double C4 = 0.009618129107607003;
    private static final double C5 = 0.0013333558153439966;
    private static final double C6 = 0.0001540353044157213;
    private static final double C7 = 1.5252727385193868e-05;
    private static final double C8 = 1.3215442675329823e-06;
    private static final double C9 = 1.0180647659234139e-07;
    private static final double C10 = 7.072570412814423e-09;
    private static final double C11 = 4.078071929588337e-10;

    private Exp2() {}

    /// Replaces the first `n` values by `2^x`; as many of `t` are overwritten.
    ///
    /// Loops that compute with doubles are vectorised, and so is one that adds their bits, each on its own.
    public static void exp2(double[] x, double[] t, int n) {
        for (int i = 0; i < n; i++) {
            double part = 0x1p-6 * x[i];
            double shifted = part + Exp.ROUND;
            t[i] = shifted;
            x[i] = series((part - (shifted - Exp.ROUND) + COARSE) - COARSE);
        }
        for (int i = 0; i < n; i++) {
            long k = Double.doubleToRawLongBits(t[i]) << 52;
            x[i] = Double.longBitsToDouble(Double.doubleToRawLongBits(x[i]) + k);
        }
        for (int i = 0; i < n; i++) {
            double y = x[i] * x[i];
            y *= y;
            y *= y;
            y *= y;
            y *= y;
            x[i] = y * y;
        }
    }

    private static double series(double f) {
        double p = Math.fma(C11, f, C10);
        p = Math.fma(p, f, C9);
        p = Math.fma(p, f, C8);
        p = Math.fma(p, f, C7);
        p = Math.fma(p, f, C6);
        p = Math.fma(p, f, C5);
        p = Math.fma(p, f, C4);
        p = Math.fma(p, f, C3);
        p = Math.fma(p, f, C2);
        p = Math.fma(p, f, C1);
        return Math.fma(p, f, 1);
    }
}
