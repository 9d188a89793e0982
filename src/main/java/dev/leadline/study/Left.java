package dev.leadline.study;

import dev.leadline.estimate.Logarithm;
import dev.leadline.interval.AnyTimeMean;
import dev.leadline.interval.DrawsNeeded;
import dev.leadline.interval.FixedWidth;
import dev.leadline.interval.Guard;
import dev.leadline.interval.HitsRule;
import dev.leadline.interval.Ratio;
import dev.leadline.model.Components;
import dev.leadline.model.Question;
import dev.leadline.model.Stop;
import dev.leadline.model.StopRule;
import dev.leadline.scheme.Growing;
import dev.leadline.trace.Answer;
import dev.leadline.trace.Bands;
import dev.leadline.trace.FirstStage;
import dev.leadline.trace.Mark;
import dev.leadline.trace.Trace;
import java.util.List;
import java.util.Optional;
import java.util.function.DoubleUnaryOperator;

/// What is likely left of a run, in draws or in seconds, with the limits between which that lies.
///
/// @param high `∞` where nothing is known of it
public record Left(double low, double value, double high) {
    private static final Left NONE = new Left(0, 0, 0);

    /// Draws that a lane still makes until its rule is satisfied or its budget used up; empty where neither
    /// is known, as of replicated points without a budget, whose error falls at a rate of its own.
    public static Optional<Left> draws(Question question, Stop stop, Trace trace) {
        if (trace.finished()) {
            return Optional.of(NONE);
        }
        long draws = trace.last().map(Mark::draws).orElse(0L);
        double budget = stop.draws() < Stop.MOST_DRAWS ? Math.max(0, stop.draws() - draws) : Double.POSITIVE_INFINITY;
        var left = byRule(question, trace).map(needed -> of(needed.after(draws)));
        return Double.isInfinite(budget)
                ? left.filter(known -> known.low < Double.POSITIVE_INFINITY)
                : Optional.of(left.orElse(new Left(budget, budget, budget)).atMost(budget));
    }

    private static Left of(DrawsNeeded needed) {
        return new Left(needed.low(), needed.value(), needed.high());
    }

    private Left atMost(double most) {
        return new Left(Math.min(low, most), Math.min(value, most), Math.min(high, most));
    }

    private Left plus(Left other) {
        return new Left(low + other.low, value + other.value, high + other.high);
    }

    private Left times(double unit) {
        return new Left(low * unit, value * unit, high * unit);
    }

    /// Seconds until all lanes have ended, which take turns; empty where some lane's end is not known, and
    /// there is no time budget.
    ///
    /// @param elapsed seconds of computing so far
    public static Optional<Left> seconds(List<LaneState> lanes, Stop stop, double elapsed) {
        double made = lanes.stream()
                .flatMap(lane -> lane.trace().last().stream())
                .mapToDouble(Mark::draws)
                .sum();
        double budget = stop.seconds().isPresent()
                ? Math.max(0, stop.seconds().getAsDouble() - elapsed)
                : Double.POSITIVE_INFINITY;
        boolean isKnown =
                made > 0 && lanes.stream().allMatch(lane -> lane.left().isPresent());
        if (!isKnown) {
            return budget < Double.POSITIVE_INFINITY ? Optional.of(new Left(budget, budget, budget)) : Optional.empty();
        }
        return Optional.of(lanes.stream()
                .map(lane -> lane.left().orElseThrow())
                .reduce(NONE, Left::plus)
                .times(elapsed / made)
                .atMost(budget));
    }

    /// Draws in all.
    private static Optional<DrawsNeeded> byRule(Question question, Trace trace) {
        if (trace.last().isEmpty()) {
            return Optional.empty();
        }
        Answer first = trace.last().orElseThrow().answers().getFirst();
        double level = question.level();
        var scheme = trace.scheme();
        return switch (trace.course().rule()) {
            case StopRule.AnyTime.WORD ->
                scheme.points() instanceof Growing
                        ? byWidth(question, trace, AnyTimeMean.tunedTo(Bands.tuned(scheme), level)::unit)
                        : Optional.empty();
            case StopRule.AsymptoticWidth.WORD -> byWidth(question, trace, new FixedWidth(level)::unit);
            case StopRule.Hits.WORD ->
                first.hits().isPresent()
                        ? Optional.of(DrawsNeeded.of(
                                new HitsRule(trace.course().hits().orElseThrow(), level),
                                first.hits().getAsLong(),
                                first.observations(),
                                question.confidence()))
                        : Optional.empty();
            case StopRule.TwoStage.WORD, StopRule.Stein.WORD ->
                trace.course()
                        .firstStage()
                        .map(FirstStage::wanted)
                        .filter(wanted -> wanted.isPresent())
                        .map(wanted -> (double) wanted.getAsLong() * scheme.drawsPerObservation())
                        .map(all -> new DrawsNeeded(all, all, all));
            default -> Optional.empty();
        };
    }

    /// From what is around the first answer now, which narrows as the width of the rule does.
    private static Optional<DrawsNeeded> byWidth(Question question, Trace trace, DoubleUnaryOperator unit) {
        Answer first = trace.last().orElseThrow().answers().getFirst();
        long n = first.observations();
        double reach = trace.course().reach(first);
        double allowed = question.tolerance()
                .map(tolerance -> tolerance.allowed(first.estimate()))
                .orElse(0.0);
        if (!(n > 2 && reach > 0 && allowed > 0 && reach < Double.POSITIVE_INFINITY)) {
            return Optional.empty();
        }
        var sums = trace.total();
        int k = Components.first(question.asks(), 0);
        double excess = sums.excessKurtosis(k);
        double ofLog = (Double.isNaN(excess) ? 2 : Math.max(0, excess + 2)) / (4.0 * n);
        var deviation = Ratio.of(
                new Logarithm(StrictMath.log(reach / unit.applyAsDouble(n)), ofLog, n - 1), question.confidence());
        double skewness = sums.skewness(k);
        double guarded = Math.max(Guard.OF_DRAWS.draws(), Double.isNaN(skewness) ? 0 : Guard.observations(skewness));
        int each = trace.scheme().drawsPerObservation();
        var needed = DrawsNeeded.of(unit, deviation, allowed);
        return Optional.of(
                new DrawsNeeded(needed.low() * each, needed.value() * each, needed.high() * each).atLeast(guarded));
    }
}
