package dev.leadline.scheme;

import dev.leadline.stream.Stream;

/// The same 52 random digits flip those of every point.
///
/// @param first digits 1 to 32, the first highest
/// @param next digits 33 to 52
record DigitalShift(int first, int next) implements Randomisation {
    /// With the next number of a stream.
    static DigitalShift of(Stream numbers) {
        long digits = numbers.next() >>> 12;
        return new DigitalShift((int) (digits >>> 20), (int) digits & 0xfffff);
    }

    @Override
    public void apply(int[] block, int from, int more, double[] u, int to, int n) {
        if (n == Sobol.BLOCK) {
            for (int i = 0; i < Sobol.BLOCK; i++) {
                u[to + i] = point(block[from + i] ^ more);
            }
        } else {
            for (int i = 0; i < n; i++) {
                u[to + i] = point(block[from + i] ^ more);
            }
        }
    }

    private double point(int digits) {
        return Fraction.of(Integer.reverse(digits) ^ first, next);
    }
}
