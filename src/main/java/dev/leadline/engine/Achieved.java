package dev.leadline.engine;

import dev.leadline.density.Measure;
import dev.leadline.estimate.Association;
import dev.leadline.estimate.Correlation;
import dev.leadline.formula.Program;
import dev.leadline.interval.Interval;
import dev.leadline.interval.Student;
import dev.leadline.model.Dependence;
import dev.leadline.model.Dependence.Tie;
import dev.leadline.model.Lane;
import dev.leadline.model.Question;
import dev.leadline.scheme.Independent;
import dev.leadline.scheme.Scheme;
import dev.leadline.scheme.Stretch;
import dev.leadline.stream.Address;
import dev.leadline.stream.Purpose;
import java.util.Arrays;
import java.util.List;
import java.util.stream.IntStream;

/// The correlation that draws of two tied inputs have, by the measure it was stated in: seen in draws made for
/// nothing else, so that it is independent of every answer.
///
/// @param value of ranks and orders the mean over batches of draws, of values that of all draws; `NaN` where all values
///     of an input in a batch are equal
/// @param interval from the spread of the batches; none, with its reason, where rare values decide the correlation
public record Achieved(Tie tie, double value, Interval interval) {
    private static final int BATCHES = 32;

    /// Blocks of a batch.
    private static final int BLOCKS = 4;

    /// How many draws are looked at.
    public static final long DRAWS = (long) BATCHES * BLOCKS * Program.BLOCK;

    /// Of every tie of a question, in their order.
    public static List<Achieved> of(Question question, long seed) {
        return question.dependence()
                .map(dependence -> of(question, dependence.ties(), seed))
                .orElse(List.of());
    }

    private static List<Achieved> of(Question question, List<Tie> ties, long seed) {
        var lane = Lane.of(Address.SHARED, Scheme.of(new Independent()));
        var recipe = Recipe.of(question, lane, seed, Purpose.DEPENDENCE);
        boolean[] tied = new boolean[question.inputs().size()];
        ties.forEach(tie -> {
            tied[tie.one()] = true;
            tied[tie.other()] = true;
        });
        var drawing = new Drawing(recipe, tied);
        double[][] seen = new double[ties.size()][BATCHES];
        double[][][] drawn = new double[question.inputs().size()][BATCHES][];
        for (int batch = 0; batch < BATCHES; batch++) {
            double[][] values = batch(drawing, batch);
            for (int input = 0; input < values.length; input++) {
                drawn[input][batch] = values[input];
            }
            double[][] ranks = Arrays.stream(values)
                    .map(column -> column == null ? null : Association.ranks(column))
                    .toArray(double[][]::new);
            for (int k = 0; k < ties.size(); k++) {
                Tie tie = ties.get(k);
                seen[k][batch] = switch (tie.measure()) {
                    case SPEARMAN -> Association.spearman(ranks[tie.one()], ranks[tie.other()]);
                    case KENDALL -> Association.kendall(values[tie.one()], values[tie.other()]);
                    case PEARSON -> Double.NaN; // of all draws together
                };
            }
        }
        double level = question.confidence();
        return IntStream.range(0, ties.size())
                .mapToObj(k -> ties.get(k).measure() == Measure.PEARSON
                        ? ofValues(question, ties.get(k), drawn, level)
                        : of(ties.get(k), seen[k], level))
                .toList();
    }

    private static Achieved ofValues(Question question, Tie tie, double[][][] drawn, double level) {
        var seen = Correlation.of(drawn[tie.one()], drawn[tie.other()]);
        var wild = Dependence.wild(tie, question.inputs());
        var interval = wild.isEmpty()
                ? Student.of(seen.value(), seen.standardError(), BATCHES, level)
                : Student.none(
                        level,
                        "rare, large values of %s decide it, more than can be seen in the draws looked at"
                                .formatted(String.join(" and ", wild)));
        return new Achieved(tie, seen.value(), interval);
    }

    private static Achieved of(Tie tie, double[] seen, double level) {
        double mean = Arrays.stream(seen).average().orElseThrow();
        double squares = Arrays.stream(seen).map(s -> (s - mean) * (s - mean)).sum();
        double error = Math.sqrt(squares / (BATCHES - 1) / BATCHES);
        return new Achieved(tie, mean, Student.of(mean, error, BATCHES, level));
    }

    private static double[][] batch(Drawing drawing, int index) {
        drawing.open(new Stretch(index, 0, 0));
        double[][] columns = drawing.columns();
        double[][] values = new double[columns.length][];
        for (int block = 0; block < BLOCKS; block++) {
            drawing.next(Program.BLOCK);
            for (int j = 0; j < columns.length; j++) {
                if (columns[j] != null) {
                    values[j] = values[j] == null ? new double[BLOCKS * Program.BLOCK] : values[j];
                    System.arraycopy(columns[j], 0, values[j], block * Program.BLOCK, Program.BLOCK);
                }
            }
        }
        return values;
    }
}
