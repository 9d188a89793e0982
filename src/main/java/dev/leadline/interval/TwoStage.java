package dev.leadline.interval;

import dev.leadline.numeric.Normal;
import dev.leadline.numeric.Significant;
import java.util.Optional;

/// A mean to a fixed tolerance with a guarantee, for values whose kurtosis is at most what this allows: a
/// first stage bounds the standard deviation, a second one of fresh draws, their number then fixed, makes the
/// mean.
///
/// Source: Hickernell, Jiang, Liu and Owen (2013), in Monte Carlo and Quasi-Monte Carlo Methods 2012,
/// 105-128, arXiv 1208.4318.
///
/// @param level of confidence, between 0 and 1
/// @param first draws of the first stage, none of which enters the mean
/// @param inflation by which the standard deviation of the first stage is made larger, above 1
public record TwoStage(double level, long first, double inflation) {
    /// Word of the project file and of the commands.
    public static final String KIND = "two-stage";

    public static final long FIRST = 10_000;

    public static final double INFLATION = 1.2;

    /// Constants of the Berry-Esseen inequalities.
    private static final double A1 = 0.3328;

    private static final double A2 = 0.429;
    private static final double A3 = 18.1139;

    private static final long MOST = 1L << 60;

    public TwoStage {
        Level.check(level);
        if (first < 4 || !(inflation > 1)) {
            throw new IllegalArgumentException(first + " draws first, inflation " + inflation);
        }
    }

    public static TwoStage of(double level) {
        return new TwoStage(level, FIRST, INFLATION);
    }

    /// The largest kurtosis, 3 for normal values, under which the promise holds.
    public double largestKurtosis() {
        double miss = missOfFirst();
        double squares = 1 - 1 / (inflation * inflation);
        return (first - 3.0) / (first - 1.0) + miss * first / (1 - miss) * squares * squares;
    }

    /// The bound of the standard deviation.
    ///
    /// @param sd of the first stage
    public double bound(double sd) {
        return inflation * sd;
    }

    /// Draws of the second stage.
    ///
    /// @param sd of the first stage; where it is 0 its values are all equal and say nothing, and the answer
    ///     is empty, as it is where more draws than can be counted are needed
    /// @param tolerance that the mean may be off, above 0
    public Optional<Long> second(double sd, double tolerance) {
        if (!(tolerance > 0)) {
            throw new IllegalArgumentException("tolerance " + tolerance);
        }
        double ratio = bound(sd) / tolerance;
        double chebyshev = Math.ceil(ratio * ratio / missOfSecond());
        if (!(sd > 0 && chebyshev <= MOST)) {
            return Optional.empty();
        }
        long low = 0;
        long high = (long) chebyshev;
        while (high - low > 1) {
            long n = low + (high - low) / 2;
            if (berryEsseen(n, ratio) <= missOfSecond() / 2) {
                high = n;
            } else {
                low = n;
            }
        }
        return Optional.of(high);
    }

    /// The interval, which is as long as the tolerance says.
    ///
    /// @param mean of the second stage
    public Interval of(double mean, double tolerance) {
        return new Interval(
                mean - tolerance,
                mean + tolerance,
                level,
                KIND,
                "The draws are independent, and the kurtosis of the values is at most %s."
                        .formatted(Significant.text(largestKurtosis(), 3)),
                Optional.empty());
    }

    private double missOfFirst() {
        return (1 - level) / 2;
    }

    private double missOfSecond() {
        return 1 - level / (1 - missOfFirst());
    }

    /// What the chance to be too large is at most.
    private double berryEsseen(double n, double ratio) {
        double z = Math.sqrt(n) / ratio;
        double thirdMoment = StrictMath.pow(largestKurtosis(), 0.75);
        double far = A3 * thirdMoment / (1 + z * z * z);
        return Normal.cdf(-z) + Math.min(A1 * (thirdMoment + A2), far) / Math.sqrt(n);
    }
}
