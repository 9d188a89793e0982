package dev.leadline.interval;

import dev.leadline.numeric.Rounding;
import java.math.BigDecimal;
import java.math.RoundingMode;

/// The adaptive procedure of JCGM 101:2008, clause 7.9: blocks of draws until mean, standard uncertainty and
/// both ends of the coverage interval have settled, by twice the standard deviation of the average of each
/// over the blocks. It is a rule to stop, not a promise: what it stops at holds the true value in 79 to 90 %
/// of the runs where 95 % are aimed at, since it looks after every block from the second on.
///
/// @param level of the coverage interval, between 0 and 1
/// @param digits of the standard uncertainty that count, 1 or 2
public record Jcgm101(double level, int digits) {
    /// Word of the project file and of the commands.
    public static final String KIND = "jcgm-101";

    private static final long LEAST_BLOCK = 10_000;

    public Jcgm101 {
        Level.check(level);
        if (digits < 1) {
            throw new IllegalArgumentException(digits + " digits");
        }
    }

    /// Draws of a block: 10,000, or more where the tails are narrow (7.9.4 b).
    public long block() {
        BigDecimal tail = BigDecimal.ONE.subtract(BigDecimal.valueOf(level));
        return Math.max(
                LEAST_BLOCK,
                BigDecimal.valueOf(100).divide(tail, 0, RoundingMode.CEILING).longValueExact());
    }

    /// Whether what was found of each block has settled (7.9.4 f to i): never without any
    /// spread.
    ///
    /// @param ofBlocks one array for each of mean, standard uncertainty, lower and upper end: its values of
    ///     all blocks
    /// @param uncertainty standard uncertainty from the draws of all blocks
    public boolean hasSettled(double[][] ofBlocks, double uncertainty) {
        if (!(uncertainty > 0)) {
            return false;
        }
        double most = Rounding.tolerance(uncertainty, digits);
        for (double[] values : ofBlocks) {
            if (!(values.length > 1 && 2 * deviationOfAverage(values) < most)) {
                return false;
            }
        }
        return true;
    }

    /// The standard deviation of the average.
    static double deviationOfAverage(double[] values) {
        double sum = 0;
        for (double value : values) {
            sum += value;
        }
        double mean = sum / values.length;
        double squares = 0;
        for (double value : values) {
            squares += (value - mean) * (value - mean);
        }
        return Math.sqrt(squares / (values.length * (values.length - 1.0)));
    }
}
