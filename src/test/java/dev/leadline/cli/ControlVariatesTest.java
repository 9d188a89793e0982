package dev.leadline.cli;

import static dev.leadline.ReferenceValues.expected;
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
import tools.jackson.databind.JsonNode;

/// Lanes with control variates, through the command line.
class ControlVariatesTest {
    private static final String INPUTS = """
            {"name": "u", "density": {"family": "uniform", "from": 0, "to": 1}},
            {"name": "v", "density": {"family": "uniform", "from": 0, "to": 1}},
            {"name": "z", "density": {"family": "normal", "mean": 0, "sd": 1}},
            {"name": "t", "density": {"family": "normal", "mean": 2, "sd": 1}},
            {"name": "c", "density": {"family": "cauchy", "location": 0, "scale": 1}},
            {"name": "n", "density": {"family": "poisson", "mean": 3}}""";

    @TempDir
    Path folder;

    private Path project(String asks, String lane) throws IOException {
        return Files.writeString(folder.resolve("controls.leadline"), """
                {"leadline": 1, "inputs": [%s],
                 "dependence": {"copula": "gaussian", "pairs": [{"of": ["z", "t"], "spearman": 0.5}]},
                 "ask": %s, "seed": 3, "lanes": [{"name": "A", %s}]}""".formatted(INPUTS, asks, lane));
    }

    private JsonNode run(String asks, String lane, long draws) throws IOException {
        var outcome = leadline("run", project(asks, lane), "--json", "--quiet", "--draws", draws);
        assertTrue(outcome.exitCode() <= 1, outcome.err());
        return outcome.json().required("lanes").get(0);
    }

    private static String controlled(String points, String... formulasAndMeans) {
        var controls = new StringBuilder();
        for (int i = 0; i < formulasAndMeans.length; i += 2) {
            String mean = formulasAndMeans[i + 1];
            controls.append(i == 0 ? "" : ", ")
                    .append("{\"formula\": \"%s\", \"mean\": %s}"
                            .formatted(
                                    formulasAndMeans[i], Character.isLetter(mean.charAt(0)) ? '"' + mean + '"' : mean));
        }
        return "\"points\": \"%s\", \"controlVariates\": [%s]".formatted(points, controls);
    }

    /// The residual variance of the record, from both sides: four standard errors of a sample variance, of
    /// residuals with a kurtosis of 2.2 (by numerical integration).
    @Test
    void theStandardErrorIsThatOfTheResidualVariance() throws IOException {
        long n = 200_000;
        var answer = run("{\"mean\": \"exp(u)\"}", controlled("independent", "u", "exact"), n)
                .required("answers")
                .get(0);
        double variance = expected("exp-expU-control", "residual_variance");
        double error = answer.required("standardError").asDouble();
        assertEquals(variance, n * error * error, 4 * variance * Math.sqrt(1.2 / n));
        assertEquals(
                expected("exp-expU-control", "mean"),
                answer.required("estimate").asDouble(),
                4 * error);
    }

    /// Halves of which nothing is left but rounding do not tell whether they agree.
    @Test
    void withoutResidualsHalvesAreNotCompared() throws IOException {
        var path = Files.writeString(folder.resolve("halves.leadline"), """
                {"leadline": 1, "seed": 7, "inputs": [
                 {"name": "n", "density": {"family": "poisson", "mean": 3}},
                 {"name": "s", "density": {"family": "lognormal", "mean": 100, "sd": 120}},
                 {"name": "cat", "density": {"family": "generalized-pareto", "location": 0, "scale": 50, "shape": 0.3}}],
                 "ask": {"mean": "n*s + cat"}, "lanes": [{"name": "C", "points": "independent", "crossFitted": true,
                 "controlVariates": [{"formula": "n*s", "mean": "exact"}, {"formula": "cat", "mean": 71.428571}]}]}""");
        var outcome = leadline("run", path, "--quiet", "--draws", 100_000);
        assertTrue(!outcome.out().contains("Infinity") && outcome.exitCode() == 0, outcome.out() + outcome.err());
    }

