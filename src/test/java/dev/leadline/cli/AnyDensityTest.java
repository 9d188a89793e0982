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
import org.junit.jupiter.params.provider.CsvSource;

/// Projects with densities that are more than a member of a family, from the file to the answer.
class AnyDensityTest {

    private static final String PROJECT = """
            {
              "leadline": 1,
              "constants": [{"name": "width", "value": 2}],
              "inputs": [{"name": "s", "density": %s}],
              "ask": {"mean": "%s"},
              "stop": {"rule": "fixed", "draws": 200000},
              "seed": 20261201
            }
            """;

    @TempDir
    Path folder;

    private CommandLines.Outcome run(String density, String asked) throws IOException {
        var file = Files.writeString(folder.resolve("any.leadline"), PROJECT.formatted(density, asked));
        return leadline("run", file, "--json");
    }

    /// Exact means: `Γ(1) / Γ(1/3)` for the second moment of `exp(-|s|^3)` (substitution); moments of a normal density
    /// add by weight; 8.1213... for the normal density above 8 from the reference set (dist-truncated-normal); the
    /// rest by hand.
    @ParameterizedTest
    @CsvSource(
            delimiter = '|',
            value = {
                "{'formula': 'exp(-abs(s)^3)', 'from': '-inf', 'to': 'inf'} | s^2 | 0.3732821739",
                "{'formula': '-(s/width)^2/2 - 1e5', 'from': '-inf', 'to': 'inf', 'log': true} | s^2 | 4",
                "{'formula': '[abs(s) > 1]', 'from': -2, 'to': 3, 'breaks': [-1, 1]} | s | 0.83333333333",
                "{'mixture': [{'weight': .9, 'family': 'normal', 'mean': 0, 'sd': 1}, {'weight': .1, 'family': 'normal', 'mean': 0, 'sd': 5}]} | s^2 | 3.4",
                "{'family': 'table', 'values': [50, 0, 10], 'probabilities': [.03, .93, .04]} | s | 1.9",
                "{'family': 'normal', 'mean': 0, 'sd': 1, 'truncate': [8, 'inf']} | s | 8.121368112236112",
                "{'family': 'exponential', 'mean': 1, 'shift': 3, 'scale': 2} | s | 5",
                "{'family': 'uniform', 'from': 0, 'to': 1, 'scale': 4, 'truncate': [1, 2]} | s | 1.5",
                "{'mixture': [{'weight': .5, 'family': 'poisson', 'mean': 2}, {'weight': .5, 'family': 'bernoulli', 'probability': .5}]} | s | 1.25",
                "{'mixture': [{'weight': .5, 'formula': '1', 'from': 0, 'to': 1}, {'weight': .5, 'family': 'uniform', 'from': 2, 'to': 4, 'shift': 1}]} | s | 2.25",
            })
    void answersAsItMust(String density, String asked, double exact) throws IOException {
        var outcome = run(density.replace('\'', '"').replace(" .", " 0.").replace("[.", "[0."), asked);
        assertEquals(0, outcome.exitCode(), outcome::err);
        var answer = outcome.json().required("lanes").get(0).required("answers").get(0);
        double error = answer.required("standardError").asDouble();
        assertEquals(exact, answer.required("estimate").asDouble(), 4.5 * error, outcome::out);
        assertTrue(error < 0.02 * Math.abs(exact), outcome::out);
    }

    @Test
    void saysWhereATypedDensityHasAGap() throws IOException {
        var outcome = run("{\"formula\": \"[abs(s) > 1]\", \"from\": -2, \"to\": 2}", "s");
        assertTrue(outcome.err().contains("no density between s = -1 and 1"), outcome::err);
    }

    @Test
    void saysThatACvIsMoreLikelyOneInPerCent() throws IOException {
        String note = "cv is 15: the standard deviation is 15 times the mean";
        var outcome = run("{\"family\": \"weibull\", \"mean\": 8, \"cv\": 15}", "s");
        assertTrue(outcome.err().contains(note), outcome::err);
        assertTrue(outcome.err().contains("cv is a fraction: 0.15 for 15 %."), outcome::err);
        assertFalse(run("{\"family\": \"weibull\", \"mean\": 8, \"cv\": 0.15}", "s")
                .err()
                .contains("cv is"));
    }

    /// The kept mass by mpmath: 3.2503307e-15.
    @Test
    void saysHowLittleATruncationKeeps() throws IOException {
        var outcome = run("{\"family\": \"normal\", \"mean\": 1500, \"sd\": 200, \"truncate\": [0.5, 3]}", "s");
        assertTrue(outcome.err().contains("truncate keeps 3.3e-15 of the density"), outcome::err);
    }

    @Test
    void pointsIntoTheFormulaOfADensity() throws IOException {
        var outcome = run(
                "{\"mixture\": [{\"weight\": 1, \"formula\": \"exp(-q^2)\", \"from\": \"-inf\", \"to\": \"inf\"}]}",
                "s");
        assertEquals(2, outcome.exitCode());
        var file = folder.resolve("any.leadline");
        var text = leadline("run", file).err();
        assertTrue(text.contains("$.inputs[0].density.mixture[0].formula"), text);
        assertTrue(text.contains("exp(-q^2)") && text.contains("^"), text);
    }
}
