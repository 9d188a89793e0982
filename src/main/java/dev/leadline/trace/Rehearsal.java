package dev.leadline.trace;

import dev.leadline.model.Tolerance;
import java.util.List;
import java.util.Optional;
import java.util.OptionalInt;
import java.util.stream.IntStream;

/// A lane's set-up repeated from fresh random numbers: does its interval hold?
///
/// @param lane its name
/// @param scheme in words
/// @param draws asked of each repetition; where a rule ends it sooner, the most there may be
/// @param meanDraws made by the repetitions on average
/// @param wanted repetitions asked for; fewer are there while it goes on, and where it was cancelled
/// @param tolerance on the first answer
/// @param met repetitions that meet it, by the rule they stop by
/// @param answers one for each thing asked, in order
public record Rehearsal(
        String lane,
        String scheme,
        long draws,
        double meanDraws,
        int wanted,
        Optional<Tolerance> tolerance,
        int met,
        List<Rehearsed> answers) {
    public Rehearsal {
        answers = List.copyOf(answers);
    }

    /// Repetitions that were made.
    public int repetitions() {
        return answers.getFirst().repetitions().size();
    }

    /// Repetitions in which every interval holds its value; empty where there is one answer.
    public OptionalInt heldTogether() {
        return answers.size() < 2
                ? OptionalInt.empty()
                : OptionalInt.of((int) IntStream.range(0, repetitions())
                        .filter(r -> answers.stream()
                                .allMatch(answer ->
                                        answer.holds(answer.repetitions().get(r))))
                        .count());
    }

    /// Repetitions whose first estimate is within the tolerance of the value; empty without one.
    public OptionalInt near() {
        double value = first().sought().value();
        return tolerance
                .map(asked -> OptionalInt.of((int) first().repetitions().stream()
                        .filter(one -> asked.isNear(one.estimate(), value))
                        .count()))
                .orElse(OptionalInt.empty());
    }

    private Rehearsed first() {
        return answers.getFirst();
    }
}
