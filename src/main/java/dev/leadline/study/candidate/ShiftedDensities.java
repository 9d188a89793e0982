package dev.leadline.study.candidate;

import dev.leadline.model.LaneDraft.Other;
import dev.leadline.model.Project;
import java.util.List;
import java.util.stream.Collectors;

/// Inputs drawn from their own densities, moved to where the outcome comes from.
record ShiftedDensities() implements Candidate {
    @Override
    public List<Offer> offers(Project project, Gains gains) {
        List<Gain> moved = gains.all().stream()
                .filter(gain -> gain.isAside() && !gain.discrete())
                .toList();
        return moved.isEmpty()
                ? List.of()
                : List.of(new Offer(
                        Gains.lane(moved, gain -> new Other.Shift(Digits.three(gain.away()))),
                        "the outcome comes from rare values of %s, which are drawn more often"
                                .formatted(moved.stream().map(Gain::input).collect(Collectors.joining(", ")))));
    }
}
