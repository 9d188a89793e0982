package dev.leadline.study.candidate;

import dev.leadline.model.LaneDraft;
import dev.leadline.model.LaneDraft.DrawFrom;
import dev.leadline.model.LaneDraft.Settings;
import dev.leadline.model.Project;
import java.util.List;
import java.util.OptionalDouble;

/// All inputs drawn from densities that are found before the run.
///
/// @param way in which they are found, as a project has it
/// @param reason what it makes use of
record AdaptedDensities(String way, String reason) implements Candidate {
    @Override
    public List<Offer> offers(Project project, Gains gains) {
        var lane = new LaneDraft(
                "",
                "independent",
                Settings.NONE,
                new DrawFrom.Adapted(way),
                OptionalDouble.empty(),
                false,
                List.of(),
                false);
        return List.of(new Offer(lane, reason));
    }
}
