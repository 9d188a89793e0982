package dev.leadline.density;

import dev.leadline.density.Axis.Line;
import dev.leadline.numeric.Exp;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;

/// The probability of an event along one variable, the others being fixed. Its score, which is above 0 where it is
/// true and below 0 where it is not, is looked at on a grid; where its sign changes, the place is found by halving, and
/// where it comes near to 0 between points of the grid, whether it passes 0 there by golden sections.
final class Crossings {
    /// Error of a place, in tolerances.
    private static final double SHARE = 0.01;

    private static final int ROUNDS = 60;

    /// A score comes near to 0 where it is at most so many times as large as its fall to the nearest point.
    private static final double NEAR = 4;

    private static final double GOLDEN = 0.38196601125010515;

    private final Line along;
    private final Score score;
    private final double[] tolerances;
    private final Part.Several parts;
    private final List<Change> changes = new ArrayList<>();
    private final List<Dip> dips = new ArrayList<>();

    /// The score of an event.
    @FunctionalInterface
    interface Score {
        /// @param rows which of the fixed values of the others
        /// @param places of this variable
        /// @param values at these places
        void fill(int[] rows, double[] places, double[] values, double[] scores);
    }

    /// A change of the event between two places.
    private static final class Change {
        final int row;
        final boolean fromTrue;
        double from;
        double to;

        Change(int row, boolean fromTrue, double from, double to) {
            this.row = row;
            this.fromTrue = fromTrue;
            this.from = from;
            this.to = to;
        }

        double middle() {
            return 0.5 * (from + to);
        }
    }

    /// Places between which the score may pass 0 twice, with the sizes of the scores there.
    private static final class Dip {
        final int row;
        final boolean isTrue;
        double from;
        double least;
        double to;
        double atFrom;
        double atLeast;
        double atTo;
        boolean isPassed;

        Dip(int row, boolean isTrue, double[] grid, double[] scores, int first, int k) {
            this.row = row;
            this.isTrue = isTrue;
            from = grid[k - 1];
            least = grid[k];
            to = grid[k + 1];
            atFrom = Math.abs(scores[first + k - 1]);
            atLeast = Math.abs(scores[first + k]);
            atTo = Math.abs(scores[first + k + 1]);
        }

        boolean isNear() {
            double fall = Math.max(atFrom, atTo) - atLeast;
            return fall > 0 && atLeast <= NEAR * fall;
        }

        double next() {
            return least - from > to - least ? least - GOLDEN * (least - from) : least + GOLDEN * (to - least);
        }

        void take(double place, double size) {
            boolean isBefore = place < least;
            if (size < atLeast) {
                if (isBefore) {
                    to = least;
                    atTo = atLeast;
                } else {
                    from = least;
                    atFrom = atLeast;
                }
                least = place;
                atLeast = size;
            } else if (isBefore) {
                from = place;
                atFrom = size;
            } else {
                to = place;
                atTo = size;
            }
        }
    }

    private Crossings(Line along, Score score, double[] tolerances, Part.Several parts) {
        this.along = along;
        this.score = score;
        this.tolerances = tolerances;
        this.parts = parts;
    }

    /// @param tolerances one for each row
    /// @param parts filled with a probability for each row
    static void fill(Line along, Score score, double[] tolerances, Part.Several parts) {
        new Crossings(along, score, tolerances, parts).fill();
    }

    private void fill() {
        double[] grid = along.grid().places();
        int together = Math.max(1, (1 << 16) / grid.length);
        for (int first = 0; first < tolerances.length; first += together) {
            int n = Math.min(together, tolerances.length - first);
            double[] scores = onGrid(grid, first, n);
            for (int i = 0; i < n; i++) {
                look(grid, scores, i * grid.length, first + i);
            }
        }
        follow();
        halve();
        for (var change : changes) {
            double between = probability(change.from, change.to);
            parts.mean()[change.row] += 0.5 * between;
            parts.error()[change.row] += 0.5 * between;
        }
        System.arraycopy(parts.mean(), 0, parts.size(), 0, tolerances.length);
        System.arraycopy(parts.mean(), 0, parts.square(), 0, tolerances.length);
    }

