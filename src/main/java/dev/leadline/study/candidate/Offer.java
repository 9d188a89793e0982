package dev.leadline.study.candidate;

import dev.leadline.model.LaneDraft;

/// A lane that may be worth more than plain draws.
///
/// @param lane without a name, unless it is one of the project
/// @param reason what it makes use of, as a clause without an end
public record Offer(LaneDraft lane, String reason) {}
