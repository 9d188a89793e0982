package dev.leadline.project;

import static org.junit.jupiter.api.Assertions.assertEquals;

import java.util.List;
import org.junit.jupiter.api.Test;

class JsonWriterTest {

    /// RFC 8785 §3.2.2 (example object) with §3.2.3 and §3.2.4 (its canonical form).
    @Test
    void canonicalFormOfTheStandardsExample() {
        String text = """
                {
                  "numbers": [333333333.33333329, 1E30, 4.50, 2e-3, 0.000000000000000000000000001],
                  "string": "\\u20ac$\\u000F\\u000aA'\\u0042\\u0022\\u005c\\\\\\"\\/",
                  "literals": [null, true, false]
                }
                """;
        String expected = "{\"literals\":[null,true,false],\"numbers\":[333333333.3333333,1e+30,4.5,0.002,1e-27],"
                + "\"string\":\"€$\\u000f\\nA'B\\\"\\\\\\\\\\\"/\"}";
        assertEquals(expected, JsonWriter.canonical(JsonReader.read(text, new Problems())));
    }

    /// RFC 8785 §3.2.3: members are sorted by UTF-16 units, so that the emoji comes before the Hebrew letter.
    @Test
    void sortsMembersAsTheStandardSays() {
        String text = """
                {"\\u20ac": 1, "\\r": 2, "\\ufb33": 3, "1": 4, "\\ud83d\\ude00": 5, "\\u0080": 6, "\\u00f6": 7}""";
        String expected = "{\"\\r\":2,\"1\":4,\"\u0080\":6,\"ö\":7,\"€\":1,\"\ud83d\ude00\":5,\"\ufb33\":3}";
        assertEquals(expected, JsonWriter.canonical(JsonReader.read(text, new Problems())));
    }

    @Test
    void spreadsListsOfTheWholeAndKeepsShortPartsTogether() {
        var json = Json.object()
                .put("leadline", Json.of(1))
                .put("inputs", Json.list(List.of(Json.object().put("name", "v").build())))
                .put("stop", Json.object().put("draws", Json.of(1e6)).build())
                .put("lanes", Json.list(List.of()))
                .build();
        assertEquals("""
                {
                  "leadline": 1,
                  "inputs": [
                    {"name": "v"}
                  ],
                  "stop": {"draws": 1000000},
                  "lanes": []
                }
                """, JsonWriter.pretty(json));
    }

    @Test
    void breaksWhatIsTooLongForALine() {
        var json = Json.object()
                .put(
                        "inputs",
                        Json.list(List.of(Json.object()
                                .put("name", "v")
                                .put("label", "x".repeat(110))
                                .put(
                                        "density",
                                        Json.object().put("family", "normal").build())
                                .build())))
                .build();
        assertEquals("""
                {
                  "inputs": [
                    {
                      "name": "v",
                      "label": "%s",
                      "density": {"family": "normal"}
                    }
                  ]
                }
                """.formatted("x".repeat(110)), JsonWriter.pretty(json));
    }

    @Test
    void hasWordsForWhatIsNotFinite() {
        assertEquals("\"Infinity\"", JsonWriter.compact(Json.of(Double.POSITIVE_INFINITY)));
        assertEquals("null", JsonWriter.compact(Json.orNull(Double.NaN)));
    }
}
