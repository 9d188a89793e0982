package dev.leadline.engine;

import dev.leadline.density.Density;
import dev.leadline.formula.Program;
import dev.leadline.numeric.Exp;
import dev.leadline.numeric.Log;
import java.util.Arrays;
import java.util.Map;
import java.util.Optional;

/// What draws from other densities count: the density of the inputs over the density they were drawn from, the latter
/// with the share of the former in it (the balance heuristic of Veach and Guibas 1995, SIGGRAPH 95, 419-428;
/// Hesterberg 1995, Technometrics 37, 185-194). Scratch of one worker.
///
/// In logarithms, so that ratios of any size are right; with a share `a` no weight is above `1 / a`.
final class Weights {
    private final Map<Integer, Density> proposal;
    private final Recipe recipe;
    private final double share;
    private final Optional<TiedProposal> tied;
    private final double[] own = new double[Program.BLOCK];
    private final double[] other = new double[Program.BLOCK];

    /// Of the draws seen last: logarithms of the density of the other densities over the inputs' own; infinite where
    /// those have none.
    private final double[] ratios = new double[Program.BLOCK];

    Weights(Recipe recipe) {
        this.recipe = recipe;
        this.proposal = recipe.proposal();
        this.share = recipe.share().value();
        this.tied = TiedProposal.of(recipe);
    }

    /// Of one draw, as far as densities of inputs make it.
    static double of(Recipe recipe, double[] inputs) {
        double[] weight = new double[1];
        new Weights(recipe).fill(columns(inputs), Optional.empty(), weight, 1);
        return weight[0];
    }

    /// The logarithm of the same.
    static double logOf(Recipe recipe, double[] inputs) {
        var weights = new Weights(recipe);
        weights.fill(columns(inputs), Optional.empty(), new double[1], 1);
        double[] log = new double[1];
        weights.addLogs(log, 1);
        return log[0];
    }

    private static double[][] columns(double[] inputs) {
        return Arrays.stream(inputs).mapToObj(x -> new double[] {x}).toArray(double[][]::new);
    }

    /// Fills the weights; 0 for a draw that the inputs cannot have.
    ///
    /// @param found weights of points that come from a density found for them
    void fill(double[][] columns, Optional<double[]> found, double[] weight, int rows) {
        if (found.isPresent()) {
            System.arraycopy(found.get(), 0, weight, 0, rows);
            Log.log(weight, ratios, rows);
            for (int i = 0; i < rows; i++) {
                ratios[i] = -ratios[i];
            }
            return;
        }
        ratio(columns, rows);
        if (share == 0) {
            for (int i = 0; i < rows; i++) {
                weight[i] = -ratios[i];
            }
            Exp.exp(weight, weight, rows);
            return;
        }
        Exp.exp(ratios, weight, rows);
        for (int i = 0; i < rows; i++) {
            weight[i] = 1 / Math.fma(1 - share, weight[i], share);
        }
    }

    /// Adds the logarithms of the weights filled last, which weights themselves may be too small for.
    void addLogs(double[] logs, int rows) {
        if (share == 0) {
            for (int i = 0; i < rows; i++) {
                logs[i] -= ratios[i];
            }
            return;
        }
        for (int i = 0; i < rows; i++) {
            own[i] = -Math.abs(ratios[i]);
        }
        Exp.exp(own, own, rows);
        for (int i = 0; i < rows; i++) {
            other[i] = ratios[i] > 0 ? Math.fma(share, own[i], 1 - share) : Math.fma(1 - share, own[i], share);
        }
        Log.log(other, other, rows);
        for (int i = 0; i < rows; i++) {
            logs[i] -= Math.max(ratios[i], 0) + other[i];
        }
    }

    private void ratio(double[][] columns, int rows) {
        Arrays.fill(ratios, 0, rows, 0);
        tied.ifPresent(inputs -> inputs.addRatio(columns, ratios, rows));
        proposal.forEach((j, density) -> {
            recipe.drawn(j).logPdf(columns[j], own, rows);
            density.logPdf(columns[j], other, rows);
            for (int i = 0; i < rows; i++) {
                ratios[i] += own[i] == Double.NEGATIVE_INFINITY ? Double.POSITIVE_INFINITY : other[i] - own[i];
            }
        });
    }
}
