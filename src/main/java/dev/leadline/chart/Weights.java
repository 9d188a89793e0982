package dev.leadline.chart;

import dev.leadline.estimate.Outermost;
import dev.leadline.model.Plan;
import dev.leadline.model.Question;
import dev.leadline.trace.Trace;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/// What the *Weights* picture shows: the largest weights of lanes that draw from other densities, over the mean
/// weight, the largest first. Where all draws count the same each is 1; a few far above the rest carry the estimate.
///
/// @param title of the question
/// @param seed of the draws
/// @param lanes at most four, in the order of the question
public record Weights(String title, long seed, List<Weighed> lanes) implements Subject {
    public Weights {
        lanes = List.copyOf(lanes);
    }

    /// A lane.
    ///
    /// @param largest a point for each rank, its estimate the weight over the mean; none where every draw counts 1
    /// @param draws that were weighed
    /// @param effective how many draws of equal weights would do as well
    public record Weighed(String lane, String scheme, List<Point> largest, long draws, double effective) {
        public Weighed {
            largest = List.copyOf(largest);
        }

        static Weighed of(Trace trace) {
            return Optional.of(trace)
                    .filter(lane -> lane.scheme().isWeighted())
                    .flatMap(Trace::outermost)
                    .filter(seen -> seen.draws() > 0)
                    .map(seen -> of(trace, seen))
                    .orElse(new Weighed(trace.lane(), trace.scheme().inWords(), List.of(), 0, Double.NaN));
        }

        private static Weighed of(Trace trace, Outermost seen) {
            var weights = seen.weights();
            double[] greatest = weights.greatest();
            List<Point> points = new ArrayList<>();
            if (greatest.length > 0) {
                double mean = weights.size() / seen.draws();
                for (int i = 0; i < greatest.length && greatest[i] > 0; i++) {
                    points.add(new Point(i + 1, greatest[i] / mean, Double.NaN, Double.NaN));
                }
            }
            return new Weighed(trace.lane(), trace.scheme().inWords(), points, seen.draws(), weights.effective());
        }

        /// Part of all weight that the largest ones up to a rank have.
        double share(int rank) {
            return largest.subList(0, rank).stream()
                            .mapToDouble(Point::estimate)
                            .sum()
                    / draws;
        }
    }

    /// Whether there is something to see.
    public static boolean isSeen(List<Trace> traces) {
        return traces.stream()
                .anyMatch(trace ->
                        trace.scheme().isWeighted() && trace.outermost().isPresent());
    }

    public static Weights of(Question question, Plan plan, List<Trace> traces) {
        return new Weights(
                question.title(), plan.seed(), traces.stream().map(Weighed::of).toList());
    }

    @Override
    public String caption() {
        return Caption.of(this);
    }
}
