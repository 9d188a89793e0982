package dev.leadline.cli;

import static dev.leadline.cli.CommandLines.leadline;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;
import tools.jackson.databind.JsonNode;

/// Stop rules in project files, in what `run` prints, and against its arguments.
class StopRulesTest {
    @TempDir
    Path folder;

    private Path project(String ask, String rest) throws IOException {
        return Files.writeString(folder.resolve("one.leadline"), """
                {"leadline": 1, "inputs": [{"name": "x", "density": {"family": "exponential", "mean": 1}}],
                 "ask": %s, "seed": 5%s}""".formatted(ask, rest));
    }

    private static JsonNode lane(CommandLines.Outcome outcome) {
        return outcome.json().required("lanes").get(0);
    }

    private static double number(JsonNode node) {
        return node.asDouble();
    }

    /// Beside a tolerance the usual rule is `any-time`.
    @Test
    void aToleranceIsWaitedFor() throws IOException {
        var outcome = leadline("run", project("{\"mean\": \"x\"}", ", \"tolerance\": {\"absolute\": 0.02}"), "--json");
        assertEquals(0, outcome.exitCode(), outcome.out());
        var lane = lane(outcome);
        assertEquals("any-time", lane.required("stopRule").asString());
        assertEquals(
                "the any-time band is within the tolerance",
                lane.required("stopReason").asString());
        var answer = lane.required("answers").get(0);
        assertEquals("any-time-mean", answer.required("bandKind").asString());
        double estimate = number(answer.required("estimate"));
        double low = number(answer.required("band").get(0));
        double high = number(answer.required("band").get(1));
        assertTrue(high - estimate <= .02 && estimate - low <= .02);
        assertTrue(low < number(answer.required("interval").get(0)));
        assertTrue(high > number(answer.required("interval").get(1)));
        assertTrue(
                number(lane.required("draws")) < 100_000, lane.required("draws").asString());
        var text = leadline("run", folder.resolve("one.leadline")).out();
        assertTrue(text.contains("it holds with 95 % however often one looks"), text);
    }

    @Test
    void withoutAToleranceAMillionDrawsAreMade() throws IOException {
        var lane = lane(leadline("run", project("{\"mean\": \"x\"}", ""), "--json"));
        assertEquals("fixed", lane.required("stopRule").asString());
        assertEquals(1_000_000, lane.required("draws").asLong());
        assertEquals("all draws made", lane.required("stopReason").asString());
    }

    @Test
    void drawsOnTheCommandLineAreMadeExactly() throws IOException {
        var file = project("{\"mean\": \"x\"}", ", \"tolerance\": {\"absolute\": 0.05}");
        var lane = lane(leadline("run", file, "--draws", 50_000, "--json"));
        assertEquals(50_000, lane.required("draws").asLong());
        assertEquals("fixed", lane.required("stopRule").asString());
        assertEquals(0, leadline("run", file, "--draws", 50_000).exitCode());
        assertEquals(1, leadline("run", file, "--draws", 100).exitCode());
    }

    /// What `--seconds` gives is an end, not another rule.
    @Test
    void secondsLieBesideTheRule() throws IOException {
        var file = project("{\"mean\": \"x\"}", ", \"tolerance\": {\"absolute\": 0.05}");
        var lane = lane(leadline("run", file, "--seconds", 60, "--json"));
        assertEquals("any-time", lane.required("stopRule").asString());
    }

    @Test
    void hitsOfARelativeToleranceAreCounted() throws IOException {
        var file = project("{\"probability\": \"x > 4\"}", ", \"tolerance\": {\"relative\": 0.1}");
        var outcome = leadline("run", file, "--json");
        assertEquals(0, outcome.exitCode(), outcome.out());
        var lane = lane(outcome);
        assertEquals("hits", lane.required("stopRule").asString());
        assertEquals("385 hits seen", lane.required("stopReason").asString());
        var answer = lane.required("answers").get(0);
        assertEquals(385, answer.required("hits").asInt());
        assertEquals("hits", answer.required("intervalKind").asString());
        assertEquals("any-time-chance", answer.required("bandKind").asString());
        assertEquals(384.0 / (lane.required("draws").asLong() - 1), number(answer.required("estimate")));
    }

    /// A budget that ends a lane before its rule does leaves the tolerance open.
    @Test
    void aBudgetMayEndItFirst() throws IOException {
        var file = project(
                "{\"mean\": \"x\"}",
                ", \"tolerance\": {\"absolute\": 0.001}, \"stop\": {\"rule\": \"any-time\", \"draws\": 20000}");
        var outcome = leadline("run", file, "--json");
        assertEquals(1, outcome.exitCode());
        assertEquals(
                "all draws made, the tolerance not met",
                lane(outcome).required("stopReason").asString());
    }

