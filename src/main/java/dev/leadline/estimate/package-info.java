/// What is asked for, and what has to be kept of the draws to answer it.
///
/// An [Estimand][dev.leadline.estimate.Estimand] names what is asked; an
/// [Accumulator][dev.leadline.estimate.Accumulator] keeps the moments of the observations, in memory that does not grow
/// with their number. [Regression][dev.leadline.estimate.Regression] and [CrossFit][dev.leadline.estimate.CrossFit]
/// correct a mean by control variates. [Jackknife][dev.leadline.estimate.Jackknife] gives the variance of what is made
/// of them.
/// [Quantile][dev.leadline.estimate.Quantile], [TailMean][dev.leadline.estimate.TailMean],
/// [RatioOfMeans][dev.leadline.estimate.RatioOfMeans] and [LogDeviation][dev.leadline.estimate.LogDeviation] estimate
/// what is no mean.
/// [Association][dev.leadline.estimate.Association] measures how two columns go together.
package dev.leadline.estimate;
