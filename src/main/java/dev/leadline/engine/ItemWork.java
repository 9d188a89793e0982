package dev.leadline.engine;

import dev.leadline.estimate.Extremes.Floor;
import java.util.Optional;
import java.util.function.BooleanSupplier;

/// Computes items of work. Scratch of one worker, confined to it; what it returns is a pure function of the
/// recipe, the item and the floor.
public interface ItemWork {
    /// Without the outermost values.
    default Optional<ItemSums> compute(Item item, BooleanSupplier cancelled) {
        return compute(item, Floor.CLOSED, cancelled);
    }

    /// @param floor which values can be outermost: of the others only the sums are made
    /// @param cancelled looked at between blocks of draws
    /// @return empty where cancelled
    Optional<ItemSums> compute(Item item, Floor floor, BooleanSupplier cancelled);
}
