package dev.leadline.scheme;

import dev.leadline.stream.Stream;

/// One dimension of Sobol's sequence, common to all replicates. Immutable, safe for all threads.
///
/// Points stand in natural order, the first at 0: the first 2^m hold one in every interval of length 2^-m,
/// and those that double their number leave them as they are. They have 32 digits; randomised points have 52.
final class Sobol {
    /// Dimensions there are direction numbers for.
    static final int DIMENSIONS = DirectionNumbers.DIMENSIONS;

    /// Points of a replicate: as many as 32 digits keep apart.
    static final long POINTS = 1L << DirectionNumbers.DIGITS;

    private static final int BLOCK_BITS = 10;
    static final int BLOCK = 1 << BLOCK_BITS;

    /// Digits of points 1, 2, 4, 8 ..., the first digit in the lowest bit.
    private final int[] directions;

    /// Digits of the first points; every later block has them and its own, digit by digit without carry.
    private final int[] block = new int[BLOCK];

    private Sobol(int[] directions) {
        this.directions = directions;
        for (int k = 0; k < BLOCK_BITS; k++) {
            for (int i = 0; i < 1 << k; i++) {
                block[(1 << k) + i] = block[i] ^ directions[k];
            }
        }
    }

    /// @param dimension from 1
    static Sobol dimension(int dimension) {
        return new Sobol(DirectionNumbers.ofDimension(dimension));
    }

    /// A replicate of this dimension.
    ///
    /// @param numbers those of the replicate and input, of which the next are used
    Coordinate randomised(Scrambling scrambling, Stream numbers) {
        return randomised(
                switch (scrambling) {
                    case NESTED -> NestedScrambling.of(numbers);
                    case DIGITAL_SHIFT -> DigitalShift.of(numbers);
                });
    }

    Coordinate randomised(Randomisation randomisation) {
        return (u, firstPoint, rows) -> {
            Coordinate.check(firstPoint, rows, POINTS);
            for (int done = 0; done < rows; ) {
                long point = firstPoint + done;
                int from = (int) (point & (BLOCK - 1));
                int n = Math.min(BLOCK - from, rows - done);
                randomisation.apply(block, from, digits(point - from), u, done, n);
                done += n;
            }
        };
    }

    private int digits(long point) {
        int digits = 0;
        for (long left = point; left != 0; left &= left - 1) {
            digits ^= directions[Long.numberOfTrailingZeros(left)];
        }
        return digits;
    }
}
