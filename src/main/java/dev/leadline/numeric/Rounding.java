package dev.leadline.numeric;

import java.math.BigDecimal;
import java.math.MathContext;
import java.math.RoundingMode;
import java.util.Optional;

/// How the numbers of one estimate are written: the uncertainty to two significant digits, the value to the same
/// decimal place, interval limits to that place too but outwards: the printed interval contains the computed one.
///
/// All numbers of an estimate share a notation: decimal places, or one common power of ten (`1.2568e-5` and
/// `0.0040e-5`) where the larger of value and uncertainty is below 1e-4, or at least 1e7 with figures that mean nothing
/// before the decimal point. The decimal point is a point in every locale. What is rounded is the shortest decimal that
/// is this double: 0.3 downwards is 0.3. Ties go to the even digit.
///
/// Where there is no uncertainty (zero or NaN: exact, or not known) or no end to it, nothing is rounded.
///
/// Source: JCGM 100:2008, 7.2.2 and 7.2.6, and general laboratory practice.
///
/// @param value the value
/// @param uncertainty the uncertainty; empty if zero or NaN, because `± 0` is never to be printed; `∞` if infinite
/// @param place the power of ten of the last digit; empty where nothing is rounded
/// @param exponent the common power of ten; 0 for ordinary decimals
public record Rounding(String value, Optional<String> uncertainty, Optional<Integer> place, int exponent) {
    private static final int DIGITS = 2;
    private static final BigDecimal SMALL = new BigDecimal("1e-4");
    private static final BigDecimal LARGE = new BigDecimal("1e7");

    /// From here on ordinary decimals would show more digits than a double has.
    private static final BigDecimal HUGE = new BigDecimal("1e15");

    /// The notation of an estimate.
    ///
    /// @param uncertainty at least 0, or NaN where it is not known
    public static Rounding of(double value, double uncertainty) {
        if (uncertainty < 0)
            throw new IllegalArgumentException("Uncertainty is " + uncertainty + " but must be at least 0");
        if (!(uncertainty > 0 && uncertainty < Double.POSITIVE_INFINITY)) {
            Optional<String> end = uncertainty > 0 ? Optional.of(unrounded(uncertainty)) : Optional.empty();
            return new Rounding(unrounded(value), end, Optional.empty(), 0);
        }
        BigDecimal rounded = decimal(uncertainty).round(new MathContext(DIGITS, RoundingMode.HALF_EVEN));
        // 5 has one digit and is written 5.0
        int place = 1 - DIGITS + leadingPlace(rounded);
        BigDecimal size = rounded;
        if (Double.isFinite(value))
            size = size.max(toPlace(value, place, RoundingMode.HALF_EVEN).abs());
        boolean isPower =
                size.compareTo(SMALL) < 0 || size.compareTo(LARGE) >= 0 && place > 0 || size.compareTo(HUGE) >= 0;
        int exponent = isPower ? leadingPlace(size) : 0;
        return new Rounding(
                write(value, place, exponent, RoundingMode.HALF_EVEN),
                Optional.of(write(uncertainty, place, exponent, RoundingMode.HALF_EVEN)),
                Optional.of(place),
                exponent);
    }

    /// How far a number may be off for so many significant digits of its uncertainty to mean something: half a unit of
    /// the last of them.
    ///
    /// Source: JCGM 101:2008, 7.9.2.
    ///
    /// @param uncertainty above 0, finite
    /// @param digits at least 1
    public static double tolerance(double uncertainty, int digits) {
        if (!(uncertainty > 0 && uncertainty < Double.POSITIVE_INFINITY)) {
            throw new IllegalArgumentException("Uncertainty is " + uncertainty + " but must be above 0 and finite");
        }
        BigDecimal rounded = decimal(uncertainty).round(new MathContext(digits, RoundingMode.HALF_EVEN));
        return new BigDecimal("0.5")
                .scaleByPowerOfTen(1 - digits + leadingPlace(rounded))
                .doubleValue();
    }

    /// An upper limit that stands alone: its own two significant digits, rounded upwards.
    ///
    /// @param limit at least 0
    public static String atMost(double limit) {
        return of(limit, limit).up(limit);
    }

    /// A lower limit in the notation of this estimate, rounded downwards.
    public String down(double limit) {
        return limit(limit, RoundingMode.FLOOR);
    }

    /// An upper limit in the notation of this estimate, rounded upwards.
    public String up(double limit) {
        return limit(limit, RoundingMode.CEILING);
    }

    private String limit(double limit, RoundingMode direction) {
        if (limit == 0 && exponent != 0) return "0";
        return place.map(last -> write(limit, last, exponent, direction)).orElseGet(() -> unrounded(limit));
    }

    private static String write(double number, int place, int exponent, RoundingMode mode) {
        if (!Double.isFinite(number)) return unrounded(number);
        BigDecimal rounded = toPlace(number, place, mode);
        if (exponent == 0) return rounded.setScale(Math.max(0, -place)).toPlainString();
        return rounded.movePointLeft(exponent).setScale(exponent - place).toPlainString() + "e" + exponent;
    }

    /// The shortest decimal that is this number, in full.
    private static String unrounded(double number) {
        if (Double.isNaN(number)) return "NaN";
        if (Double.isInfinite(number)) return number > 0 ? "∞" : "-∞";
        BigDecimal decimal = decimal(number);
        BigDecimal size = decimal.abs();
        if (size.signum() == 0 || size.compareTo(SMALL) >= 0 && size.compareTo(HUGE) < 0)
            return decimal.toPlainString();
        int exponent = leadingPlace(size);
        BigDecimal mantissa = decimal.movePointLeft(exponent).stripTrailingZeros();
        return mantissa.setScale(Math.max(1, mantissa.scale())).toPlainString() + "e" + exponent;
    }

    private static BigDecimal toPlace(double number, int place, RoundingMode mode) {
        return decimal(number).setScale(-place, mode);
    }

    private static BigDecimal decimal(double number) {
        return new BigDecimal(Double.toString(number));
    }

    /// The power of ten of the first digit.
    private static int leadingPlace(BigDecimal number) {
        return number.precision() - number.scale() - 1;
    }
}
