package dev.leadline.density;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.leadline.problem.Problem;
import dev.leadline.problem.Refusal;
import java.util.Arrays;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.MethodSource;
import org.junit.jupiter.params.provider.ValueSource;

/// What a person is told whose parameters are refused.
class FamilyTest {

    /// Family, parameters, then the first lines of all problems.
    @ParameterizedTest(name = "{0} {1}")
    @CsvSource(
            delimiter = '|',
            value = {
                "gumbel | location 2 scale 0 | scale is 0 but must be greater than 0",
                "gumbel | location 2 scale NaN | scale is NaN but must be greater than 0",
                "gumbel | location Infinity scale -1 | location is ∞ but must be a finite number; scale is -1 but must be greater than 0",
                "gumbel | location 2 scale Infinity | scale is ∞ but must be a finite number",
                "uniform | from 3 to 3 | to is 3 but must be greater than from, 3",
                "uniform | from 3 to -1.5 | to is -1.5 but must be greater than from, 3",
                "uniform | from NaN to 1 | from is NaN but must be a finite number",
                "uniform | from -1e308 to 1e308 | the distance between from and to is too large",
                "normal | mean 0 sd -1 | sd is -1 but must be greater than 0",
                "normal | mean 0 sd 1e308 | some draws of this density would exceed the largest number there is, 1.8e308",
                "normal | mean 0 sdd 1 | normal has no parameter sdd",
                "normal | mean 0 | sd is missing",
                "lognormal | mu 0 sigma 0 | sigma is 0 but must be at least 1e-9 and at most 80",
                "lognormal | mu 800 sigma 1 | mu is 800 but must be at least -700 and at most 700",
                "lognormal | mean 0 sd 1 | mean is 0 but must be greater than 0",
                "lognormal | mean 1e300 sd 1e-100 | mean 1e300 with sd 1e-100 is too extreme",
                "lognormal | mu 0 mean 1 | mean and mu do not go together in one density",
                "lognormal | mu 700 sigma 80 | some draws of this density would exceed the largest number there is, 1.8e308",
                "triangular | from 0 mode 8 to 7 | mode is 8 but must be between from, 0, and to, 7",
                "triangular | from 0 mode NaN to 7 | mode is NaN but must be a finite number",
                "triangular | from 7 mode 7 to 7 | to is 7 but must be greater than from, 7",
                "exponential | mean 0 | mean is 0 but must be greater than 0",
                "exponential | mean 2 from 3 | mean is 2 but must be greater than from, 3",
                "exponential | mean NaN | mean is NaN but must be a finite number",
                "trapezoidal | from 0 flatFrom 5 flatTo 2 to 3 | flatFrom is 5 but must be between from, 0, and to, 3",
                "trapezoidal | from 0 flatFrom 2 flatTo 1 to 3 | flatTo is 1 but must be between flatFrom, 2, and to, 3",
                "trapezoidal | from 0 to 3 | flatFrom is missing; flatTo is missing",
                "trapezoidal | from 0 to 3 top 2 | top is 2 but must be at least 0 and at most 1",
                "curvilinear-trapezoid | from 0 to 2 inexact 1 | inexact is 1 but must be less than half of the distance between from and to, 1",
                "curvilinear-trapezoid | from 0 to 2 inexact 0 | inexact is 0 but must be greater than 0",
                "arcsine | from 1 to 1 | to is 1 but must be greater than from, 1",
                "pert | from 0 mode 3 to 2 | mode is 3 but must be between from, 0, and to, 2",
                "pert | from 0 mode 1 to 2 emphasis 0 | emphasis is 0 but must be at least 0.01 and at most 100000",
                "half-normal | sigma NaN | sigma is NaN but must be greater than 0",
                "rayleigh | mean -1 | mean is -1 but must be greater than 0",
                "rayleigh | mean 1 sigma 1 | mean and sigma do not go together in one density",
                "chi-square | dof 0 | dof is 0 but must be at least 0.2 and at most 1000000",
                "f | dof1 0 dof2 NaN | dof1 is 0 but must be at least 0.2 and at most 1000000; dof2 is NaN but must be at least 0.2 and at most 1000000",
                "laplace | mean 0 sd 0 | sd is 0 but must be greater than 0",
                "logistic | location 0 scale -1 | scale is -1 but must be greater than 0",
                "log-logistic | shape 0.01 scale 1 | shape is 0.01 but must be at least 0.05 and at most 1000000",
                "log-logistic | shape 0.05 scale 1 | some draws of this density would exceed the largest number there is, 1.8e308",
                "cauchy | location NaN scale 1 | location is NaN but must be a finite number",
                "gamma | mean 1 sd 1e-9 | mean 1 with sd 1e-9 is too extreme",
                "gamma | mean 1 cv -0.1 | cv is -0.1 but must be greater than 0",
                "normal | mean 0 cv 0.1 | mean is 0 but must be a finite number other than 0",
                "beta | mean 2 sd 0.1 | mean is 2 but must be between from, 0, and to, 1",
                "beta | mean 0.5 sd 0.5 | sd is 0.5 but must be less than 0.5",
                "beta | mean 0.5 sd 1e-9 | mean 0.5 with sd 1e-9 is too extreme",
                "gamma | shape 0 scale 1 | shape is 0 but must be at least 0.001 and at most 1000000",
                "beta | alpha 1 beta 0.001 | beta is 0.001 but must be at least 0.01 and at most 1000000",
                "beta | alpha 1 beta 1 from 1 | to is 1 but must be greater than from, 1",
                "weibull | shape 0 scale -0.0 | shape is 0 but must be at least 0.01 and at most 1000000; scale is -0 but must be greater than 0",
                "student | dof 0 | dof is 0 but must be at least 0.1 and at most 10000000000",
                "student | dof 0.1 scale 1e200 | some draws of this density would exceed the largest number there is, 1.8e308",
                "binomial | trials 2.5 probability .5 | trials is 2.5 but must be a whole number, at least 0 and at most 1000000000",
                "binomial | trials 2 probability 1.5 | probability is 1.5 but must be at least 0 and at most 1",
                "poisson | mean -1 | mean is -1 but must be at least 0 and at most 1000000000000",
                "geometric | probability 0 | probability is 0 but must be at least 1e-12 and at most 1",
                "negative-binomial | mean 4 sd 2 | sd is 2 but must be greater than the square root of the mean, 2",
                "negative-binomial | mean 1e-6 sd 5 | mean 1e-6 with sd 5 is too extreme",
                "negative-binomial | size 1e6 probability 1e-9 | size 1000000 with probability 1e-9 is too extreme",
                "hypergeometric | population 10 marked 11 drawn 12 | marked is 11 but must be at most the population, 10; drawn is 12 but must be at most the population, 10",
                "discrete-uniform | from 3 to 2 | to is 2 but must be at least from, 3",
                "discrete-uniform | from .5 to 2 | from is 0.5 but must be a whole number, at least -1e15 and at most 1e15",
                "gumbel | mean Infinity sd 0 | mean is ∞ but must be a finite number; sd is 0 but must be greater than 0",
                "gumbel-min | location NaN scale 0 | location is NaN but must be a finite number; scale is 0 but must be greater than 0",
                "gumbel-min | mean NaN sd -1 | mean is NaN but must be a finite number; sd is -1 but must be greater than 0",
                "gumbel-min | location 0 scale 1e307 | some draws of this density would exceed the largest number there is, 1.8e308",
                "frechet | shape 0 scale 0 from NaN | shape is 0 but must be at least 0.1 and at most 1000000; scale is 0 but must be greater than 0; from is NaN but must be a finite number",
                "frechet | shape 0.1 scale 1e200 | some draws of this density would exceed the largest number there is, 1.8e308",
                "generalized-extreme-value | location NaN scale -1 shape -1.1 | location is NaN but must be a finite number; scale is -1 but must be greater than 0; shape is -1.1 but must be at least -1 and at most 5",
                "generalized-extreme-value | location 0 scale 1 shape 5.5 | shape is 5.5 but must be at least -1 and at most 5",
                "generalized-extreme-value | location 0 scale 1e250 shape 5 | some draws of this density would exceed the largest number there is, 1.8e308",
                "pareto | from 0 shape 0 | from is 0 but must be greater than 0; shape is 0 but must be at least 0.1 and at most 1000000",
                "pareto | from 1e200 shape 0.1 | some draws of this density would exceed the largest number there is, 1.8e308",
                "generalized-pareto | location Infinity scale 0 shape NaN | location is ∞ but must be a finite number; scale is 0 but must be greater than 0; shape is NaN but must be at least -1 and at most 5",
                "generalized-pareto | location 0 scale 1 shape -2 | shape is -2 but must be at least -1 and at most 5",
                "inverse-gamma | shape 0.05 scale 0 | shape is 0.05 but must be at least 0.1 and at most 1000000; scale is 0 but must be greater than 0",
                "inverse-gaussian | mean 0 shape 0 | mean is 0 but must be greater than 0; shape is 0 but must be greater than 0",
                "inverse-gaussian | mean 3 shape 1e-6 | shape is 1e-6 but must be at least 1e-6 and at most 1e8 times the mean, 3",
                "inverse-gaussian | mean 3 shape 1e9 | shape is 1000000000 but must be at least 1e-6 and at most 1e8 times the mean, 3",
                "inverse-gaussian | mean 0 sd 0 | mean is 0 but must be greater than 0; sd is 0 but must be greater than 0",
                "inverse-gaussian | mean 3 sd 1e-5 | sd is 1e-5 but must be at least 1e-4 and at most 1000 times the mean, 3",
                "inverse-gaussian | mean 3 sd 4000 | sd is 4000 but must be at least 1e-4 and at most 1000 times the mean, 3",
                "rice | distance -1 scale 0 | distance is -1 but must be at least 0; scale is 0 but must be greater than 0",
                "rice | distance 20000.5 scale 2 | distance is 20000.5 but must be at most 10000 times the scale, 2",
                "von-mises | mean NaN concentration -1 | mean is NaN but must be a finite number; concentration is -1 but must be at least 0 and at most 100000000",
                "johnson-su | gamma 101 delta 0 xi NaN lambda 0 | gamma is 101 but must be at least -100 and at most 100; delta is 0 but must be at least 0.05 and at most 1000000; xi is NaN but must be a finite number; lambda is 0 but must be greater than 0",
                "johnson-su | gamma 100 delta 0.05 xi 0 lambda 1 | some draws of this density would exceed the largest number there is, 1.8e308",
                "bernoulli | probability 1.5 | probability is 1.5 but must be at least 0 and at most 1",
                "bernoulli | probability NaN | probability is NaN but must be at least 0 and at most 1",
                "geometric | mean -1 | mean is -1 but must be at least 0 and at most 999999999999",
                "negative-binomial | size 0 mean -1 | size is 0 but must be at least 0.001 and at most 1000000000; mean is -1 but must be at least 0 and at most 1000000000",
                "negative-binomial | size 2 probability 0 | probability is 0 but must be at least 1e-9 and at most 1",
                "negative-binomial | mean 0 sd 0 | mean is 0 but must be at least 1e-9 and at most 1000000000; sd is 0 but must be greater than 0",
                "hypergeometric | population 1.5 marked -1 drawn NaN | population is 1.5 but must be a whole number, at least 1 and at most 1000000000; marked is -1 but must be a whole number, at least 0 and at most 1000000000; drawn is NaN but must be a whole number, at least 0 and at most 1000000000",
                "discrete-uniform | from 1 to Infinity | to is ∞ but must be a whole number, at least -1e15 and at most 1e15",
                "weibull | mean 1 sd 1e-9 | mean 1 with sd 1e-9 is too extreme",
                "weibull | mean 0 sd 0 from NaN | sd is 0 but must be greater than 0; from is NaN but must be a finite number",
                "weibull | mean 2 sd 1 from 3 | mean is 2 but must be greater than from, 3",
                "weibull | mean 2 cv 0 | cv is 0 but must be greater than 0",
                "weibull | mean -2 cv 0.1 | mean is -2 but must be greater than from, 0",
                "gumbel | mean 0 cv -1 | mean is 0 but must be a finite number other than 0; cv is -1 but must be greater than 0",
                "gumbel | mean 1e-300 cv 1e-300 | mean 1e-300 with cv 1e-300 is too extreme",
                "uniform | from 0 to Infinity | to is ∞ but must be a finite number",
                "triangular | from NaN mode 0 to Infinity | from is NaN but must be a finite number; to is ∞ but must be a finite number",
                "normal | mean NaN cv 0 | mean is NaN but must be a finite number other than 0; cv is 0 but must be greater than 0",
                "normal | mean 1e-300 cv 1e-300 | mean 1e-300 with cv 1e-300 is too extreme",
                "lognormal | mean 1 sd 0 | sd is 0 but must be greater than 0",
                "lognormal | mean 1 cv 0 | cv is 0 but must be greater than 0",
                "exponential | mean 1 from NaN | from is NaN but must be a finite number",
                "gamma | mean 0 sd 0 | mean is 0 but must be greater than 0; sd is 0 but must be greater than 0",
                "gamma | shape 1 scale 0 | scale is 0 but must be greater than 0",
                "beta | alpha 0 beta 1 from NaN to Infinity | alpha is 0 but must be at least 0.01 and at most 1000000; from is NaN but must be a finite number; to is ∞ but must be a finite number",
                "student | dof 1 location NaN scale 0 | location is NaN but must be a finite number; scale is 0 but must be greater than 0",
                "trapezoidal | from NaN flatFrom NaN flatTo NaN to NaN | from is NaN but must be a finite number; flatFrom is NaN but must be a finite number; flatTo is NaN but must be a finite number; to is NaN but must be a finite number",
                "curvilinear-trapezoid | from NaN to Infinity inexact 1 | from is NaN but must be a finite number; to is ∞ but must be a finite number",
                "arcsine | from NaN to Infinity | from is NaN but must be a finite number; to is ∞ but must be a finite number",
                "pert | from NaN mode NaN to NaN | from is NaN but must be a finite number; mode is NaN but must be a finite number; to is NaN but must be a finite number",
                "half-normal | mean 0 | mean is 0 but must be greater than 0",
                "rayleigh | sigma 0 | sigma is 0 but must be greater than 0",
                "laplace | location NaN scale 0 | location is NaN but must be a finite number; scale is 0 but must be greater than 0",
                "laplace | mean NaN sd 1 | mean is NaN but must be a finite number",
                "logistic | location NaN scale 1 | location is NaN but must be a finite number",
                "logistic | mean NaN sd 0 | mean is NaN but must be a finite number; sd is 0 but must be greater than 0",
                "log-logistic | shape 1 scale 0 | scale is 0 but must be greater than 0",
                "cauchy | location 0 scale 0 | scale is 0 but must be greater than 0",
            })
    void saysWhatIsWrong(String family, String parameters, String expected) {
        var problems = problems(family, parameters);
        assertEquals(
                expected,
                String.join("; ", problems.stream().map(Problem::primary).toList()));
    }

