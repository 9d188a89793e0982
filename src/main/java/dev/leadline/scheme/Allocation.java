package dev.leadline.scheme;

import java.util.Arrays;
import java.util.Comparator;
import java.util.List;
import java.util.PriorityQueue;

/// How the draws of a pass are shared among the cells of a grid.
public sealed interface Allocation {
    /// One draw in each cell.
    record Equal() implements Allocation {}

    /// More draws where a pilot, before the run, sees outcomes vary more: in proportion to their standard
    /// deviation, since all cells are equally probable.
    ///
    /// Source: Neyman (1934), Journal of the Royal Statistical Society 97, 558-625.
    record Neyman() implements Allocation {}

    /// What was found, and is kept for the whole run. Immutable.
    ///
    /// @param draws of each cell in a pass, at least 1; the first input that has several cells runs fastest
    /// @param deviations standard deviation of what counts within each cell, in the pilot
    /// @param pilot draws of the pilot
    record Found(List<Integer> draws, List<Double> deviations, long pilot) implements Allocation {
        public Found {
            draws = List.copyOf(draws);
            deviations = List.copyOf(deviations);
        }

        /// The shares of so many draws that make the variance of a pass least. Where no cell varies, or
        /// one by more than numbers hold, all get the same.
        ///
        /// Each next draw goes to the cell where it takes most off the sum of `deviation² / draws`, which is
        /// exact: Wright (2012), The American Statistician 66, 217-224.
        ///
        /// @param draws of a pass, at least one for each cell
        static Found of(double[] deviations, int draws, long pilot) {
            boolean known = Arrays.stream(deviations).allMatch(Double::isFinite)
                    && Arrays.stream(deviations).anyMatch(sd -> sd > 0);
            return new Found(
                    shares(known ? deviations : ones(deviations.length), draws),
                    Arrays.stream(deviations).boxed().toList(),
                    pilot);
        }

        private static double[] ones(int n) {
            double[] ones = new double[n];
            Arrays.fill(ones, 1);
            return ones;
        }

        private record Cell(int index, int draws, double gain) {
            static Cell of(int index, int draws, double deviation) {
                return new Cell(index, draws, deviation / Math.sqrt(draws * (draws + 1.0)));
            }
        }

        private static List<Integer> shares(double[] deviations, int draws) {
            var next = new PriorityQueue<Cell>(
                    Comparator.comparingDouble(Cell::gain).reversed().thenComparingInt(Cell::index));
            int[] shares = new int[deviations.length];
            for (int c = 0; c < shares.length; c++) {
                shares[c] = 1;
                next.add(Cell.of(c, 1, deviations[c]));
            }
            for (int left = draws - shares.length; left > 0; left--) {
                int c = next.remove().index();
                shares[c]++;
                next.add(Cell.of(c, shares[c], deviations[c]));
            }
            return Arrays.stream(shares).boxed().toList();
        }

        /// So many draws in each of some cells.
        public static Found even(int cells, int draws) {
            Integer[] shares = new Integer[cells];
            Arrays.fill(shares, draws);
            return new Found(List.of(shares), List.of(), 0);
        }

        /// What a draw of each cell counts, 1 on average: the pass is the mean over cells of the means in them.
        public double[] counts() {
            double pass = pass();
            return draws.stream()
                    .mapToDouble(n -> pass / ((double) draws.size() * n))
                    .toArray();
        }

        /// The cell of a draw.
        ///
        /// @param draw its index in the lane
        public int cellOf(long draw) {
            int cell = 0;
            for (long left = draw % pass() - draws.getFirst(); left >= 0; left -= draws.get(cell)) {
                cell++;
            }
            return cell;
        }

        /// Draws of a pass.
        int pass() {
            return draws.stream().mapToInt(Integer::intValue).sum();
        }
    }
}
