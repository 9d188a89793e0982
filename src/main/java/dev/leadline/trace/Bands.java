package dev.leadline.trace;

import dev.leadline.estimate.Accumulator;
import dev.leadline.estimate.Estimand;
import dev.leadline.estimate.Estimate;
import dev.leadline.estimate.Logarithm;
import dev.leadline.estimate.Outcomes;
import dev.leadline.estimate.Outcomes.Place;
import dev.leadline.interval.AnyTimeBounded;
import dev.leadline.interval.AnyTimeChance;
import dev.leadline.interval.AnyTimeMean;
import dev.leadline.interval.AnyTimeQuantile;
import dev.leadline.interval.BoundedSums;
import dev.leadline.interval.Bounds;
import dev.leadline.interval.Interval;
import dev.leadline.interval.Looks;
import dev.leadline.interval.RunningIntersection;
import dev.leadline.interval.ToRounding;
import dev.leadline.model.Components;
import dev.leadline.model.ObservedBounds;
import dev.leadline.model.Question;
import dev.leadline.model.Stop;
import dev.leadline.model.Tolerance;
import dev.leadline.scheme.Growing;
import dev.leadline.scheme.Repetitions;
import dev.leadline.scheme.Replicated;
import dev.leadline.scheme.Scheme;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.OptionalInt;
import java.util.stream.IntStream;

/// The any-time bands of a lane, mark after mark. Confined to the run that feeds it.
///
/// - Observations that follow one another: of a chance among plain draws the exact mixture, of a mean whose
///   outcomes have bounds the empirical Bernstein band, of a quantile of plain draws ranks; of all else the
///   band that holds in the limit. Exact ones of chances and means keep what they have said before; ranks do
///   not, or the band would depend on how many outcomes could be kept.
/// - Replicated points, whose mean sharpens from one doubling to the next, are looked at from 128 points each
///   on, and splitting after 10, 20, 40 … repetitions, each look at a level of its own. In between, the
///   latest look's band stands.
public final class Bands {
    /// Points of a replicate at the first look.
    private static final long FIRST_POINTS = 128;

    /// Repetitions at the first look.
    private static final long FIRST_REPETITIONS = 10;

    private final Question question;
    private final Scheme scheme;
    private final double level;
    private final Optional<Looks> looks;
    private final List<Optional<BoundedSums>> bounded;
    private final List<Optional<RunningIntersection>> kept;
    private final List<Optional<Interval>> latest;
    private int look;

    /// @param budget draws at most, which say how many looks there will be; [Stop#MOST_DRAWS] for no budget
    public Bands(Question question, Scheme scheme, long budget) {
        this.question = question;
        this.scheme = scheme;
        this.level = question.level();
        this.looks = looks(budget);
        int asks = question.asks().size();
        this.bounded = new ArrayList<>();
        this.kept = new ArrayList<>();
        this.latest = new ArrayList<>();
        for (int a = 0; a < asks; a++) {
            bounded.add(bounds(a).map(given -> BoundedSums.within(given.low(), given.high())));
            kept.add(Optional.empty());
            latest.add(Optional.empty());
        }
    }

    private Optional<Looks> looks(long budget) {
        return switch (scheme.points()) {
            case Growing _ -> Optional.empty();
            case Replicated points ->
                Optional.of(
                        budget < Stop.MOST_DRAWS
                                ? Looks.atDoublings(
                                        FIRST_POINTS,
                                        Math.min(budget / points.replicates(), points.mostPoints()),
                                        level)
                                : Looks.unplanned(level));
            case Repetitions repetitions ->
                Optional.of(
                        repetitions.most().isPresent()
                                ? Looks.atDoublings(
                                        FIRST_REPETITIONS, repetitions.most().getAsInt(), level)
                                : Looks.unplanned(level));
        };
    }

    /// Of the observations of a mean, where the question states some.
    private Optional<Bounds> bounds(int ask) {
        boolean isGrowing = scheme.points() instanceof Growing
                && !scheme.isWeighted()
                && scheme.controls().isEmpty();
        return question.interval()
                .bounds()
                .filter(_ -> isGrowing)
                .flatMap(stated ->
                        ObservedBounds.of(stated, question.asks().get(ask).estimand(), question.inputs()));
    }

