package dev.leadline.engine;

import dev.leadline.estimate.Accumulator;
import dev.leadline.formula.Program;
import dev.leadline.scheme.Allocation;
import java.util.Arrays;

/// Observations that are the mean over cells of the means in them, which have different numbers of draws.
/// Scratch of one worker.
///
/// Draws of a cell are summed one after the other, however they are divided over calls, so that equal passes
/// give equal bits: what never varies shows no spread.
final class CellMeans implements Folding {
    /// Of each cell of a pass.
    private final int[] draws;

    /// What each draw of a pass counts, 1 on average.
    private final double[] ofDraws;

    /// Of each cell, the first of its draws in a pass.
    private final int[] begins;

    /// Cells of an observation, which may have several passes.
    private final int cells;

    /// Of each component: the sum in the cell that is under way, and that of the means of those before it.
    private final double[] inCell;

    private final double[] before;

    private final double[][] observations;
    private final double[][] counted;

    /// The cell that is under way, and how many of its draws were seen.
    private int cell;

    private int seen;

    /// @param turns passes of an observation
    CellMeans(Allocation.Found found, int turns, int components) {
        this.draws = found.draws().stream().mapToInt(Integer::intValue).toArray();
        this.begins = new int[draws.length];
        int pass = 0;
        for (int c = 0; c < draws.length; c++) {
            begins[c] = pass;
            pass += draws[c];
        }
        double[] counts = found.counts();
        this.ofDraws = new double[pass];
        for (int c = 0; c < draws.length; c++) {
            Arrays.fill(ofDraws, begins[c], begins[c] + draws[c], counts[c]);
        }
        this.cells = turns * draws.length;
        this.inCell = new double[components];
        this.before = new double[components];
        this.observations = new double[components][Program.BLOCK];
        this.counted = new double[components][Program.BLOCK];
    }

    @Override
    public void open() {
        cell = 0;
        seen = 0;
        for (int k = 0; k < inCell.length; k++) {
            inCell[k] = 0;
            before[k] = 0;
        }
    }

    @Override
    public boolean addTo(Accumulator sums, double[][] components, int rows) {
        boolean finite = true;
        int ended = 0;
        int cellAfter = cell;
        int seenAfter = seen;
        for (int k = 0; k < components.length; k++) {
            double[] x = components[k];
            double sum = inCell[k];
            double means = before[k];
            double all = 0;
            ended = 0;
            cellAfter = cell;
            seenAfter = seen;
            for (int row = 0; row < rows; ) {
                int wanted = draws[cellAfter % draws.length];
                int until = Math.min(rows, row + wanted - seenAfter);
                seenAfter += until - row;
                for (; row < until; row++) {
                    sum += x[row];
                }
                all += sum;
                if (seenAfter == wanted) {
                    means += sum / wanted;
                    sum = 0;
                    seenAfter = 0;
                    cellAfter++;
                }
                if (cellAfter == cells) {
                    observations[k][ended++] = means / cells;
                    means = 0;
                    cellAfter = 0;
                }
            }
            inCell[k] = sum;
            before[k] = means;
            finite &= Double.isFinite(all);
        }
        cell = cellAfter;
        seen = seenAfter;
        sums.add(observations, 0, ended);
        return finite;
    }

    @Override
    public void count(double[] weights, int rows) {
        int at = begins[cell % draws.length] + seen;
        for (int row = 0; row < rows; at = 0) {
            int some = Math.min(rows - row, ofDraws.length - at);
            for (int i = 0; i < some; i++) {
                weights[row + i] *= ofDraws[at + i];
            }
            row += some;
        }
    }

    @Override
    public double[][] counted(double[][] components, int rows) {
        for (int k = 0; k < counted.length; k++) {
            System.arraycopy(components[k], 0, counted[k], 0, rows);
            count(counted[k], rows);
        }
        return counted;
    }
}
