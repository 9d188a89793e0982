package dev.leadline.desktop.picker;

/// Fields for one way of saying what a density is. Built anew when the way or the density's place changes.
interface Form {
    javafx.scene.Node node();

    /// Shows what the draft says now.
    void update();

    /// To where a person begins to type.
    default void focus() {}
}
