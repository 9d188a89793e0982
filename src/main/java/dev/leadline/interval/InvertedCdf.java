package dev.leadline.interval;

import dev.leadline.numeric.Significant;
import java.util.Optional;

/// The interval of a quantile from the error of the distribution function there, for draws that order
/// statistics do not serve: weighted ones, observations of several draws, replicates. Its limits are the
/// quantiles of two probabilities, `q ± t` standard errors of the estimated distribution function at the
/// quantile.
///
/// Source: Woodruff (1952), Journal of the American Statistical Association 47, 635-646.
///
/// @param low probability whose quantile is the lower limit; `NaN` where there is none
/// @param high likewise of the upper limit
/// @param note why a limit is missing, and what would help
public record InvertedCdf(double low, double high, double level, Optional<String> note) {
    /// Word of the project file and of the commands.
    public static final String KIND = "inverted-cdf";

    private static final String ASSUMPTION = "The estimated distribution function is close to normal at the quantile,"
            + " and its error there is that at both limits.";

    private static final int DIGITS = 2;

    /// @param q between 0 and 1
    /// @param standardError of the estimated distribution function at the quantile; from the light side,
    ///     that of what lies above, it is the same
    /// @param degrees of freedom of the standard error
    public static InvertedCdf of(double q, double standardError, double degrees, double level) {
        Level.check(level);
        if (!(q > 0 && q < 1)) {
            throw new IllegalArgumentException("quantile " + q);
        }
        if (!(degrees >= 1 && standardError > 0 && Double.isFinite(standardError))) {
            String why = degrees >= 1
                    ? "the observations show no spread at the quantile to build an interval from"
                    : "an interval needs at least 2 observations";
            return new InvertedCdf(Double.NaN, Double.NaN, level, Optional.of(why));
        }
        double half = Student.quantile(degrees, level) * standardError;
        boolean hasLow = half < q;
        boolean hasHigh = half < 1 - q;
        String side = hasLow ? "no upper limit" : hasHigh ? "no lower limit" : "no limit on either side";
        double times = half / Math.min(q, 1 - q);
        return new InvertedCdf(
                hasLow ? q - half : Double.NaN,
                hasHigh ? q + half : Double.NaN,
                level,
                hasLow && hasHigh
                        ? Optional.empty()
                        : Optional.of(side + " at this n: the chance of not exceeding the quantile is uncertain by "
                                + Significant.text(half, DIGITS)
                                + "; needs about "
                                + Significant.text(Math.max(1.1, 1.1 * times * times), DIGITS)
                                + " times as many draws"));
    }

    /// @param lowValue the quantile of `low`; of no matter where there is none
    /// @param highValue likewise
    public Interval interval(double lowValue, double highValue) {
        return new Interval(
                Double.isNaN(low) ? Double.NaN : lowValue,
                Double.isNaN(high) ? Double.NaN : highValue,
                level,
                KIND,
                ASSUMPTION,
                note);
    }
}
