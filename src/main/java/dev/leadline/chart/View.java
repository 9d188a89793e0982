package dev.leadline.chart;

import java.util.Optional;

/// What part of a picture is looked at, and how. Immutable; [Picture] knows how to zoom and pan, because only it knows
/// which value stands at a pixel.
///
/// @param draws range of the draws; empty follows the run
/// @param values range of the values; empty follows the run
/// @param logDraws whether the draws stand on a logarithmic axis
public record View(Optional<Range> draws, Optional<Range> values, boolean logDraws) {
    /// Both axes follow the run, draws logarithmic.
    public static final View FOLLOWING = new View(Optional.empty(), Optional.empty(), true);

    /// Both axes follow the run again.
    public View reset() {
        return new View(Optional.empty(), Optional.empty(), logDraws);
    }

    /// The other axis for the draws; its range follows the run again, since one chosen on a logarithmic axis is a poor
    /// choice on a linear one.
    public View withLogDraws(boolean log) {
        return log == logDraws ? this : new View(Optional.empty(), values, log);
    }
}
