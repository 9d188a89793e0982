package dev.leadline.study;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertNotEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.leadline.engine.Questions;
import dev.leadline.engine.Timing;
import dev.leadline.estimate.Logarithm;
import dev.leadline.interval.Ratio;
import dev.leadline.model.LaneDraft;
import dev.leadline.model.LaneDraft.DrawFrom;
import dev.leadline.model.LaneDraft.Other;
import dev.leadline.model.Project;
import dev.leadline.project.ProjectFile;
import dev.leadline.study.candidate.Candidate;
import dev.leadline.study.candidate.Candidates;
import dev.leadline.study.candidate.Offer;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import java.util.stream.Collectors;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Test;

/// Each scheme is recommended for a question that it is made for, and plain draws for one that none helps.
class SuggestionTest {
    private static final long DRAWS = 32_768;

    /// Draws of all schemes take as long here: what machines are busy with must not decide a test.
    private static final Pilots.Clock EVEN = (_, _, _) -> {
        var same = new Logarithm(0, 1e-6, 30);
        return new Timing(same, same, same);
    };

    private static final String NORMAL = "{\"family\": \"normal\", \"mean\": 0, \"sd\": 1}";

    /// @param density of each of the inputs `x1`, `x2` …
    private static Project project(int inputs, String density, String ask) {
        String rows = IntStream.rangeClosed(1, inputs)
                .mapToObj(i -> "{\"name\": \"x%d\", \"density\": %s}".formatted(i, density))
                .collect(Collectors.joining(","));
        return Project.of(ProjectFile.parse("""
                {"leadline": 1, "inputs": [%s], "ask": %s, "seed": 5, "lanes": [{"name": "A", "points": "independent"}]}
                """.formatted(rows, ask)));
    }

    private static Suggestion suggested(int normals, String formula) throws InterruptedException {
        return suggested(project(normals, NORMAL, "{\"mean\": \"%s\"}".formatted(formula)));
    }

    private static Suggestion suggested(Project project) throws InterruptedException {
        return Suggestion.of(project, 5, DRAWS, 1, _ -> {}, Candidates.ALL, EVEN);
    }

    private static LaneDraft recommended(Suggestion suggestion) {
        var row = suggestion.recommended();
        assertEquals(row, suggestion.rows().getFirst());
        assertTrue(row.efficiencyRatio().orElseThrow().low() >= 1, row::toString);
        assertEquals("B", row.lane().name());
        return row.lane();
    }

    /// All but a hundredth changes its sign with the inputs.
    @Test
    void antitheticPoints() throws InterruptedException {
        var lane = recommended(suggested(7, "x1*x2*x3*x4*x5*x6*x7 + 0.02*sin(x1*x2)"));
        assertEquals("antithetic", lane.points());
    }

    private static final Project HALVES = project(2, NORMAL, "{\"mean\": \"if(x1*x2 > 0, 1, -1)*(2 + cos(x1))\"}");

    private static final Project SQUARES =
            project(10, NORMAL, "{\"mean\": \"x1^2+x2^2+x3^2+x4^2+x5^2+x6^2+x7^2+x8^2+x9^2+x10^2\"}");

    /// Of all candidates those whose words hold none of these.
    private static Suggestion without(Project project, String... words) throws InterruptedException {
        List<Candidate> some = Candidates.ALL.stream()
                .filter(candidate -> Arrays.stream(words)
                        .noneMatch(word -> candidate.toString().contains(word)))
                .toList();
        return Suggestion.of(project, 5, DRAWS, 1, _ -> {}, some, EVEN);
    }

    /// Two quarters of the plane are worth something else than the others, and no input tells by itself.
    @Test
    void scrambledSobolPoints() throws InterruptedException {
        assertEquals("scrambled-sobol", recommended(suggested(HALVES)).points());
    }

    @Test
    void stratifiedPointsWhereNoFinerOnesAreTried() throws InterruptedException {
        assertEquals("stratified", recommended(without(HALVES, "sobol")).points());
    }

    /// All that varies lies in a fifteenth of the range of an input, in waves too short for any layout of points.
    @Test
    void stratifiedPointsWithSharedDrawsWhereNoOtherDensitiesAreTried() throws InterruptedException {
        var corner = project(2, NORMAL, "{\"mean\": \"if(x1 > 1.5, 1 + sin(9000*x2), 0)\"}");
        var lane = recommended(without(corner, "Adapted", "Shifted", "Tilted", "Widened"));
        assertEquals("stratified", lane.points());
        assertEquals(Optional.of("neyman"), lane.settings().allocation());
    }

    /// What adds up input by input.
    @Test
    void shiftedLattices() throws InterruptedException {
        assertEquals("shifted-lattice", recommended(without(SQUARES, "sobol")).points());
    }

    @Test
    void latinHypercubesWhereNoFinerPointsAreTried() throws InterruptedException {
        assertEquals(
                "latin-hypercube",
                recommended(without(SQUARES, "sobol", "lattice")).points());
    }

    /// A straight line, and waves too short for any layout of so few points, which are even besides.
    @Test
    void controlVariates() throws InterruptedException {
        var lane = recommended(suggested(1, "3*x1 + cos(40000*x1)"));
        assertEquals("independent", lane.points());
        assertEquals(1, lane.controls().size());
    }

