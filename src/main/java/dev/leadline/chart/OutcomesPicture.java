package dev.leadline.chart;

import dev.leadline.density.Portrait.Bar;
import dev.leadline.estimate.Coverage;
import dev.leadline.estimate.Estimand;
import dev.leadline.interval.Interval;
import dev.leadline.numeric.Significant;
import dev.leadline.trace.Answer;
import java.awt.AlphaComposite;
import java.awt.BasicStroke;
import java.awt.Graphics2D;
import java.awt.geom.Line2D;
import java.awt.geom.Path2D;
import java.awt.geom.Rectangle2D;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.stream.DoubleStream;

/// The *Outcomes* picture: the density of the outcomes, or bars of discrete ones, the answer as an upright line with
/// its interval, and the coverage intervals of a distribution as brackets in a colour of their own.
final class OutcomesPicture extends Picture {
    /// Share of the outcomes on either side that may lie beyond the picture.
    private static final double RARE = 5e-4;

    /// A peak so many times as high as the next highest bar is cut.
    private static final double PEAK = 4;

    private static final int BRACKET = 20;

    private final Outcomes outcomes;

    OutcomesPicture(Outcomes outcomes, View view, Theme theme, int width, int height) {
        super(
                view,
                theme,
                width,
                height,
                new Scale(
                        view.draws().orElseGet(() -> across(outcomes)),
                        false,
                        "outcomes of " + shortened(outcomes.formula()) + (isEvent(outcomes) ? ": 0 no, 1 yes" : ""),
                        outcomes.unit()),
                new Scale(
                        view.values().orElseGet(() -> up(outcomes, height)),
                        false,
                        outcomes.isDiscrete() ? "share of the outcomes" : "density of the outcomes",
                        outcomes.isDiscrete() || Typeset.unit(outcomes.unit()).isEmpty()
                                ? ""
                                : "per " + outcomes.unit()),
                key(outcomes));
        this.outcomes = outcomes;
    }

    private static boolean isEvent(Outcomes outcomes) {
        return outcomes.estimand() instanceof Estimand.Probability;
    }

    private static String shortened(String formula) {
        String line = formula.strip().replaceAll("\\s+", " ");
        return line.length() <= 50 ? line : line.substring(0, 49) + "…";
    }

    private static List<Legend.Entry> key(Outcomes outcomes) {
        var entries = new ArrayList<Legend.Entry>();
        String percent = Interval.percent(outcomes.level());
        for (int i = 0; i < outcomes.lanes().size(); i++) {
            var lane = outcomes.lanes().get(i);
            entries.add(
                    new Legend.Entry(new Legend.Of.Spread(LaneLook.values()[i]), lane.lane() + "  " + lane.scheme()));
        }
        if (Outcomes.isOnScale(outcomes.estimand())
                && outcomes.lanes().stream().anyMatch(lane -> lane.answer().isPresent())) {
            entries.add(new Legend.Entry(
                    new Legend.Of.Place(LaneLook.FIRST),
                    name(outcomes.estimand()) + ", " + percent + " confidence interval"));
        }
        outcomes.covered()
                .flatMap(Outcomes.Lying::answer)
                .flatMap(Answer::coverage)
                .ifPresent(found -> {
                    String part = Interval.percent(found.coverage()) + " of outcomes";
                    entries.add(new Legend.Entry(new Legend.Of.Bracket(false), part + ", symmetric"));
                    entries.add(new Legend.Entry(new Legend.Of.Bracket(true), part + ", shortest"));
                });
        outcomes.reference()
                .ifPresent(reference -> entries.add(new Legend.Entry(
                        new Legend.Of.ReferenceLine(), "reference " + Typeset.number(reference.value(), 8))));
        return entries;
    }

