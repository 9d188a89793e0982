package dev.leadline.study;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.leadline.model.Project;
import dev.leadline.project.ProjectFile;
import dev.leadline.trace.Answer;
import dev.leadline.trace.Mark;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/// The interval that a question names is the one that its answer has.
class IntervalKindsTest {
    private static Answer run(String ask, String interval, int draws, int threads) throws InterruptedException {
        Project project = Project.of(ProjectFile.parse("""
                {"leadline": 1, "seed": 3, "stop": {"rule": "fixed", "draws": %d},
                 "inputs": [{"name": "x", "density": {"family": "uniform", "from": 0, "to": 1}}],
                 "ask": %s%s}
                """.formatted(draws, ask, interval)));
        try (var study = Study.start(project.question(), project.plan(), threads, _ -> {})) {
            return study.await()
                    .lanes()
                    .getFirst()
                    .trace()
                    .last()
                    .orElseThrow()
                    .answers()
                    .getFirst();
        }
    }

    @ParameterizedTest
    @CsvSource(
            delimiter = '|',
            value = {
                "{\"mean\": \"exp(x)\"} | student",
                "{\"mean\": \"exp(x)\"} | skewness-corrected",
                "{\"mean\": \"exp(x)\"} | bootstrap-t",
                "{\"mean\": \"exp(x)\"} | hoeffding",
                "{\"mean\": \"exp(x)\"} | empirical-bernstein",
                "{\"probability\": \"exp(x) > 2\"} | wilson",
                "{\"probability\": \"exp(x) > 2\"} | clopper-pearson"
            })
    void isTheOneThatWasNamed(String ask, String kind) throws InterruptedException {
        String interval = ", \"interval\": \"%s\", \"bounds\": [1, 2.72]".formatted(kind);
        Answer answer = run(ask, interval, 5_000, 1);
        assertEquals(kind, answer.interval().kind());
        assertEquals(answer, run(ask, interval, 5_000, 2));
        double exact = ask.contains("mean") ? Math.E - 1 : 1 - Math.log(2);
        assertTrue(answer.interval().low() < exact && exact < answer.interval().high(), answer.toString());
    }

    /// Hoeffding's half-width is the range times the root of `ln(2/α)/(2n)`: 1.72 · √(ln 40/10,000).
    @Test
    void boundsDecideItsLength() throws InterruptedException {
        Answer answer = run("{\"mean\": \"exp(x)\"}", ", \"interval\": \"hoeffding\", \"bounds\": [1, 2.72]", 5_000, 1);
        assertEquals(1.72 * Math.sqrt(Math.log(40) / 10_000), answer.interval().halfWidth(), 1e-12);
    }

    /// An integral counts the length of its range: ten times the integrand, ten times its bounds.
    @Test
    void boundsOfAnIntegrandCountTheVolume() throws InterruptedException {
        Project project = Project.of(ProjectFile.parse("""
                {"leadline": 1, "seed": 3, "stop": {"rule": "fixed", "draws": 5000},
                 "inputs": [{"name": "x", "range": [0, 10]}],
                 "ask": {"integral": "exp(-x)"}, "interval": "hoeffding", "bounds": [0, 1]}
                """));
        try (var study = Study.start(project.question(), project.plan(), 1, _ -> {})) {
            Mark last = study.await().lanes().getFirst().trace().last().orElseThrow();
            var interval = last.answers().getFirst().interval();
            // The exact half-width, less what the limit 0 cuts off.
            double half = 10 * Math.sqrt(Math.log(40) / 10_000);
            assertEquals(last.answers().getFirst().estimate() + half, interval.high(), 1e-12);
        }
    }

    @Test
    void moreThanAreResampledAreRefused() throws InterruptedException {
        Answer answer = run("{\"mean\": \"exp(x)\"}", ", \"interval\": \"bootstrap-t\"", 100_001, 2);
        assertTrue(Double.isNaN(answer.interval().low()));
        assertTrue(
                answer.interval().note().orElseThrow().contains("at most 100,000"),
                answer.interval().toString());
    }
}
