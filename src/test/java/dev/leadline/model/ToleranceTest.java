package dev.leadline.model;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.OptionalDouble;
import org.junit.jupiter.api.Test;

class ToleranceTest {
    private static final OptionalDouble NONE = OptionalDouble.empty();
    private static final OptionalDouble TENTH = OptionalDouble.of(.1);

    /// The end of an interval that just meets it lies a tenth of the true value away.
    @Test
    void relativeMeansOfTheTrueValue() {
        var tolerance = new Tolerance(NONE, TENTH, false);
        double h = tolerance.allowed(-1.1);
        assertEquals(.1, h, 1e-15);
        assertEquals(.1, h / (1.1 - h), 1e-15);
        assertTrue(tolerance.met(1.1, h));
        assertFalse(tolerance.met(1.1, Math.nextUp(h)));
    }

    @Test
    void eitherTakesTheLooserBothTheStricter() {
        assertEquals(.1, new Tolerance(TENTH, TENTH, true).allowed(22));
        assertEquals(2, new Tolerance(TENTH, TENTH, false).allowed(22), 1e-15);
        assertEquals(.1, new Tolerance(TENTH, NONE, false).allowed(22));
    }

    @Test
    void nothingIsMetWithoutEstimateOrHalfWidth() {
        assertFalse(new Tolerance(NONE, TENTH, false).met(Double.NaN, .01));
        assertFalse(new Tolerance(TENTH, NONE, false).met(1, Double.NaN));
        assertEquals(0, new Tolerance(NONE, TENTH, false).allowed(Double.NaN));
    }
}
