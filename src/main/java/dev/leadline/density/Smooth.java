package dev.leadline.density;

/// A piece in which the density is a polynomial.
///
/// @param heights coefficients of the density times half the width, on `[-1, 1]`
/// @param masses coefficients of its integral from the lower end
record Smooth(double low, double high, double mass, double[] heights, double[] masses) implements Piece {
    private static final int TRIALS = 100;

    /// @param coefficients of the density, on `[-1, 1]`
    static Smooth of(double low, double high, double[] coefficients) {
        double half = 0.5 * (high - low);
        var heights = new double[coefficients.length];
        for (int k = 0; k < heights.length; k++) {
            heights[k] = half * coefficients[k];
        }
        var masses = Chebyshev.antiderivative(heights);
        return new Smooth(low, high, Chebyshev.at(masses, 1), heights, masses);
    }

    private double argument(double x) {
        return Math.clamp(((x - low) - (high - x)) / (high - low), -1, 1);
    }

    /// The density; its error is absolute, a rounding error of the greatest in the piece.
    double height(double x) {
        return Chebyshev.at(heights, argument(x)) / (0.5 * (high - low));
    }

    @Override
    public double below(double x) {
        return Math.clamp(Chebyshev.at(masses, argument(x)), 0, mass);
    }

    @Override
    public double above(double x) {
        return mass - below(x);
    }

    /// Newton's method, kept between the points known to lie on either side.
    @Override
    public double atBelow(double target) {
        double from = -1;
        double to = 1;
        double t = Math.clamp(2 * (target / mass) - 1, -1, 1);
        for (int trial = 0; trial < TRIALS && to - from > 0x1p-52; trial++) {
            double excess = Chebyshev.at(masses, t) - target;
            if (excess == 0) {
                break;
            }
            if (excess > 0) {
                to = t;
            } else {
                from = t;
            }
            double next = t - excess / Chebyshev.at(heights, t);
            if (!(next >= from && next <= to)) {
                next = 0.5 * (from + to);
            }
            if (Math.abs(next - t) <= 0x1p-53 * (1 + Math.abs(t)) * 2) {
                t = next;
                break;
            }
            t = next;
        }
        double half = 0.5 * (high - low);
        double x = t < 0 ? Math.fma(half, 1 + t, low) : Math.fma(-half, 1 - t, high);
        return Math.clamp(x, low, high);
    }

    @Override
    public double atAbove(double target) {
        return atBelow(mass - target);
    }
}
