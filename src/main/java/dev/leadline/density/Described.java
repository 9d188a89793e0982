package dev.leadline.density;

import dev.leadline.numeric.Shortest;
import dev.leadline.problem.Nearest;
import dev.leadline.problem.Place;
import dev.leadline.problem.Problem;
import dev.leadline.problem.Refusal;
import java.math.BigDecimal;
import java.util.ArrayList;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.TreeSet;
import java.util.stream.Collectors;
import java.util.stream.Stream;

/// A family, described by its name, its use and its entries. Immutable.
///
/// @param quantiles the entry by two quantiles, where there is one
record Described(String name, String use, List<Entry> ways, Optional<ByQuantiles> quantiles) implements Family {

    /// From here on, a cv is more likely one in per cent than that of a density.
    private static final double DOUBTFUL_CV = 3;

    /// Parameters by other names that are in use; the first of those that the family has.
    private static final Map<String, List<String>> ALSO_CALLED = Map.ofEntries(
            Map.entry("min", List.of("from")),
            Map.entry("low", List.of("from")),
            Map.entry("lower", List.of("from")),
            Map.entry("max", List.of("to")),
            Map.entry("high", List.of("to")),
            Map.entry("upper", List.of("to")),
            Map.entry("stdev", List.of("sd")),
            Map.entry("stddev", List.of("sd")),
            Map.entry("std", List.of("sd")),
            Map.entry("sigma", List.of("sd")),
            Map.entry("mu", List.of("mean")),
            Map.entry("theta", List.of("scale")),
            Map.entry("k", List.of("shape")),
            Map.entry("df", List.of("dof")),
            Map.entry("nu", List.of("dof")));

    /// What makes a parameter of one that is another quantity.
    private static final Map<String, String> CONVERTED = Map.of(
            "variance", "The standard deviation is the square root of the variance.",
            "var", "The standard deviation is the square root of the variance.",
            "rate", "The mean time, or the scale, is 1 over the rate.");

    Described(String name, String use, Entry... ways) {
        this(name, use, List.of(ways), Optional.empty());
    }

    Described enteredBy(ByQuantiles newQuantiles) {
        return new Described(name, use, ways, Optional.of(newQuantiles));
    }

    @Override
    public List<List<Parameter>> entries() {
        return Stream.concat(
                        ways.stream().map(Entry::parameters), quantiles.stream().map(ByQuantiles::parameters))
                .toList();
    }

    @Override
    public List<Problem> notes(Map<String, Double> parameters) {
        double cv = parameters.getOrDefault("cv", 0.0);
        return cv > DOUBTFUL_CV
                ? List.of(Problem.of("cv is %s: the standard deviation is %s times the mean"
                                .formatted(Shortest.text(cv), Shortest.text(cv)))
                        .because("cv is a fraction: %s for %s %%.".formatted(hundredth(cv), Shortest.text(cv)))
                        .at(Place.of("cv")))
                : List.of();
    }

    private static String hundredth(double percent) {
        return Shortest.text(BigDecimal.valueOf(percent).movePointLeft(2).doubleValue());
    }

    @Override
    public Density of(Map<String, Double> parameters) {
        refuseUnknown(parameters.keySet());
        if (parameters.keySet().stream().anyMatch(ByQuantiles::isName)) {
            return refuseOverflow(quantiles.orElseThrow().of(beside(parameters)));
        }
        var entry = entryOf(parameters.keySet());
        refuseMissing(entry, parameters);
        double[] values = entry.rules().stream()
                .mapToDouble(rule -> parameters.containsKey(rule.name())
                        ? parameters.get(rule.name())
                        : rule.otherwise().orElseThrow())
                .toArray();
        entry.check(values);
        return refuseOverflow(entry.maker().apply(values));
    }

    /// @throws Refusal where a parameter does not go together with quantiles
    private Map<String, Double> beside(Map<String, Double> parameters) {
        var rules = quantiles.orElseThrow().given().stream().map(Rule::name).toList();
        var stray = parameters.keySet().stream()
                .filter(name -> !ByQuantiles.isName(name) && !rules.contains(name))
                .toList();
        if (!stray.isEmpty()) {
            throw new Refusal(Problem.of(and(new TreeSet<>(parameters.keySet())) + " do not go together in one density")
                    .because("%s is entered by %s.".formatted(name, choices()))
                    .tryThis("Leave out those of the other way."));
        }
        return parameters;
    }

    private void refuseUnknown(Set<String> given) {
        var known = ways.stream().flatMap(way -> way.names().stream()).collect(Collectors.toSet());
        var problems = new ArrayList<Problem>();
        for (String name : given) {
            boolean quantile = quantiles.isPresent() && ByQuantiles.isName(name);
            if (!known.contains(name) && !quantile) {
                var problem = Problem.of("%s has no parameter %s".formatted(this.name, name))
                        .because("It is entered by " + choices() + ".")
                        .at(Place.of(name));
                problems.add(hint(name, known).map(problem::tryThis).orElse(problem));
            }
        }
        if (!problems.isEmpty()) {
            throw new Refusal(problems);
        }
    }

    private static Optional<String> hint(String name, Set<String> known) {
        String lower = name.toLowerCase(Locale.ROOT);
        return Nearest.to(name, known)
                .or(() -> ALSO_CALLED.getOrDefault(lower, List.of()).stream()
                        .filter(known::contains)
                        .findFirst())
                .map(near -> "Did you mean " + near + "?")
                .or(() -> Optional.ofNullable(CONVERTED.get(lower)));
    }

    /// The first entry that has all the given names.
    private Entry entryOf(Set<String> given) {
        return ways.stream()
                .filter(way -> way.names().containsAll(given))
                .findFirst()
                .orElseThrow(
                        () -> new Refusal(Problem.of(and(new TreeSet<>(given)) + " do not go together in one density")
                                .because("%s is entered by %s.".formatted(name, choices()))
                                .tryThis("Leave out those of the other way.")));
    }

    private void refuseMissing(Entry entry, Map<String, Double> parameters) {
        var missing = entry.rules().stream()
                .filter(rule -> rule.otherwise().isEmpty() && parameters.get(rule.name()) == null)
                .map(rule -> Problem.of(rule.name() + " is missing")
                        .because("%s is entered by %s.".formatted(name, choices()))
                        .at(Place.of(rule.name())))
                .toList();
        if (!missing.isEmpty()) {
            throw new Refusal(missing);
        }
    }

    /// A draw must be a number; the smallest probability drawn is `2^-53`.
    private static Density refuseOverflow(Density density) {
        if (Double.isFinite(density.quantile(0x1p-53)) && Double.isFinite(density.upperQuantile(0x1p-53))) {
            return density;
        }
        throw new Refusal(Problem.of("some draws of this density would exceed the largest number there is, 1.8e308")
                .because("An infinite draw would make every mean infinite or meaningless.")
                .tryThis("Check the unit of the parameters, or take a lighter tail."));
    }

    private String choices() {
        return entries().stream()
                .map(entry ->
                        and(entry.stream().map(Parameter::name).collect(Collectors.toCollection(LinkedHashSet::new))))
                .collect(Collectors.joining(", or by "));
    }

    private static String and(Set<String> names) {
        var all = names.stream().toList();
        return all.size() == 1
                ? all.getFirst()
                : String.join(", ", all.subList(0, all.size() - 1)) + " and " + all.getLast();
    }
}
