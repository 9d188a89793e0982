package dev.leadline.density;

import static org.junit.jupiter.api.Assertions.assertEquals;

import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/// Members entered by their moments have them.
class MeanAndSdTest {

    @ParameterizedTest
    @CsvSource(
            delimiter = '|',
            value = {
                "normal | mean -3 cv 0.1",
                "lognormal | mean 3 sd 0.2",
                "lognormal | mean 100 cv 2.5",
                "gamma | mean 3 sd 0.01",
                "gamma | mean 3 sd 20",
                "gamma | mean 1e-6 cv 0.3",
                "beta | mean 0.3 sd 0.1",
                "beta | mean 0.1 sd 0.2",
                "beta | mean 105 sd 0.3 from 100 to 120",
                "weibull | mean 3 sd 2",
                "weibull | mean 3 sd 1e-3",
                "weibull | mean 3 sd 300",
                "weibull | mean 13 sd 2 from 10",
                "weibull | mean 8 cv 0.25",
                "weibull | mean -2 cv 0.5 from -4",
                "gumbel | mean 30 sd 4",
                "gumbel | mean -4 cv 0.5",
                "gumbel | mean -30 sd 1e-3",
                "gumbel-min | mean 30 sd 4",
                "gumbel-min | mean -30 sd 1e-3",
                "inverse-gaussian | mean 3 sd 0.2",
                "inverse-gaussian | mean 1e-6 sd 1e-9",
                "inverse-gaussian | mean 1e6 sd 5e8",
                "negative-binomial | mean 20 sd 9",
                "negative-binomial | mean 0.01 sd 0.2",
                "geometric | mean 40",
                "laplace | mean 2 sd 3",
                "logistic | mean -2 sd 3",
                "exponential | mean 5 from 3",
                "half-normal | mean 4",
                "rayleigh | mean 4",
            })
    void areTheMoments(String family, String entered) {
        var values = new LinkedHashMap<String, Double>();
        var words = entered.split(" ");
        for (int i = 0; i < words.length; i += 2) {
            values.put(words[i], Double.valueOf(words[i + 1]));
        }
        var density = Catalogue.family(family).orElseThrow().of(values);
        double mean = values.get("mean");
        assertEquals(mean, density.mean(), 1e-13 * Math.abs(mean), () -> density + ", mean");
        double sd = values.containsKey("cv")
                ? values.get("cv") * Math.abs(mean)
                : values.getOrDefault("sd", Math.sqrt(density.variance()));
        assertEquals(sd, Math.sqrt(density.variance()), 1e-13 * sd, () -> density + ", sd");
    }

    /// The equations of the moments solved by mpmath 1.2.1 at 40 digits: `findroot` for the shape k with
    /// `sqrt(gamma(1 + 2/k) - gamma(1 + 1/k)^2) / gamma(1 + 1/k) = cv mean / (mean - from)`.
    @ParameterizedTest
    @CsvSource({
        "8, 0.25, 0, 4.5422130921390387591, 8.7616683107993514029",
        "12, 0.3, 2, 3.0320524405533555079, 11.193180094957358393",
        "3, 1.6, 0, 0.64821221779722796402, 2.1890272532277786603"
    })
    void weibullByMeanAndCv(double mean, double cv, double from, double shape, double scale) {
        var entered = Map.of("mean", mean, "cv", cv, "from", from);
        var w = (Weibull) Catalogue.family("weibull").orElseThrow().of(entered);
        assertEquals(shape, w.shape(), 1e-14 * shape);
        assertEquals(scale, w.scale(), 1e-14 * scale);
    }

    /// By mpmath: the scale is `sd sqrt(6) / pi`, the location the mean less Euler's constant times that.
    @ParameterizedTest
    @CsvSource({
        "20, 0.12, 18.919872301890332813, 1.871272322960822659",
        "-4, 0.5, -4.9001064150913893228, 1.5593936024673522158"
    })
    void gumbelByMeanAndCv(double mean, double cv, double location, double scale) {
        var g = (Gumbel) Catalogue.family("gumbel").orElseThrow().of(Map.of("mean", mean, "cv", cv));
        assertEquals(location, g.location(), 2e-15 * Math.abs(location));
        assertEquals(scale, g.scale(), 2e-15 * scale);
    }

    /// 15 % typed as 15 is allowed, and told; 3 is not.
    @Test
    void aCvInPerCentIsTold() {
        for (var family : List.of("normal", "lognormal", "gamma", "weibull", "gumbel")) {
            var of = Catalogue.family(family).orElseThrow();
            var note = of.notes(Map.of("mean", 8.0, "cv", 15.0)).getFirst();
            assertEquals("cv is 15: the standard deviation is 15 times the mean", note.primary());
            assertEquals("cv is a fraction: 0.15 for 15 %.", note.detail().orElseThrow());
            assertEquals("cv", note.place().path());
            assertEquals(List.of(), of.notes(Map.of("mean", 8.0, "cv", 3.0)));
            assertEquals(List.of(), of.notes(Map.of("mean", 8.0, "sd", 120.0)));
        }
    }
}