    private static String name(Estimand estimand) {
        return switch (estimand) {
            case Estimand.Quantile(double at) -> Interval.percent(at) + " quantile";
            case Estimand.TailMean _ -> "tail mean";
            case Estimand.Integral _ -> "integral, their mean";
            case Estimand.Mean _,
                    Estimand.Probability _,
                    Estimand.Ratio _,
                    Estimand.StandardDeviation _,
                    Estimand.Distribution _ -> "mean";
        };
    }

    /// Where nearly all outcomes lie, and the answers, with room on both sides.
    private static Range across(Outcomes outcomes) {
        if (isEvent(outcomes)) {
            return new Range(-.6, 1.6);
        }
        var ends = outcomes.lanes().stream()
                .flatMapToDouble(lane -> DoubleStream.concat(
                        nearlyAll(lane),
                        Outcomes.isOnScale(outcomes.estimand()) ? answers(lane) : DoubleStream.empty()))
                .filter(Double::isFinite)
                .summaryStatistics();
        if (ends.getCount() == 0) {
            return outcomes.reference().map(r -> padded(r.value(), r.value())).orElse(new Range(0, 1));
        }
        return outcomes.isDiscrete() && ends.getMax() > ends.getMin()
                ? new Range(
                        ends.getMin() - .06 * (ends.getMax() - ends.getMin()) - gap(outcomes) / 2,
                        ends.getMax() + .06 * (ends.getMax() - ends.getMin()) + gap(outcomes) / 2)
                : padded(ends.getMin(), ends.getMax());
    }

    private static Range padded(double low, double high) {
        double pad = high > low ? .04 * (high - low) : Math.max(1e-300, .1 * Math.abs(low) + (low == 0 ? 1 : 0));
        return new Range(low - pad, high + pad);
    }

    private static DoubleStream nearlyAll(Outcomes.Lying lane) {
        var bars = lane.bars();
        if (bars.isEmpty()) {
            return DoubleStream.empty();
        }
        int first = 0;
        double before = lane.below();
        while (first < bars.size() - 1 && before + bars.get(first).chance() < RARE) {
            before += bars.get(first++).chance();
        }
        int last = bars.size() - 1;
        double after = lane.above();
        while (last > first && after + bars.get(last).chance() < RARE) {
            after += bars.get(last--).chance();
        }
        return DoubleStream.of(bars.get(first).from(), bars.get(last).to());
    }

    private static DoubleStream answers(Outcomes.Lying lane) {
        return lane.answer().stream()
                .flatMapToDouble(a -> DoubleStream.concat(
                        DoubleStream.of(a.estimate()),
                        a.coverage().stream()
                                .flatMapToDouble(c -> DoubleStream.of(
                                        Math.min(c.symmetricLow(), c.shortestLow()),
                                        Math.max(c.symmetricHigh(), c.shortestHigh())))));
    }

    /// The least distance between discrete outcomes.
    private static double gap(Outcomes outcomes) {
        return outcomes.lanes().stream()
                .flatMapToDouble(lane -> java.util.stream.IntStream.range(
                                1, lane.bars().size())
                        .mapToDouble(i -> lane.bars().get(i).from()
                                - lane.bars().get(i - 1).from()))
                .filter(d -> d > 0)
                .min()
                .orElse(1);
    }

    private static Range up(Outcomes outcomes, int height) {
        double highest = highest(outcomes);
        int room = Math.max(60, height - 110);
        double brackets = outcomes.covered().isPresent() ? 2.4 * BRACKET : 0;
        double share = Math.clamp(1 - (brackets + 18 * (outcomes.lanes().size() + 1)) / room, .5, .97);
        return new Range(0, highest / share);
    }

    /// Of all bars; a peak far above the next highest is left out.
    private static double highest(Outcomes outcomes) {
        boolean discrete = outcomes.isDiscrete();
        double[] heights = outcomes.lanes().stream()
                .mapToDouble(lane -> lane.bars().stream()
                        .mapToDouble(bar -> height(bar, discrete))
                        .max()
                        .orElse(0))
                .toArray();
        double most = DoubleStream.of(heights).max().orElse(0);
        double next = outcomes.lanes().stream()
                .mapToDouble(lane -> next(lane, discrete))
                .max()
                .orElse(0);
        double top = !discrete && next > 0 && most > PEAK * next ? 1.5 * next : most;
        return top > 0 && Double.isFinite(top) ? top : 1;
    }

