package dev.leadline.density;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.LinkedHashMap;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;

class StretchesTest {
    private static final double INFINITE = Double.POSITIVE_INFINITY;

    private static Density typed(String formula, double from, double to) {
        return Typed.of(new TypedText(formula, from, to, List.of(), false), "x", new LinkedHashMap<>())
                .density();
    }

    private static Density halves(Density one, Density other) {
        return new Mixture(List.of(new Mixture.Part(.5, one), new Mixture.Part(.5, other)));
    }

    private static void misses(Density own, Density given, double from, double to) {
        assertEquals(Optional.of(new Support(from, to)), Stretches.missed(own, given));
    }

    @Test
    void findsTheFirstStretchWithoutDensity() {
        misses(new Normal(0, 1), new Exponential(1), -INFINITE, 0);
        misses(new Exponential(1), new Uniform(0, 3), 3, INFINITE);
        misses(new Uniform(0, 4), halves(new Uniform(0, 1), new Uniform(3, 4)), 1, 3);
        misses(new Uniform(0, 4), halves(new Uniform(3, 4), new Uniform(.5, 1)), 0, .5);
        misses(new Normal(0, 1), Truncated.of(new Normal(0, 1), -9, INFINITE), -INFINITE, -9);
        misses(new Uniform(0, 1), new Shifted(new Uniform(0, 1), .25, 1), 0, .25);
        misses(new Beta(2, 2, 0, 1), new Shifted(halves(new Uniform(0, 1), new Uniform(2, 3)), 1, -.25), 0, .25);
    }

    @Test
    void seesGapsOfFormulas() {
        Density gap = typed("abs(x-2) > 0.5", 0, 4);
        var missed = Stretches.missed(new Uniform(0, 4), gap).orElseThrow();
        assertEquals(1.5, missed.low(), 1e-9);
        assertEquals(2.5, missed.high(), 1e-9);
        // the same gap in the input's own is none
        assertEquals(Optional.empty(), Stretches.missed(gap, gap));
        assertEquals(Optional.empty(), Stretches.missed(gap, new Uniform(0, 4)));
    }

    @Test
    void findsNoneWhereAllIsCovered() {
        assertEquals(
                Optional.empty(), Stretches.missed(new Uniform(0, 2), halves(new Uniform(0, 1), new Uniform(1, 3))));
        assertEquals(Optional.empty(), Stretches.missed(new Exponential(1), new Normal(0, 1)));
        // an end that is off by rounding
        assertEquals(Optional.empty(), Stretches.missed(new Uniform(0, .3), new Shifted(new Uniform(0, .1), 0, 3)));
    }

    @Test
    void findsValuesWithoutProbability() {
        misses(new Poisson(3), new Binomial(5, .5), 6, 6);
        misses(new Binomial(5, .5), new Shifted(new Poisson(3), 2, 1), 0, 0);
        misses(
                ValueTable.of(new double[] {0, 10, 50}, new double[] {.9, .05, .05}),
                ValueTable.of(new double[] {0, 50}, new double[] {.5, .5}),
                10,
                10);
        misses(new Bernoulli(.1), new Bernoulli(1), 0, 0);
        misses(new DiscreteUniform(0, 9), new Shifted(new Poisson(3), 0, 2), 1, 1);
        assertEquals(Optional.empty(), Stretches.missed(new Binomial(12, .1), new Poisson(4)));
        assertEquals(Optional.empty(), Stretches.missed(new Poisson(4), new NegativeBinomial(2, 4)));
    }

    @Test
    void tellsWhatHasNothingInCommon() {
        assertTrue(Stretches.areApart(new Uniform(0, 1), new Uniform(1, 2)));
        assertTrue(Stretches.areApart(new Poisson(3), new Shifted(new Poisson(3), .5, 1)));
        assertTrue(Stretches.areApart(halves(new Uniform(0, 1), new Uniform(3, 4)), new Uniform(1.5, 2)));
        assertFalse(Stretches.areApart(new Uniform(0, 1), new Uniform(.5, 2)));
        assertFalse(Stretches.areApart(new Poisson(3), new Shifted(new Poisson(3), 2, 1)));
    }
}
