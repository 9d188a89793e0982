package dev.leadline.engine;

import dev.leadline.estimate.Extremes.Floor;
import java.util.IdentityHashMap;
import java.util.Map;
import java.util.Optional;
import java.util.concurrent.ExecutorService;
import java.util.concurrent.Executors;
import java.util.concurrent.Future;

/// Threads that compute items of work. Safe for all threads.
public final class Workers implements Crew, AutoCloseable {
    private final int threads;
    private final ExecutorService pool;
    private final ThreadLocal<Map<Recipe, ItemWork>> samplers = ThreadLocal.withInitial(IdentityHashMap::new);
    private volatile boolean cancelled;

    public Workers(int threads) {
        this.threads = threads;
        this.pool = Executors.newFixedThreadPool(
                threads,
                Thread.ofPlatform().daemon().name("leadline-worker-", 1).factory());
    }

    @Override
    public int ahead() {
        return 2 * threads + 1;
    }

    @Override
    public Future<Optional<ItemSums>> submit(Recipe recipe, Item item, Floor floor) {
        return pool.submit(
                () -> samplers.get().computeIfAbsent(recipe, Recipe::work).compute(item, floor, () -> cancelled));
    }

    /// Lets workers drop what they are at, between two blocks of draws.
    public void cancel() {
        cancelled = true;
    }

    @Override
    public void close() {
        cancel();
        pool.shutdown();
        pool.close();
    }
}
