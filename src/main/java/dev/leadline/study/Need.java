package dev.leadline.study;

import dev.leadline.estimate.Estimand;
import dev.leadline.estimate.Logarithm;
import dev.leadline.interval.AnyTimeMean;
import dev.leadline.interval.DrawsNeeded;
import dev.leadline.interval.Guard;
import dev.leadline.interval.HitsRule;
import dev.leadline.interval.Ratio;
import dev.leadline.interval.Student;
import dev.leadline.interval.TwoStage;
import dev.leadline.model.Question;
import dev.leadline.model.Tolerance;
import dev.leadline.scheme.Replicated;
import dev.leadline.trace.Answer;
import dev.leadline.trace.Answers;
import dev.leadline.trace.Mark;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.function.DoubleUnaryOperator;

/// The draws after which a lane would meet the tolerance, for a number of draws that is fixed beforehand.
///
/// @param draws with their limits
/// @param seconds of computing on one thread; empty where draws were not timed
/// @param basis how it was found, in words
public record Need(String lane, Ratio draws, Optional<Ratio> seconds, String basis) {
    /// Degrees of freedom from which on the t quantile is the normal one.
    private static final double MANY = 1e12;

    private static final int FEWEST_ROUNDS = 3;
    private static final int LATEST_ROUNDS = 6;
    private static final double LEAST_DECAY = .1;

    /// Draws to the tolerance on the logarithmic scale, before they are rounded up.
    private record Found(Logarithm draws, DoubleUnaryOperator rounded, String basis) {}

    /// Empty where there is no tolerance, or where it cannot be said yet.
    ///
    /// @param perDraw seconds of a draw
    static Optional<Need> of(Question question, Contender lane, Optional<Logarithm> perDraw) {
        return found(question, lane).map(found -> of(question, lane, found, perDraw));
    }

    /// The logarithm of the draws, whose error says how well they are known.
    static Optional<Logarithm> logarithm(Question question, Contender lane) {
        return found(question, lane).map(Found::draws);
    }

    private static Optional<Found> found(Question question, Contender lane) {
        return question.tolerance()
                .filter(_ -> lane.spreads())
                .flatMap(tolerance -> lane.scheme().points() instanceof Replicated
                        ? rounds(question, tolerance, lane)
                        : spread(question, tolerance, lane).map(spread -> growing(question, spread)));
    }

    private static Need of(Question question, Contender lane, Found found, Optional<Logarithm> perDraw) {
        var draws = Ratio.of(found.draws(), question.confidence());
        var rounded = new Ratio(
                found.rounded().applyAsDouble(draws.low()),
                found.rounded().applyAsDouble(draws.value()),
                found.rounded().applyAsDouble(draws.high()));
        double more = StrictMath.log(rounded.value() / draws.value());
        return new Need(
                lane.lane().name(),
                rounded,
                perDraw.map(found.draws().moved(more)::plus).map(log -> Ratio.of(log, question.confidence())),
                found.basis());
    }

    /// The same where one looks until the any-time band is within the tolerance, or until there are hits enough.
    ///
    /// @param rule where hits are waited for
    static Optional<Need> anyTime(
            Question question, Contender lane, Optional<HitsRule> rule, Optional<Logarithm> perDraw) {
        if (rule.isPresent()) {
            return Optional.of(timed(
                    question,
                    lane,
                    DrawsNeeded.afresh(rule.get(), lane.hits(), Math.round(lane.draws()), question.confidence()),
                    perDraw,
                    String.format(
                            Locale.ROOT,
                            "as far as the hit number %,d",
                            rule.get().hits())));
        }
        boolean isOfSums = !(question.asks().getFirst().estimand() instanceof Estimand.Quantile);
        return question.tolerance()
                .filter(_ -> lane.grows() && lane.spreads() && isOfSums)
                .flatMap(tolerance -> spread(question, tolerance, lane))
                .map(spread -> {
                    double each = lane.scheme().drawsPerObservation();
                    var band = AnyTimeMean.tunedTo(
                            each == 1 ? AnyTimeMean.DRAWS : AnyTimeMean.OBSERVATIONS, Answers.level(question));
                    var needed = DrawsNeeded.of(
                                    n -> band.unit(n / each) / Math.sqrt(each),
                                    Ratio.of(spread, question.confidence()),
                                    1)
                            .atLeast(Guard.OF_DRAWS.draws());
                    return timed(
                            question,
                            lane,
                            needed,
                            perDraw,
                            String.format(
                                    Locale.ROOT,
                                    "the band is %.2f times as wide there as the interval for a fixed number",
                                    band.overFixed(needed.value() / each)));
                });
    }

    /// The same of two stages, the first of which enters no mean.
    static Optional<Need> twoStage(Question question, Contender lane, TwoStage rule, Optional<Logarithm> perDraw) {
        return question.tolerance()
                .filter(_ -> lane.grows() && lane.spreads())
                .flatMap(tolerance -> spread(question, tolerance, lane))
                .map(spread -> {
                    double each = lane.scheme().drawsPerObservation();
                    var deviation = Ratio.of(spread.moved(-StrictMath.log(each) / 2), question.confidence());
                    return timed(
                            question,
                            lane,
                            new DrawsNeeded(
                                    each * observations(rule, deviation.low()),
                                    each * observations(rule, deviation.value()),
                                    each * observations(rule, deviation.high())),
                            perDraw,
                            String.format(Locale.ROOT, "with %,d observations of a first stage", rule.first()));
                });
    }

