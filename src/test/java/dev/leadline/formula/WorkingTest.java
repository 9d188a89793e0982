package dev.leadline.formula;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertSame;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.leadline.problem.Problem;
import dev.leadline.problem.Refusal;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.SequencedMap;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

class WorkingTest {
    private static final SequencedMap<String, Double> NO_CONSTANTS = new LinkedHashMap<>();

    private static double[] values(Working working, Program program, double... inputs) {
        double[][] columns = new double[inputs.length][1];
        for (int i = 0; i < inputs.length; i++) columns[i][0] = inputs[i];
        double[][] results = new double[program.outputs()][1];
        program.evaluate(columns, 1, results, program.workspace());
        return java.util.Arrays.stream(results).mapToDouble(column -> column[0]).toArray();
    }

    private static List<Problem> problems(List<String> inputs, List<String> steps, String... asked) {
        return assertThrows(Refusal.class, () -> Working.of(inputs, NO_CONSTANTS, steps, List.of(asked)))
                .problems();
    }

    /// `path from-to primary / hint`.
    private static String shown(Problem problem) {
        var span = problem.place().span();
        return problem.place().path()
                + span.map(s -> " " + s.from() + "-" + s.to()).orElse("")
                + ": " + problem.primary()
                + problem.hint().map(hint -> " / " + hint).orElse("");
    }

    private static List<String> shown(List<String> inputs, List<String> steps, String... asked) {
        return problems(inputs, steps, asked).stream().map(WorkingTest::shown).toList();
    }

    @Test
    void stepsInAnyOrder() {
        SequencedMap<String, Double> constants = new LinkedHashMap<>();
        constants.put("windage", 1180.0);
        var working = Working.of(
                List.of("v", "s"),
                constants,
                List.of("load = q*windage/1000", "q = 0.5*1.25*v^2   # Pa"),
                List.of("load > 480 + s", "q"));
        assertEquals("Pa", working.steps().get(1).comment());
        assertEquals("", working.steps().get(0).comment());
        assertEquals(
                new Formula("0.5*1.25*v^2", "0.5 * 1.25 * v ^ 2"),
                working.steps().get(1).formula());
        assertEquals(
                new Formula("load > 480 + s", "load > 480 + s"), working.asked().getFirst());
        double q = 0.5 * 1.25 * 30 * 30;
        double load = q * 1180 / 1000;
        org.junit.jupiter.api.Assertions.assertArrayEquals(
                new double[] {load, q, 1, q}, values(working, working.everyStep(), 30, 20));
        org.junit.jupiter.api.Assertions.assertArrayEquals(
                new double[] {1, q}, values(working, working.program(), 30, 20));
        assertTrue(working.isEvent(0));
        assertFalse(working.isEvent(1));
    }

    @Test
    void circleIsSpelledOut() {
        assertEquals(
                List.of("steps[2] 4-5: steps use one another in a circle: a → b → c → a"
                        + " / take one of the names out of one of these formulas"),
                shown(List.of("x"), List.of("a = b + x", "b = c*2", "c = a + 1", "d = a"), "d"));
        assertEquals(
                List.of("steps[0] 8-9: step \"a\" uses itself / take one of the names out of one of these formulas"),
                shown(List.of("x"), List.of("a = x + a"), "a"));
    }

    @Test
    void circleBesideOtherSteps() {
        assertEquals(
                List.of("steps[2] 4-5: steps use one another in a circle: b → c → b"
                        + " / take one of the names out of one of these formulas"),
                shown(List.of("x"), List.of("a = b", "b = c", "c = b"), "a"));
    }

    @Test
    void circleIsNamedTogetherWithOtherFaults() {
        assertEquals(
                List.of("steps[0] 4-7", "steps[1] 4-5", "steps[2] 4-5", "asked[0] 0-3"),
                shown(List.of("x"), List.of("a = top", "b = b", "c = (2"), "end").stream()
                        .map(problem -> problem.substring(0, problem.indexOf(':')))
                        .toList());
    }

