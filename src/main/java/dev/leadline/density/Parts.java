package dev.leadline.density;

import java.util.List;

/// The parts of what one polynomial of a table does not fit: polynomials of degree 13 of what the argument is beyond
/// the beginning of the part. They are searched, which is slow, and seldom asked. Immutable.
///
/// @param first the number of the first part of each whole, and at last the number of all parts
/// @param from where each part begins, rising within a whole from 0
/// @param coefficients [#STRIDE] of each part, lowest degree first
record Parts(int[] first, double[] from, double[] coefficients) {
    static final Parts NONE = new Parts(new int[1], new double[0], new double[0]);

    /// Coefficients of a part.
    static final int STRIDE = 14;

    /// @param wholes the parts of each: coefficients, then where it begins
    static Parts of(List<List<double[]>> wholes) {
        int size = wholes.stream().mapToInt(List::size).sum();
        var parts = new Parts(new int[wholes.size() + 1], new double[size], new double[size * STRIDE]);
        int k = 0;
        for (int number = 0; number < wholes.size(); number++) {
            for (double[] part : wholes.get(number)) {
                parts.from[k] = part[STRIDE];
                System.arraycopy(part, 0, parts.coefficients, k * STRIDE, STRIDE);
                k++;
            }
            parts.first[number + 1] = k;
        }
        return parts;
    }

    int wholes() {
        return first.length - 1;
    }

    long bytes() {
        return 4L * first.length + 8L * (from.length + coefficients.length);
    }

    /// The polynomial of one of the parts of a whole.
    double at(int whole, double t) {
        int low = first[whole];
        int high = first[whole + 1];
        while (high - low > 1) {
            int middle = (low + high) >>> 1;
            if (from[middle] <= t) {
                low = middle;
            } else {
                high = middle;
            }
        }
        return polynomial(coefficients, low * STRIDE, STRIDE, t - from[low]);
    }

    /// Horner's rule with the rounding errors of its steps carried along, so that only the result is rounded: what is
    /// monotone stays so at every double.
    ///
    /// Source: Graillat, Langlois and Louvet (2009), Compensated Horner scheme.
    static double polynomial(double[] c, int at, int n, double t) {
        double y = c[at + n - 1];
        double error = 0;
        for (int i = n - 2; i >= 0; i--) {
            double product = y * t;
            double sum = product + c[at + i];
            double added = sum - product;
            double lost = Math.fma(y, t, -product) + ((product - (sum - added)) + (c[at + i] - added));
            error = Math.fma(error, t, lost);
            y = sum;
        }
        return y + error;
    }
}
