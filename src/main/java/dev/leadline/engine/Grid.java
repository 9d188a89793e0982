package dev.leadline.engine;

import dev.leadline.estimate.Accumulator;
import dev.leadline.model.Lane;
import dev.leadline.model.Question;
import dev.leadline.scheme.Adaptation;
import dev.leadline.scheme.Tuned;
import dev.leadline.scheme.Warp;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.SortedMap;
import java.util.TreeMap;

/// Steps in each input for itself: after every stage the cells of an input are cut anew, so that each holds about as
/// much of the second moment of the weighted outcomes.
///
/// Source: Lepage (1978), Journal of Computational Physics 27, 192-203; the damping is his.
record Grid(Question question, Lane lane, Adaptation wish, long seed) {
    private static final int STAGES = 6;
    private static final int DRAWS = 16_384;
    private static final int CELLS = 64;

    /// Between 0, no change, and 1: keeps a stage with few draws in the tails from running away.
    private static final double DAMPING = 0.75;

    Tuned found() {
        var found = Tuned.untouched(wish);
        for (int stage = 1; stage <= STAGES; stage++) {
            var draws = Stage.of(question, lane, found, seed, stage, DRAWS);
            found = next(found, draws);
        }
        return found;
    }

    private Tuned next(Tuned before, Stage stage) {
        SortedMap<Integer, Warp> warps = new TreeMap<>();
        for (int j : wish.inputs()) {
            if (stage.points()[j] != null) {
                warps.put(j, new Warp.Steps(cut(edges(before, j), stage, stage.points()[j])));
            }
        }
        var stages = new ArrayList<>(before.stages());
        stages.add(seen(stage));
        var nominal = wish.nominal();
        return new Tuned(
                wish, nominal.nominal(), List.of(new Tuned.Part(nominal.of() - nominal.nominal(), warps)), stages);
    }

    static Tuned.Stage seen(Stage stage) {
        Accumulator sums = stage.sums();
        return new Tuned.Stage(stage.draws(), 0, sums.mean(0), sums.standardError(0), stage.hits());
    }

    private static double[] edges(Tuned before, int j) {
        if (!before.parts().isEmpty()
                && before.parts().getFirst().warps().get(j) instanceof Warp.Steps(double[] edges)) {
            return edges;
        }
        double[] even = new double[CELLS + 1];
        Arrays.setAll(even, i -> (double) i / CELLS);
        return even;
    }

    private static double[] cut(double[] edges, Stage stage, double[] u) {
        double[] moments = new double[CELLS];
        for (int i = 0; i < u.length; i++) {
            double weighted = stage.outcomes()[i] * stage.weights()[i];
            if (Double.isFinite(weighted)) {
                int at = Arrays.binarySearch(edges, u[i]);
                moments[Math.min(at >= 0 ? at : -at - 2, CELLS - 1)] += weighted * weighted;
            }
        }
        double[] importance = damped(smooth(moments));
        double all = Arrays.stream(importance).sum();
        return all > 0 ? cut(edges, importance, all / CELLS) : edges;
    }

    private static double[] smooth(double[] moments) {
        double[] smooth = new double[CELLS];
        for (int c = 0; c < CELLS; c++) {
            int from = Math.max(0, c - 1);
            int to = Math.min(CELLS - 1, c + 1);
            for (int k = from; k <= to; k++) {
                smooth[c] += moments[k] / (to - from + 1);
            }
        }
        return smooth;
    }

    private static double[] damped(double[] moments) {
        double all = Arrays.stream(moments).sum();
        if (!(all > 0)) {
            return new double[CELLS];
        }
        return Arrays.stream(moments)
                .map(moment -> {
                    double share = moment / all;
                    return share == 0
                            ? 0
                            : share == 1 ? 1 : StrictMath.pow((share - 1) / StrictMath.log(share), DAMPING);
                })
                .toArray();
    }

    private static double[] cut(double[] edges, double[] importance, double each) {
        double[] cut = new double[CELLS + 1];
        cut[CELLS] = 1;
        int cell = 0;
        double left = importance[0];
        double from = edges[0];
        for (int k = 1; k < CELLS; k++) {
            double needed = each;
            while (needed > left && cell < CELLS - 1) {
                needed -= left;
                cell++;
                left = importance[cell];
                from = edges[cell];
            }
            double part = left > 0 ? Math.min(1, needed / left) : 1;
            from += part * (edges[cell + 1] - from);
            left -= needed;
            cut[k] = from;
        }
        for (int k = 1; k < CELLS; k++) {
            cut[k] = Math.max(cut[k], cut[k - 1] + 0x1p-50);
        }
        return cut;
    }
}
