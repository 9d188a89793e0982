package dev.leadline.planted.desktop;

import javafx.scene.Node;

/// A view-model that holds a node.
record NodeViewModel(Node node) {}
