package dev.leadline.cli;

import static dev.leadline.cli.CommandLines.leadline;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.leadline.cli.CommandLines.Outcome;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import tools.jackson.databind.JsonNode;

/// Lanes that draw from other densities, as projects.
class OtherDensitiesTest {
    private static final String NORMAL = "{\"family\": \"normal\", \"mean\": 0, \"sd\": 1}";

    @TempDir
    Path folder;

    private Path project(String density, String ask, String lane) throws IOException {
        return write("{\"name\": \"x\", \"density\": %s}".formatted(density), ask, lane);
    }

    private Path write(String inputs, String ask, String lane) throws IOException {
        return Files.writeString(folder.resolve("others.leadline"), """
                {"leadline": 1, "inputs": [%s], "ask": {%s}, "stop": {"rule": "fixed", "draws": 100000}, "seed": 4,
                 "lanes": [{"name": "A", "points": "independent", %s}]}
                """.formatted(inputs, ask, lane));
    }

    private static Outcome run(Path project, Object... more) {
        Object[] arguments = new Object[more.length + 2];
        arguments[0] = "run";
        arguments[1] = project;
        System.arraycopy(more, 0, arguments, 2, more.length);
        return leadline(arguments);
    }

    private static JsonNode answer(Path project, Object draws) {
        var outcome = run(project, "--json", "--draws", draws);
        return outcome.json().required("lanes").get(0).required("answers").get(0);
    }

    private static double of(JsonNode answer, String name) {
        return answer.required(name).asDouble(Double.NaN);
    }

    /// P(Z > 3) = 1.3498980316300946e-3 in tables; the median of an exponential density of mean 1 is ln 2.
    @ParameterizedTest(name = "{1} {0}")
    @CsvSource(
            delimiter = ';',
            value = {
                "{\"shift\": 3}; shifted by 3",
                "{\"widen\": 3}; widened 3 times about its median",
                "{\"tilt\": 3}; tilted by 3",
                "{\"family\": \"normal\", \"mean\": 3, \"sd\": 2}; from normal(3, 2)"
            })
    void changesOfTheInputsOwnDensity(String change, String words) throws IOException {
        for (double share : new double[] {0, .2}) {
            var project = project(
                    NORMAL,
                    "\"probability\": \"x > 3\"",
                    "\"drawFrom\": {\"x\": %s}, \"nominalShare\": %s".formatted(change, share));
            var answer = answer(project, 1e5);
            double error = of(answer, "standardError");
            assertEquals(1.3498980316300946e-3, of(answer, "estimate"), 4 * error);
            assertTrue(error < 3e-5, "error " + error); // 1.2e-4 of plain draws
            String scheme = "independent, x " + words + ", " + (share == 0 ? "none" : "20 %") + " from its own";
            var json = run(project, "--json").json().required("lanes").get(0);
            assertEquals(scheme, json.required("scheme").asString());
            assertTrue(run(project).out().contains("lane A: " + scheme + " · 100,000 draws"));
        }
    }

    /// About the median: half of the draws stay below it.
    @Test
    void widensAboutTheMedian() throws IOException {
        var project = project(
                "{\"family\": \"exponential\", \"mean\": 1}",
                "\"mean\": \"x\"",
                "\"drawFrom\": {\"x\": {\"widen\": 2}}, \"nominalShare\": 0");
        int below = 0;
        for (int draw = 0; draw < 400; draw++) {
            var look = leadline("look", project, "--draw", draw, "--json").json();
            double x = look.required("inputs").required("x").asDouble();
            assertTrue(x > -Math.log(2));
            // 2 exp(-x) over exp(-(x + ln 2)/2), and 0 where x is below 0
            double weight = x < 0 ? 0 : 2 * Math.exp(-x) / Math.exp(-(x + Math.log(2)) / 2);
            assertEquals(weight, of(look, "weight"), 1e-12 * weight);
            below += x < Math.log(2) ? 1 : 0;
        }
        assertEquals(200, below, 4 * Math.sqrt(100));
    }

