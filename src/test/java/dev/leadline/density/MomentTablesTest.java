package dev.leadline.density;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.stream.Stream;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/// Moments against tables computed elsewhere: `density/moments/NAME.csv` (mpmath, 60 digits, `density_tables*.py`).
class MomentTablesTest {
    private static final double RELATIVE = 1e-12;

    /// Of skewness and kurtosis that a quadrature gives: where they are 0, or nearly, there is no relative accuracy.
    private static final double ABSOLUTE = 1e-13;

    static Stream<Family> families() {
        return Catalogue.families().stream().filter(family -> MomentTablesTest.class.getResource(path(family)) != null);
    }

    private static String path(Family family) {
        return "/density/moments/" + family.name() + ".csv";
    }

    @ParameterizedTest
    @MethodSource("families")
    void agrees(Family family) throws IOException {
        List<String> lines;
        try (var in = MomentTablesTest.class.getResourceAsStream(path(family))) {
            lines = new String(in.readAllBytes(), StandardCharsets.UTF_8)
                    .lines()
                    .toList();
        }
        var columns = lines.get(1).split(",");
        int parameters = columns.length - 4;
        assertTrue(lines.size() > 2);
        for (String line : lines.subList(2, lines.size())) {
            var cells = line.split(",");
            var values = new LinkedHashMap<String, Double>();
            for (int i = 0; i < parameters; i++) {
                values.put(columns[i], Double.valueOf(cells[i]));
            }
            var density = family.of(values);
            double variance = number(cells[parameters + 1]);
            within(
                    number(cells[parameters]),
                    density.mean(),
                    Double.isFinite(variance) ? 1e-15 * Math.sqrt(variance) : 0,
                    density + ", mean");
            within(variance, density.variance(), 0, density + ", variance");
            within(number(cells[parameters + 2]), density.skewness(), ABSOLUTE, density + ", skewness");
            within(number(cells[parameters + 3]), density.excessKurtosis(), ABSOLUTE, density + ", excess kurtosis");
        }
    }

    private static double number(String cell) {
        return switch (cell) {
            case "+inf" -> Double.POSITIVE_INFINITY;
            case "nan" -> Double.NaN;
            default -> Double.parseDouble(cell);
        };
    }

    private static void within(double expected, double got, double absolute, String what) {
        double slack = Double.isFinite(expected) ? RELATIVE * Math.abs(expected) + absolute : 0;
        assertEquals(expected, got, slack, what);
    }
}
