package dev.leadline.stream;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.leadline.ReferenceValues;
import java.util.SplittableRandom;
import java.util.stream.LongStream;
import org.apache.commons.rng.core.source64.XoShiRo256PlusPlus;
import org.junit.jupiter.api.Test;

class StreamTest {
    private static final Address ADDRESS = new Address(20261201, Purpose.RUN, "A", 0, "v", 0);

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
}
