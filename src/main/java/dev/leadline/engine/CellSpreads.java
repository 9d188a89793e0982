package dev.leadline.engine;

import dev.leadline.estimate.Accumulator;

/// Variances within the cells of a grid, of draws that come cell by cell, as many in each. Where observations
/// take turns in the densities they are drawn from, so do passes, and what varies between turns does not
/// count. Scratch of one worker.
///
/// What varies is a sum of the components, each times a coefficient: the outcome, less what corrects it.
final class CellSpreads implements Folding {
    private final double[] coefficients;
    private final double[] variances;
    private final int draws;
    private final double[][] group;
    private final Accumulator inGroup = new Accumulator(1);
    private final Accumulator within;
    private int filled;
    private int groups;

    /// @param cells of the grid
    /// @param draws of a cell in a pass, at least 2
    CellSpreads(int cells, int draws, double[] coefficients) {
        this.variances = new double[cells];
        this.draws = draws;
        this.coefficients = coefficients.clone();
        this.group = new double[coefficients.length][draws];
        this.within = new Accumulator(coefficients.length);
    }

    @Override
    public void open() {
        filled = 0;
        groups = 0;
    }

    /// Adds the draws themselves.
    @Override
    public boolean addTo(Accumulator sums, double[][] components, int rows) {
        for (int from = 0; from < rows; ) {
            int some = Math.min(rows - from, draws - filled);
            for (int k = 0; k < group.length; k++) {
                System.arraycopy(components[k], from, group[k], filled, some);
            }
            from += some;
            filled += some;
            if (filled == draws) {
                end();
            }
        }
        sums.add(components, 0, rows);
        return true;
    }

    private void end() {
        double[] sum = new double[draws];
        for (int k = 0; k < group.length; k++) {
            double mean = 0;
            for (int i = 0; i < draws; i++) {
                mean += group[k][i] / draws;
                sum[i] += coefficients[k] == 0 ? 0 : coefficients[k] * group[k][i];
            }
            for (int i = 0; i < draws; i++) {
                group[k][i] -= mean;
            }
        }
        inGroup.clear();
        inGroup.add(new double[][] {sum}, 0, draws);
        within.add(group, 0, draws);
        variances[groups % variances.length] += inGroup.variance(0);
        filled = 0;
        groups++;
    }

    /// Sums of the draws, each measured from the mean in its cell.
    Accumulator within() {
        return within;
    }

    /// Of each cell, the root of the mean variance over the turns; `NaN` where there is none.
    double[] deviations() {
        double turns = (double) groups / variances.length;
        double[] deviations = new double[variances.length];
        for (int c = 0; c < deviations.length; c++) {
            deviations[c] = Math.sqrt(variances[c] / turns);
        }
        return deviations;
    }
}
