package dev.leadline.stream;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;

import dev.leadline.ReferenceValues;
import java.util.Arrays;
import java.util.SplittableRandom;
import org.apache.commons.rng.core.source64.Philox4x64;
import org.junit.jupiter.api.Test;

class PhiloxTest {
    /// Known answers of Random123, the authors' own code (record rng-philox4x64-10).
    @Test
    void givesTheKnownAnswers() {
        var expected = ReferenceValues.record("rng-philox4x64-10").required("expected");
        assertEquals(3, expected.size());
        for (var answer : expected) {
            var name = answer.required("name").asString();
            var words = ReferenceValues.words(name.replaceAll("ctr |key ", ""), 16);
            var counter = Arrays.copyOf(words, 4);
            Philox.encrypt(counter, words[4], words[5]);
            assertArrayEquals(ReferenceValues.words(answer.required("text").asString(), 16), counter, name);
        }
    }

    /// Commons RNG takes the key, then the counter, and starts with the block after that counter.
    @Test
    void agreesWithCommonsRng() {
        var random = new SplittableRandom(20261201);
        for (int i = 0; i < 1_000; i++) {
            var seed = random.longs(6).toArray();
            var counter = Arrays.copyOfRange(seed, 2, 6);
            var library = new Philox4x64(seed);
            counter[0]++;
            Philox.encrypt(counter, seed[0], seed[1]);
            for (long word : counter) {
                assertEquals(library.nextLong(), word, () -> "key and counter " + Arrays.toString(seed));
            }
        }
    }
}