    @Test
    void plainDraws() throws InterruptedException {
        var suggestion = suggested(8, "cos(9*(x1+x2+x3+x4+x5+x6+x7+x8))");
        assertEquals(LaneDraft.of("B", "independent"), recommended(suggestion));
        assertEquals(Ratio.ONE, suggestion.recommended().efficiencyRatio().orElseThrow());
        assertTrue(suggestion.rows().size() >= 5);
        assertTrue(
                suggestion.rows().stream().anyMatch(row -> row.reason().equals("Loses here.")), suggestion::toString);
    }

    /// A scheme that is plain draws itself is preferred to them in one of forty, as its limits say.
    @Test
    void recommendsNothingForChance() throws InterruptedException {
        var project = project(1, "{\"family\": \"uniform\", \"from\": 0, \"to\": 1}", "{\"mean\": \"exp(x1)\"}");
        Candidate same = (_, _) -> List.of(new Offer(LaneDraft.of("", "independent"), "chance"));
        int wrong = 0;
        for (int seed = 0; seed < 20; seed++) {
            var suggestion = Suggestion.of(project, seed, 8_192, 1, _ -> {}, List.of(same), EVEN);
            wrong += suggestion.recommended().reason().startsWith("Chance") ? 1 : 0;
        }
        int seen = wrong;
        assertTrue(seen <= 3, () -> seen + " of 20");
    }

    /// The draws of a pilot are none of a run.
    @Test
    void pilotsDrawNumbersOfTheirOwn() throws InterruptedException {
        var project = project(1, "{\"family\": \"uniform\", \"from\": 0, \"to\": 1}", "{\"mean\": \"exp(x1)\"}");
        try (var pilots = new Pilots(project, 5, 1_000, 1, EVEN);
                var study = Study.start(project.question(), Questions.plan(1_000, 5), 1, _ -> {})) {
            var pilot = pilots.run(LaneDraft.of("A", "independent"), "A").orElseThrow();
            assertNotEquals(
                    study.await().lanes().getFirst().trace().total().mean(0),
                    pilot.trace().total().mean(0));
        }
    }

    @Test
    void everyLayoutIsTried() {
        for (String word : Project.layouts()) {
            assertTrue(
                    word.equals("independent")
                            || Candidates.ALL.stream()
                                    .anyMatch(candidate -> candidate.toString().contains(word)),
                    word);
        }
    }

    /// The chance of a far corner, 4.4e-6 (the tail of a normal sum, by scipy): plain draws of a pilot see none.
    private static final Project CORNER = project(3, NORMAL, "{\"probability\": \"x1 + x2 + x3 > 7.7\"}");

    private static LaneDraft gainsHundredfold(Suggestion suggestion) {
        var lane = recommended(suggestion);
        assertTrue(suggestion.recommended().efficiencyRatio().orElseThrow().low() > 100, suggestion::toString);
        return lane;
    }

    private static List<Other> others(LaneDraft lane) {
        return List.copyOf(((DrawFrom.Inputs) lane.drawFrom()).others().values());
    }

    @Test
    void someOtherDensitiesForARareEvent() throws InterruptedException {
        assertNotEquals(DrawFrom.NOTHING, gainsHundredfold(suggested(CORNER)).drawFrom());
    }

    @Test
    void densitiesFoundBeforeTheRun() throws InterruptedException {
        var lane = gainsHundredfold(without(CORNER, "Shifted", "Tilted", "Widened"));
        assertEquals(new DrawFrom.Adapted("cross-entropy"), lane.drawFrom());
    }

    /// The event is most likely at a third of 7.7 in each input.
    @Test
    void shiftedDensities() throws InterruptedException {
        var others = others(gainsHundredfold(without(CORNER, "Adapted", "Tilted")));
        assertEquals(3, others.size());
        for (Other other : others) {
            assertEquals(7.7 / 3, ((Other.Shift) other).by(), .4);
        }
    }

    /// A shift of exponential draws would leave a gap behind it. Of five whose sum exceeds 25 each is 5 or a little
    /// more, which a tilt of 1 - 1/5 gives.
    @Test
    void tiltedDensities() throws InterruptedException {
        var corner = project(
                5, "{\"family\": \"exponential\", \"mean\": 1}", "{\"probability\": \"x1 + x2 + x3 + x4 + x5 > 25\"}");
        var others = others(gainsHundredfold(without(corner, "Adapted")));
        assertEquals(5, others.size());
        for (Other other : others) {
            assertEquals(.8, ((Other.Tilt) other).by(), .06);
        }
    }

    /// Both tails at once: neither side is the one to move to.
    @Test
    void widenedDensities() throws InterruptedException {
        var tails = project(1, NORMAL, "{\"probability\": \"abs(x1) > 4.5\"}");
        var others = others(gainsHundredfold(without(tails, "Adapted")));
        assertEquals(4.7, ((Other.Widen) others.getFirst()).by(), .4);
    }

    /// The chance is 1e-9; a pilot has some two dozen repetitions.
    @Test
    void splitting() throws InterruptedException {
        var corner = project(3, NORMAL, "{\"probability\": \"x1 + x2 + x3 > 10.4\"}");
        List<Candidate> some = Candidates.ALL.stream()
                .filter(candidate -> candidate.toString().contains("splitting"))
                .toList();
        var suggestion = Suggestion.of(corner, 5, 1_000_000, 1, _ -> {}, some, EVEN);
        assertEquals("splitting", gainsHundredfold(suggestion).points());
    }
}
