package dev.leadline.chart;

import dev.leadline.model.Tolerance;
import dev.leadline.reference.ReferenceValue.Kind;
import dev.leadline.reference.ReferenceValue.Known;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.OptionalLong;
import java.util.SplittableRandom;

/// Invented runs to draw pictures of.
final class Invented {
    private Invented() {}

    static Known stated(double value, double error, String source) {
        return new Known(value, error, Kind.STATED, source, OptionalLong.empty());
    }

    /// Rare event under independent draws: no hit at first; the second lane settles sooner.
    static Settling rareEvent(long draws) {
        return settling(
                "chance per year",
                "1/a",
                Optional.of(stated(1.2568e-5, 4e-9, "invented")),
                relative(.1),
                List.of(
                        hits("A", "independent", 1.2568e-5, draws, 3),
                        mean("B", "gusts drawn more often", 1.2568e-5, 9e-5, draws, 5)));
    }

    static Settling noHit() {
        return settling(
                "chance per year",
                "1/a",
                Optional.empty(),
                relative(.1),
                List.of(hits("A", "independent", 1e-12, 65_000, 3)));
    }

    static Settling smoothMean() {
        return settling(
                "volume to dredge",
                "m3",
                Optional.of(stated(18_432.7, 6, "invented")),
                absolute(25),
                List.of(mean("A", "independent", 18_430, 5200, 4_000_000, 11)));
    }

    static Settling wild() {
        var points = new ArrayList<Point>(
                mean("A", "independent", 3, 40, 1_000_000, 17).points());
        points.replaceAll(
                p -> p.draws() < 4000 ? new Point(p.draws(), p.estimate() * 1e9, p.low() * 1e11, p.high() * 1e11) : p);
        return settling(
                "delay cost per call",
                "crowns",
                Optional.of(stated(9.5, 0, "invented")),
                Optional.empty(),
                List.of(new Series("A", "independent", points, OptionalLong.empty(), 0)));
    }

    private static final Settling JUMPS = heavyTail();

    static Settling jumps() {
        return JUMPS;
    }

    private static Settling heavyTail() {
        var random = new SplittableRandom(5);
        var points = new ArrayList<Point>();
        double sum = 0;
        double squares = 0;
        long n = 0;
        long next = 64;
        while (n < 2_000_000) {
            n++;
            double v = Math.pow(random.nextDouble(), -1 / 1.45);
            sum += v;
            squares += v * v;
            if (n >= next) {
                double se = Math.sqrt((squares / n - sum / n * sum / n) / n);
                points.add(new Point(n, sum / n, sum / n - 1.96 * se, sum / n + 1.96 * se));
                next = (long) (n * 1.01) + 1;
            }
        }
        return settling(
                "delay cost per call",
                "1e3 crowns",
                Optional.empty(),
                relative(.02),
                List.of(new Series("A", "independent", points, OptionalLong.empty(), 0)));
    }

    static Settling gaps() {
        var points = new ArrayList<Point>(
                mean("A", "independent", -.25, 2, 300_000, 23).points());
        points.replaceAll(p -> p.draws() < 2000
                ? new Point(p.draws(), Double.NaN, Double.NaN, Double.NaN)
                : p.draws() > 20_000 && p.draws() < 50_000
                        ? new Point(p.draws(), p.estimate(), Double.NaN, p.high())
                        : p);
        return settling(
                "level difference",
                "m",
                Optional.empty(),
                Optional.empty(),
                List.of(new Series("A", "independent", points, OptionalLong.empty(), 2)));
    }

    static Settling fourLanes() {
        return settling(
                "illuminance on the quay",
                "lx",
                Optional.of(stated(21.5, .02, "invented")),
                relative(.005),
                List.of(
                        mean("A", "independent", 21.5, 6, 1_000_000, 1),
                        mean("B", "antithetic", 21.5, 4, 1_000_000, 2),
                        mean("C", "Latin hypercube, 64 cells", 21.5, 2, 1_000_000, 3),
                        rounds("D", "scrambled Sobol', 16 replicates", 21.5, 9, 20, 4)));
    }

    static Settling empty() {
        return settling(
                "moment",
                "kN m",
                Optional.empty(),
                Optional.empty(),
                List.of(new Series("A", "independent", List.of(), OptionalLong.empty(), 0)));
    }

    static Settling of(Point... points) {
        return settling(
                "moment",
                "kN m",
                Optional.of(stated(1, 0, "")),
                relative(.1),
                List.of(new Series("A", "independent", List.of(points), OptionalLong.empty(), 0)));
    }

    static Settling settling(
            String quantity,
            String unit,
            Optional<Known> reference,
            Optional<Tolerance> tolerance,
            List<Series> lanes) {
        return new Settling("Invented", quantity, unit, .95, 20261201, reference, tolerance, lanes);
    }

    static Optional<Tolerance> relative(double share) {
        return Optional.of(new Tolerance(OptionalDouble.empty(), OptionalDouble.of(share), false));
    }

    static Optional<Tolerance> absolute(double width) {
        return Optional.of(new Tolerance(OptionalDouble.of(width), OptionalDouble.empty(), false));
    }

    /// A running mean of about `draws` values, marks 1 % apart.
    static Series mean(String lane, String scheme, double mean, double sd, long draws, long seed) {
        var random = new SplittableRandom(seed);
        var points = new ArrayList<Point>();
        double sum = 0;
        long n = 0;
        for (long next = 64; next <= draws; next = Math.max(n + 64, (long) (n * 1.01))) {
            sum += (next - n) * mean + Math.sqrt(next - n) * sd * random.nextGaussian();
            n = next;
            double half = 1.96 * sd / Math.sqrt(n);
            points.add(new Point(n, sum / n, sum / n - half, sum / n + half));
        }
        return new Series(lane, scheme, points, OptionalLong.empty(), 0);
    }

    private static Series rounds(String lane, String scheme, double mean, double sd, int last, long seed) {
        var random = new SplittableRandom(seed);
        var points = new ArrayList<Point>();
        for (int round = 7; round <= last; round++) {
            long n = 1L << round;
            double se = sd * Math.pow(n, -.9);
            double estimate = mean + se * random.nextGaussian();
            points.add(new Point(n, estimate, estimate - 2.13 * se, estimate + 2.13 * se));
        }
        return new Series(lane, scheme, points, OptionalLong.empty(), 0);
    }

    /// Counted hits with roughly the exact limits.
    private static Series hits(String lane, String scheme, double p, long draws, long seed) {
        var random = new SplittableRandom(seed);
        var points = new ArrayList<Point>();
        long hits = 0;
        long n = 0;
        for (long next = 64; next <= draws; next = Math.max(n + 64, (long) (n * 1.01))) {
            for (double left = (next - n) * p; left > 0; left -= 1e-3) {
                hits += random.nextDouble() < Math.min(left, 1e-3) ? 1 : 0;
            }
            n = next;
            double low = hits == 0 ? 0 : hits * Math.pow(1 - 1 / (9.0 * hits) - 1.96 / (3 * Math.sqrt(hits)), 3) / n;
            double up = hits + 1.0;
            double high = hits == 0 ? 3.69 / n : up * Math.pow(1 - 1 / (9 * up) + 1.96 / (3 * Math.sqrt(up)), 3) / n;
            points.add(new Point(n, (double) hits / n, low, high));
        }
        return new Series(lane, scheme, points, OptionalLong.of(hits), 0);
    }
}
