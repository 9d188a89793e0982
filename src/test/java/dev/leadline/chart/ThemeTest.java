package dev.leadline.chart;

import static org.junit.jupiter.api.Assertions.assertTrue;

import java.awt.Color;
import java.util.ArrayList;
import java.util.List;
import org.junit.jupiter.api.Test;

class ThemeTest {
    /// WCAG 2.2, success criterion 1.4.3: contrast of ordinary text.
    private static final double ENOUGH = 4.5;

    @Test
    void textAndLinesStandOutFromGroundAndStrip() {
        for (var theme : List.of(Theme.LIGHT, Theme.DARK)) {
            var drawn = new ArrayList<>(theme.lanes());
            drawn.addAll(List.of(theme.ink(), theme.quiet(), theme.reference(), theme.stripEdge()));
            for (var colour : drawn) {
                for (var behind : List.of(theme.ground(), theme.strip())) {
                    double contrast = contrast(colour, behind);
                    assertTrue(contrast >= ENOUGH, colour + " on " + behind + ": " + contrast);
                }
            }
        }
    }

    @Test
    void contrastIsThatOfTheStandard() {
        // 21 to 1 is the standard's own example; 767676 on white is widely published as the lightest grey that passes.
        assertTrue(Math.abs(contrast(Color.BLACK, Color.WHITE) - 21) < 1e-9);
        assertTrue(Math.abs(contrast(new Color(0x767676), Color.WHITE) - 4.54) < .005);
    }

    private static double contrast(Color one, Color other) {
        double a = luminance(one);
        double b = luminance(other);
        return (Math.max(a, b) + .05) / (Math.min(a, b) + .05);
    }

    private static double luminance(Color c) {
        return .2126 * linear(c.getRed()) + .7152 * linear(c.getGreen()) + .0722 * linear(c.getBlue());
    }

    private static double linear(int channel) {
        double v = channel / 255.0;
        return v <= .04045 ? v / 12.92 : Math.pow((v + .055) / 1.055, 2.4);
    }
}
