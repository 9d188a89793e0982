package dev.leadline.density;

import dev.leadline.numeric.Power;

/// A piece in which the mass is a power of the distance from a point: next to an end or a break, or from a distance
/// on to infinity.
///
/// With `r` the distance from `anchor` over `edge`, the mass beyond a point is `mass * r^exponent`: beyond is towards
/// the anchor where the exponent is positive, and away from it where it is negative.
///
/// @param side 1 where the piece lies above its anchor, -1 below
record Flank(double anchor, int side, double edge, double exponent, double mass) implements Piece {
    private double near() {
        return anchor + side * edge;
    }

    private double far() {
        return exponent > 0 ? anchor : side * Double.POSITIVE_INFINITY;
    }

    @Override
    public double low() {
        return Math.min(near(), far());
    }

    @Override
    public double high() {
        return Math.max(near(), far());
    }

    private boolean beyondIsBelow() {
        return side > 0 == exponent > 0;
    }

    private double beyond(double x) {
        double r = side * (x - anchor) / edge;
        return mass * Math.clamp(Power.pow(r, exponent), 0, 1);
    }

    private double at(double beyond) {
        double x = Math.fma(side * edge, Power.pow(beyond / mass, 1 / exponent), anchor);
        return Math.clamp(x, low(), high());
    }

    @Override
    public double below(double x) {
        return beyondIsBelow() ? beyond(x) : mass - beyond(x);
    }

    @Override
    public double above(double x) {
        return beyondIsBelow() ? mass - beyond(x) : beyond(x);
    }

    @Override
    public double atBelow(double target) {
        return at(beyondIsBelow() ? target : mass - target);
    }

    @Override
    public double atAbove(double target) {
        return at(beyondIsBelow() ? mass - target : target);
    }

    /// The mean of the i-th power of the distance from the anchor in a unit, with its sign, times the mass; infinite
    /// where it does not exist.
    double moment(int i, double unit) {
        if (exponent < 0 && i >= -exponent) {
            return side < 0 && i % 2 == 1 ? Double.NEGATIVE_INFINITY : Double.POSITIVE_INFINITY;
        }
        double power = mass * exponent / (exponent + i);
        for (int k = 0; k < i; k++) {
            power *= side * edge / unit;
        }
        return power;
    }
}
