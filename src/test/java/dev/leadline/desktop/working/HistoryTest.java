package dev.leadline.desktop.working;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.Optional;
import org.junit.jupiter.api.Test;

class HistoryTest {
    private final History<String> history = new History<>("");

    @Test
    void editsOfOnePlaceAreUndoneAsOne() {
        history.edit("name", "a");
        history.edit("name", "ab");
        history.edit("unit", "ab m");
        assertEquals(Optional.of("ab"), history.undo());
        assertEquals(Optional.of(""), history.undo());
        assertEquals(Optional.empty(), history.undo());
        assertEquals(Optional.of("ab"), history.redo());
        assertEquals(Optional.of("ab m"), history.redo());
        assertFalse(history.canRedo());
    }

    @Test
    void leavingAPlaceEndsItsEdit() {
        history.edit("name", "a");
        history.settle();
        history.edit("name", "ab");
        assertEquals(Optional.of("a"), history.undo());
    }

    @Test
    void whatIsTakenBackNeverWas() {
        history.edit("name", "a");
        history.settle();
        history.edit("name", "ab");
        history.edit("name", "abc");
        history.takeBack("unit");
        assertEquals("abc", history.now());
        history.takeBack("name");
        assertEquals("a", history.now());
        history.takeBack("name");
        assertEquals("a", history.now());
        history.edit("name", "b");
        assertEquals(Optional.of("a"), history.undo());
    }

    @Test
    void anEditAfterUndoForgetsWhatWasUndone() {
        history.edit("name", "a");
        history.undo();
        history.edit("name", "b");
        assertFalse(history.canRedo());
        assertEquals(Optional.of(""), history.undo());
    }

    @Test
    void anEditThatChangesNothingIsNone() {
        history.edit("name", "");
        assertFalse(history.canUndo());
    }

    @Test
    void keepsSoManySteps() {
        for (int i = 0; i < History.DEPTH + 50; i++) {
            history.settle();
            history.edit("name", "a" + i);
        }
        int undone = 0;
        while (history.canUndo()) {
            history.undo();
            undone++;
        }
        assertEquals(History.DEPTH, undone);
        assertTrue(history.canRedo());
    }
}
