package dev.leadline.estimate;

import java.util.List;
import java.util.Optional;
import java.util.function.LongUnaryOperator;

/// The coverage intervals of outcomes, of which only the ends are kept. Confined to the thread that merges items.
///
/// Source: JCGM 101:2008, 7.7. The ends of the shortest interval converge slowly, as n^(-1/3) (from memory); its length
/// and what it holds converge as other estimates do.
final class CoverageIntervals {
    /// Looked for again once there are so many times the outcomes; sorting at every mark would cost more than the run.
    private static final double AGAIN = 2;

    private final Outcomes outcomes;
    private final double coverage;
    private final LongUnaryOperator reach;
    private Optional<Found> found = Optional.empty();

    /// @param reach ranks from one end to the other, of so many outcomes
    CoverageIntervals(Outcomes outcomes, double coverage, LongUnaryOperator reach) {
        this.reach = reach;
        this.outcomes = outcomes;
        this.coverage = coverage;
    }

    /// @param draws they were found from
    record Found(long draws, Outcomes.Place low, Outcomes.Place high, double shortestLow, double shortestHigh) {}

    void forget() {
        found = Optional.empty();
    }

    Found find() {
        if (found.isEmpty() || outcomes.draws() >= AGAIN * found.get().draws()) {
            found = Optional.of(outcomes.isWeighted() ? weighted() : ranked());
        }
        return found.get();
    }

    private Found ranked() {
        long n = outcomes.draws();
        long span = reach.applyAsLong(n);
        long rank = (n - span + 1) / 2;
        var low = outcomes.ranked(rank);
        var high = outcomes.ranked(rank + span);
        double[] shortest = outcomes.ends()
                .filter(ends -> ends.getFirst().length > 0 && ends.getLast().length > 0)
                .map(ends -> shortest(ends, n, span))
                .orElseGet(() -> byBins(n, span, low.value(), high.value()));
        return new Found(n, low, high, shortest[0], shortest[1]);
    }

    /// @param ends outcomes from the least on, and those up to the greatest, in order; perhaps all in one
    private static double[] shortest(List<double[]> ends, long n, long span) {
        double[] lows = ends.getFirst();
        double[] highs = ends.getLast();
        long before = n - highs.length;
        double[] best = {lows[0], highs[highs.length - 1]};
        for (long rank = 1; rank <= Math.min(n - span, lows.length); rank++) {
            long other = rank + span - before;
            if (other < 1) {
                continue;
            }
            double low = lows[(int) rank - 1];
            double high = highs[(int) other - 1];
            if (high - low < best[1] - best[0]) {
                best[0] = low;
                best[1] = high;
            }
        }
        return best;
    }

    /// To the width of a bin, where not all are kept.
    private double[] byBins(long n, long span, double low, double high) {
        double[] best = {low, high};
        for (var step : outcomes.lowSteps()) {
            if (step.rank() < 1 || step.rank() + span > n) {
                continue;
            }
            double other = outcomes.near(step.rank() + span);
            if (other - step.value() < best[1] - best[0]) {
                best[0] = step.value();
                best[1] = other;
            }
        }
        return best;
    }

    private Found weighted() {
        double total = outcomes.weight();
        double left = (1 - coverage) / 2;
        var low = outcomes.quantile(left, total);
        var high = outcomes.quantile(1 - left, total);
        double[] best = {low.value(), high.value()};
        for (int i = 0; i <= TRIES; i++) {
            double share = (1 - coverage) * i / TRIES;
            double from = share == 0 ? outcomes.landmark().from() : outcomes.nearShare(share, total);
            double to = i == TRIES ? outcomes.landmark().to() : outcomes.nearShare(share + coverage, total);
            if (to - from < best[1] - best[0]) {
                best[0] = from;
                best[1] = to;
            }
        }
        return new Found(outcomes.draws(), low, high, best[0], best[1]);
    }

    /// Shares left out below that are tried of weighted outcomes.
    private static final int TRIES = 200;
}
