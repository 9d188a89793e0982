package dev.leadline.formula;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.leadline.problem.Refusal;
import java.util.Arrays;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

class EventScoreTest {
    private static final List<String> INPUTS = List.of("x", "y", "w");

    /// Ties are common among these, also of infinities; `log` and `sqrt` of them are often `NaN`.
    private static final double[] VALUES = {
        -2, -1, -0.0, 0, .5, 1, 2, 3, 1e-310, -1e-310, 1e308, -1e308, Double.POSITIVE_INFINITY, Double.NEGATIVE_INFINITY
    };

    private static Working working(List<String> steps, String event) {
        return Working.of(INPUTS, new LinkedHashMap<>(), steps, List.of(event));
    }

    private static double[] values(Program program, double[][] columns) {
        double[][] results = new double[1][columns[0].length];
        program.evaluate(columns, columns[0].length, results, program.workspace());
        return results[0];
    }

    private static double score(List<String> steps, String event, double... draw) {
        double[][] columns = Arrays.stream(draw).mapToObj(v -> new double[] {v}).toArray(double[][]::new);
        return values(working(steps, event).score(0), columns)[0];
    }

    private static double signOf(double event) {
        return event == 1 ? 1 : event == 0 ? -1 : Double.NaN;
    }

    /// The event itself, computed as any formula is, says what the sign of its score must be.
    @Test
    void signSaysWhetherTheEventIsTrue() {
        var random = new SplittableRandom(20261201);
        int[] seen = new int[3];
        for (int k = 0; k < 4_000; k++) {
            List<String> steps = List.of("s = " + event(random, 2).replace("s*1", "(x > 1)"), "t = " + number(random));
            String event = event(random, 4);
            var working = working(steps, event);
            assertTrue(working.isEvent(0), event);
            double[][] columns = new double[3][64];
            for (double[] column : columns) Arrays.setAll(column, _ -> VALUES[random.nextInt(VALUES.length)]);
            double[] expected = values(working.program(), columns);
            double[] score = values(working.score(0), columns);
            for (int i = 0; i < score.length; i++) {
                assertEquals(signOf(expected[i]), Math.signum(score[i]), event + " with " + steps + ", row " + i);
                seen[expected[i] == 1 ? 1 : expected[i] == 0 ? 0 : 2]++;
            }
        }
        for (int count : seen) assertTrue(count > 20_000, Arrays.toString(seen));
    }

    private static String event(SplittableRandom random, int depth) {
        if (depth == 0) return comparison(random);
        return switch (random.nextInt(13)) {
            case 0, 1 -> "(" + event(random, depth - 1) + " & " + event(random, depth - 1) + ")";
            case 2, 3 -> "(" + event(random, depth - 1) + " | " + event(random, depth - 1) + ")";
            case 4 -> "not(" + event(random, depth - 1) + ")";
            case 5 -> "[" + comparison(random) + "]";
            case 6 ->
                "if(" + event(random, depth - 1) + ", " + event(random, depth - 1) + ", " + event(random, depth - 1)
                        + ")";
            case 7 ->
                "(" + event(random, depth - 1) + (random.nextBoolean() ? " == " : " != ") + event(random, depth - 1)
                        + ")";
            case 8 -> "max(" + event(random, depth - 1) + ", " + event(random, depth - 1) + ")";
            case 9 -> "(1 - " + event(random, depth - 1) + ")*" + event(random, depth - 1);
            case 10 -> "if(" + event(random, depth - 1) + (random.nextBoolean() ? ", 1, 0)" : ", 0, 1)");
            case 11 -> random.nextInt(4) == 0 ? "[1 > 2]" : "s*1";
            default -> comparison(random);
        };
    }

    private static String comparison(SplittableRandom random) {
        return "(" + number(random) + " " + List.of("<", "<=", ">", ">=").get(random.nextInt(4)) + " " + number(random)
                + ")";
    }

