/// The commands. Start with [Commands][dev.leadline.cli.Commands], which reads the arguments and answers for the exit
/// code: 0 done and the tolerance met (or none asked), 1 done but not met or an objection stands, 2 the input is wrong,
/// 3 our fault.
///
/// There is one file for each command. The parser is set up by calls, without annotations, since reflection would
/// double the time a command takes to start. No mathematics here: what a command can do, the window can.
package dev.leadline.cli;
