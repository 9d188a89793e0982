package dev.leadline.problem;

import java.util.List;
import java.util.stream.Collectors;

/// Thrown where input is refused; carries every problem found, never an empty list.
public final class Refusal extends RuntimeException {
    private static final long serialVersionUID = 1;

    private final transient List<Problem> problems;

    public Refusal(Problem... problems) {
        this(List.of(problems));
    }

    public Refusal(List<Problem> problems) {
        super(problems.stream().map(Problem::primary).collect(Collectors.joining("; ")));
        if (problems.isEmpty()) {
            throw new IllegalArgumentException("a refusal needs a problem");
        }
        this.problems = List.copyOf(problems);
    }

    public List<Problem> problems() {
        return problems;
    }
}
