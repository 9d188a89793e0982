package dev.leadline.study;

import dev.leadline.engine.LaneRun;
import dev.leadline.engine.Recipe;
import dev.leadline.engine.Timing;
import dev.leadline.engine.Workers;
import dev.leadline.model.Lane;
import dev.leadline.model.LaneDraft;
import dev.leadline.model.LaneDraft.Settings;
import dev.leadline.model.Project;
import dev.leadline.model.Stop;
import dev.leadline.problem.Refusal;
import dev.leadline.scheme.Replicated;
import dev.leadline.stream.Purpose;
import dev.leadline.trace.Trace;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.OptionalLong;
import java.util.concurrent.ExecutionException;

/// Short runs that say what a scheme is worth. Their draws are made for nothing else and enter no result.
final class Pilots implements AutoCloseable {
    /// A comparison of replicated points wants at least 30.
    private static final int REPLICATES = 32;

    private static final double PIECE = .005;

    private final Project project;
    private final long seed;
    private final long draws;
    private final Clock clock;
    private final Workers workers;

    /// A lane that was run.
    ///
    /// @param draft as a project has it
    record Pilot(LaneDraft draft, Lane lane, Recipe recipe, Trace trace) {}

    /// How long a draw takes in one pilot and in another.
    interface Clock {
        Clock OF_PROCESSOR = (one, other, draws) -> Timing.of(one.recipe(), draws, other.recipe(), draws, PIECE);

        Timing time(Pilot one, Pilot other, long draws);
    }

    Pilots(Project project, long seed, long draws, int threads, Clock clock) {
        this.project = project;
        this.seed = seed;
        this.draws = draws;
        this.clock = clock;
        this.workers = new Workers(threads);
    }

    /// Empty where the project does not take the lane, or where so few draws are no whole observation.
    ///
    /// @param address in place of the lane's name: equal ones draw the same numbers
    Optional<Pilot> run(LaneDraft draft, String address) throws InterruptedException {
        Optional<Lane> lane = taken(draft);
        boolean few = lane.filter(
                        made -> made.scheme().points() instanceof Replicated points && points.replicates() < REPLICATES)
                .isPresent();
        LaneDraft tried = few ? withReplicates(draft) : draft;
        lane = few ? taken(tried) : lane;
        return lane.isEmpty() ? Optional.empty() : run(tried, lane.get(), address);
    }

    private Optional<Lane> taken(LaneDraft draft) {
        try {
            return Optional.of(project.lane(draft));
        } catch (Refusal _) {
            return Optional.empty();
        }
    }

    private static LaneDraft withReplicates(LaneDraft draft) {
        var settings = draft.settings();
        return draft.with(new Settings(
                OptionalLong.of(REPLICATES),
                settings.cube(),
                settings.cells(),
                settings.scrambling(),
                settings.particles(),
                settings.repetitions(),
                settings.allocation()));
    }

    private Optional<Pilot> run(LaneDraft draft, Lane lane, String address) throws InterruptedException {
        var own = new Lane(address, lane.scheme(), false, lane.working()).within(draws);
        Recipe recipe;
        try {
            recipe = Recipe.of(project.question(), own, seed, Purpose.PILOT);
        } catch (Refusal _) {
            return Optional.empty();
        }
        if (recipe.items().whole(draws) == 0) {
            return Optional.empty();
        }
        var run = new LaneRun(recipe, new Stop(draws, OptionalDouble.empty()), workers);
        try {
            while (!run.finished()) {
                run.advance(0);
            }
        } catch (ExecutionException e) {
            throw new IllegalStateException("a pilot ended by a fault", e.getCause());
        }
        return Optional.of(new Pilot(draft, own, recipe, run.trace()))
                .filter(pilot -> pilot.trace().last().isPresent());
    }

    Timing time(Pilot one, Pilot other) {
        return clock.time(one, other, draws);
    }

    @Override
    public void close() {
        workers.close();
    }
}
