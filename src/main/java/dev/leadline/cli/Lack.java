package dev.leadline.cli;

import dev.leadline.problem.Problem;
import java.util.Optional;
import java.util.stream.Stream;

/// What the computer lacks, as it looks from inside: Java and JavaFX end with errors of their own there.
final class Lack {

    private Lack() {}

    /// The lack behind an error; empty where it is no known one.
    static Optional<Problem> behind(Throwable error) {
        return Stream.iterate(error, cause -> cause != null, Throwable::getCause)
                .limit(20)
                .flatMap(cause -> of(String.valueOf(cause.getMessage())).stream())
                .findFirst();
    }

    private static Optional<Problem> of(String message) {
        if (message.contains("Unable to open DISPLAY")) {
            return Optional.of(Problem.of("there is no display to show the window on")
                    .because("The window needs a graphical desktop.")
                    .tryThis("The commands need none: see leadline --help."));
        }
        if (message.contains("Fontconfig head is null") || message.contains("Fontconfig configuration")) {
            return Optional.of(Problem.of("there is no font to draw text with")
                    .because("Pictures and the window need fontconfig and at least one font.")
                    .tryThis("On Debian: apt-get install fontconfig fonts-dejavu-core."));
        }
        return Optional.empty();
    }
}
