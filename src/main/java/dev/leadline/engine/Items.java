package dev.leadline.engine;

import dev.leadline.scheme.Growing;
import dev.leadline.scheme.Repetitions;
import dev.leadline.scheme.Replicated;
import dev.leadline.scheme.Scheme;
import java.util.Optional;

/// The items of work of a lane, in the order in which they are merged: a fixed table, which must not depend on the
/// number of threads, on speed or on the budget. Immutable, safe for all threads.
public sealed interface Items permits GrowingItems, Rounds, RepetitionItems {
    static Items of(Scheme scheme) {
        return switch (scheme.points()) {
            case Growing growing -> new GrowingItems(scheme.drawsPerObservation());
            case Replicated replicated -> new Rounds(replicated.replicates(), replicated.mostPoints());
            case Repetitions repetitions -> new RepetitionItems(repetitions.most());
        };
    }

    Item at(long index);

    /// The item as far as it lies within a budget of draws; empty beyond.
    default Optional<Item> within(long index, long budget) {
        Item item = at(index);
        return item.firstDraw() < budget ? Optional.of(item.first(budget - item.firstDraw())) : Optional.empty();
    }

    /// The item that holds the draw with index `draw`.
    Item holding(long draw);

    /// Index of the last item of a run of so many draws, as far as that is known beforehand.
    default long last(long draws) {
        return holding(Math.max(0, whole(draws) - 1)).stretch().item();
    }

    /// Of so many draws, those that are made: whole observations, or whole rounds.
    long whole(long draws);
}
