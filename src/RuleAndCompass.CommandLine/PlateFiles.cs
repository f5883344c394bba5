using System.Collections.Immutable;
using System.Diagnostics;
using RuleAndCompass.Language.Diagnostics;
using RuleAndCompass.Making;
using RuleAndCompass.Plates;
using RuleAndCompass.Plates.Scene;
using RuleAndCompass.Plates.Writing;

namespace RuleAndCompass.CommandLine;

/// <summary>The plates of a layout as files, each kind in the formats it can have.</summary>
internal static class PlateFiles
{
    /// <summary>What <c>--only</c> may name.</summary>
    public static ImmutableArray<string> Kinds { get; } = ["steps", "full", "cut"];

    /// <summary>The endings of file names, which are the formats, that a kind can be written in.</summary>
    public static ImmutableArray<string> EndingsOf(string kind) => kind == "cut" ? ["svg"] : ["pdf"];

    /// <summary>One kind of plates, in the first of its formats.</summary>
    /// <param name="findings">Those of the bench stand beside the acts they are about.</param>
    public static byte[] Write(Layout layout, string kind, IEnumerable<Diagnostic> findings, CancellationToken cancellation)
    {
        string script = layout.Script.Name;
        return kind switch
        {
            "steps" => Pdf(StepPlates.Compose(layout, new() { ScriptName = script, Cautions = PlateCautions.Of(findings) }, cancellation: cancellation), layout, "step plates", cancellation),
            "full" => Pdf(FullSizePlate.Compose(layout, new() { ScriptName = script }, cancellation), layout, "full size", cancellation),
            "cut" => CutFile.Write(layout, script, cancellation),
            _ => throw new UnreachableException($"No plates called {kind}."),
        };
    }

    private static byte[] Pdf(ImmutableArray<Page> pages, Layout layout, string what, CancellationToken cancellation) =>
        PdfWriter.Write(pages, $"{(layout.Title.Length > 0 ? layout.Title : layout.Script.Name)}: {what}", layout.Script.Name, cancellation: cancellation);
}
