package dev.leadline.interval;

import dev.leadline.estimate.Estimate;

/// Student's t interval for what is made of several means: a ratio, a mean of the tail. Its standard error
/// is that of the linear part.
///
/// Coverage at 95 % falls short where the means are few and skewed: of 30 pairs, exponential over lognormal
/// (σ = 1), it holds in 92.9 % (`FiellerTest`).
public final class Delta {
    /// Word of the project file and of the commands.
    public static final String KIND = "delta";

    private static final String ASSUMPTION = "The estimate is close to linear in means of independent observations, as"
            + " far as those err, and they are close to normal, which needs finite variances.";

    private Delta() {}

    public static Interval of(Estimate estimate, double level) {
        return Student.of(estimate, level).as(KIND, ASSUMPTION);
    }
}
