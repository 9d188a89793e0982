package dev.leadline.desktop.working;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertInstanceOf;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.leadline.desktop.Drafts;
import dev.leadline.desktop.background.HeldBackground;
import dev.leadline.desktop.working.DemandsViewModel.RuleField;
import dev.leadline.interval.IntervalKind;
import dev.leadline.model.DataFiles;
import dev.leadline.model.Draft;
import dev.leadline.model.Draft.From;
import java.nio.file.Path;
import java.util.List;
import java.util.OptionalDouble;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;

class ProjectViewModelTest {
    private final HeldBackground background = new HeldBackground();
    private final ProjectViewModel project = new ProjectViewModel(Drafts.mean(), background);
    private final InputsViewModel inputs = new InputsViewModel(project);
    private final ConstantsViewModel constants = new ConstantsViewModel(project);
    private final FormulasViewModel formulas = new FormulasViewModel(project, inputs);
    private final DemandsViewModel demands = new DemandsViewModel(project);

    @BeforeEach
    void check() {
        background.finishAll();
    }

    @Test
    void aSoundProjectHasNoProblems() {
        assertInstanceOf(ProjectViewModel.Check.Sound.class, project.check().get());
        assertEquals(List.of(), project.problems().get());
        assertFalse(project.edited().get());
    }

    @Test
    void undoingAnEditLeavesNothingToSave() {
        inputs.name(0, "z");
        assertTrue(project.edited().get());
        project.undo();
        assertFalse(project.edited().get());
        assertEquals("x", project.draft().get().inputs().getFirst().name());
        project.redo();
        assertEquals("z", project.draft().get().inputs().getFirst().name());
    }

    @Test
    void undoTakesWhatCannotBeReadFirst() {
        inputs.name(0, "z");
        demands.absolute("0,1");
        assertTrue(project.canUndo().get());
        project.undo();
        assertEquals(List.of(), project.unreadFields());
        assertEquals("0.01", demands.absoluteText());
        assertEquals("z", project.draft().get().inputs().getFirst().name());
        project.undo();
        assertEquals("x", project.draft().get().inputs().getFirst().name());
    }

    @Test
    void savingMakesItUnedited() {
        inputs.name(0, "z");
        project.savedAs(Path.of("a.leadline"), project.draft().get());
        assertFalse(project.edited().get());
        project.undo();
        assertTrue(project.edited().get());
    }

    @Test
    void anOlderCheckDoesNotOverwriteANewerOne() {
        formulas.typeFormula(0, 0, "twice +");
        formulas.typeFormula(0, 0, "twice");
        assertEquals(2, background.waiting());
        background.finishNext();
        assertEquals(List.of(), project.problems().get());
        background.finishAll();
        assertEquals(List.of(), project.problems().get());
    }

    @Test
    void aPastedFormulaMakesARowOfEachUnknownName() {
        formulas.typeSteps("q = 0.5*rho*v^2\nload = q*area*pi");
        formulas.typeFormula(0, 0, "max(load, x)");
        formulas.makeInputsOfUnknownNames();
        assertEquals(
                List.of("x", "rho", "v", "area"),
                project.draft().get().inputs().stream()
                        .map(Draft.InputDraft::name)
                        .toList());
        assertEquals(
                ": choose",
                InputsViewModel.summary(project.draft().get().inputs().get(2).from()));
        project.undo();
        assertEquals(1, project.draft().get().inputs().size());
    }

    @Test
    void blankLinesStayInTheTextAndOutOfTheDraft() {
        formulas.typeSteps("twice = 2*x\n\nthrice = 3*x +");
        background.finishAll();
        assertEquals(
                List.of("twice = 2*x", "thrice = 3*x +"), project.draft().get().steps());
        assertEquals("twice = 2*x\n\nthrice = 3*x +", formulas.stepsText().get());
        var fault = formulas.stepFaults().getFirst();
        assertEquals(2, fault.line());
        assertTrue(fault.problem().place().span().isPresent());
    }

    @Test
    void undoBringsBackTheTextOfTheSteps() {
        formulas.typeSteps("twice = 3*x");
        project.undo();
        assertEquals("twice = 2*x   # m", formulas.stepsText().get());
    }

    @Test
    void aWrongFormulaIsToldWithItsPlace() {
        formulas.typeFormula(0, 0, "twice + foo");
        background.finishAll();
        var fault = formulas.askFaults(0, 0).getFirst();
        assertEquals(8, fault.from());
        assertEquals(11, fault.to());
    }

    @Test
    void aFaultStandsAtItsFormulaOfARatio() {
        formulas.kind(0, "ratio");
        formulas.typeFormula(0, 1, "x + foo");
        background.finishAll();
        assertEquals(List.of(), formulas.askFaults(0, 0));
        assertEquals(4, formulas.askFaults(0, 1).getFirst().from());
        formulas.typeFormula(0, 1, "x");
        background.finishAll();
        assertInstanceOf(ProjectViewModel.Check.Sound.class, project.check().get());
    }

