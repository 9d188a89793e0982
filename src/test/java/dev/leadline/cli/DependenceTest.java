package dev.leadline.cli;

import static dev.leadline.ReferenceValues.caseOf;
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
import org.junit.jupiter.params.provider.ValueSource;
import tools.jackson.databind.JsonNode;

/// Tied inputs through the command line.
class DependenceTest {
    private static final String NORMALS = """
            {"name": "x", "density": {"family": "normal", "mean": 0, "sd": 1}},
            {"name": "y", "density": {"family": "normal", "mean": 0, "sd": 1}},
            {"name": "z", "density": {"family": "normal", "mean": 0, "sd": 1}}""";

    @TempDir
    Path folder;

    private Path project(String inputs, String dependence, String ask) throws IOException {
        return Files.writeString(
                folder.resolve("tied.leadline"),
                "{\"leadline\": 1, \"inputs\": [%s], \"dependence\": %s, \"ask\": %s, \"seed\": 20261201}"
                        .formatted(inputs, dependence, ask));
    }

    private static JsonNode answer(Path project, long draws) {
        var outcome = leadline("run", project, "--json", "--quiet", "--draws", draws);
        assertTrue(outcome.exitCode() <= 1, outcome.err());
        return outcome.json().required("lanes").get(0).required("answers").get(0);
    }

    /// JCGM 101:2008, 9.4: `X1^2 + X2^2`; its exact mean and standard deviation, in units of 1e-6. The square of its
    /// deviation has a kurtosis below 30.
    @ParameterizedTest(name = "{0}")
    @ValueSource(
            strings = {
                "x1=0, rho=0",
                "x1=0.01, rho=0",
                "x1=0.05, rho=0",
                "x1=0, rho=0.9",
                "x1=0.01, rho=0.9",
                "x1=0.05, rho=0.9"
            })
    void comparisonLoss(String label) throws IOException {
        JsonNode one = caseOf("prop-jcgm101-comparison-loss", label);
        String x1 = label.replaceAll("x1=([^,]*),.*", "$1");
        String rho = label.replaceAll(".*rho=", "");
        String inputs = """
                {"name": "x1", "density": {"family": "normal", "mean": %s, "sd": 0.005}},
                {"name": "x2", "density": {"family": "normal", "mean": 0, "sd": 0.005}}""".formatted(x1);
        var project = project(
                inputs,
                "{\"copula\": \"gaussian\", \"pairs\": [{\"of\": [\"x1\", \"x2\"], \"pearson\": %s}]}".formatted(rho),
                "{\"mean\": \"1e6*(x1^2 + x2^2)\"}");
        long draws = 1_000_000;
        JsonNode answer = answer(project, draws);
        double deviation = expected(one, "u_1e6");
        double error = deviation / Math.sqrt(draws);
        assertEquals(expected(one, "mean_1e6"), answer.required("estimate").asDouble(), 4 * error);
        assertEquals(
                deviation,
                answer.required("standardError").asDouble() * Math.sqrt(draws),
                4 * deviation * Math.sqrt(29.0 / (4 * draws)));
    }

    /// `E[exp(sum of tied normals)]` is `exp(half the variance of the sum)`, and the product of two normals has their
    /// correlation for mean, `1 + ρ²` for variance.
    @ParameterizedTest(name = "ρ = {0}")
    @CsvSource({"-.7", "0", ".3", ".95"})
    void productOfNormals(double rho) throws IOException {
        var project = project(
                NORMALS,
                "{\"copula\": \"gaussian\", \"pairs\": [{\"of\": [\"x\", \"y\"], \"pearson\": %s}]}".formatted(rho),
                "[{\"mean\": \"x*y\"}, {\"mean\": \"x*z\"}]");
        var outcome = leadline("run", project, "--json", "--quiet", "--draws", 1_000_000);
        var answers = outcome.json().required("lanes").get(0).required("answers");
        assertEquals(rho, answers.get(0).required("estimate").asDouble(), 4e-3 * Math.sqrt(1 + rho * rho));
        // z is in no pair
        assertEquals(0, answers.get(1).required("estimate").asDouble(), 4e-3);
    }

