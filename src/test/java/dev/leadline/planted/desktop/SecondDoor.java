package dev.leadline.planted.desktop;

import javafx.application.Platform;

/// A second way onto the FX thread.
final class SecondDoor {
    private SecondDoor() {}

    static void later(Runnable work) {
        Platform.runLater(work);
    }
}
