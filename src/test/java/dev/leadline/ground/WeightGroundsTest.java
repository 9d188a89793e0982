package dev.leadline.ground;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.leadline.density.Density;
import dev.leadline.density.Normal;
import dev.leadline.engine.Questions;
import dev.leadline.ground.Ground.Status;
import dev.leadline.ground.Ground.Strength;
import dev.leadline.model.Lane;
import dev.leadline.model.Plan;
import dev.leadline.model.Question;
import dev.leadline.model.Stop;
import dev.leadline.scheme.Independent;
import dev.leadline.scheme.Proposal;
import dev.leadline.scheme.Scheme;
import dev.leadline.scheme.Share;
import dev.leadline.study.Study;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.TreeMap;
import org.junit.jupiter.api.Test;

class WeightGroundsTest {
    private static final Share TENTH = new Share(1, 10);

    private static List<Ground> grounds(Question question, Density other, Share share, long draws, long seed)
            throws InterruptedException {
        var proposal = new Proposal(new TreeMap<>(Map.of(0, other)), share, false, List.of());
        var lane = Lane.of("A", new Scheme(new Independent(), Optional.of(proposal), List.of()));
        var plan = new Plan(new Stop(draws, OptionalDouble.empty()), seed, List.of(lane));
        try (var study = Study.start(question, plan, 1, _ -> {})) {
            return study.await().lanes().getFirst().grounds();
        }
    }

    private static Ground ground(String code, List<Ground> grounds) {
        return grounds.stream().filter(g -> g.code().equals(code)).findFirst().orElseThrow();
    }

    private static Question mean(String formula) {
        return new Questions().normal("z").mean(formula).build();
    }

    /// A density that is never drawn from where the input's own has its mass; and 300 runs of sound ones, of which by
    /// chance .02 would be doubted.
    @Test
    void theMeanWeightIsOne() throws InterruptedException {
        var far = ground("mean-weight", grounds(mean("z"), new Normal(6, 1), Share.NONE, 5_000, 1));
        assertEquals(Optional.of(Strength.OBJECTION), far.strength());
        assertTrue(far.text().startsWith("The mean weight is "), far.text());
        for (int seed = 0; seed < 150; seed++) {
            for (Share share : new Share[] {Share.NONE, TENTH}) {
                var sound = ground("mean-weight", grounds(mean("z"), new Normal(.5, 1.25), share, 2_000, seed));
                assertEquals(Status.SHOWN, sound.status(), sound.text());
            }
        }
    }

    /// `exp(5 z)` has its mean from z near 5, where a density of a spread of 1.25 is drawn from once in 30,000.
    @Test
    void noDrawMakesUpMuchOfTheSum() throws InterruptedException {
        var narrow = ground("largest-share", grounds(mean("exp(5*z)"), new Normal(0, 1.25), TENTH, 5_000, 1));
        assertEquals(Optional.of(Strength.CAUTION), narrow.strength(), narrow.text());
        var shifted = ground("largest-share", grounds(mean("exp(5*z)"), new Normal(4, 1.25), TENTH, 5_000, 1));
        assertEquals(Status.SHOWN, shifted.status(), shifted.text());
    }

    /// Of 1,000 draws 100 are from the input's own density, which has hits of a chance of 2e-9 never; of the others,
    /// 16 in 1,000 are hits from a density about 4, and half from one about 6.
    @Test
    void hitsCountHoweverSmallTheirWeight() throws InterruptedException {
        var rare = new Questions().normal("z").probability("z > 6").build();
        var few = ground("hits", grounds(rare, new Normal(4, 1), TENTH, 500, 1));
        assertEquals(Optional.of(Strength.CAUTION), few.strength(), few.text());
        assertTrue(few.text().matches("Only \\d+ hits? in 500 weighted draws"), few.text());
        var many = ground("hits", grounds(rare, new Normal(6, 1), TENTH, 500, 1));
        assertEquals(Status.SHOWN, many.status(), many.text());
        var none = ground("hits", grounds(rare, new Normal(0, 1.1), TENTH, 500, 1));
        assertEquals("0 hits in 500 weighted draws", none.text());
        assertEquals(Optional.of(Strength.CAUTION), none.strength());
    }
}
