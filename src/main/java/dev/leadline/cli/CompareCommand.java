package dev.leadline.cli;

import dev.leadline.engine.Achieved;
import dev.leadline.ground.Ground;
import dev.leadline.model.Lane;
import dev.leadline.model.Plan;
import dev.leadline.model.Question;
import dev.leadline.problem.Problem;
import dev.leadline.problem.Refusal;
import dev.leadline.project.RunJson;
import dev.leadline.study.Comparing;
import dev.leadline.study.Comparing.Equal;
import dev.leadline.study.Comparison;
import dev.leadline.study.StudyState;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Model.PositionalParamSpec;
import picocli.CommandLine.ParseResult;
import picocli.CommandLine.TypeConversionException;

/// `compare`: runs two lanes and says what a draw, and a second, of each is worth.
final class CompareCommand implements Command {
    @Override
    public String name() {
        return "compare";
    }

    @Override
    public CommandSpec spec() {
        var spec = Arguments.command(
                name(),
                "Run two lanes of a project and compare what their draws and their time are worth.",
                "leadline compare mooring-line.leadline",
                "leadline compare wave-overtopping.leadline A C --draws 1e6",
                "leadline compare mooring-line.leadline A B --equal time --seconds 20 --json");
        spec.addPositional(Arguments.project());
        spec.addPositional(PositionalParamSpec.builder()
                .paramLabel("LANE")
                .type(List.class)
                .auxiliaryTypes(String.class)
                .index("1..*")
                .arity("0..2")
                .description("Two lanes, the first two of the project if left out.")
                .build());
        spec.addOption(Arguments.option(
                "--equal",
                "WHAT",
                String.class,
                text -> {
                    if (!text.equals("draws") && !text.equals("time")) {
                        throw new TypeConversionException("'%s' is neither draws nor time".formatted(text));
                    }
                    return text;
                },
                "What both get the same of: draws (if left out), or time, as much as the draws of the first take."));
        RunArguments.addAllButLaneTo(spec);
        return spec;
    }

    @Override
    public int run(ParseResult arguments, Console console) throws InterruptedException {
        boolean quiet = Arguments.has(arguments, "--quiet");
        var open = OpenProject.of(Arguments.project(arguments));
        Question question = open.project().question();
        Plan all = RunArguments.override(open.project().plan(), arguments);
        Plan plan = new Plan(
                all.stop(), all.seed(), two(all.lanes(), arguments.matchedPositionalValue(1, List.<String>of())));
        open.printNotes(console, quiet);
        var equal =
                Equal.valueOf(arguments.matchedOptionValue("--equal", "draws").toUpperCase(Locale.ROOT));
        var comparing = Comparing.of(question, plan, equal);
        List<StudyState> states = new ArrayList<>();
        for (Plan part : comparing.plans()) {
            states.add(RunCommand.run(question, part, RunArguments.threads(arguments), console, quiet));
        }
        StudyState state = comparing.compared(states);
        var achieved = Achieved.of(question, plan.seed());
        if (Arguments.has(arguments, "--json")) {
            console.out().print(RunJson.of(open.name(), open.project(), plan, state, achieved));
        } else {
            console.out().print(new RunText(console, open.project(), plan).of(state, achieved));
        }
        return exitCode(state);
    }

    private static List<Lane> two(List<Lane> lanes, List<String> names) {
        List<Lane> chosen = names.isEmpty()
                ? lanes.stream().limit(2).toList()
                : names.stream().map(name -> RunArguments.lane(lanes, name)).toList();
        if (chosen.size() != 2) {
            throw new Refusal(
                    names.size() == 1
                            ? Problem.of("compare takes two lanes").tryThis("Name another one.")
                            : Problem.of("the project has one lane")
                                    .because("Two are needed to compare.")
                                    .tryThis("Add one, as {\"name\": \"B\", \"points\": \"antithetic\"};"
                                            + " leadline suggest says which is worth it."));
        }
        if (chosen.getFirst().equals(chosen.getLast())) {
            throw new Refusal(
                    Problem.of("a lane cannot be compared with itself").tryThis("Name another one."));
        }
        return chosen;
    }

    /// Both have to be judged without an objection, and the draws must be enough to say what they are worth.
    private static int exitCode(StudyState state) {
        boolean objected =
                state.lanes().stream().flatMap(lane -> lane.grounds().stream()).anyMatch(Ground::objects);
        boolean told = state.comparisons().stream()
                .allMatch(comparison -> comparison.outcome() != Comparison.Outcome.CANNOT_TELL);
        return told && !objected ? Commands.DONE : Commands.NOT_MET;
    }
}
