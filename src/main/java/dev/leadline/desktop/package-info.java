/// The window, its one entry and what stands behind it.
///
/// Start with [Window][dev.leadline.desktop.Window]. Views hold nodes and bindings only; what is decided is decided in
/// classes called `…ViewModel`, which know no node, stage or thread. Every edit makes a new
/// [Draft][dev.leadline.model.Draft]; a run keeps the one it started from.
package dev.leadline.desktop;
