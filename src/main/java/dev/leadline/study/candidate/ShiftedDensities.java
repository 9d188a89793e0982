package dev.leadline.study.candidate;

import dev.leadline.model.Project;
import java.util.List;
import java.util.stream.Collectors;

/// Inputs drawn from their own densities moved to where the outcome comes from, by a shift where that leaves no gap.
record ShiftedDensities() implements Candidate {
    @Override
    public List<Offer> offers(Project project, Gains gains) {
        List<Gain> rare = gains.all().stream().filter(Gain::isAside).toList();
        return Gains.lane(rare, Gain::moved).stream()
                .map(lane -> new Offer(
                        lane,
                        "the outcome comes from rare values of %s, which are drawn more often"
                                .formatted(rare.stream().map(Gain::name).collect(Collectors.joining(", ")))))
                .toList();
    }
}
