package dev.leadline.density;

/// The parts of those cells of a table that one polynomial does not fit: polynomials of degree 5 of what the argument
/// of
/// the cell is beyond the beginning of the part. Immutable.
///
/// @param from where each part begins, rising within a cell from 0
/// @param coefficients six of each part, lowest degree first
record Parts(double[] from, double[] coefficients) {
    static final Parts NONE = new Parts(new double[0], new double[0]);

    int size() {
        return from.length;
    }

    boolean isEmpty() {
        return from.length == 0;
    }

    /// The polynomial of one of the parts from `first` up to, but not with, `end`.
    double at(int first, int end, double t) {
        int low = first;
        int high = end;
        while (high - low > 1) {
            int middle = (low + high) >>> 1;
            if (from[middle] <= t) {
                low = middle;
            } else {
                high = middle;
            }
        }
        double[] c = coefficients;
        int k = low * Table.STRIDE;
        double s = t - from[low];
        double y = Math.fma(c[k + 5], s, c[k + 4]);
        y = Math.fma(y, s, c[k + 3]);
        y = Math.fma(y, s, c[k + 2]);
        y = Math.fma(y, s, c[k + 1]);
        return Math.fma(y, s, c[k]);
    }
}
