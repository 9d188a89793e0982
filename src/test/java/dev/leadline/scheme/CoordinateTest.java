package dev.leadline.scheme;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.leadline.stream.Address;
import dev.leadline.stream.Purpose;
import dev.leadline.stream.Stream;
import java.util.Arrays;
import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/// What every coordinate promises.
class CoordinateTest {
    private static final Address ADDRESS = new Address(20261201, Purpose.RUN, "A", 0, "x", 0);

    static java.util.stream.Stream<Coordinate> coordinates() {
        return java.util.stream.Stream.of(
                Sobol.dimension(17).randomised(Scrambling.NESTED, Stream.at(ADDRESS)),
                Sobol.dimension(17).randomised(Scrambling.DIGITAL_SHIFT, Stream.at(ADDRESS)),
                Lattice.dimension(17).shifted(Stream.at(ADDRESS)));
    }

    @ParameterizedTest
    @MethodSource("coordinates")
    void piecesAreTheWhole(Coordinate coordinate) {
        int n = 10_000;
        double[] whole = new double[n];
        coordinate.fill(whole, 0, n);
        var random = new SplittableRandom(1);
        for (int first = 0; first < n; ) {
            int rows = Math.min(random.nextInt(0, 2500), n - first);
            double[] piece = new double[rows + 1];
            piece[rows] = 7;
            coordinate.fill(piece, first, rows);
            assertArrayEquals(Arrays.copyOfRange(whole, first, first + rows), Arrays.copyOf(piece, rows));
            assertEquals(7, piece[rows]);
            first += rows;
        }
    }

    @ParameterizedTest
    @MethodSource("coordinates")
    void pointsAreMiddlesOfCells(Coordinate coordinate) {
        double[] u = new double[1 << 16];
        coordinate.fill(u, 1 << 19, u.length);
        for (double x : u) {
            assertTrue(x > 0 && x < 1);
            assertEquals(1, (long) (x * 0x1p53) & 1);
            assertEquals(0, x * 0x1p53 % 1);
        }
    }

    @Test
    void theOutermostDigitsAreInside() {
        assertEquals(0x1p-53, Fraction.of(0, 0));
        assertEquals(1 - 0x1p-53, Fraction.of(-1, 0xfffff));
        assertEquals(0.5 - 0x1p-53, Fraction.of(0x7fffffff, 0xfffff));
        assertEquals(0.5 + 0x1p-53, Fraction.of(0x80000000, 0));
    }
}
