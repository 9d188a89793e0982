package dev.leadline.ground;

import dev.leadline.estimate.Estimand;
import dev.leadline.estimate.Outermost;
import dev.leadline.ground.Ground.Strength;
import dev.leadline.interval.Student;
import java.util.Arrays;
import java.util.Optional;

/// Whether an event has been seen often enough, and its opposite too. The rarer of the two counts; 25 of it is common
/// practice.
final class Hits {
    private static final long ENOUGH = 25;

    private Hits() {}

    static Optional<Ground> judge(Evidence evidence, int k) {
        var answer = evidence.answers().get(k);
        if (answer.hits().isEmpty() || answer.observations() == 0) {
            return answer.estimand() instanceof Estimand.Probability && answer.observations() > 0
                    ? evidence.trace()
                            .outermost()
                            .filter(_ -> evidence.trace().scheme().isWeighted())
                            .map(draws -> weighted(evidence, draws, k))
                            .or(() -> folded(evidence, k))
                    : Optional.empty();
        }
        return judged(evidence, k, answer.hits().getAsLong(), answer.observations());
    }

    /// Of observations that are means of several draws: the sum of their hits. Those of splitting are none.
    private static Optional<Ground> folded(Evidence evidence, int k) {
        if (!evidence.answers().get(k).interval().kind().equals(Student.KIND)) {
            return Optional.empty();
        }
        double mean = evidence.total().mean(evidence.component(k));
        if (evidence.trace().scheme().allotted().isPresent() && mean > 0 && mean < 1) {
            // Cells count alike and have different numbers of draws: hits do not follow from their share.
            return Optional.empty();
        }
        double draws = evidence.total().count() * evidence.drawsPerObservation();
        return judged(evidence, k, Math.round(mean * draws), Math.round(draws));
    }

    private static Optional<Ground> judged(Evidence evidence, int k, long hits, long all) {
        long misses = all - hits;
        long rarer = Math.min(hits, misses);
        String of = evidence.of(k);
        String what = hits <= misses ? "hit" : "miss";
        String draws = Numbers.count(all) + (all == 1 ? " draw" : " draws");
        if (rarer >= ENOUGH) {
            return Optional.of(
                    Ground.shown("hits", of + "%s %s in %s".formatted(Numbers.count(rarer), plural(what), draws)));
        }
        String text = rarer == 0
                ? "no %s in %s: a part of probability below %s may be unseen"
                        .formatted(what, draws, Numbers.value(Math.min(1, 3.0 / (all * leastShare(evidence)))))
                : "only %d %s in %s".formatted(rarer, rarer == 1 ? what : plural(what), draws);
        return Optional.of(Ground.doubted(
                "hits",
                Strength.CAUTION,
                of + text,
                "Make more draws: %d %s or more are wanted".formatted(ENOUGH, plural(what))));
    }

    /// Draws of the cell that has fewest, over the even share; 1 where nothing is shared.
    private static double leastShare(Evidence evidence) {
        return evidence.trace()
                .scheme()
                .allotted()
                .map(found -> 1 / Arrays.stream(found.counts()).max().orElseThrow())
                .orElse(1.0);
    }

    /// A miss needs no weight, so that only hits count.
    private static Ground weighted(Evidence evidence, Outermost draws, int k) {
        long hits = draws.of(evidence.component(k)).nonzero();
        String text = evidence.of(k)
                + "%s %s in %s weighted draws"
                        .formatted(
                                hits < ENOUGH && hits > 0 ? "only " + hits : Numbers.count(hits),
                                hits == 1 ? "hit" : "hits",
                                Numbers.count(draws.draws()));
        return hits >= ENOUGH
                ? Ground.shown("hits", text)
                : Ground.doubted(
                        "hits",
                        Strength.CAUTION,
                        text,
                        "Make more draws, or draw from densities nearer to the event: %d hits or more are wanted"
                                .formatted(ENOUGH));
    }

    private static String plural(String what) {
        return what.equals("hit") ? "hits" : "misses";
    }
}