    /// Takes in the sums of the next item of work.
    public void add(Accumulator item) {
        for (int a = 0; a < bounded.size(); a++) {
            int k = Components.first(question.asks(), a);
            bounded.set(a, bounded.get(a).map(sums -> sums.and(item, k)));
        }
    }

    /// Whether a look is due that must not be passed over.
    ///
    /// @param observations so far
    public boolean isDue(long observations) {
        return scheme.points() instanceof Repetitions
                && observations >= FIRST_REPETITIONS << look
                && isPlanned(look + 1);
    }

    private boolean isPlanned(int next) {
        OptionalInt planned = looks.orElseThrow().planned();
        return planned.isEmpty() || next <= planned.getAsInt();
    }

    /// The answers with their bands.
    ///
    /// @param sums,blocks,outcomes as of [Answers#of]
    /// @param draws evaluations so far
    public List<Answer> around(
            List<Answer> answers, Accumulator sums, List<Accumulator> blocks, List<Outcomes> outcomes, long draws) {
        boolean isLook = looks.isPresent() && goTo(sums.count(), draws);
        return IntStream.range(0, answers.size())
                .mapToObj(a -> {
                    var shown = new Shown(question, scheme, sums, blocks, outcomes, a, level);
                    if (looks.isEmpty()) {
                        return answers.get(a).within(growing(shown, answers.get(a)));
                    }
                    if (isLook) {
                        latest.set(
                                a,
                                Optional.of(looks.get()
                                        .at(
                                                look,
                                                each -> Answers.of(shown.at(each))
                                                        .interval())));
                    }
                    return latest.get(a).map(answers.get(a)::within).orElse(answers.get(a));
                })
                .toList();
    }

    /// Whether there is a look here; `look` is then its number.
    private boolean goTo(long observations, long draws) {
        return switch (scheme.points()) {
            case Replicated points -> {
                long each = draws / points.replicates();
                look = each < FIRST_POINTS ? 0 : 64 - Long.numberOfLeadingZeros(each / FIRST_POINTS);
                yield look > 0 && isPlanned(look);
            }
            case Repetitions _ -> {
                boolean due = isDue(observations);
                look += due ? 1 : 0;
                yield due || look > 0 && observations == FIRST_REPETITIONS << (look - 1);
            }
            case Growing _ -> false;
        };
    }

    private Interval growing(Shown shown, Answer answer) {
        if (answer.interval().kind().equals(ToRounding.KIND)) {
            return answer.interval();
        }
        boolean isRanked = scheme.isPlain() && answer.estimand() instanceof Estimand.Quantile;
        Optional<Interval> exact = answer.hits().isPresent() && scheme.isPlain()
                ? Optional.of(chance(shown.index())
                        .of(
                                answer.hits().getAsLong(),
                                shown.sums().count(),
                                shown.sums().excluded()))
                : bounded.get(shown.index())
                        .map(sums -> AnyTimeBounded.tunedTo(tuned(scheme), sums.least(), sums.most(), level)
                                .of(sums))
                        .or(() -> isRanked
                                ? shown.outcomes().map(seen -> ranked(seen, (Estimand.Quantile) answer.estimand()))
                                : Optional.empty());
        if (exact.isEmpty()) {
            return inTheLimit(shown, answer.estimate());
        }
        if (isRanked) {
            return exact.get();
        }
        var so = kept.get(shown.index())
                .map(before -> before.and(exact.get()))
                .orElseGet(() -> new RunningIntersection(exact.get()));
        kept.set(shown.index(), Optional.of(so));
        return so.interval();
    }

    /// Of a chance that is asked for first with an absolute tolerance tight where it stops.
    private AnyTimeChance chance(int ask) {
        return question.tolerance()
                .filter(_ -> ask == 0)
                .map(Tolerance::absolute)
                .filter(OptionalDouble::isPresent)
                .map(absolute -> AnyTimeChance.forTolerance(absolute.getAsDouble(), level))
                .orElseGet(() -> AnyTimeChance.tunedTo(AnyTimeMean.DRAWS, level));
    }

