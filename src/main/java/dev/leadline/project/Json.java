package dev.leadline.project;

import dev.leadline.numeric.Shortest;
import java.math.BigDecimal;
import java.util.ArrayList;
import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.OptionalLong;
import java.util.SequencedMap;

/// A JSON value (RFC 8259). Immutable; the members of an object keep their order.
public sealed interface Json {

    record Members(SequencedMap<String, Json> map) implements Json {
        public Members {
            map = Collections.unmodifiableSequencedMap(new LinkedHashMap<>(map));
        }
    }

    record Elements(List<Json> list) implements Json {
        public Elements {
            list = List.copyOf(list);
        }
    }

    record Text(String value) implements Json {}

    /// A number as it is written: a double cannot hold every seed.
    record Number(String literal) implements Json {

        public double value() {
            return Double.parseDouble(literal);
        }

        /// The value where it is a whole number that fits, however it is written (`1e6`).
        public OptionalLong whole() {
            try {
                return OptionalLong.of(new BigDecimal(literal).longValueExact());
            } catch (ArithmeticException | NumberFormatException e) {
                return OptionalLong.empty();
            }
        }
    }

    record Flag(boolean value) implements Json {}

    record Null() implements Json {}

    static Json of(String text) {
        return new Text(text);
    }

    static Json of(boolean flag) {
        return new Flag(flag);
    }

    static Json of(long number) {
        return new Number(Long.toString(number));
    }

    /// JSON has no number for what is not finite: `Infinity`, `-Infinity` and `NaN` become text.
    static Json of(double number) {
        return Double.isFinite(number) ? new Number(Shortest.text(number)) : new Text(Double.toString(number));
    }

    /// `null` for `NaN`, the number that does not exist.
    static Json orNull(double number) {
        return Double.isNaN(number) ? new Null() : of(number);
    }

    static Json list(List<? extends Json> elements) {
        return new Elements(new ArrayList<>(elements));
    }

    static Builder object() {
        return new Builder();
    }

    /// Members in the order in which they are put.
    final class Builder {
        private final SequencedMap<String, Json> members = new LinkedHashMap<>();

        private Builder() {}

        public Builder put(String name, Json value) {
            members.put(name, value);
            return this;
        }

        public Builder put(String name, String value) {
            return put(name, of(value));
        }

        /// Leaves the member out where the text is empty.
        public Builder putUnlessEmpty(String name, String value) {
            return value.isEmpty() ? this : put(name, value);
        }

        public Members build() {
            return new Members(members);
        }
    }
}
