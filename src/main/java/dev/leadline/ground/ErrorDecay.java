package dev.leadline.ground;

import dev.leadline.ground.Ground.Strength;
import dev.leadline.scheme.Replicated;
import dev.leadline.trace.Answer;
import dev.leadline.trace.Mark;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;

/// How fast the error falls: the power of the draws that fits it at marks about a factor of two apart.
/// Independent observations have -1/2, replicated points up to -3/2. Kinks and jumps of the outcome lie
/// between: that is explained, not doubted, for the interval from replicates does not need a rate. Slower
/// than independent draws is a doubt.
final class ErrorDecay {
    private static final double SLOW = -.35;
    private static final double GAINING = -.6;
    private static final double SMOOTH = -1.2;

    private static final double APART = .5;
    private static final int FEWEST = 5;

    /// Draws, observations and hits below which an error is not worth a fit.
    private static final long FIRST = 500;

    private static final long FEWEST_OBSERVATIONS = 10;
    private static final long FEWEST_HITS = 25;

    private ErrorDecay() {}

    static Optional<Ground> judge(Evidence evidence, int k) {
        List<Mark> marks = thinned(evidence.trace().marks(), k);
        if (marks.size() < FEWEST) {
            return Optional.empty();
        }
        double slope = slope(marks, k);
        String text = evidence.of(k)
                + "over a factor of %s in draws the error falls like n to the power %s"
                        .formatted(
                                Numbers.about((double) marks.getFirst().draws()
                                        / marks.getLast().draws()),
                                Numbers.hundredths(slope));
        if (slope > SLOW) {
            return Optional.of(Ground.doubted(
                    "error-decay",
                    Strength.CAUTION,
                    text + ", more slowly than that of independent draws, -0.5",
                    "Look for rare, large outcomes and draw them more often: more draws help less than they should",
                    new Action.DrawWider()));
        }
        boolean isReplicated = evidence.trace().scheme().points() instanceof Replicated;
        return Optional.of(Ground.shown(
                "error-decay",
                text
                        + (!isReplicated
                                ? "; independent observations have -0.5"
                                : slope <= SMOOTH
                                        ? ", as these points have it for smooth outcomes"
                                        : slope <= GAINING
                                                ? ": faster than independent draws, -0.5, and slower than smooth outcomes"
                                                        + " let it, -1.5, as kinks and jumps make it"
                                                : ": no faster than that of independent draws, -0.5, as many jumps or many"
                                                        + " inputs make it")));
    }

    /// The newest mark, then older ones.
    private static List<Mark> thinned(List<Mark> marks, int k) {
        var thinned = new ArrayList<Mark>();
        double next = Double.POSITIVE_INFINITY;
        for (int i = marks.size() - 1; i >= 0; i--) {
            Mark mark = marks.get(i);
            if (mark.draws() < FIRST) {
                break;
            }
            if (mark.draws() <= next) {
                if (!isKnown(mark.answers().get(k))) {
                    break;
                }
                thinned.add(mark);
                next = APART * mark.draws();
            }
        }
        return thinned;
    }

    private static boolean isKnown(Answer answer) {
        boolean isSeldom = answer.hits().isPresent()
                && Math.min(
                                answer.hits().getAsLong(),
                                answer.observations() - answer.hits().getAsLong())
                        < FEWEST_HITS;
        return error(answer) > 0 && !isSeldom && answer.observations() >= FEWEST_OBSERVATIONS;
    }

    /// A quantile has no standard error.
    private static double error(Answer answer) {
        return Double.isNaN(answer.standardError()) ? answer.interval().halfWidth() : answer.standardError();
    }

    private static double slope(List<Mark> marks, int k) {
        int n = marks.size();
        double[] x =
                marks.stream().mapToDouble(mark -> StrictMath.log(mark.draws())).toArray();
        double[] y = marks.stream()
                .mapToDouble(mark -> StrictMath.log(error(mark.answers().get(k))))
                .toArray();
        double meanX = Arrays.stream(x).sum() / n;
        double meanY = Arrays.stream(y).sum() / n;
        double products = 0;
        double squares = 0;
        for (int i = 0; i < n; i++) {
            products += (x[i] - meanX) * (y[i] - meanY);
            squares += (x[i] - meanX) * (x[i] - meanX);
        }
        return products / squares;
    }
}
