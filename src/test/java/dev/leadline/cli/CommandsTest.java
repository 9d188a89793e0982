package dev.leadline.cli;

import static dev.leadline.cli.CommandLines.leadline;
import static dev.leadline.cli.CommandLines.leadlineOnTerminal;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.leadline.project.RefusedProjects.Case;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.stream.Stream;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;
import org.junit.jupiter.params.provider.ValueSource;

class CommandsTest {

    private static final String UNIFORM = """
        {
          "leadline": 1,
          "title": "A point of the unit interval",
          "inputs": [{"name": "x", "unit": "m", "density": {"family": "uniform", "from": 0, "to": 1}}],
          "steps": ["y = x^2   # m2"],
          "ask": {"mean": "y", "unit": "m2"},
          "stop": {"rule": "fixed", "draws": 2000},
          "seed": 1
        }
        """;

    @TempDir
    Path folder;

    private Path project;

    @BeforeEach
    void write() throws IOException {
        project = Files.writeString(folder.resolve("unit.leadline"), UNIFORM);
    }

    private Path with(String field, String value) throws IOException {
        String changed = UNIFORM.replaceFirst("\"leadline\": 1,", "\"leadline\": 1, \"" + field + "\": " + value + ",");
        return Files.writeString(folder.resolve("changed.leadline"), changed);
    }

    @Test
    void namesWhatWasLeftOut() throws IOException {
        assertTrue(leadline("run").err().contains("'PROJECT'"));
        assertEquals(2, leadline("run").exitCode());
        String bare = project.toString().replace(".leadline", "");
        assertTrue(leadline("run", bare).err().contains("Was " + project + " meant?"));
        assertTrue(leadline("run", folder).err().startsWith(folder.getFileName() + ": 1 problem"));
        assertTrue(leadline("run", folder)
                .err()
                .contains("There is a folder at " + folder.toString().substring(0, 3)));
        assertTrue(leadline(project).err().contains("leadline run"));
        assertTrue(leadline("help").err().contains("leadline --help"));
    }

    /// Names of other trades lead to the family and the parameter that are meant.
    @Test
    void understandsTheWordsOfOtherTrades() throws IOException {
        for (var words : List.of(
                List.of("gaussian\", \"mean\": 1, \"sd\": 1", "\"normal\""),
                List.of("normal\", \"mean\": 1, \"stdev\": 1", "Did you mean sd?"),
                List.of("triangular\", \"min\": 1, \"mode\": 1, \"to\": 2", "Did you mean from?"),
                List.of("exponential\", \"rate\": 1", "1 over the rate"))) {
            String density = "\"density\": {\"family\": \"" + words.getFirst() + "}";
            Path wrong = Files.writeString(
                    folder.resolve("words.leadline"),
                    UNIFORM.replaceFirst("\"density\": \\{[^}]*}", density.replace("\\", "")));
            var outcome = leadline("check", wrong);
            assertEquals(2, outcome.exitCode());
            assertTrue(outcome.err().contains(words.getLast()), outcome.err());
        }
    }

    /// Three answers share the 5 % that may be missed; each is written with the level that is left to it.
    @Test
    void saysThatSeveralAnswersHoldTogether() throws IOException {
        String three = UNIFORM.replace(
                "{\"mean\": \"y\", \"unit\": \"m2\"}",
                "[{\"mean\": \"y\"}, {\"mean\": \"x\"}, {\"probability\": \"x > 0.5\"}]");
        String said = leadline("run", Files.writeString(folder.resolve("three.leadline"), three))
                .out();
        assertTrue(said.contains("98.33 % interval"), said);
        assertTrue(said.contains("the 3 intervals hold all at once with 95 %"), said);
    }

    @Test
    void saysWhyAFigureEndsWithOne() throws IOException {
        Path strict = with("tolerance", "{\"relative\": 1e-6}");
        var outcome = leadline("figure", strict, "-o", folder.resolve("strict.png"));
        assertEquals(1, outcome.exitCode());
        assertTrue(outcome.err().contains("not met"), outcome.err());
        assertEquals(
                "",
                leadline("figure", strict, "-o", folder.resolve("strict.png"), "--quiet")
                        .err());
    }

