package dev.leadline.cli;

import dev.leadline.engine.Achieved;
import dev.leadline.model.Question;
import dev.leadline.study.TieRow;
import java.io.PrintWriter;
import java.io.StringWriter;
import java.util.List;

/// Tied inputs for people.
final class TiedText {

    private TiedText() {}

    /// A heading and a line for each pair; none where no inputs are tied.
    static List<String> lines(Question question, List<Achieved> achieved) {
        if (achieved.isEmpty()) {
            return List.of();
        }
        var columns = new Columns();
        TieRow.of(question, achieved).forEach(row -> columns.add(row.of(), row.target(), row.achieved()));
        var lines = new StringWriter();
        var out = new PrintWriter(lines);
        out.println(TieRow.heading(question, achieved));
        columns.print(out);
        return lines.toString().lines().toList();
    }
}
