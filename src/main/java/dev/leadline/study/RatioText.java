package dev.leadline.study;

import dev.leadline.interval.Ratio;
import java.math.BigDecimal;
import java.math.MathContext;
import java.math.RoundingMode;
import java.util.Locale;

/// Ratios and large counts as sentences say them: digits follow the error, limits are rounded outwards.
public final class RatioText {
    private static final double WRITTEN_OUT = 1e15;
    private static final int MOST_DIGITS = 6;

    private RatioText() {}

    /// As `480 (420 to 550)`.
    public static String of(Ratio ratio) {
        double half = (ratio.high() - ratio.low()) / 2;
        if (!(half > 1e-6 * ratio.value() && half < Double.POSITIVE_INFINITY)) {
            return about(ratio.value());
        }
        int place = (int) Math.floor(StrictMath.log10(Math.min(half, ratio.value())));
        return "%s (%s to %s)"
                .formatted(
                        at(place, ratio.value(), RoundingMode.HALF_EVEN),
                        at(place, ratio.low(), RoundingMode.FLOOR),
                        at(place, ratio.high(), RoundingMode.CEILING));
    }

    /// A count that is known roughly, to two digits, as `41,000`.
    public static String about(double count) {
        return written(new BigDecimal(count).round(new MathContext(2)));
    }

    /// A limit of a value much larger than the error keeps digits of its own.
    private static String at(int place, double number, RoundingMode mode) {
        var decimal = new BigDecimal(number);
        int own = decimal.precision() - decimal.scale() - 1;
        int kept = Math.max(Math.min(place, own), own - MOST_DIGITS);
        return written(decimal.setScale(-kept, mode));
    }

    private static String written(BigDecimal number) {
        return number.doubleValue() < WRITTEN_OUT
                ? String.format(Locale.ROOT, "%,." + Math.max(0, number.scale()) + "f", number)
                : String.format(Locale.ROOT, "%.1e", number).replace("e+", "e");
    }
}
