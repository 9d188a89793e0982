package dev.leadline.estimate;

import java.util.List;

/// What an item of work has of the outcomes of one thing asked, beside the sums of its observations. Confined to one
/// worker; outcomes that are not finite count nothing.
public final class Catch {
    /// Outcomes that a picture sees of one item at least, and of how many draws of a long one it sees one.
    private static final int SHOWN = 64;

    /// Steps from one to the next vary, so that they fall in step with no layout of points.
    private static final int ODD = 7919;

    private final Landmark landmark;
    private final boolean weighted;
    private final List<Caught> caught;
    private final double[] finite;
    private final double[] sizes;
    private Histogram histogram;
    private long draws;
    private double weight;

    /// @param weighted whether draws have weights of their own
    public Catch(Landmark landmark, boolean weighted, int block) {
        this.landmark = landmark;
        this.weighted = weighted;
        this.caught = landmark.windows().stream()
                .map(window -> new Caught(window, weighted))
                .toList();
        this.finite = new double[block];
        this.sizes = new double[weighted ? block : 0];
        this.histogram = new Histogram(landmark.sight().low(), landmark.sight().high());
    }

    private Catch(Catch other) {
        this.landmark = other.landmark;
        this.weighted = other.weighted;
        this.caught = other.caught.stream().map(Caught::copy).toList();
        this.finite = new double[0];
        this.sizes = new double[0];
        this.histogram = other.histogram.copy();
        this.draws = other.draws;
        this.weight = other.weight;
    }

    /// Adds the first `rows` outcomes of a block.
    ///
    /// @param w weights; not read where draws have none
    /// @param from index in the item of the first
    /// @param all draws of the item
    public void add(double[] x, double[] w, int rows, int from, int all) {
        show(x, w, rows, from, all);
        if (caught.isEmpty()) {
            return;
        }
        double rest = 0;
        for (int i = 0; i < rows; i++) {
            rest += x[i] - x[i];
        }
        if (rest == 0) {
            addFinite(x, w, rows);
            return;
        }
        int count = 0;
        for (int i = 0; i < rows; i++) {
            if (Double.isFinite(x[i])) {
                finite[count] = x[i];
                if (weighted) {
                    sizes[count] = w[i];
                }
                count++;
            }
        }
        addFinite(finite, sizes, count);
    }

    private void addFinite(double[] x, double[] w, int rows) {
        draws += rows;
        if (weighted) {
            double sum = 0;
            for (int i = 0; i < rows; i++) {
                sum += w[i];
            }
            weight += sum;
        }
        for (Caught within : caught) {
            within.add(x, w, rows);
        }
    }

    private void show(double[] x, double[] w, int rows, int from, int all) {
        int step = Math.clamp(all / SHOWN, 1, SHOWN);
        if (step == 1) {
            for (int i = 0; i < rows; i++) {
                if (Double.isFinite(x[i])) {
                    histogram.add(x[i], weighted ? w[i] : 1);
                }
            }
            return;
        }
        for (int k = Math.ceilDiv(from, step); (long) k * step < (long) from + rows; k++) {
            int i = k * step - from;
            int moved = Math.min(rows - 1, i + k * ODD % step);
            if (Double.isFinite(x[moved])) {
                histogram.add(x[moved], weighted ? w[moved] : 1);
            }
        }
    }

    public void clear() {
        caught.forEach(Caught::clear);
        histogram = new Histogram(landmark.sight().low(), landmark.sight().high());
        draws = 0;
        weight = 0;
    }

    public Catch copy() {
        return new Catch(this);
    }

    List<Caught> caught() {
        return caught;
    }

    Histogram histogram() {
        return histogram;
    }

    long draws() {
        return draws;
    }

    double weight() {
        return weighted ? weight : draws;
    }
}
