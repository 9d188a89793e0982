/// Intervals for a fixed number of draws, bands that hold at all numbers of draws at once, and the arithmetic
/// of rules to stop by.
///
/// Start with [Interval][dev.leadline.interval.Interval]. Every interval says its kind, its level and what it takes for
/// granted, and none is ever 0 ± 0; [Sides][dev.leadline.interval.Sides] gives the limit of one side of each.
///
/// - A mean: [Student][dev.leadline.interval.Student], [SkewnessCorrected][dev.leadline.interval.SkewnessCorrected],
///   [BootstrapT][dev.leadline.interval.BootstrapT]; within known bounds [Hoeffding][dev.leadline.interval.Hoeffding],
///   [EmpiricalBernstein][dev.leadline.interval.EmpiricalBernstein].
/// - A probability: [ClopperPearson][dev.leadline.interval.ClopperPearson], [Wilson][dev.leadline.interval.Wilson],
///   [SplittingSteps][dev.leadline.interval.SplittingSteps] from splitting, [NoHit][dev.leadline.interval.NoHit].
/// - A quantile: [Ranks][dev.leadline.interval.Ranks] of independent draws, else
///   [InvertedCdf][dev.leadline.interval.InvertedCdf]; a distribution function: [Dkw][dev.leadline.interval.Dkw].
/// - What is made of means: [Delta][dev.leadline.interval.Delta], [Fieller][dev.leadline.interval.Fieller] for a ratio,
///   [LogScale][dev.leadline.interval.LogScale] for a standard deviation.
/// - Any-time bands: [AnyTimeMean][dev.leadline.interval.AnyTimeMean], in the limit, from where
///   [Guard][dev.leadline.interval.Guard] allows it; exact ones are
/// [AnyTimeChance][dev.leadline.interval.AnyTimeChance],
///   [AnyTimeBounded][dev.leadline.interval.AnyTimeBounded] and
///   [AnyTimeQuantile][dev.leadline.interval.AnyTimeQuantile], and these alone may be intersected
///   ([RunningIntersection][dev.leadline.interval.RunningIntersection]). Replicated points have
///   [Looks][dev.leadline.interval.Looks].
/// - Rules to stop by: [HitsRule][dev.leadline.interval.HitsRule], [TwoStage][dev.leadline.interval.TwoStage],
///   [Stein][dev.leadline.interval.Stein], [FixedWidth][dev.leadline.interval.FixedWidth],
///   [Jcgm101][dev.leadline.interval.Jcgm101]; what they are likely to cost is
///   [DrawsNeeded][dev.leadline.interval.DrawsNeeded].
///
/// [CoverageInterval][dev.leadline.interval.CoverageInterval] says where an outcome lies, not what is known of it.
package dev.leadline.interval;
