package dev.leadline.desktop.working;

import dev.leadline.model.Draft;
import dev.leadline.model.Draft.DependenceDraft;
import dev.leadline.model.Draft.From;
import dev.leadline.model.Draft.InputDraft;
import dev.leadline.model.Draft.PairDraft;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.function.UnaryOperator;

/// Which inputs rise and fall together, and how closely.
final class TiedViewModel {
    static final List<String> COPULAS = List.of("gaussian", "student");
    static final List<String> MEASURES = List.of("spearman", "kendall", "pearson");

    private static final String PATH = "$.dependence";
    private static final DependenceDraft NONE =
            new DependenceDraft(COPULAS.getFirst(), OptionalDouble.empty(), false, List.of());

    private final ProjectViewModel project;

    TiedViewModel(ProjectViewModel project) {
        this.project = project;
    }

    ProjectViewModel project() {
        return project;
    }

    DependenceDraft tied() {
        return project.draft().get().dependence().orElse(NONE);
    }

    /// Names of the random inputs.
    List<String> names() {
        return project.draft().get().inputs().stream()
                .filter(in -> in.from() instanceof From.Density)
                .map(InputDraft::name)
                .toList();
    }

    boolean canAdd() {
        return next().isPresent();
    }

    /// The first two inputs that are no pair yet.
    private Optional<PairDraft> next() {
        var names = names();
        for (int i = 0; i < names.size(); i++) {
            for (int j = i + 1; j < names.size(); j++) {
                if (!isPair(names.get(i), names.get(j))) {
                    return Optional.of(new PairDraft(names.get(i), names.get(j), MEASURES.getFirst(), 0));
                }
            }
        }
        return Optional.empty();
    }

    private boolean isPair(String one, String other) {
        return tied().pairs().stream()
                .anyMatch(p -> p.one().equals(one) && p.other().equals(other)
                        || p.one().equals(other) && p.other().equals(one));
    }

    void add() {
        project.settle();
        next().ifPresent(pair -> edit(PATH, tied -> TiedEdits.with(tied, Edits.with(tied.pairs(), pair))));
    }

    void remove(int k) {
        project.settle();
        project.forget(PATH);
        project.edit(
                PATH,
                d -> Edits.dependence(
                        d,
                        d.dependence()
                                .map(tied -> TiedEdits.with(tied, Edits.without(tied.pairs(), k)))
                                .filter(tied -> !tied.pairs().isEmpty())));
    }

    void one(int k, String name) {
        pair(k, p -> new PairDraft(name, p.other(), p.measure(), p.value()));
    }

    void other(int k, String name) {
        pair(k, p -> new PairDraft(p.one(), name, p.measure(), p.value()));
    }

    void measure(int k, String measure) {
        project.forget(valuePath(k));
        pair(k, p -> new PairDraft(p.one(), p.other(), measure, p.value()));
    }

    private void pair(int k, UnaryOperator<PairDraft> change) {
        project.settle();
        edit(pairPath(k), tied -> TiedEdits.with(tied, Edits.changed(tied.pairs(), k, change)));
    }

    void value(int k, String text) {
        var pair = tied().pairs().get(k);
        project.typeNumber(
                valuePath(k),
                "%s of %s and %s".formatted(pair.measure(), pair.one(), pair.other()),
                text,
                (d, value) -> changed(
                        d,
                        tied -> TiedEdits.with(
                                tied,
                                Edits.changed(
                                        tied.pairs(), k, p -> new PairDraft(p.one(), p.other(), p.measure(), value)))));
    }

    String valueText(int k) {
        return project.fieldText(
                valuePath(k), OptionalDouble.of(tied().pairs().get(k).value()));
    }

    void copula(String copula) {
        project.settle();
        project.forget(PATH + ".dof");
        edit(
                PATH + ".copula",
                tied -> new DependenceDraft(
                        copula,
                        copula.equals("student") ? tied.dof() : OptionalDouble.empty(),
                        tied.repair(),
                        tied.pairs()));
    }

    void dof(String text) {
        project.typeOptionalNumber(
                PATH + ".dof",
                "degrees of freedom of the copula",
                text,
                (d, value) ->
                        changed(d, tied -> new DependenceDraft(tied.copula(), value, tied.repair(), tied.pairs())));
    }

    String dofText() {
        return project.fieldText(PATH + ".dof", tied().dof());
    }

    void repair(boolean repair) {
        project.settle();
        edit(PATH + ".repair", tied -> new DependenceDraft(tied.copula(), tied.dof(), repair, tied.pairs()));
    }

    static String pairPath(int k) {
        return PATH + ".pairs[" + k + "]";
    }

    private String valuePath(int k) {
        return pairPath(k) + "." + tied().pairs().get(k).measure();
    }

    /// As `v and w .4`, for the folded row.
    String summary() {
        var pairs = tied().pairs();
        if (pairs.isEmpty()) {
            return "all independent";
        }
        var first = pairs.getFirst();
        String more = pairs.size() > 1 ? " and " + (pairs.size() - 1) + " more" : "";
        return "%s and %s %s%s".formatted(first.one(), first.other(), NumberText.show(first.value()), more);
    }

    private void edit(String key, UnaryOperator<DependenceDraft> change) {
        project.edit(key, d -> changed(d, change));
    }

    private static Draft changed(Draft d, UnaryOperator<DependenceDraft> change) {
        return Edits.dependence(d, Optional.of(change.apply(d.dependence().orElse(NONE))));
    }
}
