package dev.leadline.cli;

import static dev.leadline.cli.CommandLines.leadline;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/// Draws that form no whole observation, or no whole round: refused, or left out and told.
class WholeObservationsTest {
    @TempDir
    Path folder;

    private Path project(String lane, String stop) throws IOException {
        return Files.writeString(folder.resolve("p.leadline"), """
                {"leadline": 1, "seed": 3, %s
                 "inputs": [{"name": "x", "density": {"family": "uniform", "from": 0, "to": 1}}],
                 "ask": {"mean": "x^2"}, "lanes": [{"name": "B", %s}]}
                """.formatted(stop, lane));
    }

    @ParameterizedTest
    @CsvSource(quoteCharacter = '\'', textBlock = """
            '"points": "antithetic"', 2, One observation of its scheme is the mean of 2 draws.
            '"points": "stratified", "cells": {"x": 7}', 7, One observation of its scheme is the mean of 7 draws.
            '"points": "stratified", "cells": {"x": 7}, "allocation": "neyman"', 56, One observation of its scheme is the mean of 56 draws.
            '"points": "latin-hypercube"', 30, A point for each of its 30 cubes takes 30 draws.
            '"points": "latin-hypercube", "cube": 50', 50, One observation of its scheme is the mean of 50 draws.
            '"points": "scrambled-sobol"', 16, The first point of each of its 16 replicates takes 16 draws.
            '"points": "shifted-lattice", "replicates": 12', 12, The first point of each of its 12 replicates takes 12 draws.
            '"points": "independent", "drawFrom": {"adapt": "grid"}', 10, One observation of its scheme is the mean of 10 draws.
            '"points": "antithetic", "drawFrom": {"adapt": "cross-entropy"}', 40, One observation of its scheme is the mean of 40 draws.
            """)
    void tooFewDrawsAreRefused(String lane, int fewest, String why) throws IOException {
        String problem = "Lane B has no answer of %d draw%s".formatted(fewest - 1, fewest == 2 ? "" : "s");
        Path small = project(lane, "\"stop\": {\"rule\": \"fixed\", \"draws\": %d},".formatted(fewest - 1));
        var checked = leadline("check", small);
        assertEquals(2, checked.exitCode());
        String told = checked.out() + checked.err();
        assertTrue(told.contains(problem) && told.contains("$.stop.draws") && told.contains(why), told);
        Path project = project(lane, "");
        var ran = leadline("run", project, "--draws", fewest - 1);
        assertEquals(2, ran.exitCode());
        assertTrue(ran.err().contains(problem) && ran.err().contains(why), ran.err());
        var least = leadline("run", project, "--draws", fewest, "--json");
        assertEquals(
                fewest, least.json().required("lanes").get(0).required("draws").asInt(), least.err());
    }

    @Test
    void aUsualBudgetMayBeTooSmall() throws IOException {
        var checked = leadline(
                "check",
                project(
                        "\"points\": \"stratified\", \"cells\": {\"x\": 65000}, \"drawFrom\": {\"adapt\": \"cross-entropy\"}",
                        ""));
        String told = checked.out() + checked.err();
        assertTrue(told.contains("Lane B has no answer of 1,000,000 draws") && told.contains("$.lanes"), told);
    }

    @ParameterizedTest
    @CsvSource({"antithetic, 1000, whole observations of 1001 draws", "scrambled-sobol, 512, whole rounds of 1001 draws"
    })
    void saysHowManyDrawsAreWhole(String points, int made, String words) throws IOException {
        var json = leadline("run", project("\"points\": \"" + points + "\"", ""), "--draws", 1001, "--json")
                .json();
        var lane = json.required("lanes").get(0);
        assertEquals(made, lane.required("draws").asInt());
        assertEquals(
                "%s are %,d".formatted(words.replace("1001", "1,001"), made),
                lane.required("stopReason").asString());
    }

    /// The lattice has 2^20 points in each replicate.
    @Test
    void aDrawBeyondTheLastPointIsRefused() throws IOException {
        Path project = project("\"points\": \"shifted-lattice\", \"replicates\": 10", "");
        var look = leadline("look", project, "--draw", 10 << 20);
        assertEquals(2, look.exitCode());
        assertTrue(look.err().contains("here is no draw 10,485,760 in lane B"), look.err());
        assertEquals(0, leadline("look", project, "--draw", (10 << 20) - 1).exitCode());
    }

    /// Time is looked at after each item of work, here one point of one of the replicates.
    @Test
    void timeThatEndsInTheFirstRoundGivesNoAnswerYet() throws IOException {
        Path project = project("\"points\": \"scrambled-sobol\"", "");
        var text = leadline("run", project, "--seconds", 1e-9);
        assertEquals(1, text.exitCode(), text.err());
        assertTrue(text.out().contains("no answer yet"), text.out());
        var lane = leadline("run", project, "--seconds", 1e-9, "--json")
                .json()
                .required("lanes")
                .get(0);
        assertEquals(0, lane.required("draws").asInt());
        assertEquals("time used up", lane.required("stopReason").asString());
        assertTrue(lane.required("answers").isEmpty());
    }
}
