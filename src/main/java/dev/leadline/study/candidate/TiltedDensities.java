package dev.leadline.study.candidate;

import dev.leadline.model.LaneDraft.Other;
import dev.leadline.model.Project;
import java.util.List;
import java.util.stream.Collectors;

/// Inputs drawn from their own densities times an exponential: of a normal density a shift, of others one that stays
/// where they are.
record TiltedDensities() implements Candidate {
    @Override
    public List<Offer> offers(Project project, Gains gains) {
        List<Gain> tilted = gains.all().stream().filter(Gain::isAside).toList();
        return tilted.isEmpty()
                ? List.of()
                : List.of(new Offer(
                        Gains.lane(
                                tilted,
                                gain -> new Other.Tilt(Digits.three(gain.away() / (gain.spread() * gain.spread())))),
                        "the outcome comes from rare values of %s, which are drawn more often"
                                .formatted(tilted.stream().map(Gain::input).collect(Collectors.joining(", ")))));
    }
}
