package dev.leadline.ground;

import java.util.Optional;

/// A reason for or against signing.
///
/// @param code stable word for programs, as `few-hits`
/// @param strength of a doubt; empty otherwise
/// @param text one sentence of evidence with its number
/// @param remedy what could be done about it
public record Ground(String code, Status status, Optional<Strength> strength, String text, Optional<String> remedy) {
    public enum Status {
        SHOWN,
        DOUBTED,
        NOT_DONE
    }

    public enum Strength {
        NOTE,
        CAUTION,
        OBJECTION
    }
}
