package dev.leadline.ground;

import dev.leadline.density.Density;
import dev.leadline.engine.LaneRun;
import dev.leadline.engine.Recipe;
import dev.leadline.engine.Workers;
import dev.leadline.ground.Ground.Strength;
import dev.leadline.model.Lane;
import dev.leadline.model.Question;
import dev.leadline.model.Stop;
import dev.leadline.scheme.Independent;
import dev.leadline.scheme.Points;
import dev.leadline.scheme.Proposal;
import dev.leadline.scheme.Scheme;
import dev.leadline.scheme.Share;
import dev.leadline.stream.Purpose;
import dev.leadline.trace.Trace;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.TreeMap;
import java.util.concurrent.ExecutionException;

/// Runs for tests of grounds: their traces, and one ground out of all.
final class Judged {
    private Judged() {}

    static Scheme from(Density other, Share share) {
        return new Scheme(
                new Independent(),
                Optional.of(new Proposal(new TreeMap<>(Map.of(0, other)), share, false, List.of())),
                List.of());
    }

    static Trace trace(Question question, Scheme scheme, long draws, long seed) {
        return trace(Recipe.of(question, Lane.of("A", scheme), seed), draws);
    }

    /// The same set-up with other draws.
    static Trace again(Recipe recipe, long draws, long seed) {
        return trace(recipe.repeated(seed, Purpose.RUN, 0), draws);
    }

    private static Trace trace(Recipe recipe, long draws) {
        try (var workers = new Workers(1)) {
            var run = new LaneRun(recipe, new Stop(draws, OptionalDouble.empty()), workers);
            while (!run.finished()) {
                run.advance(0);
            }
            return run.trace();
        } catch (ExecutionException e) {
            throw new AssertionError(e);
        } catch (InterruptedException e) {
            throw new IllegalStateException(e);
        }
    }

    static List<Ground> grounds(Question question, Scheme scheme, long draws, long seed) {
        return Grounds.of(question, trace(question, scheme, draws, seed));
    }

    static List<Ground> grounds(Question question, long draws, long seed) {
        return grounds(question, Scheme.of(new Independent()), draws, seed);
    }

    static List<Ground> grounds(Question question, Points points, long draws, long seed) {
        return grounds(question, Scheme.of(points), draws, seed);
    }

    static Optional<Ground> maybe(String code, List<Ground> grounds) {
        return grounds.stream().filter(g -> g.code().equals(code)).findFirst();
    }

    static Ground only(String code, List<Ground> grounds) {
        return maybe(code, grounds).orElseThrow(() -> new AssertionError("no " + code + " in " + grounds));
    }

    static Optional<Strength> strength(String code, List<Ground> grounds) {
        return maybe(code, grounds).flatMap(Ground::strength);
    }
}
