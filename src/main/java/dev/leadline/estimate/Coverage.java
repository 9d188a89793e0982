package dev.leadline.estimate;

/// What a distribution of outcomes is besides its mean.
///
/// @param coverage part of the outcomes that both intervals hold
/// @param standardUncertainty standard deviation of the outcomes
/// @param symmetricLow below it lies half of what the interval leaves out
/// @param symmetricHigh above it lies as much
/// @param shortestLow lower end of the shortest interval with this coverage
/// @param shortestHigh its upper end
public record Coverage(
        double coverage,
        double standardUncertainty,
        double symmetricLow,
        double symmetricHigh,
        double shortestLow,
        double shortestHigh) {}
