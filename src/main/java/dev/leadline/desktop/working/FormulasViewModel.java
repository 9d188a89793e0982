package dev.leadline.desktop.working;

import dev.leadline.model.Draft;
import dev.leadline.model.Draft.AskDraft;
import dev.leadline.problem.Place;
import dev.leadline.problem.Problem;
import java.util.ArrayList;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.SequencedSet;
import java.util.function.UnaryOperator;
import java.util.regex.Pattern;
import java.util.stream.Stream;
import javafx.beans.property.ReadOnlyStringProperty;
import javafx.beans.property.ReadOnlyStringWrapper;

/// The formulas: steps, one to a line, and what is asked.
///
/// The text of the steps may hold blank lines, which the draft does not.
public final class FormulasViewModel {
    private static final Pattern NAMED =
            Pattern.compile("\\s*([\\p{L}_][\\p{L}\\p{M}\\p{N}_]*)\\s*=(?!=).*", Pattern.DOTALL);

    private static final double USUAL_COVERAGE = .95;

    private final ProjectViewModel project;
    private final InputsViewModel inputs;
    private final ReadOnlyStringWrapper stepsText = new ReadOnlyStringWrapper("");

    /// Something wrong in a text.
    ///
    /// @param line of the text, from 0
    /// @param from place in that line
    /// @param to end of the faulty stretch; the same as `from` where something is missing
    public record Fault(int line, int from, int to, Problem problem) {}

    public FormulasViewModel(ProjectViewModel project, InputsViewModel inputs) {
        this.project = project;
        this.inputs = inputs;
        project.draft().addListener((_, _, d) -> follow(d));
        follow(project.draft().get());
    }

    ProjectViewModel project() {
        return project;
    }

    ReadOnlyStringProperty stepsText() {
        return stepsText.getReadOnlyProperty();
    }

    List<AskDraft> asks() {
        return project.draft().get().asks();
    }

    void typeSteps(String text) {
        stepsText.set(text);
        var lines = written(text);
        project.edit("$.steps(" + lines.size() + ")", d -> Edits.steps(d, lines));
    }

    /// @param formula which of those of the ask, from 0
    void typeFormula(int i, int formula, String text) {
        editAsk(i, ".formula[" + formula + "]", a -> a.withFormula(formula, text));
    }

    void kind(int i, String estimand) {
        project.settle();
        project.forget("$.ask");
        editAsk(i, ".estimand", a -> a.asking(estimand));
    }

    void unit(int i, String unit) {
        editAsk(i, ".unit", a -> a.withUnit(unit));
    }

    void label(int i, String label) {
        editAsk(i, ".label", a -> a.withLabel(label));
    }

    /// The probability that an answer belongs to, or the part of the outcomes that its intervals hold, in per cent.
    void part(int i, String text) {
        boolean covers = covers(i);
        project.typeOptionalNumber(
                partPath(i),
                covers ? "coverage" : "probability",
                text,
                (d, value) -> Edits.asks(
                        d,
                        Edits.changed(
                                d.asks(),
                                i,
                                a -> covers
                                        ? a.withCoverage(DemandsViewModel.ofPercent(value))
                                        : a.withAt(DemandsViewModel.ofPercent(value)))));
    }

    String partText(int i) {
        var ask = asks().get(i);
        var part = covers(i) ? OptionalDouble.of(ask.coverage().orElse(USUAL_COVERAGE)) : ask.at();
        return project.fieldText(partPath(i), DemandsViewModel.inPercent(part));
    }

    /// What is wrong with it.
    List<Problem> partProblems(int i) {
        return project.problemsAt(partPath(i));
    }

    private boolean covers(int i) {
        return asks().get(i).estimand().equals("distribution");
    }

    private String partPath(int i) {
        return askPath(i) + (covers(i) ? ".coverage" : ".at");
    }

    private String askPath(int i) {
        return asks().size() == 1 ? "$.ask" : "$.ask[" + i + "]";
    }

    void addAsk() {
        project.settle();
        project.forget("$.ask");
        project.edit("$.ask", d -> Edits.asks(d, Edits.with(d.asks(), new AskDraft("mean", "", "", ""))));
    }

    void removeAsk(int i) {
        project.settle();
        project.forget("$.ask");
        project.edit("$.ask", d -> Edits.asks(d, Edits.without(d.asks(), i)));
    }

    /// What is wrong in the steps, by line of the text.
    List<Fault> stepFaults() {
        var faults = new ArrayList<Fault>();
        var lines = stepsText.get().split("\n", -1);
        int step = 0;
        for (int line = 0; line < lines.length; line++) {
            if (!lines[line].isBlank()) {
                for (Problem p : project.problemsAt("$.steps[" + step + "]")) {
                    faults.add(fault(line, lines[line], p));
                }
                step++;
            }
        }
        project.problemsAt("$.steps").stream()
                .filter(p -> p.place().path().equals("$.steps"))
                .forEach(p -> faults.add(new Fault(0, 0, 0, p)));
        return faults;
    }

    /// What is wrong in one of the formulas asked at `i`; in the first, also what belongs to the whole of it.
    List<Fault> askFaults(int i, int formula) {
        String place = askPath(i);
        var ask = asks().get(i);
        return Stream.concat(
                        project.problemsAt(place).stream()
                                .filter(p -> formulaOf(p) == formula)
                                .filter(p -> !p.place().path().equals(partPath(i))),
                        project.problemsAt("$.ask").stream()
                                .filter(p -> i == 0
                                        && formula == 0
                                        && asks().size() > 1
                                        && p.place().path().equals("$.ask")))
                .map(p -> fault(0, ask.formulas().get(formula), p))
                .toList();
    }

    /// Which formula of an ask a problem is about.
    private static int formulaOf(Problem p) {
        return p.place().path().endsWith(".ratio[1]") ? 1 : 0;
    }

    public static Fault fault(int line, String text, Problem p) {
        var span = p.place().span();
        int from = Math.min(span.map(s -> s.from()).orElse(0), text.length());
        int to = Math.min(span.map(s -> s.to()).orElse(text.length()), text.length());
        return new Fault(line, from, Math.max(from, to), p);
    }

    /// Makes an input row, with its density still to be chosen, of every name that stands for nothing yet.
    void makeInputsOfUnknownNames() {
        inputs.addUnknown(unknownNames());
    }

    SequencedSet<String> unknownNames() {
        Draft d = project.draft().get();
        var known = InputsViewModel.known(d);
        var unknown = new LinkedHashSet<String>();
        Stream.concat(d.steps().stream(), d.formulas().stream())
                .flatMap(text -> Colouring.names(text).stream())
                .filter(name -> !known.contains(name))
                .forEach(unknown::add);
        return unknown;
    }

    /// The name that a line of steps gives to its formula.
    static Optional<String> stepName(String line) {
        var m = NAMED.matcher(line);
        return m.matches() ? Optional.of(m.group(1)) : Optional.empty();
    }

    /// Where a problem's place can be shown in a text: the path of a step or of an asked formula.
    static boolean isInFormulas(Place place) {
        return place.path().startsWith("$.steps") || place.path().startsWith("$.ask");
    }

    private void editAsk(int i, String field, UnaryOperator<AskDraft> change) {
        project.edit("$.ask[" + i + "]" + field, d -> Edits.asks(d, Edits.changed(d.asks(), i, change)));
    }

    private void follow(Draft d) {
        if (!written(stepsText.get()).equals(d.steps())) {
            stepsText.set(String.join("\n", d.steps()));
        }
    }

    private static List<String> written(String text) {
        return Stream.of(text.split("\n", -1)).filter(line -> !line.isBlank()).toList();
    }
}
