package dev.leadline.scheme;

/// How a copied particle is moved away from the one that it copies. Confined to one repetition.
interface Walk {
    /// Moves a particle among the points above a level, so that it stays distributed as they are.
    ///
    /// @param z coordinates of a particle above the level; replaced by those where it arrives
    /// @param score of the particle
    /// @param level never fallen to
    /// @return score where it arrives
    double move(double[] z, double score, double level);

    /// Moves tried so far.
    long proposals();

    /// Moves made so far.
    long accepted();

    /// Proposals that could not be evaluated.
    long failed();

    /// Size of the next moves, above 0, at most 1.
    double step();
}
