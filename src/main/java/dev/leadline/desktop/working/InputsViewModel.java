package dev.leadline.desktop.working;

import dev.leadline.density.Catalogue;
import dev.leadline.density.Family;
import dev.leadline.density.Parameter;
import dev.leadline.model.DensityDraft;
import dev.leadline.model.DensityDraft.Member;
import dev.leadline.model.Draft;
import dev.leadline.model.Draft.From;
import dev.leadline.model.Draft.InputDraft;
import java.util.ArrayList;
import java.util.Collection;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.SequencedMap;
import java.util.function.UnaryOperator;
import java.util.stream.Collectors;

/// The inputs of the project, edited row by row.
public final class InputsViewModel {
    private static final DensityDraft TO_CHOOSE = DensityDraft.unchosen();

    private final ProjectViewModel project;

    public InputsViewModel(ProjectViewModel project) {
        this.project = project;
    }

    ProjectViewModel project() {
        return project;
    }

    List<InputDraft> inputs() {
        return project.draft().get().inputs();
    }

    static String path(int i) {
        return "$.inputs[" + i + "]";
    }

    /// @return the index of the new row
    int addRandom(String name) {
        return add(new InputDraft(name, "", "", "", new From.Density(TO_CHOOSE)));
    }

    int addRange(String name) {
        return add(new InputDraft(name, "", "", "", new From.Range(0, 1, Optional.empty())));
    }

    /// A row of each name, its density still to be chosen, as one edit.
    void addUnknown(Collection<String> names) {
        if (!names.isEmpty()) {
            project.settle();
            project.edit("$.inputs", d -> {
                var inputs = new ArrayList<>(d.inputs());
                names.forEach(n -> inputs.add(new InputDraft(n, "", "", "", new From.Density(TO_CHOOSE))));
                return Edits.inputs(d, inputs);
            });
        }
    }

    private int add(InputDraft input) {
        project.settle();
        project.edit("$.inputs", d -> Edits.inputs(d, Edits.with(d.inputs(), input)));
        return inputs().size() - 1;
    }

    void remove(int i) {
        project.settle();
        project.forget("$.inputs");
        project.edit("$.inputs", d -> Edits.inputs(d, Edits.without(d.inputs(), i)));
    }

    void name(int i, String name) {
        edit(i, ".name", in -> new InputDraft(name.strip(), in.unit(), in.label(), in.provenance(), in.from()));
    }

    void unit(int i, String unit) {
        edit(i, ".unit", in -> new InputDraft(in.name(), unit, in.label(), in.provenance(), in.from()));
    }

    void label(int i, String label) {
        edit(i, ".label", in -> new InputDraft(in.name(), in.unit(), label, in.provenance(), in.from()));
    }

    void provenance(int i, String provenance) {
        edit(i, ".provenance", in -> new InputDraft(in.name(), in.unit(), in.label(), provenance, in.from()));
    }

    /// Another family; parameters of the same name keep their values.
    void family(int i, String family) {
        project.forget(path(i));
        project.settle();
        from(i, ".density", from -> switch (from) {
            case From.Density(DensityDraft old) -> new From.Density(refit(old, family));
            case From.Range(double low, double high, Optional<DensityDraft> old) ->
                new From.Range(low, high, Optional.of(refit(old.orElse(TO_CHOOSE), family)));
        });
    }

    private static DensityDraft refit(DensityDraft old, String family) {
        var kept = new LinkedHashMap<String, Double>();
        Catalogue.family(family)
                .map(f -> f.entries().getFirst())
                .orElse(List.of())
                .forEach(p -> {
                    var before = parameters(old);
                    if (before.containsKey(p.name())) {
                        kept.put(p.name(), before.get(p.name()));
                    }
                });
        return DensityDraft.of(family, kept);
    }

    /// Another way to enter the same family; parameters it does not have are left out.
    void entry(int i, int entry) {
        project.forget(path(i));
        project.settle();
        entryWanted = new EntryWanted(i, entry);
        density(i, old -> {
            var names = Catalogue.family(old.kind()).orElseThrow().entries().get(entry).stream()
                    .map(Parameter::name)
                    .toList();
            var kept = new LinkedHashMap<>(parameters(old));
            kept.keySet().retainAll(names);
            return old.with(new Member(old.kind(), kept));
        });
    }

    void parameter(int i, String name, String text) {
        var what = name + " of " + inputs().get(i).name();
        project.typeOptionalNumber(
                densityPath(i) + "." + name,
                what,
                text,
                (d, value) -> Edits.inputs(
                        d,
                        Edits.changed(
                                d.inputs(),
                                i,
                                in -> withFrom(in, mapDensity(in.from(), old -> {
                                    var parameters = new LinkedHashMap<>(parameters(old));
                                    if (value.isPresent()) {
                                        parameters.put(name, value.getAsDouble());
                                    } else {
                                        parameters.remove(name);
                                    }
                                    return old.with(new Member(old.kind(), inOrder(old.kind(), parameters)));
                                })))));
    }

