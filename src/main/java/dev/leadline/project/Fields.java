package dev.leadline.project;

import dev.leadline.problem.Nearest;
import dev.leadline.problem.Place;
import dev.leadline.problem.Problem;
import dev.leadline.problem.Refusal;
import java.util.ArrayList;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.OptionalLong;
import java.util.Set;

/// The fields of one object of a project, taken one by one; [#close] refuses what was not taken.
///
/// A field of the wrong kind is noted and then counts as empty (a number as `NaN`), so that one reading finds every
/// problem of a file.
final class Fields {

    private final String path;
    private final Json.Members members;
    private final Problems problems;
    private final Set<String> known = new LinkedHashSet<>();

    private Fields(String path, Json.Members members, Problems problems) {
        this.path = path;
        this.members = members;
        this.problems = problems;
    }

    /// @param expected what should stand at `path`, as `an input {"name": …}`
    static Optional<Fields> of(String path, Json json, String expected, Problems problems) {
        if (json instanceof Json.Members members) {
            return Optional.of(new Fields(path, members, problems));
        }
        problems.add(Problem.of("%s stands where %s is expected".formatted(Shown.what(json), expected))
                .at(Place.of(path)));
        return Optional.empty();
    }

    String path() {
        return path;
    }

    String pathOf(String name) {
        return JsonPath.member(path, name);
    }

    /// Names of all the fields, taken or not.
    Set<String> names() {
        return members.map().sequencedKeySet();
    }

    boolean has(String name) {
        known.add(name);
        return members.map().containsKey(name);
    }

    Optional<Json> take(String name) {
        known.add(name);
        return Optional.ofNullable(members.map().get(name));
    }

    /// Empty where it is absent.
    String text(String name, int most) {
        return take(name)
                .map(json -> {
                    if (!(json instanceof Json.Text(String value))) {
                        wrong(name, json, "a text in double quotes");
                        return "";
                    }
                    if (value.length() > most) {
                        add(
                                name,
                                String.format(Locale.ROOT, "%s has %,d characters", name, value.length()),
                                String.format(Locale.ROOT, "At most %,d are read.", most));
                        return "";
                    }
                    return value;
                })
                .orElse("");
    }

    /// So many texts in a list; empty ones where it holds something else.
    List<String> texts(String name, int count, int most, String expected) {
        List<Json> list = list(name, count);
        List<String> texts = new ArrayList<>();
        for (int i = 0; i < count; i++) {
            if (i < list.size() && list.get(i) instanceof Json.Text(String text) && text.length() <= most) {
                texts.add(text);
            } else {
                texts.add("");
            }
        }
        checkElements(
                name,
                list,
                count,
                Json.Text.class,
                String.format(Locale.ROOT, "%s of at most %,d characters", expected, most));
        return texts;
    }

    /// So many numbers in a list; `NaN` where it holds something else.
    List<Double> numbers(String name, int count) {
        List<Json> list = list(name, count);
        List<Double> numbers = new ArrayList<>();
        for (int i = 0; i < count; i++) {
            numbers.add(i < list.size() && list.get(i) instanceof Json.Number number ? number.value() : Double.NaN);
        }
        checkElements(name, list, count, Json.Number.class, "a number");
        return numbers;
    }

    private void checkElements(String name, List<Json> list, int count, Class<? extends Json> kind, String expected) {
        if (list.size() < count && members.map().get(name) instanceof Json.Elements) {
            add(
                    name,
                    "%s has %d of %d elements".formatted(name, list.size(), count),
                    "Each is %s.".formatted(expected));
        }
        for (int i = 0; i < list.size(); i++) {
            if (!kind.isInstance(list.get(i))) {
                problems.add(Problem.of("%s is %s but must be %s".formatted(name, Shown.what(list.get(i)), expected))
                        .at(Place.of(JsonPath.element(pathOf(name), i))));
            }
        }
    }

