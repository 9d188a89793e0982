package dev.leadline.density;

import dev.leadline.numeric.Log;

/// The bend that makes generalized shapes of exponential and Gumbel ones, and makes powers of their tails:
/// `z = (exp(shape y) - 1) / shape`, which is `y` itself for shape 0, and its inverse.
final class Bend {
    /// Below this magnitude of the shape the bend is less than the rounding of any y up to 10,000.
    static final double LEAST = 1e-20;

    private Bend() {}

    static double bent(double shape, double y) {
        return Math.abs(shape) < LEAST ? y : StrictMath.expm1(shape * y) / shape;
    }

    /// The y of z; infinite at the end of the bend, `-1 / shape`, and beyond it.
    static double straight(double shape, double z) {
        if (Math.abs(shape) < LEAST || Double.isNaN(z)) {
            return z;
        }
        double grown = Math.fma(shape, z, 1);
        if (grown <= 0) {
            return shape > 0 ? Double.NEGATIVE_INFINITY : Double.POSITIVE_INFINITY;
        }
        return (grown < 0.5 ? Log.log(grown) : StrictMath.log1p(shape * z)) / shape;
    }

    /// The upper tail of a positive shape is a power.
    static TailOrders tailOrders(double shape) {
        return shape > 0 ? new TailOrders(Double.POSITIVE_INFINITY, 1 / shape) : TailOrders.LIGHT;
    }
}
