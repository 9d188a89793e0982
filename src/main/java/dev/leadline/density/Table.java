package dev.leadline.density;

import java.nio.ByteBuffer;
import java.nio.charset.StandardCharsets;
import java.security.MessageDigest;
import java.security.NoSuchAlgorithmException;
import java.util.HexFormat;

/// The quantile function of a shape, or its link, as polynomials of degree 5. Immutable.
///
/// With `p = min(u, 1 - u)`, the exponent of `p` and the first `bits` bits of its mantissa name a cell; the bits behind
/// them are the argument of the cell's polynomial. Lower and upper tail have cells of their own, down to `p = 2^-53`;
/// one more cell of each holds the median. A cell that one polynomial does not fit, at a kink or a jump of the
/// quantile, has [parts][Parts]. A table without cells is legal: then every draw costs a quantile.
///
/// @param cells the coefficients, lowest degree first, where [#index] says; the last is `NaN` in a cell that has parts,
///     and the first is its number among those
/// @param parts empty where every cell is one polynomial
record Table(Density shape, Link link, int bits, double[] cells, Parts parts, double uError) implements Curve {
    /// Octaves below 1/2, down to `2^-53`, the smallest probability drawn; octave 52 has the median alone.
    static final int OCTAVES = 52;

    /// Coefficients of a cell.
    static final int STRIDE = 6;

    private static final double SMALLEST = 0x1p-53;
    private static final int MANTISSA = 52;
    private static final long ONE = 0x3ff0_0000_0000_0000L;

    /// Exponents of a double, and one more bit above them for the sign.
    private static final int EXPONENTS = 1 << 11;

    static double[] emptyCells(int bits) {
        return new double[2 * cellsOfTail(bits) * STRIDE];
    }

    private static int cellsOfTail(int bits) {
        return (OCTAVES << bits) + 1;
    }

    /// Where the coefficients of a cell begin.
    ///
    /// @param tail 0 lower, 1 upper
    static int index(int bits, int tail, int octave, int cell) {
        return (cellsOfTail(bits) * tail + (octave << bits) + cell) * STRIDE;
    }

    @Override
    public void fill(double[] u, double[] x, int n, double location, double scale) {
        if (link == Link.NONE) {
            polynomials(u, x, n, location, scale, Math.signum(scale));
            return;
        }
        polynomials(u, x, n, 0, 1, Math.signum(scale));
        link.invert(x, n);
        for (int i = 0; i < n; i++) {
            x[i] = Math.fma(scale, x[i], location);
        }
    }

    /// @param side 1, or -1 where the other tail is wanted
    private void polynomials(double[] u, double[] x, int n, double location, double scale, double side) {
        tails(u, x, n, side);
        double[] c = cells;
        if (c.length == 0) {
            for (int i = 0; i < n; i++) {
                x[i] = Math.fma(scale, exact(x[i]), location);
            }
            return;
        }
        int shift = MANTISSA - bits;
        int first = (Double.MAX_EXPONENT - 53) << bits;
        int upper = cellsOfTail(bits) - (EXPONENTS << bits);
        if (parts.isEmpty()) {
            for (int i = 0; i < n; i++) {
                x[i] = Math.fma(scale, polynomial(c, shift, first, upper, x[i]), location);
            }
            return;
        }
        for (int i = 0; i < n; i++) {
            double y = polynomial(c, shift, first, upper, x[i]);
            x[i] = Math.fma(scale, Double.isNaN(y) ? part(shift, first, upper, x[i]) : y, location);
        }
    }

    /// The probability of the nearer tail, with a minus sign for the upper one: one number that names the cell. It is
    /// never below the smallest that has one, which moves no probability by more than that, `1.1e-16`.
    ///
    /// In a loop of its own, without a branch, this is vectorised.
    private static void tails(double[] u, double[] x, int n, double side) {
        for (int i = 0; i < n; i++) {
            double near = Math.signum(0.5 - u[i]);
            x[i] = Math.max(Math.min(u[i], 1 - u[i]), SMALLEST) * (near + (1 - near * near)) * side;
        }
    }

    private static double polynomial(double[] c, int shift, int first, int upper, double tail) {
        long address = Double.doubleToRawLongBits(tail);
        int k = index(address, shift, first, upper);
        double t = argument(address, shift);
        double y = Math.fma(c[k + 5], t, c[k + 4]);
        y = Math.fma(y, t, c[k + 3]);
        y = Math.fma(y, t, c[k + 2]);
        y = Math.fma(y, t, c[k + 1]);
        return Math.fma(y, t, c[k]);
    }

    /// @param first exponent and leading bits of the smallest probability
    /// @param upper from the address of a lower tail to the cell of the upper one, less the sign that is part of it
    private static int index(long address, int shift, int first, int upper) {
        return ((int) (address >>> shift) - first + ((int) (address >> 63) & upper)) * STRIDE;
    }

    private static double argument(long address, int shift) {
        return Double.longBitsToDouble((address & ((1L << shift) - 1)) | ONE) - 1;
    }

    private double part(int shift, int first, int upper, double tail) {
        long address = Double.doubleToRawLongBits(tail);
        int k = index(address, shift, first, upper);
        return parts.at((int) cells[k], argument(address, shift));
    }

    /// From the quantile function itself, where there are no cells.
    private double exact(double tail) {
        boolean lower = Double.doubleToRawLongBits(tail) >= 0;
        if (link == Link.NONE) {
            return lower ? shape.quantile(tail) : shape.upperQuantile(-tail);
        }
        var linked = (Linked) shape;
        return lower ? linked.linked(tail) : linked.upperLinked(-tail);
    }

    @Override
    public long bytes() {
        return 8L * cells.length;
    }

    @Override
    public String hash() {
        var bytes = ByteBuffer.allocate(8 + 8 * (cells.length + parts.size() * (1 + STRIDE)));
        bytes.putInt(link.ordinal()).putInt(bits);
        bytes.asDoubleBuffer().put(cells).put(parts.from()).put(parts.coefficients());
        try {
            var digest = MessageDigest.getInstance("SHA-256");
            digest.update(shape.toString().getBytes(StandardCharsets.UTF_8));
            return HexFormat.of().formatHex(digest.digest(bytes.array()));
        } catch (NoSuchAlgorithmException e) {
            throw new IllegalStateException(e);
        }
    }
}
