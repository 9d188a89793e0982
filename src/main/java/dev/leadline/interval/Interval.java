package dev.leadline.interval;

import java.util.Optional;

/// An interval for a fixed number of draws, with what it is and what it assumes.
///
/// @param low lower limit; `NaN` where no such limit exists at this n, and then `note` says which n would do
/// @param high upper limit; `NaN` likewise
/// @param level of confidence, as .95
/// @param kind word of the project file and of the commands, as `student`
/// @param assumption one sentence: what the interval takes for granted
/// @param note why a limit is missing, or one-sided, and what would help
public record Interval(double low, double high, double level, String kind, String assumption, Optional<String> note) {

    /// The level as `95 %`.
    public String percent() {
        return Rounded.percent(level);
    }

    /// Half the length; `NaN` where a limit is missing.
    public double halfWidth() {
        return (high - low) / 2;
    }
}
