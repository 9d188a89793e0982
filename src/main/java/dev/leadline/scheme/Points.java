package dev.leadline.scheme;

/// How the points of a lane are laid out in the unit cube.
public sealed interface Points {
    /// Word of the project file.
    String word();

    /// Number of draws that together form one independent observation.
    long drawsPerObservation();

    /// Every draw on its own.
    record Independent() implements Points {
        @Override
        public String word() {
            return "independent";
        }

        @Override
        public long drawsPerObservation() {
            return 1;
        }
    }
}
