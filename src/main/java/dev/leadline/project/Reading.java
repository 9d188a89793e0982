package dev.leadline.project;

import dev.leadline.model.Draft;
import dev.leadline.model.Project;
import dev.leadline.problem.Place;
import dev.leadline.problem.Problem;
import dev.leadline.problem.Refusal;
import java.util.ArrayList;
import java.util.List;

/// What came of reading a project file.
///
/// @param draft what the file holds; what could not be told counts as absent
/// @param problems what is wrong with the file, at JSON paths; not with what it says
/// @param asksInList whether a single ask stands in a list, which its path then says
public record Reading(Draft draft, List<Problem> problems, boolean asksInList) {

    public Reading {
        problems = List.copyOf(problems);
    }

    /// @throws Refusal with every problem of the file and of what it says
    public Project project() {
        if (problems.isEmpty()) {
            try {
                return Project.of(draft);
            } catch (Refusal refusal) {
                throw new Refusal(refusal.problems().stream().map(this::placed).toList());
            }
        }
        List<Problem> all = new ArrayList<>(problems);
        try {
            Project.of(draft);
        } catch (Refusal refusal) {
            refusal.problems().stream().map(this::placed).filter(this::isNews).forEach(all::add);
        }
        throw new Refusal(all);
    }

    /// A field that could not be read is noted already: what follows from its absence is not news.
    private boolean isNews(Problem problem) {
        return problems.stream().noneMatch(known -> {
            String above = JsonPath.parent(known.place().path());
            return JsonPath.within(
                    problem.place().path(),
                    above.equals(JsonPath.WHOLE) ? known.place().path() : above);
        });
    }

    private Problem placed(Problem problem) {
        String path = problem.place().path();
        boolean moved = asksInList && draft.asks().size() == 1 && JsonPath.within(path, "$.ask");
        return moved
                ? problem.at(new Place(
                        "$.ask[0]" + path.substring(5), problem.place().span()))
                : problem;
    }
}
