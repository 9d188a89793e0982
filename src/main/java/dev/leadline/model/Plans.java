package dev.leadline.model;

import dev.leadline.model.Draft.StopDraft;
import dev.leadline.numeric.Shortest;
import dev.leadline.problem.Nearest;
import dev.leadline.problem.Problem;
import java.security.SecureRandom;
import java.util.OptionalDouble;
import java.util.Set;

/// Makes what a plan says beside its lanes of its draft.
final class Plans {

    private Plans() {}

    static Stop stop(Draft draft, Findings findings) {
        return draft.stop()
                .map(given -> stop(given, findings))
                .orElse(new Stop(Stop.USUAL_DRAWS, OptionalDouble.empty()));
    }

    private static Stop stop(StopDraft draft, Findings findings) {
        if (!draft.rule().equals(Stop.FIXED)) {
            Problem problem = Problem.of("the stop rule \"%s\" is not available".formatted(draft.rule()))
                    .because(
                            "The rule here is \"fixed\": a number of draws, or of seconds. A tolerance is judged at the end.");
            findings.add(
                    "$.stop.rule",
                    Nearest.to(draft.rule(), Set.of(Stop.FIXED))
                            .map(near -> problem.tryThis("Was \"%s\" meant?".formatted(near)))
                            .orElse(problem.tryThis("Write \"stop\": {\"rule\": \"fixed\", \"draws\": 1000000}.")));
        }
        draft.draws().ifPresent(draws -> {
            if (draws < 1 || draws > Stop.MOST_DRAWS) {
                findings.add(
                        "$.stop.draws",
                        "draws is %d but must be from 1 to %d".formatted(draws, Stop.MOST_DRAWS),
                        "It is the number of evaluations.");
            }
        });
        draft.seconds().ifPresent(seconds -> {
            if (!(seconds > 0 && Double.isFinite(seconds))) {
                findings.add(
                        "$.stop.seconds",
                        "seconds is %s but must be greater than 0".formatted(Shortest.text(seconds)),
                        "It is the time a lane may compute.");
            }
        });
        long unsaid = draft.seconds().isPresent() ? Stop.MOST_DRAWS : Stop.USUAL_DRAWS;
        return new Stop(draft.draws().orElse(unsaid), draft.seconds());
    }

    /// Drawn where the draft names none, below 2^53 so that every reader of JSON keeps its digits.
    static long seed(Draft draft, Findings findings) {
        long seed = draft.seed().orElseGet(() -> new SecureRandom().nextLong(1L << 53));
        if (seed < 0) {
            findings.add("$.seed", "seed is %d but must be 0 or more".formatted(seed), "It picks the random numbers.");
        }
        return seed;
    }
}
