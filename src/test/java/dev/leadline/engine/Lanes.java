package dev.leadline.engine;

import dev.leadline.density.Density;
import dev.leadline.estimate.Accumulator;
import dev.leadline.model.Lane;
import dev.leadline.model.Question;
import dev.leadline.scheme.Independent;
import dev.leadline.scheme.Points;
import dev.leadline.scheme.Proposal;
import dev.leadline.scheme.Scheme;
import dev.leadline.scheme.Share;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.TreeMap;

/// Lanes that draw from other densities, and the sums of their observations.
final class Lanes {
    private Lanes() {}

    static Lane drawing(Points points, Map<Integer, Density> others, Share share) {
        var proposal = new Proposal(new TreeMap<>(others), share, false, List.of());
        return Lane.of("A", new Scheme(points, Optional.of(proposal), List.of()));
    }

    static Lane drawing(Map<Integer, Density> others, Share share) {
        return drawing(new Independent(), others, share);
    }

    static Accumulator sums(Question question, Lane lane, long seed, long draws) {
        var recipe = Recipe.of(question, lane.within(draws), seed);
        var sampler = recipe.sampler();
        var items = recipe.items();
        var sums = new Accumulator(recipe.components());
        long all = items.whole(draws);
        for (long i = 0; items.at(i).firstDraw() < all; i++) {
            Item item = items.at(i);
            sums.merge(sampler.compute(item.first(all - item.firstDraw()), () -> false)
                    .orElseThrow()
                    .sums());
        }
        return sums;
    }
}
