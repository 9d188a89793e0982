package dev.leadline.scheme;

import dev.leadline.stream.Address;
import dev.leadline.stream.Stream;
import dev.leadline.stream.StreamKey;
import java.util.Arrays;
import java.util.List;

/// A stream of random numbers for each coordinate of a lane. Immutable.
final class Streams {
    private final StreamKey[] keys;

    private Streams(StreamKey[] keys) {
        this.keys = keys;
    }

    static Streams of(Address lane, List<String> coordinates) {
        return new Streams(coordinates.stream()
                .map(name -> StreamKey.of(lane.forInput(name)))
                .toArray(StreamKey[]::new));
    }

    /// Those of an item of work, each at its first number.
    Stream[] open(long item) {
        return Arrays.stream(keys).map(key -> key.stream(item)).toArray(Stream[]::new);
    }
}