    /// Every kind of wrong project, with every command that takes one: exit code 2, the problems for programs and for
    /// people, and not a file more or less than before.
    @ParameterizedTest(name = "{0}")
    @MethodSource("dev.leadline.project.RefusedProjects#all")
    void refusesWrongProjects(Case refused) throws IOException {
        Path wrong = Files.writeString(folder.resolve("wrong.leadline"), refused.text());
        List<List<Object>> commands = List.of(
                List.of("run", wrong, "--json"),
                List.of("check", wrong, "--json"),
                List.of("look", wrong, "--json"),
                List.of("figure", wrong, "-o", folder.resolve("figure.png"), "--json"));
        for (List<Object> command : commands) {
            var outcome = leadline(command.toArray());
            assertEquals(2, outcome.exitCode(), () -> command + outcome.err());
            var problems = outcome.json().required("problems");
            assertEquals(refused.expected().size(), problems.size(), outcome.out());
            assertTrue(outcome.err().startsWith("wrong.leadline: " + problems.size() + " problem"), outcome.err());
            for (String expected : refused.expected()) {
                String path = expected.substring(0, expected.indexOf(" | "));
                assertTrue(path.isEmpty() || outcome.err().contains("(" + path + ")"), outcome.err());
            }
        }
        assertEquals(refused.text(), Files.readString(wrong));
        assertEquals(List.of("unit.leadline", "wrong.leadline"), names());
    }

    private List<String> names() throws IOException {
        try (Stream<Path> files = Files.list(folder)) {
            return files.map(file -> file.getFileName().toString()).sorted().toList();
        }
    }

    @Test
    void pointsAtTheFaultOfAFormula() throws IOException {
        Path wrong = Files.writeString(folder.resolve("wrong.leadline"), UNIFORM.replace("x^2", "2*xx^2"));
        assertTrue(
                leadline("check", wrong).err().contains("""
                    y = 2*xx^2   # m2
                          ^^
                    """.indent(4)),
                leadline("check", wrong).err());
    }

    @ParameterizedTest
    @ValueSource(strings = {"run", "check", "look", "figure"})
    void refusesAMissingProject(String command) {
        var outcome = leadline(command, folder.resolve("units.leadline"), "-o", folder.resolve("a.png"), "--json");
        assertEquals(2, outcome.exitCode(), outcome.err());
    }

    /// Arguments that cannot be meant. The words of the message matter less than that it names the argument.
    static Stream<List<String>> wrongArguments() {
        return Stream.of(
                List.of("rum", "PROJECT"),
                List.of("run"),
                List.of("run", "PROJECT", "PROJECT"),
                List.of("run", "PROJECT", "--draws"),
                List.of("run", "PROJECT", "--draws", "0"),
                List.of("run", "PROJECT", "--draws", "1.5"),
                List.of("run", "PROJECT", "--draws", "many"),
                List.of("run", "PROJECT", "--draws", "1e14"),
                List.of("run", "PROJECT", "--draws", "1e999999999"),
                List.of("run", "PROJECT", "--seconds", "NaN"),
                List.of("run", "PROJECT", "--seconds", "0"),
                List.of("run", "PROJECT", "--seed", "-1"),
                List.of("run", "PROJECT", "--seed", "9223372036854775808"),
                List.of("run", "PROJECT", "--threads", "0"),
                List.of("run", "PROJECT", "--lane", "B"),
                List.of("run", "PROJECT", "--drawz", "10"),
                List.of("run", "PROJECT", "--record", "FILE"),
                List.of("run", "PROJECT", "--report", "DIR"),
                List.of("look", "PROJECT", "--draw", "-1"),
                List.of("look", "PROJECT", "--draw", "1", "--nominal"),
                List.of("figure", "PROJECT"),
                List.of("figure", "PROJECT", "-o", "figure.pdf"),
                List.of("figure", "PROJECT", "-o", "nowhere/figure.png"),
                List.of("figure", "PROJECT", "-o", "figure.png", "--width", "1"),
                List.of("figure", "PROJECT", "-o", "figure.png", "--view", "decay"),
                List.of("rehearse", "PROJECT", "--draws", "10,"),
                List.of("rehearse", "PROJECT", "--mcse", "0"),
                List.of("compare", "PROJECT"),
                List.of("compare", "PROJECT", "A", "B"),
                List.of("compare", "PROJECT", "A", "A"),
                List.of("compare", "PROJECT", "--equal", "money"),
                List.of("plan", "PROJECT", "--relative", "-1"),
                List.of("suggest", "PROJECT", "--draws", "10"),
                List.of("report", "PROJECT"),
                List.of("replay", "PROJECT"),
                List.of("run", "@PROJECT"));
    }

