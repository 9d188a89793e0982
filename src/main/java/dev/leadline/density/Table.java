package dev.leadline.density;

import java.nio.ByteBuffer;
import java.nio.charset.StandardCharsets;
import java.security.MessageDigest;
import java.security.NoSuchAlgorithmException;
import java.util.HexFormat;

/// The quantile function of a shape, or its link, as polynomials of degree 5. Immutable.
///
/// With `p = min(u, 1 - u)`, the last six bits of the exponent of `p` and the first `bits` bits of its mantissa name a
/// cell; the bits behind them are the argument of the cell's polynomial. Lower and upper tail have cells of their own,
/// down to `p = 2^-53`; one more cell holds the median; the cells of exponents that are not drawn stay empty, so that
/// the bits of `p` are the address as they are. A table without cells is legal: then every draw costs a quantile.
///
/// @param cells the coefficients, lowest degree first, where [#index] says
record Table(Density shape, Link link, int bits, double[] cells, double uError) implements Curve {
    /// Octaves below 1/2, down to `2^-53`, the smallest probability drawn; octave 52 has the median alone.
    static final int OCTAVES = 52;

    private static final double SMALLEST = 0x1p-53;

    /// Last six bits of the biased exponent of the smallest probability drawn.
    private static final int FIRST = (Double.MAX_EXPONENT - 53) & 63;

    /// A power of two above the number of coefficients: it costs less to multiply by.
    private static final int STRIDE = 8;

    private static final int MANTISSA = 52;
    private static final long ONE = 0x3ff0_0000_0000_0000L;

    static double[] emptyCells(int bits) {
        return new double[index(bits, 2, -FIRST, 0)];
    }

    /// Where the coefficients of a cell begin.
    ///
    /// @param tail 0 lower, 1 upper
    static int index(int bits, int tail, int octave, int cell) {
        return (((64 * tail + FIRST + octave) << bits) + cell) * STRIDE;
    }

    @Override
    public void fill(double[] u, double[] x, int n, double location, double scale) {
        if (link == Link.NONE) {
            polynomials(u, x, n, location, scale);
            return;
        }
        polynomials(u, x, n, 0, 1);
        link.invert(x, n);
        for (int i = 0; i < n; i++) {
            x[i] = Math.fma(scale, x[i], location);
        }
    }

    private void polynomials(double[] u, double[] x, int n, double location, double scale) {
        tails(u, x, n);
        double[] c = cells;
        if (c.length == 0) {
            for (int i = 0; i < n; i++) {
                x[i] = Math.fma(scale, exact(x[i]), location);
            }
            return;
        }
        int shift = MANTISSA - bits;
        for (int i = 0; i < n; i++) {
            x[i] = Math.fma(scale, polynomial(c, shift, x[i]), location);
        }
    }

    /// The probability of the nearer tail, with a minus sign for the upper one: one number that names the cell. It is
    /// never below the smallest that has one, which moves no probability by more than that, `1.1e-16`.
    ///
    /// In a loop of its own, without a branch, this is vectorised.
    private static void tails(double[] u, double[] x, int n) {
        for (int i = 0; i < n; i++) {
            double side = Math.signum(0.5 - u[i]);
            x[i] = Math.max(Math.min(u[i], 1 - u[i]), SMALLEST) * (side + (1 - side * side));
        }
    }

    private static double polynomial(double[] c, int shift, double tail) {
        long address = Double.doubleToRawLongBits(tail);
        int cells = 64 << (MANTISSA - shift);
        int k = (((int) (address >>> shift) & (cells - 1)) | ((int) (address >> 63) & cells)) * STRIDE;
        double t = Double.longBitsToDouble((address & ((1L << shift) - 1)) | ONE) - 1;
        double y = Math.fma(c[k + 5], t, c[k + 4]);
        y = Math.fma(y, t, c[k + 3]);
        y = Math.fma(y, t, c[k + 2]);
        y = Math.fma(y, t, c[k + 1]);
        return Math.fma(y, t, c[k]);
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
    public String hash() {
        var bytes = ByteBuffer.allocate(8 * cells.length + 8);
        bytes.putInt(link.ordinal()).putInt(bits);
        bytes.asDoubleBuffer().put(cells);
        try {
            var digest = MessageDigest.getInstance("SHA-256");
            digest.update(shape.toString().getBytes(StandardCharsets.UTF_8));
            return HexFormat.of().formatHex(digest.digest(bytes.array()));
        } catch (NoSuchAlgorithmException e) {
            throw new IllegalStateException(e);
        }
    }
}
