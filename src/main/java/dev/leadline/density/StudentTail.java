package dev.leadline.density;

/// The distribution function of Student's t for many draws, as polynomials of degree 7. Immutable.
///
/// The last bits of the exponent of `1 + |t|` and the first bits of its mantissa name a cell, whose polynomial is the
/// mass beyond `|t|`. The cells go on until that mass is below what is drawn.
///
/// Error: relative 1e-10 in both tails, from 1 to 10,000 degrees of freedom (`StudentTailTest`).
final class StudentTail {
    private static final int BITS = 7;
    private static final int COEFFICIENTS = 8;
    private static final int SHIFT = 52 - BITS;
    private static final long ONE = 0x3ff0_0000_0000_0000L;
    private static final int FIRST = (int) (ONE >>> SHIFT);
    private static final double WIDTH = 0x1p-7;

    /// Less than any probability drawn.
    private static final double NOTHING = 0x1p-55;

    /// `(1 - cos(k π / 7)) / 2`.
    private static final double[] LOBATTO = {
        0,
        0.04951556604879048,
        0.18825509907063323,
        0.3887395330218428,
        0.6112604669781572,
        0.8117449009293668,
        0.9504844339512096,
        1
    };

    private final double[] cells;
    private final double farthest;

    private StudentTail(double[] cells, double farthest) {
        this.cells = cells;
        this.farthest = farthest;
    }

    static StudentTail of(double dof) {
        Density shape = new Student(dof, 0, 1).standard();
        int octaves = 1;
        while (shape.survival(StrictMath.scalb(1.0, octaves) - 1) > NOTHING) {
            octaves++;
        }
        double[] cells = new double[(octaves << BITS) * COEFFICIENTS];
        for (int octave = 0; octave < octaves; octave++) {
            for (int cell = 0; cell < 1 << BITS; cell++) {
                fit(shape, octave, cell, cells, ((octave << BITS) + cell) * COEFFICIENTS);
            }
        }
        return new StudentTail(cells, Math.nextDown(StrictMath.scalb(1.0, octaves)));
    }

    /// Newton's divided differences over the cell, expanded in the bits of the mantissa behind those of the cell.
    private static void fit(Density shape, int octave, int cell, double[] cells, int k) {
        double base = StrictMath.scalb(1.0, octave);
        double[] difference = new double[COEFFICIENTS];
        for (int j = 0; j < COEFFICIENTS; j++) {
            difference[j] = shape.survival(base * (1 + (cell + LOBATTO[j]) * WIDTH) - 1);
        }
        for (int order = 1; order < COEFFICIENTS; order++) {
            for (int j = COEFFICIENTS - 1; j >= order; j--) {
                difference[j] = (difference[j] - difference[j - 1]) / (LOBATTO[j] - LOBATTO[j - order]);
            }
        }
        double[] c = new double[COEFFICIENTS];
        for (int j = COEFFICIENTS - 1; j >= 0; j--) {
            for (int i = COEFFICIENTS - 1; i > 0; i--) {
                c[i] = Math.fma(-LOBATTO[j], c[i], c[i - 1]);
            }
            c[0] = Math.fma(-LOBATTO[j], c[0], difference[j]);
        }
        double power = 1;
        for (int i = 0; i < COEFFICIENTS; i++) {
            cells[k + i] = c[i] * power;
            power /= WIDTH;
        }
    }

    /// Replaces values by their probabilities.
    void probabilities(double[] t, int n) {
        double[] c = cells;
        double most = farthest;
        for (int i = 0; i < n; i++) {
            double sign = Math.copySign(1, t[i]);
            double tail = tail(c, Math.min(1 + Math.abs(t[i]), most));
            t[i] = Math.fma(-sign, tail, Math.fma(0.5, sign, 0.5));
        }
    }

    private static double tail(double[] c, double distance) {
        long bits = Double.doubleToRawLongBits(distance);
        int k = ((int) (bits >>> SHIFT) - FIRST) * COEFFICIENTS;
        double x = Double.longBitsToDouble((bits & ((1L << SHIFT) - 1)) | ONE) - 1;
        double y = Math.fma(c[k + 7], x, c[k + 6]);
        y = Math.fma(y, x, c[k + 5]);
        y = Math.fma(y, x, c[k + 4]);
        y = Math.fma(y, x, c[k + 3]);
        y = Math.fma(y, x, c[k + 2]);
        y = Math.fma(y, x, c[k + 1]);
        return Math.fma(y, x, c[k]);
    }
}
