package dev.leadline.density;

/// A sum of many numbers that keeps what rounding loses of each.
///
/// Source: Neumaier (1974), Zeitschrift für angewandte Mathematik und Mechanik 54, 39-51.
final class Sum {
    private double sum;
    private double lost;

    Sum(double first) {
        sum = first;
    }

    void add(double term) {
        double next = sum + term;
        lost += Math.abs(sum) >= Math.abs(term) ? sum - next + term : term - next + sum;
        sum = next;
    }

    double value() {
        return sum + lost;
    }
}
