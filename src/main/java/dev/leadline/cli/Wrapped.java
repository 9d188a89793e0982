package dev.leadline.cli;

import java.util.ArrayList;
import java.util.List;

/// Words in lines of a hundred columns.
final class Wrapped {
    private static final int WIDTH = 100;

    private Wrapped() {}

    /// The first line behind `head`, the others below it.
    static List<String> lines(String head, String words) {
        var lines = new ArrayList<String>();
        String before = head;
        var line = new StringBuilder();
        for (String word : words.strip().split("\\s+")) {
            if (!line.isEmpty() && before.length() + line.length() + 1 + word.length() > WIDTH) {
                lines.add(before + line);
                before = " ".repeat(head.length());
                line.setLength(0);
            }
            line.append(line.isEmpty() ? "" : " ").append(word);
        }
        lines.add(before + line);
        return lines;
    }
}
