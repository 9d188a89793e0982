package dev.leadline.planted.formula;

import java.nio.file.Path;

/// Lets a formula name a file.
record OpensFile(Path path) {}