    private static double observations(TwoStage rule, double deviation) {
        return rule.second(deviation, 1)
                .map(second -> (double) rule.first() + second)
                .orElse(Double.POSITIVE_INFINITY);
    }

    private static Need timed(
            Question question, Contender lane, DrawsNeeded needed, Optional<Logarithm> perDraw, String basis) {
        var draws = new Ratio(needed.low(), needed.value(), needed.high());
        return new Need(
                lane.lane().name(),
                draws,
                perDraw.map(log -> draws.times(Ratio.of(log, question.confidence()))),
                basis);
    }

    /// The standard deviation of a draw over the half-width that the tolerance allows; the limits count that both are
    /// estimated.
    private static Optional<Logarithm> spread(Question question, Tolerance tolerance, Contender lane) {
        return question.asks().getFirst().estimand() instanceof Estimand.Quantile
                ? ofQuantile(question, tolerance, lane)
                : lane.jackknife(sums -> lane.logOfVariance(sums) / 2
                        - StrictMath.log(tolerance.allowed(lane.estimate(sums).value())));
    }

    /// From the width of the interval, which spans so many outcomes in their order that are spread alike there: a sum
    /// of
    /// as many gaps, each with a standard deviation of its size.
    private static Optional<Logarithm> ofQuantile(Question question, Tolerance tolerance, Contender lane) {
        Answer answer = lane.trace().last().orElseThrow().answers().getFirst();
        double q = ((Estimand.Quantile) answer.estimand()).at();
        double z = Student.quantile(MANY, answer.interval().level());
        double outcomes = 2 * z * q * (1 - q) / lane.estimate().standardError();
        double half = answer.interval().halfWidth();
        double allowed = tolerance.allowed(answer.estimate());
        return half > 0 && allowed > 0 && outcomes > 1
                ? Optional.of(new Logarithm(
                        StrictMath.log(half / z * Math.sqrt(lane.draws()) / allowed), 1 / outcomes, outcomes))
                : Optional.empty();
    }

    /// `(z s / h)²` with the half-width h that the tolerance allows.
    private static Found growing(Question question, Logarithm spread) {
        double z = Student.quantile(MANY, Answers.level(question));
        return new Found(
                spread.times(2).moved(2 * StrictMath.log(z)), Math::ceil, "error falls with the root of the draws");
    }

    /// Where the straight line through the logarithms of error and draws, fitted to the latest rounds, comes to the
    /// error that the tolerance allows.
    private static Optional<Found> rounds(Question question, Tolerance tolerance, Contender lane) {
        List<Mark> marks = lane.trace().marks().stream()
                .filter(mark -> mark.answers().getFirst().standardError() > 0)
                .toList();
        List<Mark> latest = marks.subList(Math.max(0, marks.size() - LATEST_ROUNDS), marks.size());
        Optional<Logarithm> variance = lane.variance();
        if (latest.size() < FEWEST_ROUNDS || variance.isEmpty()) {
            return Optional.empty();
        }
        double x = 0;
        double y = 0;
        for (Mark mark : latest) {
            x += StrictMath.log(mark.draws()) / latest.size();
            y += StrictMath.log(mark.answers().getFirst().standardError()) / latest.size();
        }
        double xx = 0;
        double xy = 0;
        for (Mark mark : latest) {
            double dx = StrictMath.log(mark.draws()) - x;
            xx += dx * dx;
            xy += dx * (StrictMath.log(mark.answers().getFirst().standardError()) - y);
        }
        double decay = -xy / xx;
        var estimate = lane.estimate();
        double allowed =
                tolerance.allowed(estimate.value()) / Student.quantile(estimate.degrees(), Answers.level(question));
        if (!(decay > LEAST_DECAY && allowed > 0)) {
            return Optional.empty();
        }
        double steps = (y - StrictMath.log(allowed)) / decay;
        // Half a logarithm of the variance is one of the error; rounds share points, so their mean is no more precise.
        double ofError = variance.get().variance() / 4;
        double ofSteps = (ofError + steps * steps * ofError / xx) / (decay * decay);
        int replicates = lane.groups().size();
        return Optional.of(new Found(
                new Logarithm(x + steps, ofSteps, variance.get().degrees()),
                draws -> wholeRounds(draws, replicates),
                String.format(
                        Locale.ROOT,
                        "error falls with the power %.2f of the draws, as fitted to the latest %d rounds",
                        decay,
                        latest.size())));
    }

    private static double wholeRounds(double draws, int replicates) {
        return replicates
                * Math.scalb(1, (int) Math.max(0, Math.ceil(StrictMath.log(draws / replicates) / StrictMath.log(2))));
    }
}
