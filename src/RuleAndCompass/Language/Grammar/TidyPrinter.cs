using RuleAndCompass.Language.Syntax;

namespace RuleAndCompass.Language.Grammar;

/// <summary>Prints trees back in the one standard layout.</summary>
public static class TidyPrinter
{
    /// <summary>The whole script, comments kept, blocks indented by two spaces; printing twice changes nothing more.</summary>
    public static string Print(Script script) => throw new NotImplementedException();

    /// <summary>One node as it is written in a sentence.</summary>
    public static string Print(Node node) => throw new NotImplementedException();
}
