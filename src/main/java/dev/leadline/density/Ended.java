package dev.leadline.density;

/// A scaled density with an end that is not its location: rounding `(x - location) / scale` would leave some mass
/// beyond that end.
interface Ended extends Scaled {
    @Override
    default double cdf(double x) {
        return side(x, 0, Scaled.super.cdf(x), 1);
    }

    @Override
    default double survival(double x) {
        return side(x, 1, Scaled.super.survival(x), 0);
    }

    private double side(double x, double below, double within, double above) {
        return x <= support().low() ? below : x >= support().high() ? above : within;
    }
}
