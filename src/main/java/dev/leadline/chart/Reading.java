package dev.leadline.chart;

import java.util.List;

/// What stands at a pixel of a picture.
///
/// @param draws of that pixel on the axis
/// @param value of that pixel on the axis
/// @param lanes for each lane with a mark, the mark nearest to the pixel from left to right
public record Reading(double draws, double value, List<At> lanes) {
    public Reading {
        lanes = List.copyOf(lanes);
    }

    /// A mark, and the pixel at which its estimate stands.
    ///
    /// @param y `NaN` where there is no estimate; outside the picture where the estimate is
    public record At(String lane, LaneLook look, Point point, double x, double y) {}
}
