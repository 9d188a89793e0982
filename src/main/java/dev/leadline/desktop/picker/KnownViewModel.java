package dev.leadline.desktop.picker;

import dev.leadline.density.Catalogue;
import dev.leadline.density.Knowledge;
import dev.leadline.density.Suggestion;
import dev.leadline.desktop.working.NumberText;
import dev.leadline.model.DensityDraft.Member;
import dev.leadline.model.DensityWords;
import dev.leadline.problem.Problem;
import dev.leadline.problem.Refusal;
import java.util.LinkedHashMap;
import java.util.Map;
import java.util.Optional;

/// What is known about an input, told in numbers. As soon as it is told in full, the density that says just that and
/// the sentence of where it comes from go into the draft, as one edit. From then on the fields say what the draft says:
/// a text among them that says nothing stands against a run.
final class KnownViewModel {
    private final Knowledge knowledge;
    private final DensityAt at;

    /// Of the fields. No file has one there: it keeps the density that follows.
    private final String path;

    private final Map<String, String> texts = new LinkedHashMap<>();
    private Optional<Suggestion> suggestion = Optional.empty();
    private boolean whole;
    private boolean typing;

    KnownViewModel(Knowledge knowledge, DensityAt at) {
        this.knowledge = knowledge;
        this.at = at;
        path = at.path() + ".(" + knowledge.word() + ")";
    }

    /// Whether there is something in its fields that cannot be read, and the density stands at that place.
    boolean isUnread(DensityAt place) {
        return place.path().equals(at.path()) && at.project().isUnread(path);
    }

    Knowledge knowledge() {
        return knowledge;
    }

    String text(String name) {
        return texts.getOrDefault(name, "");
    }

    boolean isFaulty(String name) {
        return at.project().isUnread(path + "." + name);
    }

    /// As `Kept with the input: …`; else what is still missing.
    String sentence() {
        if (suggestion.isPresent()) {
            return "Kept with the input: " + suggestion.get().provenance();
        }
        return "The density follows once all of it is told"
                + (at.now().isUnchosen() ? "." : "; until then it stays " + DensityWords.of(at.now()) + ".");
    }

    /// Forgets what was told where the draft no longer says it: it was undone, or the density became another.
    void follow() {
        if (typing) {
            return;
        }
        boolean told = suggestion
                .map(s -> at.now().of().equals(new Member(s.family(), s.parameters())))
                .orElse(!whole || at.project().isUnread(path));
        if (!told) {
            texts.clear();
            suggestion = Optional.empty();
            whole = false;
        }
    }

    void type(String name, String text) {
        typing = true;
        texts.put(name, text);
        tell();
        typing = false;
    }

    private void tell() {
        at.project().forget(path);
        var told = new LinkedHashMap<String, Double>();
        for (var parameter : knowledge.parameters()) {
            String typed = text(parameter.name());
            var number = NumberText.read(typed);
            if (number.isPresent()) {
                told.put(parameter.name(), number.getAsDouble());
            } else if (whole || !typed.isBlank()) {
                refuse(parameter.name(), NumberText.problem(parameter.use(), typed));
            }
        }
        suggestion = Optional.empty();
        if (told.size() == knowledge.parameters().size()) {
            suggest(told);
        }
    }

    private void suggest(Map<String, Double> told) {
        try {
            var found = knowledge.suggestion(told);
            Catalogue.named(found.family()).of(found.parameters());
            suggestion = Optional.of(found);
            whole = true;
        } catch (Refusal refusal) {
            refusal.problems().forEach(problem -> refuse(problem.place().path(), problem));
            return;
        }
        var found = suggestion.get();
        at.edit("(" + knowledge.word() + ")", new Member(found.family(), found.parameters()), found.provenance());
    }

    private void refuse(String name, Problem problem) {
        at.project().unread(at.path() + "(" + knowledge.word() + ")", path + "." + name, text(name), problem);
    }
}
