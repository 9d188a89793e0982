package dev.leadline.scheme;

import dev.leadline.ReferenceValues;
import dev.leadline.formula.Program;
import dev.leadline.formula.Working;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.stream.IntStream;

/// Rare events of standard normal inputs whose probabilities are known from outside.
record Events(String name, int dimensions, Score score, double p) {
    @Override
    public String toString() {
        return name;
    }

    /// Record rare-linear-limit-state.
    static Events linear(int d, int beta) {
        double limit = beta * Math.sqrt(d);
        Score score = (z, rows, s) -> {
            for (int i = 0; i < rows; i++) {
                s[i] = -limit;
                for (double[] column : z) {
                    s[i] += column[i];
                }
            }
        };
        return new Events(
                "linear " + d + ", " + beta,
                d,
                score,
                ReferenceValues.expected("rare-linear-limit-state", "P(beta=" + beta + ")"));
    }

    static Events fourBranch() {
        return of(
                "four branches",
                List.of("x1", "x2"),
                List.of("c = 3 + 0.1*(x1 - x2)^2", "s = (x1 + x2)/sqrt(2)", "far = 6/sqrt(2)"),
                "min(min(c - s, c + s), min(x1 - x2 + far, x2 - x1 + far)) <= 0",
                ReferenceValues.expected("rare-four-branch", "probability_k6"));
    }

    /// The same event, put together by `|`.
    static Events fourBranchInWords() {
        return of(
                "four branches, in words",
                List.of("x1", "x2"),
                List.of("c = 3 + 0.1*(x1 - x2)^2", "s = (x1 + x2)/sqrt(2)", "far = 6/sqrt(2)"),
                "s >= c | -s >= c | abs(x1 - x2) >= far",
                ReferenceValues.expected("rare-four-branch", "probability_k6"));
    }

    static Events parabolic() {
        return of(
                "parabolic",
                List.of("x1", "x2"),
                List.of(),
                "if(5 - x2 - 0.5*(x1 - 0.1)^2 <= 0, 1, 0)",
                ReferenceValues.expected("rare-parabolic", "probability"));
    }

    static Events parallelChain() {
        return of(
                "parallel chain",
                IntStream.rangeClosed(1, 5).mapToObj(i -> "u" + i).toList(),
                List.of(),
                "u1 + u2 >= 2.677 & u2 + u3 >= 2.5 & u3 + u4 >= 2.323 & u4 + u5 >= 2.25",
                ReferenceValues.expected("rare-parallel-chain", "probability"));
    }

    private static Events of(String name, List<String> inputs, List<String> steps, String event, double p) {
        Program program =
                Working.of(inputs, new LinkedHashMap<>(), steps, List.of(event)).score(0);
        Program.Workspace workspace = program.workspace();
        double[][] results = new double[1][];
        return new Events(
                name,
                inputs.size(),
                (z, rows, score) -> {
                    results[0] = score;
                    program.evaluate(z, rows, results, workspace);
                },
                p);
    }
}
