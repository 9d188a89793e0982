package dev.leadline.ground;

import static org.junit.jupiter.api.Assertions.assertEquals;

import org.junit.jupiter.api.Test;

class NumbersTest {
    @Test
    void noMinusBeforeNothing() {
        assertEquals("0.0", Numbers.ratio(-.04));
        assertEquals("-0.1", Numbers.ratio(-.06));
    }

    @Test
    void readAsAPersonWritesThem() {
        assertEquals("12,600", Numbers.count(12_600));
        assertEquals("41,000,000", Numbers.about(4.123e7));
        assertEquals("48", Numbers.about(47.6));
        assertEquals("1.0e16", Numbers.about(1e16));
        assertEquals("0.00300", Numbers.value(.003));
        assertEquals("9.99e-6", Numbers.value(9.987e-6));
        assertEquals("-1.00e100", Numbers.value(-1e100));
        assertEquals("NaN", Numbers.value(Double.NaN));
        assertEquals("3.0", Numbers.ratio(2.96));
    }
}
