package dev.leadline.project;

import dev.leadline.model.DataFiles;
import dev.leadline.model.Draft;
import dev.leadline.model.Project;
import dev.leadline.problem.Place;
import dev.leadline.problem.Problem;
import dev.leadline.problem.Refusal;
import java.util.ArrayList;
import java.util.List;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/// What came of reading a project file.
///
/// @param draft what the file holds; what could not be told counts as absent
/// @param files where the data come from that it names
/// @param problems what is wrong with the file, at JSON paths; not with what it says
/// @param asksInList whether a single ask stands in a list, which its path then says
public record Reading(Draft draft, DataFiles files, List<Problem> problems, boolean asksInList) {

    private static final Pattern IN_DENSITY = Pattern.compile("(.*\\.(?:density|drawFrom))\\.[^.]+");
    private static final Pattern IN_RANGE = Pattern.compile("(.*\\.(?:range|truncate))\\[\\d+]");

    public Reading {
        problems = List.copyOf(problems);
    }

    /// @throws Refusal with every problem of the file and of what it says
    public Project project() {
        if (problems.isEmpty()) {
            try {
                return Project.of(draft, files);
            } catch (Refusal refusal) {
                throw new Refusal(refusal.problems().stream().map(this::placed).toList());
            }
        }
        List<Problem> all = new ArrayList<>(problems);
        try {
            Project.of(draft, files);
        } catch (Refusal refusal) {
            refusal.problems().stream().map(this::placed).filter(this::isNews).forEach(all::add);
        }
        throw new Refusal(all);
    }

    /// A field that could not be read is noted already: what follows from its absence is not news.
    private boolean isNews(Problem problem) {
        return problems.stream()
                .flatMap(known -> lacking(known.place().path()).stream())
                .noneMatch(path -> JsonPath.within(problem.place().path(), path));
    }

    /// The places that look empty, or wrong, because of a problem at `path`.
    private static List<String> lacking(String path) {
        Matcher density = IN_DENSITY.matcher(path);
        Matcher end = IN_RANGE.matcher(path);
        if (end.matches()) {
            return List.of(end.group(1));
        }
        if (density.matches()) {
            return List.of(path, density.group(1) + ".family");
        }
        return path.startsWith("$.reference.") ? List.of(path, "$.reference.value") : List.of(path);
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
