package dev.leadline.scheme;

import dev.leadline.stream.Address;
import dev.leadline.stream.Stream;
import dev.leadline.stream.StreamKey;
import java.util.List;

/// Layouts of replicates, coordinate by coordinate: each has random numbers of its own for every coordinate.
/// Repetitions of a lane have replicates of their own.
final class Randomised {
    private Randomised() {}

    interface Replicate {
        /// @param coordinate its index
        /// @param numbers those of the replicate and the coordinate
        Coordinate of(int coordinate, Stream numbers);
    }

    static Layout layout(Address lane, List<String> coordinates, int replicates, Replicate replicate) {
        Coordinate[][] all = new Coordinate[replicates][coordinates.size()];
        for (int r = 0; r < replicates; r++) {
            int own = Math.addExact(Math.multiplyExact(lane.replicate(), replicates), r);
            var address = new Address(lane.seed(), lane.purpose(), lane.lane(), own, "", 0);
            for (int j = 0; j < coordinates.size(); j++) {
                var key = StreamKey.of(address.forInput(coordinates.get(j)));
                all[r][j] = replicate.of(j, key.stream(0));
            }
        }
        return stretch -> new Reading(all[stretch.replicate()], stretch.firstPoint());
    }

    private static final class Reading implements Cursor {
        private final Coordinate[] coordinates;
        private long next;

        Reading(Coordinate[] coordinates, long firstPoint) {
            this.coordinates = coordinates;
            this.next = firstPoint;
        }

        @Override
        public void next(double[][] u, int rows) {
            for (int j = 0; j < coordinates.length; j++) {
                if (u[j] != null) {
                    coordinates[j].fill(u[j], next, rows);
                }
            }
            next += rows;
        }
    }
}
