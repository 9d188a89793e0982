package dev.leadline.density;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.leadline.problem.Refusal;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/// What is known, and the member that it must give: worked by hand from JCGM 101:2008, 6.4, from memory, and from the
/// definitions of the families.
class KnowledgeTest {

    @ParameterizedTest
    @CsvSource(
            delimiter = '|',
            value = {
                "limits              | low 4.2 high 5.8                      | uniform from 4.2 to 5.8",
                "rough-limits        | low 4 high 6 inexact .25              | curvilinear-trapezoid from 4 to 6 inexact .25",
                "likely              | low 2 likely 3 high 7                 | triangular from 2 mode 3 to 7",
                "judged              | low 2 likely 3 high 7                 | pert from 2 mode 3 to 7",
                "swing               | low -1 high 1                         | arcsine from -1 to 1",
                "mean-and-sd         | mean 10 sd .5                         | normal mean 10 sd .5",
                "positive-mean-and-sd| mean 100 sd 50                        | lognormal mean 100 sd 50",
                "positive-mean       | mean 7                                | exponential mean 7",
                "two-quantiles       | low 1 below-low 5 high 3 below-high 95| normal q5 1 q95 3",
                "positive-quantiles  | low 1 below-low 2.5 high 9 below-high 97.5 | lognormal q2.5 1 q97.5 9",
                "readings            | n 16 mean 5.012 s .02                 | student dof 15 location 5.012 scale .005",
                "certificate         | value 100.02 U .04 k 2                | normal mean 100.02 sd .02",
                "certificate-dof     | value 100.02 U .06 k 3 dof 9          | student dof 9 location 100.02 scale .02",
                "count               | events 4 over 2                       | gamma shape 5 scale .5",
                "chance              | probability .06                       | bernoulli probability .06",
            })
    void givesTheMember(String word, String told, String expected) {
        var suggestion = Knowledge.named(word).suggestion(pairs(told));
        var words = expected.split(" ", 2);
        assertEquals(words[0], suggestion.family());
        var parameters = pairs(words[1]);
        assertEquals(parameters.keySet(), suggestion.parameters().keySet());
        parameters.forEach(
                (name, value) -> assertEquals(value, suggestion.parameters().get(name), 1e-15 * Math.abs(value), name));
        assertTrue(suggestion.provenance().length() > 20, suggestion::provenance);
        Catalogue.family(suggestion.family()).ifPresent(family -> family.of(suggestion.parameters()));
    }

    @Test
    void saysWhyItIsThatMember() {
        assertEquals(
                "mean of 10 readings 5.012, standard deviation of one 0.019: Student's t with 9 degrees of freedom"
                        + " (JCGM 101:2008, 6.4.9.2)",
                Knowledge.named("readings")
                        .suggestion(pairs("n 10 mean 5.012 s .019"))
                        .provenance());
    }

    @Test
    void namesTheNearestWay() {
        var problem = assertThrows(Refusal.class, () -> Knowledge.named("reading"))
                .problems()
                .getFirst();
        assertEquals("there is no way of knowing called \"reading\"", problem.primary());
        assertEquals("Was \"readings\" meant?", problem.hint().orElseThrow());
    }

    @Test
    void saysEveryProblem() {
        assertEquals(
                List.of(
                        "n is 1.5 but must be a whole number, at least 2",
                        "s is missing",
                        "there is nothing called sd here"),
                refused("readings", "n 1.5 mean 3 sd 2"));
        assertEquals(List.of("sd is 0 but must be greater than 0"), refused("mean-and-sd", "mean 3 sd 0"));
    }

    private static List<String> refused(String word, String told) {
        var all = new ArrayList<String>();
        assertThrows(Refusal.class, () -> Knowledge.named(word).suggestion(pairs(told)))
                .problems()
                .forEach(problem -> all.add(problem.primary()));
        return all;
    }

    private static Map<String, Double> pairs(String text) {
        var pairs = new LinkedHashMap<String, Double>();
        var words = text.strip().split("\\s+");
        for (int i = 0; i < words.length; i += 2) {
            pairs.put(words[i], Double.valueOf(words[i + 1]));
        }
        return pairs;
    }
}
