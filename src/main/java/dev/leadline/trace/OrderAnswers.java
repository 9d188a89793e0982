package dev.leadline.trace;

import dev.leadline.estimate.Estimate;
import dev.leadline.estimate.Outcomes;
import dev.leadline.estimate.Outcomes.Place;
import dev.leadline.estimate.Quantile;
import dev.leadline.estimate.SelfNormalised;
import dev.leadline.interval.CoverageInterval;
import dev.leadline.interval.Delta;
import dev.leadline.interval.Interval;
import dev.leadline.interval.InvertedCdf;
import dev.leadline.interval.Ranks;
import dev.leadline.interval.Sides;
import dev.leadline.interval.Student;
import java.util.Optional;

/// Answers that follow from outcomes in their order: quantiles, tail means, distributions.
final class OrderAnswers {
    private static final Place NOWHERE = new Place(Double.NaN, Double.NaN);

    private OrderAnswers() {}

    static Answer quantile(Shown shown, double at) {
        if (shown.outcomes().isEmpty() || shown.outcomes().get().draws() == 0) {
            return none(shown, Ranks.KIND);
        }
        var outcomes = shown.outcomes().get();
        Place place = outcomes.quantile(at, total(shown, outcomes));
        return shown.scheme().isPlain() ? ranked(shown, at, outcomes, place) : inverted(shown, at, outcomes, place);
    }

    /// Of independent draws that count 1 each: by ranks, exact whatever the outcomes are.
    private static Answer ranked(Shown shown, double at, Outcomes outcomes, Place place) {
        var ranks = Ranks.of(outcomes.draws(), at, shown.level(), Sides.BOTH);
        Place low = ranks.hasLow() ? outcomes.ranked(ranks.low()) : NOWHERE;
        Place high = ranks.hasHigh() ? outcomes.ranked(ranks.high()) : NOWHERE;
        return answer(shown, place, Double.NaN, ranks.interval(low.value(), high.value()), low, high);
    }

    /// Of all others: from the error of the share beyond a level near the quantile.
    private static Answer inverted(Shown shown, double at, Outcomes outcomes, Place place) {
        var share = share(shown, at);
        var limits = InvertedCdf.of(at, share.standardError(), share.degrees(), shown.level());
        double total = total(shown, outcomes);
        Place low = Double.isNaN(limits.low()) ? NOWHERE : outcomes.quantile(limits.low(), total);
        Place high = Double.isNaN(limits.high()) ? NOWHERE : outcomes.quantile(limits.high(), total);
        return answer(shown, place, Double.NaN, limits.interval(low.value(), high.value()), low, high);
    }

    /// The estimated share of outcomes beyond the level near the quantile, on its lighter side, with the standard error
    /// that it would have at the quantile itself.
    static Estimate share(Shown shown, double at) {
        Estimate seen = mean(shown, shown.first());
        double tail = Math.min(at, Quantile.above(at));
        double here = Math.clamp(seen.value(), 0, 1);
        double scale = here > 0 && here < 1 ? Math.sqrt(tail * (1 - tail) / (here * (1 - here))) : Double.NaN;
        return new Estimate(seen.value(), seen.standardError() * scale, seen.degrees());
    }

    private static Estimate mean(Shown shown, int component) {
        return shown.isSelfNormalised()
                ? SelfNormalised.of(shown.sums(), component, shown.weight())
                : Estimate.mean(shown.sums(), component);
    }

    static Answer tailMean(Shown shown, double at) {
        if (shown.outcomes().isEmpty() || shown.outcomes().get().draws() == 0) {
            return none(shown, Delta.KIND);
        }
        var outcomes = shown.outcomes().get();
        double total = total(shown, outcomes);
        Place place = outcomes.quantile(at, total);
        double over = outcomes.excessOver(place.value());
        double value = place.value() + over / total / Quantile.above(at);
        var error = beyond(shown, at);
        var estimate = new Estimate(value, error.standardError(), error.degrees());
        return answer(shown, estimate, Delta.of(estimate, shown.level()), !place.isFound());
    }

    /// The tail mean as if the level near the quantile were the quantile: it is too great by the square of what they
    /// differ, and errs as much.
    static Estimate beyond(Shown shown, double at) {
        Estimate excess = mean(shown, shown.first());
        double above = Quantile.above(at);
        double level = shown.outcomes().map(seen -> seen.landmark().level()).orElse(0.0);
        return new Estimate(level + excess.value() / above, excess.standardError() / above, excess.degrees());
    }

    static Answer distribution(Shown shown, double coverage) {
        var estimate = centred(shown);
        var answer = answer(shown, estimate, Student.of(estimate, shown.level()), false);
        return shown.outcomes()
                .filter(seen -> CoverageInterval.symmetricRank(seen.draws(), coverage) > 0)
                .map(seen -> {
                    double deviation = MomentAnswers.deviation(shown).value();
                    var whole =
                            answer.with(seen.coverage(coverage, n -> CoverageInterval.reach(n, coverage), deviation));
                    return seen.isOpen() ? whole.untilKnown() : whole;
                })
                .orElse(answer);
    }

    /// The mean of a distribution.
    static Estimate centred(Shown shown) {
        Estimate off = mean(shown, shown.first());
        double centre = shown.outcomes().map(seen -> seen.landmark().centre()).orElse(0.0);
        return new Estimate(centre + off.value(), off.standardError(), off.degrees());
    }

    /// What all outcomes weigh.
    static double total(Shown shown, Outcomes outcomes) {
        return shown.isSelfNormalised() ? outcomes.weight() : outcomes.draws();
    }

    private static Answer none(Shown shown, String kind) {
        return Answer.of(
                shown.ask(),
                new Estimate(Double.NaN, Double.NaN, 0),
                new Interval(
                        Double.NaN,
                        Double.NaN,
                        shown.level(),
                        kind,
                        "There are outcomes.",
                        Optional.of("there is no outcome yet")),
                shown.sums());
    }

    private static Answer answer(Shown shown, Place place, double error, Interval interval, Place low, Place high) {
        boolean known = place.isFound() && isKnown(low) && isKnown(high);
        return answer(shown, new Estimate(place.value(), error, 0), interval, !known);
    }

    private static boolean isKnown(Place place) {
        return place.isFound() || Double.isNaN(place.low());
    }

    private static Answer answer(Shown shown, Estimate estimate, Interval interval, boolean provisional) {
        var answer = Answer.of(shown.ask(), estimate, interval, shown.sums());
        return provisional ? answer.untilKnown() : answer;
    }
}
