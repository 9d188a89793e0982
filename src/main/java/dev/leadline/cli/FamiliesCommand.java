package dev.leadline.cli;

import dev.leadline.density.Catalogue;
import dev.leadline.density.Family;
import dev.leadline.density.Parameter;
import dev.leadline.project.FamiliesJson;
import java.util.List;
import java.util.stream.Collectors;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.ParseResult;

/// `families`: which densities there are, and what their parameters must be.
final class FamiliesCommand implements Command {

    @Override
    public String name() {
        return "families";
    }

    @Override
    public CommandSpec spec() {
        return Arguments.command(
                name(),
                "List the families of densities: what each is used for, and the rules of its parameters.",
                "leadline families",
                "leadline families --json");
    }

    @Override
    public int run(ParseResult arguments, Console console) {
        List<Family> families = Catalogue.families();
        if (Arguments.has(arguments, "--json")) {
            console.out().print(FamiliesJson.of(families));
            return Commands.DONE;
        }
        for (Family family : families) {
            console.out().println(console.bold(family.name()) + "  " + family.use());
            for (int i = 0; i < family.entries().size(); i++) {
                console.out()
                        .println((i == 0 ? "    " : "  or ")
                                + line(family.entries().get(i)));
            }
        }
        return Commands.DONE;
    }

    private static String line(List<Parameter> entry) {
        return entry.stream()
                .map(parameter -> parameter.name() + " (" + parameter.rule() + ")")
                .collect(Collectors.joining(", "));
    }
}
