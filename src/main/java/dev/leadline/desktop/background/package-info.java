/// Slow work away from the window's thread, and the one way back.
///
/// Start with [Background][dev.leadline.desktop.background.Background]: view-models take one, tests give them one that
/// finishes work when they say so.
package dev.leadline.desktop.background;
