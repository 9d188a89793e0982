package dev.leadline.desktop.style;

import dev.leadline.numeric.Significant;
import java.util.Locale;

/// Counts and durations in few characters.
public final class Figures {
    private static final int DIGITS = 6;

    private Figures() {}

    /// As `640`, `81,920`, `3.1 million`, `2.05 billion`.
    public static String count(long n) {
        if (n < 1_000_000) {
            return String.format(Locale.ROOT, "%,d", n);
        }
        return n < 1_000_000_000 ? three(n / 1e6) + " million" : three(n / 1e9) + " billion";
    }

    /// As `0.4 s`, `40 s`, `3 min 20 s`, `2 h 5 min`.
    public static String duration(double seconds) {
        if (seconds < 9.95) {
            return String.format(Locale.ROOT, "%.1f s", seconds);
        }
        long s = Math.round(seconds);
        if (s < 60) {
            return s + " s";
        }
        if (s < 3600) {
            return s / 60 + " min" + (s % 60 == 0 ? "" : " " + s % 60 + " s");
        }
        long minutes = Math.round(seconds / 60);
        return minutes / 60 + " h" + (minutes % 60 == 0 ? "" : " " + minutes % 60 + " min");
    }

    /// Six significant digits, as `0.0425`, `1180`, `3.2e-7`.
    public static String number(double value) {
        return Significant.text(value, DIGITS);
    }

    private static String three(double value) {
        String pattern = value < 10 ? "%.2f" : value < 100 ? "%.1f" : "%,.0f";
        return String.format(Locale.ROOT, pattern, value);
    }
}
