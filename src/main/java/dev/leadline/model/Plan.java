package dev.leadline.model;

import java.util.List;

/// How a question is to be run.
public record Plan(Stop stop, long seed, List<Lane> lanes) {
    public Plan {
        lanes = List.copyOf(lanes);
    }

    /// The lanes as they are run: what in their schemes follows from the number of draws is settled.
    public List<Lane> settled() {
        return lanes.stream().map(lane -> lane.within(stop.draws())).toList();
    }
}
