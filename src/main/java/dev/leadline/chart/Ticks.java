package dev.leadline.chart;

import java.math.BigDecimal;
import java.util.ArrayList;
import java.util.List;

/// The values named along an axis.
///
/// @param factor power of ten taken out of every label, to be said beside the axis's name; 0 for none
record Ticks(List<Tick> all, int factor) {
    /// @param label empty for a tick that only divides
    record Tick(double value, String label) {}

    Ticks {
        all = List.copyOf(all);
    }

    /// Multiples of 1, 2 or 5 times a power of ten, at least two and about `most` of them. All labels have the same
    /// decimals; a power of ten is taken out below .01 and from a million.
    static Ticks even(Range range, int most) {
        double raw = range.high() / most - range.low() / most;
        int exponent = (int) Math.floor(StrictMath.log10(raw));
        BigDecimal step = null;
        List<BigDecimal> values = List.of();
        for (int lead : new int[] {10, 5, 2, 1}) {
            var candidate = BigDecimal.valueOf(lead, -exponent);
            if (values.size() >= 2 && candidate.doubleValue() < raw) {
                break;
            }
            step = candidate;
            values = multiples(candidate, range);
        }
        int factor = factor(values);
        int decimals = Math.max(0, factor - leadExponent(step));
        return new Ticks(
                values.stream()
                        .map(v -> new Tick(v.doubleValue(), label(v.movePointLeft(factor), decimals)))
                        .toList(),
                factor);
    }

    private static List<BigDecimal> multiples(BigDecimal step, Range range) {
        var values = new ArrayList<BigDecimal>();
        long first = (long) Math.ceil(range.low() / step.doubleValue());
        for (long i = first; ; i++) {
            var value = step.multiply(BigDecimal.valueOf(i));
            if (value.doubleValue() > range.high()) {
                return values;
            }
            values.add(value);
        }
    }

    /// Powers of ten where at least two are in range, else 1, 2, 5 times powers of ten, else even steps.
    static Ticks powers(Range range, int most) {
        int from = (int) Math.ceil(StrictMath.log10(range.low()) - 1e-9);
        int to = (int) Math.floor(StrictMath.log10(range.high()) + 1e-9);
        if (to - from >= 1) {
            return decades(range, from, to, most);
        }
        var ticks = new ArrayList<Tick>();
        for (int exponent = from - 1; exponent <= to; exponent++) {
            for (int lead : new int[] {1, 2, 5}) {
                double value = Double.parseDouble(lead + "e" + exponent);
                if (range.contains(value)) {
                    ticks.add(new Tick(value, multiple(lead, exponent)));
                }
            }
        }
        return ticks.size() >= 3 ? new Ticks(ticks, 0) : even(range, most);
    }

    private static Ticks decades(Range range, int from, int to, int most) {
        var ticks = new ArrayList<Tick>();
        int stride = Math.ceilDiv(to - from + 1, most);
        for (int exponent = from - 1; exponent <= to; exponent++) {
            for (int lead = 1; lead <= (stride == 1 ? 9 : 1); lead++) {
                double value = Double.parseDouble(lead + "e" + exponent);
                boolean named = lead == 1 && Math.floorMod(exponent, stride) == 0;
                if (range.contains(value)) {
                    ticks.add(new Tick(value, named ? Typeset.power(exponent) : ""));
                }
            }
        }
        return new Ticks(ticks, 0);
    }

    private static String multiple(int lead, int exponent) {
        if (exponent >= 0 && exponent < 6) {
            return Typeset.plain(new BigDecimal(lead).movePointRight(exponent));
        }
        return lead == 1 ? Typeset.power(exponent) : lead + "×" + Typeset.power(exponent);
    }

    private static int factor(List<BigDecimal> values) {
        return values.stream().filter(v -> v.signum() != 0).mapToInt(Ticks::leadExponent).max().stream()
                .map(e -> e < -2 || e >= 6 ? e : 0)
                .findFirst()
                .orElse(0);
    }

    private static int leadExponent(BigDecimal value) {
        return value.precision() - value.scale() - 1;
    }

    private static String label(BigDecimal value, int decimals) {
        return value.signum() == 0 ? "0" : Typeset.plain(value.setScale(decimals));
    }
}
