package dev.leadline.desktop.working;

import dev.leadline.model.DensityDraft;
import dev.leadline.model.DensityWords;
import dev.leadline.model.Draft;
import dev.leadline.model.Draft.DependenceDraft;
import dev.leadline.model.Draft.From;
import dev.leadline.model.Draft.InputDraft;
import java.util.ArrayList;
import java.util.Collection;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.OptionalInt;
import java.util.function.UnaryOperator;
import javafx.beans.property.ReadOnlyObjectProperty;
import javafx.beans.property.ReadOnlyObjectWrapper;

/// The inputs of the project, edited row by row.
public final class InputsViewModel {
    private static final DensityDraft TO_CHOOSE = DensityDraft.unchosen();

    private final ProjectViewModel project;
    private final ReadOnlyObjectWrapper<OptionalInt> opened = new ReadOnlyObjectWrapper<>(OptionalInt.empty());

    public InputsViewModel(ProjectViewModel project) {
        this.project = project;
        project.draft().addListener((_, _, d) -> {
            if (opened.get().isPresent()
                    && opened.get().getAsInt() >= d.inputs().size()) {
                close();
            }
        });
    }

    public ProjectViewModel project() {
        return project;
    }

    public List<InputDraft> inputs() {
        return project.draft().get().inputs();
    }

    public static String path(int i) {
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
        String name = inputs().get(i).name();
        project.edit(
                "$.inputs",
                d -> Edits.dependence(
                        Edits.inputs(d, Edits.without(d.inputs(), i)),
                        d.dependence().flatMap(tied -> TiedEdits.without(tied, name))));
        opened.set(OptionalInt.empty());
    }

    /// Which input's density is looked at.
    public ReadOnlyObjectProperty<OptionalInt> opened() {
        return opened.getReadOnlyProperty();
    }

    public void open(int i) {
        opened.set(OptionalInt.of(i));
    }

    public void close() {
        opened.set(OptionalInt.empty());
    }

    /// Pairs of tied inputs follow the name, also where a name typed halfway is that of another input.
    void name(int i, String name) {
        var now = project.draft().get();
        String old = now.inputs().get(i).name();
        if (!(renaming.input == i && renaming.now.equals(old) && renaming.tied().equals(now.dependence()))) {
            renaming = new Renaming(i, old, old, now.dependence());
        }
        renaming = new Renaming(i, renaming.first, name.strip(), renaming.before);
        project.edit(
                path(i) + ".name",
                d -> Edits.dependence(
                        Edits.inputs(
                                d,
                                Edits.changed(
                                        d.inputs(),
                                        i,
                                        in -> new InputDraft(
                                                name.strip(), in.unit(), in.label(), in.provenance(), in.from()))),
                        renaming.tied()));
    }

    /// @param first the name before the first keystroke
    /// @param before what was tied then
    private record Renaming(int input, String first, String now, Optional<DependenceDraft> before) {
        Optional<DependenceDraft> tied() {
            return before.map(tied -> TiedEdits.renamed(tied, first, now));
        }
    }

    private Renaming renaming = new Renaming(-1, "", "", Optional.empty());

    void unit(int i, String unit) {
        edit(i, ".unit", in -> new InputDraft(in.name(), unit, in.label(), in.provenance(), in.from()));
    }

    void label(int i, String label) {
        edit(i, ".label", in -> new InputDraft(in.name(), in.unit(), label, in.provenance(), in.from()));
    }

    public void provenance(int i, String provenance) {
        edit(i, ".provenance", in -> new InputDraft(in.name(), in.unit(), in.label(), provenance, in.from()));
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

    /// Where the density of the input stands in the file.
    public String densityPath(int i) {
        return path(i) + (inputs().get(i).from() instanceof From.Range ? ".drawFrom" : ".density");
    }

    private static String rangePath(int i, boolean low) {
        return path(i) + ".range[" + (low ? 0 : 1) + "]";
    }

    public static Optional<DensityDraft> densityOf(From from) {
        return switch (from) {
            case From.Density(DensityDraft density) -> Optional.of(density);
            case From.Range(var _, var _, Optional<DensityDraft> drawFrom) -> drawFrom;
        };
    }

    /// Whether an integration variable needs a density to draw from.
    public static boolean isUnbounded(From from) {
        return from instanceof From.Range(double low, double high, var _)
                && (Double.isInfinite(low) || Double.isInfinite(high));
    }

    /// What stands after the name, as `~ gumbel(24.5, 2.6)`, `from 0 to 420` or `: choose`.
    static String summary(From from) {
        return switch (from) {
            case From.Density(DensityDraft d) -> d.isUnchosen() ? ": choose" : " ~ " + DensityWords.of(d);
            case From.Range(double low, double high, Optional<DensityDraft> drawFrom) ->
                " from " + NumberText.show(low) + " to " + NumberText.show(high)
                        + drawFrom.map(d -> ", drawn from " + DensityWords.of(d))
                                .orElse("");
        };
    }

    private void edit(int i, String field, UnaryOperator<InputDraft> change) {
        project.edit(path(i) + field, d -> Edits.inputs(d, Edits.changed(d.inputs(), i, change)));
    }

    private static InputDraft withFrom(InputDraft in, From from) {
        return new InputDraft(in.name(), in.unit(), in.label(), in.provenance(), from);
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
