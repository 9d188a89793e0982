/// What went wrong, in words for a person, and where.
///
/// One [Problem][dev.leadline.problem.Problem] serves the field, the status line, the report and the command line.
package dev.leadline.problem;
