package dev.leadline.density;

/// A shape whose values are separate ones, in rising order.
///
/// Rounding must not carry a quantile to the next value where a probability is exactly reached, as by half of the
/// values of five tossed coins: a tail that misses a probability by no more than [#ROUNDING], relative, reaches it.
interface Discrete extends Shape {
    double ROUNDING = 1e-13;

    /// The value that follows x, which is itself a value below the greatest.
    double next(double x);

    @Override
    default boolean isDiscrete() {
        return true;
    }
}
