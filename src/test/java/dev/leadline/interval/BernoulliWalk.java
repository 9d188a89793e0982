package dev.leadline.interval;

import java.util.function.DoublePredicate;
import java.util.function.LongUnaryOperator;

/// Everything that can happen to the count of hits of independent draws, draw by draw, with its probability:
/// chances of what a rule does are added up exactly, not simulated.
record BernoulliWalk(double p) {
    /// What is left when a recursion ends.
    private static final double REST = 1e-10;

    /// A rule that stops after a draw or goes on.
    interface Rule {
        boolean stops(long hits, long n);
    }

    /// The chance that the count leaves what is allowed at any of the first `draws` draws.
    double everOutside(int draws, LongUnaryOperator least, LongUnaryOperator most) {
        double[] chance = new double[draws + 2];
        chance[0] = 1;
        double outside = 0;
        int low = 0;
        int high = 0;
        for (int n = 1; n <= draws; n++) {
            high++;
            for (int k = high; k > low; k--) {
                chance[k] = chance[k] * (1 - p) + chance[k - 1] * p;
            }
            chance[low] *= 1 - p;
            int newLow = (int) Math.max(low, least.applyAsLong(n));
            int newHigh = (int) Math.min(high, most.applyAsLong(n));
            for (; low < newLow; low++) {
                outside += chance[low];
                chance[low] = 0;
            }
            for (; high > newHigh; high--) {
                outside += chance[high];
                chance[high] = 0;
            }
        }
        return outside;
    }

    /// The chance that hits over draws is close enough to p where the rule stops, looked at after every draw.
    double rightWhereItStops(Rule rule, DoublePredicate closeEnough) {
        double[] chance = new double[100_000];
        chance[0] = 1;
        double left = 1;
        double right = 0;
        int high = 0;
        for (int n = 1; left > REST; n++) {
            high++;
            double now = 0;
            for (int k = high; k >= 0; k--) {
                double here = chance[k] * (1 - p) + (k > 0 ? chance[k - 1] * p : 0);
                // Too rare to matter at 1e-10 in all.
                if (here < 1e-18) {
                    here = 0;
                } else if (rule.stops(k, n)) {
                    right += closeEnough.test((double) k / n - p) ? here : 0;
                    here = 0;
                }
                chance[k] = here;
                now += here;
            }
            while (high > 0 && chance[high] == 0) {
                high--;
            }
            left = now;
        }
        return right;
    }
}