    /// Observations at which the band is tightest, where they follow one another.
    public static double tuned(Scheme scheme) {
        return scheme.drawsPerObservation() == 1 ? AnyTimeMean.DRAWS : AnyTimeMean.OBSERVATIONS;
    }

    /// Where the ranks of the limits lie; limits that only a further pass can find are the farthest they may
    /// be.
    private Interval ranked(Outcomes outcomes, Estimand.Quantile quantile) {
        var band = AnyTimeQuantile.tunedTo(AnyTimeMean.DRAWS, quantile.at(), level);
        long n = outcomes.draws();
        long lower = n == 0 ? 0 : band.lowerRank(n);
        long upper = n == 0 ? 1 : band.upperRank(n);
        double low = lower > 0 ? finite(outcomes.ranked(lower).low()) : Double.NaN;
        double high = upper <= n ? finite(outcomes.ranked(upper).high()) : Double.NaN;
        return band.of(low, high, n);
    }

    private static double finite(double limit) {
        return Double.isFinite(limit) ? limit : Double.NaN;
    }

    private Interval inTheLimit(Shown shown, double estimate) {
        var band = AnyTimeMean.tunedTo(tuned(scheme), level);
        long n = shown.sums().count();
        return switch (shown.ask().estimand()) {
            case Estimand.Mean _, Estimand.Integral _ -> band.of(MeanAnswers.answered(shown), n);
            case Estimand.Probability _ ->
                band.of(MeanAnswers.answered(shown), n).within(0, 1);
            case Estimand.Ratio _ -> band.of(MomentAnswers.ratioOfMeans(shown).estimate(), n);
            case Estimand.StandardDeviation _ -> deviation(band, MomentAnswers.logarithm(shown), n);
            case Estimand.Quantile(double at) -> quantile(band, shown, at, n);
            case Estimand.TailMean(double at) -> tailMean(band, shown, estimate, at, n);
            case Estimand.Distribution _ -> band.of(OrderAnswers.centred(shown), n);
        };
    }

    private static Interval deviation(AnyTimeMean band, Logarithm logarithm, long n) {
        var log = band.of(new Estimate(logarithm.value(), logarithm.standardError(), Math.max(0, n - 1)), n);
        return new Interval(
                StrictMath.exp(log.low()),
                StrictMath.exp(log.high()),
                log.level(),
                log.kind(),
                log.assumption(),
                log.note());
    }

    /// From the band of the share of outcomes up to the quantile.
    private static Interval quantile(AnyTimeMean band, Shown shown, double at, long n) {
        Estimate share = OrderAnswers.share(shown, at);
        var of = band.of(new Estimate(at, share.standardError(), share.degrees()), n);
        var outcomes = shown.outcomes().filter(seen -> seen.draws() > 0);
        boolean hasLow = of.low() > 0 && outcomes.isPresent();
        boolean hasHigh = of.high() < 1 && outcomes.isPresent();
        double total = outcomes.map(seen -> OrderAnswers.total(shown, seen)).orElse(Double.NaN);
        Place none = new Place(Double.NaN, Double.NaN);
        Place low = hasLow ? outcomes.get().quantile(of.low(), total) : none;
        Place high = hasHigh ? outcomes.get().quantile(of.high(), total) : none;
        return new Interval(
                finite(low.low()),
                finite(high.high()),
                of.level(),
                of.kind(),
                of.assumption(),
                hasLow && hasHigh
                        ? of.note()
                        : of.note()
                                .or(() -> Optional.of("too few draws for %s limit of this band"
                                        .formatted(hasLow ? "the upper" : hasHigh ? "the lower" : "either"))));
    }

    private static Interval tailMean(AnyTimeMean band, Shown shown, double estimate, double at, long n) {
        var error = OrderAnswers.beyond(shown, at);
        return band.of(new Estimate(estimate, error.standardError(), error.degrees()), n);
    }
}
