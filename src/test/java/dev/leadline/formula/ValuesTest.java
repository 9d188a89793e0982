package dev.leadline.formula;

import static org.junit.jupiter.api.Assertions.assertEquals;

import java.util.LinkedHashMap;
import java.util.List;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/// Values of whole formulas, worked out by hand; `x` is 3, `y` is -2, `z` is .5, `n` is `NaN`, `big` is ∞.
class ValuesTest {
    private static final List<String> NAMES = List.of("x", "y", "z", "n", "big");
    private static final double[][] COLUMNS = {{3}, {-2}, {.5}, {Double.NaN}, {Double.POSITIVE_INFINITY}};

    static double value(String formula) {
        var program = Working.of(NAMES, new LinkedHashMap<>(), List.of(), List.of(formula))
                .program();
        double[][] results = new double[1][1];
        program.evaluate(COLUMNS, 1, results, program.workspace());
        return results[0][0];
    }

    @ParameterizedTest(name = "{0} = {1}")
    @CsvSource(delimiter = ';', textBlock = """
            # precedence
            -2^2; -4
            2^3^2; 512
            2^-1; 0.5
            -x^2; -9
            (-x)^2; 9
            2^-x^2; 0.001953125
            2^-1*4; 2
            x*-y; 6
            -x*y; 6
            +x; 3
            2 - 3 - 4; -5
            12/3/2; 2
            2 + 3*4; 14
            1 - 2 < 3 - 3; 1
            x > 2 & y < 0; 1
            x > 4 & y < 0 | z == 0.5; 1
            z == 0.5 | x > 4 & y > 0; 1
            not(x > 2) | x < 4; 1
            not(x > 2) & y < 0; 0
            # conditions
            [x > 3]; 0
            [x >= 3]; 1
            [x <= 3] + [x < 3]; 1
            [x != 3]; 0
            2*[x == 3] - 1; 1
            [x]; 1
            [x == 3 & y == -2]; 1
            if(x > 2, 10, 20); 10
            if(x < 2, 10, 20); 20
            if(y, 10, 20); 10
            if(x - 3, 10, 20); 20
            if(x > 0, x, log(y)); 3
            if(x < 0, log(y), x); 3
            not(x); 0
            not(0); 1
            # what cannot be compared
            n > 1; NaN
            1 == n; NaN
            n != n; NaN
            not(n); NaN
            [n]; NaN
            n & 0; NaN
            0 & n; NaN
            n & 1; NaN
            n | 1; NaN
            1 | n; NaN
            n | 0; NaN
            if(n, 1, 2); NaN
            if(x > 1, n, 2); NaN
            if(x > 1, 2, n); 2
            max(n, 1); NaN
            min(1, n); NaN
            0*n; NaN
            0*big; NaN
            big < big; 0
            big <= big; 1
            big == big; 1
            big != big; 0
            -big < big; 1
            big > x; 1
            1/0; Infinity
            -1/0; -Infinity
            0/0; NaN
            sqrt(y); NaN
            n^0; 1
            # functions
            max(x, y); 3
            max(y, z, x, 1); 3
            min(x, y, 1); -2
            abs(y); 2
            sign(y); -1
            sign(0); 0
            floor(-0.5); -1
            ceil(0.25); 1
            round(2.5); 2
            round(3.5); 4
            round(-2.5); -2
            hypot(x, 4); 5
            sqrt(x*12); 6
            cbrt(-27); -3
            exp(0); 1
            log(1); 0
            log10(1000); 3
            atan2(0, -1) == pi; 1
            sin(0); 0
            cos(0); 1
            log(e); 1
            180*deg == pi; 1
            x^0.5*x^0.5 - 3 < 1e-15; 1
            x^-1; 0.3333333333333333
            x^4; 81
            1.5e3 + .5 + 2.; 1502.5
            """)
    void ofFormula(String formula, double expected) {
        assertEquals(expected, value(formula), 0.0);
    }
}
