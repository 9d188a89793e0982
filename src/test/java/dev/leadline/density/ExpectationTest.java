package dev.leadline.density;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.leadline.density.Expectation.Integrand;
import dev.leadline.density.Expectation.Limit;
import dev.leadline.problem.Refusal;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.concurrent.CancellationException;
import java.util.concurrent.atomic.AtomicInteger;
import java.util.function.ToDoubleFunction;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/// Means against closed forms: the bound of the error is never too small, and small enough to be of use.
class ExpectationTest {
    private static final Density UNIFORM = new Uniform(0, 1);
    private static final Density NORMAL = of("normal", Map.of("mean", 0.0, "sd", 1.0));
    private static final Density EXPONENTIAL = of("exponential", Map.of("mean", 1.0));

    /// @param most bound of the error at most, in standard deviations; infinite where there is none
    /// @param isEvent whether the function is the score of one, and the mean its probability
    record Case(
            String name,
            List<Density> inputs,
            ToDoubleFunction<double[]> function,
            boolean isEvent,
            double mean,
            double most) {
        @Override
        public String toString() {
            return name;
        }
    }

    private static Density of(String family, Map<String, Double> parameters) {
        return Catalogue.family(family).orElseThrow().of(parameters);
    }

    private static double normalCdf(double z) {
        return NORMAL.cdf(z);
    }

