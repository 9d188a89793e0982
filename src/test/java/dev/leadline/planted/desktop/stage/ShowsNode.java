package dev.leadline.planted.desktop.stage;

import javafx.scene.Node;

/// Breaks no rule by itself: makes its package one of JavaFX.
record ShowsNode(Node node) {}
