package dev.leadline.desktop.picker;

import dev.leadline.desktop.working.Colouring;
import dev.leadline.desktop.working.Field;
import dev.leadline.desktop.working.FormulaArea;
import dev.leadline.desktop.working.Messages;
import javafx.scene.Node;
import javafx.scene.control.CheckBox;
import javafx.scene.control.Tooltip;
import javafx.scene.layout.VBox;

/// A formula for the density, where it begins and ends, and where it breaks.
final class TypedForm implements Form {
    private final TypedViewModel model;
    private final FormulaArea formula = new FormulaArea("Formula of the density", 2, false);
    private final Messages messages = new Messages();
    private final Field from;
    private final Field to;
    private final Field breaks;
    private final CheckBox log = new CheckBox("the formula is its logarithm");
    private final VBox all;

    TypedForm(TypedViewModel model) {
        this.model = model;
        Runnable settle = model.project()::settle;
        formula.setId("density-formula");
        formula.prompt("as exp(-abs(" + model.variable() + ")^3)");
        formula.onTyped(model::formula);
        formula.focusedProperty().addListener((_, _, focused) -> {
            if (!focused) {
                settle.run();
            }
        });
        from = new Field("lower end of the density", "A number, or -inf", 8, model::from, settle);
        from.setId("density-from");
        to = new Field("upper end of the density", "A number, or inf", 8, model::to, settle);
        to.setId("density-to");
        breaks = new Field(
                        "breaks of the density",
                        "Where it jumps, has a pole or a narrow peak; blanks between them",
                        12,
                        model::breaks,
                        settle)
                .prompt("none")
                .growing();
        breaks.setId("density-breaks");
        log.setId("density-log");
        log.setTooltip(new Tooltip("For densities that are too small or too large to be written as they are"));
        log.setOnAction(_ -> model.log(log.isSelected()));
        all = new VBox(
                6,
                Labels.wrapped("In " + model.variable() + " and the constants; any factor will do, its integral is"
                        + " brought to 1."),
                formula,
                messages,
                Labels.line(Labels.of("from"), from, Labels.of("to"), to),
                Labels.line(Labels.of("breaks at"), breaks),
                log);
    }

    @Override
    public Node node() {
        return all;
    }

    @Override
    public void focus() {
        formula.requestFocus();
    }

    @Override
    public void update() {
        var typed = model.typed();
        formula.show(typed.formula());
        var faults = model.faults();
        formula.paint(
                Colouring.of(model.project().draft().get()).of(typed.formula()),
                faults.stream()
                        .filter(f -> f.problem().place().span().isPresent())
                        .map(f -> new int[] {f.from(), f.to()})
                        .toList());
        messages.showIn(faults, typed.formula());
        from.show(model.fromText());
        from.showFault(model.isFaulty("from"));
        to.show(model.toText());
        to.showFault(model.isFaulty("to"));
        breaks.show(model.breaksText());
        breaks.showFault(model.isFaulty("breaks"));
        log.setSelected(typed.log());
    }
}
