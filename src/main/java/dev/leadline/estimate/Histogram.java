package dev.leadline.estimate;

/// How outcomes are spread, as a picture shows it: of bins of one width, what the outcomes in each weigh. Of
/// long items of work it sees one draw in 64, spread over the item.
///
/// Confined to one worker until it is merged.
public final class Histogram {
    public static final int BINS = 200;

    private final double from;
    private final double to;
    private final double scale;
    private final double[] weights = new double[BINS];
    private double below;
    private double above;
    private long draws;

    /// @param from lower end of the first bin
    /// @param to upper end of the last; not below `from`
    public Histogram(double from, double to) {
        this.from = from;
        this.to = to;
        this.scale = BINS / (to - from);
    }

    /// Adds one outcome, which is finite.
    void add(double x, double w) {
        draws++;
        if (x < from) {
            below += w;
        } else if (x > to) {
            above += w;
        } else {
            weights[to > from ? (int) Math.min(BINS - 1, (x - from) * scale) : 0] += w;
        }
    }

    void merge(Histogram later) {
        for (int i = 0; i < BINS; i++) {
            weights[i] += later.weights[i];
        }
        below += later.below;
        above += later.above;
        draws += later.draws;
    }

    Histogram copy() {
        var copy = new Histogram(from, to);
        copy.merge(this);
        return copy;
    }

    public double from() {
        return from;
    }

    public double to() {
        return to;
    }

    /// What the outcomes of a bin weigh.
    public double weight(int bin) {
        return weights[bin];
    }

    public double below() {
        return below;
    }

    public double above() {
        return above;
    }

    /// What all of them weigh.
    public double total() {
        double total = below + above;
        for (double weight : weights) {
            total += weight;
        }
        return total;
    }

    /// How many it has seen.
    public long draws() {
        return draws;
    }
}
