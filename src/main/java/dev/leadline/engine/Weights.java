package dev.leadline.engine;

import dev.leadline.density.Density;
import dev.leadline.formula.Program;
import dev.leadline.numeric.Exp;
import java.util.Arrays;
import java.util.Map;
import java.util.Optional;

/// What draws from other densities count: the density of the inputs over the density they were drawn from, the latter
/// with the share of the former in it (the balance heuristic of Veach and Guibas 1995, SIGGRAPH 95, 419-428; Hesterberg
/// 1995, Technometrics 37, 185-194). Scratch of one worker.
///
/// In logarithms, so that ratios of any size are right; with a share `a` no weight is above `1 / a`.
final class Weights {
    private final Map<Integer, Density> proposal;
    private final Recipe recipe;
    private final double[] own = new double[Program.BLOCK];
    private final double[] other = new double[Program.BLOCK];
    private final double[] sum;

    Weights(Recipe recipe) {
        this.recipe = recipe;
        this.proposal = recipe.proposal();
        this.sum = new double[recipe.lane().scheme().isWeighted() ? Program.BLOCK : 0];
    }

    /// Of one draw.
    static double of(Recipe recipe, double[] inputs) {
        if (recipe.proposal().isEmpty()) {
            return 1;
        }
        var weights = new Weights(recipe);
        double[][] columns =
                Arrays.stream(inputs).mapToObj(x -> new double[] {x}).toArray(double[][]::new);
        double[][] weight = {{1}};
        weights.weigh(columns, Optional.empty(), weight, 1);
        return weight[0][0];
    }

    /// A block that nobody needs between two calls.
    double[] scratch() {
        return own;
    }

    /// Multiplies every component but the last by the weight, which becomes the last. A draw that the inputs cannot
    /// have counts nothing, whatever its outcome.
    ///
    /// @param found weights of points that come from a density found for them
    void weigh(double[][] columns, Optional<double[]> found, double[][] components, int rows) {
        if (sum.length == 0) {
            return;
        }
        double[] weight = components[components.length - 1];
        if (found.isPresent()) {
            System.arraycopy(found.get(), 0, weight, 0, rows);
        } else {
            weigh(columns, weight, rows);
        }
        for (int k = 0; k < components.length - 1; k++) {
            for (int i = 0; i < rows; i++) {
                components[k][i] = weight[i] == 0 ? 0 : components[k][i] * weight[i];
            }
        }
    }

    private void weigh(double[][] columns, double[] weight, int rows) {
        ratio(columns, rows);
        Exp.exp(sum, weight, rows);
        double share = recipe.share().value();
        for (int i = 0; i < rows; i++) {
            weight[i] = 1 / Math.fma(1 - share, weight[i], share);
        }
    }

    /// The logarithm of the density drawn from over the inputs' own; infinite where those have none.
    private void ratio(double[][] columns, int rows) {
        Arrays.fill(sum, 0, rows, 0);
        proposal.forEach((j, density) -> {
            recipe.drawn(j).logPdf(columns[j], own, rows);
            density.logPdf(columns[j], other, rows);
            for (int i = 0; i < rows; i++) {
                sum[i] += own[i] == Double.NEGATIVE_INFINITY ? Double.POSITIVE_INFINITY : other[i] - own[i];
            }
        });
    }
}
