package dev.leadline;

import dev.leadline.cli.Commands;
import dev.leadline.cli.Console;
import dev.leadline.desktop.Window;
import java.util.Locale;

/// The program's only entry: no arguments or `open FILE` starts the window, anything else runs a command.
public final class Main {
    private Main() {}

    public static void main(String[] arguments) {
        // numbers and messages read the same in every country: files and reports travel
        Locale.setDefault(Locale.ROOT);
        var console = Console.ofProcess(System.getenv());
        System.exit(Commands.run(arguments, console, file -> {
            Window.open(file);
            return Commands.DONE;
        }));
    }
}
