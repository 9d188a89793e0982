/// The centre of the window: the picture, drawn in the background, and the lanes under it.
///
/// Start with [StageViewModel][dev.leadline.desktop.stage.StageViewModel].
package dev.leadline.desktop.stage;
