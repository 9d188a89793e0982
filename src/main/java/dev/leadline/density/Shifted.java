package dev.leadline.density;

import dev.leadline.numeric.Log;
import dev.leadline.problem.Problem;
import dev.leadline.problem.Refusal;
import java.util.ArrayList;

/// The density of `shift + scale * X`; a negative scale mirrors it.
///
/// It is drawn by the table of the shape of `X`; mirrored, a discrete one or one with a closed form has one of its own.
public record Shifted(Density of, double shift, double scale) implements Density {
    /// Larger than what counts as reaching a probability.
    private static final double BEYOND = 4 * Discrete.ROUNDING;

    public Shifted {
        var problems = new ArrayList<Problem>();
        Rule.finite("shift", "").broken(shift).ifPresent(problems::add);
        if (!Double.isFinite(scale) || scale == 0) {
            problems.add(Rule.problem(
                    "scale",
                    scale,
                    "a finite number other than 0",
                    "Every value is multiplied by it.",
                    scale == 0 ? "For a fixed value use a constant." : ""));
        }
        if (!problems.isEmpty()) {
            throw new Refusal(problems);
        }
    }

    private double back(double x) {
        return (x - shift) / scale;
    }

    /// Of a discrete density the value that `x` is the rounded image of; beside an image, a number beside its value.
    private double value(double x) {
        double z = back(x);
        if (!isDiscrete() || !Double.isFinite(z)) {
            return z;
        }
        double rounding = 2 * Math.max(Math.ulp(z), (Math.ulp(x) + Math.ulp(shift)) / Math.abs(scale));
        double p = of.cdf(z + rounding);
        double nearest = p <= 0.5 ? of.quantile(p) : of.upperQuantile(of.survival(z + rounding));
        if (!(Math.abs(nearest - z) <= rounding) || there(nearest) == x) {
            return there(nearest) == x ? nearest : z;
        }
        return x < there(nearest) == scale > 0 ? Math.nextDown(nearest) : Math.nextUp(nearest);
    }

    private double there(double z) {
        return Math.fma(scale, z, shift);
    }

    @Override
    public double pdf(double x) {
        return isDiscrete() ? of.pdf(value(x)) : of.pdf(back(x)) / Math.abs(scale);
    }

    @Override
    public double logPdf(double x) {
        return isDiscrete() ? of.logPdf(value(x)) : of.logPdf(back(x)) - Log.log(Math.abs(scale));
    }

    @Override
    public void logPdf(double[] x, double[] out, int n) {
        for (int i = 0; i < n; i++) {
            out[i] = value(x[i]);
        }
        of.logPdf(out, out, n);
        double log = isDiscrete() ? 0 : Log.log(Math.abs(scale));
        for (int i = 0; i < n; i++) {
            out[i] -= log;
        }
    }

    @Override
    public double cdf(double x) {
        if (isBeyond(x)) {
            return x <= support().low() ? 0 : 1;
        }
        return scale > 0 ? of.cdf(value(x)) : fromAbove(value(x));
    }

    @Override
    public double survival(double x) {
        if (isBeyond(x)) {
            return x <= support().low() ? 1 : 0;
        }
        return scale > 0 ? of.survival(value(x)) : fromBelow(value(x));
    }

    /// Whether x is an end of the support or beyond it, which rounding must not hide.
    private boolean isBeyond(double x) {
        return !isDiscrete() && (x <= support().low() || x >= support().high());
    }

    /// `P(X >= z)`.
    private double fromAbove(double z) {
        return of.survival(isDiscrete() ? Math.nextDown(z) : z);
    }

    /// `P(X < z)`.
    private double fromBelow(double z) {
        return of.cdf(isDiscrete() ? Math.nextDown(z) : z);
    }

    /// Mirrored and discrete, the least value is wanted that leaves less than p above it.
    @Override
    public double quantile(double p) {
        if (scale > 0) {
            return there(of.quantile(p));
        }
        return there(of.upperQuantile(isDiscrete() && p > 0 && p < 1 ? p * (1 - BEYOND) : p));
    }

    @Override
    public double upperQuantile(double q) {
        if (scale > 0) {
            return there(of.upperQuantile(q));
        }
        return there(of.quantile(isDiscrete() && q > 0 && q < 1 ? Math.min(q * (1 + BEYOND), Math.nextDown(1.0)) : q));
    }

    @Override
    public double mean() {
        return there(of.mean());
    }

    @Override
    public double variance() {
        return scale * scale * of.variance();
    }

    @Override
    public double skewness() {
        return Math.signum(scale) * of.skewness();
    }

    @Override
    public double excessKurtosis() {
        return of.excessKurtosis();
    }

    @Override
    public TailOrders tailOrders() {
        var orders = of.tailOrders();
        return scale > 0 ? orders : new TailOrders(orders.upper(), orders.lower());
    }

    @Override
    public boolean isDiscrete() {
        return of.isDiscrete();
    }

    @Override
    public Support support() {
        var s = of.support();
        return scale > 0 ? new Support(there(s.low()), there(s.high())) : new Support(there(s.high()), there(s.low()));
    }

    @Override
    public Standardised standardised() {
        var inner = of.standardised();
        double location = there(inner.location());
        double factor = scale * inner.scale();
        return factor < 0 && (isDiscrete() || inner.shape() instanceof ClosedForm)
                ? new Standardised(new Shifted(inner.shape(), 0, -1), location, -factor)
                : new Standardised(inner.shape(), location, factor);
    }
}