    /// Each layout, each way to know a mean, weights, several answers: the value within four standard errors, and a
    /// standard error that is smaller than without. Two outcomes are controls themselves, which leaves
    /// nothing to chance.
    @ParameterizedTest
    @CsvSource(delimiter = '|', quoteCharacter = '`', textBlock = """
            independent      | ``
            antithetic       | ``
            stratified       | "cells": {"u": 4}
            latin-hypercube  | "cube": 50
            scrambled-sobol  | "replicates": 64
            shifted-lattice  | "replicates": 64
            independent      | "crossFitted": true
            stratified       | "cells": {"u": 4}, "crossFitted": true
            latin-hypercube  | "cube": 50, "crossFitted": true
            scrambled-sobol  | "replicates": 64, "crossFitted": true
            independent      | "drawFrom": {"v": {"family": "beta", "alpha": 1.2, "beta": 1}}
            antithetic       | "drawFrom": {"v": {"family": "beta", "alpha": 1.2, "beta": 1}}
            scrambled-sobol  | "replicates": 64, "drawFrom": {"v": {"family": "beta", "alpha": 1.2, "beta": 1}}
            independent      | "crossFitted": true, "drawFrom": {"v": {"family": "beta", "alpha": 1.2, "beta": 1}}
            """)
    void worksWithEveryLayout(String layout, String further) throws IOException {
        String asks = "[{\"mean\": \"exp(u + v/3) + z^3/9\"}, {\"probability\": \"u + z > 1\"}, {\"mean\": \"v*n\"}]";
        String fields = further.isEmpty() ? "" : ", " + further;
        String controls = controlled(layout, "u", "exact", "z", "0", "v*n", "exact", "[u + z > 1]", "quadrature");
        var answers = run(asks, controls + fields, 65_536).required("answers");
        var plain = run(asks, "\"points\": \"" + layout + "\"" + fields.replace(", \"crossFitted\": true", ""), 65_536)
                .required("answers");
        // P(u + z > 1) = E[Φ(u - 1)] = 1 - Φ(1) - φ(1) + φ(0), by scipy.
        double chance = 1 - 0.841344746068542949 - 0.241970724519143349 + 0.398942280401432678;
        double error = answers.get(0).required("standardError").asDouble();
        assertEquals(
                (Math.E - 1) * 3 * (Math.exp(1 / 3.0) - 1),
                answers.get(0).required("estimate").asDouble(),
                4 * error);
        assertTrue(error < plain.get(0).required("standardError").asDouble());
        boolean isWeighted = further.contains("drawFrom");
        near(chance, answers.get(1), isWeighted);
        near(1.5, answers.get(2), isWeighted);
    }

    /// Of weighted draws what is left is the chance of the weights.
    private static void near(double value, JsonNode answer, boolean isWeighted) {
        double reach = isWeighted ? 4 * answer.required("standardError").asDouble() : 1e-7;
        assertEquals(value, answer.required("estimate").asDouble(), reach);
    }

    @ParameterizedTest
    @CsvSource(delimiter = '|', textBlock = """
            exp(u)      | exact      | it takes exp of an input | Write "mean": "quadrature".
            1/(1 + u)   | exact      | it divides by an input | Write "mean": "quadrature".
            [u > 0.5]   | exact      | it compares or chooses | Write "mean": "quadrature".
            u^0.5       | exact      | it has a power that is no small whole number | Write "mean": "quadrature".
            u^5         | exact      | it has u to the power of 5, and moments are known to the fourth | Write "mean": "quadrature".
            z*t         | exact      | z and t are tied and stand in one product | State the mean as a number.
            c           | exact      | c has no finite variance | State the mean as a number.
            z*t         | quadrature | inputs that it reads are tied (z, t) | State the mean as a number, or choose another control variate.
            u*v*z*n     | quadrature | it reads 4 inputs, and quadrature goes over 3 at most | Write "mean": "exact".
            c           | quadrature | it seems to have no finite variance | State the mean as a number, or choose another control variate.
            log(z)      | quadrature | it has no finite value | State the mean as a number, or choose another control variate.
            u - u       | quadrature | it does not vary | Write "mean": "exact".
            """)
    void refusesMeansThatItCannotFind(String formula, String mean, String reason, String remedy) throws IOException {
        var outcome = leadline("check", project("{\"mean\": \"u\"}", controlled("independent", formula, mean)));
        assertEquals(2, outcome.exitCode());
        String said = (outcome.out() + outcome.err()).replaceAll("\\s+", " ");
        assertTrue(said.contains(reason), said);
        assertTrue(said.contains(remedy), said);
    }

    /// Moments of the inputs by hand: E (2u + n - z)² with Var = 1/3 + 3 + 1, mean 4; E u⁴ = 1/5; E u v n.
    @ParameterizedTest
    @CsvSource({
        "(2*u + n - z)^2, 20.333333333333333",
        "u^4, 0.2",
        "u*v*n, 0.75",
        "(z - t)/4 + 1, 0.5",
        "z^4 - 3*z^2, 0",
        "'(n - 3)^3', 3",
        "(u + 1e6)^2 - 1e12 - 2e6*u, 0.3333333333333"
    })
    void exactMeans(String formula, double mean) throws IOException {
        // The mean is the estimate where the outcome is its own control.
        var answer = run("{\"mean\": \"%s\"}".formatted(formula), controlled("independent", formula, "exact"), 1000)
                .required("answers")
                .get(0);
        assertEquals(mean, answer.required("estimate").asDouble(), 1e-12 * Math.max(1, Math.abs(mean)));
        assertTrue(answer.required("intervalNote").asString().contains("explain every outcome"));
    }

