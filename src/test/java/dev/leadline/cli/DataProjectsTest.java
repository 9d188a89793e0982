package dev.leadline.cli;

import static dev.leadline.cli.CommandLines.leadline;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertNotEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/// Projects with inputs from data, from the file to the answer.
class DataProjectsTest {

    private static final String PROJECT = """
            {
              "leadline": 1,
              "inputs": [{"name": "w", "unit": "h", "density": {"data": "waits.csv", "column": "hours"}}],
              "ask": {"mean": "w", "unit": "h"},
              "stop": {"rule": "fixed", "draws": 1000000},
              "seed": 7
            }
            """;

    @TempDir
    Path folder;

    private Path project;

    @BeforeEach
    void write() throws IOException {
        project = Files.writeString(folder.resolve("wait.leadline"), PROJECT);
        Files.writeString(folder.resolve("waits.csv"), "call,hours\n1,1\n2,2\n3,2\n4,7\n5,\n");
    }

    private Path with(String density) throws IOException {
        return Files.writeString(
                folder.resolve("other.leadline"),
                PROJECT.replace("\"data\": \"waits.csv\", \"column\": \"hours\"", density));
    }

    /// The mean of 1, 2, 2 and 7 is 3, their standard deviation sqrt(5.5).
    @Test
    void drawTheValuesOfTheColumn() {
        var run = leadline("run", project, "--json");
        var answer = run.json().required("lanes").get(0).required("answers").get(0);
        double error = Math.sqrt(5.5 / 1e6);
        assertEquals(3, answer.required("estimate").asDouble(), 4 * error);
        assertEquals(error, answer.required("standardError").asDouble(), .01 * error);
        assertTrue(
                run.err().contains("column hours of waits.csv has no number in row 6")
                        && run.err().contains("4 values remain"),
                run.err());
    }

    @Test
    void areFoundBesideTheProjectFromAnywhere() {
        assertEquals(0, leadline("check", project).exitCode());
        Path here = Path.of("").toAbsolutePath();
        assertEquals(0, leadline("check", here.relativize(project)).exitCode());
    }

    @Test
    void areTheirDataToo() throws IOException {
        String before = fingerprint();
        assertEquals(before, fingerprint());
        Files.writeString(folder.resolve("waits.csv"), "call,hours\n1,1\n2,2\n3,2\n4,8\n5,\n");
        assertNotEquals(before, fingerprint());
    }

    private String fingerprint() {
        return leadline("run", project, "--json", "--draws", 1000)
                .json()
                .required("fingerprint")
                .asString();
    }

    /// The data are read, and must be there; draws come from the member, here of mean 30.
    @Test
    void mayDrawFromAFittedMember() throws IOException {
        Path fitted = with("\"data\": \"waits.csv\", \"column\": \"hours\", \"fitted\": "
                + "{\"family\": \"exponential\", \"mean\": 30}");
        var answer = leadline("run", fitted, "--json")
                .json()
                .required("lanes")
                .get(0)
                .required("answers")
                .get(0);
        assertEquals(30, answer.required("estimate").asDouble(), 4 * .03);
        Files.delete(folder.resolve("waits.csv"));
        assertEquals(2, leadline("check", fitted).exitCode());
    }

    /// The variance is 5.5, that of the values, plus the square of the bandwidth.
    @Test
    void mayBeSmoothed() throws IOException {
        var run = leadline(
                "run",
                with("\"data\": \"waits.csv\", \"column\": 2, \"kind\": \"kernel\", \"bandwidth\": 0.5"),
                "--json");
        double error = Math.sqrt(5.75 / 1e6);
        var answer = run.json().required("lanes").get(0).required("answers").get(0);
        assertEquals(3, answer.required("estimate").asDouble(), 4 * error);
        assertEquals(error, answer.required("standardError").asDouble(), .01 * error);
        var byRule = leadline("check", with("\"data\": \"waits.csv\", \"column\": 2, \"kind\": \"kernel\""));
        // quartiles 1.75 and 3.25: .9 * 1.5 / 1.34 * 4^-.2
        assertTrue(
                byRule.err().contains("the bandwidth is 0.7635, by Silverman's rule of thumb, 0.9 min(sd, IQR/1.34)"),
                byRule.err());
        assertTrue(byRule.err().contains("the standard deviation is 2.466, that of the data 2.345."), byRule.err());
    }

    @ParameterizedTest
    @CsvSource(
            delimiter = '|',
            quoteCharacter = '`',
            value = {
                "\"data\": \"wait.csv\" | $.inputs[0].density.data | there is no data file wait.csv",
                "\"data\": \"waits.csv\" | $.inputs[0].density.column | waits.csv has 2 columns and none is named",
                "\"data\": \"waits.csv\", \"column\": 2, \"kind\": \"kernal\""
                        + " | $.inputs[0].density.kind | kind is \"kernal\" but must be \"empirical\" or \"kernel\"",
                "\"data\": \"waits.csv\", \"column\": 2, \"bandwidth\": 1"
                        + " | $.inputs[0].density.bandwidth | bandwidth has no use without smoothing",
                "\"data\": \"waits.csv\", \"column\": 2, \"kind\": \"kernel\","
                        + " \"fitted\": {\"family\": \"exponential\", \"mean\": 3}"
                        + " | $.inputs[0].density.kind | kind has no use beside fitted",
                "\"data\": \"waits.csv\", \"column\": 2, \"bandwidth\": 2,"
                        + " \"fitted\": {\"family\": \"exponential\", \"mean\": 3}"
                        + " | $.inputs[0].density.bandwidth | bandwidth has no use beside fitted",
                "\"data\": \"waits.csv\", \"column\": 2, \"kind\": \"kernel\", \"bandwidth\": -1"
                        + " | $.inputs[0].density.bandwidth | bandwidth is -1 but must be greater than 0",
                "\"data\": \"waits.csv\", \"column\": 2, \"fitted\": {\"family\": \"exponential\", \"mean\": -3}"
                        + " | $.inputs[0].density.fitted.mean | mean is -3 but must be greater than 0"
            })
    void areRefusedAtTheirPlace(String density, String path, String primary) throws IOException {
        var problems = leadline("check", with(density), "--json").json().required("problems");
        assertEquals(1, problems.size(), problems.toString());
        assertEquals(path, problems.get(0).required("path").asString());
        assertEquals(primary, problems.get(0).required("primary").asString());
    }
}
