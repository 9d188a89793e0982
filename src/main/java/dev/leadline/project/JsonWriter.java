package dev.leadline.project;

import dev.leadline.numeric.Shortest;
import java.util.Iterator;
import java.util.Map;
import java.util.TreeMap;

/// Json as text.
public final class JsonWriter {

    private static final int WIDTH = 120;

    private final StringBuilder text = new StringBuilder();

    private JsonWriter() {}

    /// For files that people read and compare: every member of the whole and every element of its lists on lines of
    /// their own, anything deeper on one line where it fits in 120 columns.
    public static String pretty(Json json) {
        var writer = new JsonWriter();
        writer.spread(json, 0, true);
        return writer.text.append('\n').toString();
    }

    /// One line.
    public static String compact(Json json) {
        var writer = new JsonWriter();
        writer.flat(json, ", ", ": ");
        return writer.text.toString();
    }

    /// The canonical form of RFC 8785: equal for equal content, so that its hash can stand for it.
    public static String canonical(Json json) {
        var writer = new JsonWriter();
        writer.flat(sorted(json), ",", ":");
        return writer.text.toString();
    }

    /// @param always whether to use lines of its own even where it would fit in the rest of this one
    private void spread(Json json, int indent, boolean always) {
        if (isEmpty(json) || (!always && fits(json))) {
            flat(json, ", ", ": ");
            return;
        }
        switch (json) {
            case Json.Members(var map) -> {
                text.append('{');
                for (Iterator<Map.Entry<String, Json>> rest = map.entrySet().iterator(); rest.hasNext(); ) {
                    var member = rest.next();
                    line(indent + 2);
                    quote(member.getKey());
                    text.append(": ");
                    spread(member.getValue(), indent + 2, indent == 0 && member.getValue() instanceof Json.Elements);
                    text.append(rest.hasNext() ? "," : "");
                }
                line(indent);
                text.append('}');
            }
            case Json.Elements(var list) -> {
                text.append('[');
                for (Iterator<Json> rest = list.iterator(); rest.hasNext(); ) {
                    line(indent + 2);
                    spread(rest.next(), indent + 2, false);
                    text.append(rest.hasNext() ? "," : "");
                }
                line(indent);
                text.append(']');
            }
            case Json.Text _, Json.Number _, Json.Flag _, Json.Null _ -> flat(json, ", ", ": ");
        }
    }

    private boolean fits(Json json) {
        int start = text.lastIndexOf("\n") + 1;
        return text.length() - start + compact(json).length() < WIDTH;
    }

    private static boolean isEmpty(Json json) {
        return switch (json) {
            case Json.Members(var map) -> map.isEmpty();
            case Json.Elements(var list) -> list.isEmpty();
            case Json.Text _, Json.Number _, Json.Flag _, Json.Null _ -> true;
        };
    }

    private void line(int indent) {
        text.append('\n').append(" ".repeat(indent));
    }

    private void flat(Json json, String comma, String colon) {
        switch (json) {
            case Json.Members(var map) -> {
                String before = "{";
                for (var member : map.entrySet()) {
                    text.append(before);
                    quote(member.getKey());
                    text.append(colon);
                    flat(member.getValue(), comma, colon);
                    before = comma;
                }
                text.append(map.isEmpty() ? "{}" : "}");
            }
            case Json.Elements(var list) -> {
                String before = "[";
                for (Json element : list) {
                    text.append(before);
                    flat(element, comma, colon);
                    before = comma;
                }
                text.append(list.isEmpty() ? "[]" : "]");
            }
            case Json.Text(String value) -> quote(value);
            case Json.Number(String literal) -> text.append(literal);
            case Json.Flag(boolean value) -> text.append(value);
            case Json.Null() -> text.append("null");
        }
    }

    /// Escapes no more than RFC 8785 §3.2.2.2 does.
    private void quote(String value) {
        text.append('"');
        for (int i = 0; i < value.length(); i++) {
            char c = value.charAt(i);
            switch (c) {
                case '"' -> text.append("\\\"");
                case '\\' -> text.append("\\\\");
                case '\b' -> text.append("\\b");
                case '\t' -> text.append("\\t");
                case '\n' -> text.append("\\n");
                case '\f' -> text.append("\\f");
                case '\r' -> text.append("\\r");
                default -> text.append(c < ' ' ? "\\u00%02x".formatted((int) c) : String.valueOf(c));
            }
        }
        text.append('"');
    }

    /// Members by their names' UTF-16 units, numbers as ECMAScript writes them.
    private static Json sorted(Json json) {
        return switch (json) {
            case Json.Members(var map) -> {
                var object = Json.object();
                new TreeMap<>(map).forEach((name, value) -> object.put(name, sorted(value)));
                yield object.build();
            }
            case Json.Elements(var list) ->
                Json.list(list.stream().map(JsonWriter::sorted).toList());
            case Json.Number number -> new Json.Number(Shortest.canonical(number.value()));
            case Json.Text _, Json.Flag _, Json.Null _ -> json;
        };
    }
}
