package dev.leadline.interval;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.leadline.ReferenceValues;
import java.util.Arrays;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/// [Hoeffding] and [EmpiricalBernstein].
class BoundedTest {
    private static final String RECORD = "int-hoeffding-bernstein";

    private static void within(double relative, double expected, double actual) {
        assertEquals(expected, actual, relative * Math.abs(expected));
    }

    /// Record int-hoeffding-bernstein.
    @Test
    void halfWidthsAgreeWithTheTable() {
        double tolerance = ReferenceValues.relativeTolerance(RECORD);
        int checked = 0;
        for (var entry : ReferenceValues.record(RECORD).required("expected")) {
            var name = entry.required("name").asString();
            double expected = entry.required("value").asDouble();
            long n = name.contains("_n1") ? Long.parseLong(name.replaceAll(".*_n(\\d+).*", "$1")) : 0;
            if (name.startsWith("hoeffding_two_sided_95")) {
                within(tolerance, expected, Hoeffding.halfWidth(n, .95));
            } else if (name.startsWith("maurer")) {
                double level = name.contains("one_sided") ? Sides.UPPER.twoSided(.95) : .95;
                double variance = Double.parseDouble(name.substring(name.indexOf("var") + 3));
                within(tolerance, expected, EmpiricalBernstein.halfWidth(n, variance, level));
            } else {
                assertTrue(Hoeffding.halfWidth((long) expected, .95) <= .01);
                assertTrue(Hoeffding.halfWidth((long) expected - 1, .95) > .01);
            }
            checked++;
        }
        assertEquals(13, checked);
    }

    /// Twice 0 and twice 2: mean 1, variance 4/3; by hand.
    @Test
    void boundsScaleTheInterval() {
        var sums = Observed.sums(new double[] {0, 2, 0, 2});
        double half = 100 * Math.sqrt(Math.log(40) / 8);
        var hoeffding = Hoeffding.of(sums, 0, -50, 50, .95);
        assertEquals(1 - half, Hoeffding.of(sums, 0, -80, 20, .95).low(), 1e-12);
        assertEquals(-50, hoeffding.low());
        assertEquals(50, hoeffding.high());
        assertEquals(
                "the lower limit is -50, which the value sought is not below; the upper limit is 50, which it is not"
                        + " above",
                hoeffding.note().orElseThrow());
        var sixteen = new double[160];
        for (int i = 0; i < 160; i++) {
            sixteen[i] = i % 2 == 0 ? 0 : 2;
        }
        double log = Math.log(80);
        double bernstein = Math.sqrt(2 * (160 / 159.0) * log / 160) + 7 * 10 * log / (3 * 159);
        var interval = EmpiricalBernstein.of(Observed.sums(sixteen), 0, -5, 5, .95);
        assertEquals(1 - bernstein, interval.low(), 1e-12);
        assertEquals(1 + bernstein, interval.high(), 1e-12);
    }

    /// A limit alone has all that is left out: `ln(1/.05)` and `ln(2/.05)`. In place of the other stands
    /// the bound.
    @Test
    void givesOneSideAlone() {
        var values = new double[400];
        Arrays.setAll(values, i -> i % 2);
        var sums = Observed.sums(values);
        var upper = Hoeffding.of(sums, 0, 0, 1, .95, Sides.UPPER);
        assertEquals(.5 + Math.sqrt(Math.log(20) / 800), upper.high(), 1e-14);
        assertEquals(0, upper.low());
        assertEquals(.95, upper.level());
        assertEquals(
                "the lower limit is 0, which the value sought is not below",
                upper.note().orElseThrow());
        var lower = EmpiricalBernstein.of(sums, 0, 0, 1, .95, Sides.LOWER);
        double log = Math.log(40);
        assertEquals(.5 - Math.sqrt(2 * (100 / 399.0) * log / 400) - 7 * log / (3 * 399), lower.low(), 1e-14);
        assertEquals(1, lower.high());
    }

    @Test
    void equalObservationsHaveAnInterval() {
        var equal = new double[1000];
        Arrays.fill(equal, .25);
        var interval = EmpiricalBernstein.of(Observed.sums(equal), 0, 0, 1, .95);
        double half = 7 * Math.log(80) / (3 * 999);
        assertEquals(.25 - half, interval.low(), 1e-14);
        assertEquals(.25 + half, interval.high(), 1e-14);
    }

    @Test
    void refusesBoundsThatDoNotHold() {
        var sums = Observed.sums(new double[] {.2, 1.5, .3});
        for (var interval :
                new Interval[] {Hoeffding.of(sums, 0, 0, 1, .95), EmpiricalBernstein.of(sums, 0, 0, 1, .95)}) {
            assertTrue(interval.isNone());
            assertEquals(
                    "the value 1.5 was seen, outside the bounds 0 and 1: state bounds that hold",
                    interval.note().orElseThrow());
        }
        assertTrue(Hoeffding.of(sums, 0, .2, 1.5, .95).low() >= .2);
        assertTrue(
                EmpiricalBernstein.of(sums, 0, .25, 2, .95).note().orElseThrow().startsWith("the value 0.2 "));
    }

    @Test
    void needsObservations() {
        var one = Observed.sums(new double[] {.5});
        assertEquals(
                "an interval needs at least 2 observations; so far there is 1",
                EmpiricalBernstein.of(one, 0, 0, 1, .95).note().orElseThrow());
        assertTrue(Hoeffding.of(one, 0, -9, 9, .95).note().isPresent());
        assertEquals(
                "an interval needs at least 1 observation; so far there are 0",
                Hoeffding.of(Observed.sums(new double[0]), 0, 0, 1, .95).note().orElseThrow());
        assertThrows(IllegalArgumentException.class, () -> Hoeffding.of(one, 0, 1, 1, .95));
        assertThrows(IllegalArgumentException.class, () -> Hoeffding.of(one, 0, 0, Double.NaN, .95));
    }

    /// Whatever the density within the bounds, the level holds; most is lost where the density is an
    /// event's.
    @ParameterizedTest
    @CsvSource({"1, 30", ".1, 30", ".02, 200"})
    void holdsItsLevel(double power, int n) {
        var random = Observed.random(20261201);
        double mean = 1 / (1 + 1 / power);
        int missedByHoeffding = 0;
        int missedByBernstein = 0;
        for (int r = 0; r < 4_000; r++) {
            var values = new double[n];
            for (int i = 0; i < n; i++) {
                values[i] = Math.pow(random.nextDouble(), 1 / power);
            }
            var sums = Observed.sums(values);
            var hoeffding = Hoeffding.of(sums, 0, 0, 1, .95);
            var bernstein = EmpiricalBernstein.of(sums, 0, 0, 1, .95);
            missedByHoeffding += hoeffding.low() <= mean && mean <= hoeffding.high() ? 0 : 1;
            missedByBernstein += bernstein.low() <= mean && mean <= bernstein.high() ? 0 : 1;
        }
        double gate = 4_000 * .05 + 4 * Math.sqrt(4_000 * .05 * .95);
        assertTrue(missedByHoeffding <= gate && missedByBernstein <= gate);
    }
}
