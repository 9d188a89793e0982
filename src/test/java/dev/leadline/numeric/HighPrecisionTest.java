package dev.leadline.numeric;

import static org.junit.jupiter.api.Assertions.assertTrue;

import java.math.BigDecimal;
import java.math.MathContext;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvFileSource;

/// The oracle of the kernels against an independent program.
class HighPrecisionTest {
    private static final BigDecimal BOUND = new BigDecimal("1e-48");

    @ParameterizedTest(name = "{0}({1})")
    @CsvFileSource(resources = "/numeric/high-precision.csv", numLinesToSkip = 2)
    void agreesWithTheTableTo48Digits(String function, double x, BigDecimal expected) {
        HighPrecision.Value value = switch (function) {
            case "exp" -> HighPrecision.exp(x);
            case "log" -> HighPrecision.log(x);
            case "sin" -> HighPrecision.sin(x);
            case "cos" -> HighPrecision.cos(x);
            case "pow1.7" -> HighPrecision.pow(x, 1.7);
            case "erf" -> HighPrecision.erf(x);
            case "erfc" -> HighPrecision.erfc(x);
            case "upper" -> HighPrecision.normalUpperTail(x);
            case "density" -> HighPrecision.normalDensity(x);
            default -> throw new AssertionError(function);
        };
        BigDecimal miss = value.decimal()
                .subtract(expected)
                .divide(expected, MathContext.DECIMAL64)
                .abs();
        assertTrue(miss.compareTo(BOUND) < 0, () -> "relative " + miss);
    }
}
