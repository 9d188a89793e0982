/// How a lane samples: the layout of its points.
///
/// Start with [Points][dev.leadline.scheme.Points], the layouts there are, and
/// [Cursor][dev.leadline.scheme.Cursor], the points of one item of work. A layout states how many draws form one
/// independent observation; it does not bring its own interval.
package dev.leadline.scheme;
