package dev.leadline.interval;

import java.util.function.DoubleUnaryOperator;

/// Where a continuous function changes its sign.
///
/// Source: Chandrupatla (1997), Advances in Engineering Software 28, 145-149: inverse quadratic interpolation
/// where the last three points allow it, else halving.
final class Crossing {
    private static final int TRIALS = 300;

    private Crossing() {}

    /// @param from place where f has one sign, or is 0
    /// @param to place where it has the other
    /// @param near how far from the crossing the result may be
    static double between(DoubleUnaryOperator f, double from, double to, double near) {
        double a = to;
        double b = from;
        double fa = f.applyAsDouble(a);
        double fb = f.applyAsDouble(b);
        if (!(fa * fb <= 0)) {
            throw new IllegalArgumentException("no change of sign: " + fb + " at " + from + ", " + fa + " at " + to);
        }
        double t = 0.5;
        for (int trial = 0; trial < TRIALS; trial++) {
            double x = a + t * (b - a);
            double fx = f.applyAsDouble(x);
            double c;
            double fc;
            if (fx > 0 == fa > 0) {
                c = a;
                fc = fa;
            } else {
                c = b;
                fc = fb;
                b = a;
                fb = fa;
            }
            a = x;
            fa = fx;
            double least = near / Math.abs(b - a);
            if (fa == 0 || !(least < 0.5)) {
                break;
            }
            double xi = (a - b) / (c - b);
            double phi = (fa - fb) / (fc - fb);
            boolean smooth = phi * phi < xi && (1 - phi) * (1 - phi) < 1 - xi;
            t = smooth
                    ? fa / (fb - fa) * (fc / (fb - fc)) + (c - a) / (b - a) * (fa / (fc - fa)) * (fb / (fc - fb))
                    : 0.5;
            t = Math.clamp(t, least, 1 - least);
        }
        return Math.abs(fa) < Math.abs(fb) ? a : b;
    }
}
