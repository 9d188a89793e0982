package dev.leadline.trace;

import dev.leadline.estimate.Accumulator;
import dev.leadline.estimate.Outermost;
import dev.leadline.reference.ReferenceValue;
import dev.leadline.scheme.Scheme;
import java.util.List;
import java.util.Optional;

/// What a lane has shown so far. Immutable: nobody changes the accumulators in it.
///
/// @param lane its name
/// @param scheme as it was run
/// @param marks oldest first; empty before the first item is in
/// @param blocks sums of consecutive blocks of draws, at most 64 (see [Blocks])
/// @param outermost of the draws one by one, by their weights; empty of splitting, and where all outcomes are
///     events that count 1
/// @param outcomes how they lie, of each thing asked; empty for splitting
/// @param failures the first 20
/// @param course how the lane comes to its end
/// @param stopReason in words; empty while the lane runs or pauses
/// @param audit independent draws from the inputs' own densities, which enter no answer of the lane; empty
///     where none are wanted
/// @param reference what the first answer is compared with, as far as it was found; empty where a run did not look
public record Trace(
        String lane,
        Scheme scheme,
        List<Mark> marks,
        List<Accumulator> blocks,
        Optional<Outermost> outermost,
        List<Spread> outcomes,
        List<Failure> failures,
        Course course,
        Optional<String> stopReason,
        Optional<Trace> audit,
        Optional<ReferenceValue> reference) {
    public Trace {
        outcomes = List.copyOf(outcomes);
        marks = List.copyOf(marks);
        blocks = List.copyOf(blocks);
        failures = List.copyOf(failures);
    }

    /// Of a number of draws fixed beforehand, without an audit, compared with nothing.
    public Trace(
            String lane,
            Scheme scheme,
            List<Mark> marks,
            List<Accumulator> blocks,
            Optional<Outermost> outermost,
            List<Spread> outcomes,
            List<Failure> failures,
            Optional<String> stopReason) {
        this(
                lane,
                scheme,
                marks,
                blocks,
                outermost,
                outcomes,
                failures,
                Course.FIXED,
                stopReason,
                Optional.empty(),
                Optional.empty());
    }

    /// Of a lane whose draws count 1 each, compared with nothing.
    public Trace(
            String lane,
            Scheme scheme,
            List<Mark> marks,
            List<Accumulator> blocks,
            List<Failure> failures,
            Optional<String> stopReason) {
        this(lane, scheme, marks, blocks, Optional.empty(), List.of(), failures, stopReason);
    }

    /// The same, compared with this.
    public Trace with(Optional<ReferenceValue> other) {
        return new Trace(lane, scheme, marks, blocks, outermost, outcomes, failures, course, stopReason, audit, other);
    }

    /// The same beside its audit.
    public Trace beside(Trace plain) {
        return new Trace(
                lane,
                scheme,
                marks,
                blocks,
                outermost,
                outcomes,
                failures,
                course,
                stopReason,
                Optional.of(plain),
                reference);
    }

    public Optional<Mark> last() {
        return marks.isEmpty() ? Optional.empty() : Optional.of(marks.getLast());
    }

    public boolean finished() {
        return stopReason.isPresent();
    }

    /// Sums of every observation; only where there is a mark.
    public Accumulator total() {
        return merged(blocks);
    }

    /// Sums of about the first half of the observations, then of the rest; only where there is a mark.
    public List<Accumulator> halves() {
        int middle = 0;
        long half = blocks.stream().mapToLong(Accumulator::count).sum() / 2;
        for (long before = 0; middle < blocks.size() && before < half; middle++) {
            before += blocks.get(middle).count();
        }
        return List.of(merged(blocks.subList(0, middle)), merged(blocks.subList(middle, blocks.size())));
    }

    private Accumulator merged(List<Accumulator> parts) {
        var sum = new Accumulator(blocks.getFirst().components());
        parts.forEach(sum::merge);
        return sum;
    }
}
