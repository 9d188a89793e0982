package dev.leadline.density;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.stream.Stream;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/// Every family against tables computed elsewhere: `density/NAME.csv` (mpmath, 60 digits, `density_tables*.py`).
class DensityTablesTest {
    /// The error the families document.
    private static final double RELATIVE = 1e-12;

    static Stream<Family> families() {
        return Catalogue.families().stream();
    }

    /// The smallest mass whose quantile a table has, below and above, where it is more than 1e-300.
    ///
    /// @param why the quantile is no double that could be told from the end
    private record Reach(double below, double above, String why) {
        static final Reach ALL = new Reach(1e-300, 1e-300, "");
    }

    private static final Map<String, Reach> SHORTER = Map.of(
            "arcsine", new Reach(1e-100, 1e-100, "1e-300 is less than 1e-600 of the width from the end"),
            "pareto", new Reach(1e-16, 1e-300, "the least value is not 0, so the next double is 1e-16 of it away"));

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

    /// A new family cannot be forgotten: its table looks as far into both tails as doubles go, and an example of it is
    /// held against every promise, and drawn from by `DrawsByDensity`.
    @ParameterizedTest
    @MethodSource("families")
    void looksFarIntoBothTailsOfEveryFamily(Family family) {
        var table = Table.of(family.name());
        var inverse = table.rows("inverse");
        var reach = SHORTER.getOrDefault(family.name(), Reach.ALL);
        assertEquals(reach.below, smallest(inverse, "x"), () -> "lower tail; " + reach.why);
        assertEquals(reach.above, smallest(inverse, "y"), () -> "upper tail; " + reach.why);
        var kind = table.member(family, inverse.getFirst()).getClass();
        assertTrue(Examples.all().anyMatch(kind::isInstance), () -> "no example of " + family.name());
    }

    private static double smallest(List<Map<String, String>> inverse, String column) {
        return inverse.stream()
                .filter(row -> !row.get(column).isEmpty())
                .mapToDouble(row -> number(row, "cdf"))
                .min()
                .orElseThrow();
    }

    /// Off by at most 1e-12 of the value, or what 1e-12 of the tail's mass is in units of x.
    private static void closeQuantile(Density density, double expected, double got, double mass, String what) {
        double slack = RELATIVE * Math.abs(expected) + RELATIVE * mass / density.pdf(expected);
        assertEquals(expected, got, slack, () -> density + ", " + what);
    }

    private static void within(double relative, double expected, double got, String what) {
        assertEquals(expected, got, relative * Math.abs(expected), what);
    }
}
