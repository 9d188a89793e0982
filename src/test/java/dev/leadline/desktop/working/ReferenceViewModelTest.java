package dev.leadline.desktop.working;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.leadline.desktop.background.HeldBackground;
import dev.leadline.desktop.working.ReferenceViewModel.Kind;
import dev.leadline.model.Draft.ReferenceDraft;
import dev.leadline.project.ProjectFile;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import org.junit.jupiter.api.Test;

class ReferenceViewModelTest {
    private final HeldBackground background = new HeldBackground();
    private final ProjectViewModel project = new ProjectViewModel(ProjectFile.parse("""
            {"leadline": 1, "inputs": [{"name": "x", "density": {"family": "uniform", "from": 0, "to": 1}}],
             "ask": {"mean": "x^2", "unit": "m2"}}
            """), background);
    private final ReferenceViewModel reference = new ReferenceViewModel(project, background);

    private Optional<ReferenceDraft> draft() {
        return project.draft().get().reference();
    }

    @Test
    void aReferenceLeftEmptyIsNone() {
        assertEquals("none", reference.summary());
        reference.value("1");
        reference.error("0.001");
        reference.source("by hand");
        background.finishAll();
        assertEquals(List.of(), project.problems().get());
        assertEquals(new ReferenceDraft.Value(1, OptionalDouble.of(.001), "by hand"), draft().orElseThrow());
        assertEquals("1", reference.summary());
        reference.value("");
        assertTrue(draft().isEmpty());
    }

    @Test
    void aClosedFormIsReadAndSaysWhatItGives() {
        reference.kind(Kind.FORMULA);
        assertTrue(draft().isEmpty());
        assertEquals(Kind.FORMULA, reference.kind());
        reference.formula("1/3");
        background.finishAll();
        assertEquals("= 0.33333333333333330 ± 0.00000000000000030 m², in closed form", reference.formulaValue());
        reference.formula("1/x");
        background.finishAll();
        assertEquals("", reference.formulaValue());
        assertEquals(
                "the reference reads x, which is drawn at random",
                project.problemsAt("$.reference.formula").getFirst().primary());
        reference.formula("");
        background.finishAll();
        assertEquals(List.of(), project.problems().get());
        assertEquals(Kind.FORMULA, reference.kind());
    }

    @Test
    void quadratureShowsItsValueWithItsBoundForTheQuestionThatItWasAskedOf() {
        reference.kind(Kind.QUADRATURE);
        assertFalse(reference.canSeek());
        background.finishAll();
        assertTrue(reference.canSeek());
        assertEquals("by quadrature", reference.summary());
        reference.seek();
        assertTrue(reference.seeking().get());
        assertEquals("", reference.found().get());
        background.finishAll();
        String found = reference.found().get();
        assertTrue(
                found.matches("0\\.3333333333\\d+ ± 0\\.0000000000\\d+ m², by quadrature: the error is a bound,"
                        + " from [\\d,]+ evaluations"),
                found);
        assertFalse(reference.seeking().get());
        project.edit("title", d -> Edits.asking("mean"));
        assertEquals("", reference.found().get());
    }

    /// What one looked for before an edit is not shown beside another question.
    @Test
    void anEditEndsTheSearch() {
        reference.kind(Kind.QUADRATURE);
        background.finishAll();
        reference.seek();
        reference.kind(Kind.VALUE);
        assertTrue(draft().isEmpty());
        background.finishAll();
        assertEquals("", reference.found().get());
        project.undo();
        assertEquals(Kind.QUADRATURE, reference.kind());
    }
}
