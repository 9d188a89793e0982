package dev.leadline.ground;

import dev.leadline.ground.Ground.Strength;
import dev.leadline.interval.Student;
import java.util.Optional;

/// Whether the weights of draws from other densities have the mean 1 that they must have. A mean that is not says
/// that a part of the inputs' own densities is hardly ever drawn, or that a density is not what it says.
///
/// It is an objection only where the observations are many for the skewness of their weights, or the mean is ten
/// standard errors off.
final class MeanWeight {
    /// `1 - 2 Φ(-4)`.
    private static final double LEVEL = 1 - 6.334248366623985e-5;

    private static final double FAR = 10;

    /// Weights that differ from 1 by no more do so by rounding, and by the error of densities that are integrated.
    private static final double ROUNDING = 1e-9;

    private MeanWeight() {}

    static Optional<Ground> judge(Evidence evidence) {
        if (!evidence.trace().scheme().isWeighted() || evidence.total().count() < 2) {
            return Optional.empty();
        }
        var sums = evidence.total();
        int w = sums.components() - 1;
        double mean = sums.mean(w);
        double error = sums.standardError(w);
        if (Math.abs(mean - 1) <= ROUNDING) {
            return Optional.of(Ground.shown("mean-weight", "the mean weight is 1, as it must be"));
        }
        String text = "the mean weight is %s, which must be 1: it is %s standard errors %s"
                .formatted(
                        Numbers.value(mean), Numbers.ratio(Math.abs(mean - 1) / error), mean < 1 ? "below" : "above");
        var interval = Student.of(mean, error, sums.count(), LEVEL);
        if (interval.low() <= 1 && interval.high() >= 1) {
            return Optional.of(Ground.shown("mean-weight", text));
        }
        return Optional.of(Ground.doubted(
                "mean-weight",
                Skewness.isMet(sums, w) || !(Math.abs(mean - 1) <= FAR * error) ? Strength.OBJECTION : Strength.CAUTION,
                text,
                "Draw from densities that are wide enough for the inputs' own, or a greater share from these"));
    }
}
