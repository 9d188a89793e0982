package dev.leadline.engine;

import dev.leadline.formula.Program;

/// Which draws come from the inputs' own densities although others are drawn from. Scratch of one worker.
///
/// Of growing points it is every observation whose index, counted in its item, says so: shares are kept exactly. Of
/// replicated points a coordinate of the layout decides.
final class Nominal {
    private final int[] rows = new int[Program.BLOCK];
    private final int nominal;
    private final int of;

    /// Draws that stay together, 0 where a coordinate decides.
    private final int together;

    private int count;
    private long seen;

    private Nominal(int nominal, int of, int together) {
        this.nominal = nominal;
        this.of = of;
        this.together = together;
    }

    static Nominal of(Recipe recipe) {
        var share = recipe.share();
        int together = recipe.isShareDrawn() || share.nominal() == 0
                ? 0
                : recipe.lane().scheme().drawsPerObservation() / share.of();
        return new Nominal(share.nominal(), share.of(), together);
    }

    /// Goes to the first draw of an item.
    void open() {
        seen = 0;
    }

    /// @param u the coordinate that decides, where one does
    void next(double[] u, int draws) {
        count = 0;
        if (nominal == 0) {
            return;
        }
        if (together == 0) {
            for (int i = 0; i < draws; i++) {
                if (u[i] * of < nominal) {
                    rows[count++] = i;
                }
            }
        } else {
            for (int i = 0; i < draws; i++) {
                if ((seen + i) / together % of < nominal) {
                    rows[count++] = i;
                }
            }
            seen += draws;
        }
    }

    int count() {
        return count;
    }

    int row(int index) {
        return rows[index];
    }
}
