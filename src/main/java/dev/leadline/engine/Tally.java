package dev.leadline.engine;

import dev.leadline.estimate.Accumulator;
import dev.leadline.trace.Blocks;
import java.util.Arrays;
import java.util.List;
import java.util.function.LongUnaryOperator;

/// What the merged items of a lane come to: its observations. Confined to the thread that conducts the study.
sealed interface Tally {
    /// @param items those of the lane
    static Tally of(Items items, int components) {
        return switch (items) {
            case GrowingItems _ -> new Growing(components, GrowingItems::nominal);
            case RepetitionItems _ -> new Growing(components, _ -> 1);
            case Rounds rounds -> new Replicates(rounds, components);
        };
    }

    void add(ItemSums item);

    /// Whether the draws so far are whole observations.
    boolean isWhole();

    /// Sums of the observations; only where they are whole.
    Accumulator total();

    /// The observations in consecutive blocks, at most 64 where they grow.
    List<Accumulator> blocks();

    /// Observations follow one another.
    final class Growing implements Tally {
        private final Accumulator total;
        private final Blocks blocks = new Blocks();

        private final LongUnaryOperator nominal;

        /// @param nominal size of an item, by its index
        private Growing(int components, LongUnaryOperator nominal) {
            total = new Accumulator(components);
            this.nominal = nominal;
        }

        @Override
        public void add(ItemSums item) {
            total.merge(item.sums());
            blocks.add(item.sums(), nominal.applyAsLong(item.item().stretch().item()));
        }

        @Override
        public boolean isWhole() {
            return true;
        }

        @Override
        public Accumulator total() {
            return total;
        }

        @Override
        public List<Accumulator> blocks() {
            return blocks.snapshot();
        }
    }

    /// The mean of a replicate is an observation; one with a draw that failed is left out whole.
    final class Replicates implements Tally {
        private final Rounds rounds;
        private final Accumulator[] replicates;
        private List<Accumulator> whole = List.of();
        private long draws;

        private Replicates(Rounds rounds, int components) {
            this.rounds = rounds;
            this.replicates = new Accumulator[rounds.replicates()];
            Arrays.setAll(replicates, _ -> new Accumulator(components));
        }

        @Override
        public void add(ItemSums item) {
            replicates[item.item().stretch().replicate()].merge(item.sums());
            draws += item.item().draws();
            if (rounds.ends(draws)) {
                whole = Arrays.stream(replicates).map(Replicates::mean).toList();
            }
        }

        private static Accumulator mean(Accumulator draws) {
            double[][] observation = new double[draws.components()][1];
            for (int k = 0; k < observation.length; k++) {
                observation[k][0] = draws.excluded() > 0 ? Double.NaN : draws.mean(k);
            }
            var mean = new Accumulator(observation.length);
            mean.add(observation, 0, 1);
            return mean;
        }

        @Override
        public boolean isWhole() {
            return rounds.ends(draws);
        }

        @Override
        public Accumulator total() {
            var total = new Accumulator(replicates[0].components());
            whole.forEach(total::merge);
            return total;
        }

        @Override
        public List<Accumulator> blocks() {
            return whole;
        }
    }
}
