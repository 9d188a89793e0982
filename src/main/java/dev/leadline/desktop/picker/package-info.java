/// The density of an input, in place of the picture: what is known about it, and what it looks like.
///
/// Start with [PickerViewModel][dev.leadline.desktop.picker.PickerViewModel], which says whose density it is, by which
/// [Way][dev.leadline.desktop.picker.Way] it is being told, and draws it. Each way has a small view-model, which edits
/// the draft at a [DensityAt][dev.leadline.desktop.picker.DensityAt], and a form.
package dev.leadline.desktop.picker;
