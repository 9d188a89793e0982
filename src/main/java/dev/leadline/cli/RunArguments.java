package dev.leadline.cli;

import dev.leadline.model.Lane;
import dev.leadline.model.Plan;
import dev.leadline.model.Stop;
import dev.leadline.model.StopRule;
import dev.leadline.problem.Nearest;
import dev.leadline.problem.Problem;
import dev.leadline.problem.Refusal;
import java.util.List;
import java.util.OptionalDouble;
import java.util.OptionalLong;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Model.OptionSpec;
import picocli.CommandLine.ParseResult;

/// The arguments that say how a question is run. They override the project's own plan.
final class RunArguments {

    private static final int MOST_THREADS = 1024;

    private RunArguments() {}

    static void addTo(CommandSpec spec) {
        addAllButLaneTo(spec);
        spec.addOption(lane());
    }

    static void addAllButLaneTo(CommandSpec spec) {
        spec.addOption(
                draws("Make exactly N draws in each lane, also written 1e6, down to whole observations or rounds,"
                        + " whatever the project's stop rule; without --seconds no time limit applies."));
        spec.addOption(Arguments.option(
                "--seconds",
                "S",
                Double.class,
                Arguments.positive(),
                "Stop after S seconds of computing, or sooner by the project's rule; a fixed number of draws without"
                        + " --draws is then as many as that gives."));
        spec.addOption(seed());
        spec.addOption(threads());
    }

    static OptionSpec draws(String description) {
        return Arguments.option("--draws", "N", Long.class, Arguments.whole(1, Stop.MOST_DRAWS), description);
    }

    static OptionSpec threads() {
        return Arguments.option(
                "--threads",
                "N",
                Long.class,
                Arguments.whole(1, MOST_THREADS),
                "Compute on N threads (all processors if left out). The digits do not depend on it.");
    }

    static OptionSpec seed() {
        return Arguments.option(
                "--seed",
                "N",
                Long.class,
                Arguments.whole(0, Long.MAX_VALUE),
                "Draw the random numbers of seed N instead of the project's.");
    }

    static OptionSpec lane() {
        return Arguments.option("--lane", "NAME", String.class, text -> text, "Run this lane only.");
    }

    static int threads(ParseResult arguments) {
        return (int) Arguments.whole(arguments, "--threads")
                .orElse(Runtime.getRuntime().availableProcessors());
    }

    /// The plan with what the arguments say.
    static Plan override(Plan plan, ParseResult arguments) {
        return new Plan(
                        stop(
                                plan.stop(),
                                Arguments.whole(arguments, "--draws"),
                                Arguments.number(arguments, "--seconds")),
                        Arguments.whole(arguments, "--seed").orElse(plan.seed()),
                        lanes(plan.lanes(), arguments.matchedOptionValue("--lane", "")))
                .checked();
    }

    /// A number of draws takes the place of the rule; a time lies beside it.
    private static Stop stop(Stop stop, OptionalLong draws, OptionalDouble seconds) {
        if (draws.isPresent()) {
            return new Stop(draws.getAsLong(), seconds);
        }
        boolean isPatient = stop.rule() instanceof StopRule.Fixed;
        return seconds.isEmpty() ? stop : new Stop(stop.rule(), isPatient ? Stop.MOST_DRAWS : stop.draws(), seconds);
    }

    private static List<Lane> lanes(List<Lane> lanes, String name) {
        return name.isEmpty() ? lanes : List.of(lane(lanes, name));
    }

    /// @throws Refusal where no lane is called so
    static Lane lane(List<Lane> lanes, String name) {
        return lanes.stream()
                .filter(lane -> lane.name().equals(name))
                .findFirst()
                .orElseThrow(() -> noLane(lanes, name));
    }

    private static Refusal noLane(List<Lane> lanes, String name) {
        List<String> names = lanes.stream().map(Lane::name).toList();
        Problem problem = Problem.of("there is no lane \"%s\"".formatted(name))
                .because("Lanes of this project: %s.".formatted(String.join(", ", names)));
        return new Refusal(Nearest.to(name, names)
                .map(near -> problem.tryThis("Was %s meant?".formatted(near)))
                .orElse(problem));
    }
}
