package dev.leadline.ground;

import dev.leadline.estimate.Accumulator;
import dev.leadline.ground.Ground.Strength;
import dev.leadline.interval.SplittingSteps;
import dev.leadline.numeric.Rounding;
import dev.leadline.scheme.Repetitions;
import dev.leadline.scheme.SplittingOutcome;
import java.util.Optional;

/// Whether the particles of splitting moved so far that each copy tells something new: the replacements of the
/// repetitions then vary as Poisson numbers do. Beside it stands the interval that this law alone gives.
final class Mixing {
    /// Chance of so much variation, and how much it must be, to be doubted: right runs object one time in 10,000.
    private static final double RARE = 1e-4;

    private static final double MUCH = 1.25;

    private Mixing() {}

    static Optional<Ground> judge(Evidence evidence) {
        return evidence.trace().scheme().points() instanceof Repetitions repetitions
                ? Optional.of(judge(evidence, repetitions))
                : Optional.empty();
    }

    private static Ground judge(Evidence evidence, Repetitions repetitions) {
        Accumulator sums = evidence.total();
        int end = sums.count() == 0 ? 0 : (int) sums.max(Repetitions.COMPONENTS - 1);
        if (end > 0) {
            return Ground.doubted(
                    "mixing",
                    Strength.OBJECTION,
                    "a repetition gave up: " + SplittingOutcome.End.values()[end].words(),
                    "Look at the nominal draw and at the event; where it is possible, take more particles, or"
                            + " independent points from other densities");
        }
        var steps = SplittingSteps.of(sums, 0, repetitions.splitting().particles());
        if (steps.repetitions() < SplittingSteps.LEAST) {
            return Ground.notDone(
                    "mixing",
                    "Whether the particles moved far enough shows from %d repetitions on; there are %d"
                            .formatted(SplittingSteps.LEAST, steps.repetitions()),
                    "Make more draws");
        }
        if (sums.max(1) > 0) {
            return Ground.doubted(
                    "mixing",
                    Strength.NOTE,
                    "particles stood equally far from the event, as separate values of an input put them: how far"
                            + " they moved cannot be judged by how often they were replaced",
                    "Compare with a lane of independent points");
        }
        return judge(evidence, steps);
    }

    private static Ground judge(Evidence evidence, SplittingSteps steps) {
        var dispersion = steps.dispersion();
        if (Double.isNaN(dispersion.chance())) {
            return Ground.shown("mixing", "every particle began in the event");
        }
        double ratio = dispersion.statistic() / dispersion.degrees();
        String text = "replacements vary %s times as Poisson numbers do in %s repetitions"
                .formatted(Numbers.ratio(ratio), Numbers.count(steps.repetitions()));
        if (dispersion.chance() < RARE && ratio > MUCH) {
            return Ground.doubted(
                    "mixing",
                    Strength.OBJECTION,
                    text + ": copies stay too near to what they copy, and the estimate may miss parts of the event",
                    "Take more particles, or independent points from other densities");
        }
        var ideal = steps.ideal(evidence.answers().getFirst().interval().level());
        var rounding = Rounding.of(steps.estimate(), ideal.halfWidth());
        return Ground.shown(
                "mixing",
                text
                        + "; where they do, the %s interval is %s to %s"
                                .formatted(ideal.percent(), rounding.down(ideal.low()), rounding.up(ideal.high())));
    }
}