    @ParameterizedTest
    @MethodSource("wrongArguments")
    void refusesWrongArguments(List<String> arguments) throws IOException {
        Object[] words = arguments.stream()
                .map(word -> word.replace("PROJECT", project.toString()))
                .toArray();
        var people = leadline(words);
        assertEquals(2, people.exitCode(), people.out() + people.err());
        assertEquals("", people.out());
        assertFalse(people.err().isBlank());
        Object[] programs = Stream.concat(Stream.of(words), Stream.of("--json")).toArray();
        var json = leadline(programs);
        assertEquals(2, json.exitCode());
        assertEquals(1, json.json().required("problems").size(), json.out());
        assertEquals(List.of("unit.leadline"), names());
    }

    @Test
    void namesWhatIsNotAvailable() {
        assertTrue(leadline("report", project).err().contains("The command report is not available"));
        assertTrue(leadline("run", project, "--record", "r").err().contains("--record is not available"));
        assertTrue(leadline("run", project, "--drawz", "9").err().contains("Was --draws meant?"));
    }

    @Test
    void helpsAndTellsItsVersion() {
        for (String command : List.of("run", "check", "look", "figure", "families", "open")) {
            var help = leadline(command, "--help");
            assertEquals(0, help.exitCode());
            assertTrue(help.out().contains("Examples:\n  leadline " + command), help.out());
        }
        assertTrue(leadline("--help").out().contains("Exit codes"));
        assertTrue(leadline("--version").out().startsWith("leadline "));
    }

    @Test
    void handsOpenToTheWindow() {
        var outcome = leadline("open", project);
        assertEquals(0, outcome.exitCode());
        assertEquals("opened " + project, outcome.err());
        assertEquals("opened nothing", leadline().err());
    }