    @Test
    void refusesWhatCannotGoTogether() throws IOException {
        String controls = controlled("scrambled-sobol", "u", "exact", "z", "exact");
        var few = leadline("check", project("{\"mean\": \"u\"}", controls + ", \"replicates\": 16"));
        assertEquals(2, few.exitCode());
        assertTrue((few.out() + few.err()).contains("2 control variates are too many for 16 replicates"), few.err());
        var alone =
                leadline("check", project("{\"mean\": \"u\"}", "\"points\": \"independent\", \"crossFitted\": true"));
        assertEquals(2, alone.exitCode());
        assertTrue((alone.out() + alone.err()).contains("crossFitted has no control variates to fit"));
        var beside = leadline(
                "check",
                project(
                        "{\"mean\": \"u\"}",
                        controlled("independent", "u", "exact")
                                + ", \"selfNormalised\": true, \"drawFrom\": {\"z\": {\"family\": \"normal\", \"mean\": 1, \"sd\": 1}}"));
        assertEquals(2, beside.exitCode());
        assertTrue((beside.out() + beside.err()).contains("control variates beside selfNormalised"));
    }

    @Test
    void saysHowManyObservationsWouldDo() throws IOException {
        String two = controlled("independent", "u", "exact", "v", "exact");
        var few = leadline("run", project("{\"mean\": \"exp(u)\"}", two), "--draws", 19);
        assertEquals(2, few.exitCode());
        assertTrue(few.err().contains("takes 20 draws"), few.err());
        var enough = run("{\"mean\": \"exp(u)\"}", two, 20).required("answers").get(0);
        assertTrue(enough.required("standardError").asDouble() > 0);
        // The draws of one item of work are one part, outside which there are none.
        var lane = run("{\"mean\": \"exp(u)\"}", two + ", \"crossFitted\": true", 64);
        var answer = lane.required("answers").get(0);
        assertTrue(answer.required("estimate").isNull());
        assertEquals(
                "2 control variates need at least 20 observations outside every part of the draws that is corrected;"
                        + " so far there are 0 of 64",
                answer.required("intervalNote").asString());
        assertEquals("objection", ground(lane).required("strength").asString());
    }

    private static JsonNode ground(JsonNode lane) {
        for (JsonNode ground : lane.required("grounds")) {
            if (ground.required("code").asString().equals("controls")) {
                return ground;
            }
        }
        throw new AssertionError("no ground");
    }

    @Test
    void grounds() throws IOException {
        var good = ground(run("{\"mean\": \"exp(u)\"}", controlled("independent", "u", "exact"), 10_000));
        assertEquals("shown", good.required("status").asString());
        String text = good.required("text").asString();
        assertTrue(text.matches("The control variate explains 98\\.\\d\\d % of the variance"), text);
        double share = Double.parseDouble(text.replaceAll("[^.0-9]", "")) / 100;
        // Four standard errors of a correlation's square: 2ρ(1 - ρ²)/√n, and half of its last digit.
        assertEquals(expected("exp-expU-control", "rho_squared"), share, 4 * 2 * .0163 / 100 + 5e-5);
        var nothing = ground(run("{\"mean\": \"exp(u)\"}", controlled("independent", "n", "exact"), 10_000));
        assertEquals("caution", nothing.required("strength").asString());
        assertTrue(nothing.required("text").asString().endsWith("no more than chance may do"));
        var few = ground(run("{\"mean\": \"exp(u)\"}", controlled("independent", "u", "exact"), 15));
        assertEquals("caution", few.required("strength").asString());
        var wrong = ground(run("{\"mean\": \"exp(u)\"}", controlled("independent", "u", "0.51"), 100_000));
        assertEquals("objection", wrong.required("strength").asString());
        assertTrue(wrong.required("text").asString().startsWith("The mean of u in these draws is"));
        var twice = ground(
                run("{\"mean\": \"exp(u)\"}", controlled("independent", "u", "exact", "3*u - 1", "0.5"), 10_000));
        assertEquals("note", twice.required("strength").asString());
        assertEquals(
                "3*u - 1 is left out: u explains it wholly",
                twice.required("text").asString());
    }

    /// Hits are known beside the corrected chance, few of them are doubted.
    @Test
    void hitsOfAControlledProbability() throws IOException {
        var lane = run("{\"probability\": \"z > 3\"}", controlled("independent", "z", "exact"), 10_000);
        var answer = lane.required("answers").get(0);
        assertEquals("student", answer.required("intervalKind").asString());
        long hits = answer.required("hits").asLong();
        assertTrue(hits > 0 && hits < 25, "hits " + hits);
        boolean doubted = false;
        for (JsonNode ground : lane.required("grounds")) {
            doubted |= ground.required("code").asString().equals("hits")
                    && ground.required("status").asString().equals("doubted");
        }
        assertTrue(doubted);
    }
}
