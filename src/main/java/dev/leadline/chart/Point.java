package dev.leadline.chart;

/// What a lane had shown of one answer after so many draws; any value may be `NaN`, and is then left out.
///
/// @param low lower limit of the interval for this number of draws
/// @param high its upper limit
/// @param bandLow lower limit of the any-time band; `NaN` where none is kept
/// @param bandHigh its upper limit
public record Point(long draws, double estimate, double low, double high, double bandLow, double bandHigh) {
    /// Without an any-time band.
    public Point(long draws, double estimate, double low, double high) {
        this(draws, estimate, low, high, Double.NaN, Double.NaN);
    }
}
