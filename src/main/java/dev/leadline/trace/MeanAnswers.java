package dev.leadline.trace;

import dev.leadline.estimate.Accumulator;
import dev.leadline.estimate.CrossFit;
import dev.leadline.estimate.Estimand;
import dev.leadline.estimate.Estimate;
import dev.leadline.estimate.Outcomes;
import dev.leadline.estimate.Regression;
import dev.leadline.estimate.SelfNormalised;
import dev.leadline.interval.BootstrapT;
import dev.leadline.interval.Bounds;
import dev.leadline.interval.ClopperPearson;
import dev.leadline.interval.EmpiricalBernstein;
import dev.leadline.interval.Hoeffding;
import dev.leadline.interval.Interval;
import dev.leadline.interval.IntervalKind;
import dev.leadline.interval.NoHit;
import dev.leadline.interval.SkewnessCorrected;
import dev.leadline.interval.SplittingSteps;
import dev.leadline.interval.Student;
import dev.leadline.interval.ToRounding;
import dev.leadline.interval.Wilson;
import dev.leadline.model.Ask;
import dev.leadline.model.Input;
import dev.leadline.model.Input.Role;
import dev.leadline.model.ObservedBounds;
import dev.leadline.scheme.Control;
import dev.leadline.scheme.Growing;
import dev.leadline.scheme.Independent;
import dev.leadline.scheme.Proposal;
import dev.leadline.scheme.Repetitions;
import dev.leadline.scheme.Scheme;
import dev.leadline.scheme.SplittingOutcome;
import java.util.Optional;
import java.util.OptionalLong;

/// Answers that are a mean of outcomes: means, integrals and chances.
final class MeanAnswers {
    private MeanAnswers() {}

    static Answer of(Shown shown) {
        Ask ask = shown.ask();
        Scheme scheme = shown.scheme();
        Accumulator sums = shown.sums();
        int k = shown.first();
        double level = shown.level();
        OptionalLong hits =
                ask.estimand() instanceof Estimand.Probability ? hits(scheme, sums, k) : OptionalLong.empty();
        if (scheme.isPlain() && hits.isPresent()) {
            boolean isWilson = shown.question().interval().kind() == IntervalKind.WILSON;
            var interval = isWilson
                    ? Wilson.of(hits.getAsLong(), sums.count(), sums.excluded(), level)
                    : ClopperPearson.of(hits.getAsLong(), sums.count(), sums.excluded(), level);
            return answer(ask, sums, Estimate.mean(sums, k), interval, hits);
        }
        if (scheme.points() instanceof Repetitions repetitions) {
            return climbed(ask, repetitions, sums, level);
        }
        boolean isNoHit = ask.estimand() instanceof Estimand.Probability && scheme.isWeighted() && isZero(sums, k);
        if (isNoHit) {
            return answer(ask, sums, new Estimate(0, Double.NaN, sums.count() - 1), noHit(scheme, sums, level));
        }
        if (mayBePerfect(shown) && ToRounding.isMet(sums.min(k), sums.max(k))) {
            double value = sums.mean(k);
            return answer(
                    ask,
                    sums,
                    new Estimate(value, ToRounding.standardError(value), sums.count() - 1),
                    ToRounding.of(value, sums.count(), level));
        }
        Optional<String> hindrance = scheme.controls().isEmpty() ? Optional.empty() : hindrance(shown);
        if (hindrance.isPresent()) {
            var none = new Estimate(Double.NaN, Double.NaN, 0);
            return answer(ask, sums, none, Student.none(level, hindrance.get()), hits);
        }
        Estimate estimate = corrected(shown);
        var interval = !scheme.controls().isEmpty() && estimate.standardError() == 0 && !sums.constant(k)
                ? Student.none(
                        level,
                        "the control variates explain every outcome seen so far: no spread to build an interval from")
                : wished(shown, estimate);
        return answer(ask, sums, estimate, bounded(ask, interval), hits);
    }

    /// The interval of the kind that the question wants.
    private static Interval wished(Shown shown, Estimate estimate) {
        Accumulator sums = shown.sums();
        int k = shown.first();
        double level = shown.level();
        return switch (shown.question().interval().kind()) {
            case AUTO, STUDENT, CLOPPER_PEARSON, WILSON -> Student.of(estimate, level);
            case SKEWNESS_CORRECTED -> SkewnessCorrected.of(sums, k, level);
            case HOEFFDING -> {
                Bounds bounds = bounds(shown);
                yield Hoeffding.of(sums, k, bounds.low(), bounds.high(), level);
            }
            case EMPIRICAL_BERNSTEIN -> {
                Bounds bounds = bounds(shown);
                yield EmpiricalBernstein.of(sums, k, bounds.low(), bounds.high(), level);
            }
            case BOOTSTRAP_T -> resampled(shown, estimate);
        };
    }

    /// Of the observations; there are some wherever a kind is wanted that needs them.
    private static Bounds bounds(Shown shown) {
        var question = shown.question();
        return ObservedBounds.of(
                        question.interval().bounds().orElseThrow(), shown.ask().estimand(), question.inputs())
                .orElseThrow();
    }

    /// From the observations themselves, at the end of a run, since it takes long; Student's until then.
    private static Interval resampled(Shown shown, Estimate estimate) {
        if (shown.sums().count() > BootstrapT.MOST) {
            return BootstrapT.ofTooMany(shown.sums().count(), shown.level());
        }
        return shown.outcomes()
                .filter(Outcomes::isSettled)
                .flatMap(Outcomes::ends)
                .map(ends -> BootstrapT.of(ends.getFirst(), shown.level()))
                .orElseGet(() -> Student.of(estimate, shown.level()));
    }

