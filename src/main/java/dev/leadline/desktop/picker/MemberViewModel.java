package dev.leadline.desktop.picker;

import dev.leadline.density.Catalogue;
import dev.leadline.density.Family;
import dev.leadline.density.Parameter;
import dev.leadline.desktop.working.ProjectViewModel;
import dev.leadline.model.DensityDraft;
import dev.leadline.model.DensityDraft.Member;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.SequencedMap;

/// A member of a family, entered by its parameters.
final class MemberViewModel {
    private final DensityAt at;

    /// A way of entry that was chosen before any of its parameters was typed.
    private int entryWanted;

    MemberViewModel(DensityAt at) {
        this.at = at;
    }

    ProjectViewModel project() {
        return at.project();
    }

    String path() {
        return at.path();
    }

    /// Empty while none is chosen.
    Optional<Family> family() {
        return at.now().member().flatMap(m -> Catalogue.family(m.family()));
    }

    private void forgetFields() {
        family().map(Family::entries).orElse(List.of()).stream()
                .flatMap(List::stream)
                .forEach(p -> project().forget(parameterPath(p.name())));
    }

    /// Another family; parameters of the same name keep their values.
    void family(String name) {
        forgetFields();
        project().settle();
        entryWanted = 0;
        at.edit("", old -> {
            var kept = new LinkedHashMap<String, Double>();
            var before = parameters(old);
            Catalogue.family(name)
                    .map(f -> f.entries().getFirst())
                    .orElse(List.of())
                    .forEach(p -> {
                        if (before.containsKey(p.name())) {
                            kept.put(p.name(), before.get(p.name()));
                        }
                    });
            return DensityAt.become(old, new Member(name, kept));
        });
        project().settle();
    }

    /// Another way to enter the same family; parameters it does not have are left out.
    void entry(int entry) {
        forgetFields();
        project().settle();
        entryWanted = entry;
        at.edit("", old -> {
            var kept = new LinkedHashMap<>(parameters(old));
            kept.keySet().retainAll(names(family().orElseThrow().entries().get(entry)));
            return old.with(new Member(old.kind(), kept));
        });
        project().settle();
    }

    /// The way of entry that fits the parameters written so far.
    int entry() {
        var family = family();
        if (family.isEmpty()) {
            return 0;
        }
        var entries = family.get().entries();
        var written = parameters(at.now()).keySet();
        if (entryWanted < entries.size() && names(entries.get(entryWanted)).containsAll(written)) {
            return entryWanted;
        }
        for (int k = 0; k < entries.size(); k++) {
            if (names(entries.get(k)).containsAll(written)) {
                return k;
            }
        }
        return 0;
    }

    void parameter(String name, String text) {
        project()
                .typeOptionalNumber(
                        parameterPath(name),
                        name + " of " + at.of(),
                        text,
                        (d, value) -> at.changed(d, old -> {
                            var parameters = new LinkedHashMap<>(parameters(old));
                            if (value.isPresent()) {
                                parameters.put(name, value.getAsDouble());
                            } else {
                                parameters.remove(name);
                            }
                            return old.with(new Member(old.kind(), inOrder(old.kind(), parameters)));
                        }));
    }

    String parameterText(String name) {
        Double value = parameters(at.now()).get(name);
        return project()
                .fieldText(parameterPath(name), value == null ? OptionalDouble.empty() : OptionalDouble.of(value));
    }

    boolean isFaulty(String name) {
        return !project().problemsAt(parameterPath(name)).isEmpty();
    }

    private String parameterPath(String name) {
        return at.path() + "." + name;
    }

    private static SequencedMap<String, Double> parameters(DensityDraft density) {
        return density.member().map(Member::parameters).orElseGet(LinkedHashMap::new);
    }

    private static List<String> names(List<Parameter> entry) {
        return entry.stream().map(Parameter::name).toList();
    }

    /// Parameters in the family's order, so that rows and files read alike.
    private static SequencedMap<String, Double> inOrder(String family, SequencedMap<String, Double> parameters) {
        var ordered = new LinkedHashMap<String, Double>();
        Catalogue.family(family).map(Family::entries).orElse(List.of()).stream()
                .flatMap(List::stream)
                .map(Parameter::name)
                .filter(parameters::containsKey)
                .forEach(n -> ordered.putIfAbsent(n, parameters.get(n)));
        parameters.forEach(ordered::putIfAbsent);
        return ordered;
    }
}
