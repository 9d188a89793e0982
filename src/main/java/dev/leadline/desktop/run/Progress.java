package dev.leadline.desktop.run;

import dev.leadline.desktop.style.Figures;
import dev.leadline.model.Stop;
import dev.leadline.study.Left;
import dev.leadline.trace.Mark;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;

/// How far a lane has come, from its marks and its stop rule.
///
/// @param part between 0 and 1
/// @param drawsPerSecond of the later half of the computing so far; empty before it can be said
/// @param secondsLeft at that rate, to whichever limit comes first
public record Progress(long draws, double part, OptionalDouble drawsPerSecond, OptionalDouble secondsLeft) {

    public static Progress of(List<Mark> marks, Stop stop) {
        if (marks.isEmpty()) {
            return new Progress(0, 0, OptionalDouble.empty(), OptionalDouble.empty());
        }
        Mark last = marks.getLast();
        double byDraws = (double) last.draws() / stop.draws();
        double byTime =
                stop.seconds().isPresent() ? last.seconds() / stop.seconds().getAsDouble() : 0;
        var rate = rate(marks, last);
        var left = OptionalDouble.empty();
        if (rate.isPresent()) {
            double toDraws = (stop.draws() - last.draws()) / rate.getAsDouble();
            double toTime = stop.seconds().orElse(Double.POSITIVE_INFINITY) - last.seconds();
            left = OptionalDouble.of(Math.max(0, Math.min(toDraws, toTime)));
        }
        return new Progress(last.draws(), Math.clamp(Math.max(byDraws, byTime), 0, 1), rate, left);
    }

    /// With what is left as far as the stop rule says, which may come before the budget is used up.
    public Progress foreseeing(Optional<Left> left) {
        if (left.isEmpty() || !(left.get().value() < Double.POSITIVE_INFINITY)) {
            return this;
        }
        double still = left.get().value();
        var seconds = drawsPerSecond.isPresent()
                ? OptionalDouble.of(
                        Math.min(still / drawsPerSecond.getAsDouble(), secondsLeft.orElse(Double.POSITIVE_INFINITY)))
                : secondsLeft;
        return new Progress(draws, Math.max(part, draws / (draws + still)), drawsPerSecond, seconds);
    }

    /// As `3.1 million draws · 24 million a second · 40 s left`.
    public String text() {
        var text = new StringBuilder(Figures.count(draws)).append(" draws");
        drawsPerSecond.ifPresent(r ->
                text.append(" \u00b7 ").append(Figures.count(Math.round(r))).append(" a second"));
        secondsLeft.ifPresent(
                s -> text.append(" \u00b7 ").append(Figures.duration(s)).append(" left"));
        return text.toString();
    }

    private static OptionalDouble rate(List<Mark> marks, Mark last) {
        int since = marks.size() - 1;
        while (since > 0 && marks.get(since).seconds() > last.seconds() / 2) {
            since--;
        }
        Mark first = marks.get(since);
        double seconds = last.seconds() - first.seconds();
        if (seconds > 0) {
            return OptionalDouble.of((last.draws() - first.draws()) / seconds);
        }
        return last.seconds() > 0 ? OptionalDouble.of(last.draws() / last.seconds()) : OptionalDouble.empty();
    }
}
