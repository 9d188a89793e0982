package dev.leadline.project;

/// Values of a file as messages show them: short, on one line, and unable to steer a terminal.
final class Shown {

    private static final int MOST = 60;

    private Shown() {}

    static String quoted(String text) {
        return '"' + plain(text) + '"';
    }

    static String plain(String text) {
        var shown = new StringBuilder();
        text.codePoints().limit(MOST).forEach(c -> {
            int type = Character.getType(c);
            boolean safe = type != Character.CONTROL && type != Character.FORMAT && type != Character.SURROGATE;
            if (safe) {
                shown.appendCodePoint(c);
            } else {
                shown.append("\\u%04x".formatted(c));
            }
        });
        return text.codePointCount(0, text.length()) > MOST ? shown.append('…').toString() : shown.toString();
    }

    /// What stands there, as the middle of a sentence: `seed is the text "7" but …`.
    static String what(Json json) {
        return switch (json) {
            case Json.Members _ -> "an object {…}";
            case Json.Elements _ -> "a list […]";
            case Json.Text(String value) -> "the text " + quoted(value);
            case Json.Number(String literal) -> plain(literal);
            case Json.Flag(boolean value) -> String.valueOf(value);
            case Json.Null() -> "null";
        };
    }
}
