package dev.leadline.desktop.working;

import dev.leadline.model.Draft.ConstantDraft;
import java.util.List;
import java.util.OptionalDouble;
import java.util.function.UnaryOperator;

/// The constants of the project, edited row by row.
public final class ConstantsViewModel {
    private final ProjectViewModel project;

    public ConstantsViewModel(ProjectViewModel project) {
        this.project = project;
    }

    ProjectViewModel project() {
        return project;
    }

    List<ConstantDraft> constants() {
        return project.draft().get().constants();
    }

    static String path(int i) {
        return "$.constants[" + i + "]";
    }

    /// @return the index of the new row
    int add(String name) {
        project.settle();
        project.edit(
                "$.constants",
                d -> Edits.constants(d, Edits.with(d.constants(), new ConstantDraft(name, 0, "", "", ""))));
        return constants().size() - 1;
    }

    void remove(int i) {
        project.settle();
        project.forget("$.constants");
        project.edit("$.constants", d -> Edits.constants(d, Edits.without(d.constants(), i)));
    }

    void name(int i, String name) {
        edit(i, ".name", c -> new ConstantDraft(name.strip(), c.value(), c.unit(), c.label(), c.source()));
    }

    void value(int i, String text) {
        project.typeNumber(
                path(i) + ".value",
                "value of " + constants().get(i).name(),
                text,
                (d, value) -> Edits.constants(
                        d,
                        Edits.changed(
                                d.constants(),
                                i,
                                c -> new ConstantDraft(c.name(), value, c.unit(), c.label(), c.source()))));
    }

    String valueText(int i) {
        return project.fieldText(
                path(i) + ".value", OptionalDouble.of(constants().get(i).value()));
    }

    void unit(int i, String unit) {
        edit(i, ".unit", c -> new ConstantDraft(c.name(), c.value(), unit, c.label(), c.source()));
    }

    void label(int i, String label) {
        edit(i, ".label", c -> new ConstantDraft(c.name(), c.value(), c.unit(), label, c.source()));
    }

    void source(int i, String source) {
        edit(i, ".source", c -> new ConstantDraft(c.name(), c.value(), c.unit(), c.label(), source));
    }

    private void edit(int i, String field, UnaryOperator<ConstantDraft> change) {
        project.edit(path(i) + field, d -> Edits.constants(d, Edits.changed(d.constants(), i, change)));
    }
}
