package dev.leadline.ground;

import dev.leadline.estimate.Accumulator;
import dev.leadline.estimate.Regression;
import dev.leadline.ground.Ground.Strength;
import dev.leadline.model.Components;
import dev.leadline.scheme.Control;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.stream.Collectors;

/// What control variates explain of the outcomes; whether their means are what was stated, whether each
/// says something of its own, and whether there are observations enough to fit them.
final class ControlVariates {
    private static final String CODE = "controls";

    /// Standard errors beyond which the mean of a control variate is not what was stated; many of them where
    /// observations are few.
    private static final double LIMIT = 4;

    private static final double OF_FEW = 10;

    private static final long MANY = 500;

    /// Student's t below which chance alone may have made a coefficient.
    private static final double NOTHING = 2;

    /// Observations for each control variate below which the fit adds much of its own.
    private static final long COMFORTABLE = 20;

    private final Evidence evidence;
    private final List<Control> controls;
    private final int asks;

    private ControlVariates(Evidence evidence) {
        this.evidence = evidence;
        this.controls = evidence.trace().scheme().controls();
        this.asks = Components.asked(evidence.question().asks());
    }

    static List<Ground> judge(Evidence evidence) {
        return evidence.trace().scheme().controls().isEmpty() ? List.of() : new ControlVariates(evidence).grounds();
    }

    private List<Ground> grounds() {
        Accumulator sums = evidence.total();
        var grounds = new ArrayList<Ground>();
        for (int c = 0; c < controls.size(); c++) {
            checkMean(sums, c, grounds);
        }
        var estimate = evidence.answers().getFirst();
        if (Double.isNaN(estimate.estimate())) {
            grounds.add(Ground.doubted(
                    CODE,
                    Strength.OBJECTION,
                    estimate.interval().note().orElse("the control variates cannot be fitted yet"),
                    "Make more draws, or keep the control variates that matter most"));
            return grounds;
        }
        for (int k = 0; k < evidence.answers().size(); k++) {
            if (!sums.constant(evidence.component(k))) {
                explained(new Regression(sums, evidence.component(k), asks, controls.size()), k, grounds);
            }
        }
        new Regression(sums, 0, asks, controls.size())
                .leftOut()
                .forEach(left -> grounds.add(Ground.doubted(
                        CODE,
                        Strength.NOTE,
                        left.by().isEmpty()
                                ? "%s does not vary and is left out".formatted(name(left.control()))
                                : "%s is left out: %s %s it wholly"
                                        .formatted(
                                                name(left.control()),
                                                names(left.by()),
                                                left.by().size() == 1 ? "explains" : "explain"),
                        "Drop it, or put one in its place that says something of its own")));
        return grounds;
    }

    private void checkMean(Accumulator sums, int c, List<Ground> grounds) {
        double error = sums.standardError(asks + c);
        double z = Math.max(0, Math.abs(sums.mean(asks + c)) - controls.get(c).error()) / error;
        boolean few = sums.count() < MANY || !Skewness.isMet(sums, asks + c);
        if (z > (few ? OF_FEW : LIMIT) && !Double.isInfinite(error)) {
            grounds.add(Ground.doubted(
                    CODE,
                    Strength.OBJECTION,
                    "the mean of %s in these draws is %s standard errors from the %s that corrects the estimate"
                            .formatted(
                                    name(c),
                                    Numbers.ratio(z),
                                    Numbers.value(controls.get(c).mean())),
                    "Check the mean that was given for it; \"exact\" and \"quadrature\" find it"));
        }
    }

    private void explained(Regression fit, int k, List<Ground> grounds) {
        long n = evidence.total().count();
        int count = controls.size();
        var idle = new ArrayList<Integer>();
        for (int c = 0; c < count; c++) {
            if (Math.abs(fit.significance(c)) < NOTHING) {
                idle.add(c);
            }
        }
        fit.leftOut().forEach(left -> idle.remove(Integer.valueOf(left.control())));
        String text = evidence.of(k)
                + "%s %s %s of the variance"
                        .formatted(
                                count == 1 ? "the control variate" : "the %d control variates".formatted(count),
                                count == 1 ? "explains" : "explain",
                                percent(fit.share()));
        if (idle.size() == count) {
            grounds.add(Ground.doubted(
                    CODE,
                    Strength.CAUTION,
                    text + ", no more than chance may do",
                    "Leave them out, or choose ones that go with the outcome"));
        } else if (n < COMFORTABLE * count) {
            grounds.add(Ground.doubted(
                    CODE,
                    Strength.CAUTION,
                    text + ", but were fitted to %s observations only".formatted(Numbers.count(n)),
                    "Make %s observations or more, or keep the control variates that matter most"
                            .formatted(Numbers.count(COMFORTABLE * count))));
        } else {
            grounds.add(Ground.shown(CODE, text));
        }
        if (!idle.isEmpty() && idle.size() < count) {
            grounds.add(Ground.doubted(
                    CODE,
                    Strength.NOTE,
                    evidence.of(k)
                            + "beside the others, %s %s nothing"
                                    .formatted(names(idle), idle.size() == 1 ? "explains" : "explain"),
                    "Leave out what explains nothing: it costs time"));
        }
    }

    /// As `98.37 %`; of much, so that what is left has two digits.
    private static String percent(double share) {
        double left = 1 - share;
        int places = left > 0.1 ? 0 : (int) Math.min(10, Math.ceil(-Math.log10(left)));
        return String.format(Locale.ROOT, "%." + places + "f %%", 100 * share);
    }

    private String name(int control) {
        return controls.get(control).formula();
    }

    private String names(List<Integer> some) {
        return some.stream().map(this::name).collect(Collectors.joining(" and "));
    }
}
