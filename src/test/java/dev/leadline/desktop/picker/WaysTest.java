package dev.leadline.desktop.picker;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.leadline.density.Knowledge;
import dev.leadline.desktop.Drafts;
import dev.leadline.desktop.background.HeldBackground;
import dev.leadline.desktop.working.InputsViewModel;
import dev.leadline.desktop.working.ProjectViewModel;
import dev.leadline.model.DataColumn;
import dev.leadline.model.DataFiles;
import dev.leadline.model.DensityDraft.Column;
import dev.leadline.model.DensityDraft.Ends;
import dev.leadline.model.DensityDraft.Mixture;
import dev.leadline.model.DensityDraft.Values;
import dev.leadline.model.DensityWords;
import dev.leadline.project.ProjectFile;
import java.nio.file.Path;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;

/// Every way to say what a density is edits the draft, and only where it says something whole.
class WaysTest {
    private final HeldBackground background = new HeldBackground();
    private final ProjectViewModel project = new ProjectViewModel(Drafts.mean(), background);
    private final DensityAt at = DensityAt.input(project, 0);

    private String words() {
        return DensityWords.of(at.now());
    }

    private String provenance() {
        return project.draft().get().inputs().getFirst().provenance();
    }

    /// JCGM 101:2008, table 1: of limits alone follows the rectangular density.
    @Test
    void whatIsKnownGivesDensityAndProvenanceAsOneEdit() {
        var known = new KnownViewModel(Knowledge.named("limits"), at);
        known.type("low", "3");
        assertEquals("uniform(0, 1)", words());
        known.type("high", "8");
        known.type("high", "81");
        assertEquals("uniform(3, 81)", words());
        assertTrue(provenance().contains("3") && provenance().contains("81"), provenance());
        project.undo();
        assertEquals("uniform(0, 1)", words());
        assertEquals("", provenance());
    }

    @Test
    void whatIsKnownWronglyIsToldAndChangesNothing() {
        var known = new KnownViewModel(Knowledge.named("limits"), at);
        known.type("low", "3");
        known.type("high", "3x");
        assertTrue(known.isFaulty("high"));
        assertFalse(known.isFaulty("low"));
        known.type("high", "2");
        assertFalse(project.problemsAt(at.path()).isEmpty());
        assertEquals("uniform(0, 1)", words());
        known.type("high", "");
        background.finishAll();
        assertEquals(List.of(), project.problems().get());
    }

    @Test
    void whatWasKnownAndIsNoNumberAnyMoreStandsAgainstARun() {
        var known = new KnownViewModel(Knowledge.named("limits"), at);
        known.type("low", "3");
        known.type("high", "8");
        project.settle();
        known.type("high", "5");
        known.type("high", "5,");
        known.type("high", "5,5");
        background.finishAll();
        assertEquals("5,5", known.text("high"));
        assertEquals("uniform(3, 8)", words());
        assertTrue(project.sound().isEmpty());
        assertTrue(
                project.problems().get().getFirst().primary().endsWith("is \u201c5,5\u201d but must be a number"),
                project.problems().get().toString());
        known.type("high", "");
        assertTrue(known.isFaulty("high"));
        known.type("high", "5.5");
        background.finishAll();
        assertEquals("uniform(3, 5.5)", words());
        assertTrue(project.sound().isPresent());
    }

    @Test
    void whatIsUndoneNoLongerStandsInTheFields() {
        var known = new KnownViewModel(Knowledge.named("limits"), at);
        known.type("low", "3");
        known.type("high", "8");
        known.follow();
        assertEquals("8", known.text("high"));
        project.undo();
        known.follow();
        assertEquals("", known.text("high"));
        assertEquals(
                "The density follows once all of it is told; until then it stays uniform(0, 1).", known.sentence());
    }

    @Test
    void aSentenceThatWasMadeGoesWithItsDensity() {
        new KnownViewModel(Knowledge.named("chance"), at).type("probability", "0.03");
        assertTrue(provenance().contains("0.03"), provenance());
        new ChangesViewModel(at).shift("1");
        assertTrue(provenance().contains("0.03"), provenance());
        new MemberViewModel(at).family("poisson");
        assertEquals("", provenance());
        project.undo();
        assertTrue(provenance().contains("0.03"), provenance());
        new InputsViewModel(project).provenance(0, "by hand");
        new MemberViewModel(at).family("poisson");
        assertEquals("by hand", provenance());
    }

    @Test
    void everyKnowledgeIsAWay() {
        assertEquals(
                Knowledge.all().size() + Way.Given.values().length, Way.all().size());
    }

    @Test
    void cutFactorAndShift() {
        var changes = new ChangesViewModel(at);
        changes.scale("2");
        changes.shift("-3");
        changes.high("0.5");
        assertEquals("2 uniform(0, 1) - 3 cut to -\u221e to 0.5", words());
        assertEquals(
                Optional.of(new Ends(Double.NEGATIVE_INFINITY, .5)), at.now().truncate());
        changes.high("");
        changes.scale("");
        changes.shift("");
        assertEquals("uniform(0, 1)", words());
    }

    /// A file says `scale` once: for the gamma family it is a parameter.
    @Test
    void aFamilyWithAScaleOfItsOwnTakesNoOther() {
        var changes = new ChangesViewModel(at);
        changes.scale("2");
        new MemberViewModel(at).family("gamma");
        assertTrue(changes.isTaken("scale"));
        assertTrue(at.now().scale().isEmpty());
    }

