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

class RehearseTest {
    @TempDir
    Path folder;

    private Path project;

    @BeforeEach
    void write() throws IOException {
        project = folder.resolve("heavy.leadline");
        Files.writeString(project, """
            {
              "leadline": 1,
              "inputs": [{"name": "x", "density": {"family": "lognormal", "mu": 0, "sigma": 2}}],
              "ask": {"mean": "x", "unit": "m"},
              "reference": {"value": 7.38905609893065, "source": "exp(2)"},
              "tolerance": {"relative": 0.5},
              "stop": {"rule": "fixed", "draws": 100},
              "seed": 1,
              "lanes": [{"name": "A", "points": "independent"}, {"name": "B", "points": "antithetic"}]
            }
            """);
    }

    /// Of 100 lognormal (σ = 2) draws .740 of the intervals hold, by an independent experiment.
    @Test
    void printsOneObject() {
        var outcome = leadline("rehearse", project, "--repetitions", "400", "--json");
        assertEquals(1, outcome.exitCode(), outcome.err());
        var json = outcome.json();
        assertEquals("A", json.required("lane").asString());
        var rehearsal = json.required("rehearsal");
        double rate = rehearsal.required("rate").asDouble();
        assertEquals(.740, rate, 4 * Math.sqrt(.74 * .26 / 400));
        assertEquals(400, rehearsal.required("repetitions").asInt());
        assertEquals(
                Math.sqrt(rate * (1 - rate) / 400), rehearsal.required("mcse").asDouble(), 1e-15);
        int low = rehearsal.required("missedLow").asInt();
        int high = rehearsal.required("missedHigh").asInt();
        assertEquals(400, Math.round(400 * rate) + low + high);
        assertTrue(low > high);
        assertEquals("falls-short", rehearsal.required("verdict").asString());
        assertEquals(
                7.38905609893065, rehearsal.required("sought").required("value").asDouble());
        assertTrue(rehearsal.required("sought").required("draws").isNull());
        var all = json.required("rehearsals");
        assertEquals(1, all.size());
        assertEquals(rehearsal, all.get(0).required("answers").get(0));
        assertTrue(all.get(0).required("withinTolerance").asInt()
                >= all.get(0).required("met").asInt() / 2);
        assertEquals(
                outcome.out(),
                leadline("rehearse", project, "--repetitions", "400", "--json", "--threads", "1")
                        .out());
    }

    @Test
    void saysWhatItMeans() {
        var outcome = leadline("rehearse", project, "--repetitions", "300", "--draws", "30,100", "--lane", "B");
        assertEquals(1, outcome.exitCode(), outcome.err());
        for (String words : new String[] {
            "Lane B (antithetic), 300 repetitions of 30 draws",
            "Lane B (antithetic), 300 repetitions of 100 draws",
            "the interval (student) holds less often than the 95 % it says: mostly it lies too",
            "Value sought: 7.38905609893065 m, as stated: exp(2).",
            "repetitions meet the tolerance"
        }) {
            assertTrue(outcome.out().contains(words), () -> words + "\n" + outcome.out());
        }
    }

    @Test
    void withoutAReferenceOfANormalMeanItHolds() throws IOException {
        Files.writeString(
                project,
                Files.readString(project)
                        .replace(
                                "\"family\": \"lognormal\", \"mu\": 0, \"sigma\": 2",
                                "\"family\": \"normal\", \"mean\": 5, \"sd\": 1")
                        .replaceAll(" *\"reference\".*\n", ""));
        var outcome = leadline("rehearse", project, "--mcse", "0.02");
        assertEquals(0, outcome.exitCode(), outcome.out() + outcome.err());
        assertTrue(outcome.out().contains("119 repetitions of 100 draws"), outcome.out());
        assertTrue(outcome.out().contains("from a run of 11,900 draws made for it"), outcome.out());
        assertTrue(outcome.out().contains("holds as often as it says"), outcome.out());
    }