    /// The interval for a fixed number of draws would do; the band does not, and the lane was watched.
    @Test
    void theBandDecidesWhetherAWatchedLaneMeetsTheTolerance() throws IOException {
        String tolerance = ", \"tolerance\": {\"absolute\": 0.015}, \"stop\": {\"rule\": \"%s\", \"draws\": 20000}";
        var watched = leadline("run", project("{\"mean\": \"x\"}", tolerance.formatted("any-time")), "--json");
        var fixed = leadline("run", project("{\"mean\": \"x\"}", tolerance.formatted("fixed")), "--json");
        assertTrue(number(lane(watched).required("answers").get(0).required("halfWidth")) < .015);
        assertEquals(1, watched.exitCode());
        assertEquals(0, fixed.exitCode());
        assertTrue(watched.out().contains("The any-time band reaches "), watched.out());
    }

    /// Lanes that stop where they please share no draws: they are compared by as many, whatever the rule.
    @Test
    void comparedLanesMakeAsManyDraws() throws IOException {
        var file = project("{\"mean\": \"x\"}", """
                , "tolerance": {"absolute": 0.05},
                "lanes": [{"name": "A", "points": "independent"}, {"name": "B", "points": "antithetic"}]""");
        for (var lane : leadline("compare", file, "--json").json().required("lanes")) {
            assertEquals(1_000_000, lane.required("draws").asLong());
        }
    }

    /// Repetitions of a watched lane are judged by its band: at least 99 % hold.
    @Test
    void aRehearsalStopsByTheRule() throws IOException {
        var file = project("{\"mean\": \"x\"}", ", \"tolerance\": {\"absolute\": 0.1}, \"reference\": {\"value\": 1}");
        int repetitions = 300;
        var outcome = leadline("rehearse", file, "--repetitions", repetitions, "--json");
        var json = outcome.json();
        var rehearsal = json.has("rehearsal") ? json.required("rehearsal") : json;
        assertTrue(
                rehearsal.required("rate").asDouble() >= .99 - 4 * Math.sqrt(.99 * .01 / repetitions), outcome.out());
    }

    @Test
    void whatAFirstStageFoundIsTold() throws IOException {
        var file = project(
                "{\"mean\": \"x\"}", ", \"tolerance\": {\"absolute\": 0.02}, \"stop\": {\"rule\": \"two-stage\"}");
        var outcome = leadline("run", file, "--json");
        assertEquals(0, outcome.exitCode(), outcome.out());
        var lane = lane(outcome);
        var stage = lane.required("firstStage");
        assertEquals(10_000, stage.required("draws").asInt());
        assertFalse(stage.required("inAnswer").asBoolean());
        // The kurtosis allowed for at alpha .05, 10,000 draws, inflation 1.2
        assertEquals(24.9393, number(stage.required("largestKurtosis")), 5e-5);
        assertEquals(lane.required("draws").asLong(), stage.required("wanted").asLong());
        assertEquals(
                "two-stage",
                lane.required("answers").get(0).required("intervalKind").asString());
        assertTrue(leadline("run", file).out().contains("first stage of 10,000 draws, which do not enter the answer"));
    }

    @ParameterizedTest
    @ValueSource(
            strings = {
                "{\"quantile\": \"x\", \"at\": 0.9}",
                "{\"tailMean\": \"x\", \"at\": 0.9}",
                "{\"ratio\": [\"x\", \"1 + x\"]}",
                "{\"standardDeviation\": \"x\"}",
                "{\"distribution\": \"x\"}",
                "{\"mean\": \"min(x, 1)\"}, \"bounds\": [0, 1]"
            })
    void everythingAskedHasABandToStopBy(String ask) throws IOException {
        var outcome = leadline("run", project(ask, ", \"tolerance\": {\"absolute\": 0.05}"), "--json");
        assertEquals(0, outcome.exitCode(), outcome.out());
        var answer = lane(outcome).required("answers").get(0);
        assertTrue(number(answer.required("band").get(1))
                        - number(answer.required("band").get(0))
                <= .1);
        String kind = answer.required("bandKind").asString();
        assertEquals(
                ask.contains("bounds")
                        ? "any-time-bounded"
                        : ask.contains("quantile") ? "any-time-quantile" : "any-time-mean",
                kind);
    }
}
