package dev.leadline.cli;

import dev.leadline.problem.Refusal;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.ParseResult;

/// One command: how its arguments are written, and what it does.
interface Command {

    String name();

    CommandSpec spec();

    /// @return the exit code
    /// @throws Refusal where the input is wrong; nothing was printed on `out` then
    int run(ParseResult arguments, Console console) throws InterruptedException;
}