    /// The chance that both of two Student-tied inputs are beyond their median is that of two normals.
    ///
    /// The chance that both are among the largest thousandth is .3914 in a thousand for 2 degrees of freedom
    /// and ρ = .5, and .0543 for normals: by quadrature with scipy of the density of the one times the
    /// conditional tail of the other (a t with 3 degrees of freedom). The limit for ever smaller parts is
    /// .3910: Embrechts, McNeil and Straumann (2002).
    @Test
    void studentExtremesComeTogether() throws IOException {
        String pairs = "\"pairs\": [{\"of\": [\"x\", \"y\"], \"kendall\": %s}]}".formatted(2 / Math.PI * Math.asin(.5));
        String ask = "[{\"probability\": \"x > 0 & y > 0\"}, {\"probability\": \"x > 3.0902323 & y > 3.0902323\"}]";
        long draws = 2_000_000;
        var student = project(NORMALS, "{\"copula\": \"student\", \"dof\": 2, " + pairs, ask);
        var json =
                leadline("run", student, "--json", "--quiet", "--draws", draws).json();
        var answers = json.required("lanes").get(0).required("answers");
        assertEquals(1 / 3.0, answers.get(0).required("estimate").asDouble(), 4 * Math.sqrt(2 / 9.0 / draws));
        double p = .3914160e-3;
        assertEquals(p, answers.get(1).required("estimate").asDouble(), 4 * Math.sqrt(p / draws));
        assertEquals("student", json.required("dependence").required("copula").asString());
        assertEquals(2, json.required("dependence").required("dof").asDouble());
        double q = .0542592e-3;
        var gaussian = project(NORMALS, "{\"copula\": \"gaussian\", " + pairs, ask);
        var gauss =
                leadline("run", gaussian, "--json", "--quiet", "--draws", draws).json();
        answers = gauss.required("lanes").get(0).required("answers");
        assertEquals(q, answers.get(1).required("estimate").asDouble(), 4 * Math.sqrt(q / draws));
    }

    @Test
    void saysWhatIsAchieved() throws IOException {
        var project = project(
                NORMALS,
                "{\"copula\": \"gaussian\", \"pairs\": [{\"of\": [\"y\", \"x\"], \"kendall\": 0.4}]}",
                "{\"mean\": \"x*y\"}");
        String text = leadline("check", project).out();
        assertTrue(
                text.contains(
                        "Tied by a Gaussian copula; correlations achieved in 131,072 draws of their own, ± at 95 %:\n"
                                + "  y, x  kendall 0.4  0.40"),
                text);
        assertTrue(leadline("run", project, "--draws", 1000).out().contains("  y, x  kendall 0.4  0.40"));
        var checked = leadline("check", project, "--json").json();
        var run = leadline("run", project, "--draws", 1000, "--json").json();
        assertEquals(checked.required("dependence"), run.required("dependence"));
        var pair = run.required("dependence").required("pairs").get(0);
        assertEquals("[\"y\",\"x\"]", pair.required("of").toString());
        assertEquals("kendall", pair.required("measure").asString());
        assertEquals(Math.sin(.2 * Math.PI), pair.required("latent").asDouble(), 1e-15);
        assertTrue(pair.required("interval").get(0).asDouble()
                < pair.required("achieved").asDouble());
        assertTrue(run.required("dependence").required("repaired").isNull());
    }

    @Test
    void drawsWithTheNearestWhereAskedTo() throws IOException {
        String pairs =
                "\"pairs\": [{\"of\": [\"x\", \"y\"], \"pearson\": 0.9}, {\"of\": [\"y\", \"z\"], \"pearson\": 0.9},"
                        + " {\"of\": [\"x\", \"z\"], \"pearson\": 0.1}]}";
        var refused = leadline("check", project(NORMALS, "{\"copula\": \"gaussian\", " + pairs, "{\"mean\": \"x\"}"));
        assertEquals(2, refused.exitCode());
        assertTrue(refused.err().contains("\"repair\": true"), refused.err());
        var project = project(NORMALS, "{\"copula\": \"gaussian\", \"repair\": true, " + pairs, "{\"mean\": \"x*y\"}");
        var outcome = leadline("run", project, "--json", "--draws", 1_000_000);
        assertTrue(outcome.err().contains("the nearest correlations that can hold together"), outcome.err());
        var repaired = outcome.json().required("dependence").required("repaired");
        assertEquals(3, repaired.size());
        double latent = outcome.json()
                .required("dependence")
                .required("pairs")
                .get(0)
                .required("latent")
                .asDouble();
        assertTrue(latent < .9 && latent > .7, "" + latent);
        var first = outcome.json().required("dependence").required("pairs").get(0);
        assertEquals(.9, first.required("target").asDouble());
        assertEquals(latent, first.required("taken").asDouble(), 1e-9);
        String text = leadline("check", project).out();
        assertTrue(text.contains("x, y  pearson 0.9, nearest %.4f  0.".formatted(latent)), text);
        var answer = outcome.json().required("lanes").get(0).required("answers").get(0);
        assertEquals(latent, answer.required("estimate").asDouble(), 4e-3 * 1.4);
    }