    /// Values in closed form: E exp(X) of a normal, a gamma and a Poisson density; the integral of 1/√x over (0, 1)
    /// is 2, that of exp(-x²/2) √(2π).
    @ParameterizedTest(name = "{0}")
    @CsvSource(
            delimiter = ';',
            value = {
                "\"density\": {\"family\": \"normal\", \"mean\": 0, \"sd\": 1}; \"mean\": \"exp(x)\"; {\"tilt\": 1}; 1.6487212707001281",
                "\"density\": {\"family\": \"gamma\", \"shape\": 3, \"scale\": 0.5}; \"mean\": \"exp(x)\"; {\"tilt\": 1}; 8",
                "\"density\": {\"family\": \"poisson\", \"mean\": 3}; \"mean\": \"exp(x)\"; {\"tilt\": 1}; 173.26903209125192",
                "\"range\": [0, 1]; \"integral\": \"x^(-1/2)\"; {\"family\": \"beta\", \"alpha\": 0.5, \"beta\": 1, \"from\": 0, \"to\": 1}; 2",
                "\"range\": [\"-inf\", \"inf\"], \"drawFrom\": {\"family\": \"student\", \"dof\": 3}; \"integral\": \"exp(-x^2/2)\"; {\"family\": \"normal\", \"mean\": 0, \"sd\": 1}; 2.5066282746310002"
            })
    void perfectDensitiesAreAccepted(String input, String ask, String other, double exact) throws IOException {
        var project = write(
                "{\"name\": \"x\", %s}".formatted(input),
                ask,
                "\"drawFrom\": {\"x\": %s}, \"nominalShare\": 0".formatted(other));
        var answer = answer(project, 2000);
        double error = of(answer, "standardError");
        assertEquals(exact, of(answer, "estimate"), error);
        assertTrue(error > 0 && error < 1e-12 * exact, "error " + error);
        assertEquals("rounding", answer.required("intervalKind").asString());
        var text = run(project, "--draws", 2000);
        assertEquals(0, text.exitCode(), text.out());
        assertTrue(text.out().contains("every draw gives the same value up to rounding"), text.out());
    }

    /// Equal outcomes of densities that are the input's own say nothing: what differs may not have been seen.
    @Test
    void equalOutcomesAreNotPerfect() throws IOException {
        for (String lane : new String[] {
            "\"drawFrom\": {\"x\": %s}, \"nominalShare\": 0".formatted(NORMAL),
            "\"drawFrom\": {\"x\": {\"shift\": 1}}, \"selfNormalised\": true"
        }) {
            var project = project(NORMAL, "\"mean\": \"3 + 0*x\"", lane);
            var answer = answer(project, 1000);
            assertTrue(answer.required("standardError").isNull(), answer.toString());
            assertTrue(answer.required("interval").get(0).isNull());
            assertEquals(1, run(project, "--draws", 1000).exitCode());
        }
    }

    /// `(1 - .05^(1/1000)) / .1`.
    @Test
    void noHitLeavesALimitWhereWeightsHaveOne() throws IOException {
        String ask = "\"probability\": \"x > 20\"";
        var shared = project(NORMAL, ask, "\"drawFrom\": {\"x\": {\"widen\": 2}}");
        var answer = answer(shared, 1000);
        assertEquals(0, of(answer, "estimate"));
        assertTrue(answer.required("standardError").isNull());
        assertEquals("no-hit", answer.required("intervalKind").asString());
        assertEquals(0, answer.required("interval").get(0).asDouble());
        assertEquals(.029912495450953, answer.required("interval").get(1).asDouble(), 1e-14);
        assertEquals(.029912495450953, of(answer, "oneSided"), 1e-14);
        assertTrue(run(shared, "--draws", 1000).out().contains("at most 0.030"));
        // the two points of a cube depend on each other: each cube counts as one draw
        var cubes = Files.writeString(
                folder.resolve("cubes.leadline"),
                Files.readString(shared).replace("\"independent\"", "\"latin-hypercube\", \"cube\": 2"));
        assertEquals(
                (1 - Math.pow(.05, 1 / 500.)) / .1,
                answer(cubes, 1000).required("interval").get(1).asDouble(),
                1e-12);
        var without = project(NORMAL, ask, "\"drawFrom\": {\"x\": {\"widen\": 2}}, \"nominalShare\": 0");
        assertTrue(answer(without, 1000).required("interval").get(1).isNull());
        String text = run(without, "--draws", 1000).out().replaceAll("\\s+", " ");
        assertTrue(text.contains("cannot say yet"), text);
        assertTrue(text.contains("no hit in 1,000 independent draws, and a hit may weigh any amount"), text);
    }

