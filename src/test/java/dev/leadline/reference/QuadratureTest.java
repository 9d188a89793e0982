package dev.leadline.reference;

import static dev.leadline.ReferenceValues.caseOf;
import static dev.leadline.ReferenceValues.expected;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertInstanceOf;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.leadline.model.Project;
import dev.leadline.model.Question;
import dev.leadline.project.ProjectFile;
import dev.leadline.reference.ReferenceValue.Kind;
import dev.leadline.reference.ReferenceValue.Known;
import dev.leadline.reference.ReferenceValue.Unknown;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.concurrent.CancellationException;
import java.util.stream.Collectors;
import java.util.stream.IntStream;
import java.util.stream.Stream;
import org.apache.commons.math3.special.Erf;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.MethodSource;

/// Every integral, expectation and probability of `reference-values.json` over up to four variables whose value stands
/// there, and the families of Genz in three and four variables by their closed forms: the true error is within the
/// bound that is stated, and the bound no larger than the gate of each, relative to the value. Gates: 1e-8 with one
/// variable (1e-7 and 1e-6 where it is singular elsewhere than at 0) and 1e-6 with two, events 1e-9; with three and
/// four 1e-4, what has jumps 1e-3.
class QuadratureTest {
    private static final String UNIFORM = "\"density\": {\"family\": \"uniform\", \"from\": %s, \"to\": %s}";
    private static final String NORMAL = "\"density\": {\"family\": \"normal\", \"mean\": %s, \"sd\": %s}";
    private static final String UNIT = UNIFORM.formatted(0, 1);
    private static final String STANDARD = NORMAL.formatted(0, 1);
    private static final String UNIT_RANGE = "\"range\": [0, 1]";
    private static final String LINE =
            "\"range\": [\"-inf\", \"inf\"], \"drawFrom\": {\"family\": \"normal\", \"mean\": 0, \"sd\": 1}";
    private static final List<String> NAMES = List.of("x1", "x2", "x3", "x4");

    /// @param gate of the bound, relative to the value
    record Case(String name, String inputs, String ask, double value, double gate) {
        @Override
        public String toString() {
            return name;
        }
    }

    static Stream<Case> cases() {
        var cases = new ArrayList<Case>();
        singular(cases);
        genz(cases);
        keister(cases);
        means(cases);
        events(cases);
        return cases.stream();
    }

    private static void singular(List<Case> cases) {
        Map.of("a", "x1^(-1/3)", "b", "x1^(-1/2)", "c", "x1^(-3/4)", "d", "-log(x1)")
                .forEach((part, formula) -> integral(
                        cases,
                        "singular " + part,
                        all(UNIT_RANGE, 1),
                        formula,
                        expected("int-singular", part + "_integral"),
                        1e-8));
        integral(cases, "singular above", all(UNIT_RANGE, 1), "1/sqrt(1 - x1)", 2, 1e-7);
        integral(cases, "singular inside", all(UNIT_RANGE, 1), "1/sqrt(abs(x1 - 0.25))", 1 + Math.sqrt(3), 1e-6);
        integral(cases, "unbounded", all(LINE, 1), "1/(1 + (x1 - 3)^2)", Math.PI, 1e-8);
        integral(
                cases,
                "half unbounded",
                input(
                        "x1",
                        "\"range\": [1, \"inf\"], \"drawFrom\": {\"family\": \"pareto\", \"from\": 1, \"shape\": 3}"),
                "x1^-1.25",
                4,
                1e-8);
        integral(
                cases,
                "half unbounded below",
                input("x1", "\"range\": [\"-inf\", 2], \"drawFrom\": {\"family\": \"normal\", \"mean\": 0, \"sd\": 1}"),
                "exp(x1)",
                Math.exp(2),
                1e-8);
    }

