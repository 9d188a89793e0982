package dev.leadline.engine;

import dev.leadline.model.Lane;
import dev.leadline.model.Question;
import dev.leadline.scheme.Adaptation;
import dev.leadline.scheme.Tuned;

/// Finds, before the run, the density that a lane wants to draw from, and then how many draws its cells get.
/// Its draws have a purpose of their own and enter no answer; what they teach is kept as it is for the whole
/// run.
final class Tuning {
    private Tuning() {}

    /// The lane with what was found for it; the lane itself where it wants nothing.
    static Lane found(Question question, Lane lane, long seed) {
        return Sharing.found(question, adapted(question, lane, seed), seed);
    }

    private static Lane adapted(Question question, Lane lane, long seed) {
        return lane.scheme()
                .adapted()
                .filter(Adaptation.class::isInstance)
                .map(Adaptation.class::cast)
                .map(wish -> lane.with(lane.scheme().with(found(question, lane, wish, seed))))
                .orElse(lane);
    }

    private static Tuned found(Question question, Lane lane, Adaptation wish, long seed) {
        return switch (wish.way()) {
            case CROSS_ENTROPY -> new CrossEntropy(question, lane, wish, seed).found();
            case GRID -> new Grid(question, lane, wish, seed).found();
        };
    }
}
