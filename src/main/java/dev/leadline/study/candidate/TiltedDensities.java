package dev.leadline.study.candidate;

import dev.leadline.model.Project;
import java.util.List;
import java.util.stream.Collectors;

/// Inputs drawn from their own densities times an exponential, with means where the outcome comes from.
record TiltedDensities() implements Candidate {
    @Override
    public List<Offer> offers(Project project, Gains gains) {
        List<Gain> rare = gains.all().stream().filter(Gain::isAside).toList();
        return Gains.lane(rare, Gain::tilted).stream()
                .map(lane -> new Offer(
                        lane,
                        "the outcome comes from rare values of %s, which are drawn more often"
                                .formatted(rare.stream().map(Gain::name).collect(Collectors.joining(", ")))))
                .toList();
    }
}
