package dev.leadline.interval;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.leadline.ReferenceValues;
import java.util.regex.Pattern;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvFileSource;

class MixtureBoundsTest {
    private static void within(double relative, double expected, double actual) {
        assertEquals(expected, actual, relative * Math.abs(expected));
    }

    /// Record int-cs-normal-mixture, every figure.
    @Test
    void agreesWithTheRecord() {
        var id = "int-cs-normal-mixture";
        double tolerance = ReferenceValues.relativeTolerance(id);
        var form = Pattern.compile("(\\w+)\\(v=(\\d+),v_opt=(\\d+)(?:,c=(\\d+))?\\)");
        int checked = 0;
        for (var entry : ReferenceValues.record(id).required("expected")) {
            var match = form.matcher(entry.required("name").asString());
            if (match.matches()) {
                double v = Double.parseDouble(match.group(2));
                double best = Double.parseDouble(match.group(3));
                double bound = switch (match.group(1)) {
                    case "two_sided_normal_mixture" ->
                        NormalMixture.tunedTo(best, .95).bound(v);
                    case "one_sided_normal_mixture" -> new NormalMixture(NormalMixture.rho(best, .1), .95).oneSided(v);
                    default ->
                        GammaMixture.tunedTo(best, Double.parseDouble(match.group(4)), .95)
                                .bound(v);
                };
                within(tolerance, entry.required("value").asDouble(), bound);
                checked++;
            }
        }
        assertEquals(12, checked);
        double rho = ReferenceValues.expected(id, "rho(v_opt=100,alpha=0.05)");
        within(tolerance, rho, NormalMixture.tunedTo(100, .95).rho());
    }

    /// Made by `any_time.py` from the definition at 40 digits.
    @ParameterizedTest(name = "rho {0}, scale {1}, level {2}, variance {3}")
    @CsvFileSource(resources = "/interval/gamma-mixture.csv", numLinesToSkip = 2)
    void agreesWithFortyDigits(double rho, double scale, double level, double variance, double bound) {
        within(1e-10, bound, new GammaMixture(rho, scale, level).bound(variance));
    }

    /// Made by `any_time.py` with 1 for the incomplete gamma function, which is at least as much as it is.
    @ParameterizedTest(name = "level {2}, variance {3}")
    @CsvFileSource(resources = "/interval/gamma-mixture-late.csv", numLinesToSkip = 2)
    void isHardlyWiderLate(double rho, double scale, double level, double variance, double least) {
        double bound = new GammaMixture(rho, scale, level).bound(variance);
        assertTrue(bound >= least * (1 - 1e-12), bound + " below " + least);
        within(1e-3, least, bound);
    }

    /// Where the form changes, at a shape of 1e6.
    @Test
    void doesNotJump() {
        var mixture = new GammaMixture(30, 1, .975);
        within(1e-3, mixture.bound(1e6 - 31), mixture.bound(1e6 - 29));
        assertTrue(mixture.bound(1e6 - 31) < mixture.bound(1e6 - 29));
    }
}
