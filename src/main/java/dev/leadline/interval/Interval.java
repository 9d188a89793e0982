package dev.leadline.interval;

import java.math.BigDecimal;
import java.math.MathContext;
import java.math.RoundingMode;
import java.util.Optional;

/// An interval for a fixed number of draws, with what it is and what it assumes.
///
/// @param low lower limit; `NaN` where no such limit exists at this n, and then `note` says which n would do
/// @param high upper limit; `NaN` likewise
/// @param level of confidence, as .95
/// @param kind word of the project file and of the commands, as `student`
/// @param assumption one sentence: what the interval takes for granted
/// @param note why a limit is missing, or one-sided, and what would help
public record Interval(double low, double high, double level, String kind, String assumption, Optional<String> note) {
    private static final double LOPSIDED = 1.15;

    /// Decimal places of a level that are written out.
    private static final int LEVEL_PLACES = 6;

    /// Digits of a level from here on are rounding errors.
    private static final int LEVEL_NOISE = 14;

    /// No interval.
    ///
    /// @param note why there is none, and which n would do
    static Interval none(double level, String kind, String assumption, String note) {
        return new Interval(Double.NaN, Double.NaN, level, kind, assumption, Optional.of(note));
    }

    /// Whether both limits are missing.
    boolean isNone() {
        return Double.isNaN(low) && Double.isNaN(high);
    }

    /// Whether a limit is missing.
    boolean isLacking() {
        return Double.isNaN(low) || Double.isNaN(high);
    }

    /// The same limits, or the same reason for none, under the word of another kind.
    Interval as(String otherKind, String otherAssumption) {
        return new Interval(low, high, level, otherKind, otherAssumption, note);
    }

    /// The level as `95 %`.
    public String percent() {
        return percent(level);
    }

    /// A level as `95 %`; one with many digits, as that of each of three intervals that hold together, a little
    /// lower: a third of 5 % off is `98.33 %`.
    public static String percent(double level) {
        BigDecimal shown = new BigDecimal(level)
                .setScale(LEVEL_NOISE, RoundingMode.HALF_EVEN)
                .stripTrailingZeros();
        if (shown.scale() > LEVEL_PLACES) {
            shown = BigDecimal.ONE.subtract(BigDecimal.ONE.subtract(shown).round(new MathContext(3, RoundingMode.UP)));
        }
        return shown.movePointRight(2).stripTrailingZeros().toPlainString() + " %";
    }

    /// Whether `estimate ± halfWidth` is another interval than this one: one end is much farther from the estimate
    /// than the other, as with few hits. Of 550 draws with a chance of 1 in 100, the plain form holds it in 91 % of
    /// the runs, the limits of Clopper and Pearson in 98 %; from about 25 hits on the two agree.
    public boolean lopsided(double estimate) {
        return lopsided(estimate, low, high);
    }

    /// The same, of its limits.
    public static boolean lopsided(double estimate, double low, double high) {
        return Math.max(high - estimate, estimate - low) > LOPSIDED * (high - low) / 2;
    }

    /// How far the value sought may lie from the estimate, as a numerical tolerance asks: half the length, and where
    /// the interval is lopsided the distance of the farther limit; of one limit alone its distance. `NaN` where a
    /// limit is missing.
    public double reach(double estimate) {
        if (low == Double.NEGATIVE_INFINITY) {
            return high - estimate;
        }
        if (high == Double.POSITIVE_INFINITY) {
            return estimate - low;
        }
        return lopsided(estimate) ? Math.max(high - estimate, estimate - low) : halfWidth();
    }

    /// This interval as far as it lies between two limits that the value sought cannot pass; a limit that was moved
    /// is told.
    public Interval within(double least, double most) {
        if (!(low < least || high > most)) {
            return this;
        }
        String moved =
                (low < least ? "the lower limit is %s, which the value sought is not below".formatted(text(least)) : "")
                        + (low < least && high > most ? "; " : "")
                        + (high > most ? "the upper limit is %s, which it is not above".formatted(text(most)) : "");
        return new Interval(
                Math.clamp(low, least, most),
                Math.clamp(high, least, most),
                level,
                kind,
                assumption,
                Optional.of(note.map(said -> said + "; ").orElse("") + moved));
    }

    private static String text(double limit) {
        return new BigDecimal(limit).stripTrailingZeros().toPlainString();
    }

    /// Half the length; `NaN` where a limit is missing.
    public double halfWidth() {
        return (high - low) / 2;
    }
}
