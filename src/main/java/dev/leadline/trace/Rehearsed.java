package dev.leadline.trace;

import dev.leadline.interval.ClopperPearson;
import dev.leadline.interval.Interval;
import dev.leadline.model.Ask;
import java.util.Comparator;
import java.util.List;
import java.util.function.Predicate;
import java.util.function.ToDoubleFunction;
import java.util.stream.DoubleStream;

/// One answer of a set-up that was repeated: how often its interval holds the value sought, and how its
/// estimates stray from it. Every number has a Monte Carlo standard error (mcse), since repetitions are a
/// sample too.
///
/// Source of the formulas: Morris, White and Crowther (2019), Statistics in Medicine 38, 2074-2102, table 6.
///
/// @param level of each interval
/// @param repetitions in the order of their addresses
public record Rehearsed(Ask ask, double level, Sought sought, List<Repetition> repetitions) {
    /// Beyond what this interval of the rate holds, the rate is another than the level.
    private static final double SURE = .99;

    /// A reference value that may be off by a larger part of the half-width makes misses of its own.
    private static final double DOUBTFUL = .1;

    public Rehearsed {
        repetitions = List.copyOf(repetitions);
    }

    /// What the rate says beside the level.
    public enum Verdict {
        HOLDS,
        FALLS_SHORT,
        MORE_THAN_STATED,
        /// There is no interval to judge.
        NOTHING
    }

    /// Repetitions that have an interval.
    public int bounded() {
        return count(Repetition::isBounded);
    }

    /// Those that have none, as where every draw gave the same value.
    public int unbounded() {
        return repetitions.size() - bounded();
    }

    /// Intervals that lie below the value.
    public int missedLow() {
        return count(one -> one.isBelow(sought.value()));
    }

    /// Intervals that lie above the value.
    public int missedHigh() {
        return count(one -> one.isAbove(sought.value()));
    }

    /// Intervals that hold the value.
    public int held() {
        return bounded() - missedLow() - missedHigh();
    }

    public boolean holds(Repetition one) {
        return one.isBounded() && !one.isBelow(sought.value()) && !one.isAbove(sought.value());
    }

    /// Part of the intervals that hold the value; `NaN` where there is no interval.
    public double rate() {
        return (double) held() / bounded();
    }

    /// Of the rate.
    public double mcse() {
        return mcse(rate(), bounded());
    }

    /// Of a rate seen in so many repetitions.
    public static double mcse(double rate, int repetitions) {
        return Math.sqrt(rate * (1 - rate) / repetitions);
    }

    /// Repetitions with which the rate of an interval of this level has the standard error wanted.
    public static long repetitionsFor(double level, double mcse) {
        double wanted = level * (1 - level) / (mcse * mcse);
        return (long) Math.ceil(wanted * (1 - 1e-12));
    }

    /// The exact interval of the rate.
    public Interval rateInterval(double confidence) {
        return ClopperPearson.of(held(), bounded(), 0, confidence);
    }

    public Verdict verdict() {
        if (bounded() == 0) {
            return Verdict.NOTHING;
        }
        var likely = rateInterval(SURE);
        return likely.high() < level
                ? Verdict.FALLS_SHORT
                : likely.low() > level ? Verdict.MORE_THAN_STATED : Verdict.HOLDS;
    }

    /// How far the estimates lie from the value, on average.
    public double bias() {
        return meanEstimate() - sought.value();
    }

    /// Of the bias; the error of the value sought is in it.
    public double biasMcse() {
        double ofMean = empiricalError() / Math.sqrt(estimates().count());
        return Math.sqrt(ofMean * ofMean + sought.error() * sought.error());
    }

    /// The standard deviation of the estimates, which is their standard error as it is.
    public double empiricalError() {
        return deviation(estimates().toArray());
    }

    public double empiricalMcse() {
        return empiricalMcse(empiricalError(), estimates().count());
    }

    /// Of an empirical standard error seen in so many repetitions.
    public static double empiricalMcse(double error, long repetitions) {
        return error / Math.sqrt(2.0 * (repetitions - 1));
    }

    /// The standard error as the repetitions state it: the root of the mean of its squares. `NaN` where some
    /// state none, as a chance without a hit.
    public double reportedError() {
        return Math.sqrt(mean(squaredErrors()));
    }

    public double reportedMcse() {
        double[] squares = squaredErrors();
        return deviation(squares) / Math.sqrt(squares.length) / (2 * reportedError());
    }

    /// Of the intervals with both limits; `NaN` where there is none.
    public double meanHalfWidth() {
        return mean(finite(one -> one.interval().halfWidth()).toArray());
    }

    /// Whether the value sought is so uncertain, beside the intervals, that it makes misses of its own.
    public boolean isDoubtful() {
        return sought.error() > DOUBTFUL * meanHalfWidth();
    }

    /// Word of the interval's kind; empty before the first repetition.
    public String kind() {
        return repetitions.isEmpty() ? "" : repetitions.getLast().interval().kind();
    }

    /// The intervals ordered by their centres, for a picture; without those that have none.
    public List<Repetition> ordered() {
        return repetitions.stream()
                .filter(one -> one.isBounded() && Double.isFinite(one.centre()))
                .sorted(Comparator.comparingDouble(Repetition::centre))
                .toList();
    }

    private int count(Predicate<Repetition> which) {
        return (int) repetitions.stream().filter(which).count();
    }

    private double meanEstimate() {
        return mean(estimates().toArray());
    }

    private DoubleStream estimates() {
        return finite(Repetition::estimate);
    }

    private DoubleStream finite(ToDoubleFunction<Repetition> of) {
        return repetitions.stream().mapToDouble(of).filter(Double::isFinite);
    }

    private double[] squaredErrors() {
        return repetitions.stream()
                .mapToDouble(Repetition::standardError)
                .map(error -> error * error)
                .toArray();
    }

    private static double mean(double[] x) {
        double sum = 0;
        for (double value : x) {
            sum += value;
        }
        return sum / x.length;
    }

    private static double deviation(double[] x) {
        double mean = mean(x);
        double squares = 0;
        for (double value : x) {
            squares += (value - mean) * (value - mean);
        }
        return x.length < 2 ? Double.NaN : Math.sqrt(squares / (x.length - 1));
    }
}
