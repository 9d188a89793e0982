package dev.leadline.density;

import java.util.List;
import java.util.stream.IntStream;

/// A density of constant pieces, some of them empty: its quantile has a kink at each edge, and a jump at each gap.
///
/// @param edges rising, one more than masses
/// @param masses with sum 1; not the first nor the last is 0
record StepDensity(List<Double> edges, List<Double> masses) implements Shape {

    private double low(int i) {
        return edges.get(i);
    }

    private double width(int i) {
        return edges.get(i + 1) - edges.get(i);
    }

    private StepDensity mirrored() {
        return new StepDensity(
                edges.reversed().stream().map(e -> -e).toList(),
                masses.reversed().stream().toList());
    }

    @Override
    public double pdf(double x) {
        return IntStream.range(0, masses.size())
                .filter(i -> x >= low(i) && x <= edges.get(i + 1))
                .mapToDouble(i -> masses.get(i) / width(i))
                .findFirst()
                .orElse(Double.isNaN(x) ? x : 0);
    }

    @Override
    public double logPdf(double x) {
        return StrictMath.log(pdf(x));
    }

    @Override
    public double cdf(double x) {
        double sum = Double.isNaN(x) ? x : 0;
        for (int i = 0; i < masses.size() && x > low(i); i++) {
            sum += masses.get(i) * Math.min((x - low(i)) / width(i), 1);
        }
        return sum;
    }

    @Override
    public double survival(double x) {
        return mirrored().cdf(-x);
    }

    @Override
    public double inner(double p) {
        double sum = 0;
        for (int i = 0; i < masses.size(); i++) {
            double beyond = p - sum;
            if (masses.get(i) > 0 && beyond <= masses.get(i)) {
                return low(i) + width(i) * (beyond / masses.get(i));
            }
            sum += masses.get(i);
        }
        return support().high();
    }

    @Override
    public double upperInner(double q) {
        return -mirrored().inner(q);
    }

    @Override
    public double mean() {
        return IntStream.range(0, masses.size())
                .mapToDouble(i -> masses.get(i) * (low(i) + 0.5 * width(i)))
                .sum();
    }

    @Override
    public double variance() {
        double mean = mean();
        return IntStream.range(0, masses.size())
                .mapToDouble(i -> {
                    double middle = low(i) + 0.5 * width(i) - mean;
                    return masses.get(i) * (middle * middle + width(i) * width(i) / 12);
                })
                .sum();
    }

    @Override
    public Support support() {
        return new Support(edges.getFirst(), edges.getLast());
    }
}
