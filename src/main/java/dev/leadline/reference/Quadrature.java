package dev.leadline.reference;

import dev.leadline.density.Cauchy;
import dev.leadline.density.Density;
import dev.leadline.density.Expectation;
import dev.leadline.density.Expectation.Integrand;
import dev.leadline.density.Expectation.Limit;
import dev.leadline.density.LogLogistic;
import dev.leadline.density.Shifted;
import dev.leadline.formula.Program;
import dev.leadline.model.FormulaOfInputs;
import dev.leadline.model.Input;
import dev.leadline.model.Input.Role;
import dev.leadline.model.Question;
import dev.leadline.problem.Refusal;
import dev.leadline.reference.ReferenceValue.Kind;
import dev.leadline.reference.ReferenceValue.Known;
import dev.leadline.reference.ReferenceValue.Unknown;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.OptionalLong;
import java.util.function.BooleanSupplier;

/// The first answer of a question by a deterministic rule, with a bound of its error: [Expectation] over the densities
/// of
/// the inputs. An unbounded range is gone through by quantiles of a density that falls off as `1/x^2`, about where the
/// range is drawn from: what is drawn from decides where is looked first, never what can be found.
public final class Quadrature {
    /// Evaluations of a short formula, and steps of those of a long one: about a second.
    private static final long MOST_EVALUATIONS = 10_000_000;

    private static final long MOST_STEPS = 400_000_000;

    /// Share of them that may have no finite value, as at a pole.
    private static final double UNDEFINED = 1e-3;

    /// Error over the mean size of the integrand, beyond which nothing is found.
    private static final double LARGEST = 0.1;

    private final Question question;
    private final BooleanSupplier cancelled;

    private Quadrature(Question question, BooleanSupplier cancelled) {
        this.question = question;
        this.cancelled = cancelled;
    }

    /// The reference of a question, found where that takes quadrature; empty where it has none.
    ///
    /// @throws java.util.concurrent.CancellationException where cancelled
    public static Optional<ReferenceValue> found(Question question, BooleanSupplier cancelled) {
        return ReferenceValue.of(question)
                .map(value -> value instanceof ReferenceValue.Sought ? of(question, cancelled) : value);
    }

    /// @param question one that asks for it
    /// @param cancelled asked now and then, on this thread
    /// @throws java.util.concurrent.CancellationException where cancelled
    public static ReferenceValue of(Question question, BooleanSupplier cancelled) {
        try {
            return new Quadrature(question, cancelled).found();
        } catch (Refusal refusal) {
            return new Unknown(refusal.problems().getFirst().primary());
        }
    }

    private ReferenceValue found() {
        var working = question.working();
        var score = score();
        var program = score.orElseGet(() -> working.program(0));
        var formula = FormulaOfInputs.of(program, question.inputs());
        double volume = 1;
        for (var input : question.inputs()) {
            switch (input.role()) {
                case Role.Random _ -> {}
                case Role.Range(double low, double high) -> volume *= high - low;
                case Role.UnboundedRange _ -> {
                    if (!formula.read().contains(input)) {
                        return new Unknown("the formula does not fall off along the range of " + input.name());
                    }
                }
            }
        }
        if (formula.read().isEmpty()) {
            return constant(working.program(0), volume);
        }
        var limit =
                new Limit(Math.min(MOST_EVALUATIONS, MOST_STEPS / Math.max(1, program.length())), UNDEFINED, cancelled);
        var along = formula.read().stream().map(Quadrature::along).toList();
        var found = score.isPresent()
                ? Expectation.ofEvent(along, formula.integrand(), limit)
                : Expectation.of(along, weighed(formula, along), limit);
        return found(found, volume, limit);
    }

    /// The score of an event, where it has one and no unbounded range is weighed.
    private Optional<Program> score() {
        boolean isWeighed = question.inputs().stream().anyMatch(input -> input.role() instanceof Role.UnboundedRange);
        if (isWeighed || !question.working().isEvent(0)) {
            return Optional.empty();
        }
        try {
            return Optional.of(question.working().score(0));
        } catch (Refusal _) {
            return Optional.empty();
        }
    }

    private ReferenceValue constant(Program program, double volume) {
        double[] value = new double[1];
        program.evaluate(new double[question.inputs().size()][], 1, new double[][] {value}, program.workspace());
        double whole = value[0] * volume;
        return Double.isFinite(whole)
                ? new Known(
                        whole,
                        ReferenceValue.ROUNDING * Math.abs(whole),
                        Kind.QUADRATURE,
                        source(1),
                        OptionalLong.of(1))
                : new Unknown("it has no finite value");
    }

    private static ReferenceValue found(Expectation found, double volume, Limit limit) {
        double value = found.mean() * volume;
        double error = found.error() * volume;
        if (found.size() == 0) {
            return new Unknown("the formula is 0 at every point that was looked at");
        }
        if (!(found.error() <= LARGEST * found.size()) || !Double.isFinite(value)) {
            return new Unknown(
                    found.evaluations() >= limit.evaluations() && found.tails() < 0.5 * found.error()
                            ? String.format(
                                    Locale.ROOT,
                                    "%,d evaluations bring its error down to %.1g only",
                                    found.evaluations(),
                                    error)
                            : "the integral does not seem to converge");
        }
        return new Known(
                value, error, Kind.QUADRATURE, source(found.evaluations()), OptionalLong.of(found.evaluations()));
    }

    private static String source(long evaluations) {
        return String.format(Locale.ROOT, "quadrature, %,d evaluation%s", evaluations, evaluations == 1 ? "" : "s");
    }

    /// The density by whose quantiles an input is gone through.
    private static Density along(Input input) {
        var drawn = input.drawn();
        return switch (input.role()) {
            case Role.Random _, Role.Range _ -> drawn;
            case Role.UnboundedRange(double low, double high)
            when Double.isInfinite(low) && Double.isInfinite(high) ->
                new Cauchy(drawn.quantile(.5), .5 * (drawn.quantile(.75) - drawn.quantile(.25)));
            case Role.UnboundedRange(double low, double high)
            when Double.isInfinite(high) ->
                new Shifted(new LogLogistic(1, drawn.upperQuantile(.5 * drawn.survival(low)) - low), low, 1);
            case Role.UnboundedRange(double low, double high) ->
                new Shifted(new LogLogistic(1, high - drawn.quantile(.5 * drawn.cdf(high))), high, -1);
        };
    }

    /// The formula over the heights of those densities that stand for an unbounded range.
    private static Integrand weighed(FormulaOfInputs formula, List<Density> along) {
        var weighed = new boolean[along.size()];
        for (int j = 0; j < weighed.length; j++) {
            weighed[j] = formula.read().get(j).role() instanceof Role.UnboundedRange;
        }
        return (x, z, n) -> {
            formula.integrand().fill(x, z, n);
            for (int j = 0; j < weighed.length; j++) {
                for (int i = 0; weighed[j] && i < n; i++) {
                    z[i] /= along.get(j).pdf(x[j][i]);
                }
            }
        };
    }
}
