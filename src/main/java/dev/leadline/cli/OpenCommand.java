package dev.leadline.cli;

import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Optional;
import java.util.function.ToIntFunction;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.ParseResult;

/// `open`: the window.
///
/// @param window opens it with a project, and returns the exit code when it is closed
record OpenCommand(ToIntFunction<Optional<Path>> window) implements Command {

    @Override
    public String name() {
        return "open";
    }

    @Override
    public CommandSpec spec() {
        return Arguments.command(name(), "Open a project in the window.", "leadline open mooring-line.leadline")
                .addPositional(Arguments.project());
    }

    /// A project with problems opens too: the window shows them.
    @Override
    public int run(ParseResult arguments, Console console) {
        Path file = Arguments.project(arguments);
        if (!Files.isRegularFile(file)) {
            OpenProject.of(file);
        }
        return window.applyAsInt(Optional.of(file));
    }
}