    private static void genz(List<Case> cases) {
        for (String family :
                List.of("oscillatory", "product-peak", "corner-peak", "gaussian", "continuous", "discontinuous")) {
            for (int d = 1; d <= 2; d++) {
                var record = caseOf("int-genz-" + family, "d=" + d);
                integral(
                        cases,
                        family + ", d=" + d,
                        all(UNIT_RANGE, d),
                        record.required("integrand").asString().replace(" or ", " | "),
                        expected(record, "integral"),
                        d == 1 ? 1e-8 : 1e-6);
            }
        }
        double[] c = {3, 6, 2, 4};
        double[] w = {.27, .61, .4, .8};
        for (int d = 3; d <= 4; d++) {
            double peak = 1;
            double gaussian = 1;
            double continuous = 1;
            for (int j = 0; j < d; j++) {
                double below = c[j] * w[j];
                double above = c[j] * (1 - w[j]);
                peak *= c[j] * (Math.atan(above) + Math.atan(below));
                gaussian *= Math.sqrt(Math.PI) / (2 * c[j]) * (Erf.erf(above) + Erf.erf(below));
                continuous *= (2 - Math.exp(-below) - Math.exp(-above)) / c[j];
            }
            var ranges = all(UNIT_RANGE, d);
            integral(
                    cases,
                    "peak, d=" + d,
                    ranges,
                    "1/(" + terms(d, c, w, "*", "(%s^-2 + (%s - %s)^2)") + ")",
                    peak,
                    1e-4);
            integral(
                    cases,
                    "gaussian, d=" + d,
                    ranges,
                    "exp(-(" + terms(d, c, w, "+", "(%s*(%s - %s))^2") + "))",
                    gaussian,
                    1e-4);
            integral(
                    cases,
                    "continuous, d=" + d,
                    ranges,
                    "exp(-(" + terms(d, c, w, "+", "%s*abs(%s - %s)") + "))",
                    continuous,
                    1e-4);
        }
        integral(
                cases,
                "discontinuous, d=3",
                all(UNIT_RANGE, 3),
                "if(x1 > 0.6 | x2 > 0.35, 0, exp(0.5*x1 + x2 + 0.7*x3))",
                Math.expm1(.3) / .5 * Math.expm1(.35) * Math.expm1(.7) / .7,
                1e-3);
    }

    private static String terms(int d, double[] c, double[] w, String between, String term) {
        return IntStream.range(0, d)
                .mapToObj(j -> term.formatted(c[j], NAMES.get(j), w[j]))
                .collect(Collectors.joining(between));
    }

    private static void keister(List<Case> cases) {
        for (int d = 1; d <= 4; d++) {
            String squares =
                    NAMES.subList(0, d).stream().map(name -> name + "^2").collect(Collectors.joining(" + "));
            double value = expected(caseOf("int-keister", "d=" + d), "integral");
            mean(
                    cases,
                    "Keister, d=" + d,
                    all(NORMAL.formatted(0, "0.7071067811865476"), d),
                    "pi^(%d/2)*cos(sqrt(%s))".formatted(d, squares),
                    value,
                    d < 3 ? 1e-7 : 1e-4);
            if (d < 4) {
                integral(
                        cases,
                        "Keister over ranges, d=" + d,
                        all(LINE, d),
                        "cos(sqrt(%s))*exp(-(%s))".formatted(squares, squares),
                        value,
                        d < 3 ? 1e-6 : 1e-4);
            }
        }
    }

