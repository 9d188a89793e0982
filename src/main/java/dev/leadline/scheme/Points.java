package dev.leadline.scheme;

import dev.leadline.stream.Address;
import dev.leadline.stream.Stream;
import java.util.List;

/// How the points of a lane are laid out in the unit cube. Immutable, safe for all threads.
public sealed interface Points {
    /// Word of the project file.
    String word();

    /// Number of draws that together form one independent observation.
    int drawsPerObservation();

    /// The points of the item of work at `item`, a pure function of it; the address of each input is `item` with its
    /// name.
    Cursor open(Address item, List<String> inputs);

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
        public Cursor open(Address item, List<String> inputs) {
            var streams = inputs.stream()
                    .map(input -> Stream.at(item.forInput(input)))
                    .toArray(Stream[]::new);
            return (u, rows) -> {
                for (int j = 0; j < streams.length; j++) {
                    if (u[j] != null) {
                        streams[j].fill(u[j], 0, rows);
                    }
                }
            };
        }
    }
}
