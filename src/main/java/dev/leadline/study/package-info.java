/// A whole run of every lane, as command line and window both call it.
///
/// Start with [Study][dev.leadline.study.Study] and the [StudyState][dev.leadline.study.StudyState] that it hands to
/// its
/// listener.
package dev.leadline.study;
