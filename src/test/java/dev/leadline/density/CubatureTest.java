package dev.leadline.density;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.leadline.density.Expectation.Limit;
import java.util.Collections;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/// Moments of the normal density in three and four variables, exact: products of 1, 3, 15.
class CubatureTest {
    private static final Density NORMAL = new Normal(0, 1);

    @ParameterizedTest
    @ValueSource(ints = {3, 4})
    void integratesMomentsToItsTolerance(int n) {
        var inputs = Collections.nCopies(n, NORMAL);
        var found = Expectation.of(
                inputs,
                (x, z, rows) -> {
                    for (int i = 0; i < rows; i++) {
                        double a = x[0][i] * x[0][i];
                        double b = x[1][i] * x[1][i];
                        double c = x[n - 1][i] * x[n - 1][i];
                        z[i] = a * b * b * c + a + x[0][i] * x[1][i] * x[2][i];
                    }
                },
                Limit.of(20_000_000));
        assertEquals(4, found.mean(), found.error());
        assertEquals(4, found.mean(), 1e-4);
        // E a^2 b^4 c^2 + E a^2 + 2 E a^2 b^2 c + E (x y z)^2, less the square of the mean.
        assertEquals(Math.sqrt(3 * 105 * 3 + 3 + 2 * 9 + 1 - 16), found.deviation(), 1e-2);
        assertTrue(found.tails() < 1e-6, found.toString());
    }
}
