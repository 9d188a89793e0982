package dev.leadline.estimate;

import dev.leadline.estimate.Landmark.Window;
import java.util.Arrays;

/// The outcomes of some draws that lie within a window, one by one, and how many lie on either side of it. Confined to
/// one worker until it is merged.
///
/// Nothing branches by what a draw is, so that outcomes on both sides of a window cost no more than on one.
public final class Caught {
    private final Window window;
    private final boolean weighted;
    private double[] values = new double[64];
    private double[] weights;
    private int count;
    private long below;
    private long above;
    private double weightBelow;
    private double weightAbove;
    private double excess;

    /// @param weighted whether draws have weights of their own
    Caught(Window window, boolean weighted) {
        this.window = window;
        this.weighted = weighted;
        this.weights = new double[weighted ? values.length : 0];
    }

    /// Adds the first `rows` draws, all of them finite.
    ///
    /// @param w their weights; not read where draws have none
    void add(double[] x, double[] w, int rows) {
        if (count + rows > values.length) {
            int longer = Math.max(count + rows, 2 * values.length);
            values = Arrays.copyOf(values, longer);
            weights = Arrays.copyOf(weights, weighted ? longer : 0);
        }
        double low = window.low();
        double high = window.high();
        int lower = 0;
        int higher = 0;
        for (int i = 0; i < rows; i++) {
            lower += x[i] < low ? 1 : 0;
        }
        for (int i = 0; i < rows; i++) {
            higher += x[i] > high ? 1 : 0;
        }
        below += lower;
        above += higher;
        if (weighted) {
            weigh(x, w, rows);
        } else {
            keep(x, rows);
        }
        if (high < Double.POSITIVE_INFINITY) {
            double sum = 0;
            for (int i = 0; i < rows; i++) {
                sum += Math.max(0, x[i] - high) * (weighted ? w[i] : 1);
            }
            excess += sum;
        }
    }

    private void keep(double[] x, int rows) {
        double low = window.low();
        double high = window.high();
        int at = count;
        for (int i = 0; i < rows; i++) {
            values[at] = x[i];
            at += x[i] >= low & x[i] <= high ? 1 : 0;
        }
        count = at;
    }

    private void weigh(double[] x, double[] w, int rows) {
        double low = window.low();
        double high = window.high();
        int at = count;
        double lower = 0;
        double higher = 0;
        for (int i = 0; i < rows; i++) {
            values[at] = x[i];
            weights[at] = w[i];
            at += x[i] >= low & x[i] <= high ? 1 : 0;
            lower += x[i] < low ? w[i] : 0;
            higher += x[i] > high ? w[i] : 0;
        }
        count = at;
        weightBelow += lower;
        weightAbove += higher;
    }

    void clear() {
        count = 0;
        below = 0;
        above = 0;
        weightBelow = 0;
        weightAbove = 0;
        excess = 0;
    }

    Caught copy() {
        var copy = new Caught(window, weighted);
        copy.values = Arrays.copyOf(values, count);
        copy.weights = Arrays.copyOf(weights, weighted ? count : 0);
        copy.count = count;
        copy.below = below;
        copy.above = above;
        copy.weightBelow = weightBelow;
        copy.weightAbove = weightAbove;
        copy.excess = excess;
        return copy;
    }

    int count() {
        return count;
    }

    double value(int i) {
        return values[i];
    }

    double weight(int i) {
        return weighted ? weights[i] : 1;
    }

    long below() {
        return below;
    }

    long above() {
        return above;
    }

    double weightBelow() {
        return weighted ? weightBelow : below;
    }

    double weightAbove() {
        return weighted ? weightAbove : above;
    }

    /// What those above the window are more than its upper end, summed.
    double excess() {
        return excess;
    }
}
