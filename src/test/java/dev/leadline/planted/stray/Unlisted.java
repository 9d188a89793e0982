package dev.leadline.planted.stray;

/// Stands in a package without a line in the table.
final class Unlisted {}
