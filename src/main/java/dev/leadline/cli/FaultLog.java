package dev.leadline.cli;

import java.io.IOException;
import java.io.PrintWriter;
import java.io.StringWriter;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardOpenOption;
import java.time.Instant;
import java.util.Optional;

/// Where the details of a fault of ours go: nobody wants them on the screen.
final class FaultLog {

    private FaultLog() {}

    /// @param message what the person was told, so that the entry can be found
    /// @return the file; empty where it could not be written
    static Optional<Path> write(String message, Throwable fault) {
        try {
            String state = Optional.ofNullable(System.getenv("XDG_STATE_HOME"))
                    .filter(path -> !path.isBlank())
                    .orElse(System.getProperty("user.home") + "/.local/state");
            Path file = Path.of(state).resolve("leadline").resolve("faults.log");
            var trace = new StringWriter();
            fault.printStackTrace(new PrintWriter(trace));
            Files.createDirectories(file.getParent());
            Files.writeString(
                    file,
                    "%s %s%n%s%n".formatted(Instant.now(), message, trace),
                    StandardOpenOption.CREATE,
                    StandardOpenOption.APPEND);
            return Optional.of(file);
        } catch (IOException | RuntimeException e) {
            return Optional.empty();
        }
    }
}
