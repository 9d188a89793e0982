package dev.leadline.planted.numeric;

import dev.leadline.planted.density.Shape;

/// Uses a package that lies above its own.
record UsesDensity(Shape[] shapes) {}
