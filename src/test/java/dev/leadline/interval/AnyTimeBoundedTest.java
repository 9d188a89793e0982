package dev.leadline.interval;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.leadline.estimate.Accumulator;
import dev.leadline.stream.Address;
import dev.leadline.stream.Purpose;
import dev.leadline.stream.Stream;
import java.util.function.DoubleUnaryOperator;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

class AnyTimeBoundedTest {
    private static final long SEED = 20261201;

    private static DoubleUnaryOperator quantile(String density) {
        return switch (density) {
            case "uniform" -> u -> u;
            case "even" -> u -> u < .5 ? 1 : 0;
            case "rare" -> u -> u < .02 ? 1 : 0;
            // Mean 1/8, skewed.
            case "power" -> u -> u * u * u * u * u * u * u;
            default -> throw new IllegalArgumentException(density);
        };
    }

    private static double mean(String density) {
        return switch (density) {
            case "uniform", "even" -> .5;
            case "rare" -> .02;
            default -> .125;
        };
    }

    private static double[] values(String density, long run, int n) {
        var values = new double[n];
        Stream.at(new Address(SEED, Purpose.RUN, "A", 0, density, run)).fill(values, 0, n);
        var quantile = quantile(density);
        for (int i = 0; i < n; i++) {
            values[i] = quantile.applyAsDouble(values[i]);
        }
        return values;
    }

    private static Accumulator item(double[] values, int from, int to) {
        var sums = new Accumulator(1);
        sums.add(new double[][] {values}, from, to);
        return sums;
    }

    /// What items add is what the definition says, value by value.
    @Test
    void addsUpWhatWasNotForeseen() {
        var x = values("power", 0, 1000);
        var sums = BoundedSums.within(0, 1);
        double squares = 0;
        double sum = 0;
        int size = 1;
        for (int from = 0; from < 1000; from += size, size = size * 2 % 301 + 1) {
            int to = Math.min(1000, from + size);
            double foreseen = from == 0 ? .5 : sum / from;
            for (int i = from; i < to; i++) {
                squares += (x[i] - foreseen) * (x[i] - foreseen);
                sum += x[i];
            }
            sums = sums.and(item(x, from, to), 0);
        }
        assertEquals(1000, sums.n());
        assertEquals(squares, sums.squares(), 1e-12 * squares);
        assertEquals(sum / 1000, sums.mean(), 1e-15);
        assertEquals(sums, sums.and(new Accumulator(1), 0));
    }

    /// Over 10,000 draws in items of 64, doubling every 8, looked at after each: the band misses with less
    /// than 5 %. Beside it, at 2,000 draws, a betting sequence, of another kind and looked at after each
    /// draw: the two overlap and differ in length by less than a factor of 2.
    @ParameterizedTest
    @ValueSource(strings = {"uniform", "even", "rare", "power"})
    void seldomMissesAtAnyTime(String density) {
        var band = AnyTimeBounded.tunedTo(1000, 0, 1, .95);
        double mean = mean(density);
        int runs = 1_000;
        int missed = 0;
        int lost = 0;
        double ratio = 0;
        for (int r = 0; r < runs; r++) {
            var x = values(density, r, 10_000);
            var sums = BoundedSums.within(0, 1);
            boolean misses = false;
            Interval interval = null;
            int items = 0;
            for (int from = 0; from < x.length; items++) {
                int to = Math.min(x.length, from + (64 << items / 8));
                sums = sums.and(item(x, from, to), 0);
                interval = band.of(sums);
                misses |= interval.low() > mean || interval.high() < mean;
                from = to;
            }
            missed += misses ? 1 : 0;
            if (r < 100) {
                var bet = new Betting(x, 2_000, .05);
                lost += bet.everLost(mean) ? 1 : 0;
                var early = BoundedSums.within(0, 1);
                items = 0;
                for (int from = 0; from < 2_000; items++) {
                    int to = Math.min(2_000, from + (64 << items / 8));
                    early = early.and(item(x, from, to), 0);
                    from = to;
                }
                var ours = band.of(early);
                double low = bet.limit(0, early.mean());
                double high = bet.limit(1, early.mean());
                assertTrue(ours.low() < high && low < ours.high());
                ratio += ours.halfWidth() / ((high - low) / 2) / 100;
            }
        }
        assertTrue(missed <= runs * .05, missed + " of " + runs + " missed");
        assertTrue(lost <= 5 + 4 * Math.sqrt(.05 * .95 * 100), lost + " of 100 bets lost");
        double times = ratio;
        assertTrue(times > .5 && times < 2, () -> times + " times as long as by betting");
    }

