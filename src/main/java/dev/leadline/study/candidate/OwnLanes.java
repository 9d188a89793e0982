package dev.leadline.study.candidate;

import dev.leadline.model.LaneDraft;
import dev.leadline.model.Project;
import java.util.List;

/// The lanes that the project has already, but plain draws.
record OwnLanes() implements Candidate {
    @Override
    public List<Offer> offers(Project project, Gains gains) {
        return project.draft().lanes().stream()
                .filter(lane -> !lane.named("").equals(LaneDraft.of("", "independent")))
                .map(lane -> new Offer(lane, "this is lane %s of the project".formatted(lane.name())))
                .toList();
    }
}
