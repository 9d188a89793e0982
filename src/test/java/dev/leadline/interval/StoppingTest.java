package dev.leadline.interval;

import static org.junit.jupiter.api.Assertions.assertEquals;

import java.util.OptionalLong;
import org.apache.commons.statistics.distribution.NormalDistribution;
import org.junit.jupiter.api.Test;

/// Why the plain rule is not the default: zeros and ones of chance .01, a tolerance that the plain interval
/// has at 2,000 draws, and a look after every draw. How often the estimate is within the tolerance where a
/// rule stops, added up exactly.
///
/// Expected: the same recursion in another language, to four digits.
class StoppingTest {
    private static final double P = .01;
    private static final double Z = NormalDistribution.of(0, 1).inverseCumulativeProbability(.975);
    private static final double TOLERANCE = Z * Math.sqrt(P * (1 - P) / 2000);
    private static final FixedWidth PLAIN = new FixedWidth(.95);
    private static final AnyTimeMean BAND = AnyTimeMean.tunedTo(AnyTimeMean.DRAWS, .95);

    private static double sd(long hits, long n) {
        double share = (double) hits / n;
        return Math.sqrt(share * (1 - share) * n / (n - 1));
    }

    private static void rightWhereItStops(double expected, BernoulliWalk.Rule rule) {
        double right = new BernoulliWalk(P).rightWhereItStops(rule, off -> Math.abs(off) <= TOLERANCE);
        assertEquals(expected, right, 5e-5);
    }

    private static boolean plain(long first, long hits, long n) {
        return n >= first && sd(hits, n) * PLAIN.unit(n) <= TOLERANCE;
    }

    private static boolean band(long first, long hits, long n) {
        return n >= first && sd(hits, n) * BAND.unit(n) <= TOLERANCE;
    }

    @Test
    void plainRule() {
        rightWhereItStops(.0887, (hits, n) -> plain(10, hits, n));
        rightWhereItStops(.5788, (hits, n) -> plain(100, hits, n));
        rightWhereItStops(.9019, (hits, n) -> plain(1000, hits, n));
    }

    @Test
    void bandWithoutItsGuard() {
        rightWhereItStops(.6308, (hits, n) -> band(100, hits, n));
    }

    @Test
    void bandWithItsGuard() {
        rightWhereItStops(
                .9992,
                (hits, n) -> band(1, hits, n)
                        && Guard.OF_DRAWS
                                .lack(n, n, hits == 0 || hits == n, Double.NaN, OptionalLong.of(hits))
                                .isEmpty());
    }

    /// Half the width of Wilson's interval, from 10 hits on.
    @Test
    void wilsonWithTenHits() {
        rightWhereItStops(.9712, (hits, n) -> {
            double share = (double) hits / n;
            double half = Z / (1 + Z * Z / n) * Math.sqrt(share * (1 - share) / n + Z * Z / (4.0 * n * n));
            return hits >= 10 && half <= TOLERANCE;
        });
    }
}