    @Test
    void namesStandForOneThing() {
        assertEquals(
                List.of(
                        "steps[0] 0-1: name \"x\" already stands for an input / choose another name",
                        "steps[2] 0-1: name \"q\" already stands for a step / choose another name",
                        "steps[3] 0-3: name \"exp\" is taken by the function exp(x) / choose another name"),
                shown(List.of("x"), List.of("x = 1", "q = 1", "q = 2", "exp = 3"), "x"));
        assertEquals(
                List.of("inputs[1]: name \"x\" already stands for an input / choose another name"),
                shown(List.of("x", "x"), List.of(), "x"));
        assertEquals(
                List.of("inputs[0]: name \"max\" is taken by the function max(a, b, ...) / choose another name"),
                shown(List.of("max"), List.of(), "1"));
    }

    @ParameterizedTest
    @ValueSource(strings = {"", "2x", "a b", "a-b", " x", "x.", "²", "a'", "#"})
    void refusesName(String name) {
        assertEquals(List.of("inputs[0]: \"" + name + "\" is not a name"), shown(List.of(name), List.of(), "1"));
    }

    @ParameterizedTest
    @ValueSource(strings = {"x", "_", "_1", "größe", "Δt", "年", "x2y", "e\u0301tat", "andover"})
    void acceptsName(String name) {
        var working = Working.of(List.of(name), NO_CONSTANTS, List.of(), List.of(name + "*2"));
        assertEquals(6, values(working, working.program(), 3)[0]);
    }

    @Test
    void namesAreComparedComposed() {
        var working = Working.of(List.of("é"), NO_CONSTANTS, List.of("s = e\u0301 + 1"), List.of("s*é"));
        assertEquals(12, values(working, working.program(), 3)[0]);
        assertEquals("é + 1", working.steps().getFirst().formula().canonical());
    }

    @Test
    void linesThatAreNoSteps() {
        assertEquals(
                List.of(
                        "steps[0] 2-3: step has no name / write a name and = before it, as in q = 0.5*v^2",
                        "steps[1] 0-0: step is empty / write a name and = before it, as in q = 0.5*v^2",
                        "steps[2] 0-1: \"3\" is not a name",
                        "steps[6] 2-4: step has no name / write a name and = before it, as in q = 0.5*v^2",
                        "steps[4] 3-3: formula is empty / write one, as in a*b + c",
                        "steps[5] 6-7: \"=\" does not compare / write == to compare, and name a value in a step"),
                shown(List.of("x"), List.of("x + 1", "", "3 = x", "ok = x", "b =", "c = x = 1", "d == 2"), "ok"));
    }

    @Test
    void everyProblemAtOnce() {
        assertEquals(
                List.of(
                        "steps[0] 4-5: unknown name \"k\" / declare it, or correct its spelling",
                        "asked[0] 3-3: value missing after \"+\"",
                        "asked[1] 1-2: operator missing between \"2\" and \"x\" / for a product write 2*x"),
                shown(List.of("x"), List.of("s = k*x"), "x +", "2x"));
    }

    @Test
    void shadowedConstantIsNoted() {
        SequencedMap<String, Double> constants = new LinkedHashMap<>();
        constants.put("e", 2.0);
        var working = Working.of(List.of("pi"), constants, List.of("deg = 1"), List.of("pi + e + deg"));
        assertEquals(6, values(working, working.program(), 3)[0]);
        assertEquals(
                List.of(
                        "inputs[0]: name \"pi\" hides the constant pi = 3.141592653589793",
                        "constants[0]: name \"e\" hides the constant e = 2.718281828459045",
                        "steps[0] 0-3: name \"deg\" hides the constant deg = 0.017453292519943295"),
                working.notes().stream().map(WorkingTest::shown).toList());
    }

    @Test
    void constantsAreFinite() {
        SequencedMap<String, Double> constants = new LinkedHashMap<>();
        constants.put("k", Double.NaN);
        var refusal = assertThrows(Refusal.class, () -> Working.of(List.of(), constants, List.of(), List.of("k")));
        assertEquals(
                "constants[0]: constant \"k\" is NaN but must be finite",
                shown(refusal.problems().getFirst()));
    }

