package dev.leadline.model;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;

import dev.leadline.model.Draft.AskDraft;
import dev.leadline.model.Draft.ConstantDraft;
import dev.leadline.model.Draft.From;
import dev.leadline.model.Draft.InputDraft;
import dev.leadline.model.Draft.StopDraft;
import dev.leadline.problem.Refusal;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.OptionalLong;
import java.util.Set;
import java.util.stream.Collectors;
import org.junit.jupiter.api.Test;

class ProjectTest {
    private static Draft draft(double sd, String estimand, String formula, double confidence, long draws) {
        var parameters = new LinkedHashMap<>(Map.of("mean", 3.0));
        parameters.put("sd", sd);
        return new Draft(
                "",
                "",
                false,
                List.of(new ConstantDraft("limit", 4, "", "", "")),
                List.of(new InputDraft("load", "kN", "", "", new From.Density(DensityDraft.of("normal", parameters)))),
                Optional.empty(),
                List.of("excess = load - limit"),
                List.of(new AskDraft(estimand, formula, "", "")),
                Optional.empty(),
                OptionalDouble.of(confidence),
                Optional.empty(),
                Optional.empty(),
                Optional.of(new StopDraft("fixed", OptionalLong.of(draws), OptionalDouble.empty())),
                OptionalLong.of(1),
                false,
                List.of());
    }

    private static Set<String> pathsOfProblems(Draft draft) {
        return assertThrows(Refusal.class, () -> Project.of(draft)).problems().stream()
                .map(problem -> problem.place().path())
                .collect(Collectors.toSet());
    }

    @Test
    void everythingThatIsWrongIsNamedAtOnceInItsPlace() {
        assertEquals(
                Set.of("$.inputs[0].density.sd", "$.ask.mean", "$.confidence", "$.stop.draws"),
                pathsOfProblems(draft(-1, "mean", "exces", 1.5, 0)));
    }

    @Test
    void aProbabilityIsAskedOfAnEvent() {
        assertEquals(Set.of("$.ask.probability"), pathsOfProblems(draft(1, "probability", "excess", .95, 1000)));
        var project = Project.of(draft(1, "probability", "excess > 0", .95, 1000));
        assertEquals("load", project.question().inputs().getFirst().name());
        assertEquals(1000, project.plan().stop().draws());
    }

    @Test
    void whatIsNotWrittenIsAsDocumented() {
        var written = draft(1, "mean", "excess", .9, 1000);
        var bare = new Draft(
                "",
                "",
                false,
                written.constants(),
                written.inputs(),
                written.dependence(),
                written.steps(),
                written.asks(),
                Optional.empty(),
                OptionalDouble.empty(),
                Optional.empty(),
                Optional.empty(),
                Optional.empty(),
                OptionalLong.empty(),
                false,
                List.of());
        var project = Project.of(bare);
        assertEquals(.95, project.question().confidence());
        assertEquals(1_000_000, project.plan().stop().draws());
        assertEquals(1, project.plan().lanes().size());
    }
}
