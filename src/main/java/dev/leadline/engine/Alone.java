package dev.leadline.engine;

import dev.leadline.estimate.Extremes.Floor;
import java.util.Optional;
import java.util.concurrent.CompletableFuture;
import java.util.concurrent.Future;
import java.util.function.BooleanSupplier;

/// Computes each item where it is submitted, on the thread that submits it: a small run needs no queue.
/// Confined to that thread.
final class Alone implements Crew {
    private final BooleanSupplier cancelled;
    private Recipe recipe;
    private ItemWork work;

    Alone(BooleanSupplier cancelled) {
        this.cancelled = cancelled;
    }

    @Override
    public int ahead() {
        return 1;
    }

    @Override
    public Future<Optional<ItemSums>> submit(Recipe of, Item item, Floor floor) {
        if (recipe != of) {
            recipe = of;
            work = of.work();
        }
        return CompletableFuture.completedFuture(work.compute(item, floor, cancelled));
    }
}