    static Stream<Case> cases() {
        var cases = new ArrayList<Case>();
        one(cases, "1", UNIFORM, x -> 1, 1);
        one(cases, "u", UNIFORM, x -> x, .5);
        one(cases, "u^9", UNIFORM, x -> Math.pow(x, 9), .1);
        one(cases, "exp u", UNIFORM, Math::exp, Math.E - 1);
        one(cases, "sin 20 u", UNIFORM, x -> Math.sin(20 * x), (1 - Math.cos(20)) / 20);
        one(cases, "sqrt u", UNIFORM, Math::sqrt, 2 / 3.0);
        one(cases, "log u", UNIFORM, Math::log, -1);
        one(cases, "log(1 - u)", UNIFORM, x -> Math.log(1 - x), -1);
        one(cases, "u^-.4", UNIFORM, x -> Math.pow(x, -.4), 1 / .6);
        one(
                cases,
                "1/(1 + 25 (u - .3)^2)",
                UNIFORM,
                x -> 1 / (1 + 25 * (x - .3) * (x - .3)),
                (Math.atan(3.5) + Math.atan(1.5)) / 5);
        one(
                cases,
                "narrow peak",
                UNIFORM,
                x -> 1 / (1 + 1e4 * (x - .3) * (x - .3)),
                (Math.atan(70) + Math.atan(30)) / 100);
        one(
                cases,
                "abs(u - 1/pi)",
                UNIFORM,
                x -> Math.abs(x - 1 / Math.PI),
                (1 / (Math.PI * Math.PI) + (1 - 1 / Math.PI) * (1 - 1 / Math.PI)) / 2);
        one(cases, "frac 7 u", UNIFORM, x -> 7 * x - Math.floor(7 * x), .5);
        one(cases, "z", NORMAL, x -> x, 0);
        one(cases, "z^2", NORMAL, x -> x * x, 1);
        one(cases, "z^8", NORMAL, x -> Math.pow(x, 8), 105);
        one(cases, "abs z", NORMAL, Math::abs, Math.sqrt(2 / Math.PI));
        one(cases, "cos 3 z", NORMAL, x -> Math.cos(3 * x), Math.exp(-4.5));
        one(cases, "exp 2 z", NORMAL, x -> Math.exp(2 * x), Math.exp(2));
        one(cases, "exp(z^2/5)", NORMAL, x -> Math.exp(x * x / 5), 1 / Math.sqrt(.6));
        one(cases, "max(z - 3, 0)", NORMAL, x -> Math.max(x - 3, 0), NORMAL.pdf(3) - 3 * NORMAL.survival(3));
        one(cases, "z > 5", NORMAL, x -> x > 5 ? 1 : 0, NORMAL.survival(5));
        one(cases, "abs(z - 1) < .1", NORMAL, x -> Math.abs(x - 1) < .1 ? 1 : 0, normalCdf(1.1) - normalCdf(.9));
        one(cases, "1e9 + z^2", NORMAL, x -> 1e9 + x * x, 1e9 + 1);
        one(cases, "x^5", EXPONENTIAL, x -> Math.pow(x, 5), 120);
        one(cases, "exp(.4 x)", EXPONENTIAL, x -> Math.exp(.4 * x), 1 / .6);
        one(cases, "floor x", EXPONENTIAL, Math::floor, 1 / (Math.E - 1));
        one(cases, "lognormal", of("lognormal", Map.of("mu", 0.0, "sigma", 2.0)), x -> x, Math.exp(2));
        one(
                cases,
                "lognormal call",
                of("lognormal", Map.of("mu", 0.0, "sigma", 1.0)),
                x -> Math.max(x - 2, 0),
                Math.exp(.5) * normalCdf(1 - Math.log(2)) - 2 * normalCdf(-Math.log(2)));
        one(cases, "pareto 3", of("pareto", Map.of("from", 1.0, "shape", 3.0)), x -> x, 1.5);
        one(cases, "pareto 2.2", of("pareto", Map.of("from", 1.0, "shape", 2.2)), x -> x, 2.2 / 1.2);
        one(cases, "log pareto 1.1", of("pareto", Map.of("from", 1.0, "shape", 1.1)), Math::log, 1 / 1.1);
        one(
                cases,
                "abs student 5",
                of("student", Map.of("dof", 5.0)),
                Math::abs,
                2 * Math.sqrt(5) / (4 * .375 * Math.PI));
        one(
                cases,
                "1/(1 + c^2), cauchy",
                of("cauchy", Map.of("location", 0.0, "scale", 1.0)),
                x -> 1 / (1 + x * x),
                .5);
        one(cases, "gamma .3", of("gamma", Map.of("shape", .3, "scale", 2.0)), x -> x * x, 4 * .3 * 1.3);
        one(cases, "weibull .5", of("weibull", Map.of("shape", .5, "scale", 1.0)), x -> x, 2);
        one(cases, "1/x, beta", of("beta", Map.of("alpha", 3.0, "beta", 2.0)), x -> 1 / x, 2);
        one(cases, "poisson", of("poisson", Map.of("mean", 7.0)), x -> x * x, 56);
        one(cases, "2^n, poisson", of("poisson", Map.of("mean", 3.0)), x -> Math.pow(2, x), Math.exp(3));
        one(cases, "binomial", of("binomial", Map.of("trials", 20.0, "probability", .3)), x -> x * x, 36 + 4.2);
        one(
                cases,
                "geometric mixture of jumps",
                of("triangular", Map.of("from", 0.0, "mode", .2, "to", 1.0)),
                x -> x < .2 ? 0 : x,
                .4 - .2 * 2 / 15);
        two(cases, "x y", NORMAL, NORMAL, x -> x[0] * x[1], 0);
        two(cases, "exp(x y / 4)", NORMAL, NORMAL, x -> Math.exp(x[0] * x[1] / 4), 1 / Math.sqrt(1 - 1 / 16.0));
        two(cases, "hypot", NORMAL, NORMAL, x -> Math.hypot(x[0], x[1]), Math.sqrt(Math.PI / 2));
        two(cases, "max(u, v)", UNIFORM, UNIFORM, x -> Math.max(x[0], x[1]), 2 / 3.0);
        two(cases, "u^2 + v^2 < 1", UNIFORM, UNIFORM, x -> x[0] * x[0] + x[1] * x[1] < 1 ? 1 : 0, Math.PI / 4);
        two(cases, "x > y", NORMAL, EXPONENTIAL, x -> x[0] > x[1] ? 1 : 0, .5 - Math.exp(.5) * normalCdf(-1));
        two(
                cases,
                "max(x + y - 1, 0)",
                NORMAL,
                NORMAL,
                x -> Math.max(x[0] + x[1] - 1, 0),
                Math.sqrt(2) * NORMAL.pdf(Math.sqrt(.5)) - normalCdf(-Math.sqrt(.5)));
        two(cases, "n x", of("poisson", Map.of("mean", 4.0)), EXPONENTIAL, x -> x[0] * x[1], 4);
        two(cases, "1/(u + v)", UNIFORM, UNIFORM, x -> 1 / (x[0] + x[1]), 2 * Math.log(2));
        three(cases, "product", UNIFORM, x -> x[0] * x[1] * x[2], .125);
        three(cases, "exp of a sum", UNIFORM, x -> Math.exp(x[0] + x[1] + x[2]), Math.pow(Math.E - 1, 3));
        three(cases, "sum > 1", UNIFORM, x -> x[0] + x[1] + x[2] > 1 ? 1 : 0, 5 / 6.0);
        three(cases, "largest", UNIFORM, x -> Math.max(x[0], Math.max(x[1], x[2])), .75);
        three(
                cases,
                "length",
                NORMAL,
                x -> Math.sqrt(x[0] * x[0] + x[1] * x[1] + x[2] * x[2]),
                2 * Math.sqrt(2 / Math.PI));
        three(cases, "sum^2 > 3", NORMAL, x -> Math.pow(x[0] + x[1] + x[2], 2) > 3 ? 1 : 0, 2 * normalCdf(-1));
        three(cases, "exponentials in a ball", EXPONENTIAL, x -> x[0] + x[1] + x[2] < 2 ? 1 : 0, 1 - 5 * Math.exp(-2));
        events(cases);
        return cases.stream();
    }

