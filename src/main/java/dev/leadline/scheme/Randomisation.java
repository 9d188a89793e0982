package dev.leadline.scheme;

/// Makes points of one replicate and dimension of the digits of a digital point set. Immutable.
///
/// Whole blocks have a loop of their own in each: a loop of known length is vectorised even if, when it is
/// compiled, only other randomisations have been seen and several times faster then.
interface Randomisation {
    /// Digits are the 32 bits of a number, the first digit lowest.
    ///
    /// @param block digits of the points, those meant from index `from`
    /// @param more to be added to each, digit by digit without carry
    /// @param u filled at n indices from `to`
    void apply(int[] block, int from, int more, double[] u, int to, int n);
}
