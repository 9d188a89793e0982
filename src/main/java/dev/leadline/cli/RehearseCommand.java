package dev.leadline.cli;

import dev.leadline.model.Plan;
import dev.leadline.model.Question;
import dev.leadline.model.Stop;
import dev.leadline.problem.Problem;
import dev.leadline.problem.Refusal;
import dev.leadline.project.RehearsalJson;
import dev.leadline.study.RehearsalPlan;
import dev.leadline.study.RehearsalState;
import dev.leadline.study.RehearsalText;
import dev.leadline.study.Rehearsing;
import dev.leadline.trace.Rehearsal;
import dev.leadline.trace.Rehearsed;
import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import java.util.function.Consumer;
import picocli.CommandLine.ITypeConverter;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Model.OptionSpec;
import picocli.CommandLine.ParseResult;
import picocli.CommandLine.TypeConversionException;

/// `rehearse`: repeats a set-up many times and counts how often its interval holds.
final class RehearseCommand implements Command {
    @Override
    public String name() {
        return "rehearse";
    }

    @Override
    public CommandSpec spec() {
        var spec = Arguments.command(
                name(),
                "Repeat a lane from fresh random numbers, and count how often its interval holds the reference value,"
                        + " or where there is none that of a much longer run made for it.",
                "leadline rehearse tide-gauge.leadline --draws 1000",
                "leadline rehearse mooring-line.leadline --lane B --draws 1e3,1e4,1e5 --repetitions 500",
                "leadline rehearse ferry-fuel.leadline --mcse 0.002 --json");
        spec.addPositional(Arguments.project());
        spec.addOption(repetitions());
        spec.addOption(Arguments.option(
                "--mcse",
                "E",
                Double.class,
                Arguments.positive(),
                "Repeat as often as shows the rate with this standard error (0.005 if left out)."));
        spec.addOption(Arguments.option(
                "--draws",
                "N[,N...]",
                List.class,
                list(Arguments.whole(1, Stop.MOST_DRAWS)),
                "Make N draws in each repetition, down to whole observations or rounds; several numbers, separated by"
                        + " commas, one after the other."));
        spec.addOption(Arguments.option(
                "--lane", "NAME", String.class, text -> text, "Repeat this lane (the first one if left out)."));
        spec.addOption(RunArguments.seed());
        spec.addOption(RunArguments.threads());
        return spec;
    }

    @SuppressWarnings("rawtypes")
    private static ITypeConverter<List> list(ITypeConverter<Long> one) {
        return text -> {
            List<Long> all = Arrays.stream(text.split(",", -1))
                    .map(part -> {
                        try {
                            return one.convert(part.strip());
                        } catch (TypeConversionException e) {
                            throw e;
                        } catch (Exception e) {
                            throw new IllegalStateException(e);
                        }
                    })
                    .toList();
            return all;
        };
    }

    @Override
    public int run(ParseResult arguments, Console console) throws InterruptedException {
        boolean quiet = Arguments.has(arguments, "--quiet");
        var open = OpenProject.of(Arguments.project(arguments));
        open.printNotes(console, quiet);
        Question question = open.project().question();
        RehearsalPlan plan = plan(question, open.project().plan(), arguments);
        RehearsalState state = rehearse(question, plan, RunArguments.threads(arguments), console, quiet);
        if (Arguments.has(arguments, "--json")) {
            console.out().print(RehearsalJson.of(open.name(), open.project(), plan, state));
        } else {
            print(console, question, state);
        }
        return exitCode(state);
    }

    /// Repeats to the end, with progress where someone can see it.
    static RehearsalState rehearse(Question question, RehearsalPlan plan, int threads, Console console, boolean quiet)
            throws InterruptedException {
        plan.note().filter(_ -> !quiet).ifPresent(note -> console.err().println("note: " + note));
        try (var line = new Line(console, quiet);
                var rehearsing = Rehearsing.start(question, plan, threads, line)) {
            return rehearsing.await();
        }
    }