    private static double next(Outcomes.Lying lane, boolean discrete) {
        double[] sorted = lane.bars().stream()
                .mapToDouble(bar -> height(bar, discrete))
                .sorted()
                .toArray();
        return sorted.length < 2 ? 0 : sorted[sorted.length - 2];
    }

    private static double height(Bar bar, boolean discrete) {
        return discrete ? bar.chance() : bar.to() > bar.from() ? bar.chance() / (bar.to() - bar.from()) : 0;
    }

    @Override
    List<Reading.At> read(double x) {
        var readings = new ArrayList<Reading.At>();
        double value = drawsAt(x);
        for (int i = 0; i < outcomes.lanes().size(); i++) {
            var lane = outcomes.lanes().get(i);
            int at = barAt(lane, value);
            if (at >= 0) {
                var bar = lane.bars().get(at);
                double height = height(bar, outcomes.isDiscrete());
                var point = new Point(at + 1L, height, Double.NaN, Double.NaN);
                readings.add(new Reading.At(
                        lane.lane(),
                        LaneLook.values()[i],
                        ReadingText.ofOutcomes(lane, at, outcomes.unit()),
                        point,
                        xOf(bar.middle()),
                        yOf(height)));
            }
        }
        return readings;
    }

    /// The bar nearest to a value; -1 where there is none.
    private static int barAt(Outcomes.Lying lane, double value) {
        int nearest = -1;
        double least = Double.POSITIVE_INFINITY;
        for (int i = 0; i < lane.bars().size(); i++) {
            double off = Math.abs(lane.bars().get(i).middle() - value);
            if (off < least) {
                least = off;
                nearest = i;
            }
        }
        return nearest;
    }

    @Override
    boolean isSensibleAcross(Range range) {
        var all = across(outcomes);
        return range.length() >= 1e-6 * all.length() && range.length() <= 50 * all.length();
    }

    @Override
    boolean isSensibleUp(Range range) {
        double top = highest(outcomes);
        return range.low() >= -top && range.high() <= 100 * top && range.length() >= 1e-6 * top;
    }

    @Override
    void drawGround(Graphics2D g) {
        outcomes.reference().filter(r -> r.error() > 0).ifPresent(r -> {
            var composite = g.getComposite();
            g.setComposite(AlphaComposite.SrcOver.derive(.18f));
            g.setColor(theme.reference());
            g.fill(stretch(xOf(r.value() - r.error()), xOf(r.value() + r.error())));
            g.setComposite(composite);
        });
    }

    @Override
    void drawMarks(Graphics2D g) {
        var lanes = outcomes.lanes();
        boolean discrete = outcomes.isDiscrete();
        for (int i = 0; i < lanes.size(); i++) {
            var look = LaneLook.values()[i];
            if (discrete) {
                bars(g, lanes.get(i), look, i);
            } else {
                outline(g, lanes.get(i), look);
            }
        }
        if (Outcomes.isOnScale(outcomes.estimand())) {
            outcomes.reference().ifPresent(r -> {
                g.setColor(theme.reference());
                g.setStroke(dashDot());
                upright(g, xOf(r.value()));
            });
            for (int i = 0; i < lanes.size(); i++) {
                answer(g, lanes.get(i), LaneLook.values()[i]);
            }
        }
        outcomes.covered()
                .flatMap(Outcomes.Lying::answer)
                .flatMap(Answer::coverage)
                .ifPresent(c -> brackets(g, c));
    }

