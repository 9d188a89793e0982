package dev.leadline.engine;

import dev.leadline.scheme.Stretch;

/// Items of growing points: 64 draws, doubling every 8 items to 65,536, each rounded up to whole observations.
///
/// Small items give a first answer soon, large ones cost nothing to merge. The order of merging shows in the last bits.
record GrowingItems(int drawsPerObservation) implements Items {
    private static final int SMALLEST = 64;
    private static final int LARGEST = 65_536;
    private static final int PER_SIZE = 8;
    private static final int SIZES = Integer.numberOfTrailingZeros(LARGEST / SMALLEST) + 1;

    @Override
    public Item at(long index) {
        int size = (int) Math.min(index / PER_SIZE, SIZES - 1);
        return new Item(
                new Stretch(index, 0, 0), before(size) + (index - (long) size * PER_SIZE) * draws(size), draws(size));
    }

    @Override
    public Item holding(long draw) {
        int size = 0;
        while (size < SIZES - 1 && before(size + 1) <= draw) {
            size++;
        }
        return at((long) size * PER_SIZE + (draw - before(size)) / draws(size));
    }

    @Override
    public long whole(long draws) {
        return draws / drawsPerObservation * drawsPerObservation;
    }

    /// Draws of the item before they are rounded up.
    static long nominal(long index) {
        return (long) SMALLEST << Math.min(index / PER_SIZE, SIZES - 1);
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
