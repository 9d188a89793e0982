package dev.leadline.desktop.working;

import java.util.Map;

/// Units as words in a sentence.
public final class UnitWords {
    private static final Map<String, String> PER = Map.of(
            "a", "year",
            "month", "month",
            "week", "week",
            "d", "day",
            "h", "hour",
            "min", "minute",
            "s", "second");

    private UnitWords() {}

    /// What stands after a number: `1/a` as `per year`, powers raised (`m3` as `m³`), the unit 1 as nothing.
    public static String plain(String unit) {
        String u = unit.strip();
        if (u.isEmpty() || u.equals("1")) {
            return "";
        }
        if (u.startsWith("1/")) {
            String per = u.substring(2);
            return "per " + PER.getOrDefault(per, raised(per));
        }
        return raised(u);
    }

    private static String raised(String unit) {
        return unit.replaceAll("(?<=\\p{L})2(?![\\d.])", "\u00b2").replaceAll("(?<=\\p{L})3(?![\\d.])", "\u00b3");
    }
}
