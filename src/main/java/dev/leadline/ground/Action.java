package dev.leadline.ground;

import java.util.OptionalLong;

/// What a person can do about a doubt, as data, so that a window can offer it.
public sealed interface Action {
    /// What it does, as a button says it.
    String words();

    /// @param inAll draws that are wanted, where that can be said
    record MoreDraws(OptionalLong inAll) implements Action {
        static MoreDraws some() {
            return new MoreDraws(OptionalLong.empty());
        }

        static MoreDraws inAll(double draws) {
            return draws < Long.MAX_VALUE ? new MoreDraws(OptionalLong.of((long) Math.ceil(draws))) : some();
        }

        @Override
        public String words() {
            return inAll.isPresent() ? "Make %s draws".formatted(Numbers.about(inAll.getAsLong())) : "Make more draws";
        }
    }

    /// A lane that draws large outcomes more often.
    record DrawWider() implements Action {
        @Override
        public String words() {
            return "Draw large outcomes more often, in another lane";
        }
    }

    record AddReference() implements Action {
        @Override
        public String words() {
            return "Add a reference value";
        }
    }

    record Rehearse() implements Action {
        @Override
        public String words() {
            return "Rehearse this run";
        }
    }

    record RunOtherSeed() implements Action {
        @Override
        public String words() {
            return "Run with another seed";
        }
    }

    /// @param draw its index in the lane
    record LookAtDraw(long draw) implements Action {
        @Override
        public String words() {
            return "Look at draw " + Numbers.count(draw);
        }
    }

    /// A change of what is asked: its answer does not mend this one.
    ///
    /// @param example of another question
    record AskAnother(String example) implements Action {
        @Override
        public String words() {
            return "Ask another question: " + example;
        }
    }
}
