package dev.leadline.scheme;

import dev.leadline.stream.Address;
import dev.leadline.stream.Stream;
import java.util.Arrays;
import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.SequencedMap;
import java.util.stream.Collectors;

/// Passes over a grid of equally probable cells, each drawn from in every pass: the observation is a pass,
/// the mean over the cells of the means in them.
///
/// What varies between cells is gone from the error; what varies within them is left. Where draws are shared
/// by a pilot, which may miss what is rare, no cell has less than an eighth of the even share.
///
/// @param cells parts of the range of probabilities of an input, by its name; an input that is not named has one
public record Stratified(SequencedMap<String, Integer> cells, Allocation allocation) implements Growing {
    public static final String WORD = "stratified";

    /// Draws of a pass at most, as many as an item of work has.
    public static final int MOST_DRAWS = 65_536;

    /// Draws of a pass for each cell, on average, where they are shared by a pilot; fewer where a pass would
    /// be too long.
    public static final int SHARED = 8;

    /// The same for the largest grid.
    public static final int LEAST_SHARED = 4;

    private static final int USUAL_DRAWS = 1024;

    public Stratified {
        cells = Collections.unmodifiableSequencedMap(new LinkedHashMap<>(cells));
    }

    /// One draw in each cell and pass.
    public Stratified(SequencedMap<String, Integer> cells) {
        this(cells, new Allocation.Equal());
    }

    /// As many cells for each input, with at most 1,024 draws in a pass; none where there are too many
    /// inputs, of which ten can have two cells, or seven where draws are shared by a pilot.
    public static Stratified evenly(List<String> inputs, Allocation allocation) {
        int most = allocation instanceof Allocation.Equal ? USUAL_DRAWS : USUAL_DRAWS / SHARED;
        int each = 1;
        while (!inputs.isEmpty() && power(each + 1, inputs.size()) <= most) {
            each++;
        }
        var cells = new LinkedHashMap<String, Integer>();
        if (each > 1) {
            for (String input : inputs) {
                cells.put(input, each);
            }
        }
        return new Stratified(cells, allocation);
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
                        .map(entry -> entry.getValue()
                                + (entry.getValue() == 1 ? " cell of " : " cells of ")
                                + entry.getKey())
                        .collect(Collectors.joining(" × "))
                + switch (allocation) {
                    case Allocation.Equal _ -> "";
                    case Allocation.Neyman _ -> ", draws shared by a pilot";
                    case Allocation.Found found -> inWords(found);
                };
    }

    private static String inWords(Allocation.Found found) {
        int least = Collections.min(found.draws());
        int most = Collections.max(found.draws());
        return String.format(
                Locale.ROOT,
                ", %s of %,d draws to a cell by a pilot of %,d",
                least == most ? String.valueOf(least) : least + " to " + most,
                found.pass(),
                found.pilot());
    }

    /// Of the grid.
    public int cellsInAll() {
        return cells.values().stream().mapToInt(Integer::intValue).reduce(1, Math::multiplyExact);
    }

    @Override
    public int drawsPerObservation() {
        return switch (allocation) {
            case Allocation.Equal _ -> cellsInAll();
            case Allocation.Neyman _ -> Math.min(SHARED * cellsInAll(), MOST_DRAWS);
            case Allocation.Found found -> found.pass();
        };
    }

    /// How draws are shared, once that is found.
    public Optional<Allocation.Found> found() {
        return allocation instanceof Allocation.Found found ? Optional.of(found) : Optional.empty();
    }

    /// The draws that this shares by a pilot, shared by what it saw.
    ///
    /// @param deviations standard deviation within each cell
    /// @param pilot its draws
    public Stratified shared(double[] deviations, long pilot) {
        return new Stratified(cells, Allocation.Found.of(deviations, drawsPerObservation(), pilot));
    }

    @Override
    public Layout layout(Address lane, List<String> coordinates) {
        var keys = Streams.of(lane, coordinates);
        int pass = drawsPerObservation();
        int[] parts = coordinates.stream()
                .mapToInt(name -> cells.getOrDefault(name, 1))
                .toArray();
        char[][] cell = grid(parts, order(pass));
        return stretch -> new Passes(keys.open(stretch.item()), parts, cell, pass);
    }

    /// The cell of the grid of each draw of a pass.
    private int[] order(int pass) {
        int[] order = new int[pass];
        if (allocation instanceof Allocation.Found found) {
            int from = 0;
            for (int c = 0; c < found.draws().size(); c++) {
                int until = from + found.draws().get(c);
                Arrays.fill(order, from, until, c);
                from = until;
            }
        } else {
            Arrays.setAll(order, i -> i);
        }
        return order;
    }

    /// The part that each draw of a pass lies in, for each coordinate that has several.
    private static char[][] grid(int[] parts, int[] order) {
        char[][] cell = new char[parts.length][];
        int stride = 1;
        for (int j = 0; j < parts.length; j++) {
            if (parts[j] > 1) {
                cell[j] = new char[order.length];
                for (int i = 0; i < order.length; i++) {
                    cell[j][i] = (char) (order[i] / stride % parts[j]);
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
