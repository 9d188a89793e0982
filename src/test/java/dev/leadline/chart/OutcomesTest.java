package dev.leadline.chart;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.leadline.density.Portrait.Bar;
import dev.leadline.model.Project;
import dev.leadline.project.ProjectFile;
import dev.leadline.study.LaneState;
import dev.leadline.study.Study;
import dev.leadline.trace.Trace;
import java.awt.Color;
import java.util.List;
import org.junit.jupiter.api.Test;

class OutcomesTest {
    private static final String UNIFORM = "{\"family\": \"uniform\", \"from\": 0, \"to\": 1}";

    private record Run(Project project, List<Trace> traces) {
        Outcomes outcomes() {
            return Outcomes.of(project.question(), project.plan(), traces);
        }

        Outcomes.Lying lane() {
            return outcomes().lanes().getFirst();
        }

        long seen() {
            return traces.getFirst().outcomes().getFirst().histogram().draws();
        }
    }

    private static Run run(String density, String ask, int draws) throws InterruptedException {
        var project = Project.of(ProjectFile.parse("""
            {"leadline": 1, "inputs": [{"name": "x", "density": %s}], "ask": {%s},
             "stop": {"rule": "fixed", "draws": %d}, "seed": 5}
            """.formatted(density, ask, draws)));
        try (var study = Study.start(project.question(), project.plan(), 1, _ -> {})) {
            return new Run(
                    project,
                    study.await().lanes().stream().map(LaneState::trace).toList());
        }
    }

    private static Picture picture(Outcomes outcomes) {
        return Picture.of(outcomes, View.FOLLOWING, Theme.LIGHT, 900, 520);
    }

    private static double total(Outcomes.Lying lane) {
        return lane.below()
                + lane.above()
                + lane.bars().stream().mapToDouble(Bar::chance).sum();
    }

    /// Of a uniform density each bar holds its own length, within five standard errors of the draws seen.
    @Test
    void barsHoldTheSharesOfTheOutcomes() throws InterruptedException {
        var run = run(UNIFORM, "\"mean\": \"x\"", 100_000);
        var lane = run.lane();
        assertFalse(lane.discrete());
        assertEquals(1, total(lane), 1e-12);
        for (var bar : lane.bars()) {
            double length = bar.to() - bar.from();
            assertEquals(length, bar.chance(), 5 * Math.sqrt(length / run.seen()));
        }
        var reading = picture(run.outcomes()).at(450, 300).orElseThrow().text();
        assertTrue(reading.contains(" % of the outcomes from 0."), reading);
    }

    /// Poisson's probability of 4 at a mean of 4: exp(-4) 4^4 / 4! = .1953668.
    @Test
    void wholeNumbersAreBars() throws InterruptedException {
        var run = run("{\"family\": \"poisson\", \"mean\": 4}", "\"quantile\": \"x\", \"at\": 0.9", 100_000);
        var lane = run.lane();
        assertTrue(lane.discrete());
        lane.bars().forEach(bar -> assertEquals(Math.rint(bar.from()), bar.from()));
        double four = lane.bars().stream()
                .filter(bar -> bar.from() == 4)
                .findFirst()
                .orElseThrow()
                .chance();
        assertEquals(.1953668, four, 5 * Math.sqrt(.1953668 * .8046332 / run.seen()));
        assertTrue(picture(run.outcomes()).image(1).getWidth() == 900);
    }

    @Test
    void anEventIsTwoBarsOfItsChance() throws InterruptedException {
        var run = run(UNIFORM, "\"probability\": \"x > 0.9\"", 10_000);
        double chance = run.traces()
                .getFirst()
                .last()
                .orElseThrow()
                .answers()
                .getFirst()
                .estimate();
        assertEquals(
                List.of(new Bar(0, 0, 1 - chance), new Bar(1, 1, chance)),
                run.lane().bars());
        assertTrue(picture(run.outcomes()).remarks().getFirst().startsWith("lane A: happens in "));
    }

    /// Of a generalised Pareto density of shape 1.5 one outcome in a thousand is above 21,000: the picture shows
    /// most of them and tells how many lie beyond.
    @Test
    void aHeavyTailIsToldNotDrawn() throws InterruptedException {
        var run = run(
                "{\"family\": \"generalized-pareto\", \"location\": 0, \"scale\": 1, \"shape\": 1.5}",
                "\"mean\": \"x\"",
                100_000);
        assertEquals(1, total(run.lane()), 1e-12);
        assertTrue(
                run.lane().above() > 5e-4 && run.lane().above() < .01,
                "above " + run.lane().above());
        String remark = picture(run.outcomes()).remarks().getFirst();
        assertTrue(remark.contains("% right of "), remark);
    }

    /// 95 % of a uniform density lie in any interval of length .95; the interval of its mean is short beside that.
    @Test
    void coverageIntervalsHaveAColourOfTheirOwn() throws InterruptedException {
        var outcomes = run(UNIFORM, "\"distribution\": \"x\", \"unit\": \"mm\"", 100_000)
                .outcomes();
        var coverage = outcomes.covered()
                .orElseThrow()
                .answer()
                .orElseThrow()
                .coverage()
                .orElseThrow();
        assertEquals(.025, coverage.symmetricLow(), .004);
        assertEquals(.95, coverage.shortestHigh() - coverage.shortestLow(), .004);
        var picture = picture(outcomes);
        var image = picture.image(1);
        int rows = 0;
        int x = (int) Math.round((picture.xOf(.3)));
        for (int y = (int) picture.plot().getMinY(); y < picture.plot().getMaxY(); y++) {
            if (near(new Color(image.getRGB(x, y)), Theme.LIGHT.coverage())) {
                rows++;
            }
        }
        assertTrue(rows >= 2 && rows <= 6, rows + " rows of the colour of the brackets");
        assertTrue(outcomes.caption().contains("no intervals of the mean"));
    }

    private static boolean near(Color a, Color b) {
        return Math.abs(a.getRed() - b.getRed())
                        + Math.abs(a.getGreen() - b.getGreen())
                        + Math.abs(a.getBlue() - b.getBlue())
                < 60;
    }

    @Test
    void aRatioIsNoPlaceAmongOutcomes() throws InterruptedException {
        var outcomes = run(UNIFORM, "\"ratio\": [\"x\", \"1 + x\"]", 1000).outcomes();
        assertFalse(Outcomes.isOnScale(outcomes.estimand()));
        assertTrue(picture(outcomes).remarks().getFirst().contains("first formula"));
    }

    @Test
    void beforeTheFirstDrawThereIsAnEmptyPicture() throws InterruptedException {
        var run = run(UNIFORM, "\"mean\": \"x\"", 1000);
        var empty = Outcomes.of(run.project().question(), run.project().plan(), List.of());
        assertEquals(List.of("no draws yet"), picture(empty).remarks());
        picture(empty).image(1);
    }
}