    /// The contract of `run --json`: these fields, of these kinds.
    @Test
    void printsOneObjectWithTheFieldsOfTheContract() {
        var outcome = leadline("run", project, "--json");
        assertEquals(0, outcome.exitCode(), outcome.err());
        assertEquals("", outcome.err());
        var json = outcome.json();
        assertEquals("A point of the unit interval", json.required("project").asString());
        assertEquals(
                "The mean of y in m², with 1 input, at 95 %.",
                json.required("question").asString());
        assertEquals(1, json.required("seed").asInt());
        assertEquals(64, json.required("fingerprint").asString().length());
        assertFalse(json.required("version").asString().isEmpty());
        assertTrue(json.required("reference").isNull());
        assertTrue(json.required("comparison").isNull());
        var lane = json.required("lanes").get(0);
        assertEquals("A", lane.required("lane").asString());
        assertEquals("independent", lane.required("scheme").asString());
        assertEquals(2000, lane.required("draws").asInt());
        assertEquals(2000, lane.required("observations").asInt());
        assertEquals(0, lane.required("nonFinite").asInt());
        assertTrue(lane.required("seconds").isNumber());
        assertTrue(lane.required("stopReason").isString());
        var answer = lane.required("answers").get(0);
        assertEquals("mean", answer.required("ask").asString());
        assertEquals("m2", answer.required("unit").asString());
        double estimate = answer.required("estimate").asDouble();
        double error = answer.required("standardError").asDouble();
        // mean 1/3 and variance 1/5 - 1/9 of the square of a uniform variable; four standard errors
        assertEquals(1 / 3.0, estimate, 4 * Math.sqrt((1 / 5.0 - 1 / 9.0) / 2000));
        assertEquals(Math.sqrt((1 / 5.0 - 1 / 9.0) / 2000), error, .1 * error);
        double low = answer.required("interval").get(0).asDouble();
        double high = answer.required("interval").get(1).asDouble();
        assertEquals((high - low) / 2, answer.required("halfWidth").asDouble());
        assertEquals("student", answer.required("intervalKind").asString());
        assertEquals(.95, answer.required("confidence").asDouble());
        for (var ground : lane.required("grounds")) {
            assertFalse(ground.required("code").asString().isEmpty());
            assertTrue(List.of("shown", "doubted", "not-done")
                    .contains(ground.required("status").asString()));
            assertEquals(ground.required("status").asString().equals("doubted"), ground.has("strength"));
        }
    }

    @Test
    void addsWhatProbabilitiesHave() throws IOException {
        Path event = Files.writeString(
                folder.resolve("event.leadline"),
                UNIFORM.replace("\"mean\": \"y\", \"unit\": \"m2\"", "\"probability\": \"y > 0.81\""));
        var answer = leadline("run", event, "--json")
                .json()
                .required("lanes")
                .get(0)
                .required("answers")
                .get(0);
        double p = answer.required("estimate").asDouble();
        assertEquals(answer.required("hits").asLong() / 2000.0, p);
        assertEquals(1 / p, answer.required("oneIn").asDouble());
        // Φ(-1.2815515655446004) = 0.1; dβ/dp = -1/φ(β) = -5.698
        assertEquals(
                1.2815515655446004 - 5.698 * (p - .1), answer.required("beta").asDouble(), .02);
        assertTrue(answer.required("oneSided").asDouble() > p);
        assertTrue(answer.required("oneSided").asDouble()
                < answer.required("interval").get(1).asDouble());
        assertEquals("clopper-pearson", answer.required("intervalKind").asString());
    }

    /// Where nothing was hit: estimate 0, no standard error, an interval from 0 to the limit. The limits for n =
    /// 1000 are 1 - 0.025^(1/1000) and 1 - 0.05^(1/1000) (Clopper and Pearson 1934; arithmetic).
    @Test
    void saysALimitWhereNothingWasHit() throws IOException {
        Path never = Files.writeString(
                folder.resolve("never.leadline"),
                UNIFORM.replace("\"mean\": \"y\", \"unit\": \"m2\"", "\"probability\": \"y > 2\", \"unit\": \"1/a\""));
        var outcome = leadline("run", never, "--json", "--draws", "1000");
        var answer = outcome.json().required("lanes").get(0).required("answers").get(0);
        assertEquals(0, answer.required("estimate").asDouble());
        assertTrue(answer.required("standardError").isNull());
        assertEquals(0, answer.required("interval").get(0).asDouble());
        assertEquals(
                1 - Math.pow(.025, 1e-3), answer.required("interval").get(1).asDouble(), 1e-12);
        assertEquals(1 - Math.pow(.05, 1e-3), answer.required("oneSided").asDouble(), 1e-12);
        assertTrue(answer.required("beta").isNull());
        assertTrue(answer.required("oneIn").isNull());
        assertTrue(answer.required("intervalNote").asString().contains("no hit"));
        String people = leadline("run", never, "--draws", "1000").out();
        assertTrue(people.contains("at most 0.0037 per year"), people);
        assertFalse(people.contains("± 0"), people);
    }

