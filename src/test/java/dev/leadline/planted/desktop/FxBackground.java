package dev.leadline.planted.desktop;

import javafx.application.Platform;

/// Breaks no rule: the one class that may.
final class FxBackground {
    private FxBackground() {}

    static void later(Runnable work) {
        Platform.runLater(work);
    }
}
