package dev.leadline.formula;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;

import dev.leadline.formula.Names.Meaning;
import dev.leadline.problem.Problem;
import dev.leadline.problem.Span;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.util.Arrays;
import java.util.LinkedHashMap;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;
import org.junit.jupiter.params.provider.ValueSource;

/// Every refusal with its place, message, detail and hint, as a person would see them (`formula/refusals.txt`).
class RefusalsTest {
    private static final Names NAMES = names();

    private static Names names() {
        var meanings = new LinkedHashMap<String, Meaning>();
        for (String input : new String[] {"x", "y", "price", "quantity"}) meanings.put(input, new Meaning.Input());
        meanings.put("cost", new Meaning.Constant(3));
        meanings.put("load", new Meaning.Step());
        return Names.of(meanings);
    }

    static Stream<String> blocks() throws IOException {
        try (var file = RefusalsTest.class.getResourceAsStream("/formula/refusals.txt")) {
            String text = new String(file.readAllBytes(), StandardCharsets.UTF_8);
            return Arrays.stream(text.split("\n\n+")).skip(1).map(String::stripTrailing);
        }
    }

    @ParameterizedTest(name = "{0}")
    @MethodSource("blocks")
    void saysWhatWhereAndWhatToTry(String block) {
        assertEquals(block, shown(block.lines().findFirst().orElseThrow()));
    }

    @Test
    void emptyFormula() {
        assertEquals("\n|\n  formula is empty\n  Hint: write one, as in a*b + c", shown(""));
        assertEquals("# unit\n      |\n  formula is empty\n  Hint: write one, as in a*b + c", shown("# unit"));
    }

    @ParameterizedTest
    @ValueSource(
            strings = {
                "x",
                "-x",
                "+x",
                "2^-1",
                "x*-y",
                "x/+y",
                "-x^2",
                "[x > 1 & y < 2]",
                "[load]",
                "[(x > 1)]",
                "[not(x)]",
                "[[x > 1]]",
                "max(x, y, 1, 2)",
                "if(x > 1, -y, +y)",
                "1.",
                ".5",
                "1e3",
                "1E-3",
                "2.5e+10",
                "0",
                "0.000e-999",
                "x # m",
                "x\n+ y",
                "pi*e*deg",
                "x < y & y < 3",
                "x < y | y == 2 & x != 1",
                "(x < 1) == (y < 1)",
                "[x < 1] < [y < 1]",
                "load + cost",
                "((((x))))",
                "x\u00a0+ y"
            })
    void accepts(String formula) {
        assertEquals(java.util.List.of(), Reader.check(formula, NAMES));
    }

    @Test
    void namesAtMostTwentyUnknownNames() {
        String formula = java.util.stream.IntStream.range(0, 50)
                .mapToObj(i -> "unknown" + i)
                .collect(java.util.stream.Collectors.joining(" + "));
        assertEquals(20, Reader.check(formula, NAMES).size());
    }

    private static String shown(String formula) {
        var problems = Reader.check(formula, NAMES);
        assertFalse(problems.isEmpty(), () -> formula + " was not refused");
        var out = new StringBuilder(formula);
        for (Problem problem : problems) {
            Span span = problem.place().span().orElseThrow();
            out.append("\n").append(" ".repeat(span.from()));
            out.append(span.from() == span.to() ? "|" : "^".repeat(span.to() - span.from()));
            out.append("\n  ").append(problem.primary());
            problem.detail().ifPresent(detail -> out.append("\n  Detail: ").append(detail));
            problem.hint().ifPresent(hint -> out.append("\n  Hint: ").append(hint));
        }
        return out.toString();
    }
}
