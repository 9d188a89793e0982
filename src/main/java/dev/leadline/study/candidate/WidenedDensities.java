package dev.leadline.study.candidate;

import dev.leadline.model.LaneDraft.Other;
import dev.leadline.model.Project;
import java.util.List;
import java.util.stream.Collectors;

/// Inputs drawn from their own densities, stretched to reach where the outcome comes from.
record WidenedDensities() implements Candidate {
    private static final double MOST = 5;

    @Override
    public List<Offer> offers(Project project, Gains gains) {
        List<Gain> widened = gains.all().stream()
                .filter(gain -> gain.isBeyond() && !gain.discrete())
                .toList();
        return widened.isEmpty()
                ? List.of()
                : List.of(new Offer(
                        Gains.lane(widened, gain -> new Other.Widen(factor(gain))),
                        "the outcome comes from rare values of %s, which wider densities reach more often"
                                .formatted(widened.stream().map(Gain::input).collect(Collectors.joining(", ")))));
    }

    private static double factor(Gain gain) {
        return Digits.three(Math.min(MOST, gain.width() / gain.spread()));
    }
}