    private static void means(List<Case> cases) {
        mean(cases, "exp(U)", all(UNIT, 1), "exp(x1)", expected("exp-expU-crude", "mean"), 1e-8);
        mean(
                cases,
                "Ishigami",
                all(UNIFORM.formatted(-Math.PI, Math.PI), 3),
                "sin(x1) + 7*sin(x2)^2 + 0.1*x3^4*sin(x1)",
                expected("int-ishigami", "mean"),
                1e-4);
        mean(
                cases,
                "call",
                all(STANDARD, 1),
                "exp(-0.05)*max(100*exp(0.03 + 0.2*x1) - 100, 0)",
                expected("exp-black-scholes-call", "price"),
                1e-8);
        mean(
                cases,
                "Asian call",
                all(STANDARD, 4),
                "exp(-0.05)*max((100*exp(0.0075+0.1*x1)+100*exp(0.015+0.1*(x1+x2))+100*exp(0.0225+0.1*(x1+x2+x3))"
                        + "+100*exp(0.03+0.1*(x1+x2+x3+x4)))/4-100,0)",
                expected("exp-asian-call-4", "arithmetic_price"),
                1e-3);
        for (String sigma : List.of("0.5", "1", "2", "3")) {
            mean(
                    cases,
                    "lognormal " + sigma,
                    all(STANDARD, 1),
                    "exp(" + sigma + "*x1)",
                    expected(caseOf("exp-lognormal-mean", "sigma=" + sigma), "mean"),
                    1e-6);
        }
        mean(cases, "larger of two", all(STANDARD, 2), "max(x1, x2)", expected("exp-maxima", "a_mean"), 1e-6);
        for (String alpha : List.of("0.8", "1.5", "2.5")) {
            mean(
                    cases,
                    "square root, pareto " + alpha,
                    input("x1", "\"density\": {\"family\": \"pareto\", \"from\": 1, \"shape\": " + alpha + "}"),
                    "sqrt(x1)",
                    expected(caseOf("exp-pareto-moments", "alpha=" + alpha), "moment_0.5"),
                    1e-8);
        }
        for (int d = 1; d <= 4; d++) {
            integral(cases, "A, d=" + d, all(UNIT_RANGE, d), product("abs(4*%s - 2)", d), 1, d < 3 ? 1e-6 : 1e-4);
            integral(cases, "C, d=" + d, all(UNIT_RANGE, d), product("pi/2*sin(pi*%s)", d), 1, d < 3 ? 1e-6 : 1e-4);
            integral(
                    cases,
                    "D, d=" + d,
                    all(UNIT_RANGE, d),
                    "(1 + 1/%d)^%d*%s".formatted(d, d, product("%s^(1/" + d + ")", d)),
                    1,
                    d < 3 ? 1e-6 : 1e-4);
        }
    }

    private static String product(String factor, int d) {
        return NAMES.subList(0, d).stream().map(factor::formatted).collect(Collectors.joining("*"));
    }

    private static void events(List<Case> cases) {
        for (String of : List.of("0.5,0.8", "1,1", "2,0.5", "0.0625,0.25", "4,3", "0,2")) {
            String[] parts = of.split(",");
            event(
                    cases,
                    "Owen's T(" + of + ")",
                    all(STANDARD, 2),
                    "x1 > %s & x2 > 0 & x2 < %s*x1".formatted(parts[0], parts[1]),
                    expected("prob-owens-t", "T(" + of + ")"),
                    1e-9);
        }
        event(
                cases,
                "resistance and load",
                input("x1", NORMAL.formatted(200, 20)) + ", " + input("x2", NORMAL.formatted(150, 15)),
                "x1 < x2",
                expected("prob-resistance-load", "a_probability"),
                1e-9);
        String lognormal = "\"density\": {\"family\": \"lognormal\", \"mean\": %s, \"sd\": %s}";
        event(
                cases,
                "resistance and load, lognormal",
                input("x1", lognormal.formatted(200, 20)) + ", " + input("x2", lognormal.formatted(120, 24)),
                "x1 < x2",
                expected("prob-resistance-load", "b_probability"),
                1e-9);
        var cube = UNIFORM.formatted(-1, 1);
        mean(
                cases,
                "disc",
                all(cube, 2),
                "if(x1^2 + x2^2 <= 1, 1, 0)",
                expected("int-ball-volume", "fraction_d2"),
                1e-9);
        integral(
                cases,
                "volume of the ball",
                all("\"range\": [-1, 1]", 3),
                "[x1^2 + x2^2 + x3^2 <= 1]",
                expected("int-ball-volume", "volume_d3"),
                1e-3);
        event(cases, "near each other", all(UNIT, 2), "abs(x1 - x2) < 0.1", .19, 1e-9);
        // The two breaks of the stick at x1 and x2.
        event(
                cases,
                "triangle",
                all(UNIT, 2),
                "max(x1, x2) > 0.5 & min(x1, x2) < 0.5 & abs(x1 - x2) < 0.5",
                expected("prob-sums-and-counting", "P(three random broken-stick pieces form a triangle)"),
                1e-9);
        event(
                cases,
                "Buffon's needle",
                input("x1", UNIFORM.formatted(0, 1)) + ", " + input("x2", UNIFORM.formatted(0, Math.PI / 2)),
                "x1 <= 0.5*sin(x2)",
                expected("prob-buffon-normal-product", "a"),
                1e-9);
        event(cases, "product", all(STANDARD, 2), "x1*x2 > 1", expected("prob-buffon-normal-product", "b"), 1e-9);
        event(cases, "ratio", all(STANDARD, 2), "x1/x2 > 3", expected("prob-buffon-normal-product", "c"), 1e-9);
        event(cases, "ring", all(STANDARD, 2), "x1^2 + x2^2 > 9", expected("prob-buffon-normal-product", "d"), 1e-9);
        event(
                cases,
                "parabola",
                all(STANDARD, 2),
                "5 - x2 - 0.5*(x1 - 0.1)^2 <= 0",
                expected("rare-parabolic", "probability"),
                1e-9);
        event(
                cases,
                "four branches",
                all(STANDARD, 2),
                "min(3+0.1*(x1-x2)^2-(x1+x2)/sqrt(2),3+0.1*(x1-x2)^2+(x1+x2)/sqrt(2),(x1-x2)+6/sqrt(2),"
                        + "(x2-x1)+6/sqrt(2)) <= 0",
                expected("rare-four-branch", "probability_k6"),
                1e-9);
        for (int beta : new int[] {2, 4, 6}) {
            event(
                    cases,
                    "plane, β = " + beta,
                    all(STANDARD, 3),
                    "x1 + x2 + x3 >= " + beta + "*sqrt(3)",
                    expected("rare-linear-limit-state", "P(beta=" + beta + ")"),
                    1e-4);
        }
        event(
                cases,
                "plane in four",
                all(STANDARD, 4),
                "x1 + x2 + x3 + x4 >= 6",
                expected("rare-linear-limit-state", "P(beta=3)"),
                1e-3);
    }

