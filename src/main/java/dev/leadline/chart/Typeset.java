package dev.leadline.chart;

import java.math.BigDecimal;
import java.math.MathContext;
import java.util.regex.Pattern;

/// Numbers and units as a printed figure sets them: raised exponents, a true minus, thousands apart. Independent of
/// the locale.
final class Typeset {
    private static final String RAISED = "⁰¹²³⁴⁵⁶⁷⁸⁹";
    /// An exponent behind `^`, or right behind a unit that people write so: `m2`, `h-1`; not the 2 of CO2 or the 3 of
    /// 1e3.
    private static final Pattern EXPONENT = Pattern.compile(
            "(?<![\\p{L}\\d])(\\p{L}+(?=\\^)|[kcdmµμn]?m|ft|in|yd|mi|s|min|h|d|a|K|k?g|k?[VAWN])\\^?(-?[1-9])(?![\\p{L}\\d.])");

    private Typeset() {}

    /// `10⁻⁵`; `1` and `10` stay as they are.
    static String power(int exponent) {
        return switch (exponent) {
            case 0 -> "1";
            case 1 -> "10";
            default -> "10" + raised(Integer.toString(exponent));
        };
    }

    /// A unit with raised exponents: `m2` and `m^2` become `m²`; nothing for the unit 1.
    static String unit(String unit) {
        return unit.equals("1")
                ? ""
                : EXPONENT.matcher(unit).replaceAll(found -> found.group(1) + raised(found.group(2)));
    }

    static String quantity(String number, String unit) {
        return (number + " " + unit(unit)).strip();
    }

    /// With every digit that `value` has: `18,400.5`, `−0.25`.
    static String plain(BigDecimal value) {
        String digits = value.abs().toPlainString();
        int point = digits.indexOf('.') < 0 ? digits.length() : digits.indexOf('.');
        var text = new StringBuilder(digits);
        for (int i = point - 3; i > 0; i -= 3) {
            text.insert(i, ',');
        }
        return value.signum() < 0 ? "−" + text : text.toString();
    }

    static String count(long count) {
        return plain(BigDecimal.valueOf(count));
    }

    /// The value as it was typed, at most `digits` significant ones: `1.2568×10⁻⁵`.
    static String number(double value, int digits) {
        if (!Double.isFinite(value)) {
            return Double.isNaN(value) ? "none" : value > 0 ? "∞" : "−∞";
        }
        return scientific(
                BigDecimal.valueOf(value).round(new MathContext(digits)).stripTrailingZeros());
    }

    /// A finite number written by [Rounding][dev.leadline.numeric.Rounding]: `-1.2568e-5` becomes `−1.2568×10⁻⁵`.
    static String set(String written) {
        int e = written.indexOf('e');
        var digits = new BigDecimal(e < 0 ? written : written.substring(0, e));
        if (digits.signum() == 0) {
            return "0";
        }
        String mantissa = plain(digits);
        return e < 0 ? mantissa : mantissa + "×" + power(Integer.parseInt(written.substring(e + 1)));
    }

    private static String scientific(BigDecimal value) {
        int exponent = value.precision() - value.scale() - 1;
        if (value.signum() == 0) {
            return "0";
        }
        if (exponent >= -3 && exponent < 7) {
            return plain(value.scale() < 0 ? value.setScale(0) : value);
        }
        return plain(value.movePointLeft(exponent)) + "×" + power(exponent);
    }

    private static String raised(String digits) {
        var text = new StringBuilder();
        for (char c : digits.toCharArray()) {
            text.append(c == '-' ? '⁻' : RAISED.charAt(c - '0'));
        }
        return text.toString();
    }
}
