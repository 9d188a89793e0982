package dev.leadline.density;

import java.nio.ByteBuffer;
import java.nio.charset.StandardCharsets;
import java.security.MessageDigest;
import java.security.NoSuchAlgorithmException;
import java.util.HexFormat;

/// The quantile function of a shape, or its link, as polynomials of degree 5. Immutable.
///
/// With `p = min(u, 1 - u)`, the exponent of `p` and the first `bits` bits of its mantissa name a cell; the bits behind
/// them are the argument of the cell's polynomial. Lower and upper tail have cells of their own, down to `p = 2^-16`:
/// for the upper one, `p` is multiplied by `2^16`, which puts its cells behind those of the lower, with the cell of the
/// median between.
///
/// Cells need not be alike: with `grades`, each is cut into as many as it needs.
///
/// What is seldom drawn is marked, and mended after all draws of a block have been computed: at a kink or a jump of the
/// quantile, where one polynomial does not fit a cell, it has [parts][Parts], and so have the octaves below `2^-16`,
/// which are one marked cell for each tail. The last coefficient of a marked cell is [#MARKED], so are the draws from
/// it
/// `NaN`; that of others has another last bit, so that a block is looked through without a branch.
///
/// A table without cells is legal: then every draw costs a quantile.
///
/// @param grades for each cell, in the low half how far an address is shifted to name those it is cut into, in the high
///     half from there to their number; empty where cells are alike
/// @param cells the coefficients, lowest degree first; of one that has parts, the first is its number among the wholes
///     that have
/// @param parts of each octave below `2^-16`, lower tail first, then of cells
record Table(Density shape, Link link, int bits, int[] grades, double[] cells, Parts parts, double uError)
        implements Curve {
    /// Octaves of each tail that have cells, from `2^-16` to 1/2.
    static final int OCTAVES = 15;

    /// Octaves below them, down to `2^-53`, the smallest probability drawn.
    static final int DEEP = 37;

    /// Of the smallest table, and of every one whose cells are not alike.
    static final int SMALLEST_BITS = 5;

    /// Coefficients of a cell.
    static final int STRIDE = 6;

    /// The last bit of [#MARKED].
    static final long MARK = 1;

    static final double MARKED = Double.longBitsToDouble(0x7ff8_0000_0000_0000L | MARK);

    /// Draws between two looks at the marks.
    private static final int STRETCH = 64;

    private static final double SEAM = 0x1p-16;
    private static final double BELOW_SEAM = Math.nextDown(SEAM);
    private static final double SMALLEST = 0x1p-53;
    private static final int MANTISSA = 52;
    private static final long ONE = 0x3ff0_0000_0000_0000L;

    /// Of the lower tail's first octave.
    private static final int FIRST_EXPONENT = Double.MAX_EXPONENT - 16;

    /// How far the addresses of cells that are not alike are shifted, before they are cut; and the first of them.
    private static final int GRADED = MANTISSA - SMALLEST_BITS;

    private static final int FIRST_GRADED = (FIRST_EXPONENT << SMALLEST_BITS) - 1;

    /// Bits of the shift in a grade.
    private static final int ADDRESS = 6;

    /// For the tail at hand, 1, and for the other `2^16`: `1 + near (FACTOR near - FACTOR)`.
    private static final double FACTOR = 0x1p15 - 0.5;

    /// Those of both tails, those of the octave between them, of which the first holds the median and the last what
    /// lies
    /// below the upper tail, and one for what lies below the lower tail.
    static int numberOfCells(int bits) {
        return ((2 * OCTAVES + 1) << bits) + 1;
    }

    /// The number of a cell, where they are alike.
    ///
    /// @param tail 0 lower, 1 upper
    static int number(int bits, int tail, int octave, int cell) {
        return 1 + (((OCTAVES + 1) * tail + octave) << bits) + cell;
    }

    static int median(int bits) {
        return number(bits, 0, OCTAVES, 0);
    }

    /// What lies below the octaves of a tail.
    static int below(int bits, int tail) {
        return number(bits, tail, -1, (1 << bits) - 1);
    }

    /// @param number of a cell, before it is cut
    /// @param cut how often it is halved
    /// @param first of those it is cut into, among all
    static int grade(int number, int cut, int first) {
        int leading = (FIRST_GRADED + number) << cut;
        return (first - leading) << ADDRESS | (GRADED - cut);
    }

    /// Exponent and leading bits of what lies below the lower tail.
    private static int first(int bits) {
        return (FIRST_EXPONENT << bits) - 1;
    }

    @Override
    public void fill(double[] u, double[] x, int n, double location, double scale) {
        if (cells.length == 0) {
            for (int i = 0; i < n; i++) {
                x[i] = Math.fma(scale, exact(u[i]), location);
            }
            return;
        }
        double side = Math.signum(scale);
        double[] given = u;
        if (u == x) {
            given = Column.ofThread(n);
            System.arraycopy(u, 0, given, 0, n);
        }
        if (link.isSum()) {
            tabulated(given, x, n, Math.fma(link.added(), scale, location), scale, side);
            return;
        }
        tabulated(given, x, n, -0.0, 1, side);
        link.invert(x, n, location, scale);
    }

    /// @param side 1, or -1 where the other tail is wanted
    private void tabulated(double[] u, double[] x, int n, double location, double scale, double side) {
        tails(u, x, n, side);
        for (int from = 0; from < n; from += STRETCH) {
            int to = Math.min(n, from + STRETCH);
            long marks = grades.length == 0
                    ? alike(cells, bits, x, from, to, location, scale)
                    : graded(cells, grades, x, from, to, location, scale);
            if ((marks & MARK) != 0) {
                mend(u, x, from, to, location, scale, side);
            }
        }
    }

    /// The probability of the nearer tail, as a number that names the cell.
    ///
    /// In a loop of its own, without a branch, this is vectorised.
    private static void tails(double[] u, double[] x, int n, double side) {
        for (int i = 0; i < n; i++) {
            double near = Math.signum(0.5 - u[i]) * side;
            double p = Math.max(Math.min(u[i], 1 - u[i]), BELOW_SEAM);
            x[i] = p * Math.fma(near, Math.fma(FACTOR, near, -FACTOR), 1);
        }
    }

    /// @return all marks seen
    private static long alike(double[] c, int bits, double[] x, int from, int to, double location, double scale) {
        int shift = MANTISSA - bits;
        int first = first(bits);
        long marks = 0;
        for (int i = from; i < to; i++) {
            long address = Double.doubleToRawLongBits(x[i]);
            int k = ((int) (address >>> shift) - first) * STRIDE;
            double y = polynomial(c, k, argument(address, shift));
            marks |= Double.doubleToRawLongBits(c[k + 5]);
            x[i] = Math.fma(scale, y, location);
        }
        return marks;
    }

    private static long graded(double[] c, int[] grades, double[] x, int from, int to, double location, double scale) {
        long marks = 0;
        for (int i = from; i < to; i++) {
            long address = Double.doubleToRawLongBits(x[i]);
            int grade = grades[(int) (address >>> GRADED) - FIRST_GRADED];
            long leading = address >>> grade;
            int k = ((int) leading + (grade >> ADDRESS)) * STRIDE;
            double y = polynomial(c, k, Double.longBitsToDouble((address - (leading << grade)) | ONE) - 1);
            marks |= Double.doubleToRawLongBits(c[k + 5]);
            x[i] = Math.fma(scale, y, location);
        }
        return marks;
    }

    /// No probability is below the smallest drawn, which moves none by more than that, `1.1e-16`.
    private void mend(double[] u, double[] x, int from, int to, double location, double scale, double side) {
        for (int i = from; i < to; i++) {
            if (Double.isNaN(x[i])) {
                double p = Math.max(Math.min(u[i], 1 - u[i]), SMALLEST);
                boolean upper = (0.5 - u[i]) * side < 0;
                x[i] = Math.fma(scale, p < SEAM ? deep(p, upper) : part(p, upper), location);
            }
        }
    }

    private double deep(double p, boolean upper) {
        long address = Double.doubleToRawLongBits(p);
        int octave = Math.getExponent(p) - Math.getExponent(SMALLEST);
        return parts.at(upper ? DEEP + octave : octave, argument(address, MANTISSA));
    }

    private double part(double p, boolean upper) {
        long address = Double.doubleToRawLongBits(upper ? 0x1p16 * p : p);
        int grade = grades[(int) (address >>> GRADED) - FIRST_GRADED];
        int k = ((int) (address >>> grade) + (grade >> ADDRESS)) * STRIDE;
        return parts.at((int) cells[k], argument(address, grade));
    }

    private static double argument(long address, int shift) {
        return Double.longBitsToDouble((address & ((1L << shift) - 1)) | ONE) - 1;
    }

    static double polynomial(double[] c, int k, double t) {
        double y = Math.fma(c[k + 5], t, c[k + 4]);
        y = Math.fma(y, t, c[k + 3]);
        y = Math.fma(y, t, c[k + 2]);
        y = Math.fma(y, t, c[k + 1]);
        return Math.fma(y, t, c[k]);
    }

    /// From the quantile function itself, where there are no cells.
    private double exact(double u) {
        return u <= 0.5 ? shape.quantile(Math.max(u, SMALLEST)) : shape.upperQuantile(Math.max(1 - u, SMALLEST));
    }

    @Override
    public long bytes() {
        return 8L * cells.length + 4L * grades.length + parts.bytes();
    }

    @Override
    public String hash() {
        double[] from = parts.from();
        double[] coefficients = parts.coefficients();
        var bytes = ByteBuffer.allocate(4 * grades.length + 8 * (1 + cells.length + from.length + coefficients.length));
        bytes.putInt(link.ordinal()).putInt(bits);
        for (int grade : grades) {
            bytes.putInt(grade);
        }
        bytes.asDoubleBuffer().put(cells).put(from).put(coefficients);
        try {
            var digest = MessageDigest.getInstance("SHA-256");
            digest.update(shape.toString().getBytes(StandardCharsets.UTF_8));
            return HexFormat.of().formatHex(digest.digest(bytes.array()));
        } catch (NoSuchAlgorithmException e) {
            throw new IllegalStateException(e);
        }
    }
}
