package dev.leadline.engine;

import java.util.Optional;
import java.util.function.BooleanSupplier;

/// Computes items of work. Scratch of one worker, confined to it; what it returns is a pure function of the recipe and
/// the item.
public interface ItemWork {
    /// @param cancelled looked at between blocks of draws
    /// @return empty where cancelled
    Optional<ItemSums> compute(Item item, BooleanSupplier cancelled);
}
