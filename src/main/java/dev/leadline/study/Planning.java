package dev.leadline.study;

import dev.leadline.engine.LaneRun;
import dev.leadline.engine.Recipe;
import dev.leadline.engine.Timing;
import dev.leadline.engine.Workers;
import dev.leadline.model.Lane;
import dev.leadline.model.Plan;
import dev.leadline.model.Question;
import dev.leadline.model.Stop;
import dev.leadline.problem.Problem;
import dev.leadline.problem.Refusal;
import dev.leadline.stream.Purpose;
import dev.leadline.trace.Trace;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.concurrent.ExecutionException;
import java.util.function.Consumer;

/// How many draws the tolerance takes in each lane of a plan, from short pilots, whose draws enter no result.
///
/// @param draws of each pilot
/// @param lanes in the order of the plan
public record Planning(long draws, List<LanePlan> lanes) {
    public static final long USUAL_DRAWS = 65_536;

    private static final double PIECE = .005;

    public Planning {
        lanes = List.copyOf(lanes);
    }

    /// Runs and times a pilot of each lane.
    ///
    /// @param draws of each pilot
    /// @param threads workers; nothing but the seconds depends on it
    /// @param listener gets the name of each lane before it is tried
    /// @throws Refusal where there is no tolerance, or the pilot is too short for a lane
    public static Planning of(Question question, Plan plan, long draws, int threads, Consumer<String> listener)
            throws InterruptedException {
        if (question.tolerance().isEmpty()) {
            throw new Refusal(Problem.of("there is no tolerance to plan for")
                    .because("How many draws it takes follows from how far the half-width may reach.")
                    .tryThis("State it: --relative 0.05, or \"tolerance\" in the project."));
        }
        var stop = new Stop(draws, OptionalDouble.empty());
        new Plan(stop, plan.seed(), plan.lanes()).checked();
        List<Recipe> recipes = new ArrayList<>();
        List<Trace> traces = new ArrayList<>();
        try (var workers = new Workers(threads)) {
            for (Lane lane : plan.lanes()) {
                listener.accept(lane.name());
                var recipe = Recipe.of(question, lane.within(draws), plan.seed(), Purpose.PILOT);
                recipes.add(recipe);
                traces.add(trace(new LaneRun(recipe, stop, workers)));
            }
        }
        List<LanePlan> lanes = new ArrayList<>();
        for (int i = 0; i < recipes.size(); i++) {
            var timing = Timing.of(recipes.get(i), draws, recipes.get((i + 1) % recipes.size()), draws, PIECE);
            lanes.add(LanePlan.of(
                    question,
                    recipes.get(i).lane(),
                    traces.get(i),
                    Optional.of(timing),
                    plan.stop().rule()));
        }
        return new Planning(draws, lanes);
    }

    private static Trace trace(LaneRun run) throws InterruptedException {
        try {
            while (!run.finished()) {
                run.advance(0);
            }
        } catch (ExecutionException e) {
            throw new IllegalStateException("a pilot ended by a fault", e.getCause());
        }
        return run.trace();
    }
}
