package dev.leadline.scheme;

/// Points whose observations follow one another, independent of each other: a longer run has more of them.
public sealed interface Growing extends LaidOut permits Independent, Antithetic, Stratified, LatinHypercube {
    /// Number of consecutive draws that together form one independent observation, their mean.
    int drawsPerObservation();
}
