package dev.leadline.scheme;

import dev.leadline.stream.Address;
import dev.leadline.stream.Stream;
import java.util.List;

/// Draws in pairs: of the second every coordinate is 1 less that of the first.
///
/// What falls with every input as it rises, or rises with every one, gains; what is even in the inputs loses half of
/// its draws.
public record Antithetic() implements Growing {
    @Override
    public String word() {
        return "antithetic";
    }

    @Override
    public int drawsPerObservation() {
        return 2;
    }

    @Override
    public Layout layout(Address lane, List<String> coordinates) {
        var keys = Streams.of(lane, coordinates);
        return stretch -> {
            Stream[] streams = keys.open(stretch.item());
            return (u, rows) -> {
                for (int j = 0; j < streams.length; j++) {
                    if (u[j] != null) {
                        pairs(streams[j], u[j], rows);
                    }
                }
            };
        };
    }

    /// The first of each pair as if there were half as many rows; then, from the end, each with its mirror image.
    private static void pairs(Stream stream, double[] u, int rows) {
        stream.fill(u, 0, rows / 2);
        for (int i = rows / 2 - 1; i >= 0; i--) {
            u[2 * i + 1] = 1 - u[i];
            u[2 * i] = u[i];
        }
    }
}
