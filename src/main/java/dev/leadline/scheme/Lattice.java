package dev.leadline.scheme;

import dev.leadline.stream.Stream;

/// One dimension of embedded rank-1 lattices, common to all replicates: point i is the fraction of z times
/// the radical inverse of i. Immutable, safe for all threads.
///
/// The first 2^m points are the lattice of 2^m points, and those that double their number leave them as they
/// are. How the numbers z were found, and for which functions, says the script that `lattice.txt` names;
/// `LatticeTest` computes the errors it states from these points. As in every lattice, two of many dimensions
/// coincide where points are few: there are 2^(m-2) odd numbers modulo 2^m that are neither equal nor
/// opposite, which are 1,024 for 4,096 points.
final class Lattice {
    /// Dimensions there are numbers z for.
    static final int DIMENSIONS = 1010;

    /// Points of a replicate: as many as the vector was made for.
    static final long POINTS = 1L << 20;

    private static final int[] VECTOR =
            TextResource.lines("lattice.txt").mapToInt(Integer::parseInt).toArray();

    private static final int BLOCK = 1024;

    /// Radical inverses of the first numbers, times 2^32; those of a later block have them and the inverse of
    /// its first.
    private static final int[] INVERSES = new int[BLOCK];

    static {
        for (int i = 0; i < BLOCK; i++) {
            INVERSES[i] = Integer.reverse(i);
        }
    }

    private final int z;

    private Lattice(int z) {
        this.z = z;
    }

    /// @param dimension from 1
    static Lattice dimension(int dimension) {
        if (dimension < 1 || dimension > DIMENSIONS) {
            throw new IllegalArgumentException("dimension " + dimension + " of " + DIMENSIONS);
        }
        return new Lattice(VECTOR[dimension - 1]);
    }

    /// A replicate of this dimension: all points shifted by one uniform number, modulo 1.
    ///
    /// @param numbers those of the replicate and input, of which the next is used
    Coordinate shifted(Stream numbers) {
        double[] shift = new double[1];
        numbers.fill(shift, 0, 1);
        return shifted(shift[0]);
    }

    /// @param shift an odd multiple of 2^-53, so that no point is at 0
    Coordinate shifted(double shift) {
        return (u, firstPoint, rows) -> {
            Coordinate.check(firstPoint, rows, POINTS);
            for (int done = 0; done < rows; ) {
                int point = (int) firstPoint + done;
                int from = point & (BLOCK - 1);
                int n = Math.min(BLOCK - from, rows - done);
                fill(from, Integer.reverse(point - from), shift - Math.rint(shift), u, done, n);
                done += n;
            }
        };
    }

    private void fill(int from, int inverse, double shift, double[] u, int to, int n) {
        if (n == BLOCK) {
            for (int i = 0; i < BLOCK; i++) {
                u[to + i] = point(INVERSES[from + i] | inverse, shift);
            }
        } else {
            for (int i = 0; i < n; i++) {
                u[to + i] = point(INVERSES[from + i] | inverse, shift);
            }
        }
    }

    /// The product is taken modulo 2^32 and read as a fraction from -1/2 to 1/2, as the shift is; sums are
    /// exact.
    private double point(int inverse, double shift) {
        double moved = z * inverse * 0x1p-32 + shift;
        return moved - Math.floor(moved);
    }
}
