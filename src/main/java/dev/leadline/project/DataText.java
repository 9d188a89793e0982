package dev.leadline.project;

import dev.leadline.problem.Problem;
import java.nio.ByteBuffer;
import java.nio.charset.CharacterCodingException;
import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;

/// The text of a file of data, and by what its columns are separated.
final class DataText {

    private static final char[] SEPARATORS = {'\t', ';', ','};

    /// Records that the separator is told by.
    private static final int MOST_LOOKED_AT = 10;

    private static final int MOST_COLUMNS = 10_000;

    private DataText() {}

    /// Without the mark that some programs begin a text with, and without empty lines at its end.
    static String of(String file, byte[] bytes) {
        ByteBuffer rest = ByteBuffer.wrap(bytes);
        try {
            String text = StandardCharsets.UTF_8.newDecoder().decode(rest).toString();
            text = (text.startsWith("\ufeff") ? text.substring(1) : text).stripTrailing();
            refuseWide(file, text);
            return text;
        } catch (CharacterCodingException e) {
            long line = 1;
            for (int i = 0; i < rest.position(); i++) {
                line += bytes[i] == '\n' ? 1 : 0;
            }
            throw DataFolder.refusal(Problem.of(String.format(
                            Locale.ROOT, "%s is not UTF-8 text (byte %,d, line %,d)", file, rest.position(), line))
                    .because("Letters and numbers would be guessed.")
                    .tryThis("Save it as CSV in UTF-8."));
        }
    }

    /// Cells cost more memory than their text.
    private static void refuseWide(String file, String text) {
        int separators = 0;
        for (int i = 0; i < text.length(); i++) {
            char c = text.charAt(i);
            if (c == '\n' || c == '\r') {
                separators = 0;
            } else if (c == ',' || c == ';' || c == '\t') {
                separators++;
                if (separators >= MOST_COLUMNS) {
                    throw DataFolder.refusal(Problem.of(String.format(
                                    Locale.ROOT, "%s has a line of more than %,d cells", file, MOST_COLUMNS))
                            .because("So many columns are read at most.")
                            .tryThis("Write one value a line."));
                }
            }
        }
    }

    /// Tab, semicolon or comma, in this order: the first that stands equally often in each of the first records, else
    /// the one that stands most often in the first.
    static char separator(String text) {
        List<int[]> records = counts(text);
        for (int s = 0; s < SEPARATORS.length; s++) {
            int k = s;
            int inFirst = records.getFirst()[k];
            if (inFirst > 0 && records.stream().allMatch(counts -> counts[k] == inFirst)) {
                return SEPARATORS[s];
            }
        }
        int[] first = records.getFirst();
        return first[0] > 0 && first[0] >= Math.max(first[1], first[2])
                ? SEPARATORS[0]
                : first[1] > 0 && first[1] >= first[2] ? SEPARATORS[1] : SEPARATORS[2];
    }

    /// How often each separator stands outside double quotes in each of the first records that are not empty.
    private static List<int[]> counts(String text) {
        List<int[]> records = new ArrayList<>();
        int[] counts = new int[SEPARATORS.length];
        boolean quoted = false;
        boolean empty = true;
        for (int i = 0; i <= text.length() && records.size() < MOST_LOOKED_AT; i++) {
            char c = i < text.length() ? text.charAt(i) : '\n';
            if (c == '"') {
                quoted = !quoted;
            }
            if (!quoted && (c == '\n' || c == '\r') || i == text.length()) {
                if (!empty || i == text.length() && records.isEmpty()) {
                    records.add(counts);
                }
                counts = new int[SEPARATORS.length];
                empty = true;
                continue;
            }
            empty = false;
            for (int s = 0; s < SEPARATORS.length && !quoted; s++) {
                counts[s] += c == SEPARATORS[s] ? 1 : 0;
            }
        }
        return records;
    }
}
