package dev.leadline.density;

import static org.junit.jupiter.api.Assertions.assertEquals;

import java.util.LinkedHashMap;
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
                "gumbel | mean 30 sd 4",
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
}
