package dev.leadline.density;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.leadline.density.Fits.Wanted;
import dev.leadline.problem.Refusal;
import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.util.Arrays;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.stream.Collectors;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/// Fits against `density/fits.csv` (scipy, `fits.py`) and closed forms.
class FitsTest {

    /// Of both searches; relative, or of a unit.
    private static final double FOUND = 2e-6;

    private static final Map<String, double[]> SAMPLES = new HashMap<>();

    private static Stream<String[]> rows(String kind) {
        try (var in = FitsTest.class.getResourceAsStream("/density/fits.csv")) {
            return new String(in.readAllBytes(), StandardCharsets.UTF_8)
                    .lines()
                    .map(line -> line.split(","))
                    .filter(row -> row[0].equals(kind));
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
    }

    static {
        rows("values")
                .forEach(row -> SAMPLES.put(
                        row[1],
                        Arrays.stream(row[2].split(" "))
                                .mapToDouble(Double::parseDouble)
                                .toArray()));
    }

    static Stream<String[]> fits() {
        return rows("fit");
    }

    private static Fit fit(String family, Map<String, Double> given, double... values) {
        var fits = Fits.of(values, List.of(new Wanted(family, given)));
        assertEquals(List.of(), fits.refused());
        return fits.fits().getFirst();
    }

    @ParameterizedTest(name = "{2} to {1}")
    @MethodSource("fits")
    void agreesWithAnotherProgram(
            String kind, String sample, String family, String parameters, String log, String ks, String ad) {
        var fit = fit(family, Map.of(), SAMPLES.get(sample));
        Map<String, Double> expected = Arrays.stream(parameters.split(" "))
                .map(parameter -> parameter.split("="))
                .collect(Collectors.toMap(pair -> pair[0], pair -> Double.parseDouble(pair[1])));
        assertTrue(expected.keySet().containsAll(fit.parameters().keySet()), fit.toString());
        fit.parameters()
                .forEach((name, value) -> assertEquals(
                        expected.get(name), value, FOUND * Math.max(1, Math.abs(expected.get(name))), name));
        double likelihood = Double.parseDouble(log);
        assertEquals(likelihood, fit.logLikelihood(), 1e-9 * Math.abs(likelihood));
        assertEquals(Double.parseDouble(ks), fit.kolmogorovSmirnov(), FOUND);
        assertEquals(Double.parseDouble(ad), fit.andersonDarling(), 10 * FOUND);
    }

    /// Thoman, Bain and Antle (1969), Technometrics 11, 445-460, give 2.102 and 81.9 for these bearings.
    @Test
    void weibullOfBallBearings() {
        var fit = fit("weibull", Map.of(), SAMPLES.get("bearings"));
        assertEquals(2.102, fit.parameters().get("shape"), 5e-4);
        assertEquals(81.9, fit.parameters().get("scale"), .05);
        assertEquals(2, fit.free());
        assertEquals(4 - 2 * fit.logLikelihood(), fit.aic());
    }

    @Test
    void closedForms() {
        double[] x = {1, 2, 4, 9};
        assertEquals(Map.of("from", 1.0, "to", 9.0), fit("uniform", Map.of(), x).parameters());
        assertEquals(
                Map.of("mean", 4.0, "sd", Math.sqrt(9.5)),
                fit("normal", Map.of(), x).parameters());
        assertEquals(
                Map.of("location", 3.0, "scale", 2.5),
                fit("laplace", Map.of(), x).parameters());
        var pareto = fit("pareto", Map.of(), x).parameters();
        assertEquals(1, pareto.get("from"));
        assertEquals(4 / Math.log(2 * 4 * 9), pareto.get("shape"), 1e-14);
        assertEquals(3, fit("exponential", Map.of("from", 1.0), x).parameters().get("mean"), 1e-15);
        assertEquals(-4 * Math.log(8), fit("uniform", Map.of(), x).logLikelihood(), 1e-14);
    }

    /// The equations that hold at the maximum, with `t = shape/scale` and the excesses z: `mean log(1 + t z) = shape`
    /// and `mean(t z/(1 + t z)) = shape/(1 + shape)`. Grimshaw (1993), Technometrics 35, 185-191.
    @Test
    void generalizedParetoAboveAThreshold() {
        double[] x = {.2, .5, 1.1, 1.3, 1.4, 1.9, 2.2, 2.9, 3.3, 4.6, 7, 13};
        var fit = fit("generalized-pareto", Map.of("location", 1.0), x);
        assertEquals(10, fit.used());
        assertEquals(2, fit.free());
        double shape = fit.parameters().get("shape");
        double t = shape / fit.parameters().get("scale");
        double[] z = Arrays.stream(x).filter(v -> v > 1).map(v -> v - 1).toArray();
        double logs = Arrays.stream(z).map(v -> Math.log1p(t * v)).average().orElseThrow();
        double parts = Arrays.stream(z).map(v -> t * v / (1 + t * v)).average().orElseThrow();
        assertEquals(shape, logs, 1e-6);
        assertEquals(shape / (1 + shape), parts, 1e-6);
    }

    @Test
    void fitsAreOrderedAndRefusalsSayWhy() {
        var fits = Fits.of(new double[] {-1, .5, 2, 2.5, 7}, List.of());
        double last = Double.NEGATIVE_INFINITY;
        for (var fit : fits.fits()) {
            assertTrue(fit.aic() >= last, fits.toString());
            last = fit.aic();
        }
        var why = fits.refused().stream()
                .collect(Collectors.toMap(
                        Fits.Refused::family, refused -> refused.why().primary()));
        assertEquals("the least value is -1 but must be greater than 0", why.get("lognormal"));
        assertEquals("the least value is -1 but must be greater than 0", why.get("weibull"));
        assertEquals("the least value is -1 but must be at least 0", why.get("exponential"));
        assertEquals("the values reach from -1 to 7 but must lie between 0 and 1", why.get("beta"));
        assertEquals("its location, the threshold, is not given", why.get("generalized-pareto"));
        assertEquals(Fits.families().size(), fits.fits().size() + fits.refused().size());
    }

    private static String refused(String family, Map<String, Double> given, double... values) {
        var fits = Fits.of(values, List.of(new Wanted(family, given)));
        return fits.refused().getFirst().why().primary();
    }

    @Test
    void refusesWhatCannotBeFitted() {
        assertEquals("normal has no parameter median", refused("normal", Map.of("median", 1.0), 1, 2));
        assertEquals("nothing is left to fit", refused("gamma", Map.of("shape", 1.0, "scale", 1.0), 1, 2));
        assertEquals("too few values exceed 2", refused("generalized-pareto", Map.of("location", 2.0), 1, 2, 3, 4));
        // of equally spaced values up to 1 the greatest likelihood has its end there
        assertEquals(
                "the likelihood has no regular maximum",
                refused("generalized-pareto", Map.of("location", 0.0), .1, .2, .3, .4, .5, .6, .7, .8, .9, 1));
        assertEquals("the values are not all counts", refused("poisson", Map.of(), 1, 2.5));
        assertEquals("the values are not all counts", refused("geometric", Map.of(), -1, 2));
        assertEquals(
                "the family \"poison\" is not available",
                assertThrows(Refusal.class, () -> Fits.of(new double[] {1, 2}, List.of(new Wanted("poison", Map.of()))))
                        .getMessage());
        assertEquals(
                "there is only one value to fit to",
                assertThrows(Refusal.class, () -> Fits.of(new double[] {2, 2}, List.of()))
                        .problems()
                        .getFirst()
                        .primary());
        assertEquals(
                "the family triangular is not fitted",
                assertThrows(
                                Refusal.class,
                                () -> Fits.of(new double[] {1, 2}, List.of(new Wanted("triangular", Map.of()))))
                        .problems()
                        .getFirst()
                        .primary());
    }

    @Test
    void quantilesStandBesideOrderedValues() {
        double[] sorted = {-1, 0, 3};
        var fit = fit("uniform", Map.of(), sorted);
        assertEquals(
                List.of(-1 + 4 / 6.0, 1.0, 3 - 4 / 6.0),
                fit.points(sorted).stream().map(Fit.Point::quantile).toList());
        assertEquals(
                List.of(-1.0, 0.0, 3.0),
                fit.points(sorted).stream().map(Fit.Point::value).toList());
    }

    /// By hand: of 0, 1, 1, 3 the uniform cdf from 0 to 3 is 0, 1/3, 1/3, 1; the shares up to each are 1/4, 3/4, 1.
    @Test
    void distancesOfTiedValues() {
        assertEquals(.75 - 1 / 3.0, Distances.kolmogorovSmirnov(new Uniform(0, 3), 0, 1, 1, 3), 1e-15);
    }
}
