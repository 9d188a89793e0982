package dev.leadline.density;

import dev.leadline.numeric.Shortest;
import dev.leadline.problem.Problem;
import dev.leadline.problem.Refusal;
import java.util.ArrayList;
import java.util.List;
import java.util.function.Function;

/// One way to enter a member of a family: parameters that go together, what each must be, and what they must be to one
/// another. Immutable.
///
/// A family's record checks itself with the entry of its components, so that no member exists that breaks a rule.
///
/// @param between what is wrong between values that are each allowed; asked only for such values
/// @param maker the member, from the values in the order of `rules`
record Entry(List<Rule> rules, Function<double[], List<Problem>> between, Function<double[], Density> maker) {

    static Entry of(Function<double[], Density> maker, Rule... rules) {
        return new Entry(List.of(rules), _ -> List.of(), maker);
    }

    Entry and(Function<double[], List<Problem>> newBetween) {
        return new Entry(rules, newBetween, maker);
    }

    /// What is wrong with values that follow from others that were entered.
    ///
    /// @param given what was entered, as `mean 3 with sd 0.1`
    List<Problem> tooExtreme(String given, double... values) {
        var gives = new ArrayList<String>();
        var broken = new ArrayList<String>();
        for (int i = 0; i < values.length; i++) {
            var rule = rules.get(i);
            gives.add(rule.name() + " " + Shortest.text(values[i]));
            if (rule.broken(values[i]).isPresent()) {
                broken.add(rule.name() + " must be " + rule.words());
            }
        }
        return broken.isEmpty()
                ? List.of()
                : List.of(Problem.of(given + " is too extreme")
                        .because("They give " + String.join(" and ", gives) + "; " + String.join(", ", broken) + ".")
                        .tryThis("Check the units of both."));
    }

    List<String> names() {
        return rules.stream().map(Rule::name).toList();
    }

    List<Parameter> parameters() {
        return rules.stream().map(Rule::parameter).toList();
    }

    /// @throws Refusal with every problem found
    void check(double... values) {
        var problems = new ArrayList<Problem>();
        for (int i = 0; i < values.length; i++) {
            rules.get(i).broken(values[i]).ifPresent(problems::add);
        }
        if (problems.isEmpty()) {
            problems.addAll(between.apply(values));
        }
        if (!problems.isEmpty()) {
            throw new Refusal(problems);
        }
    }
}
