package dev.leadline.density;

import java.util.List;

/// The parts of those cells of a table that one polynomial does not fit: polynomials of degree 5 of what the argument
/// of the cell is beyond the beginning of the part. Immutable.
///
/// @param from where each part begins, rising within a cell from 0
/// @param until where it ends, in the same units
/// @param coefficients six of each part, lowest degree first
/// @param guide the part at the beginning of each of the 64 slices of a cell, where a search begins
/// @param perUnit slices in an argument of 1
record Parts(double[] from, double[] until, double[] coefficients, int[] guide, double perUnit) {
    static final Parts NONE = new Parts(new double[0], new double[0], new double[0], new int[0], 0);

    private static final int SLICES = 64;

    /// @param cells the parts of each cell: coefficients, then where it begins
    /// @param width of a cell
    static Parts of(List<List<double[]>> cells, double width) {
        int size = cells.stream().mapToInt(List::size).sum();
        var parts = new Parts(
                new double[size],
                new double[size],
                new double[size * Table.STRIDE],
                new int[cells.size() * SLICES],
                SLICES / width);
        int begin = 0;
        for (int number = 0; number < cells.size(); number++) {
            parts.put(cells.get(number), begin, number, width);
            begin += cells.get(number).size();
        }
        return parts;
    }

    private void put(List<double[]> cell, int begin, int number, double width) {
        for (int i = 0; i < cell.size(); i++) {
            from[begin + i] = cell.get(i)[Table.STRIDE];
            until[begin + i] = i + 1 < cell.size() ? cell.get(i + 1)[Table.STRIDE] : width;
            System.arraycopy(cell.get(i), 0, coefficients, (begin + i) * Table.STRIDE, Table.STRIDE);
        }
        int part = begin;
        for (int slice = 0; slice < SLICES; slice++) {
            while (until[part] <= slice / perUnit) {
                part++;
            }
            guide[number * SLICES + slice] = part;
        }
    }

    int size() {
        return from.length;
    }

    boolean isEmpty() {
        return from.length == 0;
    }

    /// The polynomial of one of the parts of a cell.
    ///
    /// @param cell its number among those that have parts
    double at(int cell, double t) {
        int part = guide[cell * SLICES + (int) (t * perUnit)];
        while (until[part] <= t) {
            part++;
        }
        double[] c = coefficients;
        int k = part * Table.STRIDE;
        double s = t - from[part];
        double y = Math.fma(c[k + 5], s, c[k + 4]);
        y = Math.fma(y, s, c[k + 3]);
        y = Math.fma(y, s, c[k + 2]);
        y = Math.fma(y, s, c[k + 1]);
        return Math.fma(y, s, c[k]);
    }
}
