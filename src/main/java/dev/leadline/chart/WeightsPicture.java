package dev.leadline.chart;

import java.awt.BasicStroke;
import java.awt.Graphics2D;
import java.util.ArrayList;
import java.util.List;

/// The *Weights* picture: both axes logarithmic, a line where every weight is the mean.
final class WeightsPicture extends Picture {
    private final Weights weights;

    WeightsPicture(Weights weights, View view, Theme theme, int width, int height) {
        super(
                view,
                theme,
                width,
                height,
                new Scale(view.draws().orElseGet(() -> ranks(weights)), true, "rank of the draw by its weight", ""),
                new Scale(view.values().orElseGet(() -> values(weights)), true, "weight over the mean weight", ""),
                key(weights));
        this.weights = weights;
    }

    private static List<Legend.Entry> key(Weights weights) {
        var entries = new ArrayList<Legend.Entry>();
        for (int i = 0; i < weights.lanes().size(); i++) {
            var lane = weights.lanes().get(i);
            entries.add(new Legend.Entry(
                    new Legend.Of.Trail(LaneLook.values()[i]), lane.lane() + "  " + Caption.effective(lane)));
        }
        return entries;
    }

    private static Range ranks(Weights weights) {
        int most = weights.lanes().stream()
                .mapToInt(lane -> lane.largest().size())
                .max()
                .orElse(0);
        return new Range(.9, Math.max(10, most) * 1.2);
    }

    private static Range values(Weights weights) {
        var seen = weights.lanes().stream()
                .flatMap(lane -> lane.largest().stream())
                .mapToDouble(Point::estimate)
                .summaryStatistics();
        double low = seen.getCount() == 0 ? 1 : Math.min(1, seen.getMin());
        double high = seen.getCount() == 0 ? 1 : Math.max(1, seen.getMax());
        return new Range(Math.max(low / 2, Double.MIN_NORMAL), Math.min(high * 2, 1e300));
    }

    @Override
    List<Reading.At> read(double x) {
        var lanes = new ArrayList<Reading.At>();
        for (int i = 0; i < weights.lanes().size(); i++) {
            var lane = weights.lanes().get(i);
            var look = LaneLook.values()[i];
            nearest(lane.largest(), x).ifPresent(k -> {
                var point = lane.largest().get(k);
                String words = ReadingText.ofWeight(lane, k + 1);
                lanes.add(new Reading.At(lane.lane(), look, words, point, xOf(point.draws()), yOf(point.estimate())));
            });
        }
        return lanes;
    }

    @Override
    boolean isSensibleAcross(Range range) {
        return range.low() >= .1 && range.high() <= 1e5 && range.high() >= 1.01 * range.low();
    }

    @Override
    boolean isSensibleUp(Range range) {
        var most = values(weights);
        return range.low() >= most.low() / 1e4
                && range.high() <= most.high() * 1e4
                && range.high() >= 1.01 * range.low();
    }

    @Override
    void drawGround(Graphics2D g) {
        g.setColor(theme.reference());
        g.setStroke(new BasicStroke(.8f));
        horizontal(g, yOf(1));
    }

    @Override
    void drawMarks(Graphics2D g) {
        var lanes = new ArrayList<Trace>();
        for (int i = 0; i < weights.lanes().size(); i++) {
            lanes.add(new Trace(weights.lanes().get(i).largest(), LaneLook.values()[i]));
        }
        lanes.forEach(lane -> lane.line(g, Point::estimate));
        lanes.forEach(lane -> lane.markers(g, Point::estimate));
    }

    @Override
    List<String> remarks() {
        if (weights.lanes().isEmpty()) {
            return List.of("no draws yet");
        }
        return weights.lanes().stream().allMatch(lane -> lane.largest().isEmpty())
                ? List.of("every draw counts 1: no lane draws from other densities")
                : List.of();
    }
}
