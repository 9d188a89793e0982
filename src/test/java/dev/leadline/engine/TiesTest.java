package dev.leadline.engine;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertNotEquals;

import dev.leadline.density.Copula;
import dev.leadline.density.Correlations;
import dev.leadline.density.Mixing;
import dev.leadline.model.Dependence;
import dev.leadline.model.Question;
import dev.leadline.study.Study;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

class TiesTest {
    private static Questions inputs() {
        return new Questions()
                .uniform("free", 0, 1)
                .normal("x")
                .uniform("y", 0, 1)
                .normal("z");
    }

    /// Ties x with y and y with z.
    private static Questions tied() {
        var correlations = Correlations.none(3).with(0, 1, .7).with(1, 2, -.5);
        var copula = new Copula(Mixing.NONE, correlations);
        return inputs().tied(new Dependence(copula, List.of(1, 2, 3), List.of(), List.of()));
    }

    private static double mean(Question question, long index) {
        var recipe = Recipe.of(question, Questions.lane("A"), 3);
        var sums = recipe.sampler().compute(recipe.items().at(index), () -> false);
        return sums.orElseThrow().sums().mean(0);
    }

    @Test
    void looksAtTheDrawsOfTheRun() {
        var question = tied().mean("x + y + free").build();
        var recipe = Recipe.of(question, Questions.lane("A"), 3);
        Item item = recipe.items().at(9);
        double sum = 0;
        for (int i = 0; i < item.draws(); i++) {
            sum += Look.at(question, Questions.lane("A"), 3, item.firstDraw() + i)
                    .outcomes()
                    .getFirst();
        }
        assertEquals(sum / item.draws(), mean(question, 9), 1e-13);
    }

    /// z is drawn with x and y behind it, whether a formula reads them or not.
    @Test
    void anInputIsTheSameWhetherThoseItIsTiedToAreReadOrNot() {
        var alone = tied().mean("z").build();
        var together = tied().mean("z + 0*x + 0*y").build();
        assertEquals(mean(together, 0), mean(alone, 0));
        assertNotEquals(mean(inputs().mean("z").build(), 0), mean(alone, 0));
    }

    @Test
    void anInputThatIsNotTiedIsDrawnAsEver() {
        assertEquals(
                mean(inputs().mean("free").build(), 0), mean(tied().mean("free").build(), 0));
    }

    @Test
    void nominalIsTheMedianOfEach() {
        assertEquals(
                List.of(.5, 0.0, .5, 0.0),
                Look.nominal(tied().mean("x").build()).inputs());
    }

    @ParameterizedTest(name = "{0} threads")
    @ValueSource(ints = {2, 8})
    void sameBitsOnAnyNumberOfThreads(int threads) throws InterruptedException {
        var question = tied().mean("x*y*z").build();
        var plan = Questions.plan(200_001, 5);
        try (var one = Study.start(question, plan, 1, _ -> {});
                var more = Study.start(question, plan, threads, _ -> {})) {
            assertEquals(
                    one.await().lanes().getFirst().trace().last().orElseThrow().answers(),
                    more.await().lanes().getFirst().trace().last().orElseThrow().answers());
        }
    }
}
