package dev.leadline.model;

import dev.leadline.formula.Working;
import dev.leadline.model.Draft.ConstantDraft;
import dev.leadline.model.Draft.InputDraft;
import dev.leadline.problem.Problem;
import java.text.Normalizer;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Optional;
import java.util.SequencedMap;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/// Checks the names and formulas of a draft together, and says where in the draft each problem stands.
final class Workings {

    private static final Pattern ROW = Pattern.compile("(inputs|constants|steps|asked)\\[(\\d+)]");

    private final Draft draft;
    private final SequencedMap<String, Double> constants = new LinkedHashMap<>();
    private final List<Integer> constantRows = new ArrayList<>();

    private Workings(Draft draft) {
        this.draft = draft;
    }

    /// Empty where there are problems.
    static Optional<Working> of(Draft draft, Findings findings) {
        var workings = new Workings(draft);
        workings.take(findings);
        var inputs = draft.inputs().stream().map(InputDraft::name).toList();
        return findings.made(
                workings::place, () -> Working.of(inputs, workings.constants, draft.steps(), draft.formulas()));
    }

    static List<Problem> notes(Draft draft, Working working) {
        var workings = new Workings(draft);
        workings.take(new Findings());
        return working.notes().stream()
                .map(note -> note.in(workings.place(note.place().path())))
                .toList();
    }

    /// Values of the constants by name; what is wrong with them is said where the formulas are checked.
    static SequencedMap<String, Double> constants(Draft draft) {
        var constants = new LinkedHashMap<String, Double>();
        draft.constants().stream()
                .filter(constant -> Double.isFinite(constant.value()))
                .forEach(constant -> constants.putIfAbsent(composed(constant.name()), constant.value()));
        return constants;
    }

    /// The form in which names are compared.
    static String composed(String name) {
        return Normalizer.normalize(name, Normalizer.Form.NFC);
    }

    private void take(Findings findings) {
        for (int i = 0; i < draft.constants().size(); i++) {
            ConstantDraft constant = draft.constants().get(i);
            String path = "$.constants[" + i + "]";
            boolean finite = Double.isFinite(constant.value());
            if (!finite) {
                findings.add(
                        path + ".value",
                        "value is %s but must be finite".formatted(constant.value()),
                        "A constant is a number.");
            }
            String name = composed(constant.name());
            if (constants.putIfAbsent(name, finite ? constant.value() : 1.0) == null) {
                constantRows.add(i);
            } else {
                findings.add(
                        path + ".name",
                        "name \"%s\" already stands for a constant".formatted(name),
                        "Inputs, constants and steps share their names.",
                        "Choose another name.");
            }
        }
    }

    private String place(String path) {
        Matcher row = ROW.matcher(path);
        if (!row.matches()) {
            throw new IllegalArgumentException("no place " + path);
        }
        int index = Integer.parseInt(row.group(2));
        return switch (row.group(1)) {
            case "inputs" -> "$.inputs[" + index + "].name";
            case "constants" -> "$.constants[" + constantRows.get(index) + "].name";
            case "steps" -> "$.steps[" + index + "]";
            default -> draft.formulaPaths().get(index);
        };
    }
}
