package dev.leadline.engine;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.leadline.ReferenceValues;
import dev.leadline.estimate.Accumulator;
import dev.leadline.estimate.Estimate;
import dev.leadline.interval.Student;
import dev.leadline.model.Lane;
import dev.leadline.model.Question;
import dev.leadline.scheme.Adaptation;
import dev.leadline.scheme.Adaptation.Way;
import dev.leadline.scheme.Independent;
import dev.leadline.scheme.Scheme;
import dev.leadline.scheme.Share;
import dev.leadline.scheme.Tuned;
import dev.leadline.scheme.Warp;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import java.util.TreeSet;
import java.util.stream.Collectors;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.EnumSource;

/// Densities that are found before the run: what they find, and that intervals of fresh draws hold.
class TuningTest {
    private static final String FOUR = "min(3 + 0.1*(x1-x2)^2 - (x1+x2)/sqrt(2), 3 + 0.1*(x1-x2)^2 + (x1+x2)/sqrt(2),"
            + " (x1-x2) + %s/sqrt(2), (x2-x1) + %s/sqrt(2)) <= 0";

    private static Lane lane(Question question, Way way) {
        var inputs =
                IntStream.range(0, question.inputs().size()).boxed().collect(Collectors.toCollection(TreeSet::new));
        var wish = new Adaptation(way, inputs, Share.of(.1));
        return Lane.of("B", new Scheme(new Independent(), Optional.empty(), List.of(), false, Optional.of(wish)));
    }

    private static Accumulator run(Question question, Way way, long seed, int draws) {
        var recipe = Recipe.of(question, lane(question, way), seed);
        var sampler = recipe.sampler();
        var sums = new Accumulator(recipe.components());
        for (long item = 0, made = 0; made < draws; item++) {
            var next = recipe.items().at(item);
            sums.merge(sampler.compute(next, () -> false).orElseThrow().sums());
            made += next.draws();
        }
        return sums;
    }

    private static Tuned tuned(Question question, Way way, long seed) {
        return Tuning.found(question, lane(question, way), seed)
                .scheme()
                .tuned()
                .orElseThrow();
    }

    private static Question normals(int n, String event) {
        var question = new Questions();
        for (int j = 1; j <= n; j++) {
            question.normal("x" + j);
        }
        return question.probability(event).build();
    }

    @ParameterizedTest
    @CsvSource({
        "6, probability_k6",
        "7, probability_k7",
    })
    void fourBranchesByCrossEntropy(String k, String name) {
        holds(
                normals(2, FOUR.formatted(k, k)),
                Way.CROSS_ENTROPY,
                ReferenceValues.expected("rare-four-branch", name),
                20);
    }

    @Test
    void twoDesignPointsByCrossEntropy() {
        holds(
                normals(2, "5 - x2 - 0.5*(x1 - 0.1)^2 <= 0"),
                Way.CROSS_ENTROPY,
                ReferenceValues.expected("rare-parabolic", "probability"),
                20);
    }

    @Test
    void twoDesignPointsByGrid() {
        holds(
                normals(2, "5 - x2 - 0.5*(x1 - 0.1)^2 <= 0"),
                Way.GRID,
                ReferenceValues.expected("rare-parabolic", "probability"),
                20);
    }

    @ParameterizedTest
    @CsvSource({"2", "10", "50"})
    void aLinearLimitInManyInputs(int d) {
        String sum = String.join(
                " + ", IntStream.rangeClosed(1, d).mapToObj(j -> "x" + j).toList());
        holds(
                normals(d, "%s >= 4*sqrt(%d)".formatted(sum, d)),
                Way.CROSS_ENTROPY,
                ReferenceValues.expected("rare-linear-limit-state", "P(beta=4)"),
                10);
    }

    @ParameterizedTest
    @EnumSource(Way.class)
    void aMeanThatAFewDrawsDecide(Way way) {
        // E exp(3 z) = exp(4.5); its relative variance from plain draws is exp(9) - 1.
        var question = new Questions().normal("z").normal("y").mean("exp(3*z)").build();
        holds(question, way, StrictMath.exp(4.5), 20);
        double relative = Math.sqrt(run(question, way, 5, 50_000).variance(0)) / StrictMath.exp(4.5);
        assertTrue(relative < 2, "relative sd of an observation: " + relative);
    }

    @Test
    void anInputThatNobodyReadsStaysAsItIs() {
        var question = new Questions().normal("z").normal("y").mean("exp(3*z)").build();
        var found = tuned(question, Way.CROSS_ENTROPY, 3);
        assertTrue(found.parts().stream().noneMatch(part -> part.warps().containsKey(1)));
        double mean = ((Warp.OfScores) found.parts().getFirst().warps().get(0)).mean();
        assertEquals(3, mean, .3, "the best normal density has the mean 3");
    }

    @Test
    void onlyTheInputsThatAreNamedAreMoved() {
        var question = normals(2, "x1 + x2 > 5");
        var wish = new Adaptation(Way.CROSS_ENTROPY, new TreeSet<>(List.of(1)), Share.of(.1));
        var lane = Lane.of("B", new Scheme(new Independent(), Optional.empty(), List.of(), false, Optional.of(wish)));
        var found = Tuning.found(question, lane, 3).scheme().tuned().orElseThrow();
        assertTrue(found.parts().stream().allMatch(part -> part.warps().keySet().equals(Set.of(1))));
    }

    @Test
    void allFourBranchesAreFound() {
        var found = tuned(normals(2, FOUR.formatted("7", "7")), Way.CROSS_ENTROPY, 3);
        assertEquals(4, found.parts().size());
        assertEquals(20, found.of());
        assertEquals(2, found.nominal());
    }

    @Test
    void stagesAreToldWithTheirDraws() {
        var stages = tuned(normals(1, "x1 > 5"), Way.CROSS_ENTROPY, 3).stages();
        assertTrue(stages.getFirst().level() < -3, "the first stage is far from the event");
        assertEquals(0, stages.getLast().level());
        assertEquals(
                2.866515719e-7,
                stages.getLast().estimate(),
                4 * stages.getLast().standardError());
    }

    @Test
    void integralsOverRanges() {
        var question = new Questions()
                .range("x", 0, 2)
                .line("y", 2)
                .integral("exp(-50*(x - 1)^2 - 20*(y - 1)^2)")
                .build();
        double exact = Math.PI / Math.sqrt(50 * 20);
        holds(question, Way.GRID, exact, 20);
        holds(question, Way.CROSS_ENTROPY, exact, 20);
    }

    /// The 95 % intervals of so many seeds hold as often as chance allows, and the mean of the estimates is right.
    private static void holds(Question question, Way way, double exact, int seeds) {
        int held = 0;
        double sum = 0;
        double squares = 0;
        for (int seed = 1; seed <= seeds; seed++) {
            var sums = run(question, way, seed, 20_000);
            var interval = Student.of(Estimate.mean(sums, 0), .95);
            held += interval.low() <= exact && exact <= interval.high() ? 1 : 0;
            sum += sums.mean(0) - exact;
            squares += sums.standardError(0) * sums.standardError(0);
        }
        // Binomial: P(fewer than this) is below 1e-4.
        assertTrue(held >= seeds - seeds / 10 - 4, held + " of " + seeds + " intervals hold");
        assertEquals(0, sum, 4 * Math.sqrt(squares), "sum of the errors");
    }
}
