package dev.leadline.study.candidate;

import dev.leadline.model.LaneDraft;
import dev.leadline.model.Project;
import java.util.List;

/// Another layout of the points.
///
/// @param word of the layout
/// @param reason what it makes use of
record LaidOut(String word, String reason) implements Candidate {
    @Override
    public List<Offer> offers(Project project, Gains gains) {
        return List.of(new Offer(LaneDraft.of("", word), reason));
    }
}