    @Test
    void aCertainEventIsALimitToo() throws IOException {
        Path always = Files.writeString(
                folder.resolve("always.leadline"),
                UNIFORM.replace("\"mean\": \"y\", \"unit\": \"m2\"", "\"probability\": \"y < 2\""));
        String people = leadline("run", always, "--draws", "1000").out();
        assertTrue(people.contains("at least 0.9963"), people);
        assertFalse(people.contains("±") || people.contains("NaN"), people);
    }

    @Test
    void givesTheSameDigitsOnAnyNumberOfThreads() {
        String one = leadline("run", project, "--json", "--draws", "3e5", "--threads", 1)
                .out();
        for (int threads = 2; threads <= 3; threads++) {
            String more = leadline("run", project, "--json", "--draws", "3e5", "--threads", threads)
                    .out();
            assertEquals(withoutSeconds(one), withoutSeconds(more), threads + " threads");
        }
    }

    private static String withoutSeconds(String json) {
        return json.replaceAll("\"seconds\": [^,]*,", "");
    }

    @Test
    void runsAsManyDrawsAsAskedOrAsManySecondsAsGiven() {
        var draws = leadline("run", project, "--json", "--draws", "12_345")
                .json()
                .required("lanes")
                .get(0);
        assertEquals(12_345, draws.required("draws").asInt());
        var seconds = leadline("run", project, "--json", "--seconds", "0.05")
                .json()
                .required("lanes")
                .get(0);
        assertEquals("time used up", seconds.required("stopReason").asString());
    }

    @Test
    void comparesWithEachKindOfReference() throws IOException {
        var integrated = leadline("run", with("reference", "{\"quadrature\": true}"), "--json")
                .json();
        var reference = integrated.required("reference");
        assertEquals(1 / 3.0, reference.required("value").asDouble(), 1e-9);
        double error = reference.required("error").asDouble();
        assertTrue(error > 0 && error < 1e-9, reference.toString());
        assertEquals("quadrature", reference.required("kind").asString());
        assertTrue(reference.required("evaluations").asInt() > 0, reference.toString());
        assertTrue(reference.required("source").asString().startsWith("quadrature, "), reference.toString());
        String ground = integrated
                .required("lanes")
                .get(0)
                .required("grounds")
                .valueStream()
                .filter(each -> each.required("code").asString().equals("reference"))
                .map(each -> each.required("text").asString())
                .findFirst()
                .orElseThrow();
        assertTrue(
                ground.matches("[0-3]\\.\\d standard errors (above|below) the reference value by quadrature"), ground);
        var closed = leadline("run", with("reference", "{\"formula\": \"1/3\"}"), "--json")
                .json()
                .required("reference");
        assertEquals(1 / 3.0, closed.required("value").asDouble(), 0);
        assertEquals("closed form", closed.required("kind").asString());
        Path none = Files.writeString(
                folder.resolve("none.leadline"),
                Files.readString(with("reference", "{\"quadrature\": true}")).replace("x^2", "1/x"));
        var unknown = leadline("run", none, "--json").json().required("reference");
        assertTrue(unknown.required("value").isNull());
        assertEquals(
                "the integral does not seem to converge",
                unknown.required("note").asString());
    }

    @Test
    void exitsWithOneWhereTheToleranceIsNotMetOrAnObjectionStands() throws IOException {
        assertEquals(
                0, leadline("run", with("tolerance", "{\"absolute\": 0.02}")).exitCode());
        assertEquals(
                1, leadline("run", with("tolerance", "{\"absolute\": 0.002}")).exitCode());
        assertEquals(
                0, leadline("run", with("reference", "{\"value\": 0.3333}")).exitCode());
        assertEquals(1, leadline("run", with("reference", "{\"value\": 0.4}")).exitCode());
        Path failing = Files.writeString(folder.resolve("failing.leadline"), UNIFORM.replace("x^2", "sqrt(x - 0.01)"));
        var outcome = leadline("run", failing, "--json");
        assertEquals(1, outcome.exitCode());
        var lane = outcome.json().required("lanes").get(0);
        assertTrue(lane.required("nonFinite").asInt() > 0);
        assertTrue(lane.required("failures")
                        .get(0)
                        .required("inputs")
                        .required("x")
                        .asDouble()
                < .01);
    }

