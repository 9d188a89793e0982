package dev.leadline.stream;

import java.nio.ByteBuffer;
import java.nio.charset.StandardCharsets;
import java.security.MessageDigest;
import java.security.NoSuchAlgorithmException;

/// The random numbers of one address: xoshiro256++, started in a state that Philox makes of the address. Confined to
/// one
/// worker.
///
/// Lane and input are hashed by SHA-256 to three words: two are the key of Philox, one stands in its counter beside
/// seed, purpose, replicate and item. Philox is a bijection for each key, so two addresses of the same lane and input
/// never start in the same state; two that differ there do only where 192 bits of SHA-256 collide.
///
/// Source of xoshiro256++: Blackman and Vigna (2021), Scrambled linear pseudorandom number generators, ACM TOMS 47.
/// Its period is 2^256 - 1 from every state but all zeros, which is refused.
public final class Stream {
    private static final byte[] ENCODING = "leadline stream 1".getBytes(StandardCharsets.US_ASCII);

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
        var names = ByteBuffer.wrap(hash(address.lane(), address.input()));
        long key0 = names.getLong();
        long key1 = names.getLong();
        long tag = names.getLong();
        long purposeAndReplicate = ((long) address.purpose().number() << 32) | address.replicate();
        long[] state = {address.item(), address.seed(), purposeAndReplicate, tag};
        Philox.encrypt(state, key0, key1);
        return new Stream(state[0], state[1], state[2], state[3]);
    }

    /// SHA-256 of the two names, each after its length, so that no two pairs of names are the same bytes.
    private static byte[] hash(String lane, String input) {
        var bytes = ByteBuffer.allocate(ENCODING.length + 8 + 2 * (lane.length() + input.length()));
        bytes.put(ENCODING);
        put(bytes, lane);
        put(bytes, input);
        try {
            return MessageDigest.getInstance("SHA-256").digest(bytes.array());
        } catch (NoSuchAlgorithmException e) {
            throw new AssertionError("every Java platform has SHA-256", e);
        }
    }

    private static void put(ByteBuffer bytes, String name) {
        bytes.putInt(name.length());
        for (int i = 0; i < name.length(); i++) {
            bytes.putChar(name.charAt(i));
        }
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

    /// Uniform numbers in the open interval (0, 1): the middles of 2^52 equal cells, symmetric about 1/2, none of them
    /// 0
    /// or 1.
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
