package dev.leadline.numeric;

import java.math.BigDecimal;

/// Doubles as decimal text: the fewest digits that read back as the same double, and of those the closest.
///
/// `Double.toString` gives such digits but never fewer than two (4.9E-324, where 5e-324 reads back as the same double);
/// the second digit is dropped here where one is enough.
public final class Shortest {

    private Shortest() {}

    /// As people write numbers, in files, fields and messages: `1e-5` and `1e15` take an exponent, `0.0001` and
    /// `1200000` do not; `∞`, `-∞` and `NaN` where it is none.
    public static String text(double x) {
        if (Double.isInfinite(x)) {
            return x < 0 ? "-∞" : "∞";
        }
        return Double.isNaN(x) ? "NaN" : write(x, -4, 15);
    }

    /// As ECMAScript writes numbers, which RFC 8785 §3.2.2.3 asks for: `0.000001`, `1e-7`, `1e+21`, `0` for -0.
    public static String canonical(double x) {
        if (!Double.isFinite(x)) {
            throw new IllegalArgumentException("JSON has no number " + x);
        }
        String text = write(x == 0 ? 0.0 : x, -6, 21);
        int e = text.indexOf('e');
        return e < 0 || text.charAt(e + 1) == '-' ? text : text.substring(0, e) + "e+" + text.substring(e + 1);
    }

    /// @param least smallest decimal exponent that is written without `e`
    /// @param below exponents from here on take an `e`
    private static String write(double x, int least, int below) {
        if (x == 0) {
            return 1 / x < 0 ? "-0" : "0";
        }
        BigDecimal shortest = shortest(Math.abs(x));
        String digits = shortest.unscaledValue().toString();
        int exponent = digits.length() - 1 - shortest.scale();
        String sign = x < 0 ? "-" : "";
        if (exponent < least || exponent >= below) {
            String fraction = digits.length() > 1 ? "." + digits.substring(1) : "";
            return sign + digits.charAt(0) + fraction + "e" + exponent;
        }
        if (exponent < 0) {
            return sign + "0." + "0".repeat(-exponent - 1) + digits;
        }
        if (digits.length() <= exponent + 1) {
            return sign + digits + "0".repeat(exponent + 1 - digits.length());
        }
        return sign + digits.substring(0, exponent + 1) + "." + digits.substring(exponent + 1);
    }

    private static BigDecimal shortest(double x) {
        BigDecimal found = new BigDecimal(Double.toString(x)).stripTrailingZeros();
        if (found.precision() != 2) {
            return found;
        }
        BigDecimal step = BigDecimal.ONE.movePointRight(1 - found.scale());
        BigDecimal down = found.subtract(found.remainder(step));
        BigDecimal up = down.add(step);
        BigDecimal exact = new BigDecimal(x);
        boolean downFits = down.doubleValue() == x;
        boolean upFits = up.doubleValue() == x;
        if (!downFits && !upFits) {
            return found;
        }
        boolean downCloser = exact.subtract(down).compareTo(up.subtract(exact)) <= 0;
        return (downFits && (downCloser || !upFits) ? down : up).stripTrailingZeros();
    }
}
