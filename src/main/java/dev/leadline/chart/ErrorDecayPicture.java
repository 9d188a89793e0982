package dev.leadline.chart;

import dev.leadline.interval.Interval;
import java.awt.BasicStroke;
import java.awt.Graphics2D;
import java.awt.geom.Line2D;
import java.util.ArrayList;
import java.util.List;
import java.util.stream.DoubleStream;

/// The *Error decay* picture: both axes logarithmic, the tolerance a line below which it is met, a thin straight line
/// of the promised slope through the middle of each lane's later part and onwards.
final class ErrorDecayPicture extends Picture {
    /// A tolerance farther from the marks leaves the picture.
    private static final double FARTHEST = 1000;

    private final ErrorDecay decay;

    ErrorDecayPicture(ErrorDecay decay, View view, Theme theme, int width, int height) {
        this(decay, view, theme, width, height, view.values().orElseGet(() -> values(decay)));
    }

    private ErrorDecayPicture(ErrorDecay decay, View view, Theme theme, int width, int height, Range values) {
        super(
                view,
                theme,
                width,
                height,
                new Scale(view.draws().orElseGet(() -> draws(decay)), true, "draws", ""),
                new Scale(
                        values,
                        true,
                        "half-width of the " + Interval.percent(decay.level()) + " interval",
                        decay.unit()),
                key(decay, values));
        this.decay = decay;
    }

    private static List<Legend.Entry> key(ErrorDecay decay, Range values) {
        var entries = new ArrayList<Legend.Entry>();
        for (int i = 0; i < decay.lanes().size(); i++) {
            var lane = decay.lanes().get(i);
            entries.add(new Legend.Entry(
                    new Legend.Of.Trail(LaneLook.values()[i]),
                    lane.series().lane() + "  " + lane.series().scheme() + slopes(lane)));
        }
        decay.allowed()
                .ifPresent(width -> entries.add(new Legend.Entry(
                        new Legend.Of.Below(),
                        "numerical tolerance " + Caption.of(decay.tolerance().orElseThrow(), decay.unit())
                                + (values.contains(width)
                                        ? ""
                                        : width < values.low() ? " (below the picture)" : " (above the picture)"))));
        return entries;
    }

    /// As `, slope −0.51 (promised −½)`.
    private static String slopes(ErrorDecay.Decay lane) {
        return Caption.slope(lane).map(text -> ", " + text).orElse("");
    }

    private static Range draws(ErrorDecay decay) {
        var all = decay.lanes().stream()
                .flatMap(lane -> lane.series().points().stream())
                .mapToDouble(Point::draws)
                .summaryStatistics();
        if (all.getCount() == 0) {
            return new Range(1, 1000);
        }
        double from = Math.max(1, all.getMin());
        double to = Math.max(all.getMax(), 4 * from);
        return new Range(from / 1.1, to * StrictMath.pow(to / from, .04));
    }

    /// All reaches, and the tolerance where it is not far off.
    private static Range values(ErrorDecay decay) {
        var seen = decay.lanes().stream()
                .flatMap(lane -> lane.series().points().stream())
                .mapToDouble(ErrorDecay::reach)
                .filter(reach -> reach > 0)
                .summaryStatistics();
        double low = seen.getCount() == 0 ? .1 : seen.getMin();
        double high = seen.getCount() == 0 ? 10 : seen.getMax();
        for (double width : decay.allowed().stream().toArray()) {
            if (width > low / FARTHEST && width < high * FARTHEST) {
                low = Math.min(low, width);
                high = Math.max(high, width);
            }
        }
        return new Range(Math.max(low / 1.6, Double.MIN_NORMAL), Math.min(high * 1.6, 1e300));
    }

    @Override
    List<Reading.At> read(double x) {
        var lanes = new ArrayList<Reading.At>();
        for (int i = 0; i < decay.lanes().size(); i++) {
            var lane = decay.lanes().get(i).series();
            var look = LaneLook.values()[i];
            nearest(lane.points(), x).ifPresent(k -> {
                var point = lane.points().get(k);
                String words = ReadingText.ofReach(point, decay.unit());
                double y = yOf(ErrorDecay.reach(point));
                lanes.add(new Reading.At(lane.lane(), look, words, point, xOf(point.draws()), y));
            });
        }
        return lanes;
    }

    @Override
    boolean isSensibleAcross(Range range) {
        return range.low() >= .1 && range.high() <= 1e4 * draws(decay).high() && range.high() >= 1.01 * range.low();
    }

    @Override
    boolean isSensibleUp(Range range) {
        var most = values(decay);
        return range.low() >= most.low() / 1e4
                && range.high() <= most.high() * 1e4
                && range.high() >= 1.01 * range.low();
    }

    @Override
    void drawGround(Graphics2D g) {
        decay.allowed().ifPresent(width -> strip(g, yOf(width), plot.getMaxY() + 2));
    }

    @Override
    void drawMarks(Graphics2D g) {
        var lanes = new ArrayList<Trace>();
        for (int i = 0; i < decay.lanes().size(); i++) {
            var lane = decay.lanes().get(i);
            lanes.add(new Trace(lane.series().points(), LaneLook.values()[i]));
        }
        for (int i = 0; i < lanes.size(); i++) {
            drawPromise(g, decay.lanes().get(i), LaneLook.values()[i]);
        }
        lanes.forEach(lane -> lane.line(g, ErrorDecay::reach));
        lanes.forEach(lane -> lane.markers(g, ErrorDecay::reach));
    }

    private void drawPromise(Graphics2D g, ErrorDecay.Decay lane, LaneLook look) {
        var later = Slope.laterPart(lane.series().points());
        if (lane.promised().isEmpty() || later.isEmpty()) {
            return;
        }
        double x = mean(later.stream().mapToDouble(Point::draws));
        double y = mean(later.stream().mapToDouble(ErrorDecay::reach));
        double slope = lane.promised().getAsDouble();
        double left = later.getFirst().draws();
        double right = draws().high();
        g.setColor(theme.of(look));
        g.setStroke(new BasicStroke(.8f));
        g.draw(new Line2D.Double(
                xOf(left),
                yOf(StrictMath.exp(y + slope * (StrictMath.log(left) - x))),
                xOf(right),
                yOf(StrictMath.exp(y + slope * (StrictMath.log(right) - x)))));
    }

    private static double mean(DoubleStream values) {
        return values.map(StrictMath::log).average().orElseThrow();
    }

    @Override
    List<String> remarks() {
        var remarks = new ArrayList<String>();
        if (decay.lanes().stream().allMatch(lane -> lane.series().points().isEmpty())) {
            remarks.add("no draws yet");
        }
        for (var lane : decay.lanes()) {
            var points = lane.series().points();
            if (!points.isEmpty() && points.stream().noneMatch(p -> ErrorDecay.reach(p) > 0)) {
                remarks.add("lane %s: no interval yet".formatted(lane.series().lane()));
            }
        }
        return remarks;
    }
}
