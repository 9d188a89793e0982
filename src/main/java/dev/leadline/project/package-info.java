/// What is kept and exchanged: the project file, its fingerprint, and the JSON that the commands print.
///
/// Start with [ProjectFile][dev.leadline.project.ProjectFile]. A file is read into a [Json][dev.leadline.project.Json]
/// tree within stated [limits][dev.leadline.project.JsonReader], the tree into a [Draft][dev.leadline.model.Draft];
/// what a draft means is checked by [Project][dev.leadline.model.Project]. The only importer of the JSON library.
package dev.leadline.project;
