package dev.leadline.trace;

import dev.leadline.estimate.Accumulator;
import java.util.ArrayList;
import java.util.List;

/// The draws of a lane in at most 64 consecutive blocks of about equal size, so that halves can be compared and any
/// interval recomputed later. Confined to the run that feeds it.
///
/// A block closes once it has reached the current length; when there are 64, neighbours merge and the length doubles.
/// What it holds depends on the nominal sizes of the items alone, so that lanes of one table of items have the same
/// blocks, however many draws make an observation in each.
public final class Blocks {
    private static final int MOST = 64;

    private final List<Accumulator> blocks = new ArrayList<>();
    private final List<Long> sizes = new ArrayList<>();
    private long length = 1;

    /// @param item the sums of the next item of work; not changed
    /// @param size of the item, nominally
    public void add(Accumulator item, long size) {
        if (!blocks.isEmpty() && sizes.getLast() < length) {
            blocks.getLast().merge(item);
            sizes.set(sizes.size() - 1, sizes.getLast() + size);
            return;
        }
        if (blocks.size() == MOST) {
            halve();
        }
        blocks.add(item.copy());
        sizes.add(size);
    }

    /// Copies, oldest draws first.
    public List<Accumulator> snapshot() {
        return blocks.stream().map(Accumulator::copy).toList();
    }

    private void halve() {
        for (int i = 0; i < MOST / 2; i++) {
            var merged = blocks.get(2 * i);
            merged.merge(blocks.get(2 * i + 1));
            blocks.set(i, merged);
            sizes.set(i, sizes.get(2 * i) + sizes.get(2 * i + 1));
        }
        blocks.subList(MOST / 2, MOST).clear();
        sizes.subList(MOST / 2, MOST).clear();
        length = Math.max(2 * length, sizes.getFirst());
    }
}
