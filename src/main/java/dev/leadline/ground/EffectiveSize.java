package dev.leadline.ground;

import dev.leadline.estimate.Outermost;
import dev.leadline.ground.Ground.Strength;
import java.util.Comparator;
import java.util.Optional;

/// Whether a few draws do the work of all: the square of the sum of sizes of outcomes, times their weights,
/// over the sum of their squares. A small number is a doubt. A large one is no ground for signing, for it
/// says nothing of what was not drawn: it is told beside others only.
final class EffectiveSize {
    private static final double FEW = 100;

    /// Of few draws, one in ten.
    private static final double PART = .1;

    private EffectiveSize() {}

    static Optional<Ground> judge(Evidence evidence, int k) {
        return evidence.outermost(k).stream()
                .map(Outermost.Component::effective)
                .min(Comparator.naturalOrder())
                .filter(size -> size < Math.min(FEW, PART * evidence.draws()))
                .map(size -> Ground.doubted(
                        "effective-size",
                        Strength.CAUTION,
                        evidence.of(k)
                                + "%s draws do the work of %s equal ones"
                                        .formatted(Numbers.count(evidence.draws()), Numbers.ratio(size)),
                        "Make more draws, or draw what counts more often",
                        Action.MoreDraws.inAll(evidence.draws() * FEW / size),
                        new Action.DrawWider()));
    }
}
