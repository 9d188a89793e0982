package dev.leadline.chart;

import java.util.List;
import java.util.OptionalDouble;

/// The slope of a lane's error on logarithmic axes, by least squares over its later part: marks from a hundredth of
/// the draws on. It describes what is drawn; marks share their draws, so that no error of it is told.
final class Slope {
    private static final double LATER = 100;
    private static final int FEWEST = 4;

    private Slope() {}

    /// Empty for fewer than four marks, or where they span less than a factor of four.
    static OptionalDouble fitted(List<Point> points) {
        var later = laterPart(points);
        if (later.size() < FEWEST
                || later.getLast().draws() < 4 * later.getFirst().draws()) {
            return OptionalDouble.empty();
        }
        double x = later.stream().mapToDouble(Slope::logDraws).average().orElseThrow();
        double y = later.stream().mapToDouble(Slope::logReach).average().orElseThrow();
        double above = 0;
        double below = 0;
        for (var point : later) {
            double dx = logDraws(point) - x;
            above += dx * (logReach(point) - y);
            below += dx * dx;
        }
        return OptionalDouble.of(above / below);
    }

    static List<Point> laterPart(List<Point> points) {
        if (points.isEmpty()) {
            return points;
        }
        double from = points.getLast().draws() / LATER;
        return points.stream()
                .filter(p -> p.draws() >= from && ErrorDecay.reach(p) > 0)
                .toList();
    }

    private static double logDraws(Point point) {
        return StrictMath.log(point.draws());
    }

    private static double logReach(Point point) {
        return StrictMath.log(ErrorDecay.reach(point));
    }
}
