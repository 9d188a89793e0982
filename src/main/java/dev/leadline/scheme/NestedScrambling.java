package dev.leadline.scheme;

import dev.leadline.stream.Stream;

/// Nested uniform scrambling by hashing: every digit is flipped or not by a hash of the digits before it.
///
/// Digits stand in reverse order, so that products and sums, which carry upwards, let each digit depend on
/// those before it only. Constants: Vegdahl (2021), Building a Better LK Hash; with those first published, by
/// Laine and Karras, the variance of errors is a third of what nested scrambling gives. After the hash all
/// digits are shifted by random ones: that is nested scrambling still, and leaves each point exactly uniform,
/// however good the hash. Digits 33 to 52 are another hash of the first 32: without them sums over many
/// points are biased.
///
/// @param seed of the hash
/// @param shift of digits 1 to 32, the first highest
/// @param next seed of digits 33 to 52
record NestedScrambling(int seed, int shift, int next) implements Randomisation {
    /// With the next numbers of a stream.
    static NestedScrambling of(Stream numbers) {
        long first = numbers.next();
        return new NestedScrambling((int) first, (int) (first >>> 32), (int) numbers.next());
    }

    @Override
    public void apply(int[] block, int from, int more, double[] u, int to, int n) {
        int factor = seed >>> 16 | 1;
        if (n == Sobol.BLOCK) {
            for (int i = 0; i < Sobol.BLOCK; i++) {
                u[to + i] = point(block[from + i] ^ more, factor);
            }
        } else {
            for (int i = 0; i < n; i++) {
                u[to + i] = point(block[from + i] ^ more, factor);
            }
        }
    }

    /// This and what it calls have at most 35 bytes each: they are inlined however little has been seen of them.
    private double point(int digits, int factor) {
        return Fraction.of(Integer.reverse(nested(digits, factor)) ^ shift, hash(digits ^ next) >>> 12);
    }

    private int nested(int digits, int factor) {
        int x = digits ^ digits * 0x3d20adea;
        x += seed;
        x *= factor;
        x ^= x * 0x05526c56;
        return x ^ x * 0x53a22864;
    }

    /// `lowbias32` of Wellons (2018), Prospecting for Hash Functions.
    private static int hash(int digits) {
        int x = digits;
        x ^= x >>> 16;
        x *= 0x7feb352d;
        x ^= x >>> 15;
        x *= 0x846ca68b;
        x ^= x >>> 16;
        return x;
    }
}