    private static String all(String input, int d) {
        return NAMES.subList(0, d).stream().map(name -> input(name, input)).collect(Collectors.joining(", "));
    }

    private static String input(String name, String input) {
        return "{\"name\": \"%s\", %s}".formatted(name, input);
    }

    private static void integral(
            List<Case> cases, String name, String inputs, String formula, double value, double gate) {
        cases.add(new Case(name, inputs, "\"integral\": \"" + formula + "\"", value, gate));
    }

    private static void mean(List<Case> cases, String name, String inputs, String formula, double value, double gate) {
        cases.add(new Case(name, inputs, "\"mean\": \"" + formula + "\"", value, gate));
    }

    private static void event(List<Case> cases, String name, String inputs, String event, double value, double gate) {
        cases.add(new Case(name, inputs, "\"probability\": \"" + event + "\"", value, gate));
    }

    private static Question question(String inputs, String ask) {
        return Project.of(ProjectFile.parse("""
                        {"leadline": 1, "inputs": [%s], "ask": {%s}, "reference": {"quadrature": true}}""".formatted(inputs, ask))).question();
    }

    private static ReferenceValue found(String inputs, String ask) {
        return Quadrature.of(question(inputs, ask), () -> false);
    }

    @ParameterizedTest
    @MethodSource("cases")
    void theTrueErrorIsWithinTheBoundAndTheBoundIsOfUse(Case of) {
        var known = assertInstanceOf(Known.class, found(of.inputs, of.ask));
        // The value of the record has a rounding error of its own.
        assertTrue(
                Math.abs(known.value() - of.value) <= known.error() + 1e-15 * Math.abs(of.value),
                known + " of " + of.value);
        assertTrue(known.error() > 0 && known.error() <= of.gate * Math.abs(of.value), known.toString());
        assertEquals(Kind.QUADRATURE, known.kind());
        assertTrue(known.source().startsWith("quadrature, "), known.source());
    }

    @ParameterizedTest(name = "{0}")
    @CsvSource(delimiter = '|', textBlock = """
            1/x                      | the integral does not seem to converge
            1/(1 - x)                | the integral does not seem to converge
            1/abs(x - 0.3)           | the integral does not seem to converge
            1/(x - 0.3)^2            | the integral does not seem to converge
            x - x                    | the formula is 0 at every point that was looked at
            """)
    void whatHasNoValueIsNotGivenOne(String formula, String reason) {
        assertEquals(new Unknown(reason), found(input("x", UNIT_RANGE), "\"integral\": \"" + formula + "\""));
    }

