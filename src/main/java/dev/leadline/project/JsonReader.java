package dev.leadline.project;

import dev.leadline.problem.Place;
import dev.leadline.problem.Problem;
import dev.leadline.problem.Refusal;
import dev.leadline.problem.Span;
import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.SequencedMap;
import tools.jackson.core.JacksonException;
import tools.jackson.core.JsonParser;
import tools.jackson.core.JsonToken;
import tools.jackson.core.ObjectReadContext;
import tools.jackson.core.StreamReadConstraints;
import tools.jackson.core.exc.StreamConstraintsException;
import tools.jackson.core.exc.UnexpectedEndOfInputException;
import tools.jackson.core.json.JsonFactory;
import tools.jackson.core.json.JsonReadFeature;

/// Reads a JSON text into a tree. Where the text is no JSON, or is nested too deep, nothing after that place can be
/// told and the reading ends with a [Refusal]; duplicate names and numbers that no double holds are noted and passed.
final class JsonReader {

    static final int MOST_DEPTH = 32;
    static final int MOST_DIGITS = 1000;
    static final int MOST_TEXT = 1_000_000;

    private static final JsonFactory JSON = JsonFactory.builder()
            // NaN and Infinity are no JSON, but people write them: read here so that the message can name the field
            .enable(JsonReadFeature.ALLOW_NON_NUMERIC_NUMBERS)
            .streamReadConstraints(StreamReadConstraints.builder()
                    .maxNestingDepth(MOST_DEPTH)
                    .maxNumberLength(MOST_DIGITS)
                    .maxStringLength(MOST_TEXT)
                    .build())
            .build();

    private final String text;
    private final JsonParser parser;
    private final Problems problems;

    private JsonReader(String text, JsonParser parser, Problems problems) {
        this.text = text;
        this.parser = parser;
        this.problems = problems;
    }

    static Json read(String text, Problems problems) {
        if (text.isBlank()) {
            throw new Refusal(Problem.of("the file is empty")
                    .because("A project is a JSON object that begins with \"leadline\": 1."));
        }
        try (JsonParser parser = JSON.createParser(ObjectReadContext.empty(), text)) {
            var reader = new JsonReader(text, parser, problems);
            try {
                parser.nextToken();
                Json whole = reader.value(JsonPath.WHOLE);
                if (parser.nextToken() != null) {
                    long offset = parser.currentTokenLocation().getCharOffset();
                    throw new Refusal(reader.here("more text stands after the end of the project", offset)
                            .tryThis("Remove it, or see whether a bracket closes too early."));
                }
                return whole;
            } catch (StreamConstraintsException e) {
                throw new Refusal(reader.tooMuch());
            } catch (UnexpectedEndOfInputException e) {
                throw new Refusal(reader.cutShort());
            } catch (JacksonException e) {
                throw new Refusal(reader.noJson(e.getLocation().getCharOffset()));
            }
        }
    }

    private Json value(String path) {
        return switch (parser.currentToken()) {
            case START_OBJECT -> members(path);
            case START_ARRAY -> elements(path);
            case VALUE_STRING -> new Json.Text(whole(path, parser.getString()));
            case VALUE_NUMBER_INT, VALUE_NUMBER_FLOAT -> number(path, parser.getString());
            case VALUE_TRUE -> new Json.Flag(true);
            case VALUE_FALSE -> new Json.Flag(false);
            case VALUE_NULL -> new Json.Null();
            case END_OBJECT, END_ARRAY, PROPERTY_NAME, VALUE_EMBEDDED_OBJECT, NOT_AVAILABLE ->
                throw new IllegalStateException("token " + parser.currentToken());
        };
    }

    private Json members(String path) {
        SequencedMap<String, Json> members = new LinkedHashMap<>();
        while (parser.nextToken() != JsonToken.END_OBJECT) {
            String name = parser.currentName();
            String place = JsonPath.member(path, name);
            whole(place, name);
            parser.nextToken();
            Json value = value(place);
            if (members.putIfAbsent(name, value) != null) {
                problems.add(Problem.of("%s stands there twice".formatted(Shown.quoted(name)))
                        .because("Which of the two counts cannot be told.")
                        .tryThis("Remove one of them.")
                        .at(Place.of(place)));
            }
        }
        return new Json.Members(members);
    }

