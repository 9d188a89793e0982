package dev.leadline.ground;

import dev.leadline.estimate.Outermost;
import dev.leadline.ground.Ground.Strength;
import java.util.Optional;

/// Whether the standard error is so small that what numbers of 53 binary digits lose is no longer small
/// beside it: outcomes and their sums have a resolution of 2^-52 of their size, and points of 2^-52 of a
/// range.
final class Resolution {
    private static final double RESOLUTION = 0x1p-52;

    private Resolution() {}

    static Optional<Ground> judge(Evidence evidence, int k) {
        double error = evidence.answers().get(k).standardError();
        double largest = Math.max(
                Math.abs(evidence.answers().get(k).estimate()),
                evidence.outermost(k).stream()
                        .mapToDouble(Outermost.Component::largest)
                        .max()
                        .orElse(0));
        double least = RESOLUTION * largest;
        return error > 0 && error < least
                ? Optional.of(Ground.doubted(
                        "resolution",
                        Strength.CAUTION,
                        evidence.of(k)
                                + "the standard error %s is below the resolution of the numbers it comes from, %s"
                                        .formatted(Numbers.value(error), Numbers.value(least)),
                        "Take %s for the error; ask for the difference from a value near the answer to resolve more"
                                .formatted(Numbers.value(least))))
                : Optional.empty();
    }
}
