package dev.leadline.desktop.lanes;

/// When a layout of points helps, in a sentence.
final class PointsUse {
    private PointsUse() {}

    /// @param word of the project file; empty for one that is not known
    static String of(String word) {
        return switch (word) {
            case "independent" -> "Always right, and what the others are measured by.";
            case "antithetic" -> "Helps where the outcome rises or falls with each input.";
            case "stratified" -> "Helps where one or two inputs decide most of the outcome.";
            case "latin-hypercube" -> "Helps where the outcome adds up input by input, also of many inputs.";
            case "scrambled-sobol" ->
                "Helps where the outcome is smooth and few inputs matter; the error falls faster.";
            case "shifted-lattice" ->
                "Helps where the outcome is smooth; its number of points doubles from round to round.";
            case "splitting" -> "Helps with events so rare that plain draws hardly see them.";
            default -> "";
        };
    }
}
