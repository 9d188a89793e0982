/// The left of the window: the draft being edited, with undo and redo, row by row.
///
/// Start with [ProjectViewModel][dev.leadline.desktop.working.ProjectViewModel], which holds the draft, its history and
/// what its check found, each problem at the JSON path that the rows look up.
package dev.leadline.desktop.working;
