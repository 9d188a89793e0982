package dev.leadline.chart;

import dev.leadline.interval.Interval;
import dev.leadline.model.Plan;
import dev.leadline.model.Question;
import dev.leadline.model.Tolerance;
import dev.leadline.scheme.Replicated;
import dev.leadline.trace.Trace;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;

/// What the *Error decay* picture shows of the first answer: how far its interval reaches on each lane, against the
/// number of draws. Of independent observations it shrinks as one over the root of their number, a slope of -1/2 on
/// logarithmic axes; evenly laid out points may do better, and then no slope is promised.
///
/// @param title of the question
/// @param quantity what is estimated, as `chance per year`
/// @param unit of the values; empty for none
/// @param level of confidence of the intervals
/// @param seed of the draws
/// @param lanes at most four, in the order of the question
public record ErrorDecay(
        String title,
        String quantity,
        String unit,
        double level,
        long seed,
        Optional<Tolerance> tolerance,
        List<Decay> lanes)
        implements Subject {
    private static final double PROMISED = -.5;

    public ErrorDecay {
        lanes = List.copyOf(lanes);
    }

    /// A lane.
    ///
    /// @param promised slope of the scheme, where it promises one
    public record Decay(Series series, OptionalDouble promised) {
        /// Slope of the later part, where there are marks enough.
        public OptionalDouble slope() {
            return Slope.fitted(series.points());
        }
    }

    /// @param plan whose lanes the traces are of, in order
    public static ErrorDecay of(Question question, Plan plan, List<Trace> traces) {
        var settling = Settling.of(question, plan, traces);
        var lanes = new ArrayList<Decay>();
        for (int i = 0; i < settling.lanes().size(); i++) {
            boolean replicated = plan.lanes().get(i).scheme().points() instanceof Replicated;
            lanes.add(new Decay(
                    settling.lanes().get(i), replicated ? OptionalDouble.empty() : OptionalDouble.of(PROMISED)));
        }
        return new ErrorDecay(
                settling.title(),
                settling.quantity(),
                settling.unit(),
                settling.level(),
                settling.seed(),
                settling.tolerance(),
                lanes);
    }

    /// How far the interval reaches; `NaN` where it has no such end or no length.
    static double reach(Point point) {
        double half = (point.high() - point.low()) / 2;
        double reach = Interval.lopsided(point.estimate(), point.low(), point.high())
                ? Math.max(point.high() - point.estimate(), point.estimate() - point.low())
                : half;
        return reach > 0 && Double.isFinite(reach) ? reach : Double.NaN;
    }

    /// The reach that meets the numerical tolerance, at the estimate of the lane whose interval is the shortest.
    OptionalDouble allowed() {
        return tolerance.stream()
                .flatMapToDouble(asked -> lanes.stream()
                        .flatMap(lane -> lane.series().last().stream())
                        .filter(point -> reach(point) > 0)
                        .min((p, q) -> Double.compare(reach(p), reach(q)))
                        .stream()
                        .mapToDouble(point -> asked.allowed(point.estimate())))
                .filter(width -> width > 0)
                .findFirst();
    }

    @Override
    public String caption() {
        return Caption.of(this);
    }
}
