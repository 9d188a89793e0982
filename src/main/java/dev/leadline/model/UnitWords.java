package dev.leadline.model;

import java.util.Map;

/// Units as a sentence says them.
public final class UnitWords {

    private static final Map<String, String> TIMES = Map.of(
            "a", "year", "d", "day", "h", "hour", "min", "minute", "s", "second", "week", "week", "month", "month");

    private UnitWords() {}

    /// What stands behind a number, with a space before it: ` m³`, ` per year` for `1/a`; nothing for the unit 1.
    public static String after(String unit) {
        if (unit.isBlank() || unit.equals("1")) {
            return "";
        }
        if (unit.startsWith("1/")) {
            String per = unit.substring(2);
            return " per " + TIMES.getOrDefault(per, raised(per));
        }
        return " " + raised(unit);
    }

    private static String raised(String unit) {
        return unit.replaceAll("(?<=\\p{L})\\^?2(?!\\d)", "²").replaceAll("(?<=\\p{L})\\^?3(?!\\d)", "³");
    }
}
