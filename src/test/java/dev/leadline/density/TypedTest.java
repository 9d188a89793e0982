package dev.leadline.density;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertNotEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.leadline.problem.Problem;
import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.SplittableRandom;
import java.util.function.DoubleUnaryOperator;
import java.util.stream.Stream;
import org.apache.commons.math3.analysis.integration.gauss.GaussIntegratorFactory;
import org.apache.commons.statistics.distribution.BetaDistribution;
import org.apache.commons.statistics.distribution.CauchyDistribution;
import org.apache.commons.statistics.distribution.ContinuousDistribution;
import org.apache.commons.statistics.distribution.ExponentialDistribution;
import org.apache.commons.statistics.distribution.GammaDistribution;
import org.apache.commons.statistics.distribution.LaplaceDistribution;
import org.apache.commons.statistics.distribution.NormalDistribution;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/// Typed densities against `density/typed.csv` (mpmath, 60 digits, `typed_densities.py`), and their draws against
/// distributions of a library and closed forms.
class TypedTest {
    private static final long SEED = 20261201;
    private static final int DRAWS = 20_000;

    /// Error in probability that is promised.
    private static final double PROMISED = 1e-10;

    private record Row(Map<String, String> cells) {
        String text(String column) {
            return cells.get(column);
        }

        double number(String column) {
            return Double.parseDouble(text(column).replace("inf", "Infinity"));
        }
    }

    private record Case(Row row, List<Row> points) {
        @Override
        public String toString() {
            return row.text("name");
        }

        Typed typed() {
            var breaks = Arrays.stream(row.text("breaks").split(" "))
                    .filter(b -> !b.isEmpty())
                    .map(Double::valueOf)
                    .toList();
            var text = new TypedText(
                    row.text("formula"),
                    row.number("from"),
                    row.number("to"),
                    breaks,
                    Boolean.parseBoolean(row.text("log")));
            var constants = new LinkedHashMap<String, Double>();
            constants.put("k", 2.5);
            constants.put("m", -3.0);
            return Typed.of(text, "s", constants);
        }
    }

    static Stream<Density> densities() {
        return cases().map(c -> c.typed().density());
    }

