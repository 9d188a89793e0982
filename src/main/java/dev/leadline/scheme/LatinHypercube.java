package dev.leadline.scheme;

import dev.leadline.stream.Address;
import dev.leadline.stream.Stream;
import java.util.List;
import java.util.OptionalInt;

/// Latin hypercubes, one after the other: of the points of each, every coordinate has exactly one in each of as many
/// equal parts of (0, 1). Cubes are independent of each other, their points are not.
///
/// Source: McKay, Beckman and Conover (1979), Technometrics 21, 239-245.
///
/// @param points of a cube; empty until it follows from the draws of the lane
/// @param replicates cubes at least, where it does
public record LatinHypercube(OptionalInt points, int replicates) implements Growing {
    public static final String WORD = "latin-hypercube";

    /// As many as an item of work has at most.
    public static final int MOST_POINTS = 65_536;

    @Override
    public String word() {
        return WORD;
    }

    @Override
    public String inWords() {
        return word() + (points.isPresent() ? " of " + points.getAsInt() + " points" : "");
    }

    @Override
    public Points within(long draws) {
        return points.isPresent()
                ? this
                : new LatinHypercube(OptionalInt.of(Math.clamp(draws / replicates, 1, MOST_POINTS)), replicates);
    }

    /// Of one cube; of all, one point each, where their size follows from the draws of the lane.
    int fewestDraws() {
        return points.orElse(replicates);
    }

    @Override
    public int drawsPerObservation() {
        return points.orElseThrow();
    }

    @Override
    public Layout layout(Address lane, List<String> coordinates) {
        var keys = Streams.of(lane, coordinates);
        int n = points.orElseThrow();
        return stretch -> new Cubes(keys.open(stretch.item()), n);
    }

    private static final class Cubes implements Cursor {
        private static final double LARGEST = 1 - 0x1p-53;

        private final Stream[] streams;
        private final int points;
        private final int[][] cells;
        private int next;

        Cubes(Stream[] streams, int points) {
            this.streams = streams;
            this.points = points;
            this.cells = new int[streams.length][];
            this.next = points;
        }

        @Override
        public void next(double[][] u, int rows) {
            int filled = 0;
            while (filled < rows) {
                boolean begins = next == points;
                if (begins) {
                    next = 0;
                }
                int some = Math.min(rows - filled, points - next);
                for (int j = 0; j < streams.length; j++) {
                    if (u[j] != null) {
                        if (begins) {
                            shuffle(j);
                        }
                        fill(j, u[j], filled, some);
                    }
                }
                next += some;
                filled += some;
            }
        }

        private void fill(int j, double[] u, int from, int n) {
            streams[j].fill(u, from, n);
            int[] cell = cells[j];
            double width = 1.0 / points;
            for (int i = 0; i < n; i++) {
                u[from + i] = Math.min((cell[next + i] + u[from + i]) * width, LARGEST);
            }
        }

        /// Fisher and Yates: every order is equally likely, but for a bias below `n 2^-64`.
        private void shuffle(int j) {
            int[] cell = cells[j] == null ? new int[points] : cells[j];
            cells[j] = cell;
            for (int i = 0; i < points; i++) {
                int k = (int) Math.unsignedMultiplyHigh(streams[j].next(), i + 1L);
                cell[i] = cell[k];
                cell[k] = i;
            }
        }
    }
}