    /// No interval may fall short of its level.
    static int exitCode(RehearsalState state) {
        return state.rehearsals().stream()
                        .flatMap(rehearsal -> rehearsal.answers().stream())
                        .map(Rehearsed::verdict)
                        .allMatch(verdict ->
                                verdict == Rehearsed.Verdict.HOLDS || verdict == Rehearsed.Verdict.MORE_THAN_STATED)
                ? Commands.DONE
                : Commands.NOT_MET;
    }

    static OptionSpec repetitions() {
        return Arguments.option(
                "--repetitions",
                "N",
                Long.class,
                Arguments.whole(2, RehearsalPlan.MOST_REPETITIONS),
                "Repeat N times (left out: 1,900 at 95 %%, which shows the rate with a standard error of 0.5 %%).");
    }

    private static RehearsalPlan plan(Question question, Plan whole, ParseResult arguments) {
        if (Arguments.has(arguments, "--repetitions") && Arguments.has(arguments, "--mcse")) {
            throw new Refusal(Problem.of("--repetitions and --mcse both say how many repetitions there are")
                    .tryThis("Give one of them."));
        }
        int repetitions = (int) Arguments.whole(arguments, "--repetitions")
                .orElseGet(() -> RehearsalPlan.suggested(
                        question, Arguments.number(arguments, "--mcse").orElse(RehearsalPlan.USUAL_MCSE)));
        String lane = arguments.matchedOptionValue("--lane", "");
        var plan = new Plan(
                whole.stop(),
                Arguments.whole(arguments, "--seed").orElse(whole.seed()),
                lane.isEmpty() ? whole.lanes() : List.of(RunArguments.lane(whole.lanes(), lane)));
        return RehearsalPlan.of(plan, arguments.matchedOptionValue("--draws", List.<Long>of()), repetitions);
    }

    private static void print(Console console, Question question, RehearsalState state) {
        for (Rehearsal rehearsal : state.rehearsals()) {
            console.out()
                    .println(console.bold(String.format(
                            Locale.ROOT,
                            "Lane %s (%s), %,d repetitions of %s",
                            rehearsal.lane(),
                            rehearsal.scheme(),
                            rehearsal.repetitions(),
                            RehearsalText.draws(rehearsal))));
            for (Rehearsed answer : rehearsal.answers()) {
                if (rehearsal.answers().size() > 1) {
                    console.out().println("  " + answer.ask().name() + ":");
                }
                wrapped(console, RehearsalText.counts(answer));
                wrapped(console, RehearsalText.meaning(rehearsal, answer));
                wrapped(console, RehearsalText.sought(answer));
                RehearsalText.estimates(answer).forEach(sentence -> wrapped(console, sentence));
            }
            RehearsalText.further(rehearsal, question.confidence()).forEach(sentence -> wrapped(console, sentence));
        }
    }

    private static void wrapped(Console console, String words) {
        Wrapped.lines("  ", words).forEach(console.out()::println);
    }

    /// Progress on a terminal.
    private static final class Line implements Consumer<RehearsalState>, AutoCloseable {
        private final Console console;
        private final boolean shown;
        private final long start = System.nanoTime();

        Line(Console console, boolean quiet) {
            this.console = console;
            this.shown = console.live() && !quiet;
        }

        @Override
        public void accept(RehearsalState state) {
            if (shown && !state.ended()) {
                double elapsed = (System.nanoTime() - start) / 1e9;
                String left = state.done() > 0
                        ? String.format(Locale.ROOT, "%.0f s left", elapsed * (1 - state.done()) / state.done())
                        : "";
                console.err()
                        .print(String.format(
                                Locale.ROOT,
                                "\r  %3.0f %%   %s   %-12s",
                                100 * state.done(),
                                doing(state.activity()),
                                left));
                console.err().flush();
            }
        }

        private static String doing(RehearsalState.Activity activity) {
            return switch (activity) {
                case PREPARING -> "building tables          ";
                case SEEKING -> "making the value sought  ";
                case REPEATING, FINISHED, CANCELLED, FAILED -> "repeating                ";
            };
        }

        @Override
        public void close() {
            if (shown) {
                console.err().print("\r" + " ".repeat(60) + "\r");
                console.err().flush();
            }
        }
    }
}
