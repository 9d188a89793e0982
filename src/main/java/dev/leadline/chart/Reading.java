package dev.leadline.chart;

import java.util.List;
import java.util.stream.Collectors;

/// What stands at a pixel of a picture.
///
/// @param draws of that pixel on the axis
/// @param value of that pixel on the axis
/// @param lanes for each lane with a mark, the mark nearest to the pixel from left to right
public record Reading(double draws, double value, List<At> lanes) {
    public Reading {
        lanes = List.copyOf(lanes);
    }

    /// A mark, and the pixel at which it stands.
    ///
    /// @param words what it says
    /// @param y `NaN` where there is nothing to show; outside the picture where the mark is
    public record At(String lane, LaneLook look, String words, Point point, double x, double y) {}

    /// As `A: 1.3e-5 ± .7e-5 after 1,120,000 draws`, of each lane.
    public String text() {
        return lanes.stream().map(at -> at.lane() + ": " + at.words()).collect(Collectors.joining("    "));
    }
}
