package dev.leadline.study.candidate;

import dev.leadline.model.LaneDraft;
import dev.leadline.model.Project;
import java.util.List;

/// Another layout of the points.
///
/// @param lane with its points alone
/// @param reason what it makes use of
record LaidOut(LaneDraft lane, String reason) implements Candidate {
    /// @param word of a layout that is told nothing
    LaidOut(String word, String reason) {
        this(LaneDraft.of("", word), reason);
    }

    @Override
    public List<Offer> offers(Project project, Gains gains) {
        return List.of(new Offer(lane, reason));
    }
}
