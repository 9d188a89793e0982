package dev.leadline.chart;

import java.awt.Color;
import java.util.List;

/// The colours of a picture.
///
/// Ink, quiet text, reference, strip edges and lanes keep a contrast of at least 4.5 to 1 against the ground and
/// against the strip (`ThemeTest`, by the formula of WCAG 2.2).
///
/// @param ink for names and figures
/// @param quiet for labels along the axes
/// @param grid for lines that only guide the eye
/// @param coverage coverage intervals of outcomes, which are no intervals of an estimate
/// @param strip fill of the strip of the numerical tolerance
/// @param lanes one for each [LaneLook]
/// @param fill opacity of an interval's band, from 0 to 1
public record Theme(
        Color ground,
        Color ink,
        Color quiet,
        Color grid,
        Color axis,
        Color reference,
        Color coverage,
        Color strip,
        Color stripEdge,
        List<Color> lanes,
        double fill) {

    /// For paper and for bright rooms. Every exported figure uses it.
    public static final Theme LIGHT = new Theme(
            new Color(0xFFFFFF),
            new Color(0x1C2B33),
            new Color(0x51626C),
            new Color(0xE9EDEF),
            new Color(0x8C9AA2),
            new Color(0x465769),
            new Color(0x96226B),
            new Color(0xFBF5E1),
            new Color(0x846818),
            List.of(new Color(0x0F6E75), new Color(0xB04A10), new Color(0x6A3FA0), new Color(0x546A10)),
            .15);

    public static final Theme DARK = new Theme(
            new Color(0x161C20),
            new Color(0xE4EAED),
            new Color(0xA3B1B9),
            new Color(0x273037),
            new Color(0x5F6E77),
            new Color(0xB3C3D1),
            new Color(0xEC8FC4),
            new Color(0x2E2A1B),
            new Color(0xB99A45),
            List.of(new Color(0x4DB8BF), new Color(0xF0935A), new Color(0xBFA2EE), new Color(0xABC656)),
            .2);

    public Theme {
        lanes = List.copyOf(lanes);
    }

    /// Colour of the lane with this look.
    public Color of(LaneLook look) {
        return lanes.get(look.ordinal());
    }

    Color band(LaneLook look, double share) {
        var c = of(look);
        return new Color(c.getRed(), c.getGreen(), c.getBlue(), (int) Math.round(255 * fill * share));
    }
}
