package dev.leadline.model;

import dev.leadline.problem.Problem;
import java.util.List;

/// The numbers of a column of data.
///
/// @param header what the file calls it; empty where it has no headers
/// @param values in the order of the file
/// @param notes what is no fault but may surprise, as rows that were left out
/// @param hash SHA-256 of the file, in hexadecimal
public record DataColumn(String header, List<Double> values, List<Problem> notes, String hash) {
    public DataColumn {
        values = List.copyOf(values);
        notes = List.copyOf(notes);
    }
}
