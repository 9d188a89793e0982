package dev.leadline.numeric;

import static org.junit.jupiter.api.Assertions.assertEquals;

import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class ErrorFunctionTest {
    /// Documented in [ErrorFunction]; seen: 1.6.
    private static final double BOUND = 2;

    /// Seen: 4.6, next to 0.
    private static final double BOUND_OF_COMPLEMENT = 5;

    @Test
    void erfKeepsItsBound() {
        Kernels.within(BOUND, ErrorFunction::erf, HighPrecision::erf, Kernels.between(-1, 1, 1), 1_000);
        Kernels.within(BOUND, ErrorFunction::erf, HighPrecision::erf, Kernels.anyExponent(1, 2), 1_000);
        Kernels.within(1, ErrorFunction::erf, HighPrecision::erf, Kernels.between(-6, -1, 3), 1_000);
    }

    @Test
    void erfcKeepsItsBound() {
        Kernels.within(BOUND_OF_COMPLEMENT, ErrorFunction::erfc, HighPrecision::erfc, Kernels.between(0, 1, 4), 1_000);
        Kernels.within(BOUND_OF_COMPLEMENT, ErrorFunction::erfc, HighPrecision::erfc, Kernels.between(1, 6, 5), 1_000);
        Kernels.within(BOUND, ErrorFunction::erfc, HighPrecision::erfc, Kernels.between(-6, 0, 6), 1_000);
    }

    @Test
    void erfcUnderflowsGradually() {
        Kernels.within(BOUND_OF_COMPLEMENT, ErrorFunction::erfc, HighPrecision::erfc, Kernels.between(6, 27.3, 7), 120);
        Kernels.within(BOUND, ErrorFunction::erfc, HighPrecision::erfc, Kernels.between(26.5, 27.3, 8), 60);
    }

    @ParameterizedTest
    @CsvSource({
        "0, 0.0, 1",
        "-0.0, -0.0, 1",
        "Infinity, 1, 0.0",
        "-Infinity, -1, 2",
        "NaN, NaN, NaN",
        "27.2265, 1, 0.0",
        "-28, -1, 2"
    })
    void specialValues(double x, double erf, double erfc) {
        assertEquals(erf, ErrorFunction.erf(x));
        assertEquals(erfc, ErrorFunction.erfc(x));
    }

    @Test
    void blockGivesTheBitsOfTheScalar() {
        Kernels.sameBits(ErrorFunction::erf, ErrorFunction::erf, Kernels.between(-3, 3, 9));
        Kernels.sameBits(ErrorFunction::erfc, ErrorFunction::erfc, Kernels.between(-3, 28, 10));
    }

    /// Recorded after the bounds held. Checked by hand to be the same on JDK 25 with -Xint, -XX:TieredStopAtLevel=1,
    /// -XX:UseAVX=2 and -XX:UseAVX=0, and on JDK 17.
    @Test
    void bitsDoNotChange() {
        assertEquals("0cc09c73e9bb4b36", Kernels.fingerprint(ErrorFunction::erf, Kernels.between(-3, 3, 11)));
        assertEquals("e3507cf0c05eae94", Kernels.fingerprint(ErrorFunction::erfc, Kernels.between(-3, 28, 12)));
    }

    /// mpmath, 60 digits.
    @ParameterizedTest(name = "x = {0}")
    @CsvSource({
        "0, 1.0",
        "1e-9, 0.999999998871620834",
        "0.3, 0.73459933456765515",
        "1, 0.427583576155807004",
        "2, 0.255395676310505744",
        "7, 0.0798000543291529335",
        "15, 0.0375296063885057657",
        "27.9, 0.0202088846212826167",
        "28.1, 0.0200652313771972089",
        "100, 5.6416137829894329e-3",
        "1e5, 5.64189583519546808e-6",
        "1e200, 5.64189583547756304e-201",
        "-0.5, 1.95236048918255709",
        "-3, 16205.9888539995866"
    })
    void scaledComplement(double x, double expected) {
        assertEquals(expected, ErrorFunction.erfcx(x), (x < 0 ? 25 : 5) * Math.ulp(expected));
    }
}
