/// A run of a snapshot of the project, and how far it has come.
///
/// Start with [RunViewModel][dev.leadline.desktop.run.RunViewModel]; [Studies][dev.leadline.desktop.run.Studies] is
/// where runs come from.
package dev.leadline.desktop.run;
