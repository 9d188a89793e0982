package dev.leadline.desktop;

import dev.leadline.desktop.shell.Program;
import java.nio.file.Path;
import java.util.Optional;
import java.util.logging.Logger;
import javafx.application.Application;

/// The window: opened once for each start of the program.
public final class Window {
    /// Kept, so that the filter set on it is.
    private static final Logger JAVAFX = Logger.getLogger("javafx");

    private Window() {}

    /// Returns when the window is closed.
    ///
    /// @param file to open at once; the start page shows without one
    public static void open(Optional<Path> file) {
        // JavaFX warns of a class path, which is how this program is built and tested.
        JAVAFX.setFilter(log -> !String.valueOf(log.getMessage()).startsWith("Unsupported JavaFX configuration"));
        Application.launch(
                Program.class,
                file.map(f -> new String[] {f.toAbsolutePath().toString()}).orElse(new String[0]));
    }
}
