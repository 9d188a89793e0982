package dev.leadline.cli;

import dev.leadline.interval.Interval;
import dev.leadline.model.Plan;
import dev.leadline.model.Question;
import dev.leadline.model.Stop;
import dev.leadline.model.Tolerance;
import dev.leadline.project.PlanJson;
import dev.leadline.study.LanePlan;
import dev.leadline.study.Need;
import dev.leadline.study.Planning;
import dev.leadline.study.RatioText;
import dev.leadline.trace.Answers;
import java.io.PrintWriter;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.ParseResult;

/// `plan`: says from short pilots how many draws the tolerance takes.
final class PlanCommand implements Command {
    @Override
    public String name() {
        return "plan";
    }

    @Override
    public CommandSpec spec() {
        var spec = Arguments.command(
                name(),
                "Say from a short pilot of each lane how many draws, and seconds, the numerical tolerance takes.",
                "leadline plan mooring-line.leadline",
                "leadline plan mooring-line.leadline --relative 0.02 --lane B",
                "leadline plan ferry-fuel.leadline --absolute 5 --draws 1e6 --json");
        spec.addPositional(Arguments.project());
        spec.addOption(Arguments.option(
                "--relative",
                "R",
                Double.class,
                Arguments.positive(),
                "A tolerance in place of the project's, as a part of the value: 0.05."));
        spec.addOption(Arguments.option(
                "--absolute",
                "A",
                Double.class,
                Arguments.positive(),
                "A tolerance in place of the project's, in the unit of the answer; with --relative either will do."));
        spec.addOption(Arguments.option(
                "--draws",
                "N",
                Long.class,
                Arguments.whole(100, Stop.MOST_DRAWS),
                "Draws of each pilot (65,536 if left out). They enter no result."));
        spec.addOption(RunArguments.seed());
        spec.addOption(RunArguments.threads());
        spec.addOption(Arguments.option(
                "--lane", "NAME", String.class, text -> text, "Plan this lane only (all if left out)."));
        return spec;
    }

    @Override
    public int run(ParseResult arguments, Console console) throws InterruptedException {
        boolean quiet = Arguments.has(arguments, "--quiet");
        var open = OpenProject.of(Arguments.project(arguments));
        open.printNotes(console, quiet);
        Question question = question(open.project().question(), arguments);
        Plan whole = open.project().plan();
        String lane = arguments.matchedOptionValue("--lane", "");
        var plan = new Plan(
                whole.stop(),
                Arguments.whole(arguments, "--seed").orElse(whole.seed()),
                lane.isEmpty() ? whole.lanes() : List.of(RunArguments.lane(whole.lanes(), lane)));
        var planning = Planning.of(
                question,
                plan,
                Arguments.whole(arguments, "--draws").orElse(Planning.USUAL_DRAWS),
                RunArguments.threads(arguments),
                _ -> {});
        if (Arguments.has(arguments, "--json")) {
            console.out().print(PlanJson.of(open.name(), open.project(), plan, planning));
        } else {
            print(console, question, planning);
        }
        return planning.lanes().stream().anyMatch(one -> one.fixed().isEmpty()) ? Commands.NOT_MET : Commands.DONE;
    }

    private static Question question(Question question, ParseResult arguments) {
        var absolute = Arguments.number(arguments, "--absolute");
        var relative = Arguments.number(arguments, "--relative");
        return absolute.isEmpty() && relative.isEmpty()
                ? question
                : question.to(new Tolerance(absolute, relative, false));
    }

    private static void print(Console console, Question question, Planning planning) {
        var out = console.out();
        out.println(String.format(
                Locale.ROOT,
                "Draws to the tolerance at %s, from pilots of %,d draws that enter no result:",
                Interval.percent(Answers.level(question)),
                planning.draws()));
        planning.lanes().forEach(lane -> print(console, out, lane));
    }

    private static void print(Console console, PrintWriter out, LanePlan lane) {
        out.println(console.bold("Lane %s (%s)".formatted(lane.lane(), lane.scheme())));
        lane.fixed().ifPresent(need -> wrapped(out, "A number fixed beforehand" + ruling(lane, lane.fixed()), need));
        String looking = lane.hits().isPresent() ? "Looked at until hits are enough" : "Looked at as one likes";
        lane.anyTime().ifPresent(need -> wrapped(out, looking + ruling(lane, lane.anyTime()), need));
        if (lane.fixed().isPresent()
                && ruling(lane, lane.fixed()).isEmpty()
                && ruling(lane, lane.anyTime()).isEmpty()) {
            lane.inForce()
                    .ifPresentOrElse(
                            need -> wrapped(out, "By the project's rule, " + lane.rule(), need),
                            () -> out.println("  By the project's rule, %s: cannot be told.".formatted(lane.rule())));
        }
        lane.lack()
                .ifPresent(lack ->
                        Wrapped.lines("  ", "Cannot tell yet: " + lack + ".").forEach(out::println));
        lane.limits()
                .ifPresent(draws -> out.println(
                        String.format(Locale.ROOT, "  Both limits of every quantile exist from %,d draws on.", draws)));
        lane.notes().forEach(note -> Wrapped.lines("  ", note).forEach(out::println));
    }

    private static String ruling(LanePlan lane, Optional<Need> need) {
        return need.isPresent() && lane.inForce().equals(need) ? ", the project's rule" : "";
    }

    private static void wrapped(PrintWriter out, String when, Need need) {
        Wrapped.lines("  ", "%s (%s): %s draws%s.".formatted(when, need.basis(), draws(need), seconds(need)))
                .forEach(out::println);
    }

    private static String seconds(Need need) {
        return need.seconds()
                .map(passed -> "; %s s on one thread".formatted(RatioText.of(passed)))
                .orElse("");
    }

    private static String draws(Need need) {
        return Double.isInfinite(need.draws().high())
                ? "at least " + RatioText.about(need.draws().low())
                : RatioText.of(need.draws());
    }
}
