package dev.leadline.ground;

import dev.leadline.ground.Ground.Strength;
import dev.leadline.interval.ToRounding;
import dev.leadline.model.Question;
import dev.leadline.trace.Rehearsal;
import dev.leadline.trace.Trace;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;

/// The reasons for and against signing what a lane has shown.
public final class Grounds {
    private Grounds() {}

    /// Doubts first, strongest first, then what was shown, then what was not done; none before the first mark.
    public static List<Ground> of(Question question, Trace trace) {
        return of(question, trace, Optional.empty());
    }

    /// @param rehearsal what a rehearsal of this set-up came to, where one was made
    public static List<Ground> of(Question question, Trace trace, Optional<Rehearsal> rehearsal) {
        if (trace.last().isEmpty()) {
            return List.of();
        }
        var evidence = Evidence.of(question, trace);
        var grounds = new ArrayList<Ground>();
        for (int k = 0; k < evidence.answers().size(); k++) {
            Hits.judge(evidence, k).ifPresent(grounds::add);
            TailDraws.judge(evidence, k).ifPresent(grounds::add);
            if (evidence.answers().get(k).interval().kind().equals(ToRounding.KIND)) {
                grounds.add(Ground.shown(
                        "spread", evidence.of(k) + "every draw gives the same value up to rounding, by its weight"));
                continue;
            }
            Spread.judge(evidence, k).ifPresent(grounds::add);
            Settled.judge(evidence, k).ifPresent(grounds::add);
            Skewness.judge(evidence, k).ifPresent(grounds::add);
            Tail.judge(evidence, k).ifPresent(grounds::add);
            VarianceOfVariance.judge(evidence, k).ifPresent(grounds::add);
            LargestShare.judge(evidence, k).ifPresent(grounds::add);
            EffectiveSize.judge(evidence, k).ifPresent(grounds::add);
            ErrorDecay.judge(evidence, k).ifPresent(grounds::add);
            Resolution.judge(evidence, k).ifPresent(grounds::add);
            AtomAtQuantile.judge(evidence, k).ifPresent(grounds::add);
            NoInterval.judge(evidence, k).ifPresent(grounds::add);
        }
        Tail.judgeWeights(evidence).ifPresent(grounds::add);
        MeanWeight.judge(evidence).ifPresent(grounds::add);
        Mixing.judge(evidence).ifPresent(grounds::add);
        Stages.judge(evidence).ifPresent(grounds::add);
        grounds.addAll(Audit.judge(evidence));
        grounds.addAll(ControlVariates.judge(evidence));
        grounds.add(FailedEvaluations.judge(evidence));
        NumericalTolerance.judge(evidence).ifPresent(grounds::add);
        grounds.add(AgainstReference.judge(evidence));
        HiddenRegion.judge(evidence).ifPresent(grounds::add);
        grounds.addAll(Rehearsals.judge(evidence, rehearsal));
        grounds.add(EarlierRuns.judge());
        grounds.sort(Comparator.comparing(Ground::status, Comparator.comparingInt(Grounds::rank))
                .thenComparing(
                        ground -> ground.strength().map(Strength::ordinal).orElse(0), Comparator.reverseOrder()));
        return List.copyOf(grounds);
    }

    private static int rank(Ground.Status status) {
        return switch (status) {
            case DOUBTED -> 0;
            case SHOWN -> 1;
            case NOT_DONE -> 2;
        };
    }
}
