package dev.leadline;

import java.util.Arrays;
import java.util.List;
import java.util.Set;
import java.util.stream.StreamSupport;
import tools.jackson.databind.JsonNode;
import tools.jackson.databind.json.JsonMapper;

/// The records of `reference/reference-values.json`: figures from outside this code, each with its source.
public final class ReferenceValues {
    private static final JsonNode RECORDS = read();

    private ReferenceValues() {}

    private static JsonNode read() {
        try (var in = ReferenceValues.class.getResourceAsStream("/reference/reference-values.json")) {
            return JsonMapper.builder().build().readTree(in).required("records");
        } catch (java.io.IOException e) {
            throw new java.io.UncheckedIOException(e);
        }
    }

    /// The record of this id.
    public static JsonNode record(String id) {
        return only(RECORDS, "id", id);
    }

    /// The ids of all records of these areas.
    public static List<String> ids(Set<String> areas) {
        return StreamSupport.stream(RECORDS.spliterator(), false)
                .filter(node -> areas.contains(node.required("area").asString()))
                .map(node -> node.required("id").asString())
                .toList();
    }

    /// The case of a record whose label is `label`, or else the one that starts with it.
    public static JsonNode caseOf(String id, String label) {
        var cases = StreamSupport.stream(record(id).required("cases").spliterator(), false)
                .filter(c -> c.required("label").asString().startsWith(label))
                .toList();
        return cases.stream()
                .filter(c -> c.required("label").asString().equals(label))
                .findFirst()
                .orElseGet(() -> one(cases, id + ", case " + label));
    }

    /// The number a record expects under this name.
    public static double expected(String id, String name) {
        return expected(record(id), name);
    }

    /// The number a record or a case expects under this name.
    public static double expected(JsonNode recordOrCase, String name) {
        return only(recordOrCase.required("expected"), "name", name)
                .required("value")
                .asDouble();
    }

    /// The text of what a record expects under this name: all digits, or words.
    public static String text(String id, String name) {
        return only(record(id).required("expected"), "name", name)
                .required("text")
                .asString();
    }

    /// The relative tolerance a record asks for.
    public static double relativeTolerance(String id) {
        return record(id).required("tolerance").required("rel").asDouble();
    }

    /// An array of numbers.
    public static double[] numbers(JsonNode array) {
        return StreamSupport.stream(array.spliterator(), false)
                .mapToDouble(JsonNode::asDouble)
                .toArray();
    }

    /// Words of 64 bits written with spaces or commas between them, to base 10 or 16.
    public static long[] words(String text, int base) {
        return Arrays.stream(text.split("[ ,]+"))
                .mapToLong(word -> Long.parseUnsignedLong(word, base))
                .toArray();
    }

    private static JsonNode only(JsonNode nodes, String field, String value) {
        var found = StreamSupport.stream(nodes.spliterator(), false)
                .filter(node -> node.required(field).asString().equals(value))
                .toList();
        return one(found, field + " " + value);
    }

    private static JsonNode one(List<JsonNode> found, String what) {
        if (found.size() != 1) {
            throw new AssertionError(found.size() + " entries with " + what);
        }
        return found.getFirst();
    }
}
