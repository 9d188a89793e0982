package dev.leadline.density;

/// The interval outside which a density is 0; its ends may be infinite.
public record Support(double low, double high) {
    public boolean contains(double x) {
        return low <= x && x <= high;
    }
}
