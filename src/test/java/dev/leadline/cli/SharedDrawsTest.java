package dev.leadline.cli;

import static dev.leadline.cli.CommandLines.leadline;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.stream.IntStream;
import java.util.stream.StreamSupport;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;
import tools.jackson.databind.JsonNode;

/// Lanes whose cells share the draws of a pass by a pilot, as projects.
class SharedDrawsTest {
    @TempDir
    Path folder;

    private Path project(String ask, String more) throws IOException {
        return Files.writeString(folder.resolve("shared.leadline"), """
                {"leadline": 1, "inputs": [{"name": "x", "density": {"family": "uniform", "from": 0, "to": 1}},
                  {"name": "y", "density": {"family": "normal", "mean": 0, "sd": 1}}], "ask": [%s], "seed": 4,
                 "lanes": [{"name": "A", "points": "stratified", "cells": {"y": 2, "x": 3}, "allocation": "neyman"%s}]}
                """.formatted(ask, more));
    }

    private static double[] numbers(JsonNode list) {
        return StreamSupport.stream(list.spliterator(), false)
                .mapToDouble(JsonNode::asDouble)
                .toArray();
    }

    /// Cells of x and y, x running fastest; in the upper third of x and the upper half of y the outcome is
    /// uniform on (0, 1), with a standard deviation of 1/sqrt(12), and 0 elsewhere.
    @Test
    void allNumbersStandInTheRecord() throws IOException {
        var path = project("{\"mean\": \"if(x > 2/3 & y > 0, 3*x - 2, 0)\"}", "");
        var lane = leadline("run", path, "--draws", 96_000, "--json")
                .json()
                .required("lanes")
                .get(0);
        assertEquals(
                "stratified in 2 cells of y × 3 cells of x, 1 to 43 of 48 draws to a cell by a pilot of 6,144",
                lane.required("scheme").asString());
        var allocation = lane.required("allocation");
        assertEquals("{\"x\":3,\"y\":2}", allocation.required("cells").toString());
        assertEquals(6_144, allocation.required("pilotDraws").asInt());
        assertEquals(48, allocation.required("drawsPerPass").asInt());
        assertEquals("[1,1,1,1,1,43]", allocation.required("draws").toString());
        double[] sds = numbers(allocation.required("standardDeviations"));
        IntStream.range(0, 5).forEach(c -> assertEquals(0, sds[c]));
        // The excess kurtosis of a uniform density is -1.2: an sd of 1,024 draws is off by 1.4 %.
        assertEquals(1 / Math.sqrt(12), sds[5], .06 / Math.sqrt(12));
        var answer = lane.required("answers").get(0);
        double error = 1 / 6.0 / Math.sqrt(12 * 43 * 2_000.0);
        assertEquals(error, answer.required("standardError").asDouble(), .1 * error);
        assertEquals(1 / 12.0, answer.required("estimate").asDouble(), 4 * error);
        assertEquals(96_000, lane.required("draws").asInt());
        assertEquals(2_000, lane.required("observations").asInt());
    }

    @ParameterizedTest
    @ValueSource(
            strings = {
                "",
                ", \"drawFrom\": {\"y\": {\"shift\": 1}}",
                ", \"drawFrom\": {\"adapt\": \"grid\"}",
                ", \"controlVariates\": [{\"formula\": \"y\", \"mean\": \"exact\"}]"
            })
    void sameBitsOnAnyNumberOfThreads(String more) throws IOException {
        var path = project("{\"mean\": \"exp(2*x + y)\"}, {\"probability\": \"y > x + 1\"}", more);
        String one = answers(path, 1);
        assertEquals(one, answers(path, 2));
        assertEquals(one, answers(path, 8));
    }

    private static String answers(Path path, int threads) {
        var run = leadline("run", path, "--draws", 200_000, "--threads", threads, "--json");
        var lane = run.json().required("lanes").get(0);
        return lane.required("answers") + lane.required("allocation").toString();
    }

    /// Hits do not follow from a share of cells that have different numbers of draws; the skewness of passes
    /// judges.
    @Test
    void anEventIsJudgedByItsPasses() throws IOException {
        String rare = "{\"mean\": \"if(x > 2/3, x, 0)\"}, {\"probability\": \"%s\"}";
        String few = leadline("run", project(rare.formatted("y > 3.5"), ""), "--draws", 48_000)
                .out();
        assertTrue(few.contains("caution   Answer 2: skewness"), few);
        String many = leadline("run", project(rare.formatted("y > 1"), ""), "--draws", 48_000)
                .out();
        assertTrue(many.contains("shown     Answer 2: skewness"), many);
        // The cells with one draw of 48 have an eighth of the even share: 3 / 48,000 times 8.
        String none = leadline("run", project(rare.formatted("y > 9"), ""), "--draws", 48_000)
                .out();
        assertTrue(
                none.contains(
                        "caution   Answer 2: no hit in 48,000 draws: a part of probability below 0.000500 may be"),
                none);
    }
}
