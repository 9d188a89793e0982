package dev.leadline.study;

import dev.leadline.estimate.Accumulator;
import dev.leadline.estimate.Estimand;
import dev.leadline.estimate.Estimate;
import dev.leadline.estimate.Jackknife;
import dev.leadline.estimate.Logarithm;
import dev.leadline.model.Lane;
import dev.leadline.model.Question;
import dev.leadline.scheme.Growing;
import dev.leadline.scheme.Proposal;
import dev.leadline.scheme.Scheme;
import dev.leadline.trace.Answers;
import dev.leadline.trace.Spread;
import dev.leadline.trace.Trace;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import java.util.function.ToDoubleFunction;

/// A lane as another is compared with it: the variance of its first answer times the draws made for it.
final class Contender {
    /// Groups of draws, counted by their sizes, below which their spread says nothing.
    private static final double FEWEST_DEGREES = 4;

    /// A spread below this part of the mean is that of rounding.
    private static final double ROUNDING = 4e-15;

    private final Question question;
    private final Lane lane;
    private final Trace trace;
    private final List<Accumulator> groups;
    private final Accumulator total;
    private final double drawsPerObservation;

    /// @param trace one with a mark
    Contender(Question question, Lane lane, Trace trace) {
        this.question = question;
        this.lane = lane;
        this.trace = trace;
        this.groups = trace.blocks();
        this.total = trace.total();
        this.drawsPerObservation = grows()
                ? lane.scheme().drawsPerObservation()
                : (double) trace.last().orElseThrow().draws() / attempted(total);
    }

    Lane lane() {
        return lane;
    }

    Trace trace() {
        return trace;
    }

    Scheme scheme() {
        return lane.scheme();
    }

    boolean grows() {
        return scheme().points() instanceof Growing;
    }

    List<Accumulator> groups() {
        return groups;
    }

    double draws() {
        return draws(total);
    }

    private double draws(Accumulator sums) {
        return attempted(sums) * drawsPerObservation;
    }

    private static double attempted(Accumulator sums) {
        return sums.count() + sums.excluded();
    }

    /// Of an event, as far as every observation was one.
    long hits() {
        return total.hits(0).orElse(Long.MAX_VALUE);
    }

    /// Draws of each group.
    double[] sizes() {
        return groups.stream().mapToDouble(this::draws).toArray();
    }

    Estimate estimate() {
        return estimate(total);
    }

    Estimate estimate(Accumulator sums) {
        var seen = Answers.estimate(question, scheme(), sums, 0);
        return new Estimate(origin() + seen.value(), seen.standardError(), seen.degrees());
    }

    /// From where sums of a tail mean and of a distribution are counted: it belongs to their value.
    private double origin() {
        return trace.outcomes().stream()
                .findFirst()
                .map(Spread::landmark)
                .map(landmark -> switch (question.asks().getFirst().estimand()) {
                    case Estimand.TailMean _ -> landmark.level();
                    case Estimand.Distribution _ -> landmark.centre();
                    case Estimand.Mean _,
                            Estimand.Integral _,
                            Estimand.Probability _,
                            Estimand.Ratio _,
                            Estimand.StandardDeviation _,
                            Estimand.Quantile _ -> 0.0;
                })
                .orElse(0.0);
    }

    /// Whether observations differ, by more than rounding, so that there is a variance to compare.
    boolean spreads() {
        Estimate estimate = estimate();
        double spread = estimate.standardError() * Math.sqrt(total.count());
        return spread > ROUNDING * Math.abs(estimate.value()) && spread < Double.POSITIVE_INFINITY;
    }

    /// The logarithm of the variance per draw of some of the observations.
    double logOfVariance(Accumulator sums) {
        return 2 * StrictMath.log(estimate(sums).standardError()) + StrictMath.log(draws(sums));
    }

    double logOfVariance() {
        return logOfVariance(total);
    }

    /// The logarithm of the variance per draw; empty where it cannot be judged yet.
    Optional<Logarithm> variance() {
        if (!spreads()) {
            return Optional.empty();
        }
        Optional<Logarithm> found = isMean() && total.count() > groups.size()
                ? Optional.of(Jackknife.ofVariance(total, 0))
                        .map(ofOne -> new Logarithm(logOfVariance(), ofOne.variance(), ofOne.degrees()))
                : jackknife(this::logOfVariance);
        return found.filter(log -> Double.isFinite(log.variance()) && log.degrees() >= FEWEST_DEGREES);
    }

    /// Whether the answer is a mean of observations, and not a function of several.
    private boolean isMean() {
        return grows()
                && scheme().controls().isEmpty()
                && scheme().drawFrom().filter(Proposal::selfNormalised).isEmpty();
    }

    /// The statistic with its variance from leaving out groups; empty where there are too few of them.
    Optional<Logarithm> jackknife(ToDoubleFunction<Accumulator> statistic) {
        if (groups.size() < 2) {
            return Optional.empty();
        }
        double[] without =
                Jackknife.without(groups).stream().mapToDouble(statistic).toArray();
        return judged(sizes(), statistic.applyAsDouble(total), without);
    }

    /// The ratio of variances where both lanes drew the same random numbers: the same groups are left out of both.
    static Optional<Logarithm> paired(Contender one, Contender other) {
        double[] without = minus(one.logsWithout(), other.logsWithout());
        return one.spreads() && other.spreads()
                ? judged(one.sizes(), one.logOfVariance() - other.logOfVariance(), without)
                : Optional.empty();
    }

    private double[] logsWithout() {
        return Jackknife.without(groups).stream()
                .mapToDouble(this::logOfVariance)
                .toArray();
    }

    private static double[] minus(double[] a, double[] b) {
        double[] difference = a.clone();
        for (int i = 0; i < a.length; i++) {
            difference[i] -= b[i];
        }
        return difference;
    }

    private static Optional<Logarithm> judged(double[] sizes, double whole, double[] without) {
        if (!Double.isFinite(whole) || !Arrays.stream(without).allMatch(Double::isFinite)) {
            return Optional.empty();
        }
        return Optional.of(Jackknife.of(sizes, whole, without)).filter(log -> log.degrees() >= FEWEST_DEGREES);
    }

    /// Whether the other lane has drawn the same random numbers in the same groups of draws.
    boolean isPairedWith(Contender other) {
        if (!lane.shares() || !other.lane.shares() || grows() != other.grows()) {
            return false;
        }
        double[] here = sizes();
        double[] there = other.sizes();
        if (here.length != there.length || here.length < 2) {
            return false;
        }
        // The last may be under way; rounding up to whole observations at most doubles an item.
        for (int j = 0; j < here.length - 1; j++) {
            if (!(here[j] <= 2 * there[j] && there[j] <= 2 * here[j])) {
                return false;
            }
        }
        return true;
    }
}
