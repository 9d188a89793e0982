package dev.leadline.cli;

import java.math.BigDecimal;
import java.nio.file.Path;
import java.util.OptionalDouble;
import java.util.OptionalLong;
import picocli.CommandLine.ITypeConverter;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Model.OptionSpec;
import picocli.CommandLine.Model.PositionalParamSpec;
import picocli.CommandLine.ParseResult;
import picocli.CommandLine.TypeConversionException;

/// The arguments that several commands share, and how they are read.
final class Arguments {

    private Arguments() {}

    /// A command with `--help`, `--json` and `--quiet`.
    static CommandSpec command(String name, String description, String... examples) {
        var spec = CommandSpec.create().name(name);
        spec.usageMessage()
                .description(description)
                .optionListHeading("%nOptions:%n")
                .sortOptions(false)
                .width(100)
                .footer(examples(examples));
        spec.addOption(flag("--json", "Print exactly one JSON object on standard output."));
        spec.addOption(flag("--quiet", "No progress and no notes on standard error."));
        spec.addOption(help());
        return spec;
    }

    static OptionSpec help() {
        return OptionSpec.builder("-h", "--help")
                .usageHelp(true)
                .description("Show this help.")
                .build();
    }

    static PositionalParamSpec project() {
        return PositionalParamSpec.builder()
                .paramLabel("PROJECT")
                .type(Path.class)
                .index("0")
                .arity("1")
                .required(true)
                .description("A project file (.leadline).")
                .build();
    }

    static OptionSpec flag(String name, String description) {
        return OptionSpec.builder(name)
                .arity("0")
                .type(boolean.class)
                .description(description)
                .build();
    }

    static <T> OptionSpec option(
            String name, String label, Class<T> type, ITypeConverter<T> converter, String description) {
        return OptionSpec.builder(name)
                .paramLabel(label)
                .arity("1")
                .type(type)
                .converters(converter)
                .description(description)
                .build();
    }

    /// A whole number, also written `1e6`.
    static ITypeConverter<Long> whole(long least, long most) {
        return text -> {
            try {
                long value = new BigDecimal(text.replace("_", "")).longValueExact();
                if (value >= least && value <= most) {
                    return value;
                }
            } catch (ArithmeticException | NumberFormatException e) {
                // said below
            }
            throw new TypeConversionException("'%s' is not a whole number from %d to %d".formatted(text, least, most));
        };
    }

    static ITypeConverter<Double> positive() {
        return text -> {
            try {
                double value = Double.parseDouble(text);
                if (value > 0 && value < Double.POSITIVE_INFINITY) {
                    return value;
                }
            } catch (NumberFormatException e) {
                // said below
            }
            throw new TypeConversionException("'%s' is not a number greater than 0".formatted(text));
        };
    }

    static Path project(ParseResult arguments) {
        return arguments.matchedPositionalValue(0, Path.of(""));
    }

    static boolean has(ParseResult arguments, String option) {
        return arguments.hasMatchedOption(option);
    }

    static OptionalLong whole(ParseResult arguments, String option) {
        Long value = arguments.matchedOptionValue(option, null);
        return value == null ? OptionalLong.empty() : OptionalLong.of(value);
    }

    static OptionalDouble number(ParseResult arguments, String option) {
        Double value = arguments.matchedOptionValue(option, null);
        return value == null ? OptionalDouble.empty() : OptionalDouble.of(value);
    }

    private static String[] examples(String... lines) {
        String[] footer = new String[lines.length + 1];
        footer[0] = lines.length == 0 ? "" : "%nExamples:";
        for (int i = 0; i < lines.length; i++) {
            footer[i + 1] = "  " + lines[i].replace("%", "%%");
        }
        return footer;
    }
}
