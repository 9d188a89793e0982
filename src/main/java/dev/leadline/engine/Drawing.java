package dev.leadline.engine;

import dev.leadline.formula.Program;
import dev.leadline.scheme.Cursor;
import java.util.Arrays;

/// Draws inputs of a recipe, block by block. Scratch of one worker, confined to it.
///
/// An input that is not wanted is drawn only where one is tied to it that is.
final class Drawing {
    private final Recipe recipe;
    private final boolean[] wanted;
    private final double[][] columns;
    private final double[][] points;
    private Cursor cursor;

    /// @param wanted for each input of the question
    Drawing(Recipe recipe, boolean[] wanted) {
        this.recipe = recipe;
        this.wanted = wanted.clone();
        boolean[] behind = recipe.ties().behind(wanted);
        this.points = new double[behind.length][];
        for (int j = 0; j < points.length; j++) {
            if (behind[j]) {
                points[j] = new double[Program.BLOCK];
            }
        }
        this.columns = new double[wanted.length][];
        for (int j = 0; j < columns.length; j++) {
            columns[j] = wanted[j] ? points[j] : null;
        }
    }

    /// Goes to the first draw of an item.
    void open(Item item) {
        cursor = recipe.layout().open(item.index());
    }

    /// The next draws of the item.
    ///
    /// @param rows at most [Program#BLOCK]
    void next(int rows) {
        cursor.next(points, rows);
        recipe.ties().tie(points, wanted, rows);
        for (int j = 0; j < columns.length; j++) {
            if (columns[j] != null) {
                recipe.inversion(j).fill(columns[j], columns[j], rows);
            }
        }
    }

    /// Every input of the draw with index `draw` in the lane.
    static double[] inputs(Recipe recipe, long draw) {
        boolean[] all = new boolean[recipe.question().inputs().size()];
        Arrays.fill(all, true);
        var drawing = new Drawing(recipe, all);
        var item = recipe.items().holding(draw);
        drawing.open(item);
        long from = item.firstDraw();
        drawing.next(Program.BLOCK);
        while (from + Program.BLOCK <= draw) {
            drawing.next(Program.BLOCK);
            from += Program.BLOCK;
        }
        int row = (int) (draw - from);
        return Arrays.stream(drawing.columns).mapToDouble(column -> column[row]).toArray();
    }

    /// Values of each input; `null` for one that is not wanted. The arrays stay the same.
    double[][] columns() {
        return columns;
    }
}
