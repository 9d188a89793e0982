package dev.leadline.interval;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.leadline.stream.Address;
import dev.leadline.stream.Purpose;
import dev.leadline.stream.Stream;
import org.apache.commons.statistics.distribution.FDistribution;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

class DrawsNeededTest {
    private static final long SEED = 20261201;

    /// The first n at which the half-width is reached.
    @ParameterizedTest
    @ValueSource(doubles = {.3, .1, .01, 1e-4})
    void isTheFirstThatIsEnough(double tolerance) {
        var band = AnyTimeMean.tunedTo(1e4, .95);
        var needed = DrawsNeeded.of(band::unit, new Ratio(.8, 1, 1.3), tolerance);
        assertTrue(band.unit(needed.value()) <= tolerance * (1 + 1e-9));
        assertTrue(band.unit(needed.value() - 1) > tolerance);
        assertTrue(1.3 * band.unit(needed.high()) <= tolerance * (1 + 1e-9));
        assertTrue(.8 * band.unit(needed.low()) <= tolerance * (1 + 1e-9));
        assertTrue(needed.low() < needed.value() && needed.value() < needed.high());
    }

    /// (z/.01)² with z² = 3.841459.
    @Test
    void isTheUsualSizeForTheFixedWidth() {
        var needed = DrawsNeeded.of(new FixedWidth(.95)::unit, new Ratio(1, 1, 2), .01);
        assertEquals(new DrawsNeeded(38_415, 38_415, 153_659), needed);
        assertEquals(new DrawsNeeded(0, 0, 53_659), needed.after(100_000));
        assertEquals(new DrawsNeeded(50_000, 50_000, 153_659), needed.atLeast(50_000));
    }

    @Test
    void saysWhatCannotBeKnown() {
        var unknown = DrawsNeeded.of(new FixedWidth(.95)::unit, new Ratio(0, 1, Double.POSITIVE_INFINITY), .01);
        assertEquals(new DrawsNeeded(1, 38_415, Double.POSITIVE_INFINITY), unknown);
        var noHit = DrawsNeeded.of(new HitsRule(100, .95), 0, 1000, .95);
        assertTrue(noHit.low() > 10_000 && noHit.high() == Double.POSITIVE_INFINITY);
        assertEquals(new DrawsNeeded(900, 900, 900), DrawsNeeded.of(new HitsRule(100, .95), 100, 900, .95));
    }

    /// Where the r-th hit comes, foretold from the hits among the first n draws: it lies within the limits at
    /// least as often as their level says.
    @ParameterizedTest(name = "p = {0}, {1} draws first, {2} hits wanted")
    @CsvSource({".02, 500, 30", ".1, 300, 60", ".005, 2000, 17"})
    void foretellsTheLastHit(double p, int first, int hits) {
        var rule = new HitsRule(hits, .95);
        int runs = 2_000;
        int within = 0;
        for (int r = 0; r < runs; r++) {
            var stream = Stream.at(new Address(SEED, Purpose.RUN, "A", 0, "hits " + p, r));
            var u = new double[64];
            int n = 0;
            int found = 0;
            int early = 0;
            while (found < hits) {
                if (n % 64 == 0) {
                    stream.fill(u, 0, 64);
                }
                found += u[n % 64] < p ? 1 : 0;
                n++;
                early = n == first ? found : early;
            }
            if (n <= first) {
                within++;
                continue;
            }
            var needed = DrawsNeeded.of(rule, early, first, .95);
            within += needed.low() <= n && n <= needed.high() ? 1 : 0;
        }
        double error = Math.sqrt(.95 * .05 / runs);
        assertTrue((double) within / runs >= .95 - 4 * error, within + " of " + runs);
    }

    /// Whatever was seen, a run that begins anew needs all its hits: the ratio of two gamma variables is that of F.
    /// One hit more stands in the lower limit, for the draws after the last one.
    @ParameterizedTest(name = "{0} hits in 65,536 draws, {1} wanted")
    @CsvSource({"822, 385", "40, 385", "385, 385"})
    void hitsOfAnotherRunDoNotCount(int seen, int wanted) {
        var needed = DrawsNeeded.afresh(new HitsRule(wanted, .95), seen, 65_536, .95);
        double low = FDistribution.of(2.0 * wanted, 2.0 * (seen + 1)).inverseCumulativeProbability(.025);
        double high = FDistribution.of(2.0 * wanted, 2.0 * seen).inverseCumulativeProbability(.975);
        assertEquals(65_536.0 * wanted / (seen + 1) * low, needed.low(), 1e-6 * needed.low());
        assertEquals(65_536.0 * wanted / seen, needed.value(), 1e-9 * needed.value());
        assertEquals(65_536.0 * wanted / seen * high, needed.high(), 1e-6 * needed.high());
    }
}
