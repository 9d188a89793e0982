package dev.leadline.scheme;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.leadline.stream.Address;
import dev.leadline.stream.Purpose;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.OptionalInt;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/// Points are counted in their cells, which is what the layouts promise; read in blocks of uneven sizes.
class CellsTest {
    private static final Address LANE = new Address(20261201, Purpose.RUN, "A", 0, "", 0);
    private static final int[] BLOCKS = {1024, 8, 2, 640, 1024};

    /// @return one array for each coordinate
    private static double[][] draws(LaidOut points, List<String> names, long item, int n) {
        var cursor = points.layout(LANE, names).open(new Stretch(item, 0, 0));
        double[][] all = new double[names.size()][n];
        double[][] block = new double[names.size()][1024];
        int from = 0;
        for (int b = 0; from < n; b++) {
            int rows = Math.min(BLOCKS[b % BLOCKS.length], n - from);
            cursor.next(block, rows);
            for (int j = 0; j < block.length; j++) {
                System.arraycopy(block[j], 0, all[j], from, rows);
            }
            from += rows;
        }
        return all;
    }

    @ParameterizedTest
    @ValueSource(ints = {2, 3, 10, 64, 1000, 1024, 1025, 4096})
    void aLatinHypercubeHasOnePointInEachPartOfEachInput(int n) {
        double[][] u = draws(new LatinHypercube(OptionalInt.of(n), 30), List.of("x", "y", "z"), 5, 3 * n);
        for (int cube = 0; cube < 3; cube++) {
            for (double[] coordinate : u) {
                int[] counts = new int[n];
                for (int i = 0; i < n; i++) {
                    counts[(int) (coordinate[cube * n + i] * n)]++;
                }
                assertTrue(Arrays.stream(counts).allMatch(count -> count == 1), "cube " + cube);
            }
        }
    }

    @Test
    void theOrdersOfTwoInputsAndOfTwoCubesAreIndependent() {
        int n = 8;
        int cubes = 4000;
        double[][] u = draws(new LatinHypercube(OptionalInt.of(n), 30), List.of("x", "y"), 5, n * cubes);
        // 64 pairs of cells, each expected cubes times 1/8 of the 8 points: its count in a cube is 0 or 1 with chance
        // 1/8, since the order of one input against the other is uniform.
        double[] counts = new double[64];
        for (int i = 0; i < n * cubes; i++) {
            counts[(int) (u[0][i] * n) * n + (int) (u[1][i] * n)]++;
        }
        double chi = 0;
        for (double count : counts) {
            chi += (count - cubes / 8.0) * (count - cubes / 8.0) / (cubes / 8.0 * 7 / 8);
        }
        // Of a uniform permutation matrix the centred counts span 49 dimensions with variance 1/7 each of a cube: the
        // sum is 56 in expectation, and 49 chi-square values times 8/7.
        assertEquals(56, chi, 4 * Math.sqrt(2 * 49.0) * 8 / 7);
    }

    @Test
    void aPassOverStrataHasOneDrawInEachCell() {
        var cells = new LinkedHashMap<>(Map.of("x", 5, "z", 7));
        var points = new Stratified(cells);
        assertEquals(35, points.drawsPerObservation());
        double[][] u = draws(points, List.of("x", "y", "z"), 2, 35 * 40);
        for (int pass = 0; pass < 40; pass++) {
            int[] counts = new int[35];
            for (int i = 35 * pass; i < 35 * (pass + 1); i++) {
                counts[(int) (u[0][i] * 5) * 7 + (int) (u[2][i] * 7)]++;
            }
            assertTrue(Arrays.stream(counts).allMatch(count -> count == 1), "pass " + pass);
        }
        double y = Arrays.stream(u[1]).average().orElseThrow();
        assertEquals(0.5, y, 4 * Math.sqrt(1 / 12.0 / 1400), "an input without cells is free");
    }

    /// Draws stand cell by cell, x running fastest, as many as was found.
    @Test
    void aPassOfSharedDrawsHasAsManyInEachCellAsWasFound() {
        var shared = new Stratified(new LinkedHashMap<>(Map.of("z", 2, "x", 3)), new Allocation.Neyman());
        var points = shared.shared(new double[] {1, 0, 2, 5, 3, .5}, 96);
        var draws = points.found().orElseThrow().draws();
        assertEquals(48, points.drawsPerObservation());
        assertEquals(48, shared.drawsPerObservation());
        double[][] u = draws(points, List.of("x", "y", "z"), 2, 48 * 60);
        for (int pass = 0; pass < 60; pass++) {
            int i = 48 * pass;
            for (int c = 0; c < 6; c++) {
                for (int k = 0; k < draws.get(c); k++, i++) {
                    assertEquals(c, (int) (u[0][i] * 3) + 3 * (int) (u[2][i] * 2), "draw " + i);
                }
            }
        }
    }

    @Test
    void strataAreEvenlySpreadOverInputs() {
        var names = new ArrayList<String>();
        int[] each = {1024, 32, 10, 5, 4, 3, 2, 2, 2, 2};
        for (int d = 1; d <= 10; d++) {
            names.add("x" + d);
            assertEquals(
                    each[d - 1],
                    Stratified.evenly(names, new Allocation.Equal()).cells().get("x1"),
                    d + " inputs");
        }
        names.add("x11");
        int[] shared = {128, 11, 5, 3, 2, 2, 2};
        for (int d = 1; d <= 7; d++) {
            var cells = Stratified.evenly(names.subList(0, d), new Allocation.Neyman());
            assertEquals(shared[d - 1], cells.cells().get("x1"), d + " inputs");
        }
        assertTrue(Stratified.evenly(names.subList(0, 8), new Allocation.Neyman())
                .cells()
                .isEmpty());
        assertTrue(Stratified.evenly(names, new Allocation.Equal()).cells().isEmpty());
    }

    @Test
    void antitheticPairsAddUpToOne() {
        double[][] u = draws(new Antithetic(), List.of("x", "y"), 3, 64);
        for (double[] coordinate : u) {
            for (int i = 0; i < 64; i += 2) {
                assertEquals(1, coordinate[i] + coordinate[i + 1]);
            }
        }
    }
}
