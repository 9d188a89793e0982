package dev.leadline.numeric;

/// `e^(-h) S(x)` for `x >= 0`, the part that the error function and the normal distribution share.
///
/// `S(x) = e^(x^2) erfc(x)`, and `(1 + 2 x) S(x)` is a polynomial of degree 22 in `t = (x - 4) / (x + 4)`, with a
/// relative error of 2e-17 up to `x = 28`. The exponent `h` is `x^2` for the one and half the square of another number
/// for the other, and comes as a pair of doubles: where `h` is 700, its rounding alone would cost up to 500 ulp.
///
/// Source: form after Shepherd and Laframboise (1981), Mathematics of Computation 36, 249-253; coefficients are our
/// own minimax fit.
final class NormalTail {
    /// The polynomial holds up to here, where the tail has long become 0.
    static final double FAR = 28;

    private static final double C0 = 1.2329951186255526;
    private static final double C1 = -0.1396211168405629;
    private static final double C2 = 0.015379652102619922;
    private static final double C3 = 0.06809705425473522;
    private static final double C4 = -0.10103906603630876;
    private static final double C5 = 0.09373283499686481;
    private static final double C6 = -0.06633036581241752;
    private static final double C7 = 0.03716751556131152;
    private static final double C8 = -0.016197734049907507;
    private static final double C9 = 0.005031969767359455;
    private static final double C10 = -0.000757773395913306;
    private static final double C11 = -0.00019925557646711825;
    private static final double C12 = 0.00015062243763606527;
    private static final double C13 = -2.4402906266205358e-05;
    private static final double C14 = -1.1225201262725029e-05;
    private static final double C15 = 5.717251731739943e-06;
    private static final double C16 = 3.0183466449981024e-07;
    private static final double C17 = -8.342221547988865e-07;
    private static final double C18 = 6.249175866460881e-08;
    private static final double C19 = 1.1457484761047537e-07;
    private static final double C20 = -7.817546023588877e-09;
    private static final double C21 = -1.3398681073154496e-08;
    private static final double C22 = -1.7161575093557703e-09;

    private NormalTail() {}

    /// `e^(-(h + hTail)) S(x)`.
    static double of(double x, double h, double hTail) {
        double t = Math.fma(-h, Exp.PER_LN2, Exp.ROUND);
        long bits = Double.doubleToRawLongBits(t);
        double e = Exp.reduced(-h, -hTail, t - Exp.ROUND);
        return e * (lowerHalf(x, upperHalf(x)) / Math.fma(2, x, 1)) * Exp.half(bits) * Exp.otherHalf(bits);
    }

    /// Replaces `x` by `e^(-(h + hTail)) S(x)`; `h`, `hTail` and `t` are overwritten.
    static void tile(double[] x, double[] h, double[] hTail, double[] t, int m) {
        for (int i = 0; i < m; i++) t[i] = upperHalf(x[i]);
        for (int i = 0; i < m; i++) x[i] = lowerHalf(x[i], t[i]) / Math.fma(2, x[i], 1);
        for (int i = 0; i < m; i++) {
            double shifted = Math.fma(-h[i], Exp.PER_LN2, Exp.ROUND);
            t[i] = shifted;
            h[i] = Exp.reduced(-h[i], -hTail[i], shifted - Exp.ROUND);
        }
        for (int i = 0; i < m; i++) hTail[i] = Exp.half(Double.doubleToRawLongBits(t[i]));
        for (int i = 0; i < m; i++) t[i] = Exp.otherHalf(Double.doubleToRawLongBits(t[i]));
        for (int i = 0; i < m; i++) x[i] = h[i] * x[i] * hTail[i] * t[i];
    }

    // the polynomial in two halves, each small enough to be vectorised

    private static double upperHalf(double x) {
        double t = (x - 4) / (x + 4);
        double p = Math.fma(C22, t, C21);
        p = Math.fma(p, t, C20);
        p = Math.fma(p, t, C19);
        p = Math.fma(p, t, C18);
        p = Math.fma(p, t, C17);
        p = Math.fma(p, t, C16);
        p = Math.fma(p, t, C15);
        p = Math.fma(p, t, C14);
        p = Math.fma(p, t, C13);
        p = Math.fma(p, t, C12);
        return p;
    }

    private static double lowerHalf(double x, double upper) {
        double t = (x - 4) / (x + 4);
        double p = Math.fma(upper, t, C11);
        p = Math.fma(p, t, C10);
        p = Math.fma(p, t, C9);
        p = Math.fma(p, t, C8);
        p = Math.fma(p, t, C7);
        p = Math.fma(p, t, C6);
        p = Math.fma(p, t, C5);
        p = Math.fma(p, t, C4);
        p = Math.fma(p, t, C3);
        p = Math.fma(p, t, C2);
        p = Math.fma(p, t, C1);
        return Math.fma(p, t, C0);
    }
}
