/// What a run has shown so far, as plain values: marks, the sums of blocks of draws, failed evaluations.
///
/// Start with [Trace][dev.leadline.trace.Trace], what one lane has shown, and [Answer][dev.leadline.trace.Answer], an
/// estimate with everything it must travel with. Charts, grounds and reports are made from a trace alone.
package dev.leadline.trace;
