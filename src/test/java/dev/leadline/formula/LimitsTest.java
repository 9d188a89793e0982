package dev.leadline.formula;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTimeoutPreemptively;

import dev.leadline.problem.Refusal;
import java.time.Duration;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.function.Supplier;
import java.util.stream.Collectors;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Test;

/// Long and deep texts get an answer, and soon. On a quiet machine each takes at most .7 s in a program that has just
/// started, most under .1 s; the time allowed here is for a busy one, and would still stop an answer whose time grows
/// with the square of the length.
class LimitsTest {
    private static final Duration SOON = Duration.ofSeconds(20);

    private static double value(String formula, double x) {
        var program = Working.of(List.of("x"), new LinkedHashMap<>(), List.of(), List.of(formula))
                .program();
        double[][] results = new double[1][1];
        program.evaluate(new double[][] {{x}}, 1, results, program.workspace());
        return results[0][0];
    }

    private static String refusal(String formula) {
        return assertThrows(Refusal.class, () -> value(formula, 1))
                .problems()
                .getFirst()
                .primary();
    }

    private static <T> T soon(Supplier<T> answer) {
        return assertTimeoutPreemptively(SOON, answer::get);
    }

    @Test
    void longSum() {
        String formula = "x" + "+x".repeat(49_999);
        assertEquals(99_999, formula.length());
        assertEquals(50_000 * 0.5, soon(() -> value(formula, 0.5)));
    }

    @Test
    void longSumOfDifferentTerms() {
        String formula = IntStream.range(0, 10_000).mapToObj(i -> "x*" + i).collect(Collectors.joining("+"));
        assertEquals(10_000 * 9_999 / 2, soon(() -> value(formula, 1)));
    }

    @Test
    void longPower() {
        assertEquals(1, soon(() -> value("x" + "^x".repeat(49_999), 1)));
    }

    @Test
    void longCall() {
        assertEquals(
                9_999,
                soon(() -> value(
                        IntStream.range(0, 10_000)
                                .mapToObj(i -> "x*" + i)
                                .collect(Collectors.joining(",", "max(", ")")),
                        1)));
    }

    @Test
    void longNumber() {
        assertEquals(1.0 / 3, soon(() -> value("0." + "3".repeat(99_000), 1)));
    }

    @Test
    void longWord() {
        assertEquals("unknown name \"" + "a".repeat(20) + "…\"", soon(() -> refusal("a".repeat(4_000))));
        assertEquals("unknown name \"" + "a".repeat(20) + "…\"", soon(() -> refusal("a".repeat(100_000))));
    }

    @Test
    void runsOfSigns() {
        assertEquals("two signs in a row", soon(() -> refusal("-".repeat(2_000) + "x")));
        assertEquals("two signs in a row", soon(() -> refusal("x" + "-".repeat(99_000))));
        assertEquals("value missing before \"<\"", soon(() -> refusal("<".repeat(100_000))));
    }

    @Test
    void unreadableCharacters() {
        assertEquals("\"§\" cannot be read in a formula", soon(() -> refusal("§".repeat(100_000))));
    }

    @Test
    void manyUnknownNames() {
        assertEquals(
                "unknown name \"n0\"",
                soon(() -> refusal(
                        IntStream.range(0, 15_000).mapToObj(i -> "n" + i).collect(Collectors.joining("+")))));
    }

    @Test
    void tooLong() {
        assertEquals("formula has 100001 characters, more than 100000", soon(() -> refusal("x".repeat(100_001))));
        assertEquals("formula has 1000000 characters, more than 100000", soon(() -> refusal("x".repeat(1_000_000))));
    }

    @Test
    void tooDeep() {
        assertEquals(3, value("(".repeat(500) + "x" + ")".repeat(500), 3));
        assertEquals("brackets stand more than 500 deep", refusal("(".repeat(501) + "x" + ")".repeat(501)));
        assertEquals("brackets stand more than 500 deep", soon(() -> refusal("sin(".repeat(25_000))));
        assertEquals(1, value("[".repeat(500) + "x > 1" + "]".repeat(500), 3));
    }

    @Test
    void manyStepsInAnyOrder() {
        List<String> steps = IntStream.range(0, 2_000)
                .mapToObj(i -> "s" + i + " = " + (i == 1_999 ? "x" : "s" + (i + 1) + " + 1"))
                .toList();
        var working = soon(() -> Working.of(List.of("x"), new LinkedHashMap<>(), steps, List.of("s0")));
        double[][] results = new double[1][1];
        working.program()
                .evaluate(new double[][] {{1}}, 1, results, working.program().workspace());
        assertEquals(2_000, results[0][0]);
    }

    @Test
    void stepsThatDoubleEachTime() {
        List<String> steps = IntStream.range(0, 100)
                .mapToObj(i -> "s" + i + " = " + (i == 0 ? "x" : "s" + (i - 1) + "*1.5 + s" + (i - 1) + "/2"))
                .toList();
        var working = soon(() -> Working.of(List.of("x"), new LinkedHashMap<>(), steps, List.of("s99")));
        double[][] results = new double[1][1];
        working.program()
                .evaluate(new double[][] {{1}}, 1, results, working.program().workspace());
        assertEquals(0x1p99, results[0][0]);
    }
}
