package dev.leadline.study.candidate;

import dev.leadline.model.Project;
import java.util.List;

/// A way to sample that may be worth more than plain draws.
public interface Candidate {
    /// Lanes that are worth a look; none where the way does not apply. One that the project refuses is left out.
    ///
    /// @param project the question
    /// @param gains where the outcome comes from, found when first asked for
    List<Offer> offers(Project project, Gains gains);
}
