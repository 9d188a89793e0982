package dev.leadline.study.candidate;

import dev.leadline.model.Input.Role;
import dev.leadline.model.LaneDraft;
import dev.leadline.model.LaneDraft.ControlDraft;
import dev.leadline.model.LaneDraft.Mean;
import dev.leadline.model.Project;
import java.util.List;
import java.util.stream.Collectors;

/// The inputs themselves as control variates, those whose mean is known.
record InputControls() implements Candidate {
    private static final int MOST = 30;

    @Override
    public List<Offer> offers(Project project, Gains gains) {
        var question = project.question();
        List<String> names = question.inputs().stream()
                .filter(input -> input.role() instanceof Role.Random)
                .filter(input ->
                        question.working().program().uses(question.inputs().indexOf(input)))
                .filter(input -> Double.isFinite(input.drawn().mean())
                        && Double.isFinite(input.drawn().variance()))
                .map(input -> input.name())
                .limit(MOST)
                .toList();
        if (names.isEmpty()) {
            return List.of();
        }
        var lane = LaneDraft.of("", "independent")
                .with(names.stream()
                        .map(name -> new ControlDraft(name, new Mean.Exact()))
                        .toList());
        return List.of(new Offer(
                lane,
                "the known %s of %s %s what follows the inputs in straight lines"
                        .formatted(
                                names.size() == 1 ? "mean" : "means",
                                names.stream().collect(Collectors.joining(", ")),
                                names.size() == 1 ? "corrects" : "correct")));
    }
}
