package dev.leadline.scheme;

import java.util.Arrays;

/// Moves a uniform coordinate so that it has another density on (0, 1). Immutable.
public sealed interface Warp {
    /// Normal scores of the coordinate get a mean and a standard deviation.
    record OfScores(double mean, double sd) implements Warp {
        /// The logarithm of the density, relative to the uniform one, where the normal score is z.
        public double logDensity(double z) {
            double own = (z - mean) / sd;
            return 0.5 * (z * z - own * own) - StrictMath.log(sd);
        }
    }

    /// A density with steps: as much of the probability in each cell.
    ///
    /// @param edges from 0 to 1, rising
    record Steps(double[] edges) implements Warp {
        public Steps {
            edges = edges.clone();
        }

        @Override
        public double[] edges() {
            return edges.clone();
        }

        public double moved(double v) {
            int cells = edges.length - 1;
            int cell = (int) (v * cells);
            return Math.fma(v * cells - cell, edges[cell + 1] - edges[cell], edges[cell]);
        }

        /// The cell that holds u.
        public int cell(double u) {
            int at = Arrays.binarySearch(edges, u);
            return Math.min(at >= 0 ? at : -at - 2, edges.length - 2);
        }

        /// Of each cell, relative to the uniform density.
        public double[] densities() {
            int cells = edges.length - 1;
            double[] densities = new double[cells];
            for (int c = 0; c < cells; c++) {
                densities[c] = 1 / (cells * (edges[c + 1] - edges[c]));
            }
            return densities;
        }

        @Override
        public boolean equals(Object other) {
            return other instanceof Steps steps && Arrays.equals(edges, steps.edges);
        }

        @Override
        public int hashCode() {
            return Arrays.hashCode(edges);
        }
    }
}
