package dev.leadline.desktop.working;

import java.util.ArrayDeque;
import java.util.Deque;
import java.util.Optional;

/// Values with undo and redo. Edits with the same key that follow each other count as one. Confined to a thread.
final class History<T> {
    /// Steps that can be undone.
    static final int DEPTH = 500;

    private record Version<T>(T value, String key) {}

    private final Deque<Version<T>> before = new ArrayDeque<>();
    private final Deque<Version<T>> after = new ArrayDeque<>();
    private Version<T> now;
    private boolean open;

    History(T start) {
        now = new Version<>(start, "");
    }

    T now() {
        return now.value;
    }

    /// @param key what is being edited, as `inputs[0].scale`
    void edit(String key, T value) {
        if (value.equals(now.value)) {
            return;
        }
        if (!(open && key.equals(now.key))) {
            before.push(now);
            if (before.size() > DEPTH) {
                before.removeLast();
            }
        }
        now = new Version<>(value, key);
        after.clear();
        open = true;
    }

    /// The next edit counts on its own, whatever its key.
    void settle() {
        open = false;
    }

    /// As if the edit that is not settled yet, where it has this key, had never been.
    void takeBack(String key) {
        if (open && key.equals(now.key)) {
            now = before.pop();
            open = false;
        }
    }

    Optional<T> undo() {
        return move(before, after);
    }

    Optional<T> redo() {
        return move(after, before);
    }

    boolean canUndo() {
        return !before.isEmpty();
    }

    boolean canRedo() {
        return !after.isEmpty();
    }

    private Optional<T> move(Deque<Version<T>> from, Deque<Version<T>> to) {
        if (from.isEmpty()) {
            return Optional.empty();
        }
        to.push(now);
        now = from.pop();
        open = false;
        return Optional.of(now.value);
    }
}
