package dev.leadline.density;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.lang.management.ManagementFactory;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.stream.IntStream;
import java.util.stream.Stream;
import org.apache.commons.statistics.distribution.BinomialDistribution;
import org.apache.commons.statistics.distribution.PoissonDistribution;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

class PortraitTest {
    private static final double MARGIN = .04;

    private static Support shown(Density density) {
        return Portrait.of(density).shown().orElseThrow();
    }

    private static double value(Density density, double above) {
        return Portrait.of(density).quantiles().stream()
                .filter(q -> q.above() == above)
                .findFirst()
                .orElseThrow()
                .value();
    }

    /// Handbook: the 99.9 % point of the standard normal is 3.0902.
    @Test
    void showsFromTheThousandthToTheLastThousandth() {
        double margin = MARGIN * 2 * 3.0902;
        assertEquals(-3.0902 - margin, shown(new Normal(0, 1)).low(), 1e-3);
        assertEquals(3.0902 + margin, shown(new Normal(0, 1)).high(), 1e-3);
    }

    @Test
    void showsTheEndOfASupportThatIsNear() {
        assertEquals(2 - MARGIN * 3, shown(new Uniform(2, 5)).low(), 1e-12);
        var span = shown(new Exponential(1));
        assertEquals(-MARGIN * (span.high() - span.low()) / 1.08, span.low(), 1e-12);
    }

    /// The quartiles of the Student density with one degree of freedom are -1 and 1.
    @Test
    void longTailsDoNotShrinkTheMiddleToANeedle() {
        var span = shown(new Student(1, 0, 1));
        assertEquals(24 * 1.08, span.high() - span.low(), 1e-6);
    }

    /// Fisher and Yates, Statistical Tables, table III: Student's t for 3 degrees of freedom at 5 % and 1 %, one-sided.
    /// Handbook: the normal value exceeded once in a million is 4.753424.
    @Test
    void quantilesAreThoseOfPrintedTables() {
        assertEquals(2.353, value(new Student(3, 0, 1), .05), 5e-4);
        assertEquals(4.541, value(new Student(3, 0, 1), .01), 5e-4);
        assertEquals(4.753424, value(new Normal(0, 1), 1e-6), 5e-7);
        assertEquals(10, value(new Normal(10, 3), .5), 1e-12);
    }

    /// An exponential density has skewness 2 and excess kurtosis 6, whatever its mean.
    @Test
    void momentsOfTheExponentialDensity() {
        var portrait = Portrait.of(new Exponential(3));
        assertEquals(3, portrait.mean(), 1e-12);
        assertEquals(3, portrait.sd(), 1e-12);
        assertEquals(2, portrait.skewness(), 1e-12);
        assertEquals(6, portrait.excessKurtosis(), 1e-12);
        assertEquals(
                List.of("lower end at 0", "upper tail falls faster than any power: every moment exists"),
                portrait.tails());
        assertEquals(List.of(), portrait.warnings());
    }

    /// Student's density has moments below the order of its degrees of freedom.
    @Test
    void warnsOfMomentsThatDoNotExist() {
        assertEquals(
                List.of("both tails fall like a power: moments exist below order 1.33"),
                Portrait.of(new Student(1.33, 0, 1)).tails());
        assertEquals(
                List.of("it has no mean: an average of its draws never settles"),
                Portrait.of(new Student(1, 0, 1)).warnings());
        assertEquals(
                List.of("it has no variance: the error of a mean shrinks slower than 1/√n"),
                Portrait.of(new Student(1.33, 0, 1)).warnings());
        assertEquals(
                List.of("its fourth moment is infinite: an estimate of its spread settles slowly"),
                Portrait.of(new Student(3, 0, 1)).warnings());
        assertEquals(List.of(), Portrait.of(new Student(5, 0, 1)).warnings());
    }

    /// The Weibull density of shape k is `k x^(k-1) exp(-x^k)`, which has no bound at 0 for k below 1; the beta density
    /// of a half and a half has none at both ends.
    @Test
    void warnsOfPeaksWithoutBound() {
        assertEquals(
                List.of("it is unbounded at 7: the curve has no highest point there"),
                Portrait.of(new Weibull(.5, 1, 7)).warnings());
        assertEquals(2, Portrait.of(Beta.of(.5, .5)).warnings().size());
        assertEquals(List.of(), Portrait.of(new Weibull(1.5, 1, 7)).warnings());
    }

    /// Every stretch of an exponential density of mean 1 holds `exp(-from) - exp(-to)`.
    @Test
    void curveHoldsItsChances() {
        var portrait = Portrait.of(new Exponential(1));
        for (var bar : portrait.curve(new Support(0, 20), 50)) {
            double chance = StrictMath.exp(-bar.from()) * -StrictMath.expm1(bar.from() - bar.to());
            assertEquals(chance, bar.chance(), 1e-11 * chance);
        }
        var points = portrait.points(new Support(0, 2), 3);
        assertEquals(1, points.get(1).x());
        assertEquals(StrictMath.exp(-1), points.get(1).pdf(), 1e-14);
        assertEquals(StrictMath.exp(-2), points.get(2).above(), 1e-14);
    }