    private static String number(SplittableRandom random) {
        String input = INPUTS.get(random.nextInt(3));
        return switch (random.nextInt(8)) {
            case 0 -> "1";
            case 1 -> "0";
            case 2 -> "sqrt(" + input + ")";
            case 3 -> "log(" + input + ")";
            case 4 -> "1/" + input;
            case 5 -> input + "*2";
            default -> input;
        };
    }

    /// Worked by hand.
    @ParameterizedTest
    @CsvSource(
            delimiterString = "=>",
            value = {
                "x > y => 2",
                "x >= y => 2",
                "y > x => -2",
                "not(x > y) => -2",
                "x > y & y > 0 => 1",
                "x > y | w > y => 4",
                "[x > y] => 2",
                "if(x <= y, 1, 0) => -2",
                "if(x > 0, w > 0, y > 2) => 3",
                "if(x < 0, w > 9, y > 2) => -1",
                "max(w - x, x - 9) >= 1 => 1",
                "far => 2.5",
                "not(far) | y == 1 & 0 > 1 => refused"
            })
    void howFar(String event, String expected) {
        List<String> steps = List.of("load = x + 0.5*y", "far = load > 1 & [w > 2.5]");
        if (expected.equals("refused")) {
            assertThrows(Refusal.class, () -> score(steps, event, 3, 1, 5));
        } else {
            assertEquals(Double.parseDouble(expected), score(steps, event, 3, 1, 5), 0);
        }
    }

    @Test
    void tiesAreTheNearest() {
        assertEquals(Double.MIN_VALUE, score(List.of(), "x >= y", 1, 1, 0));
        assertEquals(-Double.MIN_VALUE, score(List.of(), "x > y", 1, 1, 0));
        assertEquals(-Double.MIN_VALUE, score(List.of(), "x >= y & w > 0", 1, 1, 0));
        assertEquals(Double.MIN_VALUE, score(List.of(), "1/x >= 1/y", 0, 0, 0));
    }

    /// A branch not taken that is near shows the way; one that is `NaN` does not count.
    @Test
    void branchNotTakenShowsTheWay() {
        assertEquals(-1, score(List.of(), "if(x > 30, y > 5, y > 8)", 29, 7, 0));
        assertEquals(-4, score(List.of(), "if(x > 30, log(w) > 5, y > 8)", 29, 4, -1));
        assertEquals(Double.NaN, score(List.of(), "if(x > 30, log(w) > 5, y > 8)", 31, 4, -1));
    }

    @ParameterizedTest
    @CsvSource(
            delimiterString = "=>",
            value = {
                "x == 3 => a == b",
                "x != y & w > 1 => a != b",
                "exact => a == b",
                "x & y > 1 => a number that stands for a condition",
                "if(x, y > 1, w > 1) => a number that stands for a condition",
                "[w] => a number that stands for a condition"
            })
    void refusesWhatIsNoNearer(String event, String why) {
        var problem = assertThrows(
                        Refusal.class,
                        () -> working(List.of("exact = x == y"), event).score(0))
                .problems()
                .getFirst();
        assertEquals("asked[0]", problem.place().path());
        assertEquals("the event does not say how far it is from happening, which splitting needs", problem.primary());
        assertTrue(
                problem.detail().orElseThrow().startsWith(why), problem.detail().orElseThrow());
        assertTrue(problem.hint().isPresent());
    }

    /// What is compared may hold anything: only the comparison itself must say how far.
    @ParameterizedTest
    @ValueSource(strings = {"if(x == 1, y, w) > 2", "[x == 1] + y > 1", "if(x, y, w) >= 1"})
    void looksAtTheEventAlone(String event) {
        assertEquals(1, working(List.of(), event).score(0).outputs());
    }

    @Test
    void aNumberIsNoEvent() {
        assertThrows(
                IllegalArgumentException.class,
                () -> working(List.of(), "x + 1").score(0));
    }

    @Test
    void aLongEventTakesNoDepth() {
        String event = "x > 1" + " | y > 2".repeat(5_000) + " & w > 1".repeat(5_000);
        assertEquals(1, score(List.of(), event, 2, 0, 0), 0);
    }
}
