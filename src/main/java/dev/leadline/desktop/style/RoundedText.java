package dev.leadline.desktop.style;

import java.math.BigDecimal;
import java.math.MathContext;
import java.math.RoundingMode;

/// A value and its half-width with the half-width's two digits.
public record RoundedText(String value, String error) {
    public static RoundedText of(double value, double error) {
        var e = new BigDecimal(error).round(new MathContext(2, RoundingMode.UP));
        var v = new BigDecimal(value).setScale(e.scale(), RoundingMode.HALF_EVEN);
        int power = v.signum() == 0
                ? e.precision() - e.scale() - 1
                : Math.max(v.precision() - v.scale(), e.precision() - e.scale()) - 1;
        if (power >= -4 && power < 7) {
            return new RoundedText(v.setScale(Math.max(0, v.scale())).toPlainString(), e.toPlainString());
        }
        return new RoundedText(
                v.scaleByPowerOfTen(-power).toPlainString() + "e" + power,
                e.scaleByPowerOfTen(-power).toPlainString() + "e" + power);
    }

    public static String alone(double value) {
        return new BigDecimal(value)
                .round(new MathContext(6))
                .stripTrailingZeros()
                .toString()
                .replace("E", "e");
    }

    public static String limit(double value) {
        return new BigDecimal(value)
                .round(new MathContext(2, RoundingMode.UP))
                .toString()
                .replace("E", "e");
    }
}