    private void outline(Graphics2D g, Outcomes.Lying lane, LaneLook look) {
        if (lane.bars().isEmpty()) {
            return;
        }
        var path = new Path2D.Double();
        path.moveTo(xOf(lane.bars().getFirst().from()), yOf(0));
        for (var bar : lane.bars()) {
            double y = yOf(height(bar, false));
            path.lineTo(xOf(bar.from()), y);
            path.lineTo(xOf(bar.to()), y);
        }
        path.lineTo(xOf(lane.bars().getLast().to()), yOf(0));
        g.setColor(theme.band(look, outcomes.lanes().size() > 1 ? .6 : 1));
        g.fill(path);
        tail(lane).ifPresent(beyond -> {
            var clip = g.getClip();
            g.clip(beyond);
            g.setColor(theme.band(look, 2.4));
            g.fill(path);
            g.setClip(clip);
        });
        g.setColor(theme.of(look));
        g.setStroke(look.edge());
        g.draw(path);
    }

    /// A quarter of a bar's width apart where there are several lanes.
    private void bars(Graphics2D g, Outcomes.Lying lane, LaneLook look, int index) {
        int lanes = outcomes.lanes().size();
        double room = Math.abs(xOf(gap(outcomes)) - xOf(0));
        double thick = Math.clamp(.7 * room / lanes, 1, 34);
        double shift = (index - (lanes - 1) / 2.0) * thick;
        var beyond = tail(lane);
        for (var bar : lane.bars()) {
            double x = xOf(bar.from()) + shift;
            double y = yOf(bar.chance());
            var block = new Rectangle2D.Double(x - thick / 2, y, thick, yOf(0) - y);
            boolean shaded = beyond.filter(b -> b.contains(xOf(bar.from()), (plot.getMinY() + plot.getMaxY()) / 2))
                    .isPresent();
            g.setColor(theme.band(look, shaded ? 4 : 2));
            g.fill(block);
            g.setColor(theme.of(look));
            g.setStroke(look.edge());
            g.draw(block);
        }
    }

    /// The part of the plot beyond a quantile, on the side with fewer outcomes.
    private Optional<Rectangle2D> tail(Outcomes.Lying lane) {
        return switch (outcomes.estimand()) {
            case Estimand.Quantile(double at) ->
                lane.answer()
                        .map(Answer::estimate)
                        .filter(Double::isFinite)
                        .map(q -> at >= .5
                                ? stretch(xOf(q) + (lane.discrete() ? 1 : 0), plot.getMaxX() + 2)
                                : stretch(plot.getMinX() - 2, xOf(q) - (lane.discrete() ? 1 : 0)));
            case Estimand.TailMean _ ->
                Double.isFinite(lane.tailFrom())
                        ? Optional.of(stretch(xOf(lane.tailFrom()), plot.getMaxX() + 2))
                        : Optional.empty();
            case Estimand.Mean _,
                    Estimand.Integral _,
                    Estimand.Probability _,
                    Estimand.Ratio _,
                    Estimand.StandardDeviation _,
                    Estimand.Distribution _ -> Optional.empty();
        };
    }

    private void answer(Graphics2D g, Outcomes.Lying lane, LaneLook look) {
        lane.answer().filter(a -> Double.isFinite(a.estimate())).ifPresent(a -> {
            double low = a.interval().low();
            double high = a.interval().high();
            if (Double.isFinite(low) && Double.isFinite(high)) {
                g.setColor(theme.band(look, 2));
                g.fill(stretch(xOf(low), xOf(high)));
            }
            double x = xOf(a.estimate());
            g.setColor(theme.of(look));
            g.setStroke(look.line());
            upright(g, x);
            marker(g, look, x, plot.getMaxY() - 12 - 14 * look.ordinal());
        });
    }

    private void brackets(Graphics2D g, Coverage c) {
        double y = plot.getMinY() + 16 + (fontSize() + 6) * remarks().size();
        bracket(g, y, c.symmetricLow(), c.symmetricHigh(), false);
        bracket(g, y + BRACKET, c.shortestLow(), c.shortestHigh(), true);
    }

