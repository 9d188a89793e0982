package dev.leadline.estimate;

import dev.leadline.estimate.Landmark.Window;
import dev.leadline.estimate.Outcomes.Place;
import dev.leadline.estimate.Outcomes.Step;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import java.util.stream.IntStream;

/// Outcomes within a window in their order, and how many lie on either side of it. Confined to the thread that merges
/// items.
///
/// They are sorted into bins as they come, so that any rank is found without sorting all. Where more would have to be
/// kept than may be, only the bins are counted: a rank is then known to lie between two outcomes, and a second pass
/// over the same draws with that for a window finds it.
final class InOrder {
    private static final int BINS = 16_384;

    private final Window window;
    private final boolean weighted;
    private final long most;
    private final double scale;
    private final long[] counts = new long[BINS];
    private final double[] sums;
    private final double[] excesses = new double[BINS];
    private final double[] least = new double[BINS];
    private final double[] greatest = new double[BINS];

    /// Of each bin; `null` once no more are kept.
    private double[][] values = new double[BINS][];

    private double[][] weights = new double[BINS][];
    private long kept;
    private long below;
    private long above;
    private double weightBelow;
    private double weightAbove;
    private double excess;

    /// @param most values to keep
    InOrder(Window window, boolean weighted, long most) {
        this.window = window;
        this.weighted = weighted;
        this.most = most;
        double width = window.binsTo() - window.binsFrom();
        this.scale = width > 0 && width < Double.POSITIVE_INFINITY ? BINS / width : 0;
        this.sums = new double[BINS];
        Arrays.fill(least, Double.POSITIVE_INFINITY);
        Arrays.fill(greatest, Double.NEGATIVE_INFINITY);
    }

    void merge(Caught item) {
        below += item.below();
        above += item.above();
        weightBelow += item.weightBelow();
        weightAbove += item.weightAbove();
        excess += item.excess();
        if (values != null && kept + item.count() > most) {
            values = null;
            weights = null;
        }
        for (int i = 0; i < item.count(); i++) {
            add(item.value(i), item.weight(i));
        }
        kept += item.count();
    }

    private void add(double x, double w) {
        int bin = (int) Math.clamp((x - window.binsFrom()) * scale, 0, BINS - 1);
        int at = (int) counts[bin]++;
        sums[bin] += w;
        excesses[bin] += w * (x - window.binsFrom());
        least[bin] = Math.min(least[bin], x);
        greatest[bin] = Math.max(greatest[bin], x);
        if (values == null) {
            return;
        }
        if (values[bin] == null || at == values[bin].length) {
            int longer = Math.max(4, 2 * at);
            values[bin] = values[bin] == null ? new double[longer] : Arrays.copyOf(values[bin], longer);
            weights[bin] =
                    !weighted ? null : weights[bin] == null ? new double[longer] : Arrays.copyOf(weights[bin], longer);
        }
        values[bin][at] = x;
        if (weighted) {
            weights[bin][at] = w;
        }
    }

    /// The outcome of rank `rank` among all, from 1.
    Place at(long rank) {
        if (rank <= below) {
            return new Place(Double.NEGATIVE_INFINITY, Math.nextDown(window.low()));
        }
        if (rank > below + kept) {
            return new Place(Math.nextUp(window.high()), Double.POSITIVE_INFINITY);
        }
        long before = below;
        int bin = 0;
        while (before + counts[bin] < rank) {
            before += counts[bin++];
        }
        if (least[bin] == greatest[bin] || values == null) {
            return new Place(least[bin], greatest[bin]);
        }
        double[] sorted = Arrays.copyOf(values[bin], (int) counts[bin]);
        Arrays.sort(sorted);
        double found = sorted[(int) (rank - before - 1)];
        return new Place(found, found);
    }

