package dev.leadline.scheme;

import dev.leadline.stream.Address;
import dev.leadline.stream.Stream;
import java.util.Arrays;
import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.SequencedMap;
import java.util.stream.Collectors;

/// Passes over a grid of equally probable cells, one draw in each cell and pass: the pass is the observation.
///
/// What varies between cells is gone from the error; what varies within them is left.
///
/// @param cells parts of the range of probabilities of an input, by its name; an input that is not named has one
public record Stratified(SequencedMap<String, Integer> cells) implements Growing {
    public static final String WORD = "stratified";

    /// Cells of a grid at most, as many as the draws of an item of work.
    public static final int MOST_CELLS = 65_536;

    private static final int USUAL_CELLS = 1024;

    public Stratified {
        cells = Collections.unmodifiableSequencedMap(new LinkedHashMap<>(cells));
    }

    /// As many cells for each input, at most 1,024 in all; empty for more than ten inputs, which get none.
    public static Stratified evenly(List<String> inputs) {
        int each = 1;
        while (!inputs.isEmpty() && power(each + 1, inputs.size()) <= USUAL_CELLS) {
            each++;
        }
        var cells = new LinkedHashMap<String, Integer>();
        if (each > 1) {
            for (String input : inputs) {
                cells.put(input, each);
            }
        }
        return new Stratified(cells);
    }

    private static double power(int base, int exponent) {
        double power = 1;
        for (int i = 0; i < exponent; i++) {
            power *= base;
        }
        return power;
    }

    @Override
    public String word() {
        return WORD;
    }

    @Override
    public String inWords() {
        return word() + " in "
                + cells.entrySet().stream()
                        .map(entry -> entry.getValue() + " cells of " + entry.getKey())
                        .collect(Collectors.joining(" × "));
    }

    @Override
    public int drawsPerObservation() {
        return cells.values().stream().mapToInt(Integer::intValue).reduce(1, Math::multiplyExact);
    }

    @Override
    public Layout layout(Address lane, List<String> coordinates) {
        var keys = Streams.of(lane, coordinates);
        int pass = drawsPerObservation();
        int[] parts = coordinates.stream()
                .mapToInt(name -> cells.getOrDefault(name, 1))
                .toArray();
        char[][] cell = grid(parts, pass);
        return stretch -> new Passes(keys.open(stretch.item()), parts, cell, pass);
    }

    /// The cell of each draw of a pass, for each coordinate that has several.
    private static char[][] grid(int[] parts, int pass) {
        char[][] cell = new char[parts.length][];
        int stride = 1;
        for (int j = 0; j < parts.length; j++) {
            if (parts[j] > 1) {
                cell[j] = new char[pass];
                for (int i = 0; i < pass; i++) {
                    cell[j][i] = (char) (i / stride % parts[j]);
                }
                stride *= parts[j];
            }
        }
        return cell;
    }

    private static final class Passes implements Cursor {
        private static final double LARGEST = 1 - 0x1p-53;

        private final Stream[] streams;
        private final double[] widths;
        private final char[][] cell;
        private final int pass;
        private int next;

        Passes(Stream[] streams, int[] parts, char[][] cell, int pass) {
            this.streams = streams;
            this.widths = Arrays.stream(parts).mapToDouble(n -> 1.0 / n).toArray();
            this.cell = cell;
            this.pass = pass;
        }

        @Override
        public void next(double[][] u, int rows) {
            for (int j = 0; j < streams.length; j++) {
                if (u[j] != null) {
                    streams[j].fill(u[j], 0, rows);
                    if (cell[j] != null) {
                        place(u[j], cell[j], widths[j], rows);
                    }
                }
            }
            next = (next + rows) % pass;
        }

        private void place(double[] u, char[] cells, double width, int rows) {
            int from = 0;
            int position = next;
            while (from < rows) {
                int some = Math.min(rows - from, pass - position);
                for (int i = 0; i < some; i++) {
                    u[from + i] = Math.min((cells[position + i] + u[from + i]) * width, LARGEST);
                }
                from += some;
                position = 0;
            }
        }
    }
}
