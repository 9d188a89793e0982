package dev.leadline.model;

import dev.leadline.estimate.Estimand;
import dev.leadline.model.Draft.AskDraft;
import java.util.List;

/// One thing asked of a question.
///
/// @param formulas their texts, as written; one, or as many as the estimand takes
/// @param label what to call it; empty when not named
public record Ask(Estimand estimand, List<String> formulas, String unit, String label) {
    public Ask {
        formulas = List.copyOf(formulas);
    }

    /// What to call it: its label, else as `mean of exp(u)`.
    public String name() {
        return label.isBlank() ? AskDraft.words(estimand.word()) + " of " + text() : label;
    }

    /// The formulas in one line.
    public String text() {
        return String.join(
                " / ",
                formulas.stream()
                        .map(formula -> formulas.size() == 1 ? formula : "(" + formula + ")")
                        .toList());
    }
}
