package dev.leadline.ground;

import dev.leadline.estimate.Accumulator;
import dev.leadline.estimate.Estimate;
import dev.leadline.ground.Ground.Strength;
import java.util.Optional;

/// Whether the second half of the draws tells the same as the first.
///
/// The difference of the two halves' means, in its standard errors, is compared with the normal quantile that sound
/// draws exceed one time in 10,000.
final class Settled {
    /// `Φ⁻¹(1 - .0001 / 2)`.
    private static final double LIMIT = 3.89;

    /// Below so many observations in a half, its standard error is not worth a judgement.
    private static final long FEWEST = 500;

    private Settled() {}

    static Optional<Ground> judge(Evidence evidence, int k) {
        Accumulator first = evidence.halves().getFirst();
        Accumulator second = evidence.halves().getLast();
        if (!(Math.min(first.count(), second.count()) >= FEWEST)) {
            return Optional.empty();
        }
        Estimate before = evidence.estimate(first, k);
        Estimate after = evidence.estimate(second, k);
        double error = StrictMath.hypot(before.standardError(), after.standardError());
        double z = (after.value() - before.value()) / error;
        if (Double.isNaN(z) || Double.isInfinite(error)) {
            return Optional.empty();
        }
        String text = evidence.of(k) + "the second half of the draws differs from the first by "
                + Numbers.ratio(Math.abs(z)) + " standard errors";
        return Optional.of(
                Math.abs(z) <= LIMIT
                        ? Ground.shown("settled", text)
                        : Ground.doubted(
                                "settled",
                                Strength.OBJECTION,
                                text,
                                "Look for rare, large outcomes; make many more draws before trusting the interval"));
    }
}