    private double[] onGrid(double[] grid, int first, int rows) {
        int[] row = new int[rows * grid.length];
        double[] places = new double[row.length];
        double[] values = new double[row.length];
        double[] scores = new double[row.length];
        for (int i = 0; i < rows; i++) {
            Arrays.fill(row, i * grid.length, (i + 1) * grid.length, first + i);
            System.arraycopy(grid, 0, places, i * grid.length, grid.length);
            System.arraycopy(along.grid().values(), 0, values, i * grid.length, grid.length);
        }
        score.fill(row, places, values, scores);
        return scores;
    }

    private void look(double[] grid, double[] scores, int first, int row) {
        int last = grid.length - 1;
        var sum = new Sum(scores[first] > 0 ? 0.5 * Exp.exp(grid[0]) : 0);
        if (scores[first + last] > 0) {
            sum.add(0.5 * Exp.exp(-grid[last]));
        }
        for (int k = 0; k < last; k++) {
            boolean isTrue = scores[first + k] > 0;
            if (isTrue != scores[first + k + 1] > 0) {
                changes.add(new Change(row, isTrue, grid[k], grid[k + 1]));
            } else if (isTrue) {
                sum.add(probability(grid[k], grid[k + 1]));
            }
            if (k > 0 && isLeast(scores, first + k)) {
                var dip = new Dip(row, isTrue, grid, scores, first, k);
                if (dip.isNear()) {
                    dips.add(dip);
                }
            }
        }
        parts.mean()[row] = sum.value();
    }

    private static boolean isLeast(double[] scores, int k) {
        double here = scores[k];
        return here > 0
                ? here < scores[k - 1] && here <= scores[k + 1]
                : here > scores[k - 1] && here >= scores[k + 1] && scores[k - 1] < 0 && scores[k + 1] < 0;
    }

    /// Follows each dip to its ground, or to where it has passed 0.
    private void follow() {
        var open = new ArrayList<>(dips);
        for (int round = 0; round < ROUNDS && !open.isEmpty(); round++) {
            double[] places = open.stream().mapToDouble(Dip::next).toArray();
            double[] scores = scores(open.stream().mapToInt(dip -> dip.row).toArray(), places);
            for (int i = 0; i < places.length; i++) {
                var dip = open.get(i);
                if (scores[i] > 0 != dip.isTrue) {
                    pass(dip, places[i]);
                } else {
                    dip.take(places[i], Math.abs(scores[i]));
                }
            }
            open.removeIf(dip ->
                    dip.isPassed || !dip.isNear() || probability(dip.from, dip.to) <= SHARE * tolerances[dip.row]);
        }
    }

    /// The event changes on both sides of a place; what was thought of what lies between is taken back.
    private void pass(Dip dip, double place) {
        dip.isPassed = true;
        if (dip.isTrue) {
            parts.mean()[dip.row] -= probability(dip.from, dip.to);
        }
        changes.add(new Change(dip.row, dip.isTrue, dip.from, place));
        changes.add(new Change(dip.row, !dip.isTrue, place, dip.to));
    }

    private double[] scores(int[] rows, double[] places) {
        double[] scores = new double[places.length];
        score.fill(rows, places, Arrays.stream(places).map(along::at).toArray(), scores);
        return scores;
    }

    /// What is halved off is added where it is true.
    private void halve() {
        List<Change> wide = changes;
        for (int round = 0; round < ROUNDS; round++) {
            wide = wide.stream()
                    .filter(c -> probability(c.from, c.to) > SHARE * tolerances[c.row]
                            && c.middle() > c.from
                            && c.middle() < c.to)
                    .toList();
            if (wide.isEmpty()) {
                return;
            }
            double[] scores = scores(
                    wide.stream().mapToInt(c -> c.row).toArray(),
                    wide.stream().mapToDouble(Change::middle).toArray());
            for (int i = 0; i < scores.length; i++) {
                var change = wide.get(i);
                boolean isTrue = scores[i] > 0;
                double middle = change.middle();
                boolean isLower = isTrue == change.fromTrue;
                if (isTrue) {
                    parts.mean()[change.row] +=
                            isLower ? probability(change.from, middle) : probability(middle, change.to);
                }
                if (isLower) {
                    change.from = middle;
                } else {
                    change.to = middle;
                }
            }
        }
    }

    /// Between two places; relatively accurate in both tails.
    private static double probability(double from, double to) {
        if (from < 0 && to > 0) {
            return -0.5 * (StrictMath.expm1(from) + StrictMath.expm1(-to));
        }
        double near = Math.min(Math.abs(from), Math.abs(to));
        return -0.5 * Exp.exp(-near) * StrictMath.expm1(from - to);
    }
}