    String requiredText(String name, int most) {
        require(name, "a text in double quotes");
        return text(name, most);
    }

    OptionalDouble number(String name) {
        return take(name)
                .map(json -> {
                    if (json instanceof Json.Number number) {
                        return OptionalDouble.of(number.value());
                    }
                    wrong(name, json, "a number");
                    return OptionalDouble.of(Double.NaN);
                })
                .orElse(OptionalDouble.empty());
    }

    /// `NaN` where it is absent.
    double requiredNumber(String name) {
        require(name, "a number");
        return number(name).orElse(Double.NaN);
    }

    /// A whole number.
    OptionalLong count(String name, long least, long most) {
        return take(name)
                .map(json -> {
                    if (json instanceof Json.Number number
                            && number.whole().isPresent()
                            && number.whole().getAsLong() >= least
                            && number.whole().getAsLong() <= most) {
                        return number.whole();
                    }
                    if (!(json instanceof Json.Number(String literal) && literal.equals("NaN"))) {
                        wrong(name, json, "a whole number from %d to %d".formatted(least, most));
                    }
                    return OptionalLong.empty();
                })
                .orElse(OptionalLong.empty());
    }

    boolean flag(String name) {
        return take(name)
                .map(json -> {
                    if (json instanceof Json.Flag(boolean value)) {
                        return value;
                    }
                    wrong(name, json, "true or false");
                    return false;
                })
                .orElse(false);
    }

    Optional<Fields> object(String name, String expected) {
        return take(name).flatMap(json -> of(pathOf(name), json, expected, problems));
    }

    /// Longer lists end the reading: the file is not one that people wrote.
    List<Json> list(String name, int most) {
        return take(name)
                .map(json -> {
                    if (!(json instanceof Json.Elements(var list))) {
                        wrong(name, json, "a list […]");
                        return List.<Json>of();
                    }
                    if (list.size() > most) {
                        add(
                                name,
                                String.format(Locale.ROOT, "%s has %,d elements", name, list.size()),
                                String.format(Locale.ROOT, "At most %,d are read.", most));
                        throw new Refusal(problems.found());
                    }
                    return list;
                })
                .orElse(List.of());
    }

    /// Notes every field that was not taken: as not available where the format has it, else as unknown.
    ///
    /// @param unavailable what to do instead, by the names of fields that the format has and this version lacks
    void close(Map<String, String> unavailable) {
        for (String name : names()) {
            if (known.contains(name)) {
                continue;
            }
            if (unavailable.containsKey(name)) {
                problems.add(
                        unavailable(Shown.quoted(name), unavailable.get(name)).at(Place.of(pathOf(name))));
                continue;
            }
            Problem unknown = Problem.of("%s is not a field known here".formatted(Shown.quoted(name)))
                    .because("Fields here: %s.".formatted(String.join(", ", known)))
                    .at(Place.of(pathOf(name)));
            problems.add(Nearest.to(name, known)
                    .map(near -> unknown.tryThis("Was \"%s\" meant?".formatted(near)))
                    .orElse(unknown));
        }
    }

    static Problem unavailable(String what, String instead) {
        return Problem.of("%s is not available".formatted(what))
                .because("The project format has it, this version of Leadline does not.")
                .tryThis(instead);
    }

    private void require(String name, String expected) {
        if (!has(name)) {
            add(name, "\"%s\" is missing".formatted(name), "It must be %s.".formatted(expected));
        }
    }

    private void wrong(String name, Json json, String expected) {
        Problem problem = Problem.of("%s is %s but must be %s".formatted(Shown.plain(name), Shown.what(json), expected))
                .at(Place.of(pathOf(name)));
        problems.add(json instanceof Json.Null ? problem.tryThis("Leave the field out where there is none.") : problem);
    }

    private void add(String name, String primary, String detail) {
        problems.add(Problem.of(primary).because(detail).at(Place.of(pathOf(name))));
    }
}
