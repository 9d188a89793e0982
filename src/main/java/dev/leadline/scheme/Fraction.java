package dev.leadline.scheme;

/// Numbers in the open interval (0, 1), by binary digits.
final class Fraction {
    private Fraction() {}

    /// The middle of the cell of length 2^-52 that has these 52 digits; exact.
    ///
    /// @param first digits 1 to 32, the first highest
    /// @param next digits 33 to 52, the first of them highest; less than 2^20
    static double of(int first, int next) {
        return (first ^ Integer.MIN_VALUE) * 0x1p-32 + (next * 0x1p-52 + (0.5 + 0x1p-53));
    }
}
