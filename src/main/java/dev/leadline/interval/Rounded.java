package dev.leadline.interval;

import java.math.BigDecimal;
import java.math.MathContext;
import java.math.RoundingMode;

/// Limits as they stand in a sentence.
final class Rounded {
    /// Decimal places of a level that are written out.
    private static final int LEVEL_PLACES = 6;

    /// Digits from here on are rounding errors.
    private static final int LEVEL_NOISE = 14;

    private Rounded() {}

    /// Three significant digits, rounded up.
    static String up(double limit) {
        return rounded(limit, RoundingMode.CEILING);
    }

    /// Rounded down, to three significant digits of what is missing to 1: 0.99963 says more than 0.999.
    static String downFromOne(double limit) {
        BigDecimal missing = BigDecimal.ONE.subtract(BigDecimal.valueOf(limit));
        return BigDecimal.ONE
                .subtract(missing.round(new MathContext(3, RoundingMode.CEILING)))
                .stripTrailingZeros()
                .toPlainString();
    }

    private static String rounded(double limit, RoundingMode mode) {
        return Double.toString(BigDecimal.valueOf(limit)
                        .round(new MathContext(3, mode))
                        .doubleValue())
                .replace('E', 'e');
    }

    /// A level as `95 %`; one with many digits, as that of each of three intervals that hold together, a little lower.
    static String percent(double level) {
        BigDecimal shown = new BigDecimal(level)
                .setScale(LEVEL_NOISE, RoundingMode.HALF_EVEN)
                .stripTrailingZeros();
        if (shown.scale() > LEVEL_PLACES) {
            shown = BigDecimal.ONE.subtract(BigDecimal.ONE.subtract(shown).round(new MathContext(3, RoundingMode.UP)));
        }
        return shown.movePointRight(2).stripTrailingZeros().toPlainString() + " %";
    }
}
