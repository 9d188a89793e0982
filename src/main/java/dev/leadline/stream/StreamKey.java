package dev.leadline.stream;

import java.nio.ByteBuffer;
import java.nio.charset.StandardCharsets;
import java.security.MessageDigest;
import java.security.NoSuchAlgorithmException;

/// All of an address but the item: makes the stream of any item without hashing the names again. Immutable.
///
/// Lane and input are hashed by SHA-256 to three words: two are the key of Philox, one stands in its counter beside
/// seed, purpose, replicate and item. Philox is a bijection for each key, so two addresses of the same lane and input
/// never start in the same state; two that differ there do only where 192 bits of SHA-256 collide.
public final class StreamKey {
    private static final byte[] ENCODING = "leadline stream 1".getBytes(StandardCharsets.US_ASCII);

    private final long key0;
    private final long key1;
    private final long tag;
    private final long seed;
    private final long purposeAndReplicate;

    private StreamKey(Address address) {
        var names = ByteBuffer.wrap(hash(address.lane(), address.input()));
        key0 = names.getLong();
        key1 = names.getLong();
        tag = names.getLong();
        seed = address.seed();
        purposeAndReplicate = ((long) address.purpose().number() << 32) | address.replicate();
    }

    /// @param address its item does not matter
    public static StreamKey of(Address address) {
        return new StreamKey(address);
    }

    /// The stream of an item, at its first number.
    public Stream stream(long item) {
        long[] state = {item, seed, purposeAndReplicate, tag};
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
}
