/// The lanes of a project under the picture: their rows, how each one samples, how they compare, and which scheme a
/// question is worth.
///
/// Start with [LanesViewModel][dev.leadline.desktop.lanes.LanesViewModel].
package dev.leadline.desktop.lanes;
