package dev.leadline.density;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.leadline.problem.Problem;
import dev.leadline.problem.Refusal;
import dev.leadline.problem.Span;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Optional;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.Arguments;
import org.junit.jupiter.params.provider.MethodSource;

/// What is wrong with a typed density is said before the first draw, in words, at its place.
class TypedRefusalTest {
    private static final double INF = Double.POSITIVE_INFINITY;

    static Stream<Arguments> refused() {
        return Stream.of(
                on("s", -1, 1, "density is -0.5 at s = -0.5 but must not be below 0"),
                on("exp(-s^2)-0.1", 0, 3, "density is -0.0980695458637723 at s = 2.5 but must not be below 0"),
                on("1-2*exp(-((s-0.7)/1e-4)^2)", 0, 1, "density is -1 at s = 0.7 but must not be below 0"),
                on("log(s)", -1, 1, "density is -2.3025850929940455 at s = 0.1 but must not be below 0"),
                on("sqrt(s)", -1, 3, "density is not a number at s = -0.5"),
                on("sqrt((s-1)*(s-2))", 0, 3, "density is not a number at s = 1.1"),
                on("(sin(s)/s)^2", -30, 30, "density is not a number at s = 0"),
                on("0/0", 0, 1, "density is not a number at s = 0.1"),
                on("abs(s-0.3)^(-1/3)", -1, 1, "density is infinite at s = 0.3"),
                on("1/abs(s-sqrt(2))", 0, 2, "density is infinite at s = 1.4142135623730951"),
                on("s^400*exp(-s)", 0, INF, "density is infinite at s = 6"),
                on("-log(abs(s^2-2.1))", 1.1, 1.7, "density is infinite at s = 1.449137674618944"),
                on("abs(s^2-2)^(-1/2)", 1, 2, "density grows without bound at s = 1.4142135623731"),
                on("-log(abs(s^2-3)/9)", 1, 2, "density grows without bound at s = 1.73205080756888"),
                on("s^-1.03", 1, INF, "some draws of this density would exceed the largest number there is, 1.8e308"),
                on("1/s", 0, 1, "density has no finite integral: near s = 0 it grows like 1/distance^1.00"),
                on("s^-2", 0, 1, "density has no finite integral: near s = 0 it grows like 1/distance^2.00"),
                on("1/(1-s)", -1, 1, "density has no finite integral: near s = 1 it grows like 1/distance^1.00"),
                on("1/(1+abs(s))", 0, INF, "density has no finite integral: towards ∞ it falls only like 1/s^1.00"),
                on("1/(s*log(s)^2)", 2, INF, "density has no finite integral: towards ∞ it falls only like 1/s^1.00"),
                on("1", -INF, INF, "density has no finite integral: towards -∞ it does not fall"),
                on("exp(s)", 0, INF, "density has no finite integral: towards ∞ it grows"),
                on("s^2", -INF, INF, "density has no finite integral: towards -∞ it grows"),
                on("0*s", 0, 1, "density is 0 wherever it was looked at"),
                on("exp(-s^2-1000)", -INF, INF, "density is 0 wherever it was looked at"),
                on("exp(-1e10*(s^2-2)^2)", -INF, INF, "density is 0 wherever it was looked at"));
    }

    private static Arguments on(String formula, double from, double to, String primary) {
        return Arguments.of(formula, from, to, primary);
    }

    @ParameterizedTest(name = "{0} from {1} to {2}")
    @MethodSource("refused")
    void refuses(String formula, double from, double to, String primary) {
        var problem = only(new TypedText(formula, from, to, List.of(), false));
        assertEquals(primary, problem.primary());
        assertEquals("formula", problem.place().path());
    }

    static Stream<Arguments> kinds() {
        return Stream.of(
                Arguments.of(
                        "s",
                        "A probability cannot be negative.",
                        "Narrow the range to where it is positive, or write max(0, ...)."),
                Arguments.of(
                        "sqrt(s)",
                        "The formula has no value there, as the logarithm and the root of a negative number, or 0/0.",
                        "Narrow the range to where it has one, or choose with if(...); where it is missing in this one"
                                + " point only, add a break there."),
                Arguments.of(
                        "1/s",
                        "It may grow without bound only towards an end of the range or a break.",
                        "Add a break there; where only its numbers get too large, give its logarithm (log)."),
                Arguments.of(
                        "abs(s^2-2)^(-1/3)",
                        "It may do so only towards an end of the range or a break, where its mass is found by itself.",
                        "Add a break there."),
                Arguments.of(
                        "(1+s)^-1",
                        "The exponent must be less than 1, by .02 at least.",
                        "Move the end of the range away from there, or check the exponent."),
                Arguments.of(
                        "0*s",
                        "No draw can be made of it. A peak may be too narrow to be seen, or all values too small for a"
                                + " number.",
                        "Add a break at the peak, or give the logarithm of the density (log)."));
    }

