package dev.leadline.density;

import java.lang.ref.WeakReference;
import java.util.HashMap;
import java.util.LinkedHashMap;
import java.util.Map;
import java.util.concurrent.CancellationException;
import java.util.concurrent.ExecutionException;
import java.util.concurrent.Future;
import java.util.concurrent.FutureTask;

/// The curves of the shapes that are in use, and of those used last, so that inputs of one shape share one. Safe for
/// all threads: a shape that two threads ask for at once is built once, by the thread that asked first.
final class Curves {
    /// Curves, and bytes of them, above which those used longest ago are forgotten, unless in use.
    private static final int KEPT = 128;

    private static final long BYTES = 1L << 27;

    private static final Map<Density, FutureTask<Curve>> LAST_USED = new LinkedHashMap<>(16, 0.75f, true);

    /// Curves that someone draws from, however many there are.
    private static final Map<Density, WeakReference<Curve>> IN_USE = new HashMap<>();

    /// When those no longer in use are next forgotten: as often as their number doubles.
    private static int full = KEPT;

    private Curves() {}

    static Curve of(Density shape) {
        FutureTask<Curve> task;
        synchronized (LAST_USED) {
            task = LAST_USED.computeIfAbsent(shape, _ -> new FutureTask<>(() -> inUseOrBuilt(shape)));
        }
        task.run();
        try {
            var curve = task.get();
            forget(shape);
            return curve;
        } catch (InterruptedException e) {
            Thread.currentThread().interrupt();
            throw new CancellationException();
        } catch (ExecutionException e) {
            throw new IllegalStateException("no table of " + shape, e.getCause());
        }
    }

    private static Curve inUseOrBuilt(Density shape) {
        synchronized (IN_USE) {
            var known = IN_USE.get(shape);
            var curve = known == null ? null : known.get();
            if (curve != null) {
                return curve;
            }
        }
        var built = build(shape);
        synchronized (IN_USE) {
            if (IN_USE.size() >= full) {
                IN_USE.values().removeIf(reference -> reference.get() == null);
                full = Math.max(KEPT, 2 * IN_USE.size());
            }
            IN_USE.put(shape, new WeakReference<>(built));
        }
        return built;
    }

    private static void forget(Density asked) {
        synchronized (LAST_USED) {
            long bytes = bytes();
            var eldest = LAST_USED.entrySet().iterator();
            while (eldest.hasNext() && (LAST_USED.size() > KEPT || bytes > BYTES)) {
                var entry = eldest.next();
                if (entry.getValue().state() == Future.State.SUCCESS
                        && !entry.getKey().equals(asked)) {
                    bytes -= entry.getValue().resultNow().bytes();
                    eldest.remove();
                }
            }
        }
    }

    /// What is kept of all shapes together.
    static long bytes() {
        synchronized (LAST_USED) {
            return LAST_USED.values().stream()
                    .filter(task -> task.state() == Future.State.SUCCESS)
                    .mapToLong(task -> task.resultNow().bytes())
                    .sum();
        }
    }

    static Curve build(Density shape) {
        return switch (shape) {
            case ClosedForm form -> Exact.of(shape, form);
            case Density _ when shape.isDiscrete() -> Staircase.of(shape);
            default -> TableFit.of(shape);
        };
    }
}
