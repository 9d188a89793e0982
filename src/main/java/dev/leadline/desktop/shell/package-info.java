/// The window as a whole: menus, sentence, answer line, files, start page.
///
/// Start with [WorkbenchViewModel][dev.leadline.desktop.shell.WorkbenchViewModel]; questions to the person go through
/// [Dialogs][dev.leadline.desktop.shell.Dialogs].
package dev.leadline.desktop.shell;
