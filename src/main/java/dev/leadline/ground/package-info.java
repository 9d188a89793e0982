/// Reasons for and against signing, judged from a question and the trace of a lane alone.
///
/// One file for each reason; [Grounds][dev.leadline.ground.Grounds] lists them. A reason says one sentence of
/// evidence with its number, never more than the draws say, and a remedy where there is one.
package dev.leadline.ground;
