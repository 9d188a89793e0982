package dev.leadline.interval;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertNotEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.leadline.ReferenceValues;
import dev.leadline.stream.Address;
import dev.leadline.stream.Purpose;
import dev.leadline.stream.StreamKey;
import java.util.Arrays;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Test;

class BootstrapTTest {
    private static final String RECORD = "int-bootstrap-exact";
    private static final double[] FIVE = {1, 2, 4, 8, 16};

    private static StreamKey key(long seed) {
        return StreamKey.of(new Address(seed, Purpose.BOOTSTRAP, "A", 0, "mean", 0));
    }

    /// Record int-bootstrap-exact: the means of 100,000 samples against all of them, enumerated. Its
    /// percentile and BCa intervals are other kinds than this one.
    @Test
    void samplesAreDrawnWithReplacement() {
        int samples = 100_000;
        double[] seven = ReferenceValues.numbers(
                ReferenceValues.record(RECORD).required("data").required("a"));
        double mean = Arrays.stream(seven).average().orElseThrow();
        var ofSeven = new Resampling(seven, mean, key(1));
        double squares = IntStream.range(0, samples)
                .mapToDouble(i -> ofSeven.sample(i).off())
                .map(off -> off * off)
                .sum();
        double expected = ReferenceValues.expected(RECORD, "a_se_mean");
        assertEquals(expected, Math.sqrt(squares / samples), 4 * expected / Math.sqrt(2.0 * samples));
        var ofFive = new Resampling(FIVE, 6.2, key(2));
        double[] offs = IntStream.range(0, samples)
                .mapToDouble(i -> ofFive.sample(i).off())
                .sorted()
                .toArray();
        double less = Arrays.stream(offs).filter(off -> off < -1e-9).count() / (double) samples;
        double equal = Arrays.stream(offs).filter(off -> Math.abs(off) < 1e-9).count() / (double) samples;
        assertShare(ReferenceValues.expected(RECORD, "b_prop_less"), less, samples);
        assertShare(ReferenceValues.expected(RECORD, "b_prop_equal"), equal, samples);
        double sd = Math.sqrt(Arrays.stream(offs).map(off -> off * off).sum() / samples);
        assertEquals(ReferenceValues.expected(RECORD, "b_boot_se"), sd, 4 * sd / Math.sqrt(2.0 * samples));
        assertEquals(ReferenceValues.expected(RECORD, "b_percentile_low"), 6.2 + offs[samples / 40 - 1], .2 + 1e-9);
        assertEquals(
                ReferenceValues.expected(RECORD, "b_percentile_high"), 6.2 + offs[samples - samples / 40], .2 + 1e-9);
    }

    private static void assertShare(double expected, double actual, int samples) {
        assertEquals(expected, actual, 4 * Math.sqrt(expected * (1 - expected) / samples));
    }

    /// Limits of 1,999 samples against the quantiles of all 3,125, within four standard errors of a
    /// probability.
    @Test
    void limitsAreThoseOfAllSamples() {
        double[] ratios = IntStream.range(0, 3125)
                .mapToDouble(code -> {
                    var sample = new double[5];
                    for (int i = 0, rest = code; i < 5; i++, rest /= 5) {
                        sample[i] = FIVE[rest % 5];
                    }
                    double mean = Arrays.stream(sample).average().orElseThrow();
                    double squares = Arrays.stream(sample)
                            .map(x -> (x - mean) * (x - mean))
                            .sum();
                    return Math.abs(mean - 6.2) < 1e-9 ? 0 : (mean - 6.2) / Math.sqrt(squares / 20);
                })
                .sorted()
                .toArray();
        var interval = BootstrapT.of(FIVE, .9, key(3));
        double error = Observed.sums(FIVE).standardError(0);
        double off = 4 * Math.sqrt(.05 * .95 / 1999);
        double upper = (6.2 - interval.low()) / error;
        double lower = (6.2 - interval.high()) / error;
        assertTrue(upper >= at(ratios, .95 - off) - 1e-9 && upper <= at(ratios, .95 + off) + 1e-9, "upper " + upper);
        assertTrue(lower >= at(ratios, .05 - off) - 1e-9 && lower <= at(ratios, .05 + off) + 1e-9, "lower " + lower);
        assertEquals("bootstrap-t", interval.kind());
    }

