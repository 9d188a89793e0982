package dev.leadline.interval;

import dev.leadline.estimate.Accumulator;
import dev.leadline.numeric.Shortest;
import dev.leadline.stream.Address;
import dev.leadline.stream.Purpose;
import dev.leadline.stream.StreamKey;
import java.util.Arrays;
import java.util.Locale;
import java.util.Optional;

/// The percentile-t bootstrap for a mean of independent observations: Student's interval with quantiles of
/// the ratio that samples from the observations themselves show, in place of tabulated ones.
///
/// 1,999 samples, 19,999 where less than .005 is left out on a side. With other random numbers a limit
/// moves by a few per cent of the length. Coverage at 95 %: 93.2 % from 30 lognormal (σ = 1) observations
/// and 93.4 % from 100, where Student's holds in 88.3 % and 91.7 % (`CoverageTest`).
///
/// Cost: 4 to 6 µs for an observation, ten times that with more samples.
///
/// Source: Efron (1981), Canadian Journal of Statistics 9, 139-172; Hall (1988), Annals of Statistics 16,
/// 927-953.
public final class BootstrapT {
    /// Word of the project file and of the commands.
    public static final String KIND = "bootstrap-t";

    /// More observations are refused.
    public static final int MOST = 100_000;

    /// With fewer, too many samples hold one observation alone.
    private static final int LEAST = 5;

    private static final int SAMPLES = 1_999;
    private static final int MANY_SAMPLES = 19_999;

    /// Samples beyond a limit; with fewer it would hang on single ones.
    private static final int LEAST_BEYOND = 10;

    private static final String ASSUMPTION =
            "The independent observations are so many that samples from them err as they do themselves, which needs a"
                    + " finite variance.";

    private BootstrapT() {}

    /// With random numbers that are always the same, and independent of those that draws come from.
    ///
    /// @param observations finite; not changed
    public static Interval of(double[] observations, double level) {
        return of(observations, level, StreamKey.of(new Address(0, Purpose.BOOTSTRAP, "", 0, "", 0)));
    }

    /// No interval, of more observations than are resampled.
    public static Interval ofTooMany(long n, double level) {
        return none(
                level,
                String.format(
                        Locale.ROOT,
                        "the bootstrap takes at most %,d observations, and there are %,d: so many do not need it; take"
                                + " the skewness-corrected interval",
                        MOST,
                        n));
    }

    /// @param observations finite; not changed
    /// @param key of the random numbers, of the purpose of a bootstrap; sample i takes those of item i
    public static Interval of(double[] observations, double level, StreamKey key) {
        Level.check(level);
        int n = observations.length;
        for (double x : observations) {
            if (!Double.isFinite(x)) {
                throw new IllegalArgumentException("observation " + x);
            }
        }
        if (n > MOST) {
            return ofTooMany(n, level);
        }
        if (n < LEAST) {
            return none(
                    level,
                    "an interval needs at least %d observations; so far there %s %d"
                            .formatted(LEAST, n == 1 ? "is" : "are", n));
        }
        double tail = (1 - level) / 2;
        int samples = (SAMPLES + 1) * tail < LEAST_BEYOND ? MANY_SAMPLES : SAMPLES;
        int beyond = (int) ((samples + 1) * tail + 0.5);
        if (beyond < LEAST_BEYOND) {
            return none(
                    level,
                    "a level of " + Interval.percent(level)
                            + " is more than samples from the observations can show: at most 99.9 %");
        }
        var sums = new Accumulator(1);
        sums.add(new double[][] {observations}, 0, n);
        var plain = Student.of(sums, 0, level).as(KIND, ASSUMPTION);
        return plain.isNone() ? plain : interval(observations, sums, samples, beyond, level, key);
    }

    private static Interval interval(
            double[] observations, Accumulator sums, int samples, int beyond, double level, StreamKey key) {
        double mean = sums.mean(0);
        var resampling = new Resampling(observations, mean, key);
        var ratios = new double[samples];
        for (int i = 0; i < samples; i++) {
            ratios[i] = resampling.sample(i).ratio();
        }
        Arrays.sort(ratios);
        double low = mean - ratios[samples - beyond] * sums.standardError(0);
        double high = mean - ratios[beyond - 1] * sums.standardError(0);
        boolean hasLow = Double.isFinite(low);
        boolean hasHigh = Double.isFinite(high);
        return new Interval(
                hasLow ? low : Double.NaN,
                hasHigh ? high : Double.NaN,
                level,
                KIND,
                ASSUMPTION,
                hasLow && hasHigh
                        ? Optional.empty()
                        : Optional.of("too many samples hold one value alone, as "
                                + Shortest.text(hasLow ? sums.min(0) : sums.max(0)) + ": make more draws"));
    }

    private static Interval none(double level, String note) {
        return Interval.none(level, KIND, ASSUMPTION, note);
    }
}
