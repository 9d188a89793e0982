/// A whole run of every lane, as command line and window both call it.
///
/// Start with [Study][dev.leadline.study.Study] and the [StudyState][dev.leadline.study.StudyState] that it
/// hands to its listener. [Comparison][dev.leadline.study.Comparison] says what two lanes are worth beside
/// each other, [Suggestion][dev.leadline.study.Suggestion] which scheme a question is worth,
/// [Rehearsing][dev.leadline.study.Rehearsing] how often its interval holds,
/// [Planning][dev.leadline.study.Planning] how many draws it takes. What both say of it stands here too: an
/// answer in words ([AnswerText][dev.leadline.study.AnswerText]), a draw in rows
/// ([LookRow][dev.leadline.study.LookRow]).
package dev.leadline.study;
