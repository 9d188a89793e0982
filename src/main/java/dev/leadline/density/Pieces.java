package dev.leadline.density;

/// Pieces side by side, from the lowest to the highest, and the masses that add up from both ends: so both tails keep
/// their digits. Together the pieces have the mass 1. Immutable.
final class Pieces {
    private final Piece[] pieces;

    /// Mass below the lower end of a piece, and above it; one more for the end of the last.
    private final double[] below;

    private final double[] above;

    /// @param pieces in rising order, each of some mass; gaps may lie between them
    Pieces(Piece... pieces) {
        this.pieces = pieces;
        int n = pieces.length;
        this.below = new double[n + 1];
        this.above = new double[n + 1];
        for (int i = 0; i < n; i++) {
            below[i + 1] = below[i] + pieces[i].mass();
        }
        for (int i = n - 1; i >= 0; i--) {
            above[i] = above[i + 1] + pieces[i].mass();
        }
    }

    int count() {
        return pieces.length;
    }

    Piece get(int i) {
        return pieces[i];
    }

    double cdf(double x) {
        int i = at(x);
        double mass = massBelow(i, x);
        return mass <= 0.5 ? mass : 1 - massAbove(i, x);
    }

    double survival(double x) {
        int i = at(x);
        double mass = massBelow(i, x);
        return mass <= 0.5 ? 1 - mass : massAbove(i, x);
    }

    /// The last piece that begins at or below x; -1 where none does.
    int at(double x) {
        int from = -1;
        int to = pieces.length;
        while (to - from > 1) {
            int middle = (from + to) >>> 1;
            if (pieces[middle].low() <= x) {
                from = middle;
            } else {
                to = middle;
            }
        }
        return from;
    }

    private double massBelow(int i, double x) {
        if (i < 0) {
            return 0;
        }
        var piece = pieces[i];
        return x >= piece.high() ? below[i + 1] : below[i] + piece.below(x);
    }

    private double massAbove(int i, double x) {
        if (i < 0) {
            return 1;
        }
        var piece = pieces[i];
        return x >= piece.high() ? above[i + 1] : above[i + 1] + piece.above(x);
    }

    double quantile(double p) {
        return p <= 0.5 ? fromBelow(p) : fromAbove(1 - p);
    }

    double upperQuantile(double q) {
        return q <= 0.5 ? fromAbove(q) : fromBelow(1 - q);
    }

    private double fromBelow(double p) {
        int from = 0;
        int to = pieces.length - 1;
        while (from < to) {
            int middle = (from + to) >>> 1;
            if (below[middle + 1] >= p) {
                to = middle;
            } else {
                from = middle + 1;
            }
        }
        return pieces[from].atBelow(p - below[from]);
    }

    private double fromAbove(double q) {
        int from = 0;
        int to = pieces.length - 1;
        while (from < to) {
            int middle = (from + to + 1) >>> 1;
            if (above[middle] >= q) {
                from = middle;
            } else {
                to = middle - 1;
            }
        }
        return pieces[from].atAbove(q - above[from + 1]);
    }
}
