package dev.leadline.ground;

import dev.leadline.estimate.Outermost;
import dev.leadline.ground.Ground.Strength;
import java.util.Comparator;
import java.util.Optional;

/// Whether a single draw makes up much of the sum that an answer is.
final class LargestShare {
    private static final double MUCH = 0.1;

    /// Of few draws that count, one has a large share for that alone.
    private static final double OF_FEW = 5;

    private LargestShare() {}

    static Optional<Ground> judge(Evidence evidence, int k) {
        return evidence.outermost(k).stream()
                .max(Comparator.comparingDouble(Outermost.Component::largestShare))
                .map(draws -> judge(evidence, k, draws));
    }

    private static Ground judge(Evidence evidence, int k, Outermost.Component draws) {
        double share = draws.largestShare();
        String text = evidence.of(k)
                + "the draw that counts most makes up %s %% of the sum".formatted(Numbers.value(100 * share));
        return share <= Math.max(MUCH, OF_FEW / draws.nonzero())
                ? Ground.shown(
                        "largest-share",
                        text + "; all do the work of about %s equal ones".formatted(Numbers.about(draws.effective())))
                : Ground.doubted(
                        "largest-share",
                        Strength.CAUTION,
                        text,
                        "Draw such values more often, in a lane of its own or by a wider density; more draws make the"
                                + " share smaller",
                        new Action.DrawWider(),
                        Action.MoreDraws.some());
    }
}
