package dev.leadline.numeric;

import java.math.BigDecimal;
import java.math.MathContext;

/// Numbers to a few significant digits, for reading: `0.0425`, `1180`, `3.2e-7`, `∞`.
public final class Significant {
    /// Whole numbers below this power of ten are written out.
    private static final int WRITTEN_OUT = 9;

    private Significant() {}

    public static String text(double value, int digits) {
        if (!Double.isFinite(value)) {
            return Double.isNaN(value) ? "not a number" : value > 0 ? "∞" : "−∞";
        }
        var rounded = new BigDecimal(value).round(new MathContext(digits)).stripTrailingZeros();
        int power = rounded.precision() - rounded.scale() - 1;
        return rounded.signum() == 0 || power >= -4 && power < WRITTEN_OUT
                ? rounded.toPlainString()
                : rounded.movePointLeft(power).toPlainString() + "e" + power;
    }
}
