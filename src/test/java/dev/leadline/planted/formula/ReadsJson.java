package dev.leadline.planted.formula;

import tools.jackson.core.JsonToken;

/// Imports a library that belongs to another package.
record ReadsJson(JsonToken token) {}
