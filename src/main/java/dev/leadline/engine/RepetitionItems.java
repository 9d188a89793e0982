package dev.leadline.engine;

import dev.leadline.problem.Problem;
import dev.leadline.problem.Refusal;
import dev.leadline.scheme.Stretch;
import java.util.Optional;
import java.util.OptionalInt;

/// Items of splitting: one is a repetition, and how many draws it makes shows when it is done.
record RepetitionItems(OptionalInt most) implements Items {
    @Override
    public Item at(long index) {
        return new Item(new Stretch(index, 0, 0), index, 0);
    }

    @Override
    public Optional<Item> within(long index, long budget) {
        return index < most.orElse(Integer.MAX_VALUE) ? Optional.of(at(index)) : Optional.empty();
    }

    @Override
    public Item holding(long draw) {
        throw new Refusal(Problem.of("a draw of splitting cannot be looked at by itself")
                .because("Each draw of a repetition follows from those before it.")
                .tryThis("Look at the nominal draw, or at a draw of a lane of other points."));
    }

    @Override
    public long last(long draws) {
        return most.orElse(1) - 1L;
    }

    @Override
    public long whole(long draws) {
        return draws;
    }
}