    @Test
    void aDensityIsSplitIntoParts() {
        var mixture = new MixtureViewModel(at);
        assertFalse(mixture.isMixture());
        mixture.split();
        mixture.weight(1, "0.3");
        var second = new MemberViewModel(mixture.part(1));
        second.family("normal");
        second.parameter("mean", "4");
        second.parameter("sd", "1");
        var parts = ((Mixture) at.now().of()).parts();
        assertEquals("uniform(0, 1)", DensityWords.of(parts.getFirst().density()));
        assertEquals("normal(4, 1)", DensityWords.of(parts.getLast().density()));
        assertEquals(.3, parts.getLast().weight());
        mixture.add();
        mixture.remove(1);
        assertEquals(2, mixture.parts().size());
        assertTrue(mixture.parts().getLast().density().isUnchosen());
    }

    @Test
    void aFormulaIsTyped() {
        var typed = new TypedViewModel(at);
        assertFalse(typed.isTyped());
        typed.formula("exp(-abs(x))");
        typed.from("-4");
        typed.breaks("-1 0.5; 2");
        var now = typed.typed();
        assertEquals(-4, now.from());
        assertEquals(List.of(-1.0, .5, 2.0), now.breaks());
        typed.breaks("-1 half");
        assertEquals("-1 half", typed.breaksText());
        assertEquals(List.of(-1.0, .5, 2.0), typed.typed().breaks());
        assertTrue(typed.isFaulty("breaks"));
    }

    @Test
    void valuesAreLinesOfTwoNumbers() {
        var values = new ValuesViewModel(at);
        values.type("0 0.5\n1\t0.3\n\n2; 0.2");
        assertEquals(
                new Values(List.of(0.0, 1.0, 2.0), List.of(.5, .3, .2)),
                at.now().of());
        assertEquals("1 in all", values.sum());
        assertTrue(values.says("0 .5\n1 .30\n2 0.2\n"));
        values.type("0 0.5\n1");
        assertEquals("0 0.5\n1", values.text());
        assertEquals(3, ((Values) at.now().of()).values().size());
        assertEquals(
                "line 2 is \u201c1\u201d but must be a value and its probability",
                project.unreadFields().getFirst().primary());
    }

    @Test
    void dataLieBelowTheProject() {
        var data = new DataViewModel(at, background);
        data.choose(Path.of("/elsewhere/waits.csv"));
        assertEquals(
                "the project has no folder yet",
                project.unreadFields().getFirst().primary());
        project.savedAs(Path.of("/harbour/quay/quay.leadline"), project.draft().get());
        data.choose(Path.of("/harbour/quay-two/waits.csv"));
        assertTrue(project.unreadFields().getFirst().primary().contains("outside the folder"));
        data.choose(Path.of("/harbour/quay/measured/waits.csv"));
        assertEquals(List.of(), project.unreadFields());
        assertEquals("measured/waits.csv", data.data().file());
        data.column("3");
        assertEquals(new Column.At(3), data.data().column());
        data.column("hours");
        assertEquals(new Column.Named("hours"), data.data().column());
        data.kind("kernel");
        data.bandwidth("0.5");
        data.kind("empirical");
        assertTrue(data.data().bandwidth().isEmpty());
    }

    @Test
    void aDensityOfAnyWayIsWrittenAndReadAgain() {
        new MixtureViewModel(at).split();
        new MemberViewModel(at.part(1)).family("gamma");
        new MemberViewModel(at.part(1)).parameter("shape", "2");
        new ChangesViewModel(at).scale("3");
        new ChangesViewModel(at).low("0");
        var draft = project.draft().get();
        assertEquals(draft, ProjectFile.parse(ProjectFile.format(draft)));
    }

    /// Normal densities fitted to -1, 0 and 1: mean 0, variance 2/3 by maximum likelihood.
    @Test
    void aFitIsDrawnFromInPlaceOfTheData() {
        DataFiles files = (file, column) -> new DataColumn("", List.of(-1.0, 0.0, 1.0), List.of(), "");
        project.replace(Drafts.mean(), Optional.of(Path.of("/harbour/quay/quay.leadline")), files);
        var data = new DataViewModel(at, background);
        data.file("waits.csv");
        data.kind("kernel");
        data.fit();
        background.finishAll();
        var fits = ((DataViewModel.State.Fitted) data.fits().get()).fits();
        var normal = fits.fits().stream()
                .filter(fit -> fit.family().equals("normal"))
                .findFirst()
                .orElseThrow();
        data.use(normal);
        var kept = data.data().fitted().orElseThrow();
        assertEquals(0, kept.parameters().get("mean"), 1e-12);
        assertEquals(Math.sqrt(2 / 3.), kept.parameters().get("sd"), 1e-12);
        assertTrue(data.data().kind().isEmpty());
        assertEquals("normal fitted to 3 values of waits.csv by maximum likelihood", provenance());
        data.unfit();
        assertTrue(data.data().fitted().isEmpty());
        data.use(normal);
        data.column("2");
        assertTrue(data.data().fitted().isEmpty(), "fitted to another column");
        assertEquals(new DataViewModel.State.Unasked(), data.fits().get());
    }
}
