/// Schemes that may be worth recommending, one file each.
///
/// A [Candidate][dev.leadline.study.candidate.Candidate] offers lanes for a question; whether they are worth it is
/// measured, not believed. A new one is a line in [Candidates][dev.leadline.study.candidate.Candidates].
package dev.leadline.study.candidate;
