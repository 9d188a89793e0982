/// An address in, random numbers out.
///
/// Every random number of a run has an [Address][dev.leadline.stream.Address]; a
/// [Stream][dev.leadline.stream.Stream] opened there gives the numbers of one input within one item of work. Nothing is
/// handed out in turn, so neither the number of workers nor their order can change a number, and any draw can be looked
/// at again.
package dev.leadline.stream;
