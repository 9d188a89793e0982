package dev.leadline.ground;

import dev.leadline.density.ChiSquare;
import dev.leadline.ground.Ground.Strength;
import dev.leadline.numeric.Rounding;
import dev.leadline.scheme.Tuned;
import java.util.List;
import java.util.Optional;

/// Whether what the stages saw, in which a density to draw from was found, agrees with the run. Their draws enter no
/// answer, and their estimates are no repair of it.
final class Stages {
    /// Outcomes that are not 0, below which an estimate of a stage is not worth a judgement.
    private static final long FEWEST = 100;

    private static final double RARE = 1e-4;

    private Stages() {}

    static Optional<Ground> judge(Evidence evidence) {
        return evidence.trace().scheme().tuned().map(tuned -> judge(evidence, tuned));
    }

    private static Ground judge(Evidence evidence, Tuned tuned) {
        var answer = evidence.answers().getFirst();
        List<Tuned.Stage> seen = tuned.stages().stream()
                .filter(stage -> stage.hits() >= FEWEST && stage.standardError() > 0)
                .toList();
        if (seen.isEmpty() || !(answer.standardError() > 0)) {
            return Ground.notDone(
                    "stages",
                    "No stage of the search for a density saw enough to be compared with the run",
                    "Compare with a lane of the inputs' own densities");
        }
        double chi = 0;
        for (var stage : seen) {
            double error = StrictMath.hypot(stage.standardError(), answer.standardError());
            double off = (stage.estimate() - answer.estimate()) / error;
            chi += off * off;
        }
        double chance = new ChiSquare(seen.size()).survival(chi);
        String text = "%d of %d stages of the search can be compared with the run: chi-square %s, chance of more %s"
                .formatted(seen.size(), tuned.stages().size(), Numbers.ratio(chi), Rounding.atMost(chance));
        return chance < RARE
                ? Ground.doubted(
                        "stages",
                        Strength.CAUTION,
                        text + ": the density that was found may miss what earlier stages saw",
                        "Compare with a lane of the inputs' own densities, or raise nominalShare")
                : Ground.shown("stages", text);
    }
}
