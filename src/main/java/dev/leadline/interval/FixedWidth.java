package dev.leadline.interval;

import dev.leadline.estimate.Estimate;
import dev.leadline.numeric.Normal;

/// Stopping once the plain interval is as narrow as the tolerance. It holds in the limit of small tolerances
/// only: from light tails it keeps its level with a [Guard], from lognormal values (σ = 2) the 95 % interval
/// holds in 87 % of the runs (`EverMissTest`), and without a guard it stops wherever few draws happen to
/// agree.
///
/// Source: Chow and Robbins (1965), Annals of Mathematical Statistics 36, 457-462.
///
/// @param level of confidence, between 0 and 1
public record FixedWidth(double level) {
    /// Word of the project file and of the commands.
    public static final String KIND = "fixed-width";

    private static final String ASSUMPTION = "The tolerance is so small, and the draws so many, that looking for the"
            + " moment to stop makes no difference; this is not guaranteed.";

    public FixedWidth {
        Level.check(level);
    }

    /// Half the width at n observations, in standard deviations of one of them.
    public double unit(double n) {
        return quantile() / Math.sqrt(n);
    }

    private double quantile() {
        return Normal.upperQuantile((1 - level) / 2);
    }

    /// The interval at n observations. Widened on either side by what the estimate may be off beside chance.
    public Interval of(Estimate estimate, long n) {
        return Around.of(estimate, n, quantile(), level, KIND, ASSUMPTION);
    }

    /// The interval that a lane was stopped for, whatever it is made of.
    public static Interval looked(Interval plain) {
        return new Interval(plain.low(), plain.high(), plain.level(), KIND, ASSUMPTION, plain.note());
    }
}
