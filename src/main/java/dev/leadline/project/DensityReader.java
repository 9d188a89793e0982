package dev.leadline.project;

import dev.leadline.density.Catalogue;
import dev.leadline.density.Parameter;
import dev.leadline.model.DensityDraft;
import dev.leadline.model.DensityDraft.Column;
import dev.leadline.model.DensityDraft.Data;
import dev.leadline.model.DensityDraft.Ends;
import dev.leadline.model.DensityDraft.Member;
import dev.leadline.model.DensityDraft.Mixture;
import dev.leadline.model.DensityDraft.Part;
import dev.leadline.model.DensityDraft.Typed;
import dev.leadline.model.DensityDraft.Values;
import dev.leadline.problem.Place;
import dev.leadline.problem.Problem;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.Set;

/// Takes the JSON of a density apart: a family, a mixture, a formula or data.
final class DensityReader {

    /// What each kind of density begins with.
    private static final List<String> KINDS = List.of("family", "mixture", "formula", "data");

    /// What any density may be changed by.
    private static final Set<String> CHANGES = Set.of("shift", "scale");

    private static final Set<String> OF_ANY = Set.of("shift", "scale", "truncate", "weight");

    private static final String TABLE = "table";
    private static final int MOST_PARTS = 1000;
    private static final int MOST_VALUES = 100_000;
    private static final int DEEPEST = 8;

    private final Problems problems;
    private final int depth;

    private DensityReader(Problems problems, int depth) {
        this.problems = problems;
        this.depth = depth;
    }

    static DensityDraft read(Fields fields, Problems problems) {
        return new DensityReader(problems, 0).density(fields);
    }

    private DensityDraft density(Fields fields) {
        var density = part(fields);
        fields.close(Map.of());
        return density;
    }

    /// All but what stands beside it in the same object.
    private DensityDraft part(Fields fields) {
        var kinds = fields.names().stream().filter(KINDS::contains).toList();
        if (kinds.size() != 1) {
            problems.add(Problem.of(
                            kinds.isEmpty()
                                    ? "the density says neither family, mixture, formula nor data"
                                    : "the density has %s in one place".formatted(String.join(" and ", kinds)))
                    .because("A density is a member of a family, a mixture, a formula or a column of data.")
                    .tryThis(kinds.isEmpty() ? "Add \"family\"; the command families lists them." : "Keep one of them.")
                    .at(Place.of(kinds.isEmpty() ? fields.pathOf("family") : fields.path())));
            fields.names().forEach(fields::has);
            return DensityDraft.unchosen();
        }
        var of = switch (kinds.getFirst()) {
            case "mixture" -> mixture(fields);
            case "formula" -> typed(fields);
            case "data" -> data(fields);
            default -> ofFamily(fields);
        };
        return new DensityDraft(of, change(of, fields, "shift"), change(of, fields, "scale"), ends(fields, "truncate"));
    }

    private DensityDraft.Of ofFamily(Fields fields) {
        String family = fields.requiredText("family", DraftReader.NAME);
        return family.equals(TABLE)
                ? new Values(numbers(fields, "values", true), numbers(fields, "probabilities", true))
                : member(fields, family, OF_ANY);
    }

    /// @param elsewhere fields that are no parameters, unless the family has one of that name
    private Member member(Fields fields, String family, Set<String> elsewhere) {
        var parameters = new LinkedHashMap<String, Double>();
        for (String name : fields.names()) {
            if (!name.equals("family") && (!elsewhere.contains(name) || takes(family, name))) {
                parameters.put(name, fields.requiredNumber(name));
            }
        }
        return new Member(family, parameters);
    }

    private static OptionalDouble change(DensityDraft.Of of, Fields fields, String name) {
        boolean parameter = of instanceof Member(String family, var _) && takes(family, name);
        return parameter ? OptionalDouble.empty() : fields.number(name);
    }

    /// Whether a field is a parameter of the family; what is said of an unknown one is taken for its parameters.
    private static boolean takes(String family, String field) {
        return Catalogue.family(family)
                .map(known -> known.entries().stream()
                        .flatMap(List::stream)
                        .map(Parameter::name)
                        .anyMatch(field::equals))
                .orElse(CHANGES.contains(field));
    }

