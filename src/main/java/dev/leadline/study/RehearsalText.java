package dev.leadline.study;

import dev.leadline.interval.Interval;
import dev.leadline.model.Sentence;
import dev.leadline.model.UnitWords;
import dev.leadline.numeric.Rounding;
import dev.leadline.numeric.Significant;
import dev.leadline.trace.Rehearsal;
import dev.leadline.trace.Rehearsed;
import dev.leadline.trace.Sought;
import java.math.BigDecimal;
import java.math.RoundingMode;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;

/// A rehearsal in sentences.
public final class RehearsalText {
    /// Misses of one side that are so many times those of the other are said to be on that side.
    private static final double LOPSIDED = 2;

    /// An error below this part of the value is that of rounding.
    private static final double EXACT = 1e-13;

    private static final int EXACT_DIGITS = 15;

    private RehearsalText() {}

    /// As `91.7 % ± 0.6 %`, the standard error behind it; the lower limit where every interval holds its
    /// value.
    public static String rate(Rehearsed answer) {
        if (answer.bounded() == 0) {
            return "no interval";
        }
        double mcse = answer.mcse();
        if (mcse > 0) {
            var rounding = Rounding.of(100 * answer.rate(), 100 * mcse);
            return rounding.value() + " % ± " + rounding.uncertainty().orElseThrow() + " %";
        }
        var likely = answer.rateInterval(.95);
        return answer.rate() == 1
                ? "100 %% (at least %s %%)".formatted(percent(likely.low(), RoundingMode.FLOOR))
                : "0 %% (at most %s %%)".formatted(percent(likely.high(), RoundingMode.CEILING));
    }

    private static String percent(double rate, RoundingMode mode) {
        return new BigDecimal(100 * rate).setScale(1, mode).toPlainString();
    }

    /// How many intervals hold the value, and on which side the others miss it.
    public static String counts(Rehearsed answer) {
        String missing = answer.unbounded() == 0
                ? ""
                : String.format(
                        Locale.ROOT, "; without an interval, and not counted: %,d repetitions", answer.unbounded());
        return String.format(
                Locale.ROOT,
                "%,d of %,d intervals hold the value, %s; %,d lie below it, %,d above%s.",
                answer.held(),
                answer.bounded(),
                rate(answer),
                answer.missedLow(),
                answer.missedHigh(),
                missing);
    }

    /// What the rate means.
    public static String meaning(Rehearsal rehearsal, Rehearsed answer) {
        String stated = Interval.percent(answer.level());
        String draws = draws(rehearsal);
        return switch (answer.verdict()) {
            case HOLDS ->
                String.format(
                        Locale.ROOT,
                        "At %s the %s interval (%s) holds as often as it says, as far as %,d repetitions can tell.",
                        draws,
                        stated,
                        answer.kind(),
                        answer.bounded());
            case FALLS_SHORT ->
                "At %s the interval (%s) holds less often than the %s it says%s."
                        .formatted(draws, answer.kind(), stated, side(answer));
            case MORE_THAN_STATED ->
                "At %s the interval (%s) holds more often than the %s it says: it errs on the safe side."
                        .formatted(draws, answer.kind(), stated);
            case NOTHING -> "At %s no repetition has an interval: nothing can be said.".formatted(draws);
        };
    }

    /// As `100 draws`, or `12,400 draws on average`.
    public static String draws(Rehearsal rehearsal) {
        return String.format(
                Locale.ROOT,
                rehearsal.meanDraws() == rehearsal.draws() ? "%,.0f draws" : "%,.0f draws on average",
                rehearsal.meanDraws());
    }

    private static String side(Rehearsed answer) {
        return answer.missedLow() > LOPSIDED * answer.missedHigh()
                ? ": mostly it lies too low, as where rare, large outcomes are seldom seen"
                : answer.missedHigh() > LOPSIDED * answer.missedLow()
                        ? ": mostly it lies too high, as where rare, small outcomes are seldom seen"
                        : "";
    }

    /// What the intervals are judged by.
    public static String sought(Rehearsed answer) {
        Sought sought = answer.sought();
        var rounding = Rounding.of(sought.value(), sought.error());
        boolean isExact = sought.error() < EXACT * Math.abs(sought.value());
        String value = (isExact ? Significant.text(sought.value(), EXACT_DIGITS) : rounding.value())
                + rounding.uncertainty()
                        .filter(_ -> !isExact)
                        .map(error -> " ± " + error)
                        .orElse("")
                + UnitWords.after(answer.ask().unit());
        String from = sought.draws() > 0
                ? "from " + sought.source()
                : sought.source().isBlank() ? "as stated" : "as stated: " + sought.source();
        return "Value sought: %s, %s.%s"
                .formatted(
                        value,
                        from,
                        answer.isDoubtful()
                                ? " It is too uncertain beside the intervals: some of them miss it for its own error."
                                : "");
    }

    /// How the estimates stray.
    public static List<String> estimates(Rehearsed answer) {
        List<String> sentences = new ArrayList<>();
        double spread = answer.empiricalError();
        String unit = UnitWords.after(answer.ask().unit());
        if (spread > 0) {
            sentences.add("Bias of the estimates %s, their standard error %s%s%s."
                    .formatted(
                            with(answer.bias(), answer.biasMcse()) + unit,
                            with(spread, answer.empiricalMcse()) + unit,
                            Double.isNaN(answer.reportedError())
                                    ? ""
                                    : ", which they state as " + with(answer.reportedError(), answer.reportedMcse())
                                            + unit,
                            Double.isNaN(answer.meanHalfWidth())
                                    ? ""
                                    : "; mean half-width " + Significant.text(answer.meanHalfWidth(), 3) + unit));
        }
        return sentences;
    }

    private static String with(double value, double error) {
        var rounding = Rounding.of(value, error);
        return rounding.value() + rounding.uncertainty().map(u -> " ± " + u).orElse("");
    }

    /// Of the tolerance, where there is one, and of several answers together.
    public static List<String> further(Rehearsal rehearsal, double confidence) {
        List<String> sentences = new ArrayList<>();
        rehearsal
                .near()
                .ifPresent(near -> sentences.add(String.format(
                        Locale.ROOT,
                        "%,d of %,d repetitions meet the tolerance; %,d estimates are within it of the value.",
                        rehearsal.met(),
                        rehearsal.repetitions(),
                        near)));
        rehearsal
                .heldTogether()
                .ifPresent(held -> sentences.add(String.format(
                        Locale.ROOT,
                        "All %d intervals hold at once in %,d of %,d repetitions, %.1f %%, where %s is stated.",
                        rehearsal.answers().size(),
                        held,
                        rehearsal.repetitions(),
                        100.0 * held / rehearsal.repetitions(),
                        Sentence.percent(confidence))));
        return sentences;
    }
}
