package dev.leadline.cli;

import dev.leadline.engine.Look;
import dev.leadline.model.Lane;
import dev.leadline.model.Plan;
import dev.leadline.model.Question;
import dev.leadline.model.Stop;
import dev.leadline.problem.Problem;
import dev.leadline.problem.Refusal;
import dev.leadline.project.LookJson;
import dev.leadline.study.LookRow;
import java.util.OptionalLong;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.ParseResult;

/// `look`: one draw made again, with every input, step and outcome.
final class LookCommand implements Command {

    @Override
    public String name() {
        return "look";
    }

    @Override
    public CommandSpec spec() {
        return Arguments.command(
                        name(),
                        "Look at one draw: every input, step and outcome. Without --draw the nominal one, every input at"
                                + " its median.",
                        "leadline look mooring-line.leadline",
                        "leadline look mooring-line.leadline --draw 12600 --json")
                .addPositional(Arguments.project())
                .addOption(Arguments.option(
                        "--draw",
                        "K",
                        Long.class,
                        Arguments.whole(0, Stop.MOST_DRAWS - 1),
                        "The draw with index K, counted from 0, as a run of this seed makes it."))
                .addOption(Arguments.flag("--nominal", "Every input at its median."))
                .addOption(RunArguments.draws(
                        "The draws of the run, where its points follow from them: a Latin hypercube's do."))
                .addOption(RunArguments.seed())
                .addOption(RunArguments.lane());
    }

    @Override
    public int run(ParseResult arguments, Console console) {
        OptionalLong draw = Arguments.whole(arguments, "--draw");
        if (draw.isPresent() && Arguments.has(arguments, "--nominal")) {
            throw new Refusal(
                    Problem.of("--draw and --nominal exclude each other").tryThis("Leave one of them out."));
        }
        var open = OpenProject.of(Arguments.project(arguments));
        open.printNotes(console, Arguments.has(arguments, "--quiet"));
        Question question = open.project().question();
        Plan plan = RunArguments.override(open.project().plan(), arguments);
        Lane lane = plan.settled().getFirst();
        Look look = draw.isPresent() ? Look.at(question, lane, plan.seed(), draw.getAsLong()) : Look.nominal(question);
        if (Arguments.has(arguments, "--json")) {
            console.out().print(LookJson.of(question, plan, lane.name(), draw, look));
        } else {
            print(console, question, look, draw, plan, lane);
        }
        return Commands.DONE;
    }

    private static void print(Console console, Question question, Look look, OptionalLong draw, Plan plan, Lane lane) {
        var out = console.out();
        out.println(
                draw.isPresent()
                        ? "Draw %d of lane %s, seed %d".formatted(draw.getAsLong(), lane.name(), plan.seed())
                        : "Nominal draw: every input at its median");
        var rows = new Columns();
        LookRow.of(question, look)
                .forEach(row ->
                        rows.add(row.name(), row.value(), row.kind().equals("outcome") ? "outcome" : row.remark()));
        rows.print(out);
    }
}
