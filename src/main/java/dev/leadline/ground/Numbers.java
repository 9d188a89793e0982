package dev.leadline.ground;

import java.math.BigDecimal;
import java.math.MathContext;
import java.util.Locale;

/// Numbers as sentences of evidence say them: counts, guesses and single figures. They have no error of their own to
/// take their digits from, which is what [Rounding][dev.leadline.numeric.Rounding] does for estimates.
final class Numbers {
    private static final double LARGEST_WRITTEN_OUT = 1e15;

    private Numbers() {}

    /// A count: `12,600`.
    static String count(long count) {
        return String.format(Locale.ROOT, "%,d", count);
    }

    /// About how many, to two digits: `41,000,000`.
    static String about(double count) {
        String digits = String.format(Locale.ROOT, "%.1e", count);
        return Math.abs(count) < LARGEST_WRITTEN_OUT
                ? String.format(Locale.ROOT, "%,.0f", Double.parseDouble(digits))
                : shortExponent(digits);
    }

    /// A ratio or a number of standard errors: one decimal.
    static String ratio(double ratio) {
        String text = String.format(Locale.ROOT, "%.1f", ratio);
        return text.equals("-0.0") ? "0.0" : text;
    }

    /// A tail index, or a power: two decimals.
    static String hundredths(double value) {
        return String.format(Locale.ROOT, "%.2f", value);
    }

    /// A value to three significant digits: `0.00300`, `9.99e-6`, `1,420`.
    static String value(double value) {
        if (Math.abs(value) >= 1000 && Math.abs(value) < LARGEST_WRITTEN_OUT) {
            return String.format(Locale.ROOT, "%,.0f", new BigDecimal(value).round(new MathContext(3)));
        }
        return shortExponent(String.format(Locale.ROOT, "%.3g", value));
    }

    private static String shortExponent(String number) {
        return number.replaceFirst("e([+-])0*", "e$1").replace("e+", "e");
    }
}