    @Test
    void whatHasNoMeanIsNotGivenOne() {
        var none = new Unknown("the integral does not seem to converge");
        String cauchy = "\"density\": {\"family\": \"cauchy\", \"location\": 0, \"scale\": 1}";
        String pareto = "\"density\": {\"family\": \"pareto\", \"from\": 1, \"shape\": 0.8}";
        assertEquals(none, found(input("x", cauchy), "\"mean\": \"x\""));
        assertEquals(none, found(input("x", pareto), "\"mean\": \"x\""));
        String tail = "\"range\": [1, \"inf\"], \"drawFrom\": {\"family\": \"pareto\", \"from\": 1, \"shape\": 1}";
        assertEquals(none, found(input("x", tail), "\"integral\": \"1/x\""));
        assertEquals(
                new Unknown("the formula does not fall off along the range of y"),
                found(input("x", UNIT_RANGE) + ", " + input("y", tail), "\"integral\": \"x\""));
    }

    @Test
    void whatIsUndefinedOrNeverTrueIsSaid() {
        var undefined = assertInstanceOf(Unknown.class, found(input("z", STANDARD), "\"mean\": \"log(z)\""));
        assertTrue(
                undefined.reason().startsWith("it has no finite value where its inputs are -"), undefined.toString());
        assertEquals(
                new Unknown("the event is true at none of the points that were looked at"),
                found(input("x", UNIT), "\"probability\": \"x > 2\""));
    }

    @Test
    void rangesThatAreNotReadCountAllTheSame() {
        var known = assertInstanceOf(
                Known.class,
                found(input("x", UNIT_RANGE) + ", " + input("y", "\"range\": [2, 5]"), "\"integral\": \"x\""));
        assertEquals(1.5, known.value(), known.error());
        var constant = assertInstanceOf(Known.class, found(input("y", "\"range\": [2, 5]"), "\"integral\": \"7\""));
        assertEquals(21, constant.value(), 0);
        assertTrue(constant.error() > 0 && constant.error() < 1e-13);
    }

    /// Eight dice, 1,679,616 ways.
    @Test
    void discreteInputsAreSummed() {
        String die = "\"density\": {\"family\": \"discrete-uniform\", \"from\": 1, \"to\": 6}";
        String inputs = IntStream.range(0, 8).mapToObj(i -> input("d" + i, die)).collect(Collectors.joining(", "));
        String sum = IntStream.range(0, 8).mapToObj(i -> "d" + i).collect(Collectors.joining(" + "));
        var known = assertInstanceOf(Known.class, found(inputs, "\"probability\": \"" + sum + " >= 45\""));
        // Ways to be 0, 1, 2 or 3 short: C(7+k, k).
        assertEquals((1 + 8 + 36 + 120) / Math.pow(6, 8), known.value(), known.error());
        assertTrue(known.error() < 1e-12);
    }

    @Test
    void isCancelled() {
        var question = question(all(STANDARD, 4), "\"mean\": \"abs(x1 + x2*x3 - x4)\"");
        assertThrows(CancellationException.class, () -> Quadrature.of(question, () -> true));
    }

    @Test
    void whatIsStatedIsKnownAtOnce() {
        var closed = Project.of(ProjectFile.parse("""
                {"leadline": 1, "constants": [{"name": "r", "value": 2}], "steps": ["square = r^2"],
                 "inputs": [{"name": "x", "range": [0, 1]}], "ask": {"integral": "x"},
                 "reference": {"formula": "pi*square/8"}}"""));
        var known = (Known) ReferenceValue.of(closed.question()).orElseThrow();
        assertEquals(Math.PI / 2, known.value(), 1e-15);
        assertEquals(Kind.CLOSED_FORM, known.kind());
        assertEquals("pi*square/8", known.source());
        assertTrue(known.error() > 0 && known.error() < 1e-14);
        assertEquals(
                new ReferenceValue.Sought(),
                ReferenceValue.of(question(all(UNIT, 1), "\"mean\": \"x1\"")).orElseThrow());
    }
}
