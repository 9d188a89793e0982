package dev.leadline.engine;

import dev.leadline.estimate.Extremes.Floor;
import java.util.Optional;
import java.util.concurrent.Future;

/// Who computes the items of work of a run.
public interface Crew {
    /// How many items to have under way at once, so that nobody waits for the one that merges.
    int ahead();

    /// @param floor which values can be outermost
    /// @return empty where cancelled before its end
    Future<Optional<ItemSums>> submit(Recipe recipe, Item item, Floor floor);
}
