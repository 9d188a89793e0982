package dev.leadline.desktop.working;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.leadline.desktop.background.HeldBackground;
import dev.leadline.model.Draft.PairDraft;
import dev.leadline.project.ProjectFile;
import java.util.List;
import java.util.OptionalDouble;
import org.junit.jupiter.api.Test;

class TiedViewModelTest {
    private final HeldBackground background = new HeldBackground();
    private final ProjectViewModel project = new ProjectViewModel(ProjectFile.parse("""
            {"leadline": 1, "inputs": [
              {"name": "x", "density": {"family": "uniform", "from": 0, "to": 1}},
              {"name": "y", "density": {"family": "uniform", "from": 0, "to": 1}},
              {"name": "y1", "density": {"family": "uniform", "from": 0, "to": 1}}],
             "ask": {"mean": "x*y"}}
            """), background);
    private final InputsViewModel inputs = new InputsViewModel(project);
    private final TiedViewModel tied = new TiedViewModel(project);

    private List<PairDraft> pairs() {
        return tied.tied().pairs();
    }

    @Test
    void pairsAreAddedUntilEveryTwoAreOne() {
        assertEquals("all independent", tied.summary());
        tied.add();
        assertEquals(List.of(new PairDraft("x", "y", "spearman", 0)), pairs());
        tied.add();
        tied.add();
        assertFalse(tied.canAdd());
        tied.value(0, "0.4");
        tied.measure(0, "kendall");
        assertEquals(new PairDraft("x", "y", "kendall", .4), pairs().getFirst());
        assertEquals("x and y 0.4 and 2 more", tied.summary());
    }

    @Test
    void withTheLastPairTheDependenceGoes() {
        tied.add();
        tied.copula("student");
        tied.dof("4");
        assertEquals(OptionalDouble.of(4), tied.tied().dof());
        tied.remove(0);
        assertTrue(project.draft().get().dependence().isEmpty());
        project.undo();
        assertEquals("student", tied.tied().copula());
    }

    @Test
    void noOtherCopulaKeepsTheDegreesOfFreedom() {
        tied.add();
        tied.copula("student");
        tied.dof("4");
        tied.copula("gaussian");
        assertTrue(tied.tied().dof().isEmpty());
    }

    /// Typed halfway, y1 is called y like its neighbour.
    @Test
    void pairsFollowANewName() {
        tied.add();
        tied.add();
        for (String typed : new String[] {"y", "", "z"}) {
            inputs.name(2, typed);
        }
        assertEquals(List.of(new PairDraft("x", "y", "spearman", 0), new PairDraft("x", "z", "spearman", 0)), pairs());
        project.undo();
        assertEquals("y1", pairs().getLast().other());
    }

    @Test
    void anInputTakesItsPairsWithIt() {
        tied.add();
        tied.add();
        inputs.remove(1);
        assertEquals(List.of(new PairDraft("x", "y1", "spearman", 0)), pairs());
        inputs.remove(0);
        assertTrue(project.draft().get().dependence().isEmpty());
    }

    /// Spearman's correlation that was asked for is that of the draws.
    @Test
    void whatDrawsAchieveIsSeenWhileTheFoldIsOpen() {
        var achieved = new AchievedViewModel(project, background);
        tied.add();
        tied.value(0, "0.6");
        background.finishAll();
        assertEquals(List.of(), achieved.rows().get());
        achieved.open(true);
        background.finishAll();
        var row = achieved.rows().get().getFirst();
        assertEquals("x, y", row.of());
        assertTrue(row.achieved().matches("0\\.(59|60)\\d* ± 0\\.00\\d+"), row.achieved());
        tied.remove(0);
        background.finishAll();
        assertEquals(List.of(), achieved.rows().get());
    }
}
