package dev.leadline.engine;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.leadline.estimate.Estimand;
import dev.leadline.estimate.Outcomes;
import dev.leadline.model.Lane;
import dev.leadline.model.Question;
import dev.leadline.scheme.Antithetic;
import dev.leadline.scheme.Independent;
import dev.leadline.scheme.Points;
import dev.leadline.scheme.Scheme;
import dev.leadline.scheme.ScrambledSobol;
import dev.leadline.scheme.Scrambling;
import dev.leadline.trace.Answer;
import dev.leadline.trace.Mark;
import dev.leadline.trace.Trace;
import java.util.List;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.Arguments;
import org.junit.jupiter.params.provider.MethodSource;

/// Where more outcomes would have to be kept than may be, a second pass over the same draws finds what all of them
/// would
/// have told.
class SecondPassTest {
    private static final long DRAWS = 200_000;

    private static Trace run(Question question, Points points, long most, int threads) throws Exception {
        var recipe = Recipe.of(question, Lane.of("A", Scheme.of(points)), 11);
        try (var workers = new Workers(threads)) {
            var run = new LaneRun(recipe, Questions.plan(DRAWS, 11).stop(), workers, most);
            while (!run.finished()) {
                run.advance(0);
            }
            return run.trace();
        }
    }

    private static Answer last(Trace trace) {
        return trace.last().map(Mark::answers).orElseThrow().getFirst();
    }

    private static Stream<Arguments> questions() {
        var estimands = List.of(
                new Estimand.Quantile(.5),
                new Estimand.Quantile(.001),
                new Estimand.Quantile(.99),
                new Estimand.TailMean(.95));
        var points = List.of(new Independent(), new Antithetic(), new ScrambledSobol(16, Scrambling.NESTED));
        var formulas = List.of("exp(x)", "floor(20*x)");
        return estimands.stream()
                .flatMap(estimand -> points.stream()
                        .flatMap(p -> formulas.stream().map(formula -> Arguments.of(estimand, p, formula))));
    }

    @ParameterizedTest(name = "{0} {1} {2}")
    @MethodSource("questions")
    void findsWhatAllOutcomesTell(Estimand estimand, Points points, String formula) throws Exception {
        var question = new Questions().uniform("x", 0, 1).ask(estimand, formula).build();
        Answer kept = last(run(question, points, Outcomes.MOST_KEPT, 1));
        assertFalse(kept.provisional());
        for (long most : new long[] {0, 40}) {
            Answer again = last(run(question, points, most, 2));
            if (estimand instanceof Estimand.TailMean) {
                // Sums are added in another order.
                assertEquals(kept.estimate(), again.estimate(), 1e-12 * Math.abs(kept.estimate()));
                continue;
            }
            assertFalse(again.provisional(), "kept at most " + most);
            assertEquals(kept.estimate(), again.estimate());
            assertEquals(kept.interval(), again.interval());
        }
    }

    @Test
    void saysUntilThenThatAValueIsProvisional() throws Exception {
        var question = new Questions()
                .uniform("x", 0, 1)
                .ask(new Estimand.Quantile(.5), "exp(x)")
                .build();
        Trace trace = run(question, new Independent(), 5, 1);
        double exact = Math.exp(.5);
        long provisional = trace.marks().stream()
                .filter(mark -> mark.answers().getFirst().provisional())
                .count();
        // A bin that holds one outcome tells it all the same, so that the marks of few draws are not provisional.
        assertTrue(
                provisional > trace.marks().size() / 3,
                provisional + " of " + trace.marks().size());
        for (Mark mark : trace.marks()) {
            // Bins are narrow beside what chance does.
            double error = .8 * exact / Math.sqrt(mark.draws());
            assertEquals(exact, mark.answers().getFirst().estimate(), 5 * error + .01);
        }
        assertFalse(last(trace).provisional());
    }
}
