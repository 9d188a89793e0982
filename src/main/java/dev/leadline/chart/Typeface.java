package dev.leadline.chart;

import dev.leadline.problem.Problem;
import dev.leadline.problem.Refusal;
import java.awt.Font;
import java.awt.font.FontRenderContext;
import java.util.List;
import java.util.Locale;

/// The letters of a picture: a sans with digits of equal width.
final class Typeface {
    /// Known to have equal digits and raised figures; the first that the machine has is used.
    private static final List<String> WANTED =
            List.of("DejaVu Sans", "Noto Sans", "Liberation Sans", "Segoe UI", "Helvetica Neue");

    /// Lengths do not depend on where a text will be drawn, so a picture has one layout on screen and in files.
    private static final FontRenderContext MEASURE = new FontRenderContext(null, true, true);

    private Typeface() {}

    /// @param size in pixels
    /// @throws Refusal where the machine has no font at all
    static Font sans(int size) {
        try {
            var font = Family.FOUND.deriveFont((float) size);
            font.getStringBounds("0", MEASURE);
            return font;
        } catch (LinkageError | RuntimeException e) {
            throw new Refusal(Problem.of("this machine has no font to draw a picture with")
                    .because("The labels of a picture need one; numbers and reports without pictures do not.")
                    .tryThis("Install a font and fontconfig (on Debian: apt install fontconfig fonts-dejavu-core)."));
        }
    }

    static double width(Font font, String text) {
        return font.getStringBounds(text, MEASURE).getWidth();
    }

    /// The text, cut and ended with `…` where it is wider than `room`.
    static String fitted(Font font, String text, double room) {
        if (width(font, text) <= room) {
            return text;
        }
        int end = text.length();
        while (end > 0 && width(font, text.substring(0, end).stripTrailing() + "…") > room) {
            end--;
        }
        return text.substring(0, end).stripTrailing() + "…";
    }

    /// Looked up when first needed, once.
    private static final class Family {
        static final Font FOUND = WANTED.stream()
                .map(name -> new Font(name, Font.PLAIN, 12))
                .filter(font -> font.getFamily(Locale.ROOT).equals(font.getName()))
                .findFirst()
                .orElseGet(() -> new Font(Font.SANS_SERIF, Font.PLAIN, 12));
    }
}
