package dev.leadline.desktop.lanes;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertInstanceOf;

import dev.leadline.desktop.Drafts;
import dev.leadline.desktop.background.HeldBackground;
import dev.leadline.desktop.lanes.SuggestionViewModel.State;
import dev.leadline.desktop.run.HeldStudies;
import dev.leadline.desktop.run.RunViewModel;
import dev.leadline.desktop.working.ProjectViewModel;
import dev.leadline.model.LaneDraft;
import dev.leadline.study.Suggestion;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;

class SuggestionViewModelTest {
    private static final Suggestion.Row ROW = new Suggestion.Row(
            LaneDraft.of("Z", "antithetic"),
            "antithetic",
            Optional.empty(),
            Optional.empty(),
            Optional.empty(),
            "Invented.");

    private final HeldBackground background = new HeldBackground();
    private final ProjectViewModel project = new ProjectViewModel(Drafts.mean(), background);
    private final LanesViewModel lanes = new LanesViewModel(project, new RunViewModel(new HeldStudies(), background));
    private final List<String> tried = new ArrayList<>();
    private Runnable meanwhile = () -> {};
    private final SuggestionViewModel suggestion = new SuggestionViewModel(
            project,
            lanes,
            (_, listener) -> {
                for (String scheme : List.of("independent", "antithetic")) {
                    listener.accept(scheme);
                    tried.add(scheme);
                    meanwhile.run();
                }
                return new Suggestion(List.of(ROW), ROW, 100);
            },
            background);

    @Test
    void aFoundSchemeBecomesTheNextLane() {
        background.finishAll();
        suggestion.search();
        assertInstanceOf(State.Trying.class, suggestion.state().get());
        background.finishAll();
        var found = assertInstanceOf(State.Found.class, suggestion.state().get());
        suggestion.add(found.suggestion().recommended());
        assertEquals(LaneDraft.of("B", "antithetic"), lanes.lane(1));
        assertEquals("B", lanes.selectedName());
        assertInstanceOf(State.Idle.class, suggestion.state().get());
    }

    @Test
    void aCancelledSearchEndsAtTheNextSchemeAndSaysNothing() {
        background.finishAll();
        meanwhile = suggestion::leave;
        suggestion.search();
        background.finishAll();
        assertEquals(List.of("independent"), tried);
        assertInstanceOf(State.Idle.class, suggestion.state().get());
    }

    @Test
    void aFaultIsTold() {
        background.finishAll();
        meanwhile = () -> {
            throw new IllegalStateException("invented");
        };
        suggestion.search();
        background.finishAll();
        assertInstanceOf(State.Failed.class, suggestion.state().get());
    }

    @Test
    void nothingIsSearchedForAQuestionThatCannotBeRun() {
        project.unread("$.seed", "x", dev.leadline.problem.Problem.of("invented"));
        background.finishAll();
        suggestion.search();
        assertInstanceOf(State.Idle.class, suggestion.state().get());
    }
}
