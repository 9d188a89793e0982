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
/// Coverage at 95 %: 94.9 % for the quantile at .999 of 1,000 draws from a normal density that is moved
/// there (`InvertedCdfTest`).
///
/// @param low probability whose quantile is the lower limit; `NaN` where there is none, or none is wanted
/// @param high likewise of the upper limit
/// @param note why a limit is missing, and what would help
public record InvertedCdf(double low, double high, double level, Sides sides, Optional<String> note) {
    /// Word of the project file and of the commands.
    public static final String KIND = "inverted-cdf";

    private static final String ASSUMPTION = "The estimated distribution function is close to normal at the quantile,"
            + " and its error there is that at both limits.";

    private static final int DIGITS = 2;

    /// Both limits.
    public static InvertedCdf of(double q, double standardError, double degrees, double level) {
        return of(q, standardError, degrees, level, Sides.BOTH);
    }

    /// @param q between 0 and 1
    /// @param standardError of the estimated distribution function at the quantile; that of what lies above
    ///     is the same
    /// @param degrees of freedom of the standard error
    public static InvertedCdf of(double q, double standardError, double degrees, double level, Sides sides) {
        double twoSided = sides.twoSided(level);
        if (!(q > 0 && q < 1)) {
            throw new IllegalArgumentException("quantile " + q);
        }
        if (!(degrees >= 1 && standardError > 0 && Double.isFinite(standardError))) {
            String why = degrees >= 1
                    ? "the observations show no spread at the quantile to build an interval from"
                    : "an interval needs at least 2 observations";
            return new InvertedCdf(Double.NaN, Double.NaN, level, sides, Optional.of(why));
        }
        double half = Student.quantile(degrees, twoSided) * standardError;
        boolean lacksLow = sides != Sides.UPPER && half >= q;
        boolean lacksHigh = sides != Sides.LOWER && half >= 1 - q;
        return new InvertedCdf(
                sides == Sides.UPPER || lacksLow ? Double.NaN : q - half,
                sides == Sides.LOWER || lacksHigh ? Double.NaN : q + half,
                level,
                sides,
                lacksLow || lacksHigh ? Optional.of(missing(q, half, lacksLow, lacksHigh)) : Optional.empty());
    }

    private static String missing(double q, double half, boolean lacksLow, boolean lacksHigh) {
        double room = Math.min(lacksLow ? q : 1, lacksHigh ? 1 - q : 1);
        return (lacksLow && lacksHigh ? "no limit on either side" : lacksLow ? "no lower limit" : "no upper limit")
                + " at this n: the chance of not exceeding the quantile is uncertain by "
                + Significant.text(half, DIGITS)
                + "; needs about "
                + Significant.text(1.1 * (half / room) * (half / room), DIGITS)
                + " times as many draws";
    }

    /// @param lowValue the quantile of `low`; of no matter where there is none
    /// @param highValue likewise
    public Interval interval(double lowValue, double highValue) {
        return new Interval(
                sides == Sides.UPPER ? Double.NEGATIVE_INFINITY : Double.isNaN(low) ? Double.NaN : lowValue,
                sides == Sides.LOWER ? Double.POSITIVE_INFINITY : Double.isNaN(high) ? Double.NaN : highValue,
                level,
                KIND,
                ASSUMPTION,
                note);
    }
}
