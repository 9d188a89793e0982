package dev.leadline.study.candidate;

import dev.leadline.model.LaneDraft;
import dev.leadline.model.LaneDraft.DrawFrom;
import dev.leadline.model.Project;
import java.util.List;

/// All inputs drawn from densities that are found before the run.
///
/// @param way in which they are found, as a project has it
/// @param reason what it makes use of
record AdaptedDensities(String way, String reason) implements Candidate {
    @Override
    public List<Offer> offers(Project project, Gains gains) {
        var lane = LaneDraft.of("", "independent").with(new DrawFrom.Adapted(way));
        return List.of(new Offer(lane, reason));
    }
}
