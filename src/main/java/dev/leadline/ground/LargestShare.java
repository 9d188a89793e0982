package dev.leadline.ground;

import dev.leadline.ground.Ground.Strength;
import java.util.Optional;

/// Whether a single weighted draw makes up much of the sum that an answer is.
final class LargestShare {
    private static final double MUCH = 0.1;

    /// Of few draws that count, one has a large share for that alone.
    private static final double OF_FEW = 5;

    private LargestShare() {}

    static Optional<Ground> judge(Evidence evidence, int k) {
        int component = evidence.component(k);
        return evidence.trace()
                .extremes()
                .filter(draws -> draws.nonzero(component) > 0)
                .map(draws -> judge(evidence, k, draws.largestShare(component), OF_FEW / draws.nonzero(component)));
    }

    private static Ground judge(Evidence evidence, int k, double share, double ofFew) {
        String text = evidence.of(k)
                + "the draw that counts most makes up %s %% of the sum".formatted(Numbers.value(100 * share));
        return share <= Math.max(MUCH, ofFew)
                ? Ground.shown("largest-share", text)
                : Ground.doubted(
                        "largest-share",
                        Strength.CAUTION,
                        text,
                        "Look at that draw; draw such values more often, by a wider density or a greater share of the"
                                + " inputs' own");
    }
}
