package dev.leadline.engine;

/// The fixed table of item sizes: 64 draws, doubling every 8 items to 65,536, each rounded up to whole observations.
///
/// Small items give a first answer soon, large ones cost nothing to merge. The table must not depend on the number of
/// threads, on speed or on the budget: results are merged in item order, and the order of merging shows in the last
/// bits.
public final class Items {
    private static final int SMALLEST = 64;
    private static final int LARGEST = 65_536;
    private static final int PER_SIZE = 8;
    private static final int SIZES = Integer.numberOfTrailingZeros(LARGEST / SMALLEST) + 1;

    private final int drawsPerObservation;

    public Items(int drawsPerObservation) {
        this.drawsPerObservation = drawsPerObservation;
    }

    public Item at(long index) {
        int size = (int) Math.min(index / PER_SIZE, SIZES - 1);
        return new Item(index, before(size) + (index - (long) size * PER_SIZE) * draws(size), draws(size));
    }

    /// The item that holds the draw with index `draw`.
    public Item holding(long draw) {
        int size = 0;
        while (size < SIZES - 1 && before(size + 1) <= draw) {
            size++;
        }
        return at((long) size * PER_SIZE + (draw - before(size)) / draws(size));
    }

    private int draws(int size) {
        return Math.ceilDiv(SMALLEST << size, drawsPerObservation) * drawsPerObservation;
    }

    private long before(int size) {
        long draws = 0;
        for (int smaller = 0; smaller < size; smaller++) {
            draws += (long) PER_SIZE * draws(smaller);
        }
        return draws;
    }
}
