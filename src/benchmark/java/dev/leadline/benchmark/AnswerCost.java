package dev.leadline.benchmark;

import com.sun.management.OperatingSystemMXBean;
import dev.leadline.engine.Questions;
import dev.leadline.engine.Recipe;
import dev.leadline.estimate.Accumulator;
import dev.leadline.estimate.Estimand;
import dev.leadline.model.Lane;
import dev.leadline.model.Plan;
import dev.leadline.model.Question;
import dev.leadline.scheme.Independent;
import dev.leadline.scheme.Scheme;
import dev.leadline.study.Study;
import java.lang.management.ManagementFactory;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Arrays;
import java.util.List;
import java.util.Locale;

/// What answers, bands and grounds add to a run: nanoseconds of processor time per draw of a whole run with everything
/// that is judged at its marks, beside the bare draws with their sums, which are measured just before in every round.
///
/// `AnswerCost FILE` writes its table to the file, as Markdown.
public final class AnswerCost {
    private static final OperatingSystemMXBean CLOCK =
            (OperatingSystemMXBean) ManagementFactory.getOperatingSystemMXBean();
    private static final int DRAWS = 40_000_000;
    private static final int WARM_UP = 2;
    private static final int ROUNDS = 9;
    private static final String INTEGRAND = "x*sin(3*x) + log(1+x)";

    /// One kind of answer, asked of the same draws.
    private static final class Work {
        private final String name;
        private final Question question;
        private final Plan plan;
        private final Recipe recipe;
        private volatile int grounds;
        private final double[] time = new double[ROUNDS];
        private final double[] before = new double[ROUNDS];

        Work(String name, Estimand estimand, String... formulas) {
            this.name = name;
            this.question =
                    new Questions().uniform("x", 0, 1).ask(estimand, formulas).build();
            this.plan = Questions.plan(DRAWS, 20261201);
            this.recipe = Recipe.of(question, Lane.of("A", Scheme.of(new Independent())), 20261201);
        }

        /// Draws and sums alone.
        double bare() {
            long start = CLOCK.getProcessCpuTime();
            var items = recipe.items();
            var sampler = recipe.sampler();
            var total = new Accumulator(1);
            long done = 0;
            for (long k = 0; done < DRAWS; k++) {
                var item = items.within(k, DRAWS).orElseThrow();
                total.merge(sampler.compute(item, () -> false).orElseThrow().sums());
                done += item.draws();
            }
            return (double) (CLOCK.getProcessCpuTime() - start) / DRAWS;
        }

        /// A whole run, judged at every mark.
        double whole() throws Exception {
            long start = CLOCK.getProcessCpuTime();
            try (var study = Study.start(
                    question,
                    plan,
                    1,
                    state -> grounds += state.lanes().stream()
                            .mapToInt(lane -> lane.grounds().size())
                            .sum())) {
                study.await();
            }
            return (double) (CLOCK.getProcessCpuTime() - start) / DRAWS;
        }
    }

    private AnswerCost() {}

    public static void main(String[] args) throws Exception {
        var machine = Machine.described();
        var mean = new Work("mean", new Estimand.Mean(), INTEGRAND);
        List<Work> all = List.of(
                mean,
                new Work("probability", new Estimand.Probability(), INTEGRAND + " > 1"),
                new Work("quantile, .99", new Estimand.Quantile(.99), INTEGRAND),
                new Work("quantile, .5", new Estimand.Quantile(.5), INTEGRAND),
                new Work("tail mean, .95", new Estimand.TailMean(.95), INTEGRAND),
                new Work("standard deviation", new Estimand.StandardDeviation(), INTEGRAND),
                new Work("ratio", new Estimand.Ratio(), INTEGRAND, "1 + x"),
                new Work("distribution", new Estimand.Distribution(.95), INTEGRAND));
        for (int round = -WARM_UP; round < ROUNDS; round++) {
            int kept = Math.max(round, 0);
            for (Work work : all) {
                work.before[kept] = mean.bare();
                work.time[kept] = work.whole();
            }
        }
        Files.writeString(Path.of(args[0]), written(machine, all));
        System.out.println("written: " + args[0]);
    }

    private static double median(double[] values) {
        double[] sorted = values.clone();
        Arrays.sort(sorted);
        return sorted[sorted.length / 2];
    }

    private static String written(String machine, List<Work> all) {
        var text = new StringBuilder("""
                # Answers

                Nanoseconds of processor time per draw of `%s` in a run of %,d draws, with answers, intervals and bands at \
                every mark and every ground at every look, thirty times a second; beside them those of the bare draws of the mean with their sums, measured just before in \
                every round, and the ratio. Medians of %d rounds. Written by `AnswerCost`, which `mvn -B -Pbenchmark -DskipTests \
                test` runs.

                %s

                | answer | ns | bare, ns | ratio |
                |---|---|---|---|
                """.formatted(INTEGRAND, DRAWS, ROUNDS, machine));
        for (Work work : all) {
            double[] ratio = new double[ROUNDS];
            Arrays.setAll(ratio, round -> work.time[round] / work.before[round]);
            text.append(String.format(
                    Locale.ROOT,
                    "| %s | %.2f | %.2f | %.2f |%n",
                    work.name,
                    median(work.time),
                    median(work.before),
                    median(ratio)));
        }
        return text.toString();
    }
}
