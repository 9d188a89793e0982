package dev.leadline.study;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.leadline.model.Draft;
import dev.leadline.model.Project;
import dev.leadline.problem.Refusal;
import dev.leadline.trace.Answer;
import dev.leadline.trace.Mark;
import java.util.ArrayList;
import java.util.List;
import java.util.Set;
import java.util.TreeSet;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/// Whatever is put together either works or is refused in words; nothing is ignored.
class EveryCombinationTest {
    private static final long DRAWS = 5_000;

    /// An observation of passes that are shared, one for each of 20 densities, is of 1,280 draws; two control
    /// variates ask for 20 of them.
    private static final long DRAWS_OF_SHARED = 64_000;

    private static long draws(Combination lane) {
        return lane.points().equals("stratified, shared") ? DRAWS_OF_SHARED : DRAWS;
    }

    /// Why the lane is refused; empty where it works.
    private static List<String> refusals(Combination lane) {
        var refusals = new ArrayList<String>();
        boolean isMean = List.of("mean", "integral", "probability").contains(lane.estimand());
        String asked = Draft.AskDraft.words(lane.estimand());
        if (!isMean && !lane.controls().equals("no")) {
            refusals.add("control variates for a %s are not available".formatted(asked));
        } else if (!isMean && lane.drawFrom().matches("cross-entropy|grid")) {
            refusals.add("a density that is found for a %s is not available".formatted(asked));
        }
        if (!lane.controls().equals("no") && lane.drawFrom().equals("self-normalised")) {
            refusals.add("control variates beside selfNormalised are not available");
        }
        if (lane.controls().equals("two") && lane.points().matches("scrambled-sobol|shifted-lattice")) {
            refusals.add("2 control variates are too many for 16 replicates");
        }
        if (lane.points().equals("splitting")) {
            if (!lane.drawFrom().equals("own")) {
                refusals.add("splitting draws from no other densities");
            }
            if (!lane.controls().equals("no")) {
                refusals.add("splitting takes no control variates");
            }
            if (!lane.estimand().equals("probability")) {
                refusals.add("splitting answers one probability");
            }
        }
        return refusals;
    }

    @ParameterizedTest(name = "{0}")
    @MethodSource("dev.leadline.study.Combination#all")
    void worksOrIsRefused(Combination lane) throws InterruptedException {
        List<String> expected = refusals(lane);
        if (expected.isEmpty()) {
            works(lane);
        } else {
            var refusal = assertThrows(Refusal.class, () -> lane.project(draws(lane)));
            assertEquals(
                    expected,
                    refusal.problems().stream()
                            .map(problem -> problem.primary())
                            .toList());
            refusal.problems().forEach(problem -> assertTrue(problem.hint().isPresent(), problem.primary()));
        }
    }

    private static void works(Combination lane) throws InterruptedException {
        long draws = draws(lane);
        var project = lane.project(draws);
        Mark one = run(project, 1);
        Mark two = run(project, 2);
        assertEquals(one.draws(), two.draws());
        assertEquals(one.answers(), two.answers());
        // A repetition of splitting makes about 400 draws, and is made to its end.
        long most = lane.points().equals("splitting") ? draws + 1_000 : draws;
        assertTrue(one.draws() > draws / 2 && one.draws() <= most, one.draws() + " draws");
        Answer answer = one.answers().getFirst();
        if (lane.estimand().equals("quantile")) {
            assertEquals(lane.value(), answer.estimate(), 3 * answer.interval().halfWidth());
            // The density at the quantile is .175: independent draws have a half-width of .048.
            assertTrue(
                    answer.interval().halfWidth() < 3 * .048, answer.interval().toString());
            return;
        }
        if (lane.points().equals("antithetic")
                && lane.estimand().equals("distribution")
                && lane.drawFrom().equals("own")) {
            // x + y and its mirror image have the mean .5 whatever x and y are.
            assertEquals(.5, answer.estimate(), 1e-12);
            return;
        }
        assertTrue(answer.standardError() > 0, "standard error " + answer.standardError());
        assertEquals(lane.value(), answer.estimate(), 6 * answer.standardError());
        // The outcomes' standard deviations are .75, .46: no scheme here is much worse than independent draws.
        assertTrue(answer.standardError() < 3 * .75 / Math.sqrt(draws), "standard error " + answer.standardError());
        assertTrue(answer.interval().low() < answer.estimate()
                && answer.estimate() < answer.interval().high());
    }

    private static Mark run(Project project, int threads) throws InterruptedException {
        try (var study = Study.start(project.question(), project.plan(), threads, _ -> {})) {
            return study.await().lanes().getFirst().trace().last().orElseThrow();
        }
    }

    @Test
    void everyLayoutIsAmongThem() {
        Set<String> layouts = new TreeSet<>(Project.layouts());
        assertEquals(layouts, new TreeSet<>(Combination.layouts()));
    }
}