    @Test
    void drawsASeedWhereThereIsNoneAndTellsIt() throws IOException {
        Path unseeded =
                Files.writeString(folder.resolve("unseeded.leadline"), UNIFORM.replace("},\n  \"seed\": 1", "}"));
        var first = leadline("run", unseeded, "--json").json();
        String again = leadline(
                        "run",
                        unseeded,
                        "--json",
                        "--seed",
                        first.required("seed").asLong())
                .out();
        assertEquals(
                withoutSeconds(again),
                withoutSeconds(leadline(
                                "run",
                                unseeded,
                                "--json",
                                "--seed",
                                first.required("seed").asLong())
                        .out()));
        var answer = first.required("lanes").get(0).required("answers");
        assertTrue(again.contains(answer.get(0).required("estimate").asString()), again);
        assertTrue(leadline("run", unseeded).out().contains("seed "));
    }

    @Test
    void looksAtOneDraw() {
        var draw = leadline("look", project, "--draw", "7", "--json").json();
        double x = draw.required("inputs").required("x").asDouble();
        assertEquals(x * x, draw.required("steps").required("y").asDouble());
        assertEquals(x * x, draw.required("outcome").asDouble());
        assertEquals(1, draw.required("weight").asInt());
        var nominal = leadline("look", project, "--json").json();
        assertEquals(.5, nominal.required("inputs").required("x").asDouble());
        assertTrue(leadline("look", project).out().contains("0.25"));
    }

    /// The Gumbel density has mean `location + .5772 scale`, standard deviation `1.2825 scale`, skewness 1.1395 and
    /// excess kurtosis 2.4.
    /// JCGM 101:2008, 6.4.9.2: n readings give n - 1 degrees of freedom and the scale s / sqrt(n).
    @Test
    void familiesBeginWithWhatIsKnown() {
        String text = leadline("families", "--known", "readings", "n=16", "mean=5.012", "s=0.02")
                .out();
        assertTrue(text.startsWith("mean of 16 readings 5.012"), text);
        assertTrue(text.contains("\"dof\": 15"), text);
        assertTrue(text.contains("\"scale\": 0.005"), text);
        var density = leadline("families", "--known", "readings", "n=16", "mean=5.012", "s=0.02", "--json")
                .json()
                .required("density");
        assertEquals(15, density.required("dof").asDouble());
        assertEquals(
                2, leadline("families", "--known", "readings", "n=1", "mean=5").exitCode());
        assertTrue(leadline("families", "--known").out().contains("certificate"));
        assertTrue(leadline("families", "--known", "--json")
                        .json()
                        .required("known")
                        .size()
                >= 12);
    }

    @Test
    void portraysAMemberOfAFamily() {
        var portrait = leadline("families", "gumbel", "location=24.5", "scale=2.6", "--json")
                .json()
                .required("families")
                .get(0)
                .required("portrait");
        assertEquals(24.5 + .5772157 * 2.6, portrait.required("mean").asDouble(), 1e-6);
        assertEquals(1.2825498 * 2.6, portrait.required("sd").asDouble(), 1e-6);
        assertEquals(1.1395471, portrait.required("skewness").asDouble(), 1e-6);
        assertEquals(2.4, portrait.required("excessKurtosis").asDouble(), 1e-9);
        assertEquals(11, portrait.required("quantiles").size());
        assertEquals(101, portrait.required("curve").size());
        String text = leadline("families", "student", "dof=1.33").out();
        assertTrue(text.contains("Both tails fall like a power: moments exist below order 1.33."), text);
        assertTrue(text.contains("It has no variance: the error of a mean shrinks slower than 1/√n."), text);
        assertTrue(leadline("families", "gumbel").out().contains("entered by location, scale"));
    }

