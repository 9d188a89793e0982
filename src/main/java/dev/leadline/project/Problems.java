package dev.leadline.project;

import dev.leadline.problem.Problem;
import dev.leadline.problem.Refusal;
import java.util.ArrayList;
import java.util.List;

/// The problems found in one file so far. Past a hundred it refuses the file at once: nobody reads more, and a hostile
/// file must not cost more than an honest one.
final class Problems {

    private static final int MOST = 100;

    private final List<Problem> found = new ArrayList<>();

    void add(Problem problem) {
        found.add(problem);
        if (found.size() == MOST) {
            found.add(Problem.of("there are more problems than the %d listed".formatted(MOST))
                    .tryThis("Mend these first, then check again."));
            throw new Refusal(found);
        }
    }

    List<Problem> found() {
        return List.copyOf(found);
    }
}
