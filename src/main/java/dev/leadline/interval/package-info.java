/// Intervals for a fixed number of draws.
///
/// Start with [Interval][dev.leadline.interval.Interval]; [Student][dev.leadline.interval.Student] makes one for a
/// mean, [ClopperPearson][dev.leadline.interval.ClopperPearson] one for a probability from independent draws,
/// [SplittingSteps][dev.leadline.interval.SplittingSteps] one for a probability from splitting. Every interval says its
/// kind, its level and what it takes for granted, and none is ever 0 ± 0.
package dev.leadline.interval;
