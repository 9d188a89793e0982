package dev.leadline.study;

import dev.leadline.model.Lane;
import dev.leadline.model.Plan;
import dev.leadline.model.Question;
import dev.leadline.model.Stop;
import dev.leadline.problem.Problem;
import dev.leadline.problem.Refusal;
import dev.leadline.trace.Answers;
import dev.leadline.trace.Rehearsed;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;

/// What is to be repeated, and how often.
///
/// @param stops when a repetition ends, one or several: the same set-up at several numbers of draws
/// @param repetitions of each
/// @param seed of the draws; what is found before a run is found as in the run of that seed
/// @param note what does not apply here of the project's own plan
public record RehearsalPlan(Lane lane, List<Stop> stops, int repetitions, long seed, Optional<String> note) {
    /// Monte Carlo standard error of the rate that is wanted where nothing is said.
    public static final double USUAL_MCSE = .005;

    public static final int MOST_REPETITIONS = 1_000_000;

    public RehearsalPlan {
        stops = List.copyOf(stops);
    }

    /// Repetitions that show the rate of the question's intervals with a standard error of half a per cent:
    /// 1,900 at 95 %.
    public static int suggested(Question question) {
        return suggested(question, USUAL_MCSE);
    }

    /// @param mcse standard error of the rate that is wanted, above 0
    public static int suggested(Question question, double mcse) {
        return Math.clamp(Rehearsed.repetitionsFor(Answers.level(question), mcse), 2, MOST_REPETITIONS);
    }

    /// The first lane of a plan.
    ///
    /// @param draws numbers of them in place of the plan's own rule; none for that
    /// @throws Refusal where a repetition would have no answer, or the clock would decide when it ends
    public static RehearsalPlan of(Plan plan, List<Long> draws, int repetitions) {
        if (!draws.isEmpty()) {
            draws.forEach(n -> with(plan, n).checked());
            return new RehearsalPlan(
                    plan.lanes().getFirst(),
                    draws.stream().map(RehearsalPlan::fixed).toList(),
                    repetitions,
                    plan.seed(),
                    Optional.empty());
        }
        Stop stop = plan.stop();
        if (stop.seconds().isPresent() && stop.draws() == Stop.MOST_DRAWS) {
            throw new Refusal(Problem.of("a rehearsal needs a number of draws")
                    .because("The project stops by the clock, so that no repetition would be like another.")
                    .tryThis("State it: --draws 100000, or \"draws\" under \"stop\"."));
        }
        plan.checked();
        return new RehearsalPlan(
                plan.lanes().getFirst(),
                List.of(new Stop(stop.rule(), stop.draws(), OptionalDouble.empty())),
                repetitions,
                plan.seed(),
                stop.seconds().isPresent()
                        ? Optional.of("Repetitions have no time limit, which the project has.")
                        : Optional.empty());
    }

    private static Plan with(Plan plan, long draws) {
        return new Plan(fixed(draws), plan.seed(), List.of(plan.lanes().getFirst()));
    }

    static Stop fixed(long draws) {
        return new Stop(draws, OptionalDouble.empty());
    }
}
