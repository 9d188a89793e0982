package dev.leadline.density;

import java.nio.charset.StandardCharsets;
import java.security.MessageDigest;
import java.security.NoSuchAlgorithmException;
import java.util.HexFormat;

/// The curve of a shape with a closed form.
record Exact(Density shape, ClosedForm form, double uError) implements Curve {
    static Exact of(Density shape, ClosedForm form) {
        return new Exact(shape, form, TableFit.worst(shape, new Exact(shape, form, 0)));
    }

    @Override
    public void fill(double[] u, double[] x, int n, double location, double scale) {
        form.fill(u, x, n);
        for (int i = 0; i < n; i++) {
            x[i] = Math.fma(scale, x[i], location);
        }
    }

    @Override
    public long bytes() {
        return 0;
    }

    @Override
    public String hash() {
        try {
            return HexFormat.of()
                    .formatHex(MessageDigest.getInstance("SHA-256")
                            .digest(shape.toString().getBytes(StandardCharsets.UTF_8)));
        } catch (NoSuchAlgorithmException e) {
            throw new IllegalStateException(e);
        }
    }
}
