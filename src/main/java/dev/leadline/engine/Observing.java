package dev.leadline.engine;

import dev.leadline.estimate.Estimand;
import dev.leadline.estimate.Landmark;
import dev.leadline.formula.Program;
import dev.leadline.model.Ask;
import dev.leadline.model.Components;
import java.util.List;

/// Turns outcomes into the components of observations, as [Components] lists them; control variates count what they are
/// more than their mean. All count their weight. Scratch of one worker.
final class Observing {
    private final Recipe recipe;
    private final Evaluation evaluation;
    private final double[][] components;

    /// Of each thing asked: its first component and its first formula; then the first component of the controls.
    private final int[] firsts;

    private final int[] formulas;
    private final int controls;

    Observing(Recipe recipe, Evaluation evaluation) {
        this.recipe = recipe;
        this.evaluation = evaluation;
        this.components = new double[recipe.components()][];
        List<Ask> asks = recipe.asks();
        this.firsts = new int[asks.size()];
        this.formulas = new int[asks.size()];
        this.controls = Components.asked(asks);
        for (int a = 0; a < asks.size(); a++) {
            int formula = Components.firstFormula(asks, a);
            int first = Components.first(asks, a);
            firsts[a] = first;
            formulas[a] = formula;
            switch (asks.get(a).estimand()) {
                case Estimand.Mean _, Estimand.Integral _, Estimand.Probability _ -> share(formula, first);
                case Estimand.Ratio _ -> {
                    share(formula, first);
                    share(formula + 1, first + 1);
                }
                case Estimand.Quantile _ -> components[first] = new double[Program.BLOCK];
                case Estimand.TailMean _, Estimand.StandardDeviation _, Estimand.Distribution _ -> {
                    components[first] = new double[Program.BLOCK];
                    components[first + 1] = new double[Program.BLOCK];
                }
            }
        }
        for (int c = 0; c < recipe.controls().size(); c++) {
            share(Components.formulas(asks) + c, Components.asked(asks) + c);
        }
        if (evaluation.isWeighted()) {
            components[components.length - 1] = evaluation.weights();
        }
    }

    /// The component is the outcome itself, and takes its array.
    private void share(int formula, int component) {
        components[component] = evaluation.outcomes()[formula];
    }

    /// The arrays stay the same.
    double[][] components() {
        return components;
    }

    void observe(int rows) {
        List<Ask> asks = recipe.asks();
        for (int a = 0; a < asks.size(); a++) {
            int first = firsts[a];
            double[] outcome = evaluation.outcomes()[formulas[a]];
            Landmark landmark = recipe.landmarks().get(a);
            switch (asks.get(a).estimand()) {
                case Estimand.Mean _, Estimand.Probability _ -> weigh(first, rows);
                case Estimand.Integral _ -> {}
                case Estimand.Ratio _ -> {
                    weigh(first, rows);
                    weigh(first + 1, rows);
                }
                case Estimand.Quantile(double at) -> {
                    beyond(outcome, landmark.level(), at, components[first], rows);
                    weigh(first, rows);
                }
                case Estimand.TailMean _ -> {
                    excess(outcome, landmark.level(), components[first], rows);
                    beyond(outcome, landmark.level(), 1, components[first + 1], rows);
                    weigh(first, rows);
                    weigh(first + 1, rows);
                }
                case Estimand.StandardDeviation _, Estimand.Distribution _ -> {
                    powers(outcome, landmark.centre(), components[first], components[first + 1], rows);
                    weigh(first, rows);
                    weigh(first + 1, rows);
                }
            }
        }
        for (int c = 0; c < recipe.controls().size(); c++) {
            double[] control = components[controls + c];
            double mean = recipe.controls().get(c).mean();
            for (int i = 0; i < rows; i++) {
                control[i] -= mean;
            }
            weigh(controls + c, rows);
        }
    }

    private void weigh(int component, int rows) {
        if (evaluation.isWeighted()) {
            evaluation.weigh(components[component], components[component], rows);
        }
    }

    /// Whether an outcome is beyond a level, on its lighter side; `NaN` where it is not finite.
    private static void beyond(double[] x, double level, double at, double[] beyond, int rows) {
        if (at >= 0.5) {
            for (int i = 0; i < rows; i++) {
                beyond[i] = (x[i] > level ? 1 : 0) + (x[i] - x[i]);
            }
        } else {
            for (int i = 0; i < rows; i++) {
                beyond[i] = (x[i] <= level ? 1 : 0) + (x[i] - x[i]);
            }
        }
    }

    private static void excess(double[] x, double level, double[] excess, int rows) {
        for (int i = 0; i < rows; i++) {
            excess[i] = Math.max(0, x[i] - level) + (x[i] - x[i]);
        }
    }

    private static void powers(double[] x, double centre, double[] first, double[] second, int rows) {
        for (int i = 0; i < rows; i++) {
            double off = x[i] - centre;
            first[i] = off;
            second[i] = off * off;
        }
    }
}
