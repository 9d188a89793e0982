package dev.leadline.density;

import java.util.Arrays;
import java.util.Optional;

/// The values of a discrete density around a place, found by its quantiles. Values less likely than rounding may be
/// passed over.
final class Atoms {
    /// Larger than what counts as reaching a probability ([Discrete#ROUNDING]).
    private static final double STEP = 1e-12;

    /// Least probability of a draw.
    private static final double SMALLEST = 0x1p-53;

    private Atoms() {}

    /// The first value above `x`; infinite where there is none.
    static double after(Density density, double x) {
        return switch (density) {
            case Truncated truncated -> after(truncated.of(), x);
            case Mixture mixture ->
                mixture.parts().stream()
                        .mapToDouble(part -> after(part.density(), x))
                        .min()
                        .orElseThrow();
            default -> afterByQuantile(density, x);
        };
    }

    private static double afterByQuantile(Density density, double x) {
        double below = density.cdf(x);
        if (below == 0) {
            return density.support().low();
        }
        double next = below <= 0.5
                ? density.quantile(below * (1 + STEP))
                : density.upperQuantile(density.survival(x) * (1 - STEP));
        return next > x ? next : Double.POSITIVE_INFINITY;
    }

    /// The first value that is not below `x`.
    static double from(Density density, double x) {
        return x > density.support().low()
                ? after(density, Math.nextDown(x))
                : density.support().low();
    }

    /// The last value that is not above `x`; infinite where there is none.
    static double upTo(Density density, double x) {
        double below = density.cdf(x);
        return below == 0
                ? Double.NEGATIVE_INFINITY
                : below <= 0.5 ? density.quantile(below) : density.upperQuantile(density.survival(x));
    }

    /// All values that are drawn, rising; empty where they are more than `most`.
    static Optional<double[]> all(Density density, int most) {
        double last = density.upperQuantile(SMALLEST);
        double value = density.quantile(SMALLEST);
        var values = new double[most];
        int n = 0;
        while (n < most) {
            values[n++] = value;
            if (!(value < last)) {
                return Optional.of(Arrays.copyOf(values, n));
            }
            double next = density instanceof Discrete discrete ? discrete.next(value) : after(density, value);
            value = Math.min(next, last);
        }
        return Optional.empty();
    }
}
