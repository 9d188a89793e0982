package dev.leadline.density;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;
import static org.junit.jupiter.params.provider.Arguments.arguments;

import dev.leadline.ReferenceValues;
import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.Arguments;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.MethodSource;

/// Every family against tables computed elsewhere: `density/NAME.csv` (mpmath, 60 digits, `density_tables*.py`), the
/// standard normal one and some facts also against `reference-values.json`.
class DensityTablesTest {
    /// The error the families document.
    private static final double RELATIVE = 1e-12;

    static Stream<Family> families() {
        return Catalogue.families().stream();
    }

    private record Table(List<String> columns, List<Map<String, String>> rows) {
        static Table of(String family) {
            var lines = new ArrayList<String>();
            try (var in = DensityTablesTest.class.getResourceAsStream("/density/" + family + ".csv")) {
                lines.addAll(new String(in.readAllBytes(), StandardCharsets.UTF_8)
                        .lines()
                        .toList());
            } catch (IOException e) {
                throw new UncheckedIOException(e);
            }
            var columns = List.of(lines.get(1).split(","));
            var rows = new ArrayList<Map<String, String>>();
            for (String line : lines.subList(2, lines.size())) {
                var cells = line.split(",", -1);
                var row = new LinkedHashMap<String, String>();
                for (int i = 0; i < cells.length; i++) {
                    row.put(columns.get(i), cells[i]);
                }
                rows.add(row);
            }
            return new Table(columns, rows);
        }

        List<Map<String, String>> rows(String kind) {
            return rows.stream().filter(row -> row.get("kind").equals(kind)).toList();
        }

        Density member(Family family, Map<String, String> row) {
            var parameters = new LinkedHashMap<String, Double>();
            for (String name : columns.subList(1, columns.indexOf("y") - 1)) {
                parameters.put(name, Double.valueOf(row.get(name)));
            }
            return family.of(parameters);
        }
    }

    private static double number(Map<String, String> row, String column) {
        return Double.parseDouble(row.get(column));
    }

    /// Two roundings of x or of a parameter count as often as the tail is steep: relative to the mass, `|x| pdf / mass`
    /// times each.
    private static double allowed(double steepness) {
        return RELATIVE + 3 * 0x1p-53 * steepness;
    }

    @ParameterizedTest
    @MethodSource("families")
    void agreesAtPoints(Family family) {
        var table = Table.of(family.name());
        var rows = table.rows("at");
        assertFalse(rows.isEmpty());
        for (var row : rows) {
            var density = table.member(family, row);
            double x = number(row, "x");
            double pdf = number(row, "pdf");
            double cdf = number(row, "cdf");
            double survival = number(row, "survival");
            double steepness = Math.abs(x) * pdf / Math.min(cdf, survival);
            if (Math.min(cdf, survival) < 1e-299) {
                continue;
            }
            String what = density + " at " + x;
            within(allowed(Math.abs(x) * pdf / cdf), cdf, density.cdf(x), what + ", cdf");
            within(allowed(Math.abs(x) * pdf / survival), survival, density.survival(x), what + ", survival");
            double log = number(row, "logPdf");
            assertEquals(log, density.logPdf(x), allowed(steepness) * Math.max(1, Math.abs(log)), what + ", log pdf");
            if (pdf > 1e-290 && pdf < 1e300) {
                within(allowed(steepness), pdf, density.pdf(x), what + ", pdf");
            }
        }
    }

    @ParameterizedTest
    @MethodSource("families")
    void agreesInBothDirections(Family family) {
        var table = Table.of(family.name());
        int checked = 0;
        for (var row : table.rows("inverse")) {
            var density = table.member(family, row);
            double p = number(row, "cdf");
            if (!row.get("x").isEmpty()) {
                double x = number(row, "x");
                closeQuantile(density, x, density.quantile(p), p, "quantile of " + p);
                checked++;
            }
            if (!row.get("y").isEmpty()) {
                double y = number(row, "y");
                closeQuantile(density, y, density.upperQuantile(p), p, "upper quantile of " + p);
                checked++;
            }
        }
        assertTrue(checked > 0);
    }

