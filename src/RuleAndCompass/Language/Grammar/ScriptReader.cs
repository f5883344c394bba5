using RuleAndCompass.Language.Diagnostics;
using RuleAndCompass.Language.Syntax;

namespace RuleAndCompass.Language.Grammar;

/// <summary>Reads the text of a script into its tree.</summary>
public static class ScriptReader
{
    /// <summary>Reads a script; a bad sentence is left out of the tree and told, and reading goes on with the next.</summary>
    /// <param name="name">What diagnostics call the script.</param>
    /// <param name="text">The script.</param>
    /// <param name="limits">What bounds the reading.</param>
    /// <param name="cancellation">Ends the reading early.</param>
    public static Outcome<Script> Read(string name, string text, ReadingLimits? limits = null, CancellationToken cancellation = default) => throw new NotImplementedException();

    /// <summary>Reads one expression, for values given on the command line (<c>43°18'</c>, <c>80 mm</c>).</summary>
    public static Outcome<Expression> ReadExpression(string text) => throw new NotImplementedException();
}

/// <summary>Bounds on a script, each a diagnostic that names it.</summary>
public sealed record ReadingLimits(int MaximumBytes = 4 << 20, int MaximumSentences = 200_000, int MaximumNesting = 100, int MaximumDigits = 10_000);
