package dev.leadline.density;

import java.util.OptionalDouble;
import java.util.function.DoubleUnaryOperator;

/// Integrals of smooth functions: Gauss-Legendre quadrature with 16 points on each of some equal panels.
///
/// A panel on which the function falls by `e^14` is integrated to a relative `1e-16`; so are three panels of a function
/// that falls by `e^42`, behind which nothing is left that a double would notice.
final class Quadrature {
    /// Relative change by halving that is left to rounding.
    private static final double SETTLED = 1e-14;

    private static final int PANELS = 1000;
    private static final int HALVINGS = 40;

    /// An exponent that counts as the end of a tail.
    static final double END = 42;

    /// Nodes and weights of the rule of 16 points on `[-1, 1]`: Abramowitz and Stegun, table 25.4.
    private static final double[] NODES = {
        0.09501250983763744,
        0.28160355077925891,
        0.45801677765722739,
        0.61787624440264375,
        0.75540440835500303,
        0.86563120238783174,
        0.94457502307323258,
        0.98940093499164993
    };

    private static final double[] WEIGHTS = {
        0.1894506104550685,
        0.18260341504492359,
        0.16915651939500254,
        0.14959598881657673,
        0.12462897125553387,
        0.095158511682492785,
        0.062253523938647893,
        0.027152459411754095
    };

    private Quadrature() {}

    static double of(DoubleUnaryOperator f, double from, double to, int panels) {
        double half = 0.5 * (to - from) / panels;
        double sum = 0;
        for (int panel = 0; panel < panels; panel++) {
            double middle = from + (2 * panel + 1) * half;
            for (int j = 0; j < NODES.length; j++) {
                double away = half * NODES[j];
                sum += WEIGHTS[j] * (f.applyAsDouble(middle - away) + f.applyAsDouble(middle + away));
            }
        }
        return half * sum;
    }

    /// On panels that are halved until halving changes nothing; empty where a thousand are not enough, as at a
    /// pole, or the integral is not finite.
    static OptionalDouble halving(DoubleUnaryOperator f, double from, double to) {
        var left = new int[] {PANELS};
        double whole = of(f, from, to, 1);
        double sum = halved(f, from, to, whole, whole, HALVINGS, left);
        return left[0] > 0 && Double.isFinite(sum) ? OptionalDouble.of(sum) : OptionalDouble.empty();
    }

    private static double halved(
            DoubleUnaryOperator f, double from, double to, double panel, double whole, int halvings, int[] left) {
        double middle = from + 0.5 * (to - from);
        double lower = of(f, from, middle, 1);
        double upper = of(f, middle, to, 1);
        if (Math.abs(lower + upper - panel) <= SETTLED * Math.abs(whole) || --left[0] <= 0) {
            return lower + upper;
        }
        if (halvings == 0) {
            left[0] = 0;
            return Double.NaN;
        }
        return halved(f, from, middle, lower, whole, halvings - 1, left)
                + halved(f, middle, to, upper, whole, halvings - 1, left);
    }

    /// How far a normal tail at the distance `d` from its middle reaches until it has fallen by `e^END`.
    static double normalReach(double d) {
        return 2 * END / (d + Math.sqrt(d * d + 2 * END));
    }
}
