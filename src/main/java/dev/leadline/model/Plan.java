package dev.leadline.model;

import java.util.List;

/// How a question is to be run.
public record Plan(Stop stop, long seed, List<Lane> lanes) {
    public Plan {
        lanes = List.copyOf(lanes);
    }
}
