package dev.leadline.interval;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.leadline.ReferenceValues;
import java.util.Arrays;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

class DkwTest {
    /// Record int-hoeffding-bernstein: the number is the same, `sqrt(ln(2/α)/(2n))`.
    @ParameterizedTest
    @ValueSource(longs = {10, 100, 1000, 100000})
    void halfWidthAgreesWithTheTable(long n) {
        double expected = ReferenceValues.expected("int-hoeffding-bernstein", "hoeffding_two_sided_95_halfwidth_n" + n);
        assertEquals(expected, Dkw.halfWidth(n, .95), 1e-12 * expected);
    }

    @Test
    void isNoLongerThanAll() {
        assertEquals(1, Dkw.halfWidth(0, .95));
        assertEquals(1, Dkw.halfWidth(1, .95));
    }

    /// The largest distance of 200 uniform draws stays within the band in at least 95 %, and not in much
    /// more: the limit of the chance is .95 up to terms of the order of `1/√n`.
    @Test
    void holdsAtAllValuesTogether() {
        var random = Observed.random(20261201);
        double half = Dkw.halfWidth(200, .95);
        int repetitions = 10_000;
        int held = 0;
        for (int r = 0; r < repetitions; r++) {
            double[] sorted = random.doubles(200).toArray();
            Arrays.sort(sorted);
            double farthest = 0;
            for (int i = 0; i < 200; i++) {
                farthest = Math.max(farthest, Math.max((i + 1) / 200.0 - sorted[i], sorted[i] - i / 200.0));
            }
            held += farthest <= half ? 1 : 0;
        }
        double share = (double) held / repetitions;
        assertTrue(share >= .95 - 4 * Math.sqrt(.95 * .05 / repetitions) && share <= .97, "share " + share);
    }
}
