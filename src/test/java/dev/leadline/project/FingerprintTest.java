package dev.leadline.project;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertNotEquals;

import dev.leadline.model.Project;
import java.nio.charset.StandardCharsets;
import java.security.MessageDigest;
import java.util.HexFormat;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class FingerprintTest {

    private static final String PROJECT = """
            {"leadline": 1, "title": "T", "notes": "N",
             "constants": [{"name": "k", "value": 2.50, "unit": "m", "label": "L", "source": "S"}],
             "inputs": [{"name": "x", "unit": "m", "label": "M", "provenance": "P",
                         "density": {"family": "normal", "mean": 0, "sd": 1e-7}}],
             "steps": ["y = k*x^2   # m3"],
             "ask": {"probability": "y>1", "unit": "1/a", "label": "A"},
             "reference": {"value": 1, "error": 0.1}, "confidence": 0.9, "tolerance": {"relative": 0.1},
             "stop": {"rule": "fixed", "draws": 10}, "seed": 7, "lanes": [{"name": "A", "points": "independent"}]}
            """;

    private static String fingerprint(String text) {
        return Fingerprint.of(Project.of(ProjectFile.parse(text)));
    }

    /// The content that counts, written out by hand in the form of RFC 8785 and hashed here.
    @Test
    void isTheHashOfTheCanonicalQuestion() throws Exception {
        String canonical = "{\"ask\":[{\"probability\":\"y > 1\",\"unit\":\"1/a\"}],"
                + "\"constants\":[{\"name\":\"k\",\"source\":\"S\",\"unit\":\"m\",\"value\":2.5}],"
                + "\"inputs\":[{\"density\":{\"family\":\"normal\",\"mean\":0,\"sd\":1e-7},"
                + "\"name\":\"x\",\"provenance\":\"P\",\"unit\":\"m\"}],"
                + "\"leadline\":1,\"steps\":[\"y = k * x ^ 2\"]}";
        byte[] hash = MessageDigest.getInstance("SHA-256").digest(canonical.getBytes(StandardCharsets.UTF_8));
        assertEquals(HexFormat.of().formatHex(hash), fingerprint(PROJECT));
    }

    @ParameterizedTest
    @CsvSource(
            delimiter = ';',
            value = {
                "\"title\": \"T\"; \"title\": \"U\"",
                "\"notes\": \"N\"; \"notes\": \"O\"",
                "\"label\": \"L\"; \"label\": \"K\"",
                "\"label\": \"M\"; \"label\": \"K\"",
                "\"label\": \"A\"; \"label\": \"K\"",
                "\"value\": 1,; \"value\": 2,",
                "\"confidence\": 0.9; \"confidence\": 0.8",
                "\"relative\"; \"absolute\"",
                "\"draws\": 10; \"draws\": 11",
                "\"seed\": 7; \"seed\": 8",
                "\"name\": \"A\"; \"name\": \"B\"",
                "k*x^2   # m3; k * x^2  # volume",
                "2.50; 2.5"
            })
    void staysWhereTheQuestionStays(String before, String after) {
        String changed = PROJECT.replace(before, after);
        assertNotEquals(PROJECT, changed);
        assertEquals(fingerprint(PROJECT), fingerprint(changed));
    }

    @ParameterizedTest
    @CsvSource(
            delimiter = ';',
            value = {
                "2.50; 2.6",
                "\"sd\": 1e-7; \"sd\": 1e-8",
                "\"source\": \"S\"; \"source\": \"R\"",
                "\"provenance\": \"P\"; \"provenance\": \"Q\"",
                "\"unit\": \"1/a\"; \"unit\": \"1/d\"",
                "y>1; y>2",
                "y>1; y>=1",
                "k*x^2; x^2*k",
                "\"title\": \"T\"; \"safety\": true"
            })
    void changesWithTheQuestion(String before, String after) {
        assertNotEquals(fingerprint(PROJECT), fingerprint(PROJECT.replace(before, after)));
    }

    @Test
    void doesNotDependOnHowOneAskIsWritten() {
        String list = PROJECT.replace("\"ask\": {", "\"ask\": [{").replace("\"A\"},\n", "\"A\"}],\n");
        assertEquals(fingerprint(PROJECT), fingerprint(list));
    }
}
