package dev.leadline.study.candidate;

import dev.leadline.model.LaneDraft.Other;
import dev.leadline.model.Project;
import java.util.List;
import java.util.Optional;
import java.util.stream.Collectors;

/// Inputs drawn from their own densities, stretched to reach where the outcome comes from.
record WidenedDensities() implements Candidate {
    private static final double MOST = 5;

    @Override
    public List<Offer> offers(Project project, Gains gains) {
        List<Gain> rare = gains.all().stream().filter(Gain::isBeyond).toList();
        return Gains.lane(rare, gain -> Optional.of(new Other.Widen(factor(gain)))).stream()
                .map(lane -> new Offer(
                        lane,
                        "the outcome comes from rare values of %s, which wider densities reach more often"
                                .formatted(rare.stream().map(Gain::name).collect(Collectors.joining(", ")))))
                .toList();
    }

    private static double factor(Gain gain) {
        return Digits.three(Math.min(MOST, gain.width() / gain.spread()));
    }
}