    @Test
    void noLowerLimitOfAChanceIsNegative() throws IOException {
        var project = project(NORMAL, "\"probability\": \"x > 5\"", "\"drawFrom\": {\"x\": {\"shift\": 2.5}}");
        var answer = answer(project, 600);
        assertTrue(of(answer, "estimate") > 0 && of(answer, "estimate") < 2 * of(answer, "standardError"));
        assertEquals(0, answer.required("interval").get(0).asDouble());
        assertEquals(
                "the lower limit is 0, which the value sought is not below",
                answer.required("intervalNote").asString());
    }

    /// The target Exp(1) drawn from twice as long: weights `2 exp(-x/2)`. The mean of x with weights over their mean
    /// has the variance `∫ f²/g (x - 1)² = 20/27` a draw, with weights as they are `∫ f²/g x² - 1 = 5/27`.
    @Test
    void weightsMayBeDividedByTheirMean() throws IOException {
        String lane = "\"drawFrom\": {\"x\": {\"family\": \"exponential\", \"mean\": 2}}, \"nominalShare\": 0";
        String own = "{\"family\": \"exponential\", \"mean\": 1}";
        var divided = answer(project(own, "\"mean\": \"x\"", lane + ", \"selfNormalised\": true"), 1e5);
        assertEquals(Math.sqrt(20 / 27.0 / 1e5), of(divided, "standardError"), .02 * of(divided, "standardError"));
        assertEquals(1, of(divided, "estimate"), 4 * of(divided, "standardError"));
        var plain = answer(project(own, "\"mean\": \"x\"", lane), 1e5);
        assertEquals(Math.sqrt(5 / 27.0 / 1e5), of(plain, "standardError"), .02 * of(plain, "standardError"));
        assertEquals(1, of(plain, "estimate"), 4 * of(plain, "standardError"));
        // of an outcome that hardly varies, they gain
        String ask = "\"mean\": \"10 + x\"";
        var far = answer(project(own, ask, lane + ", \"selfNormalised\": true"), 1e5);
        assertTrue(of(far, "standardError") < .5 * of(answer(project(own, ask, lane), 1e5), "standardError"));
    }

    @Test
    void looksShowTheWeight() throws IOException {
        var project = project(NORMAL, "\"mean\": \"x\"", "\"drawFrom\": {\"x\": {\"shift\": 3}}");
        for (int draw = 0; draw < 20; draw++) {
            var look = leadline("look", project, "--draw", draw, "--json").json();
            double x = look.required("inputs").required("x").asDouble();
            assertEquals(1 / (.1 + .9 * Math.exp(3 * x - 4.5)), of(look, "weight"), 1e-12 * of(look, "weight"));
        }
        assertTrue(leadline("look", project, "--draw", 3).out().contains("weight"));
    }

    /// P(Z > 2) = .02275013194817921 in tables.
    @Test
    void auditsStandBesideAnswers() throws IOException {
        var path = project(
                NORMAL, "\"probability\": \"x > 2\"", "\"drawFrom\": {\"x\": {\"shift\": 2}}, \"audit\": 40000");
        var lane = run(path, "--json").json().required("lanes").get(0);
        assertEquals(100_000, lane.required("draws").asInt());
        var audit = lane.required("audit");
        assertEquals(40_000, audit.required("draws").asInt());
        assertEquals("all draws made", audit.required("stopReason").asString());
        var answer = audit.required("answers").get(0);
        assertEquals(.02275013, of(answer, "estimate"), 4 * Math.sqrt(.02275 * .97725 / 40_000));
        assertEquals(of(answer, "estimate") * 40_000, answer.required("hits").asInt(), 1e-9);
        String text = run(path).out();
        assertTrue(
                text.contains(
                        "audit: 40,000 draws from the inputs' own densities, which enter no interval above: 0.02"),
                text);
        assertTrue(text.contains("hits in 40,000 audit draws from the inputs' own densities leave"), text);
    }
}
