package dev.leadline.cli;

import dev.leadline.engine.Achieved;
import dev.leadline.ground.Ground;
import dev.leadline.model.Plan;
import dev.leadline.model.Question;
import dev.leadline.project.RunJson;
import dev.leadline.study.LaneState;
import dev.leadline.study.Study;
import dev.leadline.study.StudyState;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.ParseResult;

/// `run`: draws, and says what came of it.
final class RunCommand implements Command {

    @Override
    public String name() {
        return "run";
    }

    @Override
    public CommandSpec spec() {
        var spec = Arguments.command(
                name(),
                "Run a project and print its answer with its interval and the grounds for and against signing it.",
                "leadline run mooring-line.leadline",
                "leadline run mooring-line.leadline --draws 1e6 --json",
                "leadline run mooring-line.leadline --seconds 10 --seed 7 --threads 2");
        spec.addPositional(Arguments.project());
        RunArguments.addTo(spec);
        return spec;
    }

    @Override
    public int run(ParseResult arguments, Console console) throws InterruptedException {
        boolean quiet = Arguments.has(arguments, "--quiet");
        var open = OpenProject.of(Arguments.project(arguments));
        open.printNotes(console, quiet);
        Question question = open.project().question();
        Plan plan = RunArguments.override(open.project().plan(), arguments);
        StudyState state = run(question, plan, RunArguments.threads(arguments), console, quiet);
        var achieved = Achieved.of(question, plan.seed());
        if (Arguments.has(arguments, "--json")) {
            console.out().print(RunJson.of(open.name(), open.project(), plan, state, achieved));
        } else {
            console.out().print(new RunText(console, open.project(), plan).of(state, achieved));
        }
        return exitCode(question, state);
    }

    /// Runs to the end, with progress where someone can see it.
    static StudyState run(Question question, Plan plan, int threads, Console console, boolean quiet)
            throws InterruptedException {
        try (var progress = new Progress(console, plan.stop(), quiet);
                var study = Study.start(question, plan, threads, progress)) {
            return study.await();
        }
    }

    /// Every lane has to meet the tolerance, and none may have an objection.
    static int exitCode(Question question, StudyState state) {
        return state.lanes().stream().allMatch(lane -> isMet(question, lane)) ? Commands.DONE : Commands.NOT_MET;
    }

    private static boolean isMet(Question question, LaneState lane) {
        boolean objected = lane.grounds().stream().anyMatch(Ground::objects);
        return !objected
                && lane.trace().last().isPresent()
                && question.tolerance()
                        .map(tolerance -> lane.trace()
                                .last()
                                .map(mark -> mark.answers().getFirst())
                                .filter(answer -> lane.trace().course().isMet(tolerance, answer))
                                .isPresent())
                        .orElse(true);
    }
}
