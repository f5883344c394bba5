namespace RuleAndCompass.CommandLine.Display;

/// <summary>What the program reads from and writes to.</summary>
/// <param name="openInput">Opens standard input.</param>
/// <param name="output">Takes results.</param>
/// <param name="error">Takes findings and progress.</param>
internal sealed class Terminal(Func<Stream> openInput, TextWriter output, TextWriter error)
{
    public TextWriter Output { get; } = output;

    public TextWriter Error { get; } = error;

    /// <summary>Someone reads the results as they come: tables are drawn.</summary>
    public bool OutputIsTerminal { get; init; }

    /// <summary>Someone waits: progress is shown.</summary>
    public bool ErrorIsTerminal { get; init; }

    /// <summary>False where <c>NO_COLOR</c> is set.</summary>
    public bool UsesColour { get; init; }

    public Stream OpenInput() => openInput();
}
