package dev.leadline.scheme;

import java.util.Arrays;
import java.util.List;

/// The direction numbers of Sobol's sequence: Joe and Kuo (2008), criterion D(6); source and licence stand in
/// the resource `joe-kuo-d6.txt`.
final class DirectionNumbers {
    static final int DIMENSIONS = 1111;

    /// Of each point, and as many direction numbers of each dimension.
    static final int DIGITS = 32;

    /// By dimension from 2: polynomial, then the first numbers m.
    private static final List<int[]> FIRST = TextResource.lines("joe-kuo-d6.txt")
            .map(line ->
                    Arrays.stream(line.split(" ")).mapToInt(Integer::parseInt).toArray())
            .toList();

    private DirectionNumbers() {}

    /// The digits of the points 1, 2, 4, 8 ... of a dimension, first digit in the lowest bit.
    ///
    /// @param dimension from 1
    static int[] ofDimension(int dimension) {
        if (dimension < 1 || dimension > DIMENSIONS) {
            throw new IllegalArgumentException("dimension " + dimension + " of " + DIMENSIONS);
        }
        int[] v = new int[DIGITS];
        if (dimension == 1) {
            for (int k = 0; k < DIGITS; k++) {
                v[k] = 1 << k;
            }
            return v;
        }
        int[] first = FIRST.get(dimension - 2);
        int polynomial = first[0];
        int degree = first.length - 1;
        for (int k = 0; k < DIGITS; k++) {
            if (k < degree) {
                v[k] = first[k + 1] << (DIGITS - 1 - k);
            } else {
                v[k] = v[k - degree] ^ (v[k - degree] >>> degree);
                for (int i = 1; i < degree; i++) {
                    if ((polynomial >>> (degree - i) & 1) != 0) {
                        v[k] ^= v[k - i];
                    }
                }
            }
        }
        return Arrays.stream(v).map(Integer::reverse).toArray();
    }
}
