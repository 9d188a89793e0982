package dev.leadline.cli;

import dev.leadline.problem.Nearest;
import dev.leadline.problem.Problem;
import dev.leadline.problem.Refusal;
import dev.leadline.project.ProblemsJson;
import dev.leadline.project.ProjectFile;
import dev.leadline.project.Version;
import java.nio.file.Path;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import java.util.function.ToIntFunction;
import java.util.stream.Stream;
import picocli.CommandLine;
import picocli.CommandLine.Help.Ansi;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Model.OptionSpec;
import picocli.CommandLine.ParameterException;
import picocli.CommandLine.ParseResult;
import picocli.CommandLine.UnmatchedArgumentException;

/// The command line: reads the arguments, runs the command, answers for the exit code.
public final class Commands {

    public static final int DONE = 0;
    public static final int NOT_MET = 1;
    public static final int WRONG_INPUT = 2;
    public static final int OUR_FAULT = 3;

    /// Commands of the programme that this version lacks.
    private static final Set<String> LATER = Set.of("report", "replay");

    /// Options of its commands that this version lacks.
    private static final Set<String> OPTIONS_LATER = Set.of("--record", "--report");

    private final Console console;
    private final ToIntFunction<Optional<Path>> window;
    private final List<Command> commands;

    private Commands(Console console, ToIntFunction<Optional<Path>> window) {
        this.console = console;
        this.window = window;
        this.commands = List.of(
                new RunCommand(),
                new CheckCommand(),
                new LookCommand(),
                new CompareCommand(),
                new SuggestCommand(),
                new RehearseCommand(),
                new PlanCommand(),
                new FigureCommand(),
                new FamiliesCommand(),
                new OpenCommand(window));
    }

    /// @param window opens the window, with a project where one is given, and returns the exit code when it is closed
    /// @return the exit code
    public static int run(String[] arguments, Console console, ToIntFunction<Optional<Path>> window) {
        try {
            return new Commands(console, window).run(arguments);
        } finally {
            console.out().flush();
            console.err().flush();
        }
    }

    private int run(String[] arguments) {
        boolean json = Arrays.asList(arguments).contains("--json");
        try {
            return parsed(arguments);
        } catch (OpenProject.Wrong wrong) {
            return refuse(wrong.problems(), wrong.text(), json);
        } catch (Refusal refusal) {
            return refuse(refusal.problems(), ProblemText.of("", refusal.problems(), Optional.empty()), json);
        } catch (InterruptedException e) {
            Thread.currentThread().interrupt();
            return fault(e, json);
        } catch (Throwable fault) {
            return fault(fault, json);
        }
    }

    private int parsed(String[] arguments) throws InterruptedException {
        if (arguments.length == 0) {
            return window.applyAsInt(Optional.empty());
        }
        CommandLine line = commandLine();
        refuseLaterCommands(arguments);
        ParseResult whole;
        try {
            whole = line.parseArgs(arguments);
        } catch (ParameterException e) {
            throw new Refusal(problems(e));
        }
        ParseResult last = whole.hasSubcommand() ? whole.subcommand() : whole;
        if (last.isUsageHelpRequested() || (!whole.hasSubcommand() && !whole.isVersionHelpRequested())) {
            last.commandSpec().commandLine().usage(console.out(), console.styled() ? Ansi.ON : Ansi.OFF);
            return DONE;
        }
        if (whole.isVersionHelpRequested()) {
            console.out().println("leadline " + Version.text());
            return DONE;
        }
        Command command = commands.stream()
                .filter(known -> known.name().equals(last.commandSpec().name()))
                .findFirst()
                .orElseThrow();
        return command.run(last, console);
    }

    private CommandLine commandLine() {
        var spec = CommandSpec.create().name("leadline");
        spec.usageMessage()
                .description("Expected values, integrals and event probabilities by random sampling,"
                        + " with intervals that hold.")
                .commandListHeading("%nCommands:%n")
                .optionListHeading("%nOptions:%n")
                .width(100)
                .footer(
                        "%nExamples:",
                        "  leadline run mooring-line.leadline",
                        "  leadline run mooring-line.leadline --draws 1e6 --json",
                        "  leadline run --help",
                        "%nWithout a command the window opens.",
                        "Exit codes: 0 done, 1 tolerance not met or an objection stands, 2 wrong input, 3 our fault.");
        spec.addOption(Arguments.help());
        spec.addOption(OptionSpec.builder("--version")
                .versionHelp(true)
                .description("Show the version.")
                .build());
        for (Command command : commands) {
            spec.addSubcommand(command.name(), command.spec());
        }
        return new CommandLine(spec).setExpandAtFiles(false);
    }

