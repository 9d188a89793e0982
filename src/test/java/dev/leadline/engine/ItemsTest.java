package dev.leadline.engine;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.leadline.scheme.Stretch;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

class ItemsTest {
    @Test
    void growFrom64To65536() {
        var items = new GrowingItems(1);
        assertEquals(new Item(new Stretch(0, 0, 0), 0, 64), items.at(0));
        assertEquals(new Item(new Stretch(7, 0, 0), 448, 64), items.at(7));
        assertEquals(new Item(new Stretch(8, 0, 0), 512, 128), items.at(8));
        assertEquals(new Item(new Stretch(80, 0, 0), 523_776, 65_536), items.at(80));
        assertEquals(65_536, items.at(1_000_000_000).draws());
    }

    @ParameterizedTest(name = "{0} draws in an observation")
    @ValueSource(ints = {1, 2, 30, 100, 1000})
    void followEachOtherWithoutGapInWholeObservations(int drawsPerObservation) {
        var items = new GrowingItems(drawsPerObservation);
        long next = 0;
        for (long k = 0; k < 200; k++) {
            Item item = items.at(k);
            assertEquals(next, item.firstDraw(), "item " + k);
            assertEquals(0, item.draws() % drawsPerObservation, "item " + k);
            assertTrue(item.draws() >= Math.min(65_536, 64L << Math.min(10, k / 8)), "item " + k);
            next += item.draws();
        }
    }

    @ParameterizedTest(name = "{0} draws in an observation")
    @ValueSource(ints = {1, 2, 30, 1000})
    void findTheItemThatHoldsADraw(int drawsPerObservation) {
        var items = new GrowingItems(drawsPerObservation);
        for (long k = 0; k < 120; k++) {
            Item item = items.at(k);
            assertEquals(item, items.holding(item.firstDraw()));
            assertEquals(item, items.holding(item.firstDraw() + item.draws() - 1));
        }
    }
}
