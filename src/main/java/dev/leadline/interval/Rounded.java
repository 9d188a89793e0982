package dev.leadline.interval;

import java.math.BigDecimal;
import java.math.MathContext;
import java.math.RoundingMode;

/// Limits as they stand in a sentence.
final class Rounded {
    private Rounded() {}

    /// Three significant digits, rounded up.
    static String up(double limit) {
        return rounded(limit, RoundingMode.CEILING);
    }

    /// Three significant digits, rounded down.
    static String down(double limit) {
        return rounded(limit, RoundingMode.FLOOR);
    }

    private static String rounded(double limit, RoundingMode mode) {
        return Double.toString(
                BigDecimal.valueOf(limit).round(new MathContext(3, mode)).doubleValue());
    }

    /// A level as `95 %`.
    static String percent(double level) {
        return BigDecimal.valueOf(level).movePointRight(2).stripTrailingZeros().toPlainString() + " %";
    }
}
