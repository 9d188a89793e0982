package dev.leadline.desktop.lanes;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.leadline.chart.LaneLook;
import dev.leadline.desktop.Drafts;
import dev.leadline.desktop.background.HeldBackground;
import dev.leadline.desktop.lanes.LanesViewModel.Known;
import dev.leadline.desktop.lanes.LanesViewModel.Source;
import dev.leadline.desktop.lanes.LanesViewModel.Sources;
import dev.leadline.desktop.run.HeldStudies;
import dev.leadline.desktop.run.RunViewModel;
import dev.leadline.desktop.working.ProjectViewModel;
import dev.leadline.model.Draft;
import dev.leadline.model.LaneDraft;
import dev.leadline.model.LaneDraft.Mean;
import dev.leadline.model.Layouts;
import dev.leadline.project.ProjectFile;
import dev.leadline.study.Study;
import java.util.List;
import java.util.Optional;
import java.util.OptionalLong;
import org.junit.jupiter.api.Test;

class LanesViewModelTest {
    private final HeldBackground background = new HeldBackground();
    private final ProjectViewModel project = new ProjectViewModel(Drafts.mean(), background);
    private final HeldStudies studies = new HeldStudies();
    private final RunViewModel run = new RunViewModel(studies, background);
    private final LanesViewModel lanes = new LanesViewModel(project, run);

    /// As the project's file has it, so that what the window edits is what a file holds.
    private static LaneDraft lane(String json) {
        Draft d = ProjectFile.parse("{\"leadline\": 1, \"ask\": {\"mean\": \"1\"}, \"lanes\": [" + json + "]}");
        return d.lanes().getFirst();
    }

    private List<String> problemsAt(String path) {
        background.finishAll();
        return project.problemsAt(path).stream().map(p -> p.primary()).toList();
    }

    @Test
    void aProjectWithoutLanesHasOneOfPlainDraws() {
        assertEquals(List.of(lane("{\"name\": \"A\", \"points\": \"independent\"}")), lanes.lanes());
        assertEquals("A", lanes.selectedName());
        assertTrue(project.draft().get().lanes().isEmpty());
    }

    @Test
    void addsUpToFourUnderFreeNamesAndSpeaksOfTheNewest() {
        lanes.add();
        assertEquals("B", lanes.selectedName());
        lanes.name(1, "D");
        lanes.duplicate(1);
        lanes.add();
        lanes.add();
        assertEquals(
                List.of("A", "D", "B", "C"),
                lanes.lanes().stream().map(LaneDraft::name).toList());
        assertFalse(lanes.canAdd());
    }

    @Test
    void removesALaneAndUndoBringsItBack() {
        lanes.add();
        lanes.points(1, "antithetic");
        lanes.remove(1);
        assertEquals(1, lanes.lanes().size());
        assertEquals("A", lanes.selectedName());
        lanes.remove(0);
        assertEquals(1, lanes.lanes().size());
        project.undo();
        assertEquals("antithetic", lanes.lane(1).points());
        project.redo();
        assertEquals(1, lanes.lanes().size());
    }

    @Test
    void twoLanesOfOneNameAreToldAtIt() {
        lanes.add();
        lanes.name(1, "A");
        assertEquals(List.of("two lanes are called A"), problemsAt("$.lanes[1].name"));
    }

    @Test
    void aLayoutKeepsWhatItTakes() {
        lanes.points(0, "scrambled-sobol");
        lanes.count(0, "replicates", "32");
        lanes.scrambling(0, "digital-shift");
        assertEquals(
                lane("{\"name\": \"A\", \"points\": \"scrambled-sobol\", \"replicates\": 32,"
                        + " \"scrambling\": \"digital-shift\"}"),
                lanes.lane(0));
        lanes.points(0, "shifted-lattice");
        assertEquals(lane("{\"name\": \"A\", \"points\": \"shifted-lattice\", \"replicates\": 32}"), lanes.lane(0));
        lanes.points(0, "stratified");
        lanes.cells(0, "x", "64");
        assertEquals(lane("{\"name\": \"A\", \"points\": \"stratified\", \"cells\": {\"x\": 64}}"), lanes.lane(0));
        lanes.allocation(0, "neyman");
        assertEquals("neyman", lanes.allocationWord(0));
        assertEquals(
                lane("{\"name\": \"A\", \"points\": \"stratified\", \"cells\": {\"x\": 64},"
                        + " \"allocation\": \"neyman\"}"),
                lanes.lane(0));
        lanes.allocation(0, "equal");
        assertEquals("equal", lanes.allocationWord(0));
        lanes.cells(0, "x", "");
        assertEquals(lane("{\"name\": \"A\", \"points\": \"stratified\"}"), lanes.lane(0));
    }

    @Test
    void whatCannotBeReadIsToldAtItsField() {
        lanes.points(0, "scrambled-sobol");
        lanes.count(0, "replicates", "16.5");
        assertEquals(
                List.of("replicates of lane A is 16.5 but must be a whole number"),
                problemsAt("$.lanes[0].replicates"));
        assertEquals("16.5", lanes.countText(0, "replicates"));
        lanes.count(0, "replicates", "4");
        assertEquals(List.of("replicates is 4 but must be from 10 to 10000"), problemsAt("$.lanes[0].replicates"));
        assertEquals(OptionalLong.of(4), lanes.lane(0).settings().replicates());
        lanes.points(0, "independent");
        assertEquals(List.of(), problemsAt("$.lanes"));
    }

