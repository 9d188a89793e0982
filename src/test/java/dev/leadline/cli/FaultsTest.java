package dev.leadline.cli;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.io.PrintWriter;
import java.io.StringWriter;
import java.nio.file.Files;
import java.nio.file.Path;
import org.junit.jupiter.api.AfterEach;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/// Faults of ours, as a window that fails brings them about.
class FaultsTest {

    @TempDir
    Path home;

    private String homeBefore;

    private final StringWriter out = new StringWriter();
    private final StringWriter err = new StringWriter();

    @BeforeEach
    void logElsewhere() {
        homeBefore = System.setProperty("user.home", home.toString());
    }

    @AfterEach
    void logAtHomeAgain() {
        System.setProperty("user.home", homeBefore);
    }

    private int with(Throwable fault, String... arguments) {
        var console = new Console(new PrintWriter(out), new PrintWriter(err), false, false);
        return Commands.run(arguments, console, _ -> {
            throw FaultsTest.<RuntimeException>unchecked(fault);
        });
    }

    @SuppressWarnings("unchecked")
    private static <T extends Throwable> T unchecked(Throwable fault) throws T {
        throw (T) fault;
    }

    @Test
    void saysAFaultInOneSentenceAndKeepsTheDetailsForTheLog() throws IOException {
        assertEquals(3, with(new NullPointerException("secret detail")));
        assertTrue(err.toString().startsWith("Leadline failed; this is our fault, not yours"), err.toString());
        assertFalse(err.toString().contains("NullPointerException"), err.toString());
        assertTrue(err.toString().lines().count() <= 3, err.toString());
        assertEquals("", out.toString());
        if (System.getenv("XDG_STATE_HOME") == null) {
            String log = Files.readString(home.resolve(".local/state/leadline/faults.log"));
            assertTrue(log.contains("NullPointerException: secret detail"), log);
        }
    }

    @Test
    void saysThatMemoryRanOut() {
        assertEquals(3, with(new OutOfMemoryError("Java heap space")));
        assertTrue(err.toString().startsWith("There was not enough memory"), err.toString());
    }

    /// As it comes from the builders of tables, which work side by side.
    @Test
    void saysThatMemoryRanOutBehindOtherErrors() {
        var error = new OutOfMemoryError("Java heap space");
        assertEquals(3, with(new IllegalStateException(new IllegalStateException("no table of x", error))));
        assertTrue(err.toString().startsWith("There was not enough memory"), err.toString());
        assertTrue(err.toString().contains("-Xmx"), err.toString());
        assertFalse(err.toString().contains("our fault"), err.toString());
    }

    @Test
    void saysWhatTheComputerLacks() {
        assertEquals(2, with(new RuntimeException(new UnsupportedOperationException("Unable to open DISPLAY"))));
        assertTrue(err.toString().contains("no display"), err.toString());
        assertEquals(2, with(new InternalError("Fontconfig head is null, check your fonts")));
        assertTrue(err.toString().contains("fonts-dejavu-core"), err.toString());
    }
}
