package dev.leadline.formula;

import dev.leadline.problem.Place;
import dev.leadline.problem.Problem;
import java.util.ArrayDeque;
import java.util.ArrayList;
import java.util.Deque;
import java.util.HashMap;
import java.util.Iterator;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.stream.Collectors;
import java.util.stream.Stream;

/// Puts steps behind those that they use. Depth first, with a stack of its own: a thousand steps may use one another.
final class StepOrder {
    /// Names of a circle that fit into a message.
    private static final int SHOWN = 12;

    private enum State {
        NEW,
        OPEN,
        DONE
    }

    /// A step being looked at, and the steps it uses that have not been looked at.
    private record Visit(int line, Iterator<Token> uses) {}

    private final List<StepLine> lines;
    private final Map<String, Integer> lineOf = new HashMap<>();
    private final State[] states;
    private final Deque<Visit> path = new ArrayDeque<>();
    private final List<StepLine> order = new ArrayList<>();
    private Optional<Problem> circle = Optional.empty();

    private StepOrder(List<StepLine> lines) {
        this.lines = lines;
        this.states = new State[lines.size()];
        for (int i = 0; i < states.length; i++) {
            states[i] = State.NEW;
            lineOf.put(lines.get(i).name().text(), i);
        }
    }

    static StepOrder of(List<StepLine> lines) {
        var order = new StepOrder(lines);
        for (int i = 0; i < lines.size() && order.circle.isEmpty(); i++) {
            if (order.states[i] == State.NEW) order.visit(i);
        }
        return order;
    }

    /// The first circle in which steps use one another, spelled out.
    Optional<Problem> circle() {
        return circle;
    }

    /// The same lines, each after those that it uses; some are missing where there is a circle.
    List<StepLine> lines() {
        return order;
    }

    private void visit(int first) {
        enter(first);
        while (!path.isEmpty()) {
            Visit visit = path.peek();
            if (visit.uses.hasNext()) {
                Token use = visit.uses.next();
                int used = lineOf.get(use.text());
                if (states[used] == State.OPEN) {
                    circle = Optional.of(circle(used, use));
                    return;
                }
                if (states[used] == State.NEW) enter(used);
            } else {
                path.pop();
                states[visit.line] = State.DONE;
                order.add(lines.get(visit.line));
            }
        }
    }

    private void enter(int line) {
        states[line] = State.OPEN;
        path.push(new Visit(
                line,
                lines.get(line).tokens().stream()
                        .filter(token -> token.kind() == Token.Kind.NAME && lineOf.containsKey(token.text()))
                        .iterator()));
    }

    /// @param use where the step that is looked at uses `line`, which waits for it
    private Problem circle(int line, Token use) {
        List<String> names = new ArrayList<>();
        for (Iterator<Visit> all = path.descendingIterator(); all.hasNext(); ) {
            Visit visit = all.next();
            if (visit.line == line || !names.isEmpty())
                names.add(lines.get(visit.line).name().text());
        }
        String primary = names.size() == 1
                ? "step \"" + names.getFirst() + "\" uses itself"
                : "steps use one another in a circle: "
                        + Stream.concat(
                                        names.size() <= SHOWN
                                                ? names.stream()
                                                : Stream.concat(names.stream().limit(SHOWN), Stream.of("…")),
                                        Stream.of(names.getFirst()))
                                .collect(Collectors.joining(" → "));
        return Problem.of(primary)
                .because("a step is computed after the steps that it uses")
                .tryThis("take one of the names out of one of these formulas")
                .at(Place.of(use.span()).in(lines.get(path.peek().line).path()));
    }
}
