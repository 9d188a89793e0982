package dev.leadline.interval;

import dev.leadline.estimate.Accumulator;

/// Hall's interval for a mean of independent observations: Student's, corrected for skewness by a cubic
/// that has an inverse everywhere.
///
/// With `g = m3/s³` the quantiles t of Student's ratio become `(3 √n/g) (cbrt(1 + g/√n (t - g/(6 √n))) -
/// 1)`; where g is 0 they stay. Coverage at 95 %: 93.6 % from 100 lognormal (σ = 1) observations, where
/// Student's holds in 91.7 %; 93.4 % from 10 exponential ones, where Student's holds in 90.1 %
/// (`CoverageTest`).
///
/// Source: Hall (1992), Journal of the Royal Statistical Society B 54, 221-228; with Student's quantiles in
/// place of normal ones.
public final class SkewnessCorrected {
    /// Word of the project file and of the commands.
    public static final String KIND = "skewness-corrected";

    private static final String ASSUMPTION = "The mean of so many independent observations is close to normal but for"
            + " its skewness, which is estimated and needs a finite third moment.";

    private SkewnessCorrected() {}

    /// The interval of one component.
    public static Interval of(Accumulator sums, int k, double level) {
        var plain = Student.of(sums, k, level).as(KIND, ASSUMPTION);
        long n = sums.count();
        if (plain.isNone()) {
            return plain;
        }
        if (n < 3) {
            return Interval.none(
                    level, KIND, ASSUMPTION, "a skewness needs at least 3 observations; so far there are 2");
        }
        double skewness = sums.skewness(k);
        if (Double.isNaN(skewness)) {
            return Interval.none(
                    level,
                    KIND,
                    ASSUMPTION,
                    "the values are too large or too close together for a skewness: their cubes leave the range of"
                            + " numbers");
        }
        double g = skewness * ((n - 1.0) / n) * ((n - 2.0) / n);
        double t = Student.quantile(n - 1, level);
        double mean = sums.mean(k);
        double error = sums.standardError(k);
        return new Interval(
                mean - error * inverse(t, g, n),
                mean - error * inverse(-t, g, n),
                level,
                KIND,
                ASSUMPTION,
                plain.note());
    }

    /// The difference of cube roots is `y/(c² + c + 1)`, which does not cancel and holds for g = 0.
    static double inverse(double t, double g, long n) {
        double root = Math.sqrt(n);
        double centred = t - g / (6 * root);
        double c = StrictMath.cbrt(1 + g / root * centred);
        return 3 * centred / (c * c + c + 1);
    }
}
