package dev.leadline.cli;

import static dev.leadline.cli.CommandLines.leadline;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class CompareTest {
    @TempDir
    Path folder;

    private Path project;

    @BeforeEach
    void write() throws IOException {
        project = folder.resolve("growth.leadline");
        Files.writeString(project, """
                {
                  "leadline": 1,
                  "inputs": [{"name": "u", "density": {"family": "uniform", "from": 0, "to": 1}}],
                  "ask": {"mean": "exp(u)"},
                  "tolerance": {"absolute": 0.01},
                  "stop": {"rule": "fixed", "draws": 20000},
                  "seed": 1,
                  "lanes": [
                    {"name": "A", "points": "independent"},
                    {"name": "B", "points": "antithetic"},
                    {"name": "C", "points": "latin-hypercube"}
                  ]
                }
                """);
    }

    @Test
    void printsOneObjectWithTheTimes() {
        var outcome = leadline("compare", project, "--json");
        assertEquals(0, outcome.exitCode(), outcome.err());
        var comparison = outcome.json().required("comparison");
        assertEquals("[\"A\",\"B\"]", comparison.required("of").toString());
        for (String name : new String[] {"varianceRatio", "timeRatio", "efficiencyRatio"}) {
            var ratio = comparison.required(name);
            assertTrue(ratio.get(0).asDouble() <= ratio.get(1).asDouble(), ratio::toString);
            assertTrue(ratio.get(1).asDouble() <= ratio.get(2).asDouble(), ratio::toString);
            assertTrue(ratio.get(0).asDouble() > 0);
        }
        assertEquals(2, comparison.required("toTolerance").size());
        assertTrue(comparison.required("toTolerance").get(0).required("seconds").isArray());
    }

    @Test
    void comparesTheLanesNamed() {
        var outcome = leadline("compare", project, "C", "B", "--draws", "10000");
        assertEquals(0, outcome.exitCode(), outcome.err());
        assertTrue(outcome.out().contains("C is better: B needs "), outcome.out());
        assertTrue(outcome.out().contains("B meets the tolerance after "), outcome.out());
    }

    /// Draws of the second lane follow from the clock, and from nothing else.
    @Test
    void equalTimeGivesTheSecondLaneItsOwnDraws() {
        var lanes =
                leadline("compare", project, "--equal", "time", "--json").json().required("lanes");
        assertEquals(20_000, lanes.get(0).required("draws").asLong());
        assertTrue(lanes.get(1).required("draws").asLong() > 2_000);
        assertTrue(lanes.get(1).required("draws").asLong() < 200_000);
    }

    @Test
    void whatCannotBeToldIsNotDone() throws IOException {
        Files.writeString(
                project, Files.readString(project).replace("\"mean\": \"exp(u)\"", "\"probability\": \"u > 0.9999\""));
        var outcome = leadline("compare", project, "--draws", "1000");
        assertEquals(1, outcome.exitCode(), outcome.err());
        assertTrue(outcome.out().contains("Cannot tell yet: "), outcome.out());
    }

    /// What is recommended can be written into the project as it stands; a lane that is there already keeps its name.
    @Test
    void suggestsALaneThatTheProjectTakes() throws IOException {
        var outcome = leadline("suggest", project, "--draws", "8192", "--json");
        assertEquals(0, outcome.exitCode(), outcome.err());
        var rows = outcome.json().required("suggestions");
        double least = rows.get(0).required("efficiencyRatio").get(0).asDouble();
        assertTrue(least > 100, outcome.out());
        assertEquals(rows.get(0).required("lane"), outcome.json().required("recommended"));
        assertTrue(outcome.out().contains("This is lane B of the project."), outcome.out());
        Files.writeString(
                project,
                Files.readString(project)
                        .replace(
                                "{\"name\": \"A\", \"points\": \"independent\"},",
                                "{\"name\": \"A\", \"points\": \"independent\"}],")
                        .replaceAll("(?s)\\],\\s*\\{\"name\": \"B\".*", ", %s]}")
                        .replace("%s", outcome.json().required("recommended").toString()));
        assertEquals(0, leadline("check", project).exitCode(), Files.readString(project));
    }

    /// Nothing in a run but its seconds depends on a clock.
    @Test
    void aRunComparesWithoutTimes() {
        var run = leadline("run", project, "--json", "--threads", "1");
        var comparison = run.json().required("comparison");
        assertTrue(comparison.required("timeRatio").isNull());
        assertTrue(comparison.required("efficiencyRatio").isNull());
        assertEquals("second-better", comparison.required("outcome").asString());
        assertEquals(2, run.json().required("comparisons").size());
        String seconds = "\"seconds\": [0-9.eE-]+";
        assertEquals(
                run.out().replaceAll(seconds, ""),
                leadline("run", project, "--json", "--threads", "3").out().replaceAll(seconds, ""));
    }
}
