package dev.leadline.formula;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import java.util.SplittableRandom;
import java.util.stream.Collectors;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class TokensTest {
    @ParameterizedTest
    @CsvSource(delimiter = ';', textBlock = """
            2*x; NUMBER 2, MARK *, NAME x
            sin(x)<=1; FUNCTION sin, MARK (, NAME x, MARK ), MARK <=, NUMBER 1
            q = v^2 # Pa; NAME q, MARK =, NAME v, MARK ^, NUMBER 2, COMMENT # Pa
            1e5x; NUMBER 1e5, NAME x
            1ex; NUMBER 1, NAME ex
            2e+; NUMBER 2, NAME e, MARK +
            1.5E-3; NUMBER 1.5E-3
            1.2.3; NUMBER 1.2.3
            .5.x; NUMBER .5., NAME x
            x.y; NAME x, UNREADABLE ., NAME y
            a!=b; NAME a, MARK !=, NAME b
            !a; UNREADABLE !, NAME a
            a<=-b; NAME a, MARK <=, MARK -, NAME b
            a&&b; NAME a, MARK &&, NAME b
            Δt×2; NAME Δt, UNREADABLE ×, NUMBER 2
            """)
    void kinds(String text, String expected) {
        assertEquals(
                expected,
                Reader.tokens(text).stream()
                        .map(token -> token.kind() + " " + token.text())
                        .collect(Collectors.joining(", ")));
    }

    @Test
    void anyTextIsCoveredFromLeftToRight() {
        String letters = "xe_ \t\n#().,+-*/^<>=!&|[]0123456789π²é\u0301𝒳\ud835§\"'{}";
        for (long seed = 0; seed < 2_000; seed++) {
            var random = new SplittableRandom(seed);
            var made = new StringBuilder();
            for (int i = random.nextInt(30); i > 0; i--) made.append(letters.charAt(random.nextInt(letters.length())));
            String text = made.toString();
            String where = "seed " + seed + ": " + text;
            int end = 0;
            for (Token token : Reader.tokens(text)) {
                assertTrue(
                        text.substring(end, token.span().from()).isBlank()
                                || text.substring(end, token.span().from())
                                        .chars()
                                        .allMatch(Character::isSpaceChar),
                        where);
                assertTrue(token.span().to() > token.span().from(), where);
                end = token.span().to();
            }
            assertTrue(text.substring(end).isBlank(), where);
            Reader.check(text, Names.of(java.util.Map.of()));
        }
    }

    @Test
    void namesOfAFormula() {
        assertEquals(List.of("b", "a"), List.copyOf(Reader.names("b + sin(a)*pi - b/unknown(2) # not this")));
        assertEquals(List.of(), List.copyOf(Reader.names("2*(")));
        assertEquals(List.of("x"), List.copyOf(Reader.names("ln(x)")));
    }

    @Test
    void everyFunctionIsDescribedAndCanBeCalled() {
        assertEquals(34, Functions.all().size());
        for (Function function : Functions.all()) {
            assertTrue(
                    !function.meaning().isBlank() && function.form().startsWith(function.name() + "("),
                    function.name());
            String values = String.join(", ", java.util.Collections.nCopies(function.least(), "0.5"));
            assertTrue(
                    Reader.check(function.name() + "(" + values + ")", Names.of(java.util.Map.of()))
                            .isEmpty(),
                    function.name());
        }
    }
}
