package dev.leadline.engine;

import dev.leadline.estimate.Accumulator;
import dev.leadline.formula.Program;

/// Observations that are the mean of so many draws that follow one another. Scratch of one worker.
final class Means implements Folding {
    private final int draws;
    private final double[] part;
    private final double[][] observations;
    private int seen;

    Means(int draws, int components) {
        this.draws = draws;
        this.part = new double[components];
        this.observations = new double[draws == 1 ? 0 : components][Program.BLOCK];
    }

    @Override
    public boolean isPlain() {
        return draws == 1;
    }

    @Override
    public void open() {
        seen = 0;
    }

    @Override
    public boolean addTo(Accumulator sums, double[][] components, int rows) {
        if (draws == 1) {
            long excluded = sums.excluded();
            sums.add(components, 0, rows);
            return sums.excluded() == excluded;
        }
        boolean finite = true;
        int ended = (seen + rows) / draws;
        for (int k = 0; k < components.length; k++) {
            finite &= fold(k, components[k], rows);
        }
        seen = (seen + rows) % draws;
        sums.add(observations, 0, ended);
        return finite;
    }

    private boolean fold(int k, double[] x, int rows) {
        double[] means = observations[k];
        double divisor = draws;
        double all = 0;
        int row = 0;
        for (int ended = 0; row < rows; ended++) {
            int until = Math.min(rows, row + draws - (ended == 0 ? seen : 0));
            double sum = (ended == 0 && seen > 0 ? part[k] : 0) + sum(x, row, until);
            all += sum;
            boolean whole = until - row == draws - (ended == 0 ? seen : 0);
            if (whole) {
                means[ended] = sum / divisor;
            } else {
                part[k] = sum;
            }
            row = until;
        }
        return Double.isFinite(all);
    }

    /// Four sums side by side, in a fixed order: one would wait for itself.
    private static double sum(double[] x, int from, int to) {
        double a = 0;
        double b = 0;
        double c = 0;
        double d = 0;
        int i = from;
        for (; i + 3 < to; i += 4) {
            a += x[i];
            b += x[i + 1];
            c += x[i + 2];
            d += x[i + 3];
        }
        for (; i < to; i++) {
            a += x[i];
        }
        return (a + b) + (c + d);
    }
}
