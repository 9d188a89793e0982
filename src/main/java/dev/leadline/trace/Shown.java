package dev.leadline.trace;

import dev.leadline.estimate.Accumulator;
import dev.leadline.estimate.Outcomes;
import dev.leadline.model.Ask;
import dev.leadline.model.Components;
import dev.leadline.model.Question;
import dev.leadline.scheme.Proposal;
import dev.leadline.scheme.Scheme;
import java.util.List;
import java.util.Optional;

/// What a lane has shown that one answer is made of.
///
/// @param sums of every observation
/// @param blocks the same, in parts that are independent of each other
/// @param all outcomes of each thing asked; none where only sums are known
/// @param index of the thing asked
/// @param level of its interval
record Shown(
        Question question,
        Scheme scheme,
        Accumulator sums,
        List<Accumulator> blocks,
        List<Outcomes> all,
        int index,
        double level) {
    Ask ask() {
        return question.asks().get(index);
    }

    /// Its first component.
    int first() {
        return Components.first(question.asks(), index);
    }

    /// The first component of the control variates.
    int controls() {
        return Components.asked(question.asks());
    }

    /// The component of the weights.
    int weight() {
        return sums.components() - 1;
    }

    boolean isSelfNormalised() {
        return scheme.drawFrom().filter(Proposal::selfNormalised).isPresent();
    }

    Optional<Outcomes> outcomes() {
        return index < all.size() ? Optional.of(all.get(index)) : Optional.empty();
    }

    /// The same for an interval of another level.
    Shown at(double other) {
        return new Shown(question, scheme, sums, blocks, all, index, other);
    }
}