    /// Capital of two gamblers against a mean, one who bets it is larger and one who bets it is smaller, with
    /// stakes by the variance seen before: Waudby-Smith and Ramdas (2024), J. R. Stat. Soc. B 86, 1-27. A
    /// mean is given up once they have made 1/α of 1 together.
    private static final class Betting {
        private final double[] x;
        private final double[] stake;
        private final double alpha;

        Betting(double[] x, int n, double alpha) {
            this.x = x;
            this.alpha = alpha;
            stake = new double[n];
            double sum = .5;
            double squares = .25;
            for (int i = 0; i < n; i++) {
                double variance = squares / (i + 1);
                stake[i] = Math.sqrt(2 * Math.log(2 / alpha) / (variance * (i + 1) * Math.log(i + 2)));
                sum += x[i];
                double m = sum / (i + 2);
                squares += (x[i] - m) * (x[i] - m);
            }
        }

        boolean everLost(double mean) {
            return mostCapital(mean, 0) > 1 / alpha;
        }

        /// From draw `first` on.
        private double mostCapital(double mean, int first) {
            double up = .5;
            double down = .5;
            double most = 0;
            for (int i = 0; i < stake.length; i++) {
                up *= 1 + Math.min(stake[i], .5 / mean) * (x[i] - mean);
                down *= 1 - Math.min(stake[i], .5 / (1 - mean)) * (x[i] - mean);
                most = i >= first ? Math.max(most, up + down) : most;
            }
            return most;
        }

        /// The end of the means that are not given up at the last draw, on the side of `end`.
        double limit(double end, double inside) {
            double out = end == 0 ? 1e-9 : 1 - 1e-9;
            double in = inside;
            int last = stake.length - 1;
            if (!(mostCapital(out, last) > 1 / alpha)) {
                return out;
            }
            for (int i = 0; i < 30; i++) {
                double middle = (in + out) / 2;
                if (mostCapital(middle, last) > 1 / alpha) {
                    out = middle;
                } else {
                    in = middle;
                }
            }
            return in;
        }
    }

    @Test
    void staysWithinTheBounds() {
        var band = AnyTimeBounded.tunedTo(1000, 2, 4, .95);
        var values = new double[64];
        java.util.Arrays.fill(values, 2);
        var interval = band.of(BoundedSums.within(2, 4).and(item(values, 0, 64), 0));
        assertEquals(2, interval.low());
        assertTrue(interval.high() > 2.1 && interval.high() < 4, interval.toString());
        assertEquals("any-time-bounded", interval.kind());
        assertEquals(.95, interval.level());
    }

    /// The unit does not matter.
    @Test
    void scales() {
        var x = values("power", 1, 500);
        var scaled = x.clone();
        for (int i = 0; i < x.length; i++) {
            scaled[i] = 1000 * x[i] - 7;
        }
        var interval = AnyTimeBounded.tunedTo(1000, 0, 1, .95)
                .of(BoundedSums.within(0, 1).and(item(x, 0, 500), 0));
        var other = AnyTimeBounded.tunedTo(1000, -7, 993, .95)
                .of(BoundedSums.within(-7, 993).and(item(scaled, 0, 500), 0));
        assertEquals(1000 * interval.low() - 7, other.low(), 1e-9);
        assertEquals(1000 * interval.high() - 7, other.high(), 1e-9);
    }

    @Test
    void saysWhyThereIsNone() {
        var band = AnyTimeBounded.tunedTo(1000, 0, 1, .95);
        var empty = band.of(BoundedSums.within(0, 1));
        assertEquals("an interval needs at least 1 observation", empty.note().orElseThrow());
        var beyond = band.of(BoundedSums.within(0, 1).and(item(new double[] {.5, 1.25}, 0, 2), 0));
        assertTrue(Double.isNaN(beyond.low()));
        assertEquals(
                "values from 0.5 to 1.25 were seen, which are not within the bounds 0 and 1",
                beyond.note().orElseThrow());
    }
}
