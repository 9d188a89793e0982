package dev.leadline.ground;

import dev.leadline.ground.Ground.Strength;
import dev.leadline.numeric.Normal;
import dev.leadline.numeric.Rounding;
import dev.leadline.trace.Answer;

/// Whether a quantile agrees with a reference value. It has no standard error: its interval comes from
/// ranks, which reach farther in proportion to the normal quantile of their level. A value is doubted where
/// it is farther off than the limit on its side would be at four standard errors.
final class QuantileReference {
    private static final double LIMIT = 4;

    private QuantileReference() {}

    static Ground judge(Answer answer, double value, double error) {
        var interval = answer.interval();
        boolean isAbove = value > answer.estimate();
        double reach = isAbove ? interval.high() - answer.estimate() : answer.estimate() - interval.low();
        double errors = -Normal.quantile((1 - interval.level()) / 2);
        double distance = Math.max(0, Math.abs(value - answer.estimate()) - LIMIT * error);
        if (Double.isNaN(reach) || Double.isNaN(distance)) {
            return Ground.notDone(
                    "reference",
                    "The reference value cannot be compared yet: there is no limit of the interval on its side",
                    "Make more draws",
                    Action.MoreDraws.some());
        }
        double allowed = LIMIT / errors * reach;
        var rounding = Rounding.of(answer.estimate(), allowed);
        String text =
                "the ranks of the draws leave a quantile of %s possible at four standard errors, and the reference value %s is %s that"
                        .formatted(
                                isAbove
                                        ? "up to " + rounding.up(answer.estimate() + allowed)
                                        : "down to " + rounding.down(answer.estimate() - allowed),
                                Numbers.value(value),
                                distance <= allowed ? "within" : "beyond");
        return distance <= allowed
                ? Ground.shown("reference", text)
                : Ground.doubted(
                        "reference",
                        Strength.OBJECTION,
                        text,
                        "Check formula, densities and units, and where the reference value comes from");
    }
}
