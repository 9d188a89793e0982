package dev.leadline.engine;

import static org.junit.jupiter.api.Assertions.assertEquals;

import java.util.List;
import org.junit.jupiter.api.Test;

class LookTest {
    /// The mean over the first items, taken from the looks of their draws one by one.
    @Test
    void makesEveryDrawOfARunAgain() {
        var question = new Questions()
                .uniform("x", 0, 1)
                .normal("z")
                .step("d = x + z")
                .mean("d^2")
                .build();
        var recipe = Recipe.of(question, Questions.lane("A"), 3);
        for (long index : new long[] {0, 5, 9, 40}) {
            Item item = recipe.items().at(index);
            var sums = recipe.sampler().compute(item, () -> false).orElseThrow().sums();
            double sum = 0;
            for (int i = 0; i < item.draws(); i++) {
                var look = Look.at(question, Questions.lane("A"), 3, item.firstDraw() + i);
                assertEquals(
                        look.inputs().get(0) + look.inputs().get(1),
                        look.steps().getFirst());
                sum += look.outcomes().getFirst();
            }
            assertEquals(sum / item.draws(), sums.mean(0), 1e-12 * sums.mean(0), "item " + index);
        }
    }

    @Test
    void nominalTakesMedians() {
        var question =
                new Questions().uniform("x", 2, 4).normal("z").mean("x + z").build();
        var look = Look.nominal(question);
        assertEquals(List.of(3.0, 0.0), look.inputs());
        assertEquals(List.of(3.0), look.outcomes());
        assertEquals(1, look.weight());
    }

    @Test
    void saysTheWeightOfAnIntegral() {
        var question =
                new Questions().range("x", 2, 5).line("z", 1).integral("x*z").build();
        // 3 / φ(0), with φ(0) = 1/√(2π)
        assertEquals(3 * Math.sqrt(2 * Math.PI), Look.nominal(question).weight(), 1e-14 * 8);
    }

    @Test
    void aDrawBeyondTheRangeWeighsNothing() {
        var question = new Questions()
                .unbounded("x", 1, Double.POSITIVE_INFINITY, 1)
                .integral("x")
                .build();
        assertEquals(0, Look.nominal(question).weight());
    }
}
