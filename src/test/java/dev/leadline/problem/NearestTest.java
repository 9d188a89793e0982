package dev.leadline.problem;

import static org.junit.jupiter.api.Assertions.assertEquals;

import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;

class NearestTest {

    private static final List<String> KNOWN = List.of("location", "scale", "shape", "mean", "sd", "normalCdf", "v");

    @Test
    void findsSlipsOfTheHand() {
        assertEquals(Optional.of("scale"), Nearest.to("scael", KNOWN));
        assertEquals(Optional.of("location"), Nearest.to("lokation", KNOWN));
        assertEquals(Optional.of("normalCdf"), Nearest.to("normalcdf", KNOWN));
        assertEquals(Optional.of("sd"), Nearest.to("std", KNOWN));
        assertEquals(Optional.of("v"), Nearest.to("V", KNOWN));
    }

    @Test
    void staysSilentRatherThanGuess() {
        assertEquals(Optional.empty(), Nearest.to("threshold", KNOWN));
        assertEquals(Optional.empty(), Nearest.to("", KNOWN));
        assertEquals(Optional.empty(), Nearest.to("x".repeat(100_000), List.of("x".repeat(100_001))));
    }
}
