package dev.leadline.engine;

import dev.leadline.scheme.Stretch;

/// Items of replicated points. Round 0 takes all replicates to their first point, round m from `2^(m-1)` to `2^m`
/// points, up to the most that the points have; within a round one replicate comes after the other, each in parts of at
/// most 65,536 draws.
record Rounds(int replicates, long mostPoints) implements Items {
    private static final int LARGEST = 65_536;

    @Override
    public Item at(long index) {
        int round = 0;
        long left = index;
        while (left >= replicates * parts(round)) {
            left -= replicates * parts(round);
            round++;
        }
        return at(round, (int) (left / parts(round)), left % parts(round), index);
    }

    @Override
    public Item holding(long draw) {
        int round = 0;
        while (draw >= before(round + 1)) {
            round++;
        }
        long within = draw - before(round);
        int replicate = (int) (within / size(round));
        long part = within % size(round) / LARGEST;
        long index = replicate * parts(round) + part;
        for (int earlier = 0; earlier < round; earlier++) {
            index += replicates * parts(earlier);
        }
        return at(round, replicate, part, index);
    }

    @Override
    public long whole(long draws) {
        return Math.min(Long.highestOneBit(draws / replicates), mostPoints) * replicates;
    }

    /// Whether a round ends with so many draws.
    boolean ends(long draws) {
        return draws % replicates == 0 && Long.bitCount(draws / replicates) == 1;
    }

    private Item at(int round, int replicate, long part, long index) {
        long size = size(round);
        long offset = part * LARGEST;
        return new Item(
                new Stretch(index, replicate, firstPoint(round) + offset),
                before(round) + replicate * size + offset,
                (int) Math.min(LARGEST, size - offset));
    }

    private static long firstPoint(int round) {
        return round == 0 ? 0 : size(round);
    }

    /// Points of a replicate in a round.
    private static long size(int round) {
        return round == 0 ? 1 : 1L << (round - 1);
    }

    private static long parts(int round) {
        return Math.ceilDiv(size(round), LARGEST);
    }

    private long before(int round) {
        return replicates * firstPoint(round);
    }
}