    private Mixture mixture(Fields fields) {
        var parts = new ArrayList<Part>();
        var list = fields.list("mixture", MOST_PARTS);
        if (depth >= DEEPEST) {
            problems.add(Problem.of("mixtures stand in one another more than %d deep".formatted(DEEPEST))
                    .tryThis("Multiply the weights out into one mixture.")
                    .at(Place.of(fields.pathOf("mixture"))));
            return new Mixture(List.of());
        }
        var within = new DensityReader(problems, depth + 1);
        for (int i = 0; i < list.size(); i++) {
            String path = JsonPath.element(fields.pathOf("mixture"), i);
            Fields.of(path, list.get(i), "a part {\"weight\": …, \"family\": …}", problems)
                    .ifPresent(part -> {
                        double weight = part.requiredNumber("weight");
                        parts.add(new Part(weight, within.density(part)));
                    });
        }
        return new Mixture(parts);
    }

    private Typed typed(Fields fields) {
        return new Typed(
                fields.requiredText("formula", DraftReader.FORMULA),
                end(fields, "from"),
                end(fields, "to"),
                numbers(fields, "breaks", false),
                fields.flag("log"));
    }

    private Data data(Fields fields) {
        var kind = fields.has("kind") ? Optional.of(fields.text("kind", DraftReader.NAME)) : Optional.<String>empty();
        var fitted = fields.object("fitted", "a member of a family {\"family\": …}")
                .map(member -> {
                    var family = member.requiredText("family", DraftReader.NAME);
                    var fit = member(member, family, Set.of());
                    member.close(Map.of());
                    return fit;
                });
        return new Data(
                fields.requiredText("data", DraftReader.LINE),
                column(fields),
                kind,
                fields.number("bandwidth"),
                fitted);
    }

    private Column column(Fields fields) {
        return switch (fields.take("column").orElse(new Json.Null())) {
            case Json.Null _ when !fields.has("column") -> new Column.Only();
            case Json.Text(String header) -> new Column.Named(header);
            case Json.Number number
            when number.whole().isPresent() && number.whole().getAsLong() >= 1 ->
                new Column.At(number.whole().getAsLong());
            case Json other -> {
                problems.add(Problem.of("column is %s but must be a header in double quotes or a number from 1"
                                .formatted(Shown.what(other)))
                        .at(Place.of(fields.pathOf("column"))));
                yield new Column.Only();
            }
        };
    }

    /// `NaN` where it is absent.
    private double end(Fields fields, String name) {
        var json = fields.take(name);
        if (json.isEmpty()) {
            problems.add(Problem.of("\"%s\" is missing".formatted(name))
                    .because("It must be a number, \"-inf\" or \"inf\".")
                    .at(Place.of(fields.pathOf(name))));
            return Double.NaN;
        }
        return DraftReader.end(json.get(), name, fields.pathOf(name), problems);
    }

    private Optional<Ends> ends(Fields fields, String name) {
        if (!fields.has(name)) {
            return Optional.empty();
        }
        var list = fields.list(name, MOST_PARTS);
        if (list.size() != 2) {
            if (fields.take(name).orElseThrow() instanceof Json.Elements) {
                problems.add(Problem.of("%s must have 2 ends but has %d".formatted(name, list.size()))
                        .because("It is [low, high]; an end may be \"-inf\" or \"inf\".")
                        .at(Place.of(fields.pathOf(name))));
            }
            return Optional.of(new Ends(Double.NaN, Double.NaN));
        }
        var path = fields.pathOf(name);
        String what = "an end of the interval";
        return Optional.of(new Ends(
                DraftReader.end(list.get(0), what, JsonPath.element(path, 0), problems),
                DraftReader.end(list.get(1), what, JsonPath.element(path, 1), problems)));
    }

    private List<Double> numbers(Fields fields, String name, boolean required) {
        if (required && !fields.has(name)) {
            problems.add(Problem.of("\"%s\" is missing".formatted(name))
                    .because("It must be a list of numbers.")
                    .at(Place.of(fields.pathOf(name))));
        }
        var list = fields.list(name, MOST_VALUES);
        var numbers = new ArrayList<Double>();
        for (int i = 0; i < list.size(); i++) {
            if (list.get(i) instanceof Json.Number number) {
                numbers.add(number.value());
            } else {
                problems.add(Problem.of(
                                "an element of %s is %s but must be a number".formatted(name, Shown.what(list.get(i))))
                        .at(Place.of(JsonPath.element(fields.pathOf(name), i))));
                numbers.add(Double.NaN);
            }
        }
        return numbers;
    }
}
