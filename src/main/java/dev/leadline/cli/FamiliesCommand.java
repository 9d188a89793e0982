package dev.leadline.cli;

import dev.leadline.density.Catalogue;
import dev.leadline.density.Density;
import dev.leadline.density.Family;
import dev.leadline.density.Knowledge;
import dev.leadline.density.Parameter;
import dev.leadline.density.Portrait;
import dev.leadline.density.PortraitText;
import dev.leadline.problem.Place;
import dev.leadline.problem.Problem;
import dev.leadline.problem.Refusal;
import dev.leadline.project.FamiliesJson;
import java.io.PrintWriter;
import java.math.BigDecimal;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.stream.Collectors;
import java.util.stream.Stream;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Model.PositionalParamSpec;
import picocli.CommandLine.ParseResult;

/// `families`: which densities there are, what their parameters must be, and what a member looks like.
final class FamiliesCommand implements Command {

    private static final String KNOWN = "--known";

    @Override
    public String name() {
        return "families";
    }

    @Override
    public CommandSpec spec() {
        return FamilyFits.options(Arguments.command(
                        name(),
                        "List the families of densities: what each is used for, and the rules of its parameters. With"
                                + " parameters: the moments, quantiles and tails of that member.",
                        "leadline families",
                        "leadline families gumbel",
                        "leadline families gumbel location=24.5 scale=2.6",
                        "leadline families gumbel location=24.5 scale=2.6 --json",
                        "leadline families --known",
                        "leadline families --known readings n=10 mean=5.012 s=0.019",
                        "leadline families --fit waits.csv --column hours",
                        "leadline families --fit waits.csv --column hours gamma generalized-pareto location=6")
                .addOption(Arguments.flag(
                        KNOWN, "Begin with what is known about a quantity: NAME is a way of knowing, not a family."))
                .addPositional(text("0", "0..1", "NAME", "A family."))
                .addPositional(text("1..*", "0..*", "PARAMETER=VALUE", "Each parameter of a member of it.")));
    }

    private static PositionalParamSpec text(String index, String arity, String label, String description) {
        return PositionalParamSpec.builder()
                .paramLabel(label)
                .type(index.equals("0") ? String.class : String[].class)
                .index(index)
                .arity(arity)
                .description(description)
                .build();
    }

    @Override
    public int run(ParseResult arguments, Console console) {
        boolean json = Arguments.has(arguments, "--json");
        String name = arguments.matchedPositionalValue(0, "");
        String[] values = arguments.matchedPositionalValue(1, new String[0]);
        FamilyFits.refuseColumnAlone(arguments);
        if (FamilyFits.isAsked(arguments)) {
            FamilyFits.print(arguments, words(name, values), console);
        } else if (Arguments.has(arguments, KNOWN)) {
            known(console, name, values, json);
        } else if (name.isEmpty()) {
            list(console, Catalogue.families(), json);
        } else if (values.length == 0) {
            list(console, List.of(Catalogue.named(name)), json);
        } else {
            Family family = Catalogue.named(name);
            Density member = family.of(parameters(values));
            family.notes(parameters(values)).forEach(note -> console.err().print(ProblemText.note(note)));
            if (json) {
                console.out().print(FamiliesJson.of(family, Portrait.of(member)));
            } else {
                print(console, family, Portrait.of(member));
            }
        }
        return Commands.DONE;
    }

    private static List<String> words(String name, String[] values) {
        return Stream.concat(Stream.of(name), Stream.of(values))
                .filter(word -> !word.isEmpty())
                .toList();
    }

    private static void known(Console console, String word, String[] told, boolean json) {
        if (word.isEmpty()) {
            if (json) {
                console.out().print(FamiliesJson.ways(Knowledge.all()));
            } else {
                Knowledge.all().forEach(way -> {
                    console.out().println(console.bold(way.word()) + "  " + way.title());
                    console.out().println("    " + line(way.parameters()));
                });
            }
            return;
        }
        var suggestion = Knowledge.named(word).suggestion(parameters(told));
        Family family = Catalogue.named(suggestion.family());
        var portrait = Portrait.of(family.of(suggestion.parameters()));
        if (json) {
            console.out().print(FamiliesJson.of(suggestion, family, portrait));
        } else {
            console.out().println(suggestion.provenance());
            console.out().println(FamiliesJson.density(suggestion));
            print(console, family, portrait);
        }
    }

    private static Map<String, Double> parameters(String[] arguments) {
        var parameters = new LinkedHashMap<String, Double>();
        for (String argument : arguments) {
            int equals = argument.indexOf('=');
            String name = argument.substring(0, Math.max(0, equals));
            if (equals < 1) {
                throw new Refusal(Problem.of("\"%s\" is no parameter".formatted(argument))
                        .tryThis("Write each as name=value, as scale=2.6."));
            }
            if (parameters.putIfAbsent(name, number(name, argument.substring(equals + 1))) != null) {
                throw new Refusal(Problem.of(name + " is given twice").at(Place.of(name)));
            }
        }
        return parameters;
    }

    private static double number(String name, String text) {
        try {
            return new BigDecimal(text).doubleValue();
        } catch (NumberFormatException e) {
            throw new Refusal(Problem.of("%s is \"%s\" but must be a number".formatted(name, text))
                    .tryThis("Write it as 2.6, 0.07 or 1.5e-3.")
                    .at(Place.of(name)));
        }
    }

    private static void list(Console console, List<Family> families, boolean json) {
        if (json) {
            console.out().print(FamiliesJson.of(families));
            return;
        }
        for (Family family : families) {
            console.out().println(console.bold(family.name()) + "  " + family.use());
            if (families.size() == 1) {
                explain(console.out(), family);
            } else {
                for (int i = 0; i < family.entries().size(); i++) {
                    console.out()
                            .println((i == 0 ? "    " : "  or ")
                                    + line(family.entries().get(i)));
                }
            }
        }
    }

    private static String line(List<Parameter> entry) {
        return entry.stream()
                .map(parameter -> parameter.name() + " (" + parameter.rule() + ")")
                .collect(Collectors.joining(", "));
    }

    private static void explain(PrintWriter out, Family family) {
        for (List<Parameter> entry : family.entries()) {
            out.println("entered by " + entry.stream().map(Parameter::name).collect(Collectors.joining(", ")));
            var rows = new Columns();
            entry.forEach(parameter -> rows.add(parameter.name(), "", parameter.use() + "; " + parameter.rule()));
            rows.print(out);
        }
    }

    private static void print(Console console, Family family, Portrait portrait) {
        var out = console.out();
        out.println(console.bold(family.name()) + "  " + family.use());
        var moments = new Columns();
        PortraitText.moments(portrait).forEach(row -> moments.add(row.name(), row.value(), row.remark()));
        moments.print(out);
        out.println(portrait.isDiscrete() ? "chance up to and value" : "chance below and value");
        var quantiles = new Columns();
        PortraitText.quantiles(portrait).forEach(row -> quantiles.add(row.name(), row.value(), row.remark()));
        quantiles.print(out);
        PortraitText.sentences(portrait).forEach(out::println);
    }
}
