package dev.leadline.cli;

import dev.leadline.chart.Export;
import dev.leadline.chart.Picture;
import dev.leadline.chart.PictureKind;
import dev.leadline.chart.Repeated;
import dev.leadline.chart.Subject;
import dev.leadline.chart.View;
import dev.leadline.engine.Achieved;
import dev.leadline.model.Plan;
import dev.leadline.model.Question;
import dev.leadline.problem.Problem;
import dev.leadline.problem.Refusal;
import dev.leadline.project.RehearsalJson;
import dev.leadline.project.RunJson;
import dev.leadline.project.WholeFile;
import dev.leadline.study.LaneState;
import dev.leadline.study.RehearsalPlan;
import dev.leadline.study.StudyState;
import java.nio.file.Path;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import java.util.function.Consumer;
import java.util.stream.Collectors;
import java.util.stream.Stream;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Model.OptionSpec;
import picocli.CommandLine.ParseResult;
import picocli.CommandLine.TypeConversionException;

/// `figure`: runs a project and draws a picture of it into a file.
final class FigureCommand implements Command {

    private static final int MOST_PIXELS = 8000;

    /// The picture that is not of a run, but of many.
    private static final String REHEARSAL = "rehearsal";

    @Override
    public String name() {
        return "figure";
    }

    @Override
    public CommandSpec spec() {
        var spec = Arguments.command(
                name(),
                "Run a project and draw how its estimate settled, or how its error shrank, lane by lane; or repeat it"
                        + " and draw which intervals hold.",
                "leadline figure mooring-line.leadline -o settling.png",
                "leadline figure mooring-line.leadline -o error.svg --view error-decay --width 900 --height 500"
                        + " --draws 1e6",
                "leadline figure mooring-line.leadline -o rehearsal.png --view rehearsal --draws 1e4 --repetitions"
                        + " 500");
        spec.addPositional(Arguments.project());
        spec.addOption(OptionSpec.builder("-o", "--output")
                .paramLabel("FILE")
                .arity("1")
                .type(Path.class)
                .required(true)
                .description("The file to write, .png or .svg; replaced where it is there.")
                .build());
        spec.addOption(Arguments.option(
                "--view",
                "VIEW",
                String.class,
                FigureCommand::view,
                "Which picture: %s (settling if left out).".formatted(words())));
        spec.addOption(size("--width", Picture.LEAST_WIDTH, "Pixels across, at 96 to the inch (1000 if left out)."));
        spec.addOption(size("--height", Picture.LEAST_HEIGHT, "Pixels down (600 if left out)."));
        spec.addOption(Arguments.option(
                "--dpi", "N", Long.class, Arguments.whole(24, 1200), "Dots to the inch of a PNG (192 if left out)."));
        RunArguments.addTo(spec);
        spec.addOption(RehearseCommand.repetitions());
        return spec;
    }

    @Override
    public int run(ParseResult arguments, Console console) throws InterruptedException {
        Path file = arguments.matchedOptionValue("--output", Path.of(""));
        // Before anything is computed: a run of minutes must not end in a file that cannot be written.
        String view = arguments.matchedOptionValue("--view", PictureKind.SETTLING.word());
        if (Arguments.has(arguments, "--repetitions") && !view.equals(REHEARSAL)) {
            throw new Refusal(Problem.of("--repetitions belongs to --view rehearsal")
                    .because("The other pictures are of one run."));
        }
        var export = Export.of(file);
        WholeFile.check(file);
        int width = (int) Arguments.whole(arguments, "--width").orElse(1000);
        int height = (int) Arguments.whole(arguments, "--height").orElse(600);
        int dpi = (int) Arguments.whole(arguments, "--dpi").orElse(192);
        boolean quiet = Arguments.has(arguments, "--quiet");
        var open = OpenProject.of(Arguments.project(arguments));
        open.printNotes(console, quiet);
        Question question = open.project().question();
        Plan plan = RunArguments.override(open.project().plan(), arguments);
        if (view.equals(REHEARSAL)) {
            return rehearsal(
                    arguments,
                    console,
                    open,
                    plan,
                    subject -> WholeFile.write(file, export.bytes(subject, View.FOLLOWING, width, height, dpi)));
        }
        StudyState state = RunCommand.run(question, plan, RunArguments.threads(arguments), console, quiet);
        var subject = kind(view)
                .orElseThrow()
                .of(question, plan, state.lanes().stream().map(LaneState::trace).toList());
        WholeFile.write(file, export.bytes(subject, View.FOLLOWING, width, height, dpi));
        if (Arguments.has(arguments, "--json")) {
            console.out()
                    .print(RunJson.of(
                            open.name(),
                            open.project(),
                            plan,
                            state,
                            Achieved.of(open.project().question(), plan.seed())));
        } else {
            console.out().println(subject.caption());
            console.out().println("Written to " + file);
            if (!quiet) {
                console.err().print(new RunText(console, open.project(), plan).doubts(state));
            }
        }
        return RunCommand.exitCode(question, state);
    }

    private static int rehearsal(
            ParseResult arguments, Console console, OpenProject open, Plan plan, Consumer<Subject> write)
            throws InterruptedException {
        Question question = open.project().question();
        var repeated = RehearsalPlan.of(plan, List.of(), (int)
                Arguments.whole(arguments, "--repetitions").orElse(RehearsalPlan.suggested(question)));
        var state = RehearseCommand.rehearse(
                question, repeated, RunArguments.threads(arguments), console, Arguments.has(arguments, "--quiet"));
        var subject = Repeated.of(question, state.rehearsals().getFirst());
        write.accept(subject);
        if (Arguments.has(arguments, "--json")) {
            console.out().print(RehearsalJson.of(open.name(), open.project(), repeated, state));
        } else {
            console.out().println(subject.caption());
            console.out().println("Written to " + arguments.matchedOptionValue("--output", Path.of("")));
        }
        return RehearseCommand.exitCode(state);
    }

    private static String words() {
        return Stream.concat(Arrays.stream(PictureKind.values()).map(PictureKind::word), Stream.of(REHEARSAL))
                .collect(Collectors.joining(", "));
    }

    private static String view(String word) {
        if (word.equals(REHEARSAL) || kind(word).isPresent()) {
            return word;
        }
        throw new TypeConversionException("'%s' is not one of %s".formatted(word, words()));
    }

    private static Optional<PictureKind> kind(String word) {
        return Arrays.stream(PictureKind.values())
                .filter(kind -> kind.word().equals(word))
                .findFirst();
    }

    private static OptionSpec size(String name, int least, String description) {
        return Arguments.option(name, "PX", Long.class, Arguments.whole(least, MOST_PIXELS), description);
    }
}
