package dev.leadline.cli;

import dev.leadline.engine.Achieved;
import dev.leadline.model.Sentence;
import dev.leadline.project.ProblemsJson;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.ParseResult;

/// `check`: is the project sound?
final class CheckCommand implements Command {

    @Override
    public String name() {
        return "check";
    }

    @Override
    public CommandSpec spec() {
        return Arguments.command(
                        name(),
                        "Check a project without running it: every problem at once, each with its place.",
                        "leadline check mooring-line.leadline",
                        "leadline check mooring-line.leadline --json")
                .addPositional(Arguments.project());
    }

    @Override
    public int run(ParseResult arguments, Console console) {
        var open = OpenProject.of(Arguments.project(arguments));
        open.printNotes(console, Arguments.has(arguments, "--quiet"));
        var question = open.project().question();
        var achieved = Achieved.of(question, open.project().plan().seed());
        if (Arguments.has(arguments, "--json")) {
            console.out().print(ProblemsJson.none(question, achieved));
        } else {
            console.out().println(Sentence.of(open.project().draft()).text());
            TiedText.lines(question, achieved).forEach(console.out()::println);
            console.out().println("No problem found.");
        }
        return Commands.DONE;
    }
}
