package dev.leadline.study;

import dev.leadline.engine.Timing;
import dev.leadline.estimate.Logarithm;
import dev.leadline.interval.Ratio;
import dev.leadline.model.Lane;
import dev.leadline.model.Question;
import dev.leadline.trace.Trace;
import java.util.List;
import java.util.Optional;
import java.util.stream.IntStream;
import java.util.stream.Stream;

/// Two lanes of a question compared by their first answer. Ratios are of A over B, above 1 where B is better.
///
/// The ratio of variances per draw is judged on its logarithm, by what it becomes when observations are left out; where
/// lanes share their random numbers the same draws are left out of both. Variances are never compared by an F test,
/// which holds for normal observations only.
///
/// @param a name of the one lane
/// @param b name of the other
/// @param varianceRatio of the variances per draw; empty where it cannot be judged yet
/// @param timeRatio of the seconds per draw; empty where draws were not timed
/// @param efficiencyRatio of what the same error costs in time
/// @param paired whether both drew the same random numbers, and that was counted
/// @param needs draws of each lane to the tolerance, where there is one and it can be said
/// @param notes what must be known to read it
public record Comparison(
        String a,
        String b,
        Outcome outcome,
        Optional<Ratio> varianceRatio,
        Optional<Ratio> timeRatio,
        Optional<Ratio> efficiencyRatio,
        boolean paired,
        List<Need> needs,
        String sentence,
        List<String> notes) {
    public Comparison {
        needs = List.copyOf(needs);
        notes = List.copyOf(notes);
    }

    /// What is known of the variances per draw.
    public enum Outcome {
        A_BETTER,
        B_BETTER,
        /// They are equal, or nearly.
        NO_DIFFERENCE,
        CANNOT_TELL
    }

    /// Of a logarithm that is less certain, limits of 95 % are no more than guesses: as of an event that was hit less
    /// than four times.
    static final double MOST_ERROR = .5;

    /// Ratios from one over it to itself pass for no difference.
    static final double NEARLY_ONE = 1.25;

    /// Empty where one of them has shown nothing yet.
    public static Optional<Comparison> of(Question question, Lane a, Trace traceA, Lane b, Trace traceB) {
        return of(question, a, traceA, b, traceB, question.confidence(), Optional.empty());
    }

    /// Of the first lane with each other one.
    static List<Comparison> ofFirst(Question question, List<Lane> lanes, List<Trace> traces) {
        return IntStream.range(1, lanes.size())
                .mapToObj(i -> of(question, lanes.getFirst(), traces.getFirst(), lanes.get(i), traces.get(i)))
                .flatMap(Optional::stream)
                .toList();
    }

    /// With the time that draws take.
    public static Optional<Comparison> timed(
            Question question, Lane a, Trace traceA, Lane b, Trace traceB, Timing timing) {
        return of(question, a, traceA, b, traceB, question.confidence(), Optional.of(timing));
    }

    /// @param level of confidence of each interval
    static Optional<Comparison> of(
            Question question, Lane a, Trace traceA, Lane b, Trace traceB, double level, Optional<Timing> timing) {
        return traceA.last().isEmpty() || traceB.last().isEmpty()
                ? Optional.empty()
                : Optional.of(of(
                        question,
                        new Contender(question, a, traceA),
                        new Contender(question, b, traceB),
                        level,
                        timing));
    }

    private static Comparison of(Question question, Contender a, Contender b, double level, Optional<Timing> timing) {
        boolean paired = a.isPairedWith(b);
        Optional<Logarithm> variance = paired
                ? Contender.paired(a, b)
                : a.variance().flatMap(one -> b.variance().map(one::minus));
        Optional<Ratio> ratio = variance.map(log -> Ratio.of(log, level));
        Optional<Ratio> time = timing.map(Timing::ratio).map(log -> Ratio.of(log, level));
        Optional<Ratio> efficiency =
                variance.flatMap(log -> timing.map(Timing::ratio).map(log::plus).map(both -> Ratio.of(both, level)));
        var outcome = variance.map(log -> outcome(log, ratio.orElseThrow())).orElse(Outcome.CANNOT_TELL);
        var text = new ComparisonText(question, a, b);
        return new Comparison(
                a.lane().name(),
                b.lane().name(),
                outcome,
                ratio,
                time,
                efficiency,
                paired,
                Stream.of(
                                Need.of(question, a, timing.map(Timing::first)),
                                Need.of(question, b, timing.map(Timing::second)))
                        .flatMap(Optional::stream)
                        .toList(),
                text.sentence(outcome, variance, ratio) + text.time(outcome, time, efficiency),
                text.notes(paired));
    }

    private static Outcome outcome(Logarithm variance, Ratio ratio) {
        if (variance.standardError() > MOST_ERROR) {
            return Outcome.CANNOT_TELL;
        }
        if (!ratio.holdsOne()) {
            return ratio.low() > 1 ? Outcome.B_BETTER : Outcome.A_BETTER;
        }
        return ratio.low() > 1 / NEARLY_ONE && ratio.high() < NEARLY_ONE ? Outcome.NO_DIFFERENCE : Outcome.CANNOT_TELL;
    }
}