    @ParameterizedTest
    @ValueSource(
            strings = {
                "x > 1",
                "x >= 1 & y < 2",
                "x == 1 | y",
                "x & y",
                "not(x)",
                "[x > 1]",
                "[x]",
                "1 > 2",
                "storm",
                "[storm]",
                "if(x > 1, y > 1, 0)",
                "if(x, 1, storm)",
                "max(x > 1, y > 1)",
                "min(x > 1, 1)",
                "(x > 1)*(y > 1)",
                "1 - [x > 1]",
                "if(x > 1, if(y > 1, 1, 0), y == 1)"
            })
    void events(String formula) {
        assertTrue(Working.of(List.of("x", "y"), NO_CONSTANTS, List.of("storm = x > 24"), List.of(formula))
                .isEvent(0));
    }

    @ParameterizedTest
    @ValueSource(
            strings = {"x", "x*y", "[x > 1] + [y > 1]", "2*(x > 1)", "if(x > 1, y, 0)", "max(x, y > 1)", "-[x > 1]", "2"
            })
    void notEvents(String formula) {
        assertFalse(Working.of(List.of("x", "y"), NO_CONSTANTS, List.of(), List.of(formula))
                .isEvent(0));
    }

    @ParameterizedTest
    @ValueSource(
            strings = {
                "x+1",
                " x  +\n1 # unit",
                "-x^2*3/(x-1)",
                "if(x>1,max(x,2,3),[x<=0])",
                "1e-3*x",
                "x*-2",
                "not(x>1)&x<2|x==.5",
                "sin( pi *x)",
                "1.50*x"
            })
    void canonicalTextSaysTheSameAndStays(String formula) {
        var first = Working.of(List.of("x"), NO_CONSTANTS, List.of(), List.of(formula));
        String canonical = first.asked().getFirst().canonical();
        var second = Working.of(List.of("x"), NO_CONSTANTS, List.of(), List.of(canonical));
        assertEquals(canonical, second.asked().getFirst().canonical());
        for (double x : new double[] {-1, 0, .5, 1.25, 7}) {
            assertEquals(values(first, first.program(), x)[0], values(second, second.program(), x)[0]);
        }
    }

    @Test
    void canonicalTextForgetsSpacesAndComments() {
        var working =
                Working.of(List.of("x"), NO_CONSTANTS, List.of("a=x+ 1#m"), List.of("2 *a # twice", "max( x,a )<= -x"));
        assertEquals("x + 1", working.steps().getFirst().formula().canonical());
        assertEquals("2 * a", working.asked().get(0).canonical());
        assertEquals("max ( x , a ) <= - x", working.asked().get(1).canonical());
        assertEquals("2 *a # twice", working.asked().get(0).text());
    }

    /// Words in any order: a refusal, or a value that the canonical text has too; never any other failure.
    @Test
    void anyOrderOfWordsIsRefusedOrComputed() {
        String[] words = {
            "x", "y", "2", "1e3", ".5", "+", "-", "*", "/", "^", "<", "==", "&", "|", "(", ")", "[", "]", ",", "sin",
            "max", "if", "not", "(", ")", "pi", "=", "#", "unknown", "x", "2", "-"
        };
        int computed = 0;
        for (long seed = 0; seed < 20_000; seed++) {
            var random = new java.util.SplittableRandom(seed);
            var made = new StringBuilder();
            for (int i = random.nextInt(1, 7); i > 0; i--) {
                made.append(words[random.nextInt(words.length)]).append(random.nextBoolean() ? " " : "");
            }
            String text = made.toString();
            try {
                var working = Working.of(List.of("x", "y"), NO_CONSTANTS, List.of("s = " + text), List.of(text));
                String canonical = working.asked().getFirst().canonical();
                var again = Working.of(List.of("x", "y"), NO_CONSTANTS, List.of(), List.of(canonical));
                double[] both = values(working, working.everyStep(), 3, -2);
                assertEquals(both[0], both[1], "seed " + seed + ": " + text);
                assertEquals(both[0], values(again, again.program(), 3, -2)[0], "seed " + seed + ": " + text);
                computed++;
            } catch (Refusal refusal) {
                for (Problem problem : refusal.problems()) {
                    int end = problem.place().span().orElseThrow().to();
                    assertTrue(end <= text.length() + 4, () -> text + ": " + problem);
                }
            }
        }
        assertTrue(computed > 1_000, computed + " computed");
    }

    @Test
    void withoutStepsOneProgramServesBoth() {
        var working = Working.of(List.of("x"), NO_CONSTANTS, List.of(), List.of("x"));
        assertSame(working.program(), working.everyStep());
    }
}
