package dev.leadline.project;

import java.util.Locale;
import java.util.Set;
import java.util.regex.Pattern;

/// What stands in a cell of a file of data.
enum Cell {
    /// A number without a decimal sign.
    WHOLE,
    /// A number with a decimal point.
    POINT,
    /// A number with a decimal comma.
    COMMA,
    /// Empty, or a word for a value that is missing.
    MISSING,
    /// `NaN`, `inf` or a number beyond the largest that there is.
    ENDLESS,
    TEXT;

    private static final int LONGEST = 400;
    private static final Pattern NUMBER = Pattern.compile("[+-]?(?:\\d++([.,]?)\\d*+|([.,])\\d++)(?:[eE][+-]?\\d++)?");
    private static final Set<String> NOTHING =
            Set.of("", "na", "n/a", "#n/a", "n.a.", "null", "none", "missing", "-", "--", "–", "—");
    private static final Pattern NO_NUMBER = Pattern.compile("[+-]?(?:nan|inf|infinity|∞|\\d.*e[+]?\\d+)");

    /// @param comma whether a decimal comma is read
    static Cell of(String text, boolean comma) {
        String cell = text.strip();
        if (cell.length() > LONGEST) {
            return TEXT;
        }
        String lower = cell.toLowerCase(Locale.ROOT);
        if (NOTHING.contains(lower)) {
            return MISSING;
        }
        var number = NUMBER.matcher(cell);
        if (!number.matches() || (!comma && cell.indexOf(',') >= 0)) {
            return NO_NUMBER.matcher(lower).matches() ? ENDLESS : TEXT;
        }
        if (!Double.isFinite(value(cell))) {
            return ENDLESS;
        }
        return cell.indexOf(',') >= 0 ? COMMA : cell.indexOf('.') >= 0 ? POINT : WHOLE;
    }

    boolean isNumber() {
        return this == WHOLE || this == POINT || this == COMMA;
    }

    /// Of a cell that is a number.
    static double value(String text) {
        return Double.parseDouble(text.strip().replace(',', '.'));
    }
}
