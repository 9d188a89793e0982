package dev.leadline.ground;

import dev.leadline.estimate.Accumulator;
import dev.leadline.estimate.Estimate;
import dev.leadline.estimate.Outermost;
import dev.leadline.model.Components;
import dev.leadline.model.Question;
import dev.leadline.scheme.Proposal;
import dev.leadline.trace.Answer;
import dev.leadline.trace.Answers;
import dev.leadline.trace.Trace;
import java.util.List;
import java.util.stream.IntStream;

/// What grounds are judged by: a question, what a lane has shown of it, and the sums that follow.
///
/// @param answers at the newest mark
/// @param total sums of every observation
/// @param halves sums of the first and of the second half
record Evidence(Question question, Trace trace, List<Answer> answers, Accumulator total, List<Accumulator> halves) {
    static Evidence of(Question question, Trace trace) {
        return new Evidence(question, trace, trace.last().orElseThrow().answers(), trace.total(), trace.halves());
    }

    /// Evaluations behind the answers.
    long draws() {
        return trace.last().orElseThrow().draws();
    }

    /// What some of the observations say of an answer.
    Estimate estimate(Accumulator sums, int answer) {
        return Answers.estimate(question, trace.scheme(), sums, answer);
    }

    /// The first component of an answer.
    int component(int answer) {
        return Components.first(question.asks(), answer);
    }

    /// The components of an answer whose tails its error follows from; none where they were not looked at.
    List<Outermost.Component> outermost(int answer) {
        return trace.outermost()
                .map(seen -> IntStream.range(
                                0, Components.of(answers.get(answer).estimand()))
                        .mapToObj(c -> seen.of(component(answer) + c))
                        .filter(Outermost.Component::isSeen)
                        .toList())
                .orElse(List.of());
    }

    /// Whether weights are divided by their sum, so that they enter the answers by themselves.
    boolean isSelfNormalised() {
        return trace.scheme().drawFrom().filter(Proposal::selfNormalised).isPresent();
    }

    /// Draws whose mean is an observation, those of a replicate so far where it is one.
    double drawsPerObservation() {
        return (double) draws() / (total.count() + total.excluded());
    }

    /// What to call an answer in a sentence, with a colon; nothing where there is only one.
    String of(int answer) {
        if (answers.size() == 1) {
            return "";
        }
        String label = answers.get(answer).label();
        return (label.isEmpty() ? "answer " + (answer + 1) : label) + ": ";
    }
}
