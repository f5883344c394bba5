using RuleAndCompass.CommandLine.Display;

namespace RuleAndCompass.CommandLine;

/// <summary>What every command works with.</summary>
/// <param name="Terminal">Where it reads and writes.</param>
/// <param name="Options">The options it shares with others.</param>
/// <param name="Cancellation">Ends its work early.</param>
internal sealed record Surroundings(Terminal Terminal, CommonOptions Options, CancellationToken Cancellation);