    /// The audit goes with the last density to audit.
    @Test
    void auditsWhatIsDrawnFromElsewhere() {
        assertFalse(lanes.isAuditable(0));
        lanes.source(0, "x", Source.SHIFT);
        lanes.audit(0, "50000");
        assertEquals(OptionalLong.of(50_000), lanes.lane(0).audit());
        lanes.audit(0, "5");
        assertEquals(List.of("audit is 5 but must be from 1000 to 10000000000000"), problemsAt("$.lanes[0].audit"));
        lanes.source(0, "x", Source.OWN);
        assertEquals(lane("{\"name\": \"A\", \"points\": \"independent\"}"), lanes.lane(0));
    }

    @Test
    void drawsAnInputFromElsewhere() {
        lanes.source(0, "x", Source.ANOTHER);
        assertEquals(
                lane("{\"name\": \"A\", \"points\": \"independent\", \"drawFrom\":"
                        + " {\"x\": {\"family\": \"uniform\", \"from\": 0, \"to\": 1}}}"),
                lanes.lane(0));
        lanes.source(0, "x", Source.SHIFT);
        lanes.amount(0, "x", "0.5");
        lanes.nominalShare(0, "0.2");
        assertEquals(
                lane("{\"name\": \"A\", \"points\": \"independent\", \"drawFrom\": {\"x\": {\"shift\": 0.5}},"
                        + " \"nominalShare\": 0.2}"),
                lanes.lane(0));
        assertEquals("0.5", lanes.amountText(0, "x"));
        lanes.source(0, "x", Source.OWN);
        assertEquals(lane("{\"name\": \"A\", \"points\": \"independent\"}"), lanes.lane(0));
        lanes.sources(0, Sources.GRID);
        assertEquals(
                lane("{\"name\": \"A\", \"points\": \"independent\", \"drawFrom\": {\"adapt\": \"grid\"}}"),
                lanes.lane(0));
        assertEquals(Sources.GRID, lanes.sources(0));
    }

    @Test
    void controlVariatesAreEditedAndToldAtTheirField() {
        lanes.addControl(0);
        assertEquals(
                lane("{\"name\": \"A\", \"points\": \"independent\","
                        + " \"controlVariates\": [{\"formula\": \"x\", \"mean\": \"exact\"}]}"),
                lanes.lane(0));
        lanes.controlFormula(0, 0, "x^");
        assertFalse(problemsAt("$.lanes[0].controlVariates[0]").isEmpty());
        lanes.controlFormula(0, 0, "x^2");
        lanes.controlMean(0, 0, Known.STATED);
        lanes.controlValue(0, 0, "0.3333");
        assertEquals(new Mean.Stated(.3333), lanes.lane(0).controls().getFirst().mean());
        lanes.removeControl(0, 0);
        assertEquals(List.of(), lanes.lane(0).controls());
    }

    @Test
    void everyLayoutSaysWhenItHelps() {
        for (String word : Layouts.words()) {
            assertFalse(PointsUse.of(word).isEmpty(), word);
        }
    }

    @Test
    void everyWayToSampleCanBeRunAsItIsChosen() {
        for (String word : Layouts.words()) {
            if (!word.equals("splitting")) { // takes probabilities only
                lanes.points(0, word);
                assertEquals(List.of(), problemsAt("$"), word);
            }
        }
    }

    @Test
    void rowsAreThoseOfTheProjectWithWhatTheRunShows() throws InterruptedException {
        lanes.add();
        lanes.points(1, "antithetic");
        background.finishAll();
        var before = LaneRows.of(lanes.lanes(), Optional.empty());
        assertEquals(List.of("A", "B"), before.stream().map(LaneRows.Row::name).toList());
        assertEquals("not run yet", before.getFirst().why());
        run.start(project.draft().get(), project.files());
        background.finishAll();
        try (var study = Study.start(studies.project.question(), studies.project.plan(), 1, _ -> {})) {
            studies.listener.accept(study.await());
        }
        background.finishAll();
        var shown = RunViewModel.shown(run.state().get());
        var rows = LaneRows.of(lanes.lanes(), shown);
        assertEquals("antithetic", rows.get(1).scheme());
        assertEquals("20,000", rows.get(1).draws());
        assertEquals(LaneLook.SECOND, rows.get(1).look());
        assertEquals("met", rows.getFirst().left());
        assertEquals(1, lanes.comparisons().size());
        lanes.remove(0);
        lanes.add();
        rows = LaneRows.of(lanes.lanes(), shown);
        assertEquals(List.of("B", "A"), rows.stream().map(LaneRows.Row::name).toList());
        assertEquals(LaneLook.SECOND, rows.getFirst().look());
        lanes.points(0, "stratified");
        assertTrue(LaneRows.of(lanes.lanes(), shown).getFirst().why().startsWith("edited since; "));
    }
}