    private Json elements(String path) {
        List<Json> elements = new ArrayList<>();
        while (parser.nextToken() != JsonToken.END_ARRAY) {
            elements.add(value(JsonPath.element(path, elements.size())));
        }
        return new Json.Elements(elements);
    }

    /// Half a surrogate pair, which only `\ud83d` and the like can write, is no character and has no UTF-8.
    private String whole(String path, String characters) {
        if (!StandardCharsets.UTF_8.newEncoder().canEncode(characters)) {
            problems.add(Problem.of("a text holds half a character, %s".formatted(Shown.quoted(characters)))
                    .because("It cannot be saved as UTF-8.")
                    .tryThis("Remove the escape that begins with \\ud.")
                    .at(Place.of(path)));
            return "";
        }
        return characters;
    }

    private Json number(String path, String literal) {
        double value = parser.isNaN() ? Double.NaN : Double.parseDouble(literal);
        boolean vanished = value == 0 && literal.split("[eE]")[0].matches(".*[1-9].*");
        if (!Double.isFinite(value) || vanished) {
            problems.add(Problem.of("%s is not a number that can be used".formatted(Shown.plain(literal)))
                    .because("Numbers are finite, in size from 4.9e-324 to 1.797e308, or 0.")
                    .at(Place.of(path)));
            return new Json.Number("NaN");
        }
        return new Json.Number(literal);
    }

    private Problem tooMuch() {
        long offset = Math.max(0, parser.currentLocation().getCharOffset());
        return here("the JSON is larger than a project can be", offset)
                .because(String.format(
                        Locale.ROOT,
                        "Lists and objects stand at most %d deep, a text has at most %,d characters, a number %,d digits.",
                        MOST_DEPTH,
                        MOST_TEXT,
                        MOST_DIGITS));
    }

    private Problem noJson(long reported) {
        int offset = Math.clamp(reported, 0, text.length());
        if (text.substring(offset).isBlank()) {
            return cutShort();
        }
        int c = text.codePointAt(offset);
        String before = text.substring(0, offset).stripTrailing();
        if (before.isEmpty()) {
            return here("a project begins with {, not with %s".formatted(mark(c)), offset)
                    .because("A project is a JSON object that begins with \"leadline\": 1.")
                    .tryThis("See whether the right file was given.");
        }
        Problem problem = here("%s is not expected here".formatted(mark(c)), offset)
                .because("The text is JSON (RFC 8259) up to this place.");
        if ((c == '}' || c == ']') && before.endsWith(",")) {
            return problem.tryThis("Remove the comma before the bracket.");
        }
        return switch (c) {
            case '\'' -> problem.tryThis("Names and texts stand in double quotes.");
            case '/', '#' -> problem.tryThis("JSON has no comments; \"notes\" takes any text.");
            case '"' -> problem.tryThis("See whether a comma is missing before it.");
            case '\n', '\r', '\t' ->
                problem.tryThis("Close the quote on the line where it opens; write \\n for a new line.");
            case '“', '”', '„', '‘', '’', '«', '»' -> problem.tryThis("Write straight double quotes: \".");
            case '.' -> problem.tryThis("Write a 0 before the point: 0.5.");
            case '+' -> problem.tryThis("Leave the sign out.");
            default ->
                Character.isLetter(c) && ":,{[".indexOf(before.charAt(before.length() - 1)) >= 0
                        ? problem.tryThis("Names and texts stand in double quotes.")
                        : problem;
        };
    }

    private static String mark(int c) {
        return c == '"' ? "a double quote" : Shown.quoted(Character.toString(c));
    }

    private Problem cutShort() {
        return here("the JSON breaks off", text.stripTrailing().length())
                .because("A quote or a closing bracket is missing.")
                .tryThis("See whether the file was cut short.");
    }

    /// A problem at a place of the text, with its line and column, both from 1.
    private Problem here(String primary, long offset) {
        int at = Math.clamp(offset, 0, text.length());
        int line =
                1 + (int) text.substring(0, at).chars().filter(c -> c == '\n').count();
        int column = at - text.lastIndexOf('\n', at - 1);
        return Problem.of("%s (line %d, column %d)".formatted(primary, line, column))
                .at(Place.of(new Span(at, Math.min(at + 1, text.length()))));
    }
}