    private void refuseLaterCommands(String[] arguments) {
        Optional<String> command = Arrays.stream(arguments)
                .filter(argument -> !argument.startsWith("-"))
                .findFirst();
        if (command.isEmpty()
                || commands.stream().anyMatch(known -> known.name().equals(command.get()))) {
            return;
        }
        List<String> names = commands.stream().map(Command::name).toList();
        Problem problem = Problem.of(
                        LATER.contains(command.get())
                                ? "the command %s is not available".formatted(command.get())
                                : "there is no command \"%s\"".formatted(shown(command.get())))
                .because("Commands are %s.".formatted(String.join(", ", names)));
        throw new Refusal(problem.tryThis(
                command.get().endsWith(ProjectFile.EXTENSION)
                        ? "Write leadline run, or leadline open, before the name of a project."
                        : Nearest.to(command.get(), names)
                                .map("Was \"leadline %s\" meant?"::formatted)
                                .orElse("See leadline --help.")));
    }

    private static List<Problem> problems(ParameterException e) {
        String command = e.getCommandLine().getCommandName();
        String hint = "See leadline %s--help.".formatted(command.equals("leadline") ? "" : command + " ");
        if (!(e instanceof UnmatchedArgumentException unmatched)) {
            return List.of(Problem.of(shown(e.getMessage())).tryThis(hint));
        }
        List<String> options = e.getCommandLine().getCommandSpec().options().stream()
                .flatMap(known -> Stream.of(known.names()))
                .toList();
        // what stands behind an unknown option is its value, and says nothing more
        boolean option = unmatched.getUnmatched().getFirst().startsWith("-");
        return unmatched.getUnmatched().stream()
                .filter(argument -> !option || argument.startsWith("-"))
                .map(argument -> {
                    String name = argument.replaceAll("=.*", "");
                    Problem problem = Problem.of(
                            OPTIONS_LATER.contains(name)
                                    ? "%s is not available".formatted(name)
                                    : "\"%s\" is not understood".formatted(shown(argument)));
                    return problem.tryThis(Nearest.to(name, options)
                            .map("Was %s meant?"::formatted)
                            .orElse(hint));
                })
                .toList();
    }

    private int refuse(List<Problem> problems, String text, boolean json) {
        if (json) {
            console.out().print(ProblemsJson.of(problems));
        }
        console.err().print(text);
        return WRONG_INPUT;
    }

    private int fault(Throwable fault, boolean json) {
        Throwable cause = fault instanceof IllegalStateException && fault.getCause() != null ? fault.getCause() : fault;
        Optional<Problem> lack = Lack.behind(cause);
        if (lack.isPresent()) {
            return refuse(List.of(lack.get()), ProblemText.of("", List.of(lack.get()), Optional.empty()), json);
        }
        boolean isMemory = Stream.iterate(cause, behind -> behind != null, Throwable::getCause)
                .limit(20)
                .anyMatch(behind -> behind instanceof OutOfMemoryError);
        Problem said = isMemory
                ? Problem.of("there was not enough memory to go on")
                        .because(
                                "It may use %d MB; every input whose shape no other has keeps a table of 60 kB or more."
                                        .formatted(Runtime.getRuntime().maxMemory() >> 20))
                        .tryThis("Run with fewer threads, or allow it more: JAVA_TOOL_OPTIONS=-Xmx1g.")
                : Problem.of("Leadline failed; this is our fault, not yours")
                        .because("Your project was not changed.")
                        .tryThis("Please report it with what you did.");
        Problem problem = FaultLog.write(said.primary(), cause)
                .map(file -> said.because(said.detail().orElseThrow() + " Details stand in " + file + "."))
                .orElse(said);
        if (json) {
            console.out().print(ProblemsJson.of(List.of(problem)));
        }
        console.err().print(ProblemText.of("", List.of(problem), Optional.empty()));
        return OUR_FAULT;
    }

    private static String shown(String text) {
        String line = text.replaceAll("[\\p{Cntrl}\\p{Cf}]", "?");
        return line.length() <= 200 ? line : line.substring(0, 199) + "…";
    }
}