    private static void events(List<Case> cases) {
        event(cases, "z > 9", List.of(NORMAL), x -> x[0] - 9, NORMAL.survival(9), 1e-9);
        event(
                cases,
                "a thin stretch",
                List.of(NORMAL),
                x -> 1e-6 - Math.abs(x[0] - 1.2345),
                normalCdf(1.234501) - normalCdf(1.234499),
                1e-9);
        event(
                cases,
                "all but a thin stretch",
                List.of(NORMAL),
                x -> Math.abs(x[0] - 1.2345) - 1e-6,
                1 - (normalCdf(1.234501) - normalCdf(1.234499)),
                1e-9);
        event(cases, "a thin strip", List.of(UNIFORM, UNIFORM), x -> .001 - Math.abs(x[0] - x[1]), .001999, 1e-9);
        event(
                cases,
                "a ratio, undefined at one point",
                List.of(NORMAL, NORMAL),
                x -> x[0] / x[1] - 3,
                .5 - Math.atan(3) / Math.PI,
                1e-9);
        event(cases, "a ring", List.of(NORMAL, NORMAL), x -> Math.hypot(x[0], x[1]) - 3, Math.exp(-4.5), 1e-9);
        var poisson = of("poisson", Map.of("mean", 3.0));
        double sum = 0;
        for (int k = 0; k < 60; k++) {
            sum += poisson.pdf(k) * normalCdf((k - 5) / Math.sqrt(2));
        }
        event(cases, "n + y + z > 5", List.of(NORMAL, poisson, NORMAL), x -> x[0] + x[1] + x[2] - 5, sum, 1e-7);
        event(cases, "n > 8", List.of(poisson), x -> x[0] - 8, poisson.survival(8), 1e-9);
        event(cases, "u + v + w > 1", List.of(UNIFORM, UNIFORM, UNIFORM), x -> x[0] + x[1] + x[2] - 1, 5 / 6.0, 1e-5);
        event(
                cases,
                "four far out",
                List.of(NORMAL, NORMAL, NORMAL, NORMAL),
                x -> x[0] + x[1] + x[2] + x[3] - 10,
                NORMAL.survival(5),
                1e-3);
    }

    private static void event(
            List<Case> cases,
            String name,
            List<Density> inputs,
            ToDoubleFunction<double[]> score,
            double probability,
            double most) {
        cases.add(new Case(name, inputs, score, true, probability, most));
    }

    private static void one(List<Case> cases, String name, Density x, ToDoubleFunction<Double> f, double mean) {
        cases.add(new Case(name, List.of(x), p -> f.applyAsDouble(p[0]), false, mean, x.isDiscrete() ? 1e-7 : 1e-8));
    }

    private static void two(
            List<Case> cases, String name, Density x, Density y, ToDoubleFunction<double[]> f, double mean) {
        cases.add(new Case(name, List.of(x, y), f, false, mean, 1e-6));
    }

    private static void three(List<Case> cases, String name, Density x, ToDoubleFunction<double[]> f, double mean) {
        // Jumps across three variables are found to some hundredths, kinks to some thousandths.
        boolean isSmooth = !name.contains(">") && !name.contains("ball") && !name.equals("largest");
        cases.add(new Case(name, List.of(x, x, x), f, false, mean, isSmooth ? 1e-5 : .05));
    }

    private static Expectation of(List<Density> inputs, ToDoubleFunction<double[]> f) {
        return Expectation.of(inputs, blocks(inputs, f), Limit.of(8_000_000));
    }

    private static Integrand blocks(List<Density> inputs, ToDoubleFunction<double[]> f) {
        double[] point = new double[inputs.size()];
        return (x, z, n) -> {
            for (int i = 0; i < n; i++) {
                for (int j = 0; j < point.length; j++) {
                    point[j] = x[j][i];
                }
                z[i] = f.applyAsDouble(point);
            }
        };
    }

    @ParameterizedTest
    @MethodSource("cases")
    void theBoundIsNeverTooSmall(Case of) {
        var found = of.isEvent
                ? Expectation.ofEvent(
                        of.inputs, blocks(of.inputs, of.function), new Limit(8_000_000, 1e-3, () -> false))
                : of(of.inputs, of.function);
        // The closed form has a rounding error of its own.
        assertTrue(Math.abs(found.mean() - of.mean) <= found.error() + 4e-16 * Math.abs(of.mean), found.toString());
        double scale = of.isEvent ? of.mean : Math.max(found.deviation(), Math.abs(of.mean));
        assertTrue(found.error() <= of.most * scale, found.toString());
    }

