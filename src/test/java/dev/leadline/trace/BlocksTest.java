package dev.leadline.trace;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.leadline.estimate.Accumulator;
import dev.leadline.scheme.Independent;
import dev.leadline.scheme.Scheme;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;

class BlocksTest {
    private static Accumulator of(double... values) {
        var sums = new Accumulator(1);
        sums.add(new double[][] {values}, 0, values.length);
        return sums;
    }

    private static Trace trace(Blocks blocks) {
        return new Trace("A", Scheme.of(new Independent()), List.of(), blocks.snapshot(), List.of(), Optional.empty());
    }

    @Test
    void neverMoreThan64AndNothingIsLost() {
        var blocks = new Blocks();
        double sum = 0;
        for (int i = 1; i <= 5_000; i++) {
            blocks.add(of(i, 2 * i), 2);
            sum += 3 * i;
            assertTrue(blocks.snapshot().size() <= 64, "after " + i);
            assertEquals(2L * i, trace(blocks).total().count(), "after " + i);
        }
        assertEquals(sum / 10_000, trace(blocks).total().mean(0), 1e-12 * sum / 10_000);
    }

    @Test
    void halvesSplitInTheMiddle() {
        var blocks = new Blocks();
        for (int i = 0; i < 4_096; i++) {
            blocks.add(of(i < 2_048 ? 0 : 1), 1);
        }
        var halves = trace(blocks).halves();
        assertEquals(2_048, halves.getFirst().count(), 64);
        assertEquals(0, halves.getFirst().mean(0), .04);
        assertEquals(1, halves.getLast().mean(0), .04);
        assertEquals(4_096, halves.getFirst().count() + halves.getLast().count());
    }

    /// Pairs are half as many observations as draws, and the blocks stand at the same draws all the same.
    @Test
    void blocksDependOnNominalSizesAlone() {
        var draws = new Blocks();
        var pairs = new Blocks();
        for (int i = 0; i < 300; i++) {
            long size = 64L << Math.min(i / 8, 10);
            draws.add(of(new double[(int) size]), size);
            pairs.add(of(new double[(int) (size / 2 + i % 2)]), size);
        }
        var ofDraws = draws.snapshot();
        var ofPairs = pairs.snapshot();
        assertEquals(ofDraws.size(), ofPairs.size());
        for (int j = 0; j < ofDraws.size(); j++) {
            assertEquals(
                    ofDraws.get(j).count() / 2.0,
                    ofPairs.get(j).count(),
                    1 + ofDraws.get(j).count() / 64.0);
        }
    }

    @Test
    void aSnapshotStaysAsItWas() {
        var blocks = new Blocks();
        blocks.add(of(1), 1);
        var before = trace(blocks);
        for (int i = 0; i < 500; i++) {
            blocks.add(of(2), 1);
        }
        assertEquals(1, before.total().count());
    }
}
