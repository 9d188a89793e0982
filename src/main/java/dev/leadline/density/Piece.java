package dev.leadline.density;

/// A stretch of the line with its mass, and how the mass is spread inside. Immutable.
sealed interface Piece permits Smooth, Flank {
    double low();

    double high();

    double mass();

    /// The mass between the lower end and `x`, which lies inside.
    double below(double x);

    /// The mass between `x`, which lies inside, and the upper end.
    double above(double x);

    /// The point with this mass below it inside the piece.
    double atBelow(double mass);

    /// The point with this mass above it inside the piece.
    double atAbove(double mass);
}
