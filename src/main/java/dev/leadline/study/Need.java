package dev.leadline.study;

import dev.leadline.estimate.Logarithm;
import dev.leadline.interval.Ratio;
import dev.leadline.interval.Student;
import dev.leadline.model.Question;
import dev.leadline.model.Tolerance;
import dev.leadline.scheme.Replicated;
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
        return question.tolerance()
                .filter(_ -> lane.spreads())
                .flatMap(tolerance -> lane.scheme().points() instanceof Replicated
                        ? rounds(question, tolerance, lane)
                        : growing(question, tolerance, lane))
                .map(found -> of(question, lane, found, perDraw));
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

    /// `(z s / h)²` with the half-width h that the tolerance allows; the limits count that s and h are estimated.
    private static Optional<Found> growing(Question question, Tolerance tolerance, Contender lane) {
        double z = Student.quantile(MANY, Answers.level(question));
        return lane.jackknife(sums -> lane.logOfVariance(sums)
                        - 2
                                * StrictMath.log(
                                        tolerance.allowed(lane.estimate(sums).value())))
                .map(log -> new Found(
                        log.moved(2 * StrictMath.log(z)), Math::ceil, "error falls with the root of the draws"));
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
