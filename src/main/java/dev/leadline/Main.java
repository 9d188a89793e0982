package dev.leadline;

/// The program's only entry: no arguments or `open FILE` starts the window, anything else runs a command.
public final class Main {
    private Main() {}

    public static void main(String[] args) {
        System.out.println("Leadline");
    }
}
