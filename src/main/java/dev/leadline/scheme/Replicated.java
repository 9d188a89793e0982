package dev.leadline.scheme;

/// Points of which no two are independent, in replicates that are: the mean of each replicate is an observation, which
/// a longer run sharpens. They have as many points as a power of two.
public sealed interface Replicated extends LaidOut permits ScrambledSobol, ShiftedLattice {
    int replicates();

    /// Points of a replicate at most, a power of two.
    long mostPoints();

    @Override
    default String inWords() {
        return word() + ", " + replicates() + " replicates";
    }
}