    @ParameterizedTest
    @MethodSource("kinds")
    void saysWhyAndWhatToTry(String formula, String detail, String hint) {
        var problem = only(new TypedText(formula, -1, 3, List.of(), false));
        assertEquals(Optional.of(detail), problem.detail());
        assertEquals(Optional.of(hint), problem.hint());
    }

    @Test
    void wavesWithoutNumber() {
        var problem = only(new TypedText("1+sin(1e6*s)", 0, 1, List.of(), false));
        assertTrue(problem.primary().startsWith("density changes too fast to be integrated, near s = "));
        assertEquals(Optional.of("It was cut into more than 20000 pieces."), problem.detail());
        assertEquals(
                Optional.of("Narrow the range, or add breaks where the density jumps or grows without bound."),
                problem.hint());
    }

    @Test
    void aBreakLetsAPoleIn() {
        var text = new TypedText("abs(s-0.3)^(-1/3)", -1, 1, List.of(0.3), false);
        assertEquals(0, Typed.of(text, "s", new LinkedHashMap<>()).notes().size());
    }

    /// The break that the message of a pole between two doubles asks for; the integral by the substitution
    /// `s = 2^(1/2) cosh(t)` above and `s = 2^(1/2) sin(t)` below: `pi/4 + log(1 + 2^(1/2))`.
    @Test
    void aBreakWhereThePoleWasSaidToBeLetsItIn() {
        var text = new TypedText("abs(s^2-2)^(-1/2)", 1, 2, List.of(1.4142135623731), false);
        var typed = Typed.of(text, "s", new LinkedHashMap<>());
        assertEquals(Math.PI / 4 + Math.log(1 + Math.sqrt(2)), typed.integral(), 1e-7);
    }

    @Test
    void aPoleWithoutMassStaysOut() {
        var problem = only(new TypedText("1/abs(s-1)", 0, 2, List.of(1.0), false));
        assertEquals("density has no finite integral: near s = 1 it grows like 1/distance^1.00", problem.primary());
    }

    @Test
    void aLogarithmMayGrowToo() {
        var problem = only(new TypedText("exp(s)", 0, INF, List.of(), true));
        assertEquals("density has no finite integral: towards ∞ it grows", problem.primary());
    }

    @Test
    void ranges() {
        range("to is 1 but must be greater than from, 3", "to", 3, 1);
        range("to is 3 but must be greater than from, 3", "to", 3, 3);
        range("from is NaN but must be a number or -∞", "from", Double.NaN, 1);
        range("from is ∞ but must be a number or -∞", "from", INF, INF);
        range("to is -∞ but must be a number or ∞", "to", -INF, -INF);
        range("to is NaN but must be a number or ∞", "to", 0, Double.NaN);
        range("the distance between from and to is too large", "to", -1.7e308, 1.7e308);
    }

    private static void range(String primary, String path, double from, double to) {
        var problem = only(new TypedText("s", from, to, List.of(), false));
        assertEquals(primary, problem.primary());
        assertEquals(path, problem.place().path());
    }

    @Test
    void breaks() {
        breaks("breaks[1] is 7 but must be between from, 0, and to, 5", "breaks[1]", 1.0, 7.0);
        breaks("breaks[0] is 0 but must be between from, 0, and to, 5", "breaks[0]", 0.0);
        breaks("breaks[1] is 2 but must be greater than the one before, 3", "breaks[1]", 3.0, 2.0);
        breaks("breaks[1] is 3 but must be greater than the one before, 3", "breaks[1]", 3.0, 3.0);
        breaks("breaks[0] is NaN but must be between from, 0, and to, 5", "breaks[0]", Double.NaN);
    }

    private static void breaks(String primary, String path, Double... breaks) {
        var problem = only(new TypedText("s", 0, 5, List.of(breaks), false));
        assertEquals(primary, problem.primary());
        assertEquals(path, problem.place().path());
    }

    @Test
    void formulasThatCannotBeRead() {
        var bracket = only(new TypedText("exp(-s", 0, 1, List.of(), false));
        assertEquals("closing bracket of \"(\" missing", bracket.primary());
        assertEquals("formula", bracket.place().path());
        assertEquals(Optional.of(new Span(3, 4)), bracket.place().span());
        var name = only(new TypedText("t*s", 0, 1, List.of(), false));
        assertEquals("unknown name \"t\"", name.primary());
        assertEquals(Optional.of(new Span(0, 1)), name.place().span());
    }

    @Test
    void namesEverythingWrongAtOnce() {
        var refusal = assertThrows(
                Refusal.class,
                () -> Typed.of(new TypedText("t*s", 0, 5, List.of(7.0, 9.0), false), "s", new LinkedHashMap<>()));
        assertEquals(
                List.of("breaks[0]", "breaks[1]", "formula"),
                refusal.problems().stream().map(p -> p.place().path()).toList());
    }

    private static Problem only(TypedText text) {
        var refusal = assertThrows(Refusal.class, () -> Typed.of(text, "s", new LinkedHashMap<>()));
        assertEquals(1, refusal.problems().size(), () -> refusal.problems().toString());
        return refusal.problems().getFirst();
    }
}
