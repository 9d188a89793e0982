package dev.leadline.study;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.leadline.estimate.Coverage;
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

    /// A band between two outcomes that are the same one is written as the outcome.
    @Test
    void aBandOfOneValueIsThatValue() {
        var a = answer(new Estimand.Quantile(.995), "", 8, 8, 8, OptionalLong.empty(), 0);
        var band = new Interval(8, 8, .95, "any-time-quantile", "", Optional.empty());
        assertEquals("any-time band 8 to 8: it holds with 95 % however often one looks", AnswerText.band(a, band));
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

    private static Answer quantile(String unit, double value, double low, double high, String note) {
        var interval = new Interval(
                low, high, .95, "order-statistics", "", note.isEmpty() ? Optional.empty() : Optional.of(note));
        return new Answer(
                new Estimand.Quantile(.98),
                unit,
                "",
                value,
                Double.NaN,
                interval,
                Optional.empty(),
                OptionalLong.empty(),
                10_000,
                0,
                Optional.empty(),
                false);
    }

    @Test
    void aQuantileOfWholeNumbersIsNeverPlusMinusZero() {
        var only = quantile("", 16, 16, 16, "");
        assertEquals("16 (the interval contains only 16)", AnswerText.value(only));
        assertEquals("16 (the interval contains only 16; 95 %, lane A)", AnswerText.of(only, "A"));
        assertEquals("95 % interval 16 to 16 (order-statistics)", AnswerText.interval(only));
        assertEquals(new AnswerText.Cells("16", "only this value"), AnswerText.cells(only));
        assertEquals("16, between 15 and 17", AnswerText.value(quantile("", 16, 15, 17, "")));
        assertEquals("16, between 16 and 17", AnswerText.value(quantile("", 16, 16, 17, "")));
        assertEquals("16, between 15 and 16 h", AnswerText.value(quantile("h", 16, 15, 16, "")));
    }

    @Test
    void aQuantileHasTheDigitsOfItsLimits() {
        assertEquals("1.3943 ± 0.0027 t", AnswerText.value(quantile("t", 1.39431, 1.39162, 1.39703, "")));
        assertEquals("-1.39, between -2.11 and -1.30", AnswerText.value(quantile("1", -1.391, -2.1013, -1.3021, "")));
    }

    /// Of 100 draws the .98 quantile has no upper limit: .98^100 is .13, and 2.5 % are left for it.
    @Test
    void aLimitThatDoesNotExistIsToldWithWhatItNeeds() {
        var open = quantile("t", 1.39431, 1.31162, Double.NaN, "no upper limit; needs n = 183");
        assertEquals("1.394, at least 1.311 t (95 %, lane A; no upper limit; needs n = 183)", AnswerText.of(open, "A"));
        assertEquals("95 % interval from 1.311 (order-statistics)", AnswerText.interval(open));
        assertEquals(new AnswerText.Cells("1.394", "from 1.311"), AnswerText.cells(open));
        var none = quantile("t", 1.3943127, Double.NaN, Double.NaN, "needs n = 183");
        assertEquals("1.39431 t, no interval at this n (lane A; needs n = 183)", AnswerText.of(none, "A"));
        assertEquals("no 95 % interval yet (order-statistics)", AnswerText.interval(none));
    }

    private static Answer distribution(double u, boolean provisional) {
        return new Answer(
                new Estimand.Distribution(.95),
                "mm",
                "",
                3.206023,
                .0019703,
                new Interval(3.20216, 3.20988, .95, "student", "", Optional.empty()),
                Optional.empty(),
                OptionalLong.empty(),
                1_000_000,
                0,
                Optional.of(new Coverage(.95, u, -.878, 6.393, -.757, 6.498)),
                provisional);
    }

    /// The tide gauge: mean 3.206023, standard uncertainty 1.970317, 95 % symmetric [-.878, 6.393], shortest
    /// [-.757, 6.498], by closed forms and 2e7 draws apart from this program.
    @Test
    void aDistributionHasTheDigitsOfItsUncertainty() {
        var a = distribution(1.970317, false);
        assertEquals("3.2 mm, u = 2.0 mm, 95 % of outcomes in [-0.9, 6.4] mm", AnswerText.value(a));
        assertEquals(
                "3.2 mm, u = 2.0 mm, 95 % of outcomes in [-0.9, 6.4] mm" + " (lane A; mean 3.2060 ± 0.0039 mm at 95 %)",
                AnswerText.of(a, "A"));
        assertEquals(
                Optional.of("95 % of outcomes: [-0.9, 6.4] with half of the rest on either side,"
                        + " [-0.8, 6.5] the shortest"),
                AnswerText.coverage(a));
        assertEquals("95 % interval of the mean 3.2021 to 3.2099 (student)", AnswerText.interval(a));
        assertEquals(new AnswerText.Cells("3.2", "u 2.0"), AnswerText.cells(a));
        assertEquals("3.20602 mm, no spread among outcomes", AnswerText.value(distribution(0, false)));
    }

    @Test
    void whatIsNotFoundYetIsProvisional() {
        assertTrue(AnswerText.of(distribution(2, true), "A").endsWith("95 %; provisional)"));
    }

    /// Fieller's limits of a ratio lie unevenly; a deviation is bounded on its logarithm.
    @Test
    void ratiosAndDeviationsSayBothLimitsWhereTheyLieUnevenly() {
        var ratio = answer(new Estimand.Ratio(), "1", 2.5, 2.31, 2.94, OptionalLong.empty(), 0);
        assertEquals("2.50, between 2.31 and 2.94 (95 %, lane A)", AnswerText.of(ratio, "A"));
        var top = answer(new Estimand.TailMean(.95), "t", 1.5, 1.1, 1.5, OptionalLong.empty(), 0);
        assertEquals("1.50, between 1.10 and 1.50 t (95 %, lane A)", AnswerText.of(top, "A"));
        var deviation = answer(new Estimand.StandardDeviation(), "mm", 1.97, 1.95, 1.99, OptionalLong.empty(), 0);
        assertEquals("1.970 ± 0.020 mm (95 %, lane A)", AnswerText.of(deviation, "A"));
    }
}
