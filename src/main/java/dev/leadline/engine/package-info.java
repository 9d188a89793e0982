/// Draws made in items of work, on any number of threads, to the same bits.
///
/// Start with [Item][dev.leadline.engine.Item], the unit of work, a pure function of its address;
/// [Sampler][dev.leadline.engine.Sampler], which computes one; and [LaneRun][dev.leadline.engine.LaneRun],
/// which merges them in order and finds the end. [Look][dev.leadline.engine.Look] makes any single draw again;
/// [Achieved][dev.leadline.engine.Achieved] says what correlations draws have.
package dev.leadline.engine;
