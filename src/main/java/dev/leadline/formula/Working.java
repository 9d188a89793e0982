package dev.leadline.formula;

import dev.leadline.problem.Refusal;
import java.util.List;
import java.util.SequencedMap;

/// The formulas of a question, checked together: its steps and what is asked. Immutable, safe for all threads.
public final class Working {
    private Working() {}

    /// @param inputs names, in the order of the columns of draws
    /// @param constants values by name
    /// @param steps lines `name = formula   # comment`, in any order
    /// @param asked formulas, one for each component of an observation
    /// @throws Refusal with every problem found, at the paths `steps[i]` and `asked[i]`
    public static Working of(
            List<String> inputs, SequencedMap<String, Double> constants, List<String> steps, List<String> asked) {
        throw new UnsupportedOperationException();
    }

    public List<Step> steps() {
        throw new UnsupportedOperationException();
    }

    public List<Formula> asked() {
        throw new UnsupportedOperationException();
    }

    /// Inputs to the components asked for.
    public Program program() {
        throw new UnsupportedOperationException();
    }

    /// Inputs to every step, in the order of [#steps()], then to the components asked for.
    public Program everyStep() {
        throw new UnsupportedOperationException();
    }

    /// Whether the formula asked at `index` is an event (its value can only be 0, 1 or `NaN`).
    public boolean isEvent(int index) {
        throw new UnsupportedOperationException();
    }
}
