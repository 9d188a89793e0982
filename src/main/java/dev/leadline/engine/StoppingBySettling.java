package dev.leadline.engine;

import dev.leadline.estimate.Accumulator;
import dev.leadline.estimate.Estimand;
import dev.leadline.interval.CoverageInterval;
import dev.leadline.interval.Jcgm101;
import dev.leadline.model.StopRule;
import dev.leadline.trace.Course;
import dev.leadline.trace.Course.Judged;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import java.util.Optional;

/// Stops once the results of blocks of draws have settled, as JCGM 101:2008, 7.9, says. It makes each draw a
/// second time, since blocks and items of work end at different draws.
final class StoppingBySettling implements Stopping {
    private static final int RESULTS = 4;

    private final Retrace retrace;
    private final Jcgm101 rule;
    private final double coverage;
    private final double[] block;
    private final List<double[]> blocks = new ArrayList<>();
    private final Accumulator all = new Accumulator(1);
    private int filled;
    private boolean hasSettled;

    StoppingBySettling(Recipe recipe, int digits) {
        this.retrace = new Retrace(recipe);
        this.coverage = ((Estimand.Distribution) recipe.asks().getFirst().estimand()).coverage();
        this.rule = new Jcgm101(coverage, digits);
        this.block = new double[Math.toIntExact(rule.block())];
    }

    @Override
    public int within(ItemSums item) {
        double[] outcomes = retrace.outcomes(item.item());
        for (int from = 0; from < outcomes.length; ) {
            int more = Math.min(block.length - filled, outcomes.length - from);
            System.arraycopy(outcomes, from, block, filled, more);
            filled += more;
            from += more;
            if (filled == block.length) {
                close();
                if (hasSettled) {
                    return from;
                }
            }
        }
        return outcomes.length;
    }

    private void close() {
        filled = 0;
        double[] sorted = Arrays.stream(block).filter(Double::isFinite).sorted().toArray();
        if (sorted.length < 2) {
            return;
        }
        var moments = new Accumulator(1);
        moments.add(new double[][] {sorted}, 0, sorted.length);
        all.add(new double[][] {block}, 0, block.length);
        var held = CoverageInterval.symmetric(sorted, coverage);
        blocks.add(new double[] {moments.mean(0), Math.sqrt(moments.variance(0)), held.low(), held.high()});
        double uncertainty = Math.sqrt(all.variance(0));
        hasSettled = uncertainty > 0 && rule.hasSettled(byResult(), uncertainty);
    }

    private double[][] byResult() {
        double[][] results = new double[RESULTS][blocks.size()];
        for (int b = 0; b < blocks.size(); b++) {
            for (int r = 0; r < RESULTS; r++) {
                results[r][b] = blocks.get(b)[r];
            }
        }
        return results;
    }

    @Override
    public Optional<String> merged(Accumulator total, long draws) {
        return hasSettled
                ? Optional.of(String.format(
                        Locale.ROOT,
                        "settled by JCGM 101 after %,d blocks of %,d draws, which is no guarantee",
                        blocks.size(),
                        block.length))
                : Optional.empty();
    }

    @Override
    public String allMade(String usual) {
        return usual + ", the results not settled";
    }

    @Override
    public Course course() {
        return new Course(StopRule.Jcgm101.WORD, Judged.INTERVAL);
    }
}
