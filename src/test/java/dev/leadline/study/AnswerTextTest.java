package dev.leadline.study;

import static org.junit.jupiter.api.Assertions.assertEquals;

import dev.leadline.estimate.Estimand;
import dev.leadline.interval.Interval;
import dev.leadline.trace.Answer;
import java.util.Optional;
import java.util.OptionalLong;
import org.junit.jupiter.api.Test;

class AnswerTextTest {
    private static Answer answer(
            Estimand estimand, String unit, double value, double low, double high, OptionalLong hits, long nonFinite) {
        var interval = new Interval(low, high, .95, "student", "", Optional.empty());
        return new Answer(
                estimand,
                unit,
                "",
                value,
                (high - low) / 4,
                interval,
                Optional.empty(),
                hits,
                1_000_000,
                nonFinite,
                Optional.empty(),
                false);
    }

    @Test
    void aSmallChanceSaysOneInHowMany() {
        var a = answer(new Estimand.Probability(), "1/a", 1.2568e-5, .956e-5, 1.556e-5, OptionalLong.of(13), 0);
        assertEquals("1.26e-5 \u00b1 0.30e-5 per year (95 %, lane B; 1 in 79,600)", AnswerText.of(a, "B"));
    }

    @Test
    void aMeanHasItsUnit() {
        var a = answer(new Estimand.Mean(), "mm", 3.20602, 3.20102, 3.21102, OptionalLong.empty(), 0);
        assertEquals("3.2060 \u00b1 0.0050 mm (95 %, lane A)", AnswerText.of(a, "A"));
    }

    /// Clopper and Pearson's limits for 2 hits of 10,000 are 2.4e-5 and 7.2e-4 (tables for a Poisson count of 2: .242
    /// and 7.22), far from 2e-4 ± 3.5e-4.
    @Test
    void fewHitsSayBothLimits() {
        var a = answer(new Estimand.Probability(), "1/a", 2e-4, 2.422e-5, 7.223e-4, OptionalLong.of(2), 0);
        assertEquals("0.00020, between 0.00002 and 0.00073 per year (95 %, lane A; 1 in 5,000)", AnswerText.of(a, "A"));
        var all = answer(new Estimand.Probability(), "1/a", 1, .99963, 1, OptionalLong.of(1_000_000), 0);
        assertEquals("at least 0.99963 per year (95 %, lane A)", AnswerText.of(all, "A"));
    }

    @Test
    void noHitIsALimitNeverZero() {
        var a = answer(new Estimand.Probability(), "1/a", 0, 0, 2.9957e-6, OptionalLong.of(0), 0);
        assertEquals("at most 3.0e-6 per year (95 %, lane A; no hit in 1,000,000 draws)", AnswerText.of(a, "A"));
    }

    @Test
    void withoutSpreadNoIntervalIsMadeUp() {
        var a = answer(new Estimand.Mean(), "m", 4, Double.NaN, Double.NaN, OptionalLong.empty(), 0);
        assertEquals("4.0 m, no interval yet (lane A)", AnswerText.of(a, "A"));
        var none = answer(new Estimand.Mean(), "m", Double.NaN, Double.NaN, Double.NaN, OptionalLong.empty(), 0);
        assertEquals("cannot say yet (lane A; 1,000,000 draws)", AnswerText.of(none, "A"));
    }

    @Test
    void oneInHowManyIsForSmallChances() {
        var half = answer(new Estimand.Probability(), "1", .5, .49, .51, OptionalLong.of(500_000), 0);
        assertEquals(Optional.empty(), AnswerText.oneIn(half));
        var rare = answer(new Estimand.Probability(), "1", 8e-10, 7e-10, 9e-10, OptionalLong.of(9), 0);
        assertEquals(Optional.of("1 in 1.25e9"), AnswerText.oneIn(rare));
        var mean = answer(new Estimand.Mean(), "1", .1, .09, .11, OptionalLong.empty(), 0);
        assertEquals(Optional.empty(), AnswerText.oneIn(mean));
    }

    @Test
    void limitsAreRoundedOutwards() {
        var a = answer(new Estimand.Mean(), "mm", 3.20602, 3.20102, 3.21102, OptionalLong.empty(), 0);
        assertEquals("95 % interval 3.2010 to 3.2111 (student)", AnswerText.interval(a));
    }

    @Test
    void failedEvaluationsAreSaid() {
        var a = answer(new Estimand.Mean(), "1", 4, 3.9, 4.1, OptionalLong.empty(), 3);
        assertEquals("4.00 \u00b1 0.10 (95 %, lane A; over finite evaluations only)", AnswerText.of(a, "A"));
    }
}
