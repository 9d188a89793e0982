package dev.leadline.stream;

/// The random numbers of one address: xoshiro256++, started in a state that [StreamKey] makes of the address.
/// Confined to one worker.
///
/// Source of xoshiro256++: Blackman and Vigna (2021), Scrambled linear pseudorandom number generators, ACM TOMS 47.
/// Its period is 2^256 - 1 from every state but all zeros, which is refused.
public final class Stream {
    private long s0;
    private long s1;
    private long s2;
    private long s3;

    /// @throws IllegalArgumentException for the state of zeros, which xoshiro256++ never leaves
    Stream(long s0, long s1, long s2, long s3) {
        if ((s0 | s1 | s2 | s3) == 0) {
            throw new IllegalArgumentException("xoshiro256++ cannot start from zeros");
        }
        this.s0 = s0;
        this.s1 = s1;
        this.s2 = s2;
        this.s3 = s3;
    }

    /// The stream of an address, at its first number.
    public static Stream at(Address address) {
        return StreamKey.of(address).stream(address.item());
    }

    /// The next 64 random bits.
    public long next() {
        long result = Long.rotateLeft(s0 + s3, 23) + s0;
        long t = s1 << 17;
        s2 ^= s0;
        s3 ^= s1;
        s1 ^= s2;
        s0 ^= s3;
        s2 ^= t;
        s3 = Long.rotateLeft(s3, 45);
        return result;
    }

    /// Uniform numbers in the open interval (0, 1): the middles of 2^52 equal cells, symmetric about 1/2, none
    /// of them 0 or 1.
    ///
    /// @param u filled at the n indices from `from`
    public void fill(double[] u, int from, int n) {
        long a = s0;
        long b = s1;
        long c = s2;
        long d = s3;
        for (int i = from; i < from + n; i++) {
            u[i] = uniform(Long.rotateLeft(a + d, 23) + a);
            long t = b << 17;
            c ^= a;
            d ^= b;
            b ^= c;
            a ^= d;
            c ^= t;
            d = Long.rotateLeft(d, 45);
        }
        s0 = a;
        s1 = b;
        s2 = c;
        s3 = d;
    }

    /// The cell is the top 52 bits; with 53 the last midpoint would round to 1.
    static double uniform(long bits) {
        return ((bits >>> 12) + 0.5) * 0x1p-52;
    }
}