    private void bracket(Graphics2D g, double y, double low, double high, boolean shortest) {
        double from = Math.clamp(xOf(low), plot.getMinX() - 4, plot.getMaxX() + 4);
        double to = Math.clamp(xOf(high), plot.getMinX() - 4, plot.getMaxX() + 4);
        g.setColor(faint(theme.coverage()));
        g.setStroke(new BasicStroke(1, BasicStroke.CAP_BUTT, BasicStroke.JOIN_ROUND, 1, new float[] {2, 3}, 0));
        g.draw(new Line2D.Double(from, y, from, plot.getMaxY()));
        g.draw(new Line2D.Double(to, y, to, plot.getMaxY()));
        g.setColor(theme.coverage());
        g.setStroke(bracketStroke(shortest));
        g.draw(new Line2D.Double(from, y, to, y));
        g.setStroke(new BasicStroke(2));
        g.draw(new Line2D.Double(from, y - 5, from, y + 5));
        g.draw(new Line2D.Double(to, y - 5, to, y + 5));
    }

    private void upright(Graphics2D g, double x) {
        if (plot.getMinX() <= x && x <= plot.getMaxX()) {
            g.draw(new Line2D.Double(x, plot.getMinY(), x, plot.getMaxY()));
        }
    }

    private Rectangle2D stretch(double left, double right) {
        double from = Math.clamp(left, plot.getMinX() - 2, plot.getMaxX() + 2);
        double to = Math.clamp(right, plot.getMinX() - 2, plot.getMaxX() + 2);
        return new Rectangle2D.Double(from, plot.getMinY(), to - from, plot.getHeight());
    }

    @Override
    List<String> remarks() {
        var remarks = new ArrayList<String>();
        if (outcomes.lanes().stream().allMatch(lane -> lane.bars().isEmpty())) {
            remarks.add(
                    outcomes.lanes().stream().anyMatch(lane -> lane.answer().isPresent())
                            ? "no outcomes are kept under this scheme"
                            : "no draws yet");
        }
        switch (outcomes.estimand()) {
            case Estimand.Ratio _ -> remarks.add("outcomes of the first formula; the ratio is not on this axis");
            case Estimand.StandardDeviation _ -> remarks.add("the deviation is a length along this axis, not a place");
            case Estimand.Mean _,
                    Estimand.Integral _,
                    Estimand.Probability _,
                    Estimand.Quantile _,
                    Estimand.TailMean _,
                    Estimand.Distribution _ -> {}
        }
        for (var lane : outcomes.lanes()) {
            beyond(lane).ifPresent(remarks::add);
        }
        return remarks;
    }

    private Optional<String> beyond(Outcomes.Lying lane) {
        if (lane.bars().isEmpty()) {
            return Optional.empty();
        }
        if (isEvent(outcomes)) {
            return Optional.of("lane " + lane.lane() + ": happens in "
                    + share(lane.bars().getLast().chance()));
        }
        double low = lane.below();
        double high = lane.above();
        for (var bar : lane.bars()) {
            low += bar.to() < draws().low() ? bar.chance() : 0;
            high += bar.from() > draws().high() ? bar.chance() : 0;
        }
        var parts = new ArrayList<String>();
        if (low > 0) {
            parts.add(share(low) + " left of the picture");
        }
        if (high > 0) {
            parts.add(share(high) + (low > 0 ? " right of it" : " right of the picture"));
        }
        highestCut(lane).ifPresent(parts::add);
        return parts.isEmpty()
                ? Optional.empty()
                : Optional.of("lane " + lane.lane() + ": " + String.join(", ", parts));
    }

    /// What a bar holds that leaves the picture.
    private Optional<String> highestCut(Outcomes.Lying lane) {
        return lane.bars().stream()
                .filter(bar -> height(bar, outcomes.isDiscrete()) > values().high())
                .findFirst()
                .map(bar -> "the peak about " + Significant.text(bar.middle(), 3) + " holds " + share(bar.chance()));
    }

    private static String share(double part) {
        return Significant.text(100 * part, 2) + " %";
    }
}
