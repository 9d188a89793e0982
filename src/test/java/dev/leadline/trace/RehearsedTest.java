package dev.leadline.trace;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.leadline.estimate.Estimand;
import dev.leadline.interval.Interval;
import dev.leadline.model.Ask;
import dev.leadline.model.Tolerance;
import dev.leadline.trace.Rehearsed.Verdict;
import java.util.ArrayList;
import java.util.Collections;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.OptionalInt;
import org.junit.jupiter.api.Test;

class RehearsedTest {
    private static final double NAN = Double.NaN;

    private static Repetition repetition(double estimate, double error, double low, double high) {
        return new Repetition(estimate, error, new Interval(low, high, .9, "made", "", Optional.empty()));
    }

    private static Rehearsed judged(double value, double error, Repetition... repetitions) {
        return judged(value, error, List.of(repetitions));
    }

    private static Rehearsed judged(double value, double error, List<Repetition> repetitions) {
        return new Rehearsed(
                new Ask(new Estimand.Mean(), List.of("x"), "", ""), .9, new Sought(value, error, "", 0), repetitions);
    }

    /// The worked figures of Morris, White and Crowther (2019), Statistics in Medicine 38, 2074-2102, table
    /// 6.
    @Test
    void errorsOfRepetitions() {
        assertEquals(.0073315, Rehearsed.mcse(.943, 1000), 5e-8);
        assertEquals(.0033807, Rehearsed.empiricalMcse(.1511150, 1000), 5e-8);
    }

    /// `.95 * .05 / .005²` is 1,900, whatever rounding makes of it.
    @Test
    void repetitionsThatAreWanted() {
        assertEquals(1900, Rehearsed.repetitionsFor(.95, .005));
        assertEquals(396, Rehearsed.repetitionsFor(.99, .005));
        assertEquals(47_500, Rehearsed.repetitionsFor(.95, .001));
    }

    /// A limit that does not exist is never passed; without any there is no interval to count.
    @Test
    void countsMissesOnEitherSide() {
        var answer = judged(
                2,
                0,
                repetition(1, .1, .8, 1.2),
                repetition(2, .1, 1.8, 2.2),
                repetition(3, .1, 2, 4),
                repetition(3, .1, 2.5, 3.5),
                repetition(5, .1, 4.5, 5.5),
                repetition(1, .1, 0, NAN),
                repetition(1, .1, 2.1, NAN),
                repetition(1, NAN, NAN, NAN));
        assertEquals(7, answer.bounded());
        assertEquals(1, answer.unbounded());
        assertEquals(1, answer.missedLow());
        assertEquals(3, answer.missedHigh());
        assertEquals(3, answer.held());
        assertEquals(3.0 / 7, answer.rate());
        assertEquals(Math.sqrt(3.0 / 7 * 4 / 7 / 7), answer.mcse(), 1e-15);
        assertTrue(Double.isNaN(answer.reportedError()), "one states no error");
        assertEquals((.2 + .2 + 1 + .5 + .5) / 5, answer.meanHalfWidth(), 1e-15);
    }

    /// Estimates 1, 2, 6: mean 3, squares 4 + 1 + 9, standard deviation the root of 7.
    @Test
    void biasAndErrors() {
        var answer = judged(2.5, .3, repetition(1, .1, 0, 2), repetition(2, .2, 1, 3), repetition(6, .2, 5, 7));
        assertEquals(.5, answer.bias(), 1e-15);
        assertEquals(Math.sqrt(7), answer.empiricalError(), 1e-15);
        assertEquals(Math.sqrt(7) / 2, answer.empiricalMcse(), 1e-15);
        assertEquals(Math.sqrt(7 / 3.0 + .09), answer.biasMcse(), 1e-15);
        assertEquals(Math.sqrt((.01 + .04 + .04) / 3), answer.reportedError(), 1e-15);
        // variance of .01, .04, .04 is 3e-4
        assertEquals(Math.sqrt(3e-4 / 3) / (2 * Math.sqrt(.03)), answer.reportedMcse(), 1e-15);
        assertTrue(answer.isDoubtful(), "the value sought is off by .3 of a half-width");
        assertFalse(judged(2.5, .05, answer.repetitions()).isDoubtful());
    }

    @Test
    void ordersIntervalsByTheirCentres() {
        var a = repetition(1, .1, 2, 4);
        var b = repetition(9, .1, 0, 1);
        var c = repetition(2, .1, 1, NAN);
        var none = repetition(2, .1, NAN, NAN);
        assertEquals(List.of(b, c, a), judged(0, 0, a, none, b, c).ordered());
    }

    /// Of 1,000 intervals of 90 %, 99 % sure: 875 may be chance, 870 not. By the binomial distribution (SciPy
    /// 1.11) P(X <= 875) = .0060 and P(X <= 870) = .0013, to be compared with .005.
    @Test
    void saysWhetherTheRateIsTheLevel() {
        assertEquals(Verdict.HOLDS, verdict(875));
        assertEquals(Verdict.FALLS_SHORT, verdict(870));
        assertEquals(Verdict.MORE_THAN_STATED, verdict(940));
        assertEquals(Verdict.NOTHING, judged(0, 0, repetition(1, .1, NAN, NAN)).verdict());
    }

    private static Verdict verdict(int held) {
        var repetitions = new ArrayList<>(Collections.nCopies(held, repetition(1, .1, 0, 2)));
        repetitions.addAll(Collections.nCopies(1000 - held, repetition(3, .1, 2, 4)));
        return judged(1, 0, repetitions).verdict();
    }

    @Test
    void countsWhatMeetsTheToleranceAndWhatHoldsTogether() {
        var one = judged(2, 0, repetition(2.2, .1, 1.9, 2.5), repetition(3, .1, 2.9, 3.1), repetition(2, .1, 1, 3));
        var other = judged(5, 0, repetition(5, .1, 4, 6), repetition(5, .1, 4, 6), repetition(7, .1, 6, 8));
        var tolerance = new Tolerance(OptionalDouble.of(.35), OptionalDouble.empty(), false);
        var both = new Rehearsal("A", "independent", 10, 10, 3, Optional.of(tolerance), 2, List.of(one, other));
        assertEquals(OptionalInt.of(2), both.near());
        assertEquals(OptionalInt.of(1), both.heldTogether());
        var alone = new Rehearsal("A", "independent", 10, 10, 3, Optional.empty(), 0, List.of(one));
        assertEquals(OptionalInt.empty(), alone.near());
        assertEquals(OptionalInt.empty(), alone.heldTogether());
    }
}
