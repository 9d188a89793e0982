package dev.leadline.engine;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.leadline.model.Question;
import java.util.concurrent.atomic.AtomicInteger;
import org.junit.jupiter.api.Test;

class SamplerTest {
    private static final Item BIG = new GrowingItems(1).at(80);

    private static ItemSums compute(Question question, Item item) {
        return Recipe.of(question, Questions.lane("A"), 7)
                .sampler()
                .compute(item, () -> false)
                .orElseThrow();
    }

    @Test
    void givesTheSameBitsAgainAndAfterOtherItems() {
        var question =
                new Questions().uniform("x", 0, 1).normal("z").mean("x*exp(z)").build();
        var sampler = Recipe.of(question, Questions.lane("A"), 7).sampler();
        var first = sampler.compute(BIG, () -> false).orElseThrow();
        sampler.compute(new GrowingItems(1).at(3), () -> false);
        var again = sampler.compute(BIG, () -> false).orElseThrow();
        assertEquals(first.sums().mean(0), again.sums().mean(0));
        assertEquals(first.sums().variance(0), compute(question, BIG).sums().variance(0));
    }

    @Test
    void lanesAndSeedsDrawOtherNumbers() {
        var question = new Questions().uniform("x", 0, 1).mean("x").build();
        double mean = compute(question, BIG).sums().mean(0);
        for (var other :
                new Recipe[] {Recipe.of(question, Questions.lane("B"), 7), Recipe.of(question, Questions.lane("A"), 8)
                }) {
            assertTrue(mean
                    != other.sampler()
                            .compute(BIG, () -> false)
                            .orElseThrow()
                            .sums()
                            .mean(0));
        }
    }

    @Test
    void anInputNobodyReadsChangesNoOther() {
        var one = new Questions().uniform("x", 0, 1).mean("x").build();
        var two = new Questions().normal("unused").uniform("x", 0, 1).mean("x").build();
        assertEquals(compute(one, BIG).sums().mean(0), compute(two, BIG).sums().mean(0));
    }

    /// The integral of exp(-x²/2) over the line is √(2π), with a finite variance when drawn from a wider normal.
    @Test
    void weighsIntegrationVariables() {
        var question = new Questions()
                .range("y", 2, 5)
                .line("x", 1.5)
                .integral("exp(-x^2/2)*y")
                .build();
        var sums = compute(question, BIG).sums();
        double exact = Math.sqrt(2 * Math.PI) * 10.5;
        assertEquals(exact, sums.mean(0), 4 * sums.standardError(0));
        assertTrue(sums.standardError(0) < .01 * exact);
    }

    /// From 1 on, `x exp(-x²/2)` comes to exp(-1/2); up to 0, to -1; the density drawn from covers the whole
    /// line. Where the formula cannot be evaluated beyond the range, nothing has failed.
    @Test
    void drawsBeyondTheRangeCountNothing() {
        double exact = Math.exp(-.5);
        for (String formula : new String[] {"x*exp(-x^2/2)", "x*exp(-x^2/2) + 0*log(x - 1)"}) {
            var sums = compute(
                            new Questions()
                                    .unbounded("x", 1, Double.POSITIVE_INFINITY, 3)
                                    .integral(formula)
                                    .build(),
                            BIG)
                    .sums();
            assertEquals(0, sums.excluded());
            assertEquals(exact, sums.mean(0), 4 * sums.standardError(0));
            assertTrue(sums.standardError(0) < .01 * exact);
        }
        var upTo = compute(
                        new Questions()
                                .unbounded("x", Double.NEGATIVE_INFINITY, 0, 3)
                                .integral("x*exp(-x^2/2)")
                                .build(),
                        BIG)
                .sums();
        assertEquals(-1, upTo.mean(0), 4 * upTo.standardError(0));
        assertTrue(upTo.standardError(0) < .01);
    }

    @Test
    void keepsFailuresWithTheirInputs() {
        var question = new Questions().uniform("x", -1, 1).mean("log(x)").build();
        var result = compute(question, BIG);
        assertEquals(BIG.draws(), result.sums().count() + result.sums().excluded());
        assertEquals(.5, (double) result.sums().excluded() / BIG.draws(), .01);
        assertEquals(ItemSums.KEPT, result.failures().size());
        for (var failure : result.failures()) {
            assertTrue(failure.inputs().getFirst() < 0);
            var look = Look.at(question, Questions.lane("A"), 7, failure.draw());
            assertEquals(failure.inputs(), look.inputs());
            assertTrue(look.outcomes().getFirst().isNaN());
        }
    }

    @Test
    void endsBetweenBlocksWhenCancelled() {
        var question = new Questions().uniform("x", 0, 1).mean("x").build();
        var looks = new AtomicInteger();
        var sums =
                Recipe.of(question, Questions.lane("A"), 7).sampler().compute(BIG, () -> looks.incrementAndGet() > 3);
        assertFalse(sums.isPresent());
        assertEquals(4, looks.get());
    }
}