    /// The smallest outcome with at most `above` of the weight beyond it.
    Place withAbove(double wanted) {
        if (weightAbove > wanted) {
            return new Place(Math.nextUp(window.high()), Double.POSITIVE_INFINITY);
        }
        double beyond = weightAbove;
        int bin = BINS - 1;
        while (bin >= 0 && beyond + sums[bin] <= wanted) {
            beyond += sums[bin--];
        }
        if (bin < 0) {
            return new Place(Double.NEGATIVE_INFINITY, Math.nextDown(window.low()));
        }
        if (least[bin] == greatest[bin] || values == null) {
            return new Place(least[bin], greatest[bin]);
        }
        int[] order = order(bin);
        int i = order.length - 1;
        double beyondHere = beyond + weight(bin, order[i]);
        while (i > 0 && beyondHere <= wanted) {
            beyondHere += weight(bin, order[--i]);
        }
        double found = values[bin][order[i]];
        return new Place(found, found);
    }

    /// The smallest outcome with at least `wanted` of the weight up to it.
    Place withUpTo(double wanted) {
        if (weightBelow >= wanted) {
            return new Place(Double.NEGATIVE_INFINITY, Math.nextDown(window.low()));
        }
        double upTo = weightBelow;
        int bin = 0;
        while (bin < BINS && upTo + sums[bin] < wanted) {
            upTo += sums[bin++];
        }
        if (bin == BINS) {
            return new Place(Math.nextUp(window.high()), Double.POSITIVE_INFINITY);
        }
        if (least[bin] == greatest[bin] || values == null) {
            return new Place(least[bin], greatest[bin]);
        }
        int[] order = order(bin);
        int i = 0;
        double here = upTo + weight(bin, order[0]);
        while (i < order.length - 1 && here < wanted) {
            here += weight(bin, order[++i]);
        }
        double found = values[bin][order[i]];
        return new Place(found, found);
    }

    private double weight(int bin, int i) {
        return weighted ? weights[bin][i] : 1;
    }

    private int[] order(int bin) {
        double[] here = values[bin];
        return IntStream.range(0, (int) counts[bin])
                .boxed()
                .sorted((i, j) -> Double.compare(here[i], here[j]))
                .mapToInt(Integer::intValue)
                .toArray();
    }

    /// What outcomes are more than `x`, by their weights, summed; `NaN` where `x` lies outside the window.
    double excessOver(double x) {
        if (x < window.low() || x > window.high()) {
            return Double.NaN;
        }
        double over = weightAbove == 0 ? 0 : Math.fma(weightAbove, window.high() - x, excess);
        int bin = (int) Math.clamp((x - window.binsFrom()) * scale, 0, BINS - 1);
        double offset = x - window.binsFrom();
        for (int b = BINS - 1; b > bin; b--) {
            over += Math.fma(-offset, sums[b], excesses[b]);
        }
        if (values == null) {
            double mean = sums[bin] == 0 ? 0 : excesses[bin] / sums[bin] - offset;
            return over + Math.max(0, mean) * sums[bin];
        }
        for (int i = 0; i < counts[bin]; i++) {
            over += Math.max(0, values[bin][i] - x) * weight(bin, i);
        }
        return over;
    }

    /// The greatest outcome of each bin, with its rank.
    List<Step> steps() {
        var steps = new ArrayList<Step>();
        long rank = below;
        for (int b = 0; b < BINS; b++) {
            rank += counts[b];
            if (counts[b] > 0) {
                steps.add(new Step(rank, greatest[b]));
            }
        }
        return steps;
    }

    /// All that are kept, in order; empty where not all are.
    Optional<double[]> sorted() {
        if (values == null || weighted) {
            return Optional.empty();
        }
        double[] all = new double[(int) kept];
        int at = 0;
        for (int b = 0; b < BINS; b++) {
            int here = (int) counts[b];
            if (here > 0) {
                System.arraycopy(values[b], 0, all, at, here);
                Arrays.sort(all, at, at + here);
                at += here;
            }
        }
        return Optional.of(all);
    }
}
