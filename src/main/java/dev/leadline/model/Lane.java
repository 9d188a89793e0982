package dev.leadline.model;

import dev.leadline.formula.Working;
import dev.leadline.scheme.Independent;
import dev.leadline.scheme.Scheme;
import dev.leadline.stream.Address;
import java.util.Optional;
import java.util.OptionalLong;

/// One scheme being run under a name.
///
/// @param shares whether its random numbers are those of every other lane that shares them
/// @param working the formulas of the question and, as further components, those of the control variates; empty where
///     there are none
/// @param audit draws from the inputs' own densities that the answers are compared with; empty for none
public record Lane(String name, Scheme scheme, boolean shares, Optional<Working> working, OptionalLong audit) {
    /// Draws of an audit at least: its means are then about normal.
    static final long FEWEST_AUDITED = 1_000;

    /// Lanes of one project at most: their rows are read together.
    public static final int MOST = 4;

    /// A lane without an audit.
    public Lane(String name, Scheme scheme, boolean shares, Optional<Working> working) {
        this(name, scheme, shares, working, OptionalLong.empty());
    }

    /// A lane of its own random numbers, without control variates.
    public static Lane of(String name, Scheme scheme) {
        return new Lane(name, scheme, false, Optional.empty());
    }

    /// The lane in the address of its random numbers.
    public String address() {
        return shares ? Address.SHARED : name;
    }

    /// The lane as it is run with so many draws.
    public Lane within(long draws) {
        return with(scheme.within(draws));
    }

    /// Independent draws from the inputs' own densities, of which an audit is made.
    public Lane plain() {
        return new Lane(name, Scheme.of(new Independent()), shares, Optional.empty());
    }

    /// The lane with what was found for its scheme.
    public Lane with(Scheme settled) {
        return new Lane(name, settled, shares, working, audit);
    }
}
