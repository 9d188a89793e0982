/// The question and how it is run, checked and immutable.
///
/// A [Draft][dev.leadline.model.Draft] is what a file holds or a person has typed so far;
/// [Project#of][dev.leadline.model.Project#of] checks it, all at once, and makes a
/// [Question][dev.leadline.model.Question] and a [Plan][dev.leadline.model.Plan] of it. Nothing below checks them
/// again.
package dev.leadline.model;