    private static boolean isZero(Accumulator sums, int k) {
        return sums.count() > 0 && sums.min(k) == 0 && sums.max(k) == 0;
    }

    private static Interval noHit(Scheme scheme, Accumulator sums, double level) {
        long draws = scheme.points() instanceof Growing ? sums.count() * scheme.turns() : sums.count();
        return NoHit.of(draws, scheme.nominalShare(), sums.excluded(), level);
    }

    /// Whether equal values say that the density drawn from is perfect: they do where the weights are not all equal.
    private static boolean mayBePerfect(Shown shown) {
        Scheme scheme = shown.scheme();
        Accumulator sums = shown.sums();
        boolean isWeighed = shown.ask().estimand() instanceof Estimand.Integral
                && shown.question().inputs().stream().map(Input::role).anyMatch(Role.UnboundedRange.class::isInstance);
        return sums.count() > 1
                && (isWeighed && scheme.controls().isEmpty()
                        || scheme.isWeighted()
                                && scheme.drawFrom()
                                        .filter(Proposal::selfNormalised)
                                        .isEmpty()
                                && !ToRounding.isMet(sums.min(sums.components() - 1), sums.max(sums.components() - 1)));
    }

    /// Of single draws that count 1 each.
    private static OptionalLong hits(Scheme scheme, Accumulator sums, int k) {
        return scheme.points() instanceof Independent && !scheme.isWeighted() ? sums.hits(k) : OptionalLong.empty();
    }

    /// Why the coefficients of the control variates cannot be fitted yet, and what number of observations
    /// would do.
    private static Optional<String> hindrance(Shown shown) {
        Scheme scheme = shown.scheme();
        Accumulator sums = shown.sums();
        int controls = scheme.controls().size();
        long wanted = Regression.fewest(controls);
        String needed = controls == 1
                ? "1 control variate needs at least %d observations".formatted(wanted)
                : "%d control variates need at least %d observations".formatted(controls, wanted);
        if (sums.count() < wanted) {
            return Optional.of("%s, 10 for each; so far there %s"
                    .formatted(needed, sums.count() == 1 ? "is 1" : "are " + sums.count()));
        }
        long others = scheme.crossFitted()
                ? new CrossFit(shown.blocks(), shown.first(), shown.controls(), controls).fewest()
                : wanted;
        return others >= wanted
                ? Optional.empty()
                : Optional.of("%s outside every part of the draws that is corrected; so far there are %d of %d"
                        .formatted(needed, others, sums.count()));
    }

    private static double[] errors(Scheme scheme) {
        return scheme.controls().stream().mapToDouble(Control::error).toArray();
    }

    private static Estimate corrected(Shown shown) {
        Scheme scheme = shown.scheme();
        return scheme.crossFitted()
                ? new CrossFit(
                                shown.blocks(),
                                shown.first(),
                                shown.controls(),
                                scheme.controls().size())
                        .estimate(errors(scheme))
                : estimate(shown);
    }

    /// The estimate as it is answered; `NaN` where control variates hinder it.
    static Estimate answered(Shown shown) {
        return shown.scheme().controls().isEmpty() || hindrance(shown).isEmpty()
                ? corrected(shown)
                : new Estimate(Double.NaN, Double.NaN, 0);
    }

    /// The estimate alone, before its interval, from sums alone.
    static Estimate estimate(Shown shown) {
        Scheme scheme = shown.scheme();
        Accumulator sums = shown.sums();
        int k = shown.first();
        if (scheme.points() instanceof Repetitions repetitions) {
            var steps = steps(repetitions, sums);
            return new Estimate(steps.estimate(), steps.error(), sums.count() - 1);
        }
        if (shown.isSelfNormalised()) {
            return SelfNormalised.of(sums, k, shown.weight());
        }
        return scheme.controls().isEmpty()
                ? Estimate.mean(sums, k)
                : new Regression(sums, k, shown.controls(), scheme.controls().size()).estimate(errors(scheme));
    }

    /// Of splitting: no answer once a repetition has given up, for those that did not are the lucky ones.
    private static Answer climbed(Ask ask, Repetitions repetitions, Accumulator sums, double level) {
        int end = sums.count() == 0 ? 0 : (int) sums.max(Repetitions.COMPONENTS - 1);
        if (end > 0) {
            String why = SplittingOutcome.End.values()[end].words();
            var none = new Interval(
                    Double.NaN, Double.NaN, level, SplittingSteps.KIND, "A repetition gave up.", Optional.of(why));
            return answer(
                    ask, sums, new Estimate(Double.NaN, Double.NaN, sums.count() - 1), none, OptionalLong.empty());
        }
        var steps = steps(repetitions, sums);
        var estimate = new Estimate(steps.estimate(), steps.error(), sums.count() - 1);
        return answer(ask, sums, estimate, steps.interval(level), OptionalLong.empty());
    }

    private static SplittingSteps steps(Repetitions repetitions, Accumulator sums) {
        return SplittingSteps.of(sums, 0, repetitions.splitting().particles());
    }

    /// A chance is neither below 0 nor above 1.
    private static Interval bounded(Ask ask, Interval interval) {
        return ask.estimand() instanceof Estimand.Probability ? interval.within(0, 1) : interval;
    }

    private static Answer answer(Ask ask, Accumulator sums, Estimate estimate, Interval interval) {
        return answer(ask, sums, estimate, interval, OptionalLong.empty());
    }

    private static Answer answer(Ask ask, Accumulator sums, Estimate estimate, Interval interval, OptionalLong hits) {
        return Answer.of(ask, estimate, interval, sums).with(hits);
    }
}
