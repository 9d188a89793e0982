package dev.leadline.interval;

import dev.leadline.estimate.RatioOfMeans;
import dev.leadline.numeric.Significant;
import java.util.Optional;

/// Fieller's limits of a ratio of means: every ratio r for which the mean of `numerator - r denominator`
/// does not differ from 0 by more than t of its standard errors.
///
/// Where the denominator's mean does not differ from 0 either, those ratios have no lower and no upper
/// limit: they are all numbers, or all but a piece in the middle, which the note then tells.
///
/// Coverage at 95 %: of 30 pairs, exponential over lognormal (σ = 1), it holds in 94.8 % where [Delta] does
/// in 92.9 % (`FiellerTest`).
///
/// Source: Fieller (1954), Journal of the Royal Statistical Society B 16, 175-185.
public final class Fieller {
    /// Word of the project file and of the commands.
    public static final String KIND = "fieller";

    /// From this error of the denominator's mean on, in parts of it, the plain interval is not to be
    /// trusted.
    private static final double UNCERTAIN = 0.1;

    private static final int DIGITS = 3;

    private static final String ASSUMPTION =
            "The two means are close to jointly normal, which needs finite variances of the observations.";

    private Fieller() {}

    /// Fieller's limits where the denominator's mean is uncertain by more than a tenth of it, else those of
    /// [Delta].
    public static Interval orDelta(RatioOfMeans ratio, double level) {
        return ratio.errorOfDenominator() > UNCERTAIN ? of(ratio, level) : Delta.of(ratio.estimate(), level);
    }

    public static Interval of(RatioOfMeans ratio, double level) {
        var plain = Delta.of(ratio.estimate(), level);
        if (plain.isNone()) {
            return plain.as(KIND, ASSUMPTION);
        }
        double t = Student.quantile(ratio.degrees(), level);
        // in units of its own each, so that no power of a mean overflows
        double unitUp = unit(ratio.numerator(), ratio.varianceOfNumerator());
        double unitDown = unit(ratio.denominator(), ratio.varianceOfDenominator());
        double unit = unitUp / unitDown;
        double up = ratio.numerator() / unitUp;
        double down = ratio.denominator() / unitDown;
        double above = t * t * (ratio.varianceOfNumerator() / unitUp / unitUp);
        double both = t * t * (ratio.covariance() / unitUp / unitDown);
        double below = t * t * (ratio.varianceOfDenominator() / unitDown / unitDown);
        // the ratios r with a r² - 2 b r + c <= 0
        double a = down * down - below;
        double b = up * down - both;
        double c = up * up - above;
        double quarter = up * up * below - 2 * up * down * both + down * down * above - (above * below - both * both);
        double far = b + Math.copySign(Math.sqrt(Math.max(0, quarter)), b);
        double least = unit * Math.min(far / a, c / far);
        double most = unit * Math.max(far / a, c / far);
        if (a > 0) {
            return new Interval(least, most, level, KIND, ASSUMPTION, Optional.empty());
        }
        String which = a == 0 || quarter <= 0
                ? "no ratio can be excluded"
                : "the ratio is at most %s or at least %s, and no limit on either side can be given"
                        .formatted(Significant.text(least, DIGITS), Significant.text(most, DIGITS));
        return Interval.none(
                level,
                KIND,
                ASSUMPTION,
                "the denominator's mean is within its error of 0: " + which + "; make more draws");
    }

    /// A power of two.
    private static double unit(double mean, double variance) {
        return Math.scalb(1.0, Math.getExponent(Math.max(Math.abs(mean), Math.sqrt(variance))));
    }
}