    @Test
    void probabilitiesOfQuantilesAreTypedInPerCent() {
        formulas.kind(0, "quantile");
        assertEquals("95", formulas.partText(0));
        formulas.part(0, "99.9");
        assertEquals(
                OptionalDouble.of(.999), project.draft().get().asks().getFirst().at());
        formulas.part(0, "100");
        background.finishAll();
        assertEquals(
                "at is 1 but must be between 0 and 1",
                formulas.partProblems(0).getFirst().primary());
        assertEquals(List.of(), formulas.askFaults(0, 0));
        formulas.part(0, "many");
        assertEquals("many", formulas.partText(0));
        formulas.kind(0, "distribution");
        background.finishAll();
        assertEquals("95", formulas.partText(0));
        assertEquals(List.of(), project.problems().get());
        formulas.part(0, "90");
        assertEquals(
                OptionalDouble.of(.9), project.draft().get().asks().getFirst().coverage());
    }

    @Test
    void boundsComeInPairs() {
        demands.interval(IntervalKind.HOEFFDING);
        background.finishAll();
        assertEquals("$.interval", project.problems().get().getFirst().place().path());
        demands.bounds("0", "");
        assertEquals(
                "one of the two bounds is missing",
                project.problemsAt("$.bounds").getFirst().primary());
        assertEquals("0", demands.leastText());
        demands.bounds("0", "x");
        assertTrue(project.problemsAt("$.bounds").getFirst().primary().contains("x"));
        demands.bounds("0", "2");
        background.finishAll();
        assertEquals(List.of(), project.problems().get());
        assertEquals("2", demands.mostText());
        demands.interval(IntervalKind.AUTO);
        demands.bounds("", "");
        assertTrue(project.draft().get().interval().isEmpty());
    }

    @Test
    void aStopRuleHasItsOwnFields() {
        demands.rule("any-time");
        demands.ruleField(RuleField.GUARD_DRAWS, "2000");
        demands.ruleField(RuleField.GUARD_HITS, "30");
        demands.draws("1e6");
        background.finishAll();
        assertEquals(List.of(), project.problems().get());
        assertEquals("2000", demands.ruleFieldText(RuleField.GUARD_DRAWS));
        assertEquals(
                "once the any-time band is narrow, at most 1.00 million draws",
                DemandsViewModel.stopSummary(project.draft().get()));
        demands.rule("stein");
        demands.ruleField(RuleField.FIRST, "many");
        assertEquals("many", demands.ruleFieldText(RuleField.FIRST));
        demands.rule("two-stage");
        demands.ruleField(RuleField.INFLATION, "1.2");
        background.finishAll();
        assertEquals(List.of(), project.problems().get());
        assertEquals("", demands.ruleFieldText(RuleField.GUARD_HITS));
        demands.rule("hits");
        background.finishAll();
        assertEquals("$.stop.rule", project.problems().get().getFirst().place().path());
        demands.rule("");
        demands.draws("");
        assertTrue(project.draft().get().stop().isEmpty());
        assertEquals(
                "once the any-time band is narrow, at most 100 million draws",
                DemandsViewModel.stopSummary(project.draft().get()));
    }

    @Test
    void removingAnInputRenumbersTheRest() {
        inputs.addRange("y");
        inputs.rangeEnd(1, true, "nothing");
        inputs.remove(0);
        assertEquals("y", project.draft().get().inputs().getFirst().name());
        background.finishAll();
        assertTrue(project.problems().get().stream().noneMatch(p -> p.primary().contains("nothing")));
    }

    @Test
    void percentagesHaveNoFalseDigits() {
        demands.relative("7");
        assertEquals(
                OptionalDouble.of(.07),
                project.draft().get().tolerance().orElseThrow().relative());
        assertEquals("7", demands.relativeText());
        demands.confidence("99.9");
        assertEquals(OptionalDouble.of(.999), project.draft().get().confidence());
        assertEquals("99.9", demands.confidenceText());
    }

    @Test
    void anEmptiedToleranceIsNone() {
        demands.absolute("");
        assertTrue(project.draft().get().tolerance().isEmpty());
        assertEquals("none at 95 %", demands.toleranceSummary());
    }

    @Test
    void constantsAreEditedInTheirRow() {
        int row = constants.add("rho");
        constants.value(row, "1.25");
        constants.unit(row, "kg/m3");
        background.finishAll();
        assertEquals("1.25", constants.valueText(row));
        assertEquals(List.of(), project.problems().get());
        constants.value(row, "");
        assertEquals(
                "Value of rho is empty but must be a number",
                project.problems().get().getFirst().primary());
        constants.remove(row);
        background.finishAll();
        assertEquals(List.of(), project.problems().get());
    }

    @Test
    void anotherProjectStartsItsOwnHistory() {
        inputs.name(0, "z");
        project.replace(Drafts.integral(), java.util.Optional.empty(), DataFiles.NONE);
        assertFalse(project.canUndo().get());
        assertFalse(project.edited().get());
        assertEquals(" from 0 to 2", InputsViewModel.summary(from()));
    }

    private From from() {
        return project.draft().get().inputs().getFirst().from();
    }
}
