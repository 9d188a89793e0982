package dev.leadline.interval;

import static org.junit.jupiter.api.Assertions.assertEquals;

import dev.leadline.estimate.Accumulator;
import java.util.Optional;
import java.util.OptionalLong;
import org.junit.jupiter.api.Test;

class GuardTest {
    private static final OptionalLong NO_EVENT = OptionalLong.empty();

    private static Optional<String> lack(Guard guard, long drawn, long observed, double skewness) {
        return guard.lack(drawn, observed, false, skewness, NO_EVENT);
    }

    @Test
    void asksForDraws() {
        assertEquals(Optional.of("999 draws of at least 1,000"), lack(Guard.OF_DRAWS, 999, 999, 0));
        assertEquals(Optional.empty(), lack(Guard.OF_DRAWS, 1000, 1000, 0));
        assertEquals(Optional.of("900 draws of at least 1,000"), lack(Guard.OF_OBSERVATIONS, 900, 30, 0));
        assertEquals(Optional.of("29 observations of at least 30"), lack(Guard.OF_OBSERVATIONS, 2900, 29, 0));
        assertEquals(Optional.empty(), lack(Guard.OF_OBSERVATIONS, 3000, 30, 0));
    }

    /// 25 · 6.5² = 1056.25.
    @Test
    void asksForMoreWhereValuesAreSkewed() {
        assertEquals(
                Optional.of("1,056 observations of at least 1,057, 25 times the square of their skewness -6.5"),
                lack(Guard.OF_DRAWS, 1056, 1056, -6.5));
        assertEquals(Optional.empty(), lack(Guard.OF_DRAWS, 1057, 1057, -6.5));
        assertEquals(
                Optional.of("the skewness of the values cannot be said"), lack(Guard.OF_DRAWS, 5000, 5000, Double.NaN));
    }

    @Test
    void asksForHitsOrMisses() {
        for (long hits : new long[] {24, 25, 2475, 2476}) {
            String lacking = hits == 24 ? "24 hits of at least 25" : hits == 2476 ? "24 misses of at least 25" : null;
            assertEquals(
                    Optional.ofNullable(lacking), Guard.OF_DRAWS.lack(2500, 2500, false, 10, OptionalLong.of(hits)));
        }
        assertEquals(
                Optional.of("0 hits of at least 25"),
                Guard.OF_DRAWS.lack(2500, 2500, true, Double.NaN, OptionalLong.of(0)));
    }

    /// Of 1,000 values of 2 and two others: skewness far beyond 6.
    @Test
    void looksAtSums() {
        var values = new double[1][1000];
        java.util.Arrays.fill(values[0], 2);
        var sums = new Accumulator(1);
        sums.add(values, 0, 1000);
        assertEquals(Optional.of("every value seen so far is equal"), Guard.OF_DRAWS.lack(1000, sums, 0));
        values[0][7] = 3;
        values[0][8] = 9;
        var skewed = new Accumulator(1);
        skewed.add(values, 0, 1000);
        var lack = Guard.OF_DRAWS.lack(1000, skewed, 0).orElseThrow();
        assertEquals(true, lack.startsWith("1,000 observations of at least 2"), lack);
    }
}