    /// Every parameter of every way to enter a member of every family is refused above, so that the words of a new one
    /// are read by someone.
    @ParameterizedTest
    @MethodSource("families")
    void refusesEveryParameter(Family family) throws NoSuchMethodException {
        var rows = FamilyTest.class
                .getDeclaredMethod("saysWhatIsWrong", String.class, String.class, String.class)
                .getAnnotation(CsvSource.class)
                .value();
        var said = Arrays.stream(rows)
                .map(row -> row.split(" \\| "))
                .filter(row -> row[0].equals(family.name()))
                .flatMap(row -> Arrays.stream(row[2].split("; ")))
                .toList();
        for (var entry : family.entries()) {
            for (var parameter : entry) {
                assertTrue(
                        parameter.name().matches("q[0-9.]+")
                                || said.stream()
                                        .anyMatch(words -> words.matches(parameter.name() + " is .* but must be .*")),
                        () -> family.name() + " is never refused for " + parameter.name());
            }
        }
    }

    static List<Family> families() {
        return Catalogue.families();
    }

    /// The record refuses with the same words.
    @Test
    void recordsCheckThemselves() {
        var refusal = assertThrows(Refusal.class, () -> new Gumbel(0, 0));
        assertEquals("scale is 0 but must be greater than 0", refusal.getMessage());
        assertThrows(Refusal.class, () -> new Student(0, 0, 1));
        assertThrows(Refusal.class, () -> Lognormal.ofMeanAndSd(-1, 1));
    }

