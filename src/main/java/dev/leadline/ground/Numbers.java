package dev.leadline.ground;

import java.util.Locale;

/// Numbers as sentences of evidence say them.
final class Numbers {
    private static final double LARGEST_WRITTEN_OUT = 1e6;

    private Numbers() {}

    /// A count: `12,600`, or `4.1e7` for millions, where the digits beyond the second say nothing.
    static String count(double count) {
        return Math.abs(count) < LARGEST_WRITTEN_OUT
                ? String.format(Locale.ROOT, "%,.0f", count)
                : shortExponent(String.format(Locale.ROOT, "%.1e", count));
    }

    /// A ratio or a number of standard errors: one decimal.
    static String ratio(double ratio) {
        return String.format(Locale.ROOT, "%.1f", ratio);
    }

    /// A value to three significant digits: `0.00300`, `9.99e-6`.
    static String value(double value) {
        return shortExponent(String.format(Locale.ROOT, "%.3g", value));
    }

    private static String shortExponent(String number) {
        return number.replaceFirst("e([+-])0*", "e$1").replace("e+", "e");
    }
}
