package dev.leadline.scheme;

import dev.leadline.stream.Address;
import dev.leadline.stream.Stream;
import dev.leadline.stream.StreamKey;
import java.util.Arrays;
import java.util.List;

/// How the points of a lane are laid out in the unit cube. Immutable, safe for all threads.
public sealed interface Points {
    /// Word of the project file.
    String word();

    /// Number of draws that together form one independent observation.
    int drawsPerObservation();

    /// The points of a lane; the address of each input is `lane` with its name.
    ///
    /// @param lane its input and item do not matter
    Layout layout(Address lane, List<String> inputs);

    /// Every draw on its own.
    record Independent() implements Points {
        @Override
        public String word() {
            return "independent";
        }

        @Override
        public int drawsPerObservation() {
            return 1;
        }

        @Override
        public Layout layout(Address lane, List<String> inputs) {
            var keys = inputs.stream()
                    .map(input -> StreamKey.of(lane.forInput(input)))
                    .toArray(StreamKey[]::new);
            return item -> {
                var streams = Arrays.stream(keys).map(key -> key.stream(item)).toArray(Stream[]::new);
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
}
