package dev.leadline.formula;

import dev.leadline.formula.Names.Meaning;
import dev.leadline.problem.Place;
import dev.leadline.problem.Problem;
import dev.leadline.problem.Refusal;
import java.util.ArrayList;
import java.util.List;
import java.util.SequencedMap;
import java.util.function.IntFunction;
import java.util.stream.Stream;

/// The formulas of a question, checked together: its steps and what is asked. Immutable, safe for all threads.
public final class Working {
    private final List<Step> steps;
    private final List<Formula> asked;
    private final List<Problem> notes;
    private final Program program;
    private final Program everyStep;
    private final Expression expression;
    private final List<Integer> askedNodes;
    private final int inputs;

    /// @param expression not changed any more
    private Working(
            List<Step> steps,
            List<Formula> asked,
            List<Problem> notes,
            Program program,
            Program everyStep,
            Expression expression,
            List<Integer> askedNodes,
            int inputs) {
        this.steps = List.copyOf(steps);
        this.asked = List.copyOf(asked);
        this.notes = List.copyOf(notes);
        this.program = program;
        this.everyStep = everyStep;
        this.expression = expression;
        this.askedNodes = List.copyOf(askedNodes);
        this.inputs = inputs;
    }

    /// @param inputs names, in the order of the columns of draws
    /// @param constants values by name
    /// @param steps lines `name = formula   # comment`, in any order
    /// @param asked formulas, one for each component of an observation
    /// @throws Refusal with every problem found, at `inputs[i]`, `constants[i]`, `steps[i]` and `asked[i]`
    public static Working of(
            List<String> inputs, SequencedMap<String, Double> constants, List<String> steps, List<String> asked) {
        var declarations = new Declarations();
        for (int i = 0; i < inputs.size(); i++) {
            declarations.declare(inputs.get(i), new Meaning.Input(), Place.of("inputs[" + i + "]"));
        }
        int index = 0;
        for (var constant : constants.entrySet()) {
            declarations.declare(
                    constant.getKey(),
                    new Meaning.Constant(constant.getValue()),
                    Place.of("constants[" + index++ + "]"));
        }
        List<StepLine> lines = split(steps, declarations);
        StepOrder order = StepOrder.of(lines);
        check(lines, order, asked, declarations);
        return compile(inputs, lines, order, asked, declarations);
    }

    public List<Step> steps() {
        return steps;
    }

    public List<Formula> asked() {
        return asked;
    }

    /// What is allowed but may surprise: names that hide a constant which every formula knows.
    public List<Problem> notes() {
        return notes;
    }

    /// Inputs to the components asked for.
    public Program program() {
        return program;
    }

    /// Inputs to the formula asked at `index` alone.
    public Program program(int index) {
        return Program.of(expression, inputs, List.of(askedNodes.get(index)));
    }

    /// Inputs to every step, in the order of [#steps()], then to the components asked for.
    public Program everyStep() {
        return everyStep;
    }

    /// Whether the formula asked at `index` is an event (its value can only be 0, 1 or `NaN`).
    public boolean isEvent(int index) {
        return expression.isEvent(askedNodes.get(index));
    }

    /// Inputs to the score of the event asked at `index`: above 0 exactly where the event is true, below 0 where it is
    /// false, `NaN` where it is `NaN`, never 0, and the larger the nearer the event is to happening.
    ///
    /// @throws Refusal where the event does not say how far it is from happening, at `asked[index]`
    public Program score(int index) {
        if (!isEvent(index)) throw new IllegalArgumentException("formula " + index + " is no event");
        Expression scored = expression.copy();
        try {
            return Program.of(scored, inputs, List.of(EventScore.write(scored, askedNodes.get(index))));
        } catch (Refusal refusal) {
            String path = "asked[" + index + "]";
            throw new Refusal(
                    refusal.problems().stream().map(problem -> problem.in(path)).toList());
        }
    }

    /// The formula asked at `index` as a sum of products of powers of its inputs.
    ///
    /// @param measures how each input is measured, by its index; only asked for inputs that the formula
    ///     reads
    /// @throws Refusal where it is none, saying what it does instead
    public Polynomial polynomial(int index, IntFunction<Polynomial.Measured> measures) {
        return Polynomial.of(expression, askedNodes.get(index), measures);
    }

    /// The numbers that stand in the formulas and the values that follow from them and from constants alone,
    /// in the order in which they first stand, each once; up to their sign.
    public List<Double> numbers() {
        return expression.numbers();
    }

    /// Lines that are no steps are reported and left out, so that those which use them are checked all the same.
    private static List<StepLine> split(List<String> steps, Declarations declarations) {
        List<StepLine> lines = new ArrayList<>();
        for (int i = 0; i < steps.size(); i++) {
            String path = "steps[" + i + "]";
            try {
                StepLine line = StepLine.of(steps.get(i), path);
                declarations.declare(
                        line.name().text(),
                        new Meaning.Step(),
                        Place.of(line.name().span()).in(path));
                lines.add(line);
            } catch (Refusal refusal) {
                declarations.report(refusal.problems(), path);
            }
        }
        return lines;
    }

    private static void check(List<StepLine> lines, StepOrder order, List<String> asked, Declarations declarations) {
        Names names = declarations.names();
        for (StepLine line : lines) {
            declarations.report(line.check(names), line.path());
            order.circle()
                    .filter(circle -> circle.place().path().equals(line.path()))
                    .ifPresent(circle -> declarations.report(List.of(circle), line.path()));
        }
        for (int i = 0; i < asked.size(); i++) {
            declarations.report(Reader.check(asked.get(i), names), "asked[" + i + "]");
        }
        if (!declarations.problems().isEmpty()) throw new Refusal(declarations.problems());
    }

    private static Working compile(
            List<String> inputs, List<StepLine> lines, StepOrder order, List<String> asked, Declarations declarations) {
        var writer = new ExpressionWriter(inputs, declarations.names());
        order.lines().forEach(line -> writer.step(line.name().text(), line.tokens()));
        List<Integer> stepNodes =
                lines.stream().map(line -> writer.stepNode(line.name().text())).toList();
        List<Integer> askedNodes = new ArrayList<>();
        List<Formula> formulas = new ArrayList<>();
        for (String text : asked) {
            List<Token> tokens = Reader.meaningful(Tokens.of(text));
            askedNodes.add(writer.write(tokens));
            formulas.add(new Formula(text, Tokens.canonical(tokens)));
        }
        Expression expression = writer.expression();
        Program program = Program.of(expression, inputs.size(), askedNodes);
        return new Working(
                lines.stream().map(StepLine::step).toList(),
                formulas,
                declarations.notes(),
                program,
                lines.isEmpty()
                        ? program
                        : Program.of(
                                expression,
                                inputs.size(),
                                Stream.concat(stepNodes.stream(), askedNodes.stream())
                                        .toList()),
                expression,
                askedNodes,
                inputs.size());
    }
}
