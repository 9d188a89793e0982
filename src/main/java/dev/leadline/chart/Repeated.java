package dev.leadline.chart;

import dev.leadline.model.Question;
import dev.leadline.trace.Rehearsal;
import dev.leadline.trace.Rehearsed;
import dev.leadline.trace.Repetition;
import java.util.ArrayList;
import java.util.List;

/// What the *Rehearsal* picture shows: the intervals of all repetitions of a set-up, ordered by their
/// middles, and the value that they should hold.
///
/// @param title of the question
/// @param rehearsal one with repetitions
/// @param answer one of its answers
public record Repeated(String title, Rehearsal rehearsal, Rehearsed answer) implements Subject {
    /// The first answer.
    public static Repeated of(Question question, Rehearsal rehearsal) {
        return new Repeated(question.title(), rehearsal, rehearsal.answers().getFirst());
    }

    /// An interval.
    ///
    /// @param point its place in the order, from 1, its estimate and limits; a limit that does not exist is
    ///     infinite
    /// @param missed whether it misses the value
    record Placed(Point point, boolean missed) {}

    /// In their order; without those of repetitions that have none.
    List<Placed> placed() {
        var placed = new ArrayList<Placed>();
        for (Repetition one : answer.ordered()) {
            double low = one.interval().low();
            double high = one.interval().high();
            placed.add(new Placed(
                    new Point(
                            placed.size() + 1,
                            one.estimate(),
                            Double.isNaN(low) ? Double.NEGATIVE_INFINITY : low,
                            Double.isNaN(high) ? Double.POSITIVE_INFINITY : high),
                    !answer.holds(one)));
        }
        return placed;
    }

    @Override
    public String caption() {
        return Caption.of(this);
    }
}