    /// Hoeffding's intervals of 50 draws are twice as long as they need be, and none of them reaches 0.9. Of ten
    /// repetitions that all hold, the exact lower limit of the rate is `.025^(1/10) = .6915`.
    @Test
    void saysWhereAllHoldOrNone() throws IOException {
        for (String[] expected : new String[][] {
            {"0.5", "10 of 10 intervals hold the value, 100 % (at least 69.1 %)"},
            {"0.9", "0 of 10 intervals hold the value, 0 % (at most 30.9 %)"}
        }) {
            Files.writeString(project, """
                {"leadline": 1, "inputs": [{"name": "u", "density": {"family": "uniform", "from": 0, "to": 1}}],
                 "ask": {"mean": "u", "unit": "m"}, "reference": {"value": %s}, "interval": "hoeffding",
                 "bounds": [0, 1], "stop": {"rule": "fixed", "draws": 50}, "seed": 1}
                """.formatted(expected[0]));
            var outcome = leadline("rehearse", project, "--repetitions", "10");
            assertTrue(outcome.out().contains(expected[1]), outcome.out() + outcome.err());
        }
    }

    @Test
    void refuses() {
        for (String[] wrong : new String[][] {
            {"--draws", "10,x", "'x' is not a whole number"},
            {"--draws", "1", "lane A has no answer"},
            {"--repetitions", "1", "'1' is not a whole number from 2"},
            {"--lane", "C", "There is no lane \"C\""}
        }) {
            var outcome = leadline("rehearse", project, wrong[0], wrong[1]);
            if (wrong[2].startsWith("lane A")) {
                assertEquals(1, outcome.exitCode(), "one draw has no interval, which is told");
                assertTrue(outcome.out().contains("no repetition has an interval"), outcome.out());
            } else {
                assertEquals(2, outcome.exitCode(), outcome.out());
                assertTrue(outcome.err().contains(wrong[2]), outcome.err());
            }
        }
        var both = leadline("rehearse", project, "--repetitions", "10", "--mcse", "0.1");
        assertEquals(2, both.exitCode());
        assertTrue(both.err().contains("--repetitions and --mcse both say"), both.err());
    }

    @Test
    void drawsItsPicture() throws IOException {
        Path file = folder.resolve("rehearsal.svg");
        var outcome =
                leadline("figure", project, "-o", file, "--view", "rehearsal", "--repetitions", "100", "--draws", "50");
        assertEquals(1, outcome.exitCode(), outcome.err());
        String svg = Files.readString(file);
        assertTrue(svg.contains("hold the value: "), "key");
        assertTrue(svg.contains("Intervals of 100 repetitions of lane A (independent), of 50 draws each"), "caption");
        var refused = leadline("figure", project, "-o", file, "--repetitions", "100");
        assertEquals(2, refused.exitCode());
        assertTrue(refused.err().contains("--repetitions belongs to --view rehearsal"), refused.err());
    }

    @Test
    void plans() {
        var outcome = leadline("plan", project, "--json", "--draws", "20000");
        assertEquals(0, outcome.exitCode(), outcome.out() + outcome.err());
        var lanes = outcome.json().required("plan");
        assertEquals(2, lanes.size());
        var first = lanes.get(0);
        assertEquals("A", first.required("lane").asString());
        var draws = first.required("draws");
        assertTrue(draws.get(0).asDouble() <= draws.get(1).asDouble());
        assertTrue(draws.get(1).asDouble() <= draws.get(2).asDouble());
        assertTrue(first.required("seconds").asDouble() > 0);
        assertTrue(first.required("anyTime").required("draws").get(1).asDouble()
                > draws.get(1).asDouble());
        assertTrue(first.required("cannotTell").isNull());
        var text = leadline("plan", project, "--lane", "A", "--draws", "20000", "--absolute", "0.5");
        assertEquals(0, text.exitCode(), text.err());
        assertTrue(
                text.out().contains("A number fixed beforehand, the project's rule (error falls with the root of the"),
                text.out());
        assertTrue(text.out().contains("Looked at as one likes (the band is "), text.out());
    }

    @Test
    void plansNothingWithoutATolerance() throws IOException {
        Files.writeString(project, Files.readString(project).replaceAll(" *\"tolerance\".*\n", ""));
        var refused = leadline("plan", project);
        assertEquals(2, refused.exitCode());
        assertTrue(refused.err().contains("There is no tolerance to plan for"), refused.err());
        var told = leadline("plan", project, "--relative", "0.1", "--draws", "100");
        assertEquals(1, told.exitCode(), told.out());
        assertTrue(told.out().contains("Cannot tell yet: "), told.out());
    }
}
