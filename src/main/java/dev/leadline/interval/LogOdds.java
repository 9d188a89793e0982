package dev.leadline.interval;

import dev.leadline.density.Deviance;

/// Quantiles of the log-odds of a beta variable, from which the exact limits of a probability and those of Student's t
/// follow.
///
/// With X ~ Beta(a, b) and `s = ln(X/(1-X)) - ln(a/b)`, the density of s is proportional to
/// `h(s) = exp(a s - (a+b) ln(1 + (e^s - 1) a/(a+b)))`: analytic on the whole line, its logarithm concave, its peak
/// `h(0) = 1`. So the whole integral is a plain trapezoidal sum, a tail is a few Gauss-Legendre panels, and their ratio
/// needs no gamma function. Digits that cancel in the exponent for large a and b do so in proportion to the width of
/// the density, hence not in the quantile; a tail needs them all, and beyond [#MANY] the exponent is written as
/// deviances
/// from the peak, which do not cancel.
///
/// Error: see [Student], [ClopperPearson] and [BinomialTail]. Bit-stable: `StrictMath` only.
///
/// Cost: 20 to 60 µs.
final class LogOdds {
    /// Below this share of the peak the rest of an integral is less than rounding.
    private static final double NEGLIGIBLE = 1e-19;

    /// Panels grow as the density loses its curvature.
    private static final double GROWTH = 1.25;

    /// From here on, of the smaller of a and b, deviances are taken.
    private static final double MANY = 1e6;

    /// The positive nodes of the Gauss-Legendre rule of 16 points (mpmath, 40 digits).
    private static final double[] NODES = {
        0.98940093499164993,
        0.94457502307323258,
        0.86563120238783174,
        0.75540440835500303,
        0.61787624440264375,
        0.45801677765722739,
        0.28160355077925891,
        0.09501250983763744
    };

    private static final double[] WEIGHTS = {
        0.027152459411754095,
        0.062253523938647893,
        0.095158511682492785,
        0.12462897125553387,
        0.14959598881657673,
        0.16915651939500254,
        0.18260341504492359,
        0.1894506104550685
    };

    private final double a;
    private final double b;

    /// Standard deviation of the normal density that fits the peak.
    private final double width;

    private LogOdds(double a, double b) {
        this.a = a;
        this.b = b;
        width = Math.sqrt(1 / a + 1 / b);
    }

    /// The s with `P(S > s) = tail`, where S is the log-odds of a Beta(a, b) variable less `ln(a/b)`.
    ///
    /// @param tail at most 1/2; for the other side swap a and b and change the sign
    static double upper(double a, double b, double tail) {
        if (!(a > 0 && b > 0 && tail > 0 && tail <= 0.5)) {
            throw new IllegalArgumentException("a = " + a + ", b = " + b + ", tail = " + tail);
        }
        return new LogOdds(a, b).upper(tail);
    }

    /// `P(S > s)`.
    static double beyond(double a, double b, double s) {
        return s < 0 ? 1 - beyond(b, a, -s) : new LogOdds(a, b).tail(s);
    }

    private double tail(double s) {
        double height = StrictMath.exp(logH(s));
        return height == 0 ? 0 : height * beyond(s) / whole();
    }

    /// Halley's method: with `m` the tail divided by h, the logarithm of the tail has the derivatives `-1/m` and
    /// `-(1 + m slope)/m²`. Its error is cubed by each step.
    private double upper(double tail) {
        double logTarget = StrictMath.log(tail * whole());
        double s = width * Math.sqrt(-2 * StrictMath.log(2 * tail));
        double step;
        do {
            double m = beyond(s);
            double off = logH(s) + StrictMath.log(m) - logTarget;
            step = off * m / Math.max(0.5, 1 + off * (1 + m * slope(s)) / 2);
            s += step;
        } while (Math.abs(step) > 1e-5 * width);
        return s;
    }

    /// Written from the rarer side, whose share of `a + b` keeps its digits.
    private double logH(double s) {
        double n = a + b;
        if (Math.min(a, b) > MANY && Math.abs(s) < 0.25) {
            double e = StrictMath.expm1(s);
            double off = e / (1 + a / n * e);
            return a * Deviance.logOnePlusLess(b / n * off) + b * Deviance.logOnePlusLess(-a / n * off);
        }
        return a <= b
                ? a * s - n * StrictMath.log1p(a / n * StrictMath.expm1(s))
                : -b * s - n * StrictMath.log1p(b / n * StrictMath.expm1(-s));
    }

    /// Derivative of the logarithm of h.
    private double slope(double s) {
        return a <= b ? -a * b / (a + (a + b) / StrictMath.expm1(s)) : a * b / (b + (a + b) / StrictMath.expm1(-s));
    }

    private double whole() {
        double step = Math.min(0.18, 0.45 * width);
        double sum = 1;
        for (int side = -1; side <= 1; side += 2) {
            double term = 1;
            for (int i = 1; term > NEGLIGIBLE; i++) {
                term = StrictMath.exp(logH(side * i * step));
                sum += term;
            }
        }
        return sum * step;
    }

    /// The integral of h from s on, divided by h(s): panels that grow, until they add nothing.
    private double beyond(double s) {
        double here = logH(s);
        double longest = Math.min(width, 1);
        double middle = s;
        double sum = 0;
        double panel;
        do {
            double half = Math.min(longest, 4 / Math.abs(slope(middle)));
            middle += half;
            panel = 0;
            for (int i = 0; i < NODES.length; i++) {
                double x = half * NODES[i];
                panel += WEIGHTS[i]
                        * (StrictMath.exp(logH(middle - x) - here) + StrictMath.exp(logH(middle + x) - here));
            }
            panel *= half;
            sum += panel;
            middle += half;
            longest *= GROWTH;
        } while (panel > NEGLIGIBLE * sum);
        return sum;
    }
}
