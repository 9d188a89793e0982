package dev.leadline.cli;

import dev.leadline.density.Fit;
import dev.leadline.density.Fits;
import dev.leadline.density.Fits.Wanted;
import dev.leadline.model.DataColumn;
import dev.leadline.model.DensityDraft.Column;
import dev.leadline.numeric.Significant;
import dev.leadline.problem.Problem;
import dev.leadline.problem.Refusal;
import dev.leadline.project.DataFolder;
import dev.leadline.project.FitsJson;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.stream.Collectors;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Model.OptionSpec;
import picocli.CommandLine.ParseResult;

/// `families --fit FILE`: families fitted to a column of data.
final class FamilyFits {

    private static final String FIT = "--fit";
    private static final String COLUMN = "--column";
    private static final int DIGITS = 6;

    /// Of a column as wide as the longest of its cells.
    private static final int GAP = 2;

    private FamilyFits() {}

    static CommandSpec options(CommandSpec spec) {
        return spec.addOption(OptionSpec.builder(FIT)
                        .paramLabel("FILE")
                        .arity("1")
                        .type(Path.class)
                        .description("Fit families to a column of data (CSV) by maximum likelihood; name the families,"
                                + " each followed by parameters that are given, or none for all.")
                        .build())
                .addOption(OptionSpec.builder(COLUMN)
                        .paramLabel("C")
                        .arity("1")
                        .type(String.class)
                        .description("With --fit: a header, or the number of the column from 1.")
                        .build());
    }

    static boolean isAsked(ParseResult arguments) {
        return Arguments.has(arguments, FIT);
    }

    static void refuseColumnAlone(ParseResult arguments) {
        if (Arguments.has(arguments, COLUMN) && !isAsked(arguments)) {
            throw new Refusal(
                    Problem.of("--column has no use without --fit").tryThis("Add --fit with a file of data."));
        }
    }

    /// @param words families and `parameter=value`
    static void print(ParseResult arguments, List<String> words, Console console) {
        Path file = arguments.matchedOptionValue(FIT, Path.of(""));
        String name = arguments.matchedOptionValue(COLUMN, "");
        List<Wanted> wanted = wanted(words);
        DataColumn column = read(file, column(name));
        Fits fits = Fits.of(column.values().stream().mapToDouble(x -> x).toArray(), wanted);
        if (!Arguments.has(arguments, "--quiet")) {
            column.notes().forEach(note -> console.err().print(ProblemText.note(note)));
            console.err().flush();
        }
        if (Arguments.has(arguments, "--json")) {
            console.out().print(FitsJson.of(fits, nameOf(file), column(name)));
        } else {
            table(fits, console);
            densities(fits, nameOf(file), column(name), console);
        }
    }

    /// For a project in the folder of the file.
    private static String nameOf(Path file) {
        return String.valueOf(file.getFileName());
    }

    private static void densities(Fits fits, String file, Column column, Console console) {
        console.out().println();
        console.out().println("As the density of an input, in a project beside the file:");
        fits.fits().forEach(fit -> console.out().println(FitsJson.density(fit, file, column)));
    }

    private static DataColumn read(Path file, Column column) {
        try {
            // whoever writes the command may read where a link leads
            Path real = Files.exists(file) ? file.toRealPath() : file.toAbsolutePath();
            return DataFolder.beside(real).column(String.valueOf(real.getFileName()), column);
        } catch (IOException e) {
            throw new Refusal(Problem.of("%s cannot be read".formatted(file.getFileName()))
                    .tryThis("See whether you may read it."));
        }
    }

    private static Column column(String name) {
        if (name.isEmpty()) {
            return new Column.Only();
        }
        return name.matches("[1-9]\\d{0,8}") ? new Column.At(Long.parseLong(name)) : new Column.Named(name);
    }

    private static List<Wanted> wanted(List<String> words) {
        List<Wanted> wanted = new ArrayList<>();
        for (String word : words) {
            int equals = word.indexOf('=');
            if (equals < 0) {
                wanted.add(new Wanted(word, Map.of()));
            } else if (wanted.isEmpty()) {
                throw new Refusal(Problem.of("\"%s\" stands before any family".formatted(word))
                        .tryThis("Write the family first, as beta from=0 to=10."));
            } else {
                Wanted last = wanted.removeLast();
                Map<String, Double> given = new LinkedHashMap<>(last.given());
                given.put(word.substring(0, equals), number(word, word.substring(equals + 1)));
                wanted.add(new Wanted(last.family(), given));
            }
        }
        return wanted;
    }

    private static double number(String word, String text) {
        try {
            double value = Double.parseDouble(text);
            if (Double.isFinite(value)) {
                return value;
            }
        } catch (NumberFormatException e) {
            // said below
        }
        throw new Refusal(Problem.of("\"%s\" has no number behind its =".formatted(word))
                .tryThis("Write it with a decimal point, as from=0.5."));
    }

    private static void table(Fits fits, Console console) {
        List<List<String>> rows = new ArrayList<>();
        rows.add(List.of("family", "log-likelihood", "AIC", "KS", "AD", "parameters"));
        fits.fits().forEach(fit -> rows.add(row(fit, fits.sorted().size())));
        int[] widths = new int[rows.getFirst().size()];
        for (List<String> row : rows) {
            for (int i = 0; i < widths.length; i++) {
                widths[i] = Math.max(widths[i], row.get(i).length());
            }
        }
        for (List<String> row : rows) {
            var line = new StringBuilder();
            for (int i = 0; i < widths.length; i++) {
                String cell = row.get(i);
                String pad = " ".repeat(widths[i] - cell.length());
                boolean number = i > 0 && i < widths.length - 1;
                line.append(number ? pad + cell : cell + pad).append(" ".repeat(GAP));
            }
            console.out().println(line.toString().stripTrailing());
        }
        fits.refused()
                .forEach(refused -> console.out()
                        .println(refused.family() + ": " + refused.why().primary() + "."
                                + refused.why().hint().map(hint -> " " + hint).orElse("")));
        console.out().println();
        console.out()
                .println("Smaller AIC is better, for fits to the same values. KS and AD are the distances of Kolmogorov"
                        + " and Smirnov and of Anderson and Darling;");
        console.out()
                .println("they have no p-values, since the parameters were fitted to the same values. A fit is advice:"
                        + " what the values are decides.");
    }

    private static List<String> row(Fit fit, int all) {
        String parameters = fit.parameters().entrySet().stream()
                .map(entry -> entry.getKey() + "=" + Significant.text(entry.getValue(), DIGITS))
                .collect(Collectors.joining(" "));
        String some = fit.used() < all ? "  (%d of %d values)".formatted(fit.used(), all) : "";
        return List.of(
                fit.family(),
                Significant.text(fit.logLikelihood(), DIGITS),
                Significant.text(fit.aic(), DIGITS),
                Significant.text(fit.kolmogorovSmirnov(), 4),
                Optional.of(fit.andersonDarling())
                        .filter(Double::isFinite)
                        .map(distance -> Significant.text(distance, 4))
                        .orElse("-"),
                parameters + some);
    }
}