    @Test
    void saysWhyThereIsNoInterval() throws IOException {
        String inputs = NORMALS.replaceFirst(
                "\"family\": \"normal\", \"mean\": 0, \"sd\": 1",
                "\"family\": \"student\", \"dof\": 4, \"location\": 0, \"scale\": 1");
        var project = project(
                inputs,
                "{\"copula\": \"gaussian\", \"pairs\": [{\"of\": [\"x\", \"y\"], \"pearson\": 0.6}]}",
                "{\"mean\": \"x*y\"}");
        String text = leadline("check", project).out();
        assertTrue(text.contains(", no ±: rare, large values of x decide it"), text);
        var pair = leadline("check", project, "--json")
                .json()
                .required("dependence")
                .required("pairs")
                .get(0);
        assertTrue(pair.required("interval").get(0).isNull());
        assertTrue(pair.required("intervalNote").asString().startsWith("rare, large values of x"));
    }

    /// Ranks of two values hardly tell anything; pearson speaks of the values.
    @Test
    void speaksOfTheCopulaBehindADiscreteInput() throws IOException {
        Files.writeString(folder.resolve("coin.csv"), "side\n0\n1\n");
        String inputs = "{\"name\": \"x\", \"density\": {\"family\": \"normal\", \"mean\": 0, \"sd\": 1}},"
                + " {\"name\": \"coin\", \"density\": {\"data\": \"coin.csv\", \"column\": \"side\"}}";
        String dependence = "{\"copula\": \"gaussian\", \"pairs\": [{\"of\": [\"x\", \"coin\"], \"%s\": 0.5}]}";
        String ask = "{\"mean\": \"x*coin\"}";
        var ranks = leadline("check", project(inputs, dependence.formatted("spearman"), ask), "--json");
        assertTrue(ranks.err().contains("spearman speaks of the copula behind coin"), ranks.err());
        var values = leadline("check", project(inputs, dependence.formatted("pearson"), ask), "--json");
        assertTrue(!values.err().contains("copula behind"), values.err());
        var pair = values.json().required("dependence").required("pairs").get(0);
        // the correlation of a normal and its sign is sqrt(2/π) of that of the normals
        assertEquals(.5 / Math.sqrt(2 / Math.PI), pair.required("latent").asDouble(), 2e-4);
        assertEquals(.5, pair.required("achieved").asDouble(), 4 / Math.sqrt(131_072));
    }

    @Test
    void looksAtATiedDraw() throws IOException {
        String ask = "{\"mean\": \"x*y\"}";
        var tied = project(
                NORMALS, "{\"copula\": \"gaussian\", \"pairs\": [{\"of\": [\"x\", \"y\"], \"pearson\": 0.6}]}", ask);
        var inputs = leadline("look", tied, "--draw", 5, "--json").json().required("inputs");
        var file = Files.readString(tied).replaceAll("\"dependence\": .*?]}, \"ask\"", "\"ask\"");
        var untied = leadline("look", Files.writeString(folder.resolve("untied.leadline"), file), "--draw", 5, "--json")
                .json()
                .required("inputs");
        double x = untied.required("x").asDouble();
        assertEquals(x, inputs.required("x").asDouble(), 1e-12);
        assertEquals(
                .6 * x + .8 * untied.required("y").asDouble(),
                inputs.required("y").asDouble(),
                1e-11);
        assertEquals(untied.required("z").asDouble(), inputs.required("z").asDouble());
        assertEquals(
                0,
                leadline("look", tied, "--json")
                        .json()
                        .required("inputs")
                        .required("y")
                        .asDouble());
    }
}
