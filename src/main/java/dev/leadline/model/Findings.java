package dev.leadline.model;

import dev.leadline.problem.Place;
import dev.leadline.problem.Problem;
import dev.leadline.problem.Refusal;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.function.Supplier;
import java.util.function.UnaryOperator;

/// The problems found in a draft so far.
final class Findings {

    private final List<Problem> problems = new ArrayList<>();
    private final List<Problem> notes = new ArrayList<>();

    void add(String path, Problem problem) {
        problems.add(problem.at(Place.of(path)));
    }

    /// One that knows its place.
    void add(Problem problem) {
        problems.add(problem);
    }

    /// What is no fault but may surprise.
    void note(String path, Problem note) {
        notes.add(note.at(Place.of(path)));
    }

    List<Problem> notes() {
        return List.copyOf(notes);
    }

    void add(String path, String primary, String detail) {
        add(path, Problem.of(primary).because(detail));
    }

    void add(String path, String primary, String detail, String hint) {
        add(path, Problem.of(primary).because(detail).tryThis(hint));
    }

    /// What `made` makes; empty where it refuses, its problems noted.
    ///
    /// @param place from the path of a problem to its path in the project
    <T> Optional<T> made(UnaryOperator<String> place, Supplier<T> made) {
        try {
            return Optional.of(made.get());
        } catch (Refusal refusal) {
            refusal.problems()
                    .forEach(problem ->
                            problems.add(problem.in(place.apply(problem.place().path()))));
            return Optional.empty();
        }
    }

    void refuseIfAny() {
        if (!problems.isEmpty()) {
            throw new Refusal(problems);
        }
    }
}
