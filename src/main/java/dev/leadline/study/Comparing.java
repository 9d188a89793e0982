package dev.leadline.study;

import dev.leadline.engine.Recipe;
import dev.leadline.engine.Timing;
import dev.leadline.model.Lane;
import dev.leadline.model.Plan;
import dev.leadline.model.Question;
import dev.leadline.model.Stop;
import dev.leadline.stream.Purpose;
import dev.leadline.study.StudyState.Activity;
import dev.leadline.trace.Trace;
import java.util.List;
import java.util.Optional;

/// Two lanes run side by side and timed.
///
/// @param plans to be run one after the other, the first lane first
/// @param timing of their draws, measured before
public record Comparing(Question question, List<Plan> plans, Timing timing) {
    private static final double PIECE = .02;

    /// Draws that are enough to see how long one takes.
    private static final long TIMED_DRAWS = 1_000_000;

    /// What both lanes get the same of.
    public enum Equal {
        DRAWS,
        /// As much as the draws of the first take.
        TIME
    }

    /// Times the two lanes of a plan, which takes about a second on this thread. Each gets a number of draws fixed
    /// beforehand, whatever the project's rule: lanes that stop where they please share no draws.
    public static Comparing of(Question question, Plan given, Equal equal) {
        Plan plan = new Plan(given.stop().fixed(), given.seed(), given.lanes());
        long draws = Math.min(plan.stop().draws(), TIMED_DRAWS);
        List<Recipe> recipes = plan.lanes().stream()
                .map(lane -> Recipe.of(question, lane.within(draws), plan.seed(), Purpose.TIMING))
                .toList();
        var timing = Timing.of(recipes.getFirst(), draws, recipes.getLast(), draws, PIECE);
        return new Comparing(
                question,
                switch (equal) {
                    case DRAWS -> List.of(plan);
                    case TIME -> ofEqualTime(plan, timing);
                },
                timing);
    }

    private static List<Plan> ofEqualTime(Plan plan, Timing timing) {
        double times = StrictMath.exp(timing.ratio().value());
        long draws = Math.clamp(
                Math.round(plan.stop().draws() * times),
                plan.lanes().getLast().scheme().fewestDraws(),
                Stop.MOST_DRAWS);
        return List.of(
                new Plan(plan.stop(), plan.seed(), List.of(plan.lanes().getFirst())),
                new Plan(
                        new Stop(draws, plan.stop().seconds()),
                        plan.seed(),
                        List.of(plan.lanes().getLast())));
    }

    /// What the runs of the plans came to, compared.
    public StudyState compared(List<StudyState> states) {
        List<Lane> lanes =
                plans.stream().flatMap(plan -> plan.settled().stream()).toList();
        List<LaneState> shown =
                states.stream().flatMap(state -> state.lanes().stream()).toList();
        Trace a = shown.getFirst().trace();
        Trace b = shown.getLast().trace();
        Optional<Comparison> comparison = Comparison.timed(question, lanes.getFirst(), a, lanes.getLast(), b, timing);
        return new StudyState(Activity.FINISHED, shown, comparison.stream().toList());
    }
}
