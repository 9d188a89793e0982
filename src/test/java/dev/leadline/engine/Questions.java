package dev.leadline.engine;

import dev.leadline.density.Catalogue;
import dev.leadline.density.Density;
import dev.leadline.estimate.Estimand;
import dev.leadline.formula.Working;
import dev.leadline.model.Ask;
import dev.leadline.model.Dependence;
import dev.leadline.model.Input;
import dev.leadline.model.Input.Role;
import dev.leadline.model.IntervalWish;
import dev.leadline.model.Lane;
import dev.leadline.model.Plan;
import dev.leadline.model.Question;
import dev.leadline.model.Reference;
import dev.leadline.model.Stop;
import dev.leadline.model.Tolerance;
import dev.leadline.scheme.Independent;
import dev.leadline.scheme.Scheme;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;

/// Small questions for tests, built part by part.
public final class Questions {
    private final List<Input> inputs = new ArrayList<>();
    private final List<String> steps = new ArrayList<>();
    private final List<Ask> asks = new ArrayList<>();
    private Optional<Dependence> dependence = Optional.empty();
    private Optional<Reference> reference = Optional.empty();
    private Optional<Tolerance> tolerance = Optional.empty();

    public Questions uniform(String name, double from, double to) {
        return input(name, density("uniform", Map.of("from", from, "to", to)), new Role.Random());
    }

    public Questions normal(String name) {
        return input(name, density("normal", Map.of("mean", 0.0, "sd", 1.0)), new Role.Random());
    }

    public Questions input(String name, Density density) {
        return input(name, density, new Role.Random());
    }

    public Questions random(String name, Density drawn) {
        return input(name, drawn, new Role.Random());
    }

    public Questions range(String name, double low, double high) {
        return input(name, density("uniform", Map.of("from", low, "to", high)), new Role.Range(low, high));
    }

    /// Over the whole line, drawn from a normal density.
    public Questions line(String name, double sd) {
        return unbounded(name, Double.NEGATIVE_INFINITY, Double.POSITIVE_INFINITY, sd);
    }

    /// Drawn from a normal density with mean 0, which reaches beyond a half-line.
    public Questions unbounded(String name, double low, double high, double sd) {
        return input(name, density("normal", Map.of("mean", 0.0, "sd", sd)), new Role.UnboundedRange(low, high));
    }

    public Questions step(String line) {
        steps.add(line);
        return this;
    }

    public Questions mean(String formula) {
        return ask(new Estimand.Mean(), formula);
    }

    public Questions integral(String formula) {
        return ask(new Estimand.Integral(), formula);
    }

    public Questions probability(String formula) {
        return ask(new Estimand.Probability(), formula);
    }

    public Questions tied(Dependence ties) {
        dependence = Optional.of(ties);
        return this;
    }

    public Questions reference(double value) {
        reference = Optional.of(new Reference.Stated(value, 0, "test"));
        return this;
    }

    public Questions absoluteTolerance(double absolute) {
        tolerance = Optional.of(new Tolerance(OptionalDouble.of(absolute), OptionalDouble.empty(), false));
        return this;
    }

    public Questions relativeTolerance(double relative) {
        tolerance = Optional.of(new Tolerance(OptionalDouble.empty(), OptionalDouble.of(relative), false));
        return this;
    }

    public Question build() {
        var working = Working.of(
                inputs.stream().map(Input::name).toList(),
                new LinkedHashMap<>(),
                steps,
                asks.stream().flatMap(ask -> ask.formulas().stream()).toList());
        return new Question(
                "",
                "",
                false,
                List.of(),
                inputs,
                dependence,
                working,
                asks,
                reference,
                .95,
                tolerance,
                IntervalWish.AUTO);
    }

    public static Lane lane(String name) {
        return Lane.of(name, Scheme.of(new Independent()));
    }

    public static Plan plan(long draws, long seed) {
        return new Plan(new Stop(draws, OptionalDouble.empty()), seed, List.of(lane("A")));
    }

    private Questions input(String name, Density density, Role role) {
        inputs.add(new Input(name, "", "", "", density, role));
        return this;
    }

    public Questions ask(Estimand estimand, String... formulas) {
        asks.add(new Ask(estimand, List.of(formulas), "", ""));
        return this;
    }

    private static Density density(String family, Map<String, Double> parameters) {
        return Catalogue.family(family).orElseThrow().of(parameters);
    }
}
