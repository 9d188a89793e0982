package dev.leadline.desktop.picker;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.leadline.desktop.Drafts;
import dev.leadline.desktop.background.HeldBackground;
import dev.leadline.desktop.working.ProjectViewModel;
import dev.leadline.model.DensityWords;
import java.util.List;
import java.util.Map;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;

class MemberViewModelTest {
    private final HeldBackground background = new HeldBackground();
    private final ProjectViewModel project = new ProjectViewModel(Drafts.mean(), background);
    private final DensityAt at = DensityAt.input(project, 0);
    private final MemberViewModel member = new MemberViewModel(at);

    @BeforeEach
    void check() {
        background.finishAll();
    }

    private Map<String, Double> parameters() {
        return at.now().member().orElseThrow().parameters();
    }

    @Test
    void aTextThatIsNoNumberKeepsTheOneBeforeItAndStandsAgainstARun() {
        for (String typed : List.of("5", "5,", "5,5")) {
            member.parameter("to", typed);
        }
        background.finishAll();
        assertEquals("5,5", member.parameterText("to"));
        assertEquals(1.0, parameters().get("to"));
        assertTrue(project.sound().isEmpty());
        assertEquals(
                "To of x is \u201c5,5\u201d but must be a number",
                project.problems().get().getFirst().primary());
        member.parameter("to", "2.5");
        background.finishAll();
        assertEquals(List.of(), project.problems().get());
        assertEquals(2.5, parameters().get("to"));
    }

    @Test
    void anEmptyParameterIsMissingNotZero() {
        member.parameter("to", "");
        background.finishAll();
        assertEquals(List.of("from"), List.copyOf(parameters().keySet()));
        assertTrue(member.isFaulty("to"));
        assertFalse(member.isFaulty("from"));
    }

    @Test
    void anotherFamilyKeepsParametersOfTheSameName() {
        member.family("triangular");
        assertEquals(List.of("from", "to"), List.copyOf(parameters().keySet()));
        member.parameter("mode", "0.5");
        assertEquals(List.of("from", "mode", "to"), List.copyOf(parameters().keySet()));
        assertEquals("triangular(0, 0.5, 1)", DensityWords.of(at.now()));
        background.finishAll();
        assertEquals(List.of(), project.problems().get());
        project.undo();
        project.undo();
        assertEquals("uniform(0, 1)", DensityWords.of(at.now()));
    }

    @Test
    void anotherWayOfEntryIsRememberedBeforeItHasNumbers() {
        member.family("lognormal");
        assertEquals(0, member.entry());
        member.entry(1);
        assertEquals(1, member.entry());
        member.parameter("mean", "3");
        member.parameter("sd", "1");
        background.finishAll();
        assertEquals(1, member.entry());
        assertEquals(List.of(), project.problems().get());
    }
}
