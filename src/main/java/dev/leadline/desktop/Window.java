package dev.leadline.desktop;

import dev.leadline.desktop.shell.Program;
import java.nio.file.Path;
import java.util.Optional;
import javafx.application.Application;

/// The window: opened once for each start of the program.
public final class Window {
    private Window() {}

    /// Returns when the window is closed.
    ///
    /// @param file to open at once; the start page shows without one
    public static void open(Optional<Path> file) {
        Application.launch(
                Program.class,
                file.map(f -> new String[] {f.toAbsolutePath().toString()}).orElse(new String[0]));
    }
}
