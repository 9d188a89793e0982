package dev.leadline.desktop.working;

import dev.leadline.model.Draft.DependenceDraft;
import dev.leadline.model.Draft.PairDraft;
import java.util.List;
import java.util.Optional;

/// What ties inputs, with one thing changed.
final class TiedEdits {
    private TiedEdits() {}

    static DependenceDraft with(DependenceDraft tied, List<PairDraft> pairs) {
        return new DependenceDraft(tied.copula(), tied.dof(), tied.repair(), pairs);
    }

    static DependenceDraft renamed(DependenceDraft tied, String from, String to) {
        return with(
                tied,
                tied.pairs().stream()
                        .map(p -> new PairDraft(
                                p.one().equals(from) ? to : p.one(),
                                p.other().equals(from) ? to : p.other(),
                                p.measure(),
                                p.value()))
                        .toList());
    }

    /// Without the pairs of an input; empty where no pair is left.
    static Optional<DependenceDraft> without(DependenceDraft tied, String input) {
        var pairs = tied.pairs().stream()
                .filter(p -> !p.one().equals(input) && !p.other().equals(input))
                .toList();
        return pairs.isEmpty() ? Optional.empty() : Optional.of(with(tied, pairs));
    }
}
