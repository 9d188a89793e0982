package dev.leadline.scheme;

import dev.leadline.stream.Address;
import dev.leadline.stream.Stream;
import java.util.List;

/// Every draw on its own.
public record Independent() implements Growing {
    @Override
    public String word() {
        return "independent";
    }

    @Override
    public int drawsPerObservation() {
        return 1;
    }

    @Override
    public Layout layout(Address lane, List<String> coordinates) {
        var keys = Streams.of(lane, coordinates);
        return stretch -> {
            Stream[] streams = keys.open(stretch.item());
            return (u, rows) -> {
                for (int j = 0; j < streams.length; j++) {
                    if (u[j] != null) {
                        streams[j].fill(u[j], 0, rows);
                    }
                }
            };
        };
    }
}