    @Test
    void aDiscreteDensityHasABarForEveryValue() {
        var of = BinomialDistribution.of(10, .3);
        var bars = Portrait.of(Borrowed.of(of)).bars();
        assertEquals(0, bars.getFirst().from()); // P(0) = .028
        assertEquals(8, bars.getLast().from()); // P(X > 8) < .001 <= P(X > 7) = .0016
        for (int i = 0; i < bars.size(); i++) {
            assertEquals(i, bars.get(i).from());
            assertEquals(of.probability(i), bars.get(i).chance(), 1e-15);
        }
    }

    /// Of the 620 values drawn, stretches of six or so are bars; each holds the chance of its values.
    @Test
    void manyValuesAreDrawnInStretches() {
        var of = PoissonDistribution.of(1e4);
        var bars = Portrait.of(Borrowed.of(of)).bars();
        assertTrue(bars.size() <= Portrait.MOST_BARS && bars.size() > Portrait.MOST_BARS / 2, bars.size() + " bars");
        for (var bar : bars) {
            double chance = of.probability((int) Math.floor(bar.from()), (int) Math.floor(bar.to()));
            assertEquals(chance, bar.chance(), 1e-12);
        }
    }

    @Test
    void valuesThatAreSureOrNearlySoAreDrawn() {
        assertEquals(
                1,
                Portrait.of(Borrowed.of(BinomialDistribution.of(1, 1))).bars().size());
        assertEquals(
                2,
                Portrait.of(Borrowed.of(BinomialDistribution.of(1, 1e-6)))
                        .bars()
                        .size());
        assertEquals(
                2,
                Portrait.of(Borrowed.of(BinomialDistribution.of(1, .5))).bars().size());
    }

    /// Few data are drawn one by one, each as high as its share of them.
    @Test
    void dataAreBarsOrStretches() {
        var few = Portrait.of(Empirical.of(3, 3, 3, 7.5, 7.6, 11, 3.1, 3.2)).bars();
        assertEquals(
                List.of(3.0, 3.1, 3.2, 7.5, 7.6, 11.0),
                few.stream().map(Portrait.Bar::from).toList());
        assertEquals(3 / 8., few.getFirst().chance(), 1e-15);
        assertEquals(1 / 8., few.getLast().chance(), 1e-15);
        double[] many =
                IntStream.rangeClosed(1, 500).mapToDouble(i -> Math.sqrt(i)).toArray();
        var bars = Portrait.of(Empirical.of(many)).bars();
        assertEquals(40, bars.size());
        assertEquals(1, bars.stream().mapToDouble(Portrait.Bar::chance).sum(), 1e-12);
    }

    /// A mass of 50.000623 g known to .000025 g: its quantiles differ from the sixth digit on. The normal value
    /// that one in twenty exceeds is 1.644854.
    @Test
    void digitsShowWhatDiffers() {
        var portrait = Portrait.of(new Normal(50.000623, 25e-6));
        var quantiles = PortraitText.quantiles(portrait);
        assertEquals("50.000623", quantiles.get(5).value());
        assertEquals(
                50.000623 + 1.644854 * 25e-6,
                Double.parseDouble(quantiles.get(7).value()),
                1e-8);
        assertEquals("50.000623", PortraitText.moments(portrait).getFirst().value());
        assertTrue(PortraitText.reading(portrait, 50.00065, " g").startsWith("50.00065 g: 86 % below, 14 % above"));
        assertEquals(
                "26.0008",
                PortraitText.moments(Portrait.of(new Gumbel(24.5, 2.6)))
                        .getFirst()
                        .value());
    }

    /// By symmetry mean, skewness and median are 0; quadrature leaves some 1e-17 of it.
    @Test
    void roundingIsNotShown() {
        var formula =
                new TypedText("exp(-abs(s)^3)", Double.NEGATIVE_INFINITY, Double.POSITIVE_INFINITY, List.of(), false);
        var portrait = Portrait.of(Typed.of(formula, "s", new LinkedHashMap<>()).density());
        assertEquals("0", PortraitText.moments(portrait).getFirst().value());
        assertEquals("0", PortraitText.moments(portrait).get(3).value());
        assertEquals("0", PortraitText.quantiles(portrait).get(5).value());
        // the smallest value of a positive quantity is no rounding
        assertEquals(
                "1e-60",
                PortraitText.quantiles(Portrait.of(new Weibull(.1, 1, 0)))
                        .getFirst()
                        .value()
                        .replaceAll("^[\\d.]+e", "1e"));
    }

    static Stream<Density> examples() {
        return Examples.all();
    }

    @ParameterizedTest(name = "{0}")
    @MethodSource("examples")
    void isQuickAndWholeForEveryExample(Density density) {
        var processor = ManagementFactory.getThreadMXBean();
        long best = Long.MAX_VALUE;
        for (int trial = 0; trial < 5; trial++) {
            long start = processor.getCurrentThreadCpuTime();
            var portrait = Portrait.of(density);
            portrait.shown().ifPresent(over -> portrait.curve(over, 600));
            best = Math.min(best, processor.getCurrentThreadCpuTime() - start);
            assertEquals(11, portrait.quantiles().size());
            assertTrue(portrait.shown().isPresent());
        }
        assertTrue(best < 20e6, "%s takes %.1f ms".formatted(density, best / 1e6));
    }
}
