package dev.leadline.chart;

import dev.leadline.interval.Interval;
import dev.leadline.numeric.Rounding;
import java.awt.AlphaComposite;
import java.awt.Graphics2D;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/// The *Settling* picture.
final class SettlingPicture extends Picture {
    private final Settling settling;

    SettlingPicture(Settling settling, View view, Theme theme, int width, int height) {
        this(settling, view, theme, width, height, view.values().orElseGet(() -> Framing.values(settling)));
    }

    private SettlingPicture(Settling settling, View view, Theme theme, int width, int height, Range values) {
        super(
                view,
                theme,
                width,
                height,
                new Scale(
                        view.draws().orElseGet(() -> Framing.draws(settling, view.logDraws())),
                        view.logDraws(),
                        "draws",
                        ""),
                new Scale(values, false, "estimate of " + settling.quantity(), settling.unit()),
                key(settling, values));
        this.settling = settling;
    }

    private static List<Legend.Entry> key(Settling settling, Range values) {
        var entries = new ArrayList<Legend.Entry>();
        for (int i = 0; i < settling.lanes().size(); i++) {
            var lane = settling.lanes().get(i);
            entries.add(new Legend.Entry(new Legend.Of.Lane(LaneLook.values()[i]), lane.lane() + "  " + lane.scheme()));
        }
        if (!entries.isEmpty()) {
            entries.add(new Legend.Entry(new Legend.Of.Remark(), Interval.percent(settling.level()) + " intervals"));
        }
        for (int i = 0; i < settling.lanes().size(); i++) {
            if (settling.lanes().get(i).banded()) {
                entries.add(new Legend.Entry(
                        new Legend.Of.Band(LaneLook.values()[i]), "any-time band: holds at every look"));
                break;
            }
        }
        settling.reference()
                .ifPresent(reference -> entries.add(new Legend.Entry(
                        new Legend.Of.ReferenceLine(),
                        "reference " + Typeset.number(reference.value(), 8) + whereabouts(reference.value(), values))));
        settling.strip()
                .flatMap(_ -> settling.tolerance())
                .ifPresent(asked -> entries.add(new Legend.Entry(
                        new Legend.Of.Strip(), "numerical tolerance " + Caption.of(asked, settling.unit()))));
        return entries;
    }

    private static String whereabouts(double value, Range values) {
        return value > values.high() ? " (above the picture)" : value < values.low() ? " (below the picture)" : "";
    }

    @Override
    List<Reading.At> read(double x) {
        var lanes = new ArrayList<Reading.At>();
        for (int i = 0; i < settling.lanes().size(); i++) {
            var lane = settling.lanes().get(i);
            var look = LaneLook.values()[i];
            nearest(lane.points(), x).ifPresent(k -> {
                var point = lane.points().get(k);
                String words = ReadingText.of(point, settling.unit());
                lanes.add(new Reading.At(lane.lane(), look, words, point, xOf(point.draws()), yOf(point.estimate())));
            });
        }
        return lanes;
    }

    @Override
    boolean isSensibleAcross(Range range) {
        double low = range.low();
        double high = range.high();
        double most = Framing.draws(settling, view.logDraws()).high();
        return view.logDraws()
                ? low >= .1 && high <= 30 * most && high >= 1.01 * low
                : low >= -most && high <= 3 * most && high - low >= 1 && high - low >= 1e-9 * high;
    }

    @Override
    boolean isSensibleUp(Range range) {
        var most = Framing.outermost(settling);
        return most.contains(range.low())
                && most.contains(range.high())
                && range.length() >= Framing.LEAST
                && range.length() >= 1e-11 * Math.max(Math.abs(range.low()), Math.abs(range.high()));
    }

    @Override
    void drawGround(Graphics2D g) {
        settling.strip().ifPresent(strip -> strip(g, yOf(strip.high()), yOf(strip.low())));
    }

    @Override
    void drawMarks(Graphics2D g) {
        var lanes = new ArrayList<Trace>();
        for (int i = 0; i < settling.lanes().size(); i++) {
            lanes.add(new Trace(settling.lanes().get(i).points(), LaneLook.values()[i]));
        }
        double share = lanes.size() > 2 ? .6 : 1; // many bands over each other stay light
        lanes.forEach(lane -> {
            lane.between(g, .5 * share, Point::bandLow, Point::bandHigh);
            lane.between(g, share, Point::low, Point::high);
        });
        drawReference(g);
        lanes.forEach(lane -> {
            lane.outerEdge(g, Point::bandLow);
            lane.outerEdge(g, Point::bandHigh);
        });
        lanes.forEach(lane -> {
            lane.edge(g, Point::low);
            lane.edge(g, Point::high);
        });
        lanes.forEach(lane -> lane.line(g, Point::estimate));
        lanes.forEach(lane -> lane.markers(g, Point::estimate));
    }

    private void drawReference(Graphics2D g) {
        settling.reference().ifPresent(reference -> {
            if (reference.error() > 0) {
                g.setColor(theme.reference());
                var composite = g.getComposite();
                g.setComposite(AlphaComposite.SrcOver.derive(.18f));
                g.fill(between(yOf(reference.value() + reference.error()), yOf(reference.value() - reference.error())));
                g.setComposite(composite);
            }
            g.setColor(theme.reference());
            g.setStroke(dashDot());
            horizontal(g, yOf(reference.value()));
        });
    }

    @Override
    List<String> remarks() {
        var remarks = new ArrayList<String>();
        if (settling.lanes().stream().allMatch(lane -> lane.points().isEmpty())) {
            remarks.add("no draws yet");
        }
        for (var lane : settling.lanes()) {
            remark(lane).ifPresent(remarks::add);
            if (lane.provisional()) {
                remarks.add("lane " + lane.lane() + ": provisional, exact places are found at the end");
            }
            if (lane.nonFinite() > 0) {
                remarks.add("lane " + lane.lane() + ": over finite evaluations only, " + Typeset.count(lane.nonFinite())
                        + " left out");
            }
        }
        return remarks;
    }

    private Optional<String> remark(Series lane) {
        var last = lane.last();
        if (last.isEmpty()) {
            return Optional.empty();
        }
        var point = last.get();
        String name = "lane " + lane.lane() + ": ";
        if (lane.withoutHit()) {
            var limit = Double.isFinite(point.high())
                    ? ", so at most " + Typeset.quantity(Typeset.set(Rounding.atMost(point.high())), settling.unit())
                            + " (" + Interval.percent(settling.level()) + ")"
                    : "";
            return Optional.of(name + "no hit in " + Typeset.count(point.draws()) + " draws" + limit);
        }
        if (!Double.isFinite(point.estimate())) {
            return Optional.of(name + "no estimate yet");
        }
        if (!(Double.isFinite(point.low()) && Double.isFinite(point.high()))) {
            return Optional.of(name + "no interval yet");
        }
        return Optional.empty();
    }
}
