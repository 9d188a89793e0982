package dev.leadline.engine;

import dev.leadline.density.Copula;
import dev.leadline.density.Density;
import dev.leadline.density.Normal;
import dev.leadline.formula.Program;
import java.util.Arrays;
import java.util.Optional;

/// Inputs that are tied by a Gaussian copula and drawn from other densities: they are drawn first, tied to each other
/// as stated, and the others then as they are when these are given. Scratch of one worker.
///
/// What ties is the normal behind a value under the input's own density: the draw is a fair one of the others, given
/// these, so that only these need a weight.
final class TiedProposal {
    /// Beyond it a normal has no probability that is a number.
    private static final double FARTHEST = 37;

    private static final Normal NORMAL = new Normal(0, 1);

    private final Recipe recipe;
    private final int[] inputs;
    private final Copula copula;
    private final boolean[] all;

    /// Probabilities, then values.
    private final double[][] values;

    private final double[][] own;
    private final double[][] other;

    /// Fills values of an input from its probabilities.
    interface Inverting {
        void invert(int input, double[] x, int rows);
    }

    private TiedProposal(Recipe recipe) {
        this.recipe = recipe;
        this.inputs = recipe.ties().proposed();
        this.copula = recipe.ties().first();
        this.all = new boolean[inputs.length];
        Arrays.fill(all, true);
        this.values = new double[inputs.length][Program.BLOCK];
        this.own = new double[inputs.length][Program.BLOCK];
        this.other = new double[inputs.length][Program.BLOCK];
    }

    static Optional<TiedProposal> of(Recipe recipe) {
        return recipe.ties().proposed().length == 0 ? Optional.empty() : Optional.of(new TiedProposal(recipe));
    }

    /// Puts the arrays that hold the values into those of all inputs.
    void putInto(double[][] columns) {
        for (int i = 0; i < inputs.length; i++) {
            columns[inputs[i]] = values[i];
        }
    }

    /// Draws them.
    ///
    /// @param points probabilities of all inputs; those of these become the independent normals that their values
    ///     are made of
    /// @param nominal which come from the inputs' own densities
    void draw(double[][] points, Inverting inverting, Nominal nominal, int rows) {
        for (int i = 0; i < inputs.length; i++) {
            System.arraycopy(points[inputs[i]], 0, values[i], 0, rows);
        }
        copula.tie(values, all, rows);
        double[][] behind = new double[inputs.length][];
        for (int i = 0; i < inputs.length; i++) {
            int j = inputs[i];
            double[] u = points[j];
            System.arraycopy(values[i], 0, u, 0, rows);
            inverting.invert(j, values[i], rows);
            if (recipe.drawn(j).isDiscrete()) {
                inSteps(j, u, values[i], nominal, rows);
            } else {
                normals(recipe.drawn(j), values[i], u, rows);
            }
            behind[i] = u;
        }
        copula.untie(behind, rows);
    }

    /// Adds what the ties of these to each other make of the logarithm of the density drawn from over the inputs'
    /// own.
    void addRatio(double[][] columns, double[] logs, int rows) {
        if (inputs.length == 1) {
            return;
        }
        for (int i = 0; i < inputs.length; i++) {
            int j = inputs[i];
            normals(recipe.drawn(j), columns[j], own[i], rows);
            normals(recipe.proposal().get(j), columns[j], other[i], rows);
        }
        addLogDensity(other, 1, logs, rows);
        addLogDensity(own, -1, logs, rows);
    }

    /// Adds the logarithm of the copula's density at normals, up to what is the same everywhere; `z` becomes scratch.
    private void addLogDensity(double[][] z, double sign, double[] logs, int rows) {
        addSquares(z, 0.5 * sign, logs, rows);
        copula.untie(z, rows);
        addSquares(z, -0.5 * sign, logs, rows);
    }

    private static void addSquares(double[][] z, double factor, double[] logs, int rows) {
        for (double[] component : z) {
            for (int i = 0; i < rows; i++) {
                logs[i] = Math.fma(factor * component[i], component[i], logs[i]);
            }
        }
    }

    /// The normals that are as unlikely as values, each from the nearer tail; of a normal density at once.
    private static void normals(Density density, double[] x, double[] z, int rows) {
        var standardised = density.standardised();
        if (standardised.shape().equals(NORMAL.standard())) {
            double scale = Math.abs(standardised.scale());
            for (int i = 0; i < rows; i++) {
                z[i] = (x[i] - standardised.location()) / scale;
            }
            return;
        }
        for (int i = 0; i < rows; i++) {
            double below = density.cdf(x[i]);
            z[i] = below <= 0.5 ? normal(below, 1) : normal(1, density.survival(x[i]));
        }
    }

    /// @param below probability; does not matter where `above` is less
    private static double normal(double below, double above) {
        double z = below <= above ? NORMAL.quantile(below) : NORMAL.upperQuantile(above);
        return Math.clamp(z, -FARTHEST, FARTHEST);
    }

    /// A separate value stands for a range of probabilities: where in it the draw lies under the density drawn from,
    /// it lies under the input's own.
    ///
    /// @param u probabilities that the values were drawn by; replaced by normals
    private void inSteps(int j, double[] u, double[] x, Nominal nominal, int rows) {
        Density own = recipe.drawn(j);
        int next = 0;
        for (int i = 0; i < rows; i++) {
            boolean isNominal = next < nominal.count() && nominal.row(next) == i;
            next += isNominal ? 1 : 0;
            Density drawn = isNominal ? own : recipe.proposal().get(j);
            double left = Math.clamp((drawn.cdf(x[i]) - u[i]) / drawn.pdf(x[i]), 0, 1);
            double beyond = left * own.pdf(x[i]);
            u[i] = normal(Math.max(own.cdf(x[i]) - beyond, 0), own.survival(x[i]) + beyond);
        }
    }
}
