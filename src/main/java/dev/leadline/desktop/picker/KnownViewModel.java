package dev.leadline.desktop.picker;

import dev.leadline.density.Catalogue;
import dev.leadline.density.Knowledge;
import dev.leadline.density.Suggestion;
import dev.leadline.desktop.working.NumberText;
import dev.leadline.model.DensityDraft.Member;
import dev.leadline.problem.Problem;
import dev.leadline.problem.Refusal;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/// What is known about an input, told in numbers. As soon as it is told in full, the density that says just that and
/// the sentence of where it comes from go into the draft, as one edit.
final class KnownViewModel {
    private final Knowledge knowledge;
    private final DensityAt at;
    private final Map<String, String> texts = new LinkedHashMap<>();
    private List<Problem> problems = List.of();
    private Optional<Suggestion> suggestion = Optional.empty();

    KnownViewModel(Knowledge knowledge, DensityAt at) {
        this.knowledge = knowledge;
        this.at = at;
    }

    Knowledge knowledge() {
        return knowledge;
    }

    String text(String name) {
        return texts.getOrDefault(name, "");
    }

    /// What is wrong with what was typed; nothing is wrong with what was not typed yet.
    List<Problem> problems() {
        return problems;
    }

    Optional<Suggestion> suggestion() {
        return suggestion;
    }

    boolean isFaulty(String name) {
        return problems.stream().anyMatch(p -> p.place().path().equals(name));
    }

    void type(String name, String text) {
        texts.put(name, text);
        var told = new LinkedHashMap<String, Double>();
        var unread = new ArrayList<Problem>();
        for (var parameter : knowledge.parameters()) {
            String typed = text(parameter.name());
            var number = NumberText.read(typed);
            if (number.isPresent()) {
                told.put(parameter.name(), number.getAsDouble());
            } else if (!typed.isBlank()) {
                unread.add(NumberText.problem(parameter.name(), typed).in(parameter.name()));
            }
        }
        boolean whole = told.size() == knowledge.parameters().size();
        suggestion = Optional.empty();
        problems = unread;
        if (whole) {
            suggest(told);
        }
    }

    private void suggest(Map<String, Double> told) {
        try {
            var found = knowledge.suggestion(told);
            Catalogue.named(found.family()).of(found.parameters());
            suggestion = Optional.of(found);
        } catch (Refusal refusal) {
            problems = refusal.problems();
            return;
        }
        var found = suggestion.get();
        at.project().forget(at.path());
        at.edit("(" + knowledge.word() + ")", new Member(found.family(), found.parameters()), found.provenance());
    }
}
