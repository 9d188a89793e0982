package dev.leadline.engine;

import dev.leadline.scheme.Growing;
import dev.leadline.scheme.Replicated;
import dev.leadline.scheme.Scheme;

/// The items of work of a lane, in the order in which they are merged: a fixed table, which must not depend on the
/// number of threads, on speed or on the budget. Immutable, safe for all threads.
public sealed interface Items permits GrowingItems, Rounds {
    static Items of(Scheme scheme) {
        return switch (scheme.points()) {
            case Growing growing -> new GrowingItems(scheme.drawsPerObservation());
            case Replicated replicated -> new Rounds(replicated.replicates(), replicated.mostPoints());
        };
    }

    Item at(long index);

    /// The item that holds the draw with index `draw`.
    Item holding(long draw);

    /// Of so many draws, those that are made: whole observations, or whole rounds.
    long whole(long draws);
}
