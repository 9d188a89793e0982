package dev.leadline.interval;

import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.leadline.estimate.Accumulator;
import dev.leadline.stream.Address;
import dev.leadline.stream.Purpose;
import dev.leadline.stream.Stream;
import dev.leadline.stream.StreamKey;
import java.util.function.Function;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/// How often a 95 % interval holds what it should.
///
/// The expected coverages are those of an independent experiment with at least 20,000 repetitions (standard
/// error at most .0016). With R repetitions here the gate is four joint standard errors: a right program
/// fails a case with probability 6e-5, and at R = 4,000 a coverage that is off by .02 is noticed nearly
/// always.
class CoverageTest {
    private static final long SEED = 20261201;
    private static final double OTHER_ERROR = 0.0016;

    @ParameterizedTest(name = "{0}")
    @CsvSource({
        "NORMAL, .951, .951, .951, .950, .950",
        "EXPONENTIAL, .901, .928, .941, .951, .951",
        "LOGNORMAL_1, .839, .883, .917, .943, .949",
        "LOGNORMAL_2, .570, .654, .740, .854, .910",
        "PARETO_2_5, .793, .843, .885, .927, .944",
        "PARETO_1_5, .622, .661, .703, .760, .788"
    })
    void studentCoversAsItShould(
            Observed density, double of10, double of30, double of100, double of1000, double of10000) {
        covers(density, 10, 4_000, of10, sums -> Student.of(sums, 0, .95));
        covers(density, 30, 4_000, of30, sums -> Student.of(sums, 0, .95));
        covers(density, 100, 4_000, of100, sums -> Student.of(sums, 0, .95));
        covers(density, 1_000, 2_000, of1000, sums -> Student.of(sums, 0, .95));
        covers(density, 10_000, 1_000, of10000, sums -> Student.of(sums, 0, .95));
    }

    @ParameterizedTest(name = "{0}, n = {1}: {2}")
    @CsvSource({"EXPONENTIAL, 10, .934", "EXPONENTIAL, 30, .946", "EXPONENTIAL, 100, .948", "LOGNORMAL_1, 100, .936"})
    void skewnessCorrectedCoversAsItShould(Observed density, int n, double coverage) {
        covers(density, n, 20_000, coverage, sums -> SkewnessCorrected.of(sums, 0, .95));
    }

    /// The repetitions are few, since each takes 1,999 samples.
    @ParameterizedTest(name = "{0}, n = {1}: {2}")
    @CsvSource({"LOGNORMAL_1, 30, .932", "LOGNORMAL_1, 100, .934"})
    void bootstrapTCoversAsItShould(Observed density, int n, double coverage) {
        var random = Observed.random(SEED + n);
        int repetitions = 2_000;
        int covered = 0;
        for (int r = 0; r < repetitions; r++) {
            var key = StreamKey.of(new Address(SEED, Purpose.BOOTSTRAP, "A", r, density + " " + n, 0));
            var interval = BootstrapT.of(density.draws(random, n), .95, key);
            covered += interval.low() <= density.mean && density.mean <= interval.high() ? 1 : 0;
        }
        gate(coverage, covered, repetitions, OTHER_ERROR);
    }

    private static void covers(
            Observed density, int n, int repetitions, double coverage, Function<Accumulator, Interval> kind) {
        var random = Observed.random(SEED + n);
        int covered = 0;
        for (int r = 0; r < repetitions; r++) {
            var interval = kind.apply(Observed.sums(density.draws(random, n)));
            covered += interval.low() <= density.mean && density.mean <= interval.high() ? 1 : 0;
        }
        gate(coverage, covered, repetitions, OTHER_ERROR);
    }

    /// Against the exact coverages of [ClopperPearsonTest].
    @ParameterizedTest(name = "n = {0}, p = {1}: {2}")
    @CsvSource({"100, .5, .9648", "1000, 1e-3, .98107", "1000, 5e-3, .9799"})
    void clopperPearsonCoversAsItShould(int n, double p, double coverage) {
        int repetitions = 4_000;
        var values = new double[1][n];
        int covered = 0;
        for (int r = 0; r < repetitions; r++) {
            Stream.at(new Address(SEED, Purpose.RUN, "A", 0, "event " + n + " " + p, r))
                    .fill(values[0], 0, n);
            for (int i = 0; i < n; i++) {
                values[0][i] = values[0][i] < p ? 1 : 0;
            }
            var sums = new Accumulator(1);
            sums.add(values, 0, n);
            var interval = ClopperPearson.of(sums.hits(0).orElseThrow(), n, sums.excluded(), .95);
            covered += interval.low() <= p && p <= interval.high() ? 1 : 0;
        }
        gate(coverage, covered, repetitions, 0);
    }

    static void gate(double expected, int covered, int repetitions, double otherError) {
        double here = (double) covered / repetitions;
        double error = Math.sqrt(expected * (1 - expected) / repetitions + otherError * otherError);
        assertTrue(
                Math.abs(here - expected) <= 4 * error,
                () -> here + " where " + expected + " ± " + 4 * error + " was expected, seed " + SEED);
    }
}
