package dev.leadline.engine;

import static org.junit.jupiter.api.Assertions.assertEquals;

import dev.leadline.density.Copula;
import dev.leadline.density.Correlations;
import dev.leadline.density.Density;
import dev.leadline.density.Mixing;
import dev.leadline.density.Normal;
import dev.leadline.density.Poisson;
import dev.leadline.model.Dependence;
import dev.leadline.scheme.Antithetic;
import dev.leadline.scheme.Independent;
import dev.leadline.scheme.LatinHypercube;
import dev.leadline.scheme.Points;
import dev.leadline.scheme.ScrambledSobol;
import dev.leadline.scheme.Scrambling;
import dev.leadline.scheme.Share;
import java.util.List;
import java.util.Map;
import java.util.OptionalInt;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

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

    /// The same with weights, some draws from the inputs' own densities, and tied inputs.
    @ParameterizedTest
    @MethodSource("layouts")
    void makesEveryWeightedDrawAgain(Points points) {
        var tie = new Copula(Mixing.NONE, Correlations.none(3).with(0, 1, .5).with(1, 2, -.3));
        var question = new Questions()
                .normal("x")
                .normal("y")
                .random("n", new Poisson(3))
                .mean("exp(x)*y + n")
                .tied(new Dependence(tie, List.of(0, 1, 2), List.of(), List.of()))
                .build();
        for (Map<Integer, Density> others : List.<Map<Integer, Density>>of(
                Map.of(0, new Normal(1, 1.5), 1, new Normal(-1, 2)), Map.of(2, new Poisson(5)))) {
            var lane = Lanes.drawing(points, others, new Share(1, 4));
            var recipe = Recipe.of(question, lane, 3);
            for (long index : new long[] {0, 9}) {
                Item item = recipe.items().at(index);
                var sums = recipe.sampler().compute(item, () -> false).orElseThrow();
                double sum = 0;
                for (int i = 0; i < item.draws(); i++) {
                    var look = Look.at(question, lane, 3, item.firstDraw() + i);
                    sum += look.weight() * look.outcomes().getFirst();
                }
                assertEquals(sum / item.draws(), sums.sums().mean(0), 1e-12, "item " + index);
            }
        }
    }

    static Stream<Points> layouts() {
        return Stream.of(
                new Independent(),
                new Antithetic(),
                new LatinHypercube(OptionalInt.of(4), 30),
                new ScrambledSobol(16, Scrambling.NESTED));
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
