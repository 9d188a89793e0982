package dev.leadline.density;

import dev.leadline.formula.Program;
import dev.leadline.formula.Reader;
import dev.leadline.formula.Working;
import dev.leadline.numeric.Shortest;
import dev.leadline.problem.Place;
import dev.leadline.problem.Problem;
import dev.leadline.problem.Refusal;
import java.math.BigDecimal;
import java.math.MathContext;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.SequencedMap;
import java.util.stream.DoubleStream;

/// A density given by a formula in its own variable and constants.
///
/// Peaks are looked for near the ends, the breaks, 0, and the first twenty numbers that stand in the formula
/// or follow from its numbers and constants alone, at distances of all orders of magnitude, and at evenly
/// spaced points between them; then the highest places found are climbed. A peak elsewhere that is much
/// narrower than its distance from all of these, and at whose foot the density is no higher than around, is
/// missed; a break at the peak shows it.
///
/// @param density what is drawn from
/// @param notes what is allowed but may surprise: gaps, names that hide a constant which every formula knows
public record Typed(Integrated density, List<Problem> notes) {
    /// Numbers of a formula that peaks are looked for near.
    private static final int PROBES = 20;

    /// @param variable the name that the formula calls its value by
    /// @param constants values by name; the formula need not use them all
    /// @throws Refusal with every problem found, at the path of its field: `formula`, `from`, `to`, `breaks[1]`
    public static Typed of(TypedText text, String variable, SequencedMap<String, Double> constants) {
        var problems = new ArrayList<>(problems(text));
        Working working = null;
        try {
            working = Working.of(List.of(variable), constants, List.of(), List.of(text.formula()));
        } catch (Refusal refusal) {
            refusal.problems().stream().map(Typed::inFormula).forEach(problems::add);
        }
        if (!problems.isEmpty()) {
            throw new Refusal(problems);
        }
        var used = used(text, constants);
        var name = new Name(working.asked().getFirst().canonical(), variable, used, text);
        var density = Integrated.of(
                name,
                variable,
                new Compiled(working.program()),
                text.log(),
                new Support(text.from(), text.to()),
                text.breaks().stream().mapToDouble(x -> x).toArray(),
                probes(working));
        refuseOverflow(density);
        return new Typed(density, notes(density, variable, working));
    }

    /// The integral of the formula over the range, or of its exponential where it is a logarithm; may be 0 or infinite
    /// where [Integrated#logArea()] is not.
    public double integral() {
        return density.area();
    }

    /// What tells a typed density from others: spaces and constants that are not used do not.
    private record Name(
            String formula,
            String variable,
            Map<String, Double> constants,
            double from,
            double to,
            List<Double> breaks,
            boolean log) {
        Name(String formula, String variable, Map<String, Double> constants, TypedText text) {
            this(formula, variable, constants, text.from(), text.to(), text.breaks(), text.log());
        }
    }

    /// The heights that a formula gives.
    private static final class Compiled implements Heights {
        private final Program program;
        private final ThreadLocal<Program.Workspace> workspace;

        Compiled(Program program) {
            this.program = program;
            this.workspace = ThreadLocal.withInitial(program::workspace);
        }

        @Override
        public void fill(double[] x, double[] heights, int n) {
            program.evaluate(new double[][] {x}, n, new double[][] {heights}, workspace.get());
        }
    }

    private static List<Problem> problems(TypedText text) {
        var problems = new ArrayList<Problem>();
        if (!(text.from() < Double.POSITIVE_INFINITY)) {
            problems.add(Rule.problem("from", text.from(), "a number or -∞", "It is the lower end of the range.", ""));
        } else if (!(text.to() > Double.NEGATIVE_INFINITY)) {
            problems.add(Rule.problem("to", text.to(), "a number or ∞", "It is the upper end of the range.", ""));
        } else if (Double.isFinite(text.from()) && Double.isFinite(text.to())) {
            problems.addAll(Uniform.rising("from", text.from(), "to", text.to()));
        }
        boolean rangeIsRight = problems.isEmpty();
        for (int i = 0; rangeIsRight && i < text.breaks().size(); i++) {
            double x = text.breaks().get(i);
            String path = "breaks[" + i + "]";
            if (!(x > text.from() && x < text.to() && Double.isFinite(x))) {
                problems.add(Rule.problem(
                        path,
                        x,
                        "between from, " + Shortest.text(text.from()) + ", and to, " + Shortest.text(text.to()),
                        "A break lies inside the range; its ends need none.",
                        ""));
            } else if (i > 0 && !(x > text.breaks().get(i - 1))) {
                problems.add(Rule.problem(
                        path,
                        x,
                        "greater than the one before, "
                                + Shortest.text(text.breaks().get(i - 1)),
                        "Breaks stand in rising order, each once.",
                        ""));
            }
        }
        return problems;
    }

    private static Problem inFormula(Problem problem) {
        return problem.place().path().startsWith("asked") ? problem.in("formula") : problem;
    }

    private static Map<String, Double> used(TypedText text, SequencedMap<String, Double> constants) {
        var used = new LinkedHashMap<String, Double>();
        for (String name : Reader.names(text.formula())) {
            if (constants.containsKey(name)) {
                used.put(name, constants.get(name));
            }
        }
        return used;
    }

    /// Numbers of the formula, with either sign.
    private static double[] probes(Working working) {
        return working.numbers().stream()
                .filter(Double::isFinite)
                .limit(PROBES)
                .flatMapToDouble(x -> DoubleStream.of(x, -x))
                .distinct()
                .toArray();
    }

    /// A draw must be a number; the smallest probability drawn is `2^-53`.
    private static void refuseOverflow(Density density) {
        if (Double.isFinite(density.quantile(0x1p-53)) && Double.isFinite(density.upperQuantile(0x1p-53))) {
            return;
        }
        throw new Refusal(Problem.of("some draws of this density would exceed the largest number there is, 1.8e308")
                .because("An infinite draw would make every mean infinite or meaningless.")
                .tryThis("Give a finite range, or a density that falls faster.")
                .at(Place.of("formula")));
    }

    private static List<Problem> notes(Integrated density, String variable, Working working) {
        var notes = new ArrayList<>(working.notes());
        for (Support gap : density.gaps()) {
            notes.add(Problem.of("no density between %s = %s and %s"
                            .formatted(variable, shown(gap.low()), shown(gap.high())))
                    .because("The formula is 0 there: no draw falls between.")
                    .at(Place.of("formula")));
        }
        return List.copyOf(notes);
    }

    /// A place found by halving, to ten digits.
    private static String shown(double x) {
        return Shortest.text(new BigDecimal(x).round(new MathContext(10)).doubleValue());
    }
}
