package dev.leadline.benchmark;

import dev.leadline.engine.Questions;
import dev.leadline.engine.Recipe;
import dev.leadline.engine.Sampler;
import dev.leadline.estimate.Accumulator;
import java.util.List;

/// The engine as every run uses it: items of work made by one sampler, merged in order.
final class Engine implements Contestant {
    private static final long SEED = 20261201;

    private final List<Recipe> recipes;
    private final List<Sampler> samplers;

    Engine(List<Integrand> integrands) {
        recipes = integrands.stream()
                .map(integrand -> Recipe.of(integrand.question(), Questions.lane("A"), SEED))
                .toList();
        samplers = recipes.stream().map(Recipe::sampler).toList();
    }

    @Override
    public Found run(int integrand, int draws) {
        var items = recipes.get(integrand).items();
        var total = new Accumulator(1);
        int done = 0;
        for (long k = 0; done < draws; k++) {
            var item = items.at(k);
            total.merge(samplers.get(integrand)
                    .compute(item, () -> false)
                    .orElseThrow()
                    .sums());
            done += item.draws();
        }
        return new Found(total.mean(0), total.standardError(0));
    }
}