    @Test
    void refusesWhatIsNoMember() {
        for (var words : List.of(
                List.of("gumble", "location=1", "Was \"gumbel\" meant?"),
                List.of("gaussian", "mean=1", "Was \"normal\" meant?"),
                List.of("gumbel", "scale=0", "Location is missing"),
                List.of("exponential", "mean=-1", "Mean is -1 but must be greater than 0"),
                List.of("exponential", "mean=1,5", "Mean is \"1,5\" but must be a number"),
                List.of("exponential", "1.5", "1.5\" is no parameter"))) {
            var outcome = leadline("families", words.get(0), words.get(1));
            assertEquals(2, outcome.exitCode());
            assertTrue(outcome.err().contains(words.getLast()), outcome.err());
        }
        var twice = leadline("families", "exponential", "mean=1", "mean=2", "--json");
        assertEquals(2, twice.exitCode());
        assertEquals(
                "mean is given twice",
                twice.json().required("problems").get(0).required("primary").asString());
    }

    @Test
    void listsFamilies() {
        var families = leadline("families", "--json").json().required("families");
        assertTrue(families.size() >= 5);
        for (var family : families) {
            assertTrue(leadline("families")
                    .out()
                    .contains(family.required("family").asString()));
            assertFalse(family.required("use").asString().isEmpty());
            assertTrue(family.required("parameters").get(0).get(0).has("rule"));
        }
    }

    @Test
    void drawsAFigure() throws IOException {
        Path png = folder.resolve("figure.png");
        var outcome = leadline("figure", project, "-o", png, "--width", 400, "--height", 300, "--dpi", 96);
        assertEquals(0, outcome.exitCode(), outcome.err());
        var image = javax.imageio.ImageIO.read(png.toFile());
        assertEquals(400, image.getWidth());
        assertEquals(300, image.getHeight());
        assertTrue(outcome.out().contains("Lane A"), outcome.out());
        Path decay = folder.resolve("decay.png");
        assertTrue(leadline("figure", project, "-o", decay, "--view", "error-decay")
                .out()
                .startsWith("Half-width of"));
        Path svg = folder.resolve("figure.svg");
        assertEquals(0, leadline("figure", project, "-o", svg, "--json").exitCode());
        assertTrue(Files.readString(svg).contains("<svg"));
    }

    @Test
    void carriesTheCautions() throws IOException {
        String plain = leadline("run", project).out().replaceAll("\\s+", " ");
        assertTrue(plain.contains("The interval covers sampling error only"), plain);
        assertFalse(plain.contains("licensed engineer"), plain);
        String safety = leadline("run", with("safety", "true")).out().replaceAll("\\s+", " ");
        assertTrue(safety.contains("do not replace, the judgement of a licensed engineer"), safety);
        assertTrue(safety.contains("local codes and standards govern"), safety);
        assertTrue(safety.contains("rests on the stated densities"), safety);
    }

    @Test
    void showsProgressOnATerminalOnly() {
        assertEquals("", leadline("run", project, "--seconds", "0.5").err());
        assertEquals(
                "",
                leadlineOnTerminal("run", project, "--seconds", "0.5", "--quiet")
                        .err());
        String progress = leadlineOnTerminal("run", project, "--seconds", "0.7").err();
        assertTrue(progress.contains("draws") && progress.contains("±") && progress.contains("s left"), progress);
        assertTrue(progress.endsWith("\r"), progress);
    }

    @Test
    void notesNamesThatHideAKnownNumber() throws IOException {
        Path hiding = Files.writeString(
                folder.resolve("e.leadline"), UNIFORM.replace("\"x\"", "\"e\"").replace("x^2", "e^2"));
        var outcome = leadline("run", hiding, "--json");
        assertEquals(0, outcome.exitCode());
        assertTrue(outcome.err().startsWith("Note: "), outcome.err());
        assertEquals("", leadline("run", hiding, "--json", "--quiet").err());
    }
}
