package dev.leadline.model;

import dev.leadline.estimate.Regression;
import dev.leadline.problem.Problem;
import dev.leadline.scheme.Growing;
import dev.leadline.scheme.LatinHypercube;
import dev.leadline.scheme.Repetitions;
import dev.leadline.scheme.Replicated;
import java.security.SecureRandom;
import java.util.Locale;
import java.util.Optional;

/// Makes what a plan says beside its lanes of its draft.
final class Plans {

    private Plans() {}

    /// What is wrong where so many draws are no whole observation of the lane, or too few to fit its control variates:
    /// it would have no answer.
    static Optional<Problem> tooFew(Lane lane, long draws) {
        long fewest = fewest(lane);
        return draws >= fewest
                ? Optional.empty()
                : Optional.of(Problem.of("lane %s has no answer of %s".formatted(lane.name(), words(draws)))
                        .because(why(lane, fewest))
                        .tryThis("Make at least ten times as many, or choose a scheme that needs fewer."));
    }

    private static long fewest(Lane lane) {
        long one = lane.scheme().fewestDraws();
        int controls = lane.scheme().controls().size();
        return controls == 0
                ? one
                : switch (lane.scheme().points()) {
                    case LatinHypercube cubes when cubes.points().isEmpty() -> one;
                    case Growing _ -> one * Regression.fewest(controls);
                    case Replicated _, Repetitions _ -> one;
                };
    }

    private static String why(Lane lane, long fewest) {
        return switch (lane.scheme().points()) {
            case Replicated points ->
                "The first point of each of its %d replicates takes %s.".formatted(points.replicates(), words(fewest));
            case LatinHypercube cubes
            when cubes.points().isEmpty() ->
                "A point for each of its %d cubes takes %s.".formatted(cubes.replicates(), words(fewest));
            case Growing _, Repetitions _ ->
                lane.scheme().controls().isEmpty()
                        ? "One observation of its scheme is the mean of %s.".formatted(words(fewest))
                        : "To fit its control variates takes %s.".formatted(words(fewest));
        };
    }

    private static String words(long draws) {
        return String.format(Locale.ROOT, "%,d draw%s", draws, draws == 1 ? "" : "s");
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
