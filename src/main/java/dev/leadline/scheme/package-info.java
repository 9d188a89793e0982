/// How a lane samples: the layout of its points.
///
/// Start with [Points][dev.leadline.scheme.Points], the layouts there are, and
/// [Cursor][dev.leadline.scheme.Cursor], the points of one item of work. A layout states how many draws form one
/// independent observation; it does not bring its own interval.
///
/// [Splitting][dev.leadline.scheme.Splitting] has no layout: its points climb towards a rare event by its
/// [Score][dev.leadline.scheme.Score], and a repetition is one observation.
package dev.leadline.scheme;
