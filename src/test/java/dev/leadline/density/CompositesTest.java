package dev.leadline.density;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.leadline.density.Mixture.Part;
import dev.leadline.problem.Refusal;
import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.util.List;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.MethodSource;

/// Truncated, mixed, shifted and mirrored densities against tables computed elsewhere (mpmath, 60 digits,
/// `density_tables_composites.py`).
class CompositesTest {
    private static final double INFINITY = Double.POSITIVE_INFINITY;
    private static final Normal NORMAL = new Normal(0, 1);

    static Stream<String> names() {
        return Composites.named().keySet().stream();
    }

    private static List<String[]> rows(String file) {
        try (var in = CompositesTest.class.getResourceAsStream("/density/" + file + ".csv")) {
            return new String(in.readAllBytes(), StandardCharsets.UTF_8)
                    .lines()
                    .skip(2)
                    .map(line -> line.split(",", -1))
                    .toList();
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
    }

    /// Relative 1e-12, and three roundings of x, which count as often as the tail is steep.
    @ParameterizedTest
    @MethodSource("names")
    void agreesAtPoints(String name) {
        var density = Composites.named().get(name);
        int checked = 0;
        for (var row : rows(name)) {
            if (!row[0].equals("at") || Math.min(Double.parseDouble(row[5]), Double.parseDouble(row[6])) < 1e-299) {
                continue;
            }
            checked++;
            double x = Double.parseDouble(row[1]);
            double pdf = Double.parseDouble(row[3]);
            double rounding = 3 * 0x1p-53 * Math.abs(x) * pdf;
            double cdf = Double.parseDouble(row[5]);
            double survival = Double.parseDouble(row[6]);
            assertEquals(cdf, density.cdf(x), 1e-12 * cdf + rounding, () -> name + ", cdf at " + x);
            assertEquals(survival, density.survival(x), 1e-12 * survival + rounding, () -> name + ", survival at " + x);
            double steep = 1e-12 + rounding / Math.min(cdf, survival);
            double log = Double.parseDouble(row[4]);
            assertEquals(log, density.logPdf(x), steep * Math.max(1, Math.abs(log)), () -> name + ", log pdf at " + x);
            if (pdf > 1e-290) {
                assertEquals(pdf, density.pdf(x), steep * pdf, () -> name + ", pdf at " + x);
            }
        }
        assertTrue(checked > 0);
    }

    @ParameterizedTest
    @MethodSource("names")
    void agreesInBothDirections(String name) {
        var density = Composites.named().get(name);
        int checked = 0;
        for (var row : rows(name)) {
            if (!row[0].equals("inverse")) {
                continue;
            }
            double p = Double.parseDouble(row[5]);
            if (density instanceof Truncated t && p * t.keptMass() < 1e-300) {
                continue;
            }
            checked += close(density, row[1], density.quantile(p), p, name + ", quantile of " + p);
            checked += close(density, row[2], density.upperQuantile(p), p, name + ", upper quantile of " + p);
        }
        assertTrue(checked > 0);
    }

    private static int close(Density density, String text, double got, double mass, String what) {
        if (text.isEmpty()) {
            return 0;
        }
        double expected = Double.parseDouble(text);
        double pdf = density.pdf(expected);
        double slack = 1e-12 * Math.abs(expected) + (pdf > 0 ? 1e-12 * mass / pdf : 0);
        assertEquals(expected, got, slack, what);
        return 1;
    }

    /// Relative 1e-12; a skewness of nearly 0 absolutely.
    @ParameterizedTest
    @MethodSource("names")
    void agreesWithMoments(String name) {
        var density = Composites.named().get(name);
        var row = rows("moments/" + name).getFirst();
        double mean = Double.parseDouble(row[0]);
        double variance = Double.parseDouble(row[1]);
        double rounding = 4 * 0x1p-53 * Math.abs(mean) / Math.sqrt(variance);
        assertEquals(mean, density.mean(), 1e-12 * (Math.abs(mean) + Math.sqrt(variance)), "mean");
        assertEquals(variance, density.variance(), (1e-12 + rounding) * variance, "variance");
        near(Double.parseDouble(row[2]), density.skewness(), rounding, "skewness");
        near(Double.parseDouble(row[3]), density.excessKurtosis(), rounding, "excess kurtosis");
    }

    private static void near(double expected, double got, double rounding, String what) {
        assertEquals(expected, got, (1e-11 + 10 * rounding) * Math.max(1, Math.abs(expected)), what);
    }

    /// Phi(-8) and Phi(-30): mpmath, erfc(8 / sqrt 2) / 2 and erfc(30 / sqrt 2) / 2.
    @Test
    void saysWhatIsKept() {
        assertEquals(6.220960574271784e-16, Truncated.of(NORMAL, 8, INFINITY).keptMass(), 1e-27);
        assertEquals(
                4.906713927148187e-198, Truncated.of(NORMAL, -INFINITY, -30).keptMass(), 1e-209);
        assertEquals(1, Truncated.of(new Uniform(0, 1), -1, 2).keptMass());
    }

    @Test
    void refusesAnIntervalThatKeepsNothing() {
        refused("the lower end is NaN but must be a number or -∞", NORMAL, Double.NaN, 1);
        refused("the upper end is NaN but must be a number or ∞", NORMAL, 0, Double.NaN);
        refused("the upper end is 1 but must be greater than the lower one, 2", NORMAL, 2, 1);
        refused("the upper end is 2 but must be greater than the lower one, 2", NORMAL, 2, 2);
        refused("the interval from 2 to 3 misses all values of the density", new Uniform(0, 1), 2, 3);
        refused("the lower end is ∞ but must be a number or -∞", NORMAL, INFINITY, INFINITY);
        refused("the upper end is -∞ but must be a number or ∞", NORMAL, 0, -INFINITY);
        refused("the interval from 1 to 2 misses all values of the density", new Uniform(0, 1), 1, 2);
        refused(
                "the interval from 2 to 3 misses all values of the density",
                Truncated.of(new Uniform(0, 4), 0, 1),
                2,
                3);
        refused("the interval from 7 to ∞ misses all values of the density", new DiscreteUniform(1, 6), 7, INFINITY);
        refused("the interval from 50 to ∞ keeps nothing", NORMAL, 50, INFINITY);
        refused("the interval from 36 to 40 keeps nothing", NORMAL, 36, 40);
        refused("the interval from 2.2 to 2.8 keeps nothing", new Poisson(4), 2.2, 2.8);
    }

    /// 4.182624e-284 is `erfc(36 / sqrt 2) / 2`, mpmath.
    @Test
    void saysHowLittleIsKept() {
        assertEquals(
                "The chance of a value in it is 4.18e-284; it must be at least 1e-280, or draws lose digits.",
                why(NORMAL, 36, 40));
        assertEquals("The chance of a value in it is 0.", why(new Poisson(4), 2.2, 2.8));
    }

    private static String why(Density density, double low, double high) {
        return assertThrows(Refusal.class, () -> Truncated.of(density, low, high))
                .problems()
                .getFirst()
                .detail()
                .orElseThrow();
    }

    private static void refused(String words, Density density, double low, double high) {
        var refusal = assertThrows(Refusal.class, () -> Truncated.of(density, low, high));
        assertEquals(words, refusal.problems().getFirst().primary());
        assertTrue(refusal.problems().getFirst().detail().isPresent());
    }

    @Test
    void refusesWeightsAndPartsThatDoNotGoTogether() {
        refused("the weights add up to 0.75 but must add up to 1", new Part(0.5, NORMAL), new Part(0.25, NORMAL));
        refused("the weight of part 2 is -1 but must be greater than 0", new Part(2, NORMAL), new Part(-1, NORMAL));
        refused(
                "the weight of part 1 is ∞ but must be a finite number",
                new Part(INFINITY, NORMAL),
                new Part(0.5, NORMAL));
        refused(
                "the weight of part 1 is 0 but must be greater than 0;"
                        + " the weight of part 2 is NaN but must be greater than 0",
                new Part(0, NORMAL),
                new Part(Double.NaN, NORMAL));
        refused(
                "a mixture has both discrete and continuous parts",
                new Part(0.5, NORMAL),
                new Part(0.5, new Poisson(2)));
        refused("a mixture has no parts");
    }

    @ParameterizedTest
    @CsvSource(
            delimiter = '|',
            value = {
                "0   | 0        | scale is 0 but must be a finite number other than 0",
                "NaN | 1        | shift is NaN but must be a finite number",
                "1   | Infinity | scale is ∞ but must be a finite number other than 0",
                "-Infinity | NaN | shift is -∞ but must be a finite number; scale is NaN but must be a finite number other than 0",
            })
    void refusesToShiftAndScaleBy(double shift, double scale, String words) {
        assertEquals(
                words,
                assertThrows(Refusal.class, () -> new Shifted(NORMAL, shift, scale))
                        .getMessage());
    }

    private static void refused(String words, Part... parts) {
        var refusal = assertThrows(Refusal.class, () -> new Mixture(List.of(parts)));
        assertEquals(words, refusal.getMessage());
    }

    @Test
    void shareTheTablesOfTheirShapes() {
        assertEquals(
                Curves.of(NORMAL.standard()),
                Curves.of(new Shifted(NORMAL, 5, -2).standardised().shape()));
        assertEquals(
                Truncated.of(NORMAL, -1, 2).standardised().shape(),
                Truncated.of(new Normal(10, 4), 6, 18).standardised().shape());
        assertEquals(
                Composites.mixture(0.25, NORMAL, 0.75, new Normal(1, 2))
                        .standardised()
                        .shape(),
                Composites.mixture(0.25, new Normal(2, 2), 0.75, new Normal(4, 4))
                        .standardised()
                        .shape());
    }

    @Test
    void noDrawFallsBeyondTheEnds() {
        var density = Truncated.of(new Normal(0.1, 0.3), 0.7, 0.9);
        var u = new double[] {0x1p-53, 1e-10, 0.5, 1 - 1e-10, 1 - 0x1p-53};
        Inversion.of(density).fill(u, u, u.length);
        for (double x : u) {
            assertTrue(x >= 0.7 && x <= 0.9, () -> "draw " + x);
        }
    }

    @Test
    void tailsAndMomentsThatDoNotExist() {
        var cauchy = new Student(1, 0, 1);
        assertEquals(
                new TailOrders(INFINITY, 1), Truncated.of(cauchy, 0, INFINITY).tailOrders());
        assertEquals(INFINITY, Truncated.of(cauchy, 0, INFINITY).mean());
        assertTrue(Double.isFinite(Truncated.of(cauchy, 0, 1000).excessKurtosis()));
        assertEquals(
                new TailOrders(1, 1),
                Composites.mixture(0.5, NORMAL, 0.5, cauchy).tailOrders());
        assertTrue(Double.isNaN(Composites.mixture(0.5, NORMAL, 0.5, cauchy).mean()));
    }

    /// A third moment that is infinite in one tail has its sign, however the density is known.
    @Test
    void infiniteSkewnessHasTheSignOfItsTail() {
        var student = new Student(2.5, 0, 1);
        assertEquals(INFINITY, Truncated.of(student, 0, INFINITY).skewness());
        assertEquals(-INFINITY, Truncated.of(student, -INFINITY, 0).skewness());
        var power = Integrated.of("x^-3.5", x -> 1 / (x * x * x * Math.sqrt(x)), new Support(1, INFINITY));
        assertEquals(INFINITY, power.skewness());
    }

    /// pmf and cdf at 3 of a mean of 5 from scipy.stats.poisson.
    @Test
    void aScaledDiscreteDensityHasItsValuesWhereRoundingPutsThem() {
        for (double step : new double[] {0.1, 0.7, 1e-7, 1 / 3.0}) {
            for (double shift : new double[] {0, 0.7, -1e6}) {
                var up = new Shifted(new Poisson(5), shift, step);
                var down = new Shifted(new Poisson(5), shift, -step);
                double x = Math.fma(step, 3, shift);
                assertEquals(0.1403738958142805, up.pdf(x), 1e-14);
                assertEquals(0.2650259152973616, up.cdf(x), 1e-14);
                assertEquals(1 - 0.2650259152973616, up.survival(x), 1e-14);
                assertEquals(0.1403738958142805, down.pdf(Math.fma(-step, 3, shift)), 1e-14);
                assertEquals(0.2650259152973616, down.survival(Math.fma(-step, 4, shift)), 1e-14);
                assertEquals(1 - 0.2650259152973616, down.cdf(Math.fma(-step, 4, shift)), 1e-14);
            }
        }
    }

    /// From the values number `i` to number `j`, ends at them and between them; sums of e^-5 5^k/k!.
    @Test
    void truncatesAScaledDiscreteDensityAtAndBetweenItsValues() {
        for (double step : new double[] {0.1, -0.1, 0.7, -1 / 3.0}) {
            for (double shift : new double[] {0, 0.7, -1e6}) {
                var whole = new Shifted(new Poisson(5), shift, step);
                double kept = 0;
                double next = StrictMath.exp(-5);
                for (int k = 0; k <= 7; k++) {
                    kept += k >= 3 ? next : 0;
                    next *= 5.0 / (k + 1);
                }
                for (double beyond : new double[] {0, 0.25}) {
                    double a = Math.fma(step, 3 - beyond, shift);
                    double b = Math.fma(step, 7 + beyond, shift);
                    var part = Truncated.of(whole, Math.min(a, b), Math.max(a, b));
                    assertEquals(kept, part.keptMass(), 1e-13, () -> "%s + %s X".formatted(shift, step));
                    assertEquals(Math.fma(step, step > 0 ? 3 : 7, shift), part.quantile(1e-9));
                    assertEquals(Math.fma(step, step > 0 ? 7 : 3, shift), part.upperQuantile(1e-9));
                }
            }
        }
    }

    @Test
    void endsBetweenTheValuesOfADiscreteDensityAreNoValues() {
        var kept = Truncated.of(new Poisson(5), 2.5, 6.5);
        assertEquals(new Support(3, 6), kept.support());
        assertEquals(3, kept.quantile(1e-30));
        assertEquals(6, kept.upperQuantile(1e-30));
        assertTrue(Inversion.of(kept).uError() < 1e-12);
    }

    /// A Pareto tail of order .5 has no finite mean; one of order 2.5 has a variance and no third moment.
    @Test
    void mixturesSayWhichMomentsAreInfinite() {
        var heavy = new Mixture(List.of(new Part(0.9, NORMAL), new Part(0.1, new Shifted(new Pareto(1, 0.5), 0, -1))));
        assertEquals(-INFINITY, heavy.mean());
        assertEquals(INFINITY, heavy.variance());
        var skew = new Mixture(List.of(new Part(0.9, NORMAL), new Part(0.1, new Pareto(1, 2.5))));
        assertEquals(INFINITY, skew.skewness());
    }

    /// The search for a quantile passes 0, where a gamma density begins: below 2.4, `P(X <= x)` of the two is
    /// `.52 (x + 4.3) / 6.7` but for the gamma's share.
    @ParameterizedTest
    @CsvSource({"1", "7.5"})
    void quantilesNextToAnEndOfAPart(double shape) {
        var gamma = new Gamma(shape, 2.4);
        var mixed = Composites.mixture(0.52, new Uniform(-4.3, 2.4), 0.48, gamma);
        for (double p : new double[] {0.1, 0.3, 0.334, 0.4, 0.5, 0.9}) {
            double x = mixed.quantile(p);
            double mass = 0.52 * Math.clamp((x + 4.3) / 6.7, 0, 1) + 0.48 * gamma.cdf(x);
            assertEquals(p, mass, 1e-12, () -> "at " + x);
        }
    }

    /// A mass that is no number has no side, and would end the search anywhere.
    @Test
    void aMassThatIsNotANumberIsAnError() {
        var root = Root.between(0, 8).from(4);
        var e = assertThrows(
                ArithmeticException.class, () -> root.rising(x -> x == 4 ? Double.NaN : x / 8, _ -> 1 / 8.0, 0.25));
        assertEquals("The mass at 4.0 is not a number.", e.getMessage());
        assertThrows(ArithmeticException.class, () -> root.falling(_ -> Double.NaN, _ -> 1, 0.25));
    }

    /// The logarithm of a falling mass, to the step that leaves the rest to one of Newton's.
    @Test
    void aRootOfAFallingMass() {
        var root = Root.between(0.5, 700);
        assertEquals(
                StrictMath.log(1e300), root.falling(x -> StrictMath.exp(-x), x -> -StrictMath.exp(-x), 1e-300), 1e-12);
        assertEquals(2, root.roughly().falling(x -> 1 / (x * x * x), x -> -3 / (x * x * x * x), 0.125), 1e-12);
    }

    /// The root of `x + 1`, whose slope is said to be infinite wherever it is asked.
    @Test
    void aSlopeMayBeInfinite() {
        assertEquals(2, Root.between(-10, 1e300).rising(x -> x + 1, _ -> INFINITY, 3), 1e-15);
    }
}
