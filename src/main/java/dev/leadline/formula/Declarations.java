package dev.leadline.formula;

import dev.leadline.formula.Names.Meaning;
import dev.leadline.problem.Place;
import dev.leadline.problem.Problem;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.SequencedMap;

/// Collects the names of a question one by one, with what is wrong with them. Confined to one check.
final class Declarations {
    private final SequencedMap<String, Meaning> meanings = new LinkedHashMap<>();
    private final List<Problem> problems = new ArrayList<>();
    private final List<Problem> notes = new ArrayList<>();

    void declare(String written, Meaning meaning, Place place) {
        String name = Names.composed(written);
        Names.fault(name).ifPresent(fault -> problems.add(fault.at(place)));
        Meaning other = meanings.putIfAbsent(name, meaning);
        if (other != null) {
            problems.add(Problem.of("name \"" + name + "\" already stands for " + other.kind())
                    .because("inputs, constants and steps share their names")
                    .tryThis("choose another name")
                    .at(place));
        }
        if (meaning instanceof Meaning.Constant(double value) && !Double.isFinite(value)) {
            problems.add(Problem.of("constant \"" + name + "\" is " + value + " but must be finite")
                    .at(place));
        }
        Double hidden = Functions.constants().get(name);
        if (hidden != null) {
            notes.add(Problem.of("name \"" + name + "\" hides the constant " + name + " = " + hidden)
                    .because("formulas here mean " + meaning.kind() + " by it")
                    .at(place));
        }
    }

    void report(List<Problem> found, String path) {
        found.forEach(problem -> problems.add(problem.in(path)));
    }

    Names names() {
        return new Names(meanings);
    }

    List<Problem> problems() {
        return problems;
    }

    List<Problem> notes() {
        return List.copyOf(notes);
    }
}
