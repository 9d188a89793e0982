package dev.leadline.density;

import dev.leadline.problem.Problem;
import dev.leadline.problem.Refusal;
import java.util.List;
import java.util.Map;

/// A family of densities, with the rules of its parameters.
public interface Family {
    /// Word of the project file.
    String name();

    /// The ways to enter a member, the usual one first: each the parameters that go together.
    List<List<Parameter>> entries();

    /// What it is used for, in the trades' words.
    String use();

    /// What is allowed but may surprise, at the path of its parameter.
    List<Problem> notes(Map<String, Double> parameters);

    /// @throws Refusal with every problem found, each at the path of its parameter (`scale`), or at no path
    Density of(Map<String, Double> parameters);
}