    @Test
    void saysWhyAndWhatToTry() {
        var problem = problems("gumbel", "location 2 scale 0").getFirst();
        assertEquals(
                "The Gumbel density divides by its scale.", problem.detail().orElseThrow());
        assertEquals("For a fixed value use a constant.", problem.hint().orElseThrow());
        assertEquals("scale", problem.place().path());
    }

    @Test
    void namesTheNearestParameter() {
        var problem = problems("normal", "mean 0 sdd 1").getFirst();
        assertEquals(
                "It is entered by mean and sd, or by mean and cv, or by q5 and q95.",
                problem.detail().orElseThrow());
        assertEquals("Did you mean sd?", problem.hint().orElseThrow());
        assertEquals("sdd", problem.place().path());
    }

    @Test
    void namesTheWaysToEnter() {
        var mixed = problems("lognormal", "mu 0 mean 1").getFirst();
        assertEquals(
                "lognormal is entered by mu and sigma, or by mean and sd, or by mean and cv, or by q5 and q95.",
                mixed.detail().orElseThrow());
        assertEquals("", mixed.place().path());
        var missing = problems("lognormal", "mean 3").getFirst();
        assertEquals("sd is missing", missing.primary());
        assertEquals("sd", missing.place().path());
    }

    @Test
    void namesEveryMissingParameter() {
        assertEquals(
                List.of("from is missing", "to is missing"),
                problems("uniform", "").stream().map(Problem::primary).toList());
    }

