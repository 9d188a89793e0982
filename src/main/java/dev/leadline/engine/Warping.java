package dev.leadline.engine;

import dev.leadline.formula.Program;
import dev.leadline.numeric.Exp;
import dev.leadline.numeric.Normal;
import dev.leadline.scheme.Replicated;
import dev.leadline.scheme.Tuned;
import dev.leadline.scheme.Warp;
import java.util.Arrays;
import java.util.Optional;

/// Moves points to the density that was found for them, and says what they count. Scratch of one worker.
///
/// Observations take turns in fixed shares; of replicated points a coordinate of the layout decides.
final class Warping {
    private static final double SMALLEST = 0x1p-53;
    private static final double LARGEST = 1 - 0x1p-53;

    private final Tuned tuned;

    /// The part of each observation in turn, -1 for the uniform density.
    private final int[] turns;

    /// Draws that stay together, 0 where a coordinate decides.
    private final int together;

    private final int[] part = new int[Program.BLOCK];
    private final double[] z = new double[Program.BLOCK];
    private final double[][] logDensity;
    private final double[][][] logsOfCells;
    private final double[] weights = new double[Program.BLOCK];
    private long seen;

    private Warping(Tuned tuned, int together) {
        this.tuned = tuned;
        this.together = together;
        this.turns = new int[tuned.of()];
        this.logsOfCells = logsOfCells(tuned);
        this.logDensity = new double[tuned.parts().size()][Program.BLOCK];
        int turn = tuned.nominal();
        Arrays.fill(turns, 0, turn, -1);
        for (int p = 0; p < logDensity.length; p++) {
            int until = turn + tuned.parts().get(p).share();
            Arrays.fill(turns, turn, until, p);
            turn = until;
        }
    }

    static Optional<Warping> of(Recipe recipe) {
        var scheme = recipe.lane().scheme();
        return recipe.tuned()
                .map(tuned -> new Warping(
                        tuned, scheme.points() instanceof Replicated ? 0 : scheme.drawsPerObservation() / tuned.of()));
    }

    /// Goes to the first draw of an item.
    void open() {
        seen = 0;
    }

    /// @param points one array for each coordinate, `null` for one that nobody reads; the last decides where one does
    void move(double[][] points, int rows) {
        chooseParts(points[points.length - 1], rows);
        for (double[] logs : logDensity) {
            Arrays.fill(logs, 0, rows, 0);
        }
        for (int j = 0; j < points.length; j++) {
            int coordinate = j;
            if (points[j] != null
                    && tuned.parts().stream().anyMatch(p -> p.warps().containsKey(coordinate))) {
                move(points[j], j, rows);
            }
        }
        weigh(rows);
    }

    private void chooseParts(double[] u, int rows) {
        for (int i = 0; i < rows; i++) {
            int turn = together == 0 ? (int) (u[i] * turns.length) : (int) ((seen + i) / together % turns.length);
            part[i] = turns[turn];
        }
        seen += rows;
    }

    /// All parts move a coordinate in one way, or leave it.
    private void move(double[] u, int j, int rows) {
        boolean isByScores = tuned.parts().stream().anyMatch(p -> p.warps().get(j) instanceof Warp.OfScores);
        if (isByScores) {
            moveScores(u, j, rows);
        } else {
            moveSteps(u, j, rows);
        }
    }

    private void moveScores(double[] u, int j, int rows) {
        int parts = logDensity.length;
        double[] mean = new double[parts + 1];
        double[] sd = new double[parts + 1];
        Arrays.fill(sd, 1);
        for (int p = 0; p < parts; p++) {
            if (tuned.parts().get(p).warps().get(j) instanceof Warp.OfScores(double m, double s)) {
                mean[p + 1] = m;
                sd[p + 1] = s;
            }
        }
        Normal.quantile(u, z, rows);
        for (int i = 0; i < rows; i++) {
            z[i] = Math.fma(sd[part[i] + 1], z[i], mean[part[i] + 1]);
        }
        for (int p = 0; p < parts; p++) {
            double[] logs = logDensity[p];
            double m = mean[p + 1];
            double inverse = 1 / sd[p + 1];
            double less = StrictMath.log(sd[p + 1]);
            for (int i = 0; i < rows; i++) {
                double own = (z[i] - m) * inverse;
                logs[i] += 0.5 * (z[i] * z[i] - own * own) - less;
            }
        }
        Normal.cdf(z, u, rows);
        for (int i = 0; i < rows; i++) {
            u[i] = Math.min(Math.max(u[i], SMALLEST), LARGEST);
        }
    }

    private void moveSteps(double[] u, int j, int rows) {
        for (int i = 0; i < rows; i++) {
            if (part[i] >= 0 && tuned.parts().get(part[i]).warps().get(j) instanceof Warp.Steps steps) {
                u[i] = Math.min(Math.max(steps.moved(u[i]), SMALLEST), LARGEST);
            }
        }
        for (int p = 0; p < logDensity.length; p++) {
            if (tuned.parts().get(p).warps().get(j) instanceof Warp.Steps steps) {
                double[] logs = logDensity[p];
                double[] ofCells = logsOfCells[p][j];
                for (int i = 0; i < rows; i++) {
                    logs[i] += ofCells[steps.cell(u[i])];
                }
            }
        }
    }

    /// Of each part and coordinate that has steps.
    private static double[][][] logsOfCells(Tuned tuned) {
        return tuned.parts().stream()
                .map(part -> {
                    double[][] logs =
                            new double[part.warps().isEmpty() ? 0 : part.warps().lastKey() + 1][];
                    part.warps().forEach((j, warp) -> {
                        if (warp instanceof Warp.Steps steps) {
                            logs[j] = Arrays.stream(steps.densities())
                                    .map(StrictMath::log)
                                    .toArray();
                        }
                    });
                    return logs;
                })
                .toArray(double[][][]::new);
    }

    /// One over the mixture of the densities.
    private void weigh(int rows) {
        double of = tuned.of();
        Arrays.fill(weights, 0, rows, tuned.nominal() / of);
        for (int p = 0; p < logDensity.length; p++) {
            double share = tuned.parts().get(p).share() / of;
            double[] density = logDensity[p];
            Exp.exp(density, density, rows);
            for (int i = 0; i < rows; i++) {
                weights[i] = Math.fma(share, density[i], weights[i]);
            }
        }
        for (int i = 0; i < rows; i++) {
            weights[i] = 1 / weights[i];
        }
    }

    /// What each draw counts.
    double[] weights() {
        return weights;
    }
}