    /// Of B samples the quantile p is the one of rank `(B + 1) p`: of 1,999 the 50th and the 1,950th at 95
    /// %, of 19,999 the 20th and the 19,980th at 99.8 %.
    @Test
    void limitsAreRatiosOfExactRanks() {
        double[] values = Observed.EXPONENTIAL.draws(Observed.random(9), 25);
        var sums = Observed.sums(values);
        var resampling = new Resampling(values, sums.mean(0), key(5));
        double[] ratios = IntStream.range(0, 19_999)
                .mapToDouble(i -> resampling.sample(i).ratio())
                .toArray();
        double[] few = Arrays.stream(ratios).limit(1_999).sorted().toArray();
        double[] many = Arrays.stream(ratios).sorted().toArray();
        var usual = BootstrapT.of(values, .95, key(5));
        assertEquals(sums.mean(0) - few[1949] * sums.standardError(0), usual.low());
        assertEquals(sums.mean(0) - few[49] * sums.standardError(0), usual.high());
        var strict = BootstrapT.of(values, .998, key(5));
        assertEquals(sums.mean(0) - many[19_979] * sums.standardError(0), strict.low());
        assertEquals(sums.mean(0) - many[19] * sums.standardError(0), strict.high());
    }

    private static double at(double[] sorted, double q) {
        return sorted[(int) (q * sorted.length)];
    }

    @Test
    void isAFunctionOfTheAddress() {
        double[] values = Observed.EXPONENTIAL.draws(Observed.random(4), 50);
        assertEquals(BootstrapT.of(values, .95, key(7)), BootstrapT.of(values, .95, key(7)));
        assertNotEquals(
                BootstrapT.of(values, .95, key(7)).low(),
                BootstrapT.of(values, .95, key(8)).low());
        var resampling = new Resampling(values, 1, key(7));
        var later = resampling.sample(9);
        resampling.sample(3);
        assertEquals(later, resampling.sample(9));
    }

    /// Powers of two and shifts that lose no digit go through.
    @Test
    void unitsDoNotMatter() {
        double[] values = Observed.LOGNORMAL_1.draws(Observed.random(5), 40);
        var interval = BootstrapT.of(values, .95, key(7));
        var large = BootstrapT.of(Arrays.stream(values).map(x -> x * 0x1p500).toArray(), .95, key(7));
        assertEquals(interval.low() * 0x1p500, large.low());
        assertEquals(interval.high() * 0x1p500, large.high());
    }

    /// Other random numbers move a limit by a few per cent of the length.
    @Test
    void hardlyDependsOnTheRandomNumbers() {
        double[] values = Observed.LOGNORMAL_1.draws(Observed.random(6), 100);
        double[] lows = IntStream.range(0, 100)
                .mapToDouble(seed -> BootstrapT.of(values, .95, key(seed)).low())
                .toArray();
        double length = 2 * BootstrapT.of(values, .95, key(0)).halfWidth();
        double mean = Arrays.stream(lows).average().orElseThrow();
        double sd =
                Math.sqrt(Arrays.stream(lows).map(x -> (x - mean) * (x - mean)).sum() / 99);
        assertTrue(sd < .03 * length, sd / length + " of the length");
    }

    @Test
    void saysWhyThereIsNone() {
        assertTrue(note(new double[100_001], .95).startsWith("the bootstrap takes at most 100,000 observations"));
        assertTrue(note(new double[] {1, 2, 3, 4}, .95).startsWith("an interval needs at least 5 observations"));
        assertTrue(note(new double[50], .95).startsWith("every value seen so far is equal (0)"));
        assertTrue(note(FIVE, .9999).contains("at most 99.9 %"));
        var rare = BootstrapT.of(new double[] {0, 0, 0, 0, 0, 1}, .95, key(1));
        assertTrue(Double.isNaN(rare.high()) && !Double.isNaN(rare.low()));
        assertEquals(
                "too many samples hold one value alone, as 0: make more draws",
                rare.note().orElseThrow());
        assertTrue(BootstrapT.of(Observed.EXPONENTIAL.draws(Observed.random(1), 30), .999, key(1))
                        .low()
                > 0);
        assertThrows(
                IllegalArgumentException.class,
                () -> BootstrapT.of(new double[] {1, 2, 3, 4, Double.NaN}, .95, key(1)));
    }

    private static String note(double[] values, double level) {
        var interval = BootstrapT.of(values, level, key(1));
        assertTrue(interval.isNone());
        return interval.note().orElseThrow();
    }
}