    @Test
    void extremeMeanAndSdSaysWhatTheyGive() {
        var problem = problems("lognormal", "mean 1e300 sd 1e-100").getFirst();
        assertTrue(problem.detail().orElseThrow().startsWith("They give mu 690.77"), () -> problem.toString());
    }

    /// Squares of these ratios would overflow or vanish.
    @ParameterizedTest
    @ValueSource(doubles = {1e-9, 1e-4, 1, 1e4, 1e200})
    void lognormalKeepsItsMean(double cv) {
        var density = Lognormal.ofMeanAndSd(2, 2 * cv);
        assertEquals(2, density.mean(), 2e-12 * (1 + Math.log(1 + cv)));
        assertFalse(density.sigma() < 0.999 * Math.min(cv, 1e-3));
    }

    private static List<Problem> problems(String family, String parameters) {
        var values = new LinkedHashMap<String, Double>();
        var words = parameters == null || parameters.isBlank() ? new String[0] : parameters.split(" ");
        for (int i = 0; i < words.length; i += 2) {
            values.put(words[i], Double.valueOf(words[i + 1]));
        }
        var known = Catalogue.family(family).orElseThrow();
        Map<String, Double> given = values;
        return assertThrows(Refusal.class, () -> known.of(given)).problems();
    }
}
