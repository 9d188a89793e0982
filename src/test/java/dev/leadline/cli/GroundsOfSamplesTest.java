package dev.leadline.cli;

import static dev.leadline.cli.CommandLines.leadline;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.nio.file.Path;
import java.util.List;
import java.util.stream.StreamSupport;
import org.junit.jupiter.api.Test;
import tools.jackson.databind.JsonNode;

/// What the sample projects are there to show of grounds.
class GroundsOfSamplesTest {
    private static List<JsonNode> grounds(String sample, String lane, long draws, String code) {
        var run = leadline(
                "run", Path.of("sample-projects", sample + ".leadline"), "--lane", lane, "--draws", draws, "--json");
        assertTrue(run.exitCode() <= 1, run.err());
        var all = run.json().required("lanes").get(0).required("grounds");
        return StreamSupport.stream(all.spliterator(), false)
                .filter(g -> g.required("code").asString().equals(code))
                .toList();
    }

    private static String strength(JsonNode ground) {
        return ground.path("strength").asString("");
    }

    /// The extra wait has the tail index .75; a lane that draws long waits more often 1/3.
    @Test
    void berthDelay() {
        var plain = grounds("berth-delay", "A", 1_000_000, "tail").getFirst();
        assertEquals("objection", strength(plain), plain.toString());
        assertTrue(plain.required("remedy").asString().contains("another question, not a repair"));
        var other = grounds("berth-delay", "B", 100_000, "tail");
        assertTrue(other.stream().noneMatch(g -> strength(g).equals("objection")), other.toString());
    }

    /// A narrow density to draw from, .81 of outcomes by their weights; and plain draws, whose variance is finite
    /// though it does not look so.
    @Test
    void waveOvertopping() {
        var narrow = grounds("wave-overtopping", "C", 100_000, "tail");
        assertTrue(narrow.stream().anyMatch(g -> strength(g).equals("objection")), narrow.toString());
        var plain = grounds("wave-overtopping", "A", 100_000, "tail").getFirst();
        assertTrue(
                plain.required("text").asString().contains("behave as if their variance were infinite up to"),
                plain.toString());
        var good = grounds("wave-overtopping", "B", 100_000, "tail");
        assertTrue(good.stream().noneMatch(g -> strength(g).equals("objection")), good.toString());
    }

    @Test
    void mooringLine() {
        var tails = grounds("mooring-line", "B", 250_000, "tail");
        assertTrue(tails.stream().allMatch(g -> strength(g).isEmpty()), tails.toString());
        assertTrue(grounds("mooring-line", "A", 100_000, "tail").isEmpty());
    }

    /// A jump on a circle and a kink: the error of scrambled points falls like n^-.7, which is explained.
    @Test
    void dredgingVolume() {
        var decay = grounds("dredging-volume", "B", 1 << 20, "error-decay").getFirst();
        assertEquals("shown", decay.required("status").asString(), decay.toString());
        assertTrue(decay.required("text").asString().contains("as kinks and jumps make it"), decay.toString());
    }
}