    void rangeEnd(int i, boolean low, String text) {
        var what = (low ? "lower" : "upper") + " end of " + inputs().get(i).name();
        project.typeNumber(
                rangePath(i, low),
                what,
                text,
                (d, value) -> Edits.inputs(
                        d,
                        Edits.changed(
                                d.inputs(),
                                i,
                                in -> withFrom(
                                        in,
                                        switch (in.from()) {
                                            case From.Density density -> density;
                                            case From.Range(double l, double h, Optional<DensityDraft> drawFrom) ->
                                                new From.Range(low ? value : l, low ? h : value, drawFrom);
                                        }))));
    }

    String rangeText(int i, boolean low) {
        return inputs().get(i).from() instanceof From.Range(double l, double h, var _)
                ? project.fieldText(rangePath(i, low), OptionalDouble.of(low ? l : h))
                : "";
    }

    String parameterText(int i, String name) {
        Double value = densityOf(inputs().get(i).from())
                .map(d -> parameters(d).get(name))
                .orElse(null);
        return project.fieldText(
                densityPath(i) + "." + name, value == null ? OptionalDouble.empty() : OptionalDouble.of(value));
    }

    /// Where the density of the input stands in the file.
    String densityPath(int i) {
        return path(i) + (inputs().get(i).from() instanceof From.Range ? ".drawFrom" : ".density");
    }

    private static String rangePath(int i, boolean low) {
        return path(i) + ".range[" + (low ? 0 : 1) + "]";
    }

    /// A way of entry that was chosen before any of its parameters was typed.
    private record EntryWanted(int input, int entry) {}

    private EntryWanted entryWanted = new EntryWanted(-1, 0);

    /// The way of entry that fits the parameters written so far.
    int entryOf(int i) {
        var density = densityOf(inputs().get(i).from());
        var family = density.flatMap(d -> Catalogue.family(d.kind()));
        if (family.isEmpty()) {
            return 0;
        }
        var entries = family.get().entries();
        var written = parameters(density.get()).keySet();
        if (entryWanted.input == i
                && entryWanted.entry < entries.size()
                && names(entries.get(entryWanted.entry)).containsAll(written)) {
            return entryWanted.entry;
        }
        for (int k = 0; k < entries.size(); k++) {
            if (names(entries.get(k)).containsAll(written)) {
                return k;
            }
        }
        return 0;
    }

    static Optional<DensityDraft> densityOf(From from) {
        return switch (from) {
            case From.Density(DensityDraft density) -> Optional.of(density);
            case From.Range(var _, var _, Optional<DensityDraft> drawFrom) -> drawFrom;
        };
    }

    /// Whether an integration variable needs a density to draw from.
    static boolean isUnbounded(From from) {
        return from instanceof From.Range(double low, double high, var _)
                && (Double.isInfinite(low) || Double.isInfinite(high));
    }

    /// What stands after the name, as `~ gumbel(24.5, 2.6)`, `from 0 to 420` or `: choose`.
    static String summary(From from) {
        return switch (from) {
            case From.Density(DensityDraft d) -> d.isUnchosen() ? ": choose" : " ~ " + member(d);
            case From.Range(double low, double high, Optional<DensityDraft> drawFrom) ->
                " from " + NumberText.show(low) + " to " + NumberText.show(high)
                        + drawFrom.map(d -> ", drawn from " + member(d)).orElse("");
        };
    }

    private static String member(DensityDraft d) {
        return d.kind()
                + d.member()
                        .map(m -> m.parameters().values().stream()
                                .map(NumberText::show)
                                .collect(Collectors.joining(", ", "(", ")")))
                        .orElse("");
    }

    private static SequencedMap<String, Double> parameters(DensityDraft density) {
        return density.member().map(Member::parameters).orElseGet(LinkedHashMap::new);
    }

    private void edit(int i, String field, UnaryOperator<InputDraft> change) {
        project.edit(path(i) + field, d -> Edits.inputs(d, Edits.changed(d.inputs(), i, change)));
    }

    private void from(int i, String field, UnaryOperator<From> change) {
        edit(i, field, in -> withFrom(in, change.apply(in.from())));
    }

    private void density(int i, UnaryOperator<DensityDraft> change) {
        from(i, ".density", from -> mapDensity(from, change));
    }

    private static From mapDensity(From from, UnaryOperator<DensityDraft> change) {
        return switch (from) {
            case From.Density(DensityDraft d) -> new From.Density(change.apply(d));
            case From.Range(double low, double high, Optional<DensityDraft> d) ->
                new From.Range(low, high, d.map(change));
        };
    }

    private static InputDraft withFrom(InputDraft in, From from) {
        return new InputDraft(in.name(), in.unit(), in.label(), in.provenance(), from);
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

    /// Names that the formulas of a draft may use already.
    static List<String> known(Draft d) {
        var names = new ArrayList<String>();
        d.inputs().forEach(in -> names.add(in.name()));
        d.constants().forEach(c -> names.add(c.name()));
        d.steps().forEach(s -> FormulasViewModel.stepName(s).ifPresent(names::add));
        return names;
    }
}
