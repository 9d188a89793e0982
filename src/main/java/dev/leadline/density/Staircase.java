package dev.leadline.density;

import java.nio.ByteBuffer;
import java.nio.charset.StandardCharsets;
import java.security.MessageDigest;
import java.security.NoSuchAlgorithmException;
import java.util.Arrays;
import java.util.HexFormat;

/// The quantiles of a discrete shape: its values, and up to which u each is drawn. Immutable.
///
/// The edge of a value is the largest double that its cdf reaches: that serves both tails alike, since u itself is a
/// double, and its distance from 1 is known exactly. Between 0 and 1 the guide names, for each of many equal cells,
/// the first value that is drawn there; on average, at most a few more edges are looked at.
///
/// At most 1,048,576 values are kept, 21 MB with the guide; of shapes with more, every draw costs a quantile.
///
/// @param values from the first to the last that is drawn, rising
/// @param edges one for each value, rising; the last is 1
/// @param guide the first value of each cell
record Staircase(Density shape, double[] values, double[] edges, int[] guide, double uError) implements Curve {
    static final int MOST = 1 << 20;

    private static final double SMALLEST = 0x1p-53;

    private static final int FEWEST_CELLS = 1 << 10;
    private static final int MOST_CELLS = 1 << 20;
    private static final int CELLS_A_VALUE = 8;

    static Curve of(Density shape) {
        double[] values = values(shape);
        if (values.length > MOST) {
            return TableFit.slow(shape);
        }
        double[] edges = edges(shape, values);
        var stairs = new Staircase(shape, values, edges, guide(edges), 0);
        double worst = TableFit.worst(shape, stairs);
        return worst <= TableFit.U_ERROR
                ? new Staircase(shape, values, edges, stairs.guide, worst)
                : TableFit.slow(shape);
    }

    /// All values that are drawn, or more than are kept.
    static double[] values(Density shape) {
        var values = new double[MOST + 1];
        double last = shape.upperQuantile(SMALLEST);
        double value = shape.quantile(SMALLEST);
        int n = 0;
        values[n++] = value;
        while (value < last && n < values.length) {
            double next = shape instanceof Discrete discrete ? discrete.next(value) : Atoms.after(shape, value);
            value = Math.min(next, last);
            values[n++] = value;
        }
        return Arrays.copyOf(values, n);
    }

    private static double[] edges(Density shape, double[] values) {
        return shape instanceof Discrete ? added(shape, values) : read(shape, values);
    }

    /// Both tails as the density has them.
    private static double[] read(Density shape, double[] values) {
        var edges = new double[values.length];
        for (int i = 0; i < values.length; i++) {
            double below = shape.cdf(values[i]);
            edges[i] = below <= 0.5 ? below : oneLess(shape.survival(values[i]));
        }
        return rising(edges);
    }

    private static double[] rising(double[] edges) {
        for (int i = 1; i < edges.length; i++) {
            edges[i] = Math.max(edges[i], edges[i - 1]);
        }
        edges[edges.length - 1] = 1;
        return edges;
    }

    /// Probabilities added from both ends towards the middle.
    private static double[] added(Density shape, double[] values) {
        int n = values.length;
        var edges = new double[n];
        var below = new Sum(shape.cdf(values[0]));
        int middle = 0;
        while (middle < n && below.value() <= 0.5) {
            edges[middle++] = below.value();
            if (middle < n) {
                below.add(shape.pdf(values[middle]));
            }
        }
        var above = new Sum(shape.survival(values[n - 1]));
        for (int i = n - 1; i >= middle; i--) {
            edges[i] = oneLess(above.value());
            above.add(shape.pdf(values[i]));
        }
        return rising(edges);
    }

    /// The largest double not above `1 - q`.
    private static double oneLess(double q) {
        double nearest = 1 - q;
        return 1 - nearest < q ? Math.nextDown(nearest) : nearest;
    }

    private static int[] guide(double[] edges) {
        int cells = FEWEST_CELLS;
        while (cells < MOST_CELLS && cells < CELLS_A_VALUE * edges.length) {
            cells *= 2;
        }
        var guide = new int[cells];
        int k = 0;
        for (int cell = 0; cell < cells; cell++) {
            while (edges[k] < (double) cell / cells) {
                k++;
            }
            guide[cell] = k;
        }
        return guide;
    }

    @Override
    public void fill(double[] u, double[] x, int n, double location, double scale) {
        double cells = guide.length;
        for (int i = 0; i < n; i++) {
            double p = Math.min(Math.max(u[i], SMALLEST), 1 - SMALLEST);
            int k = guide[(int) (p * cells)];
            while (edges[k] < p) {
                k++;
            }
            x[i] = Math.fma(scale, values[k], location);
        }
    }

    @Override
    public long bytes() {
        return 16L * values.length + 4L * guide.length;
    }

    @Override
    public String hash() {
        var bytes = ByteBuffer.allocate(16 * values.length);
        bytes.asDoubleBuffer().put(values).put(edges);
        try {
            var digest = MessageDigest.getInstance("SHA-256");
            digest.update(shape.toString().getBytes(StandardCharsets.UTF_8));
            return HexFormat.of().formatHex(digest.digest(bytes.array()));
        } catch (NoSuchAlgorithmException e) {
            throw new IllegalStateException(e);
        }
    }
}
