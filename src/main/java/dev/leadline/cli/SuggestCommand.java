package dev.leadline.cli;

import dev.leadline.model.Stop;
import dev.leadline.project.SuggestionJson;
import dev.leadline.study.RatioText;
import dev.leadline.study.Suggestion;
import java.util.Locale;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.ParseResult;

/// `suggest`: tries the schemes that apply, and says which a project is worth.
final class SuggestCommand implements Command {
    @Override
    public String name() {
        return "suggest";
    }

    @Override
    public CommandSpec spec() {
        var spec = Arguments.command(
                name(),
                "Try other schemes in short pilots, and recommend the one that needs least time for the same error, where"
                        + " one surely does.",
                "leadline suggest mooring-line.leadline",
                "leadline suggest quay-lighting.leadline --draws 2e5 --json");
        spec.addPositional(Arguments.project());
        spec.addOption(Arguments.option(
                "--draws",
                "N",
                Long.class,
                Arguments.whole(1_000, Stop.MOST_DRAWS),
                "Draws of each pilot (65,536 if left out). They enter no result."));
        spec.addOption(RunArguments.seed());
        spec.addOption(RunArguments.threads());
        return spec;
    }

    @Override
    public int run(ParseResult arguments, Console console) throws InterruptedException {
        boolean quiet = Arguments.has(arguments, "--quiet");
        var open = OpenProject.of(Arguments.project(arguments));
        open.printNotes(console, quiet);
        var suggestion = Suggestion.of(
                open.project(),
                Arguments.whole(arguments, "--seed")
                        .orElse(open.project().plan().seed()),
                Arguments.whole(arguments, "--draws").orElse(Suggestion.USUAL_DRAWS),
                RunArguments.threads(arguments),
                points -> {
                    if (console.live() && !quiet) {
                        console.err().print("\r  trying %-40s".formatted(points));
                        console.err().flush();
                    }
                });
        if (console.live() && !quiet) {
            console.err().print("\r%50s\r".formatted(""));
            console.err().flush();
        }
        if (Arguments.has(arguments, "--json")) {
            console.out().print(SuggestionJson.of(suggestion));
        } else {
            print(console, suggestion);
        }
        return Commands.DONE;
    }

    private static void print(Console console, Suggestion suggestion) {
        var out = console.out();
        out.println(String.format(
                Locale.ROOT,
                "How many times less time than plain draws for the same error, in pilots of %,d draws:",
                suggestion.draws()));
        var columns = new Columns();
        suggestion
                .rows()
                .forEach(row -> columns.add(
                        row.scheme(), row.efficiencyRatio().map(RatioText::of).orElse("?"), row.reason()));
        columns.print(out);
        out.println("Recommended: " + console.bold(suggestion.recommended().scheme()) + ", as a lane of the project:");
        out.print(SuggestionJson.lane(suggestion.recommended().lane()));
    }
}
