package dev.leadline.ground;

import dev.leadline.estimate.Accumulator;
import dev.leadline.estimate.Estimate;
import dev.leadline.ground.Ground.Strength;
import dev.leadline.interval.Student;
import dev.leadline.scheme.Replicated;
import java.util.Optional;

/// Whether the second half of the draws tells the same as the first.
///
/// The difference of the two halves' means, in its standard errors, is compared with the normal quantile
/// that sound draws exceed one time in 10,000.
final class Settled {
    /// `Φ⁻¹(1 - .0001 / 2)`.
    private static final double LIMIT = 3.89;

    private static final double LEVEL = 1 - 1e-4;
    private static final long FEWEST_REPLICATES = 10;

    /// Below so many observations in a half, its standard error is not worth a judgement.
    private static final long FEWEST = 500;

    private Settled() {}

    static Optional<Ground> judge(Evidence evidence, int k) {
        if (evidence.trace().scheme().points() instanceof Replicated) {
            return ofRounds(evidence, k);
        }
        Accumulator first = evidence.halves().getFirst();
        Accumulator second = evidence.halves().getLast();
        if (!(Math.min(first.count(), second.count()) >= FEWEST)) {
            return Optional.empty();
        }
        Estimate before = evidence.estimate(first, k);
        Estimate after = evidence.estimate(second, k);
        double error = StrictMath.hypot(before.standardError(), after.standardError());
        double z = (after.value() - before.value()) / error;
        if (!(error > 0) || Double.isNaN(z) || Double.isInfinite(error)) {
            return Optional.empty();
        }
        String text = evidence.of(k) + "the second half of the draws differs from the first by "
                + Numbers.ratio(Math.abs(z)) + " standard errors";
        return Optional.of(judged(text, Math.abs(z) <= LIMIT));
    }

    /// Replicates make their draws side by side, so that there are no halves; but what all had shown a
    /// round before is known. Both errors are added, for the estimates are not independent, and replicates
    /// are few.
    private static Optional<Ground> ofRounds(Evidence evidence, int k) {
        var marks = evidence.trace().marks();
        if (marks.size() < 2) {
            return Optional.empty();
        }
        var before = marks.get(marks.size() - 2).answers().get(k);
        var after = marks.getLast().answers().get(k);
        double z = (after.estimate() - before.estimate()) / (before.standardError() + after.standardError());
        if (Double.isNaN(z) || before.observations() < FEWEST_REPLICATES) {
            return Optional.empty();
        }
        double limit = Student.quantile(before.observations() - 1, LEVEL);
        return Optional.of(judged(
                evidence.of(k) + "the last round of points moved the estimate by " + Numbers.ratio(Math.abs(z))
                        + " times the standard errors before and after",
                Math.abs(z) <= limit));
    }

    private static Ground judged(String text, boolean isSettled) {
        return isSettled
                ? Ground.shown("settled", text)
                : Ground.doubted(
                        "settled",
                        Strength.OBJECTION,
                        text,
                        "Look for rare, large outcomes; make many more draws before trusting the interval",
                        Action.MoreDraws.some(),
                        new Action.DrawWider());
    }
}