    static Stream<Case> cases() {
        List<String> lines;
        try (var in = TypedTest.class.getResourceAsStream("/density/typed.csv")) {
            lines = new String(in.readAllBytes(), StandardCharsets.UTF_8)
                    .lines()
                    .toList();
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
        var columns = lines.get(1).split(",");
        var rows = new ArrayList<Row>();
        for (String line : lines.subList(2, lines.size())) {
            var cells = line.split(",", -1);
            var row = new LinkedHashMap<String, String>();
            for (int i = 0; i < columns.length; i++) {
                row.put(columns[i], cells[i]);
            }
            rows.add(new Row(row));
        }
        return rows.stream()
                .filter(row -> row.text("kind").equals("density"))
                .map(row -> new Case(
                        row,
                        rows.stream()
                                .filter(at -> at.text("kind").equals("at")
                                        && at.text("name").equals(row.text("name")))
                                .toList()));
    }

    @ParameterizedTest
    @MethodSource("cases")
    void integralAndMoments(Case c) {
        var typed = c.typed();
        double integral = c.row.number("integral");
        if (integral > 0) {
            assertEquals(integral, typed.integral(), 1e-12 * integral);
        }
        var d = typed.density();
        if (Double.isNaN(c.row.number("mean"))) {
            assertTrue(Double.isNaN(d.mean()));
            assertTrue(Double.isNaN(d.variance()));
            assertEquals(new TailOrders(1, 1), d.tailOrders());
            return;
        }
        double sd = Math.sqrt(c.row.number("variance"));
        assertEquals(c.row.number("mean"), d.mean(), 1e-11 * sd + 1e-15 * Math.abs(d.mean()));
        assertEquals(c.row.number("variance"), d.variance(), 1e-11 * sd * sd);
        assertEquals(c.row.number("skewness"), d.skewness(), 1e-10);
        assertEquals(c.row.number("excessKurtosis"), d.excessKurtosis(), 1e-10);
    }

    @Test
    void logarithmOfAnIntegralBelowTheSmallestNumber() {
        var typed = cases().filter(c -> c.toString().equals("far below underflow"))
                .findFirst()
                .orElseThrow()
                .typed();
        assertEquals(0, typed.integral());
        assertEquals(-1e5 + 0.5 * StrictMath.log(2 * Math.PI), typed.density().logArea(), 1e-10);
    }

    /// Both masses to 1e-12, and to a relative 1e-10 each; two doubles to either side.
    @ParameterizedTest
    @MethodSource("cases")
    void masses(Case c) {
        var d = c.typed().density();
        for (var point : c.points) {
            double x = point.number("x");
            within(point.number("cdf"), d.cdf(down(x)), d.cdf(up(x)), c + ", cdf at " + x);
            within(point.number("survival"), d.survival(up(x)), d.survival(down(x)), c + ", survival at " + x);
        }
    }

    @ParameterizedTest
    @MethodSource("cases")
    void blocksOfAnyLengthHaveTheBitsOfSingleValues(Case c) {
        var d = c.typed().density();
        var x = new double[3000];
        for (int i = 0; i < x.length; i++) {
            x[i] = d.quantile((i + 0.5) / x.length);
        }
        var logs = new double[x.length];
        d.logPdf(x, logs, x.length);
        for (int i = 0; i < x.length; i++) {
            assertEquals(d.logPdf(x[i]), logs[i], 0.0);
        }
    }

    /// Several threads at once, as in a run.
    @Test
    void sameBitsOnManyThreads() {
        var d = cases().filter(c -> c.toString().equals("waves"))
                .findFirst()
                .orElseThrow()
                .typed()
                .density();
        var x = new double[1000];
        for (int i = 0; i < x.length; i++) {
            x[i] = d.quantile((i + 0.5) / x.length);
        }
        var expected = Arrays.stream(x).map(d::logPdf).toArray();
        var seen = Arrays.stream(x).parallel().map(d::logPdf).toArray();
        assertArrayEquals(expected, seen);
    }

    @Test
    void densitiesThatDifferInSpacesOnlyAreOne() {
        var constants = new LinkedHashMap<String, Double>();
        constants.put("k", 2.0);
        var one = Typed.of(text("exp(-k*s)", 0, Double.POSITIVE_INFINITY), "s", constants)
                .density();
        constants.put("unused", 3.0);
        var same = Typed.of(text("exp( -k * s )  # waits", 0, Double.POSITIVE_INFINITY), "s", constants)
                .density();
        constants.put("k", 2.5);
        var other = Typed.of(text("exp(-k*s)", 0, Double.POSITIVE_INFINITY), "s", constants)
                .density();
        assertEquals(one, same);
        assertEquals(one.toString(), same.toString());
        assertNotEquals(one, other);
        assertNotEquals(one.toString(), other.toString());
    }

    @Test
    void saysWhereNothingIsDrawn() {
        var typed = Typed.of(text("[s>2 & s<3]+2*[s>5 & s<6]", 0, 10), "s", new LinkedHashMap<>());
        assertEquals(
                List.of("no density between s = 3 and 5"),
                typed.notes().stream().map(Problem::primary).toList());
        assertEquals("formula", typed.notes().getFirst().place().path());
        assertEquals(2, typed.density().quantile(1e-18), 1e-15);
        assertEquals(6, typed.density().upperQuantile(1e-18), 1e-14);
    }

    /// The peak stands at a number that follows from others.
    @Test
    void findsASpikeAtAComputedPlace() {
        var typed = Typed.of(
                text(
                        "exp(-s^2/2)+1e5*exp(-((s-sqrt(2))/1e-6)^2/2)",
                        Double.NEGATIVE_INFINITY,
                        Double.POSITIVE_INFINITY),
                "s",
                new LinkedHashMap<>());
        assertEquals(1.1 * Math.sqrt(2 * Math.PI), typed.integral(), 1e-11);
    }

    /// Bends that no node of a piece sees. The integral is from mpmath 1.2.1, the quadrature of each hump at 30 digits.
    @Test
    void findsBendsNextToTheEndsOfPieces() {
        var typed = Typed.of(
                text("max(0,cos(s))*exp(-abs(s)/50)", Double.NEGATIVE_INFINITY, Double.POSITIVE_INFINITY),
                "s",
                new LinkedHashMap<>());
        assertEquals(31.8530120286487132293578930536, typed.integral(), 1e-12);
    }

    /// A plain function, without a formula.
    @Test
    void integratesAFunction() {
        var range = new Support(0, Double.POSITIVE_INFINITY);
        var d = Integrated.of("halved wall", x -> x > 700 ? 0 : StrictMath.exp(-x / 2), range);
        assertEquals(2, d.area(), 1e-12);
        assertEquals(2, d.mean(), 1e-12);
        assertEquals(StrictMath.exp(-50), d.survival(100), 1e-12 * StrictMath.exp(-50));
        assertEquals(2e-300, d.quantile(1e-300), 1e-312);
    }

    private static TypedText text(String formula, double from, double to) {
        return new TypedText(formula, from, to, List.of(), false);
    }

    private static void within(double expected, double least, double most, String what) {
        double slack = Math.min(1e-12, 1e-10 * expected);
        assertTrue(
                expected >= least - slack && expected <= most + slack,
                () -> what + ": " + expected + " is not between " + least + " and " + most);
    }

    private static double down(double x) {
        return Math.nextDown(Math.nextDown(x));
    }

    private static double up(double x) {
        return Math.nextUp(Math.nextUp(x));
    }

    /// Draws lie where an independent distribution function says; what the rounding of x moves is not counted.
    @ParameterizedTest
    @MethodSource("cases")
    void drawsHitTheProbability(Case c) {
        var inversion = Inversion.of(c.typed().density());
        assertTrue(inversion.uError() <= PROMISED, () -> "stated " + inversion.uError());
        var random = new SplittableRandom(SEED);
        var u = new double[DRAWS];
        var x = new double[DRAWS];
        for (int i = 0; i < DRAWS; i++) {
            double p = StrictMath.scalb(1 + random.nextDouble(), -2 - random.nextInt(52));
            u[i] = i % 2 == 0 ? random.nextDouble(0x1p-53, 1 - 0x1p-53) : random.nextBoolean() ? p : 1 - p;
        }
        inversion.fill(u, x, DRAWS);
        var cdf = cdf(c.toString());
        double worst = 0;
        double at = 0;
        for (int i = 0; i < DRAWS; i++) {
            double least = cdf.applyAsDouble(down(x[i]));
            double most = cdf.applyAsDouble(up(x[i]));
            double error = Math.max(Math.max(least - u[i], u[i] - most), 0);
            if (!(error <= worst)) {
                worst = error;
                at = u[i];
            }
        }
        double seen = worst;
        double where = at;
        assertTrue(seen <= PROMISED, () -> c + ", seed " + SEED + ": error " + seen + " at u = " + where);
    }

    private static DoubleUnaryOperator cdf(String name) {
        var normal = NormalDistribution.of(0, 1);
        return switch (name) {
            case "two humps" -> mix(1, NormalDistribution.of(2, 1), 0.25, NormalDistribution.of(-3, 0.5));
            case "gap" -> x -> (Math.clamp(x, 2, 3) - 2 + 2 * (Math.clamp(x, 5, 6) - 5)) / 3;
            case "jump" -> x -> (Math.clamp(x, 0, 1) + 3 * (Math.clamp(x, 1, 2) - 1)) / 4;
            case "kink" ->
                x -> {
                    double t = Math.clamp(x, -0.75, 1.25) + 0.75;
                    return t <= 1 ? t * t / 2 : 1 - (2 - t) * (2 - t) / 2;
                };
            case "heavy tail" -> CauchyDistribution.of(1000, 3)::cumulativeProbability;
            case "spike" -> NormalDistribution.of(0.3, 1e-6)::cumulativeProbability;
            case "spike on a hump" -> mix(1, normal, 0.1, NormalDistribution.of(0.3, 1e-6));
            case "far below underflow" -> NormalDistribution.of(4, 1)::cumulativeProbability;
            case "pole at an end" -> Math::sqrt;
            case "pole at a break" ->
                x -> {
                    double low = StrictMath.pow(1.3, 2 / 3.0);
                    double mass = Math.copySign(StrictMath.pow(Math.abs(x - 0.3), 2 / 3.0), x - 0.3);
                    return (low + mass) / (low + StrictMath.pow(0.7, 2 / 3.0));
                };
            case "wall" -> ExponentialDistribution.of(1)::cumulativeProbability;
            case "polynomial" -> BetaDistribution.of(3, 4)::cumulativeProbability;
            case "waves" -> waves();
            case "constants" -> LaplaceDistribution.of(-3, 0.4)::cumulativeProbability;
            case "cube" ->
                x -> {
                    double mass = GammaDistribution.of(1 / 3.0, 1).survivalProbability(Math.abs(x * x * x)) / 2;
                    return x < 0 ? mass : 1 - mass;
                };
            default -> throw new AssertionError(name);
        };
    }

    private static DoubleUnaryOperator mix(
            double weight, ContinuousDistribution one, double otherWeight, ContinuousDistribution other) {
        return x -> (weight * one.cumulativeProbability(x) + otherWeight * other.cumulativeProbability(x))
                / (weight + otherWeight);
    }

    /// The wave by Gauss-Legendre quadrature over panels of 1/32, the hump by the library.
    private static DoubleUnaryOperator waves() {
        var rule = new GaussIntegratorFactory().legendre(16, 0, 1);
        var masses = new double[32 * 18 + 1];
        for (int i = 1; i < masses.length; i++) {
            masses[i] = masses[i - 1] + wave(rule, -9 + (i - 1) / 32.0, 1 / 32.0);
        }
        return x -> {
            double inside = Math.clamp(x, -9, 8.99);
            int i = (int) ((inside + 9) * 32);
            double from = -9 + i / 32.0;
            return NormalDistribution.of(0, 1).cumulativeProbability(x) + masses[i] + wave(rule, from, inside - from);
        };
    }

    private static double wave(
            org.apache.commons.math3.analysis.integration.gauss.GaussIntegrator rule, double from, double width) {
        return width
                * rule.integrate(t -> {
                    double x = from + width * t;
                    return StrictMath.cos(20 * x) * StrictMath.exp(-x * x / 2) / Math.sqrt(2 * Math.PI);
                });
    }
}
