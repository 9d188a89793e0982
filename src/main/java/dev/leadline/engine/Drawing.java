package dev.leadline.engine;

import dev.leadline.formula.Program;
import dev.leadline.scheme.Cursor;
import dev.leadline.scheme.Stretch;
import java.util.Arrays;
import java.util.Optional;

/// Draws inputs of a recipe, block by block. Scratch of one worker, confined to it.
///
/// An input that is not wanted is drawn only where one is tied to it that is.
final class Drawing {
    private final Recipe recipe;
    private final boolean[] wanted;
    private final double[][] columns;
    private final double[][] points;
    private final Nominal nominal;
    private final Optional<Warping> warping;
    private final Optional<TiedProposal> tied;
    private final double[] few = new double[Program.BLOCK];
    private Cursor cursor;

    /// @param wanted for each input of the question
    Drawing(Recipe recipe, boolean[] wanted) {
        this.recipe = recipe;
        this.wanted = wanted.clone();
        boolean[] behind = recipe.ties().behind(wanted);
        this.points = new double[behind.length + (recipe.isShareDrawn() ? 1 : 0)][];
        for (int j = 0; j < points.length; j++) {
            if (j == behind.length || behind[j]) {
                points[j] = new double[Program.BLOCK];
            }
        }
        this.nominal = Nominal.of(recipe);
        this.warping = Warping.of(recipe);
        this.columns = new double[wanted.length][];
        for (int j = 0; j < columns.length; j++) {
            columns[j] = wanted[j] ? points[j] : null;
        }
        this.tied = TiedProposal.of(recipe);
        tied.ifPresent(these -> these.putInto(columns));
    }

    /// Goes to the first draw of an item.
    void open(Stretch stretch) {
        cursor = recipe.layout().open(stretch);
        nominal.open();
        warping.ifPresent(Warping::open);
    }

    /// The next draws of the item.
    ///
    /// @param rows at most [Program#BLOCK]
    void next(int rows) {
        place(rows);
        fill(rows);
    }

    /// The next points, in the unit cube.
    double[][] place(int rows) {
        cursor.next(points, rows);
        warping.ifPresent(w -> w.move(points, rows));
        return points;
    }

    /// The inputs at those points, which become scratch.
    void fill(int rows) {
        nominal.next(points[points.length - 1], rows);
        tied.ifPresent(these -> these.draw(points, this::invert, nominal, rows));
        recipe.ties().tie(points, wanted, rows);
        for (int j = 0; j < columns.length; j++) {
            if (columns[j] == points[j] && columns[j] != null) {
                invert(j, columns[j], rows);
            }
        }
    }

    /// @param x probabilities, replaced by values
    private void invert(int j, double[] x, int rows) {
        var proposed = recipe.proposed(j);
        if (proposed.isEmpty()) {
            recipe.inversion(j).fill(x, x, rows);
            return;
        }
        int count = nominal.count();
        for (int i = 0; i < count; i++) {
            few[i] = x[nominal.row(i)];
        }
        proposed.get().fill(x, x, rows);
        recipe.inversion(j).fill(few, few, count);
        for (int i = 0; i < count; i++) {
            x[nominal.row(i)] = few[i];
        }
    }

    /// One draw.
    ///
    /// @param inputs every input
    /// @param weight what it counts because of a density found for its points and of how cells share draws;
    ///     else 1
    record Single(double[] inputs, double weight) {}

    /// The draw with index `draw` in the lane.
    static Single single(Recipe recipe, long draw) {
        boolean[] all = new boolean[recipe.question().inputs().size()];
        Arrays.fill(all, true);
        var drawing = new Drawing(recipe, all);
        var item = recipe.items().holding(draw);
        drawing.open(item.stretch());
        long from = item.firstDraw();
        drawing.next(Program.BLOCK);
        while (from + Program.BLOCK <= draw) {
            drawing.next(Program.BLOCK);
            from += Program.BLOCK;
        }
        int row = (int) (draw - from);
        return new Single(
                Arrays.stream(drawing.columns)
                        .mapToDouble(column -> column[row])
                        .toArray(),
                drawing.weights().map(weights -> weights[row]).orElse(1.0) * share(recipe, draw));
    }

    /// What a draw counts in its pass, 1 on average.
    private static double share(Recipe recipe, long draw) {
        return recipe.lane()
                .scheme()
                .allotted()
                .map(found -> found.counts()[found.cellOf(draw)])
                .orElse(1.0);
    }

    /// What draws count that come from a density found for them.
    Optional<double[]> weights() {
        return warping.map(Warping::weights);
    }

    /// Where points stand before [#fill(int)]; `null` for a coordinate that nobody reads.
    double[][] points() {
        return points;
    }

    /// Values of each input; `null` for one that is not wanted. The arrays stay the same.
    double[][] columns() {
        return columns;
    }
}
