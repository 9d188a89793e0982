package dev.leadline.stream;

/// Philox 4x64 with ten rounds: for a fixed key a bijection of 256-bit counters that mixes every bit into every other.
///
/// Source: Salmon, Moraes, Dror and Shaw (2011), Parallel random numbers: as easy as 1, 2, 3. Checked by the known
/// answers of its authors (`PhiloxTest`).
final class Philox {
    private static final long M0 = 0xD2E7470EE14C6C93L;
    private static final long M1 = 0xCA5A826395121157L;

    /// Steps of the key: fractions of the golden ratio and of the square root of 3.
    private static final long W0 = 0x9E3779B97F4A7C15L;

    private static final long W1 = 0xBB67AE8584CAA73BL;

    private static final int ROUNDS = 10;

    private Philox() {}

    /// Replaces a counter of four words, word 0 first, by what the key makes of it.
    static void encrypt(long[] counter, long key0, long key1) {
        long c0 = counter[0];
        long c1 = counter[1];
        long c2 = counter[2];
        long c3 = counter[3];
        long k0 = key0;
        long k1 = key1;
        for (int round = 0; round < ROUNDS; round++) {
            long high0 = Math.unsignedMultiplyHigh(M0, c0);
            long high1 = Math.unsignedMultiplyHigh(M1, c2);
            long low0 = M0 * c0;
            long low1 = M1 * c2;
            c0 = high1 ^ c1 ^ k0;
            c1 = low1;
            c2 = high0 ^ c3 ^ k1;
            c3 = low0;
            k0 += W0;
            k1 += W1;
        }
        counter[0] = c0;
        counter[1] = c1;
        counter[2] = c2;
        counter[3] = c3;
    }
}
