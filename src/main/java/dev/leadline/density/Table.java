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
/// one more cell holds the median. A table without cells is legal: then every draw costs a quantile.
///
/// @param cells the coefficients, lowest degree first, cell by cell: those of the lower tail, then those of the upper
record Table(Density shape, Link link, int bits, double[] cells, double uError) implements Curve {
    static final int STRIDE = 6;
    static final int OCTAVES = 52;

    private static final int MANTISSA = 52;

    /// Biased exponent of the smallest probability drawn, `2^-53`.
    private static final int LOWEST = 970;

    private static final long ONE = 0x3ff0_0000_0000_0000L;

    static int cellsOfTail(int bits) {
        return (OCTAVES << bits) + 1;
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
        int shift = MANTISSA - bits;
        long rest = (1L << shift) - 1;
        int first = LOWEST << bits;
        int tail = c.length / STRIDE / 2;
        for (int i = 0; i < n; i++) {
            long address = Double.doubleToRawLongBits(x[i]);
            int cell = (int) ((address & Long.MAX_VALUE) >>> shift) - first;
            if (cell < 0 || cell >= tail) {
                x[i] = Math.fma(scale, outside(x[i]), location);
                continue;
            }
            double t = Double.longBitsToDouble((address & rest) | ONE) - 1;
            int k = (cell + ((int) (address >> 63) & tail)) * STRIDE;
            double y = Math.fma(c[k + 5], t, c[k + 4]);
            y = Math.fma(y, t, c[k + 3]);
            y = Math.fma(y, t, c[k + 2]);
            y = Math.fma(y, t, c[k + 1]);
            y = Math.fma(y, t, c[k]);
            x[i] = Math.fma(scale, y, location);
        }
    }

    /// The probability of the nearer tail, with a minus sign for the upper one: one number that names the cell.
    ///
    /// In a loop of its own, without a branch, this is vectorised; the draws then take two thirds of the time that
    /// they take in one loop (measured in turn: 3.1 against 4.6 ns for each normal draw on a busy machine).
    private static void tails(double[] u, double[] x, int n) {
        for (int i = 0; i < n; i++) {
            double side = Math.signum(0.5 - u[i]);
            x[i] = Math.min(u[i], 1 - u[i]) * (side + (1 - side * side));
        }
    }

    /// What no cell holds, from the quantile function itself.
    ///
    /// @param p as [#tails] gives it
    private double outside(double p) {
        boolean lower = Double.doubleToRawLongBits(p) >= 0;
        if (link == Link.NONE) {
            return lower ? shape.quantile(p) : shape.upperQuantile(-p);
        }
        var linked = (Linked) shape;
        return lower ? linked.linked(p) : linked.upperLinked(-p);
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
