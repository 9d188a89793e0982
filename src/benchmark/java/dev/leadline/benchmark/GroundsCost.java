package dev.leadline.benchmark;

import com.sun.management.OperatingSystemMXBean;
import dev.leadline.engine.Items;
import dev.leadline.engine.Questions;
import dev.leadline.engine.Recipe;
import dev.leadline.engine.Sampler;
import dev.leadline.estimate.Accumulator;
import dev.leadline.estimate.Estimand;
import dev.leadline.ground.Grounds;
import dev.leadline.model.Question;
import dev.leadline.study.Study;
import dev.leadline.trace.Trace;
import java.io.IOException;
import java.lang.management.ManagementFactory;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Arrays;
import java.util.LinkedHashMap;
import java.util.Locale;
import java.util.Map;

/// What a run costs beyond making draws and their sums: answers, bands and grounds at every mark, largest values, and
/// outcomes kept in order. Processor time of the whole process, on one worker, against items of work merged and nothing
/// else, measured just before in every round.
///
/// `GroundsCost FILE` writes its table to the file, as Markdown.
public final class GroundsCost {
    private static final OperatingSystemMXBean PROCESS =
            (OperatingSystemMXBean) ManagementFactory.getOperatingSystemMXBean();
    private static final long DRAWS = 1 << 25;
    private static final int WARM_UP = 2;
    private static final int ROUNDS = 7;
    private static final String B = "x*sin(3*x) + log(1+x)";

    private GroundsCost() {}

    private static Questions uniform() {
        return new Questions().uniform("x", 0, 1);
    }

    public static void main(String[] args) throws IOException, InterruptedException {
        var machine = Machine.described();
        Map<String, Question> questions = new LinkedHashMap<>();
        questions.put("mean", uniform().mean(B).build());
        questions.put("mean, values of both signs", uniform().mean(B + " - 1").build());
        questions.put(
                "quantile .95", uniform().ask(new Estimand.Quantile(.95), B).build());
        questions.put(
                "distribution", uniform().ask(new Estimand.Distribution(.95), B).build());
        var bare = Recipe.of(questions.get("mean"), Questions.lane("A"), 1);
        var sampler = bare.sampler();
        double[][] ratios = new double[questions.size()][ROUNDS];
        double[] plain = new double[ROUNDS];
        Trace mean = null;
        for (int round = -WARM_UP; round < ROUNDS; round++) {
            int row = 0;
            for (var question : questions.values()) {
                double before = sums(bare.items(), sampler);
                long start = PROCESS.getProcessCpuTime();
                try (var study = Study.start(question, Questions.plan(DRAWS, 1), 1, _ -> {})) {
                    var trace = study.await().lanes().getFirst().trace();
                    mean = row == 0 ? trace : mean;
                }
                double took = (double) (PROCESS.getProcessCpuTime() - start) / DRAWS;
                ratios[row++][Math.max(round, 0)] = took / before;
                plain[Math.max(round, 0)] = before;
            }
        }
        Files.writeString(
                Path.of(args[0]), written(machine, questions, ratios, plain, judging(questions.get("mean"), mean)));
        System.out.println("written: " + args[0]);
    }

    /// Nanoseconds a draw.
    private static double sums(Items items, Sampler sampler) {
        long start = PROCESS.getProcessCpuTime();
        var total = new Accumulator(1);
        long done = 0;
        for (long k = 0; done < DRAWS; k++) {
            var item = items.at(k);
            total.merge(sampler.compute(item, () -> false).orElseThrow().sums());
            done += item.draws();
        }
        return (double) (PROCESS.getProcessCpuTime() - start) / done;
    }

    /// Microseconds of the grounds of one mark.
    private static double judging(Question question, Trace trace) {
        int times = 2_000;
        int grounds = 0;
        long start = 0;
        for (int i = -times; i < times; i++) {
            start = i == 0 ? PROCESS.getProcessCpuTime() : start;
            grounds += Grounds.of(question, trace).size();
        }
        return grounds > 0 ? (PROCESS.getProcessCpuTime() - start) / 1e3 / times : Double.NaN;
    }

    private static double median(double[] values) {
        double[] sorted = values.clone();
        Arrays.sort(sorted);
        return sorted[sorted.length / 2];
    }

    private static String written(
            String machine, Map<String, Question> questions, double[][] ratios, double[] plain, double judging) {
        var text = new StringBuilder("""
                # Grounds, bands and quantiles

                Processor time of a whole run of `%s` (answers, bands and grounds at every mark, largest values, outcomes kept in order) \
                over that of its draws and their sums alone, which is measured just before in every round: %.2f ns a draw. Medians of %d \
                rounds of %,d draws on one worker. The grounds of one mark take %.0f µs. Written by `GroundsCost`, which \
                `mvn -B -Pbenchmark -DskipTests test` runs.

                %s

                | asked for | run over draws and sums |
                |---|---|
                """.formatted(B, median(plain), ROUNDS, DRAWS, judging, machine));
        int row = 0;
        for (var name : questions.keySet()) {
            text.append(String.format(Locale.ROOT, "| %s | %.3f |%n", name, median(ratios[row++])));
        }
        return text.toString();
    }
}