    /// Off by at most 1e-12 of the value, or what 1e-12 of the tail's mass is in units of x.
    private static void closeQuantile(Density density, double expected, double got, double mass, String what) {
        double slack = RELATIVE * Math.abs(expected) + RELATIVE * mass / density.pdf(expected);
        assertEquals(expected, got, slack, () -> density + ", " + what);
    }

    private static void within(double relative, double expected, double got, String what) {
        assertEquals(expected, got, relative * Math.abs(expected), what);
    }

    /// The record asks for 1e-13; a subnormal result may be off by its own rounding.
    @ParameterizedTest
    @CsvSource({"-38", "-10", "-5", "-3", "-1.96", "-1", "0", "0.5", "1.96", "3", "8", "38"})
    void standardNormal(String x) {
        double expected = ReferenceValues.expected("dist-normal-standard", "cdf(" + x + ")");
        var normal = new Normal(0, 1);
        double slack = Math.max(ReferenceValues.relativeTolerance("dist-normal-standard") * expected, 0x1p-1070);
        assertEquals(expected, normal.cdf(Double.parseDouble(x)), slack);
        assertEquals(expected, normal.survival(-Double.parseDouble(x)), slack);
    }

    @ParameterizedTest
    @CsvSource({
        "1e-300", "1e-100", "1e-16", "1e-10", "1e-6", "0.001", "0.005", "0.01", "0.025", "0.05", "0.1", "0.25", "0.5",
        "0.75", "0.9", "0.95", "0.975", "0.99", "0.995"
    })
    void standardNormalQuantile(String p) {
        double expected = ReferenceValues.expected("dist-normal-standard", "quantile(" + p + ")");
        var normal = new Normal(0, 1);
        double slack = ReferenceValues.relativeTolerance("dist-normal-standard") * Math.abs(expected) + 1e-16;
        assertEquals(expected, normal.quantile(Double.parseDouble(p)), slack);
        assertEquals(-expected, normal.upperQuantile(Double.parseDouble(p)), slack);
    }

    /// Facts of `dist-edge-cases`; the two degenerate ones are refused instead, with the advice to use a constant.
    @ParameterizedTest
    @MethodSource("sameDensities")
    void oneDensityByTwoNames(Density one, Density other) {
        for (double p : new double[] {1e-10, 0.01, 0.3, 0.5, 0.9}) {
            double x = one.quantile(p);
            within(1e-13, x, other.quantile(p), one + ", quantile of " + p);
            within(1e-13, one.cdf(x), other.cdf(x), one + ", cdf at " + x);
            within(1e-13, one.survival(x), other.survival(x), one + ", survival at " + x);
        }
    }

    static Stream<Arguments> sameDensities() {
        return Stream.of(
                arguments(new Weibull(1, 3, 0), new Exponential(3)),
                arguments(new Gamma(1, 3), new Exponential(3)),
                arguments(Beta.of(1, 1), new Uniform(0, 1)));
    }

    @Test
    void lognormalByMeanAndSd() {
        var density = Lognormal.ofMeanAndSd(100, 50);
        within(1e-13, ReferenceValues.expected("dist-edge-cases", "mu_for_mean100_sd50"), density.mu(), "mu");
        within(1e-13, ReferenceValues.expected("dist-edge-cases", "sigma_for_mean100_sd50"), density.sigma(), "sigma");
        within(1e-13, 100, density.mean(), "mean");
        within(1e-13, 2500, density.variance(), "variance");
    }

    @Test
    void furthestDraw() {
        double expected = ReferenceValues.expected("dist-edge-cases", "largest_abs_normal_from_53bit_midpoints");
        within(1e-13, -expected, new Normal(0, 1).quantile(0x1p-54), "quantile of 2^-54");
        within(1e-13, expected, new Normal(0, 1).upperQuantile(0x1p-54), "upper quantile of 2^-54");
    }
}
