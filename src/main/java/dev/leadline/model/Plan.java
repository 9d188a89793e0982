package dev.leadline.model;

import dev.leadline.problem.Problem;
import dev.leadline.problem.Refusal;
import java.util.List;

/// How a question is to be run.
public record Plan(Stop stop, long seed, List<Lane> lanes) {
    public Plan {
        lanes = List.copyOf(lanes);
    }

    /// @throws Refusal where the draws are too few for an answer of a lane
    public Plan checked() {
        List<Problem> problems = lanes.stream()
                .flatMap(lane -> Plans.tooFew(lane, stop.draws()).stream())
                .toList();
        if (!problems.isEmpty()) {
            throw new Refusal(problems);
        }
        return this;
    }

    /// The lanes as they are run: what in their schemes follows from the number of draws is settled.
    public List<Lane> settled() {
        return lanes.stream().map(lane -> lane.within(stop.draws())).toList();
    }
}