    /// Jumps and kinks across three and four variables, wherever they fall: next to sides of boxes too.
    @Test
    void theBoundIsNeverTooSmallWhereverAJumpAcrossSeveralIs() {
        for (int i = 1; i <= 24; i++) {
            double at = i % 2 == 0 ? normalCdf(1.2 + .01 * (i - 12)) : .04 * i;
            var inputs = i % 3 == 0 ? List.of(UNIFORM, UNIFORM, UNIFORM, UNIFORM) : List.of(UNIFORM, UNIFORM, UNIFORM);
            var limit = Limit.of(400_000);
            var jump = Expectation.of(inputs, blocks(inputs, x -> x[0] > at ? x[1] + x[2] : 0), limit);
            assertTrue(Math.abs(jump.mean() - (1 - at)) <= jump.error(), jump + " at " + at);
            var kink = Expectation.of(inputs, blocks(inputs, x -> Math.max(x[2] - at, 0) * x[1]), limit);
            assertTrue(Math.abs(kink.mean() - .25 * (1 - at) * (1 - at)) <= kink.error(), kink + " at " + at);
            var corner = Expectation.of(inputs, blocks(inputs, x -> x[0] + x[1] + x[2] < at ? 1 : 0), limit);
            double below = (at * at * at) / 6;
            assertTrue(Math.abs(corner.mean() - below) <= corner.error(), corner + " at " + at);
        }
    }

    @Test
    void goesOnNoLongerThanAsked() {
        var inputs = List.of(NORMAL, NORMAL, NORMAL, NORMAL);
        var jump = blocks(inputs, x -> x[0] * x[1] > x[2] * x[3] ? 1 : 0);
        var found = Expectation.of(inputs, jump, Limit.of(1_000_000));
        assertTrue(found.evaluations() <= 1_010_000, found.toString());
        assertTrue(found.error() >= Math.abs(found.mean() - .5) && found.error() <= .2, found.toString());
        var asked = new AtomicInteger();
        assertThrows(
                CancellationException.class,
                () -> Expectation.of(inputs, jump, new Limit(1_000_000, 0, () -> asked.incrementAndGet() > 50)));
        assertEquals(51, asked.get());
    }

    @Test
    void anEventThatIsNeverSeenHasNoProbability() {
        var refusal = assertThrows(
                Refusal.class,
                () -> Expectation.ofEvent(
                        List.of(UNIFORM, UNIFORM), blocks(List.of(UNIFORM, UNIFORM), x -> -1), Limit.of(1_000_000)));
        assertEquals("the event is true at none of the points that were looked at", refusal.getMessage());
    }

    /// Jumps and kinks wherever they fall: between nodes, next to them, next to the ends of panels.
    @Test
    void theBoundIsNeverTooSmallWhereverAJumpOrAKinkIs() {
        for (int i = 1; i < 400; i++) {
            double at = i % 2 == 0 ? 6.0 * i / 400 - 3 : Math.sqrt(2) * Math.log(i) - 4;
            var jump = of(List.of(NORMAL), x -> x[0] > at ? 1 : 0);
            assertTrue(Math.abs(jump.mean() - NORMAL.survival(at)) <= jump.error(), jump + " at " + at);
            var kink = of(List.of(NORMAL), x -> Math.max(x[0] - at, 0));
            double mean = NORMAL.pdf(at) - at * NORMAL.survival(at);
            assertTrue(Math.abs(kink.mean() - mean) <= kink.error(), kink + " at " + at);
        }
    }

    @Test
    void saysWhereThereIsNoStandardDeviation() {
        var pareto = of("pareto", Map.of("from", 1.0, "shape", 1.9));
        assertEquals(Double.POSITIVE_INFINITY, of(List.of(pareto), x -> x[0]).deviation());
        assertEquals(
                Double.POSITIVE_INFINITY,
                of(List.of(NORMAL), x -> Math.exp(x[0] * x[0] / 3.9)).deviation());
        assertEquals(
                Double.POSITIVE_INFINITY,
                of(List.of(UNIFORM), x -> 1 / Math.sqrt(x[0])).deviation());
        assertEquals(
                Math.sqrt(5),
                of(List.of(UNIFORM), x -> Math.pow(x[0], -.4)).deviation() * Math.sqrt(5 / (5 - 1 / .36)),
                1e-4);
    }

    @Test
    void refusesWhatHasNoValue() {
        var refusal = assertThrows(Refusal.class, () -> of(List.of(NORMAL), x -> Math.log(x[0])));
        assertTrue(
                refusal.getMessage().startsWith("it has no finite value where its inputs are -"), refusal.getMessage());
        assertThrows(
                Refusal.class,
                () -> of(
                        List.of(of("poisson", Map.of("mean", 1e6)), of("poisson", Map.of("mean", 1e6))),
                        x -> x[0] * x[1]));
    }
}
