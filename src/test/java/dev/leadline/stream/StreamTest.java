package dev.leadline.stream;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertNull;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.leadline.ReferenceValues;
import java.io.ByteArrayOutputStream;
import java.nio.ByteBuffer;
import java.nio.charset.StandardCharsets;
import java.security.MessageDigest;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.SplittableRandom;
import java.util.stream.LongStream;
import org.apache.commons.rng.core.source64.Philox4x64;
import org.apache.commons.rng.core.source64.XoShiRo256PlusPlus;
import org.junit.jupiter.api.Test;

class StreamTest {
    private static final Address ADDRESS = new Address(20261201, Purpose.RUN, "A", 0, "v", 0);

    private static final long[] PINNED_A = {0xAF3EBD3DBD4AC019L, 0x168D8E91FD28EB58L, 0xFB1EB42B0F36549AL};
    private static final long[] PINNED_B = {0x6396B601804D9E21L, 0xB1674C186F9BE9E2L, 0x739624E59EE19D9BL};

    private static long[] first(Stream stream, int n) {
        return LongStream.generate(stream::next).limit(n).toArray();
    }

    /// Vigna's reference vector (record rng-xoshiro256pp).
    @Test
    void givesTheKnownAnswersOfXoshiro() {
        assertArrayEquals(
                ReferenceValues.words(ReferenceValues.text("rng-xoshiro256pp", "first_ten"), 10),
                first(new Stream(1, 2, 3, 4), 10));
    }

    /// SplittableRandom is SplitMix64 (record rng-splitmix64).
    @Test
    void givesTheKnownAnswersOfXoshiroSeededBySplitMix() {
        var mix = new SplittableRandom(1234567);
        var answers = ReferenceValues.words(ReferenceValues.text("rng-splitmix64", "seed_1234567"), 10);
        assertArrayEquals(answers, mix.longs(5).toArray());
        var seed = new SplittableRandom(42);
        assertArrayEquals(
                ReferenceValues.words(ReferenceValues.text("rng-xoshiro256pp", "seeded_by_splitmix_42"), 10),
                first(new Stream(seed.nextLong(), seed.nextLong(), seed.nextLong(), seed.nextLong()), 4));
    }

    @Test
    void agreesWithCommonsRng() {
        var library = new XoShiRo256PlusPlus(new long[] {5, 6, 7, 8});
        var stream = new Stream(5, 6, 7, 8);
        for (int i = 0; i < 100_000; i++) {
            assertEquals(library.nextLong(), stream.next(), "number " + i);
        }
    }

    @Test
    void refusesTheStateOfZeros() {
        assertThrows(IllegalArgumentException.class, () -> new Stream(0, 0, 0, 0));
    }

    @Test
    void fillsWithTheMiddlesOfTheCellsOfNext() {
        var filled = new double[3_000];
        var stream = Stream.at(ADDRESS);
        stream.fill(filled, 0, 1);
        stream.fill(filled, 1, 1_999);
        stream.fill(filled, 2_000, 1_000);
        var bits = Stream.at(ADDRESS);
        for (int i = 0; i < filled.length; i++) {
            assertEquals(((bits.next() >>> 12) + 0.5) / (1L << 52), filled[i], "number " + i);
        }
        assertEquals(bits.next(), stream.next());
    }

    @Test
    void fillsOnlyWhereAsked() {
        var u = new double[10];
        Stream.at(ADDRESS).fill(u, 3, 4);
        for (int i = 0; i < u.length; i++) {
            assertEquals(i >= 3 && i < 7, u[i] != 0, "index " + i);
        }
    }

    @Test
    void isNeverZeroOrOne() {
        assertEquals(0x1p-53, Stream.uniform(0));
        assertEquals(1 - 0x1p-53, Stream.uniform(-1));
        assertTrue(Stream.uniform(-1) < 1);
        assertEquals(1, Stream.uniform(0x123456789ABCDEFL) + Stream.uniform(~0x123456789ABCDEFL));
    }

    // ---- addresses -----------------------------------------------------------------------------------------------

    /// From a few lines of Python (hashlib, and Philox and xoshiro256++ written down again). Run records rest
    /// on them, so they may never change.
    @Test
    void keepsItsNumbers() {
        assertArrayEquals(PINNED_A, first(Stream.at(ADDRESS), 3));
        assertArrayEquals(
                PINNED_B,
                first(Stream.at(new Address(Long.MAX_VALUE, Purpose.RUN, Address.SHARED, 3, "Böe", 12_345)), 3));
    }

    /// The state worked out apart from [Stream]: SHA-256 of the text with lengths and UTF-16 units spelled out, then
    /// Philox of Commons RNG.
    @Test
    void startsWhereTheAddressSays() throws Exception {
        var names = "leadline stream 1".getBytes(StandardCharsets.US_ASCII);
        var bytes = new ByteArrayOutputStream();
        bytes.write(names);
        bytes.write(new byte[] {0, 0, 0, 1, 0, 'A', 0, 0, 0, 2, 0, 'v', 0x20, (byte) 0xAC});
        var hash = ByteBuffer.wrap(MessageDigest.getInstance("SHA-256").digest(bytes.toByteArray()));
        long key0 = hash.getLong();
        long key1 = hash.getLong();
        long tag = hash.getLong();
        var philox = new Philox4x64(new long[] {key0, key1, 77 - 1, 5, (1L << 32) | 9, tag});
        var expected = new XoShiRo256PlusPlus(
                new long[] {philox.nextLong(), philox.nextLong(), philox.nextLong(), philox.nextLong()});
        var stream = Stream.at(new Address(5, Purpose.RUN, "A", 9, "v€", 77));
        for (int i = 0; i < 10; i++) {
            assertEquals(expected.nextLong(), stream.next());
        }
    }

    @Test
    void differsWhereverTheAddressDiffers() {
        var names = List.of("", "a", "b", "ab", "aab", "A", "*", "é", "e\u0301", "\uD800", "\uDC00", "?");
        var seen = new HashMap<Long, Address>();
        for (var lane : names) {
            for (var input : names) {
                for (long number : new long[] {0, 1, 2, 1L << 32, Long.MAX_VALUE}) {
                    for (int replicate : new int[] {0, 1, Integer.MAX_VALUE}) {
                        note(seen, new Address(number, Purpose.RUN, lane, replicate, input, 0));
                        if (number > 0) {
                            note(seen, new Address(0, Purpose.RUN, lane, replicate, input, number));
                        }
                    }
                }
            }
        }
        assertEquals(12 * 12 * 3 * 9, seen.size());
    }

    private static void note(Map<Long, Address> seen, Address address) {
        var other = seen.put(Stream.at(address).next(), address);
        assertNull(other, () -> address + " gives the numbers of " + other);
    }

    @Test
    void refusesNegativeAddresses() {
        assertThrows(IllegalArgumentException.class, () -> new Address(-1, Purpose.RUN, "A", 0, "v", 0));
        assertThrows(IllegalArgumentException.class, () -> new Address(0, Purpose.RUN, "A", -1, "v", 0));
        assertThrows(IllegalArgumentException.class, () -> new Address(0, Purpose.RUN, "A", 0, "v", -1));
    }
}
