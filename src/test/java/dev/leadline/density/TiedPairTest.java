package dev.leadline.density;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.Arrays;
import java.util.Map;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvFileSource;
import org.junit.jupiter.params.provider.CsvSource;

class TiedPairTest {
    private static final Density LOGNORMAL = new Lognormal(0, .8);
    private static final Density NORMAL = new Normal(3, 2);

    /// Of inputs with steps, as `SteppedPair` says.
    private static final double STEPPED = 1e-9;

    private static double value(Measure measure, Mixing mixing, Density one, Density other, double latent) {
        return measure.value(mixing, one, other, latent);
    }

    /// Kruskal (1958): `6/π asin(ρ/2)` and `2/π asin(ρ)`, here for ρ = .7.
    @Test
    void ranksOfTheGaussianCopula() {
        assertEquals(.6829105, value(Measure.SPEARMAN, Mixing.NONE, NORMAL, NORMAL, .7), 5e-8);
        assertEquals(.4936334, value(Measure.KENDALL, Mixing.NONE, NORMAL, NORMAL, .7), 5e-8);
        assertEquals(.4936334, value(Measure.KENDALL, Mixing.student(3), NORMAL, NORMAL, .7), 5e-8);
        assertEquals(.7, Measure.SPEARMAN.latent(Mixing.NONE, NORMAL, NORMAL, .6829105), 1e-7);
        assertEquals(.7, Measure.KENDALL.latent(Mixing.NONE, NORMAL, NORMAL, .4936334), 1e-7);
    }

    /// The correlation of two lognormals is `expm1(σ²ρ) / expm1(σ²)`; so is its inverse.
    @Test
    void valuesOfLognormals() {
        assertEquals(.6304414, value(Measure.PEARSON, Mixing.NONE, LOGNORMAL, LOGNORMAL, .7), 5e-8);
        assertEquals(.7610431, Measure.PEARSON.latent(Mixing.NONE, LOGNORMAL, LOGNORMAL, .7), 5e-8);
        assertEquals(
                Math.expm1(-.64) / Math.expm1(.64),
                value(Measure.PEARSON, Mixing.NONE, LOGNORMAL, LOGNORMAL, -1),
                1e-9);
        assertTrue(Double.isNaN(Measure.PEARSON.latent(Mixing.NONE, LOGNORMAL, LOGNORMAL, -.6)));
    }

    /// Of normals it is that of the normals; of a normal and a lognormal it is `σρ / sqrt(expm1(σ²))`.
    @Test
    void valuesOfANormal() {
        assertEquals(.3, Measure.PEARSON.latent(Mixing.NONE, NORMAL, new Normal(-1, 7), .3), 1e-9);
        assertEquals(
                .8 * .5 / Math.sqrt(Math.expm1(.64)), value(Measure.PEARSON, Mixing.NONE, NORMAL, LOGNORMAL, .5), 1e-9);
    }

    /// Student values tied by the Student copula of the same degrees of freedom are a multivariate t, whose correlation
    /// is that of the normals.
    @ParameterizedTest(name = "dof {0}")
    @CsvSource({"3, 1e-6", "5, 1e-9", "30, 1e-12"})
    void valuesOfTheMultivariateT(double dof, double error) {
        var student = new Student(dof, 1, 4);
        assertEquals(.7, value(Measure.PEARSON, Mixing.student(dof), student, student, .7), error);
    }

    /// `copula_values.py`: by another formula, in three dimensions.
    @ParameterizedTest(name = "dof {0}, ρ {1}")
    @CsvFileSource(resources = "/density/copula.csv", useHeadersInDisplayName = true)
    void ranksOfTheStudentCopula(double dof, double rho, double spearman) {
        double error = dof < 2 ? 1e-5 : 1e-7;
        assertEquals(spearman, value(Measure.SPEARMAN, Mixing.student(dof), NORMAL, NORMAL, rho), error);
        assertEquals(rho, Measure.SPEARMAN.latent(Mixing.student(dof), NORMAL, NORMAL, spearman), 2 * error);
    }

    /// Two values each, with a chance of one half: `2/π asin(ρ)`, Sheppard (1899).
    @ParameterizedTest
    @CsvSource({"-.8", "-.3", ".2", ".7", ".99"})
    void valuesOfTwoHalves(double rho) {
        var half = Empirical.of(0, 1);
        assertEquals(2 / Math.PI * Math.asin(rho), value(Measure.PEARSON, Mixing.NONE, half, half, rho), STEPPED);
        assertEquals(1, value(Measure.PEARSON, Mixing.NONE, half, half, 1), 1e-12);
    }

    /// A value 1 with chance p, else 0, and a normal: `ρ φ(z) / sqrt(p (1 - p))`, with z the quantile of p.
    @Test
    void valuesOfAnEventAndANormal() {
        var quarter = Empirical.of(0, 0, 0, 1);
        double expected = .6 * .3177765726841069 / Math.sqrt(.1875);
        assertEquals(expected, value(Measure.PEARSON, Mixing.NONE, quarter, NORMAL, .6), STEPPED);
        assertEquals(.6, Measure.PEARSON.latent(Mixing.NONE, NORMAL, quarter, expected), 2 * STEPPED);
    }

    /// `stepped_pairs.py`: double sums over the steps, with the copula by another integral; closed forms.
    @ParameterizedTest(name = "{0} and {1}, dof {2}, ρ {3}")
    @CsvFileSource(resources = "/density/stepped-pairs.csv", delimiter = ';', useHeadersInDisplayName = true)
    void valuesOfInputsWithSteps(String one, String other, double dof, double rho, double pearson) {
        var mixing = dof == 0 ? Mixing.NONE : Mixing.student(dof);
        assertEquals(pearson, value(Measure.PEARSON, mixing, density(one), density(other), rho), STEPPED);
        assertEquals(pearson, value(Measure.PEARSON, mixing, density(other), density(one), rho), STEPPED);
    }

    private static Density density(String words) {
        double[] numbers = Arrays.stream(
                        words.replaceAll("^[^(]*|[^-.\\d]+", " ").strip().split(" +"))
                .mapToDouble(Double::parseDouble)
                .toArray();
        return switch (words.replaceAll("\\(.*", "")) {
            case "poisson" -> new Poisson(numbers[0]);
            case "binomial" -> Catalogue.named("binomial").of(Map.of("trials", numbers[0], "probability", numbers[1]));
            case "bernoulli" -> Catalogue.named("bernoulli").of(Map.of("probability", numbers[0]));
            case "table" -> ValueTable.of(everyOther(numbers, 0), everyOther(numbers, 1));
            default -> new Lognormal(numbers[0], numbers[1]);
        };
    }

    private static double[] everyOther(double[] numbers, int from) {
        return IntStream.range(0, numbers.length / 2)
                .mapToDouble(i -> numbers[2 * i + from])
                .toArray();
    }

    /// With too many values for that, two of Poisson's are nearly normal, and so is their correlation.
    @Test
    void valuesOfManySteps() {
        var many = new Poisson(40_000);
        assertEquals(.7, value(Measure.PEARSON, Mixing.NONE, many, many, .7), 1e-4);
    }
}
