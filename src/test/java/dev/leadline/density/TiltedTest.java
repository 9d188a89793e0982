package dev.leadline.density;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.leadline.problem.Refusal;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.util.Arrays;
import java.util.List;
import java.util.Map;
import java.util.stream.Collectors;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

class TiltedTest {
    /// A row of `tilts.csv`: quadrature and summation in 40 digits by `src/test/python/tilts.py`.
    record Row(Density density, double by, double logFactor, double x, double cdf, double survival) {
        static Row of(String line) {
            String[] cells = line.split(",");
            Map<String, Double> parameters = Arrays.stream(cells[1].split(";"))
                    .map(pair -> pair.split("="))
                    .collect(Collectors.toMap(pair -> pair[0], pair -> Double.valueOf(pair[1])));
            double[] n = Arrays.stream(cells)
                    .skip(2)
                    .mapToDouble(Double::parseDouble)
                    .toArray();
            return new Row(Catalogue.family(cells[0]).orElseThrow().of(parameters), n[0], n[1], n[2], n[3], n[4]);
        }
    }

    static List<Row> rows() throws IOException {
        try (var in = TiltedTest.class.getResourceAsStream("/density/tilts.csv")) {
            return new String(in.readAllBytes(), StandardCharsets.UTF_8)
                    .lines()
                    .skip(1)
                    .map(Row::of)
                    .toList();
        }
    }

    @ParameterizedTest
    @MethodSource("rows")
    void agreesWithQuadrature(Row row) {
        var tilted = Tilted.of(row.density, row.by);
        assertEquals(row.logFactor, tilted.logFactor(), 1e-12 * (1 + Math.abs(row.logFactor)));
        assertEquals(row.cdf, tilted.density().cdf(row.x), 1e-10 * row.cdf);
        assertEquals(row.survival, tilted.density().survival(row.x), 1e-10 * row.survival);
    }

    static Stream<Density> densities() {
        return Stream.of(
                new Normal(3, 2),
                new Exponential(2),
                new Gamma(2.5, 3),
                new ChiSquare(5),
                new InverseGaussian(2, 3),
                new Laplace(1, 2),
                new Uniform(-1, 2),
                new Gumbel(1, 2),
                new Logistic(0, 1.5),
                new Triangular(0, 1, 4),
                new Beta(2, 3, 0, 1),
                new Poisson(4),
                new Binomial(12, .25),
                new Bernoulli(.0625),
                new Geometric(.25),
                new NegativeBinomial(2.5, 4),
                new Hypergeometric(50, 20, 10),
                ValueTable.of(new double[] {0, 10, 50}, new double[] {.93, .04, .03}),
                Empirical.of(3, 1, 4, 1, 5, 9, 2, 6),
                new Shifted(new Gamma(2, 1), 5, -2),
                new Shifted(new Poisson(3), 1, 2),
                Truncated.of(new Normal(0, 1), 1, Double.POSITIVE_INFINITY),
                Truncated.of(new Lognormal(0, 1), 0, 20),
                Truncated.of(new Poisson(4), 2, 9),
                new Mixture(List.of(new Mixture.Part(.9, new Normal(0, 1)), new Mixture.Part(.1, new Exponential(2)))));
    }

    /// By definition: the logarithm of the density over the input's own is `by x` less that of the mean factor, at
    /// all values; and what is divided by is the mean, so that the tilted density has the mass 1 below its last
    /// quantile.
    @ParameterizedTest
    @MethodSource("densities")
    void isTheDensityTimesTheFactor(Density density) {
        for (double by : new double[] {.125, -.25, 0}) {
            var tilted = Tilted.of(density, by);
            for (double p : new double[] {1e-6, .01, .3, .7, .999}) {
                double x = density.quantile(p);
                assertEquals(
                        by * x - tilted.logFactor(),
                        tilted.density().logPdf(x) - density.logPdf(x),
                        1e-10,
                        density + " by " + by + " at " + x);
            }
            double median = tilted.density().quantile(.5);
            assertEquals(
                    1, tilted.density().cdf(median) + tilted.density().survival(median), 1e-12, density + " by " + by);
        }
    }

    @Test
    void refusesWhereTheFactorHasNoMean() {
        refuses(new Lognormal(0, 1), .01, "exp(0.01 x) has no finite mean");
        refuses(new Student(4, 0, 1), -1e-6, "exp(-1e-6 x) has no finite mean");
        refuses(new Exponential(2), .5, "exp(0.5 x) has no finite mean");
        refuses(new Gamma(3, .5), 2.5, "exp(2.5 x) has no finite mean");
        refuses(new Laplace(0, 1), -1, "exp(-1 x) has no finite mean");
        refuses(new InverseGaussian(2, 3), .375, "exp(0.375 x) has no finite mean");
        refuses(new Gumbel(0, 2), .5, "exp(0.5 x) has no finite mean");
        refuses(new Weibull(.75, 1, 0), 1e-3, "exp(0.001 x) has no finite mean");
        refuses(new Geometric(.5), 1, "exp(1 x) has no finite mean");
        refuses(new Normal(0, 1), Double.NaN, "tilt is NaN but must be a finite number");
        refuses(
                new Mixture(List.of(new Mixture.Part(.5, new Normal(0, 1)), new Mixture.Part(.5, new Lognormal(0, 1)))),
                1,
                "exp(1 x) has no finite mean");
        // the other tail is tilted down
        assertTrue(Tilted.of(new Lognormal(0, 1), -.01).logFactor() < 0);
    }

    private static void refuses(Density density, double by, String primary) {
        var refusal = assertThrows(Refusal.class, () -> Tilted.of(density, by), density + " by " + by);
        assertEquals(primary, refusal.problems().getFirst().primary());
        assertEquals("tilt", refusal.problems().getFirst().place().path());
    }
}
