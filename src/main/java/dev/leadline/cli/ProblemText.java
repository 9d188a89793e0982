package dev.leadline.cli;

import dev.leadline.model.Draft;
import dev.leadline.model.LaneDraft;
import dev.leadline.problem.Problem;
import dev.leadline.problem.Span;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.function.Function;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/// Problems for people, on standard error.
final class ProblemText {

    private static final Pattern ROW = Pattern.compile("\\$\\.(constants|inputs|lanes)\\[(\\d{1,9})].*");
    private static final int AROUND = 45;

    private ProblemText() {}

    /// @param what what has the problems, as the name of a file; may be empty
    /// @param draft what the file holds, where it could be read
    static String of(String what, List<Problem> problems, Optional<Draft> draft) {
        var text = new StringBuilder();
        if (!what.isEmpty()) {
            text.append("%s: %d problem%s%n".formatted(what, problems.size(), problems.size() == 1 ? "" : "s"));
        }
        problems.forEach(problem -> text.append(of(problem, draft)));
        return text.toString();
    }

    static String note(Problem note) {
        return "Note: %s.%s%n"
                .formatted(
                        note.primary(),
                        note.detail().map(detail -> " " + detail).orElse(""));
    }

    private static String of(Problem problem, Optional<Draft> draft) {
        String path = problem.place().path();
        var text = new StringBuilder();
        String row = draft.map(known -> row(path, known)).orElse("");
        text.append(row.isEmpty() ? capital(problem.primary()) : row + ": " + problem.primary());
        text.append(path.isEmpty() ? "%n".formatted() : "   (%s)%n".formatted(path));
        problem.place()
                .span()
                .flatMap(span -> draft.flatMap(known -> known.formulaAt(path)).map(formula -> caret(formula, span)))
                .ifPresent(text::append);
        problem.detail().ifPresent(detail -> text.append("  Detail: %s%n".formatted(sentence(detail))));
        problem.hint().ifPresent(hint -> text.append("  Hint: %s%n".formatted(sentence(hint))));
        return text.toString();
    }

    private static String row(String path, Draft draft) {
        Matcher row = ROW.matcher(path);
        if (!row.matches()) {
            return "";
        }
        int index = Integer.parseInt(row.group(2));
        return switch (row.group(1)) {
            case "constants" -> named("Constant", draft.constants(), index, Draft.ConstantDraft::name);
            case "inputs" -> named("Input", draft.inputs(), index, Draft.InputDraft::name);
            default -> named("Lane", draft.lanes(), index, LaneDraft::name);
        };
    }

    private static <T> String named(String kind, List<T> rows, int index, Function<T, String> name) {
        if (index >= rows.size()) {
            return "";
        }
        String called = name.apply(rows.get(index));
        return called.matches("[\\p{L}\\p{N}_.-]{1,40}") ? kind + " " + called : kind + " " + (index + 1);
    }

    /// The formula, or what stands around the fault in a long one, with carets below the fault.
    private static String caret(String formula, Span span) {
        String line = formula.replaceAll("[\\p{Cntrl}\\p{Cf}]", " ");
        int from = Math.min(span.from(), line.length());
        int to = Math.clamp(span.to(), from, line.length());
        int start = Math.max(0, from - AROUND);
        int end = Math.min(line.length(), Math.max(to, from + AROUND));
        end = Math.min(end, start + 3 * AROUND);
        String before = start > 0 ? "… " : "";
        String after = end < line.length() ? " …" : "";
        int carets = Math.max(1, Math.min(to, end) - from);
        return "    %s%s%s%n    %s%s%n"
                .formatted(
                        before,
                        line.substring(start, end),
                        after,
                        " ".repeat(before.length() + from - start),
                        "^".repeat(carets));
    }

    private static String sentence(String text) {
        String capital = capital(text);
        return capital.matches("(?s).*[.?!…]") ? capital : capital + ".";
    }

    private static String capital(String text) {
        return text.isEmpty() ? text : text.substring(0, 1).toUpperCase(Locale.ROOT) + text.substring(1);
    }
}
