package dev.leadline.chart;

import dev.leadline.model.Plan;
import dev.leadline.model.Question;
import dev.leadline.model.Tolerance;
import dev.leadline.reference.ReferenceValue;
import dev.leadline.reference.ReferenceValue.Known;
import dev.leadline.trace.Answers;
import dev.leadline.trace.Trace;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;

/// What the *Settling* picture shows of one answer: the running estimate of each lane with its interval, the reference
/// value and the strip of the numerical tolerance. Plain data, immutable.
///
/// @param title of the question
/// @param quantity what is estimated, as `chance per year`
/// @param unit of the values; empty for none
/// @param level of confidence of the intervals
/// @param seed of the draws
/// @param lanes at most four, in the order of the question
public record Settling(
        String title,
        String quantity,
        String unit,
        double level,
        long seed,
        Optional<Known> reference,
        Optional<Tolerance> tolerance,
        List<Series> lanes)
        implements Subject {

    public Settling {
        lanes = List.copyOf(lanes);
        if (lanes.size() > LaneLook.values().length) {
            throw new IllegalArgumentException(lanes.size() + " lanes in a picture for four");
        }
    }

    /// The first answer, which reference and tolerance speak of.
    public static Settling of(Question question, Plan plan, List<Trace> traces) {
        return of(question, plan, traces, 0);
    }

    /// @param answer index among the things asked
    public static Settling of(Question question, Plan plan, List<Trace> traces, int answer) {
        var ask = question.asks().get(answer);
        boolean first = answer == 0;
        return new Settling(
                question.title(),
                ask.name(),
                ask.unit(),
                Answers.level(question),
                plan.seed(),
                first ? reference(question, traces) : Optional.empty(),
                first ? question.tolerance() : Optional.empty(),
                traces.stream().map(trace -> Series.of(trace, answer)).toList());
    }

    /// What a run knows of it, or what is known before.
    static Optional<Known> reference(Question question, List<Trace> traces) {
        return traces.stream()
                .findFirst()
                .flatMap(Trace::reference)
                .or(() -> ReferenceValue.of(question))
                .flatMap(ReferenceValue::known);
    }

    /// The strip of the numerical tolerance: latest estimate ± the half-width that the tolerance allows there, of
    /// the lane whose latest interval is the shortest, since its answer is the one to sign. That lane has met the
    /// tolerance once its band is no longer than the strip is high. Empty without a tolerance or an estimate, or
    /// where the tolerance is relative and the estimate 0.
    public Optional<Range> strip() {
        return tolerance.flatMap(asked ->
                sharpest().flatMap(point -> around(point.estimate(), asked.allowed(point.estimate()))));
    }

    private Optional<Point> sharpest() {
        return lanes.stream()
                .flatMap(lane -> lane.last().stream())
                .filter(point -> Double.isFinite(point.estimate()))
                .min(Comparator.comparingDouble(point -> point.high() - point.low()));
    }

    private static Optional<Range> around(double estimate, double width) {
        double low = estimate - width;
        double high = estimate + width;
        return low < high && Double.isFinite(low) && Double.isFinite(high)
                ? Optional.of(new Range(low, high))
                : Optional.empty();
    }

    @Override
    public String caption() {
        return Caption.of(this);
    }

    /// The values behind the picture, a row for each mark of each lane.
    public List<Row> rows() {
        return lanes.stream()
                .flatMap(lane -> lane.points().stream().map(point -> new Row(lane.lane(), point)))
                .toList();
    }

    /// A row of the table behind the picture.
    public record Row(String lane, Point point) {}
}
