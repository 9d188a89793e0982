package dev.leadline.cli;

import java.io.IOException;
import java.io.PrintWriter;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.InvalidPathException;
import java.nio.file.Path;
import java.util.Map;

/// Where a command writes.
///
/// @param out results
/// @param err messages and progress
/// @param live whether `err` is a terminal, so that a line may be overwritten
/// @param styled whether `out` is a terminal that may show bold
public record Console(PrintWriter out, PrintWriter err, boolean live, boolean styled) {

    /// The console of this process. Text is UTF-8 whatever the locale says.
    public static Console ofProcess(Map<String, String> environment) {
        String noColor = environment.getOrDefault("NO_COLOR", "");
        boolean capable = !environment.getOrDefault("TERM", "dumb").equals("dumb");
        return new Console(
                new PrintWriter(System.out, true, StandardCharsets.UTF_8),
                new PrintWriter(System.err, true, StandardCharsets.UTF_8),
                capable && isTerminal(2),
                capable && isTerminal(1) && noColor.isEmpty());
    }

    String bold(String text) {
        return styled ? "\u001b[1m" + text + "\u001b[0m" : text;
    }

    /// Java only tells of standard input and output together. On Linux the descriptor itself is asked; elsewhere a
    /// stream is taken for none, which costs a progress line and nothing else.
    private static boolean isTerminal(int descriptor) {
        try {
            Path target = Files.readSymbolicLink(Path.of("/proc/self/fd/" + descriptor));
            return target.startsWith("/dev/pts") || target.toString().startsWith("/dev/tty");
        } catch (IOException | UnsupportedOperationException | InvalidPathException e) {
            return false;
        }
    }
}
