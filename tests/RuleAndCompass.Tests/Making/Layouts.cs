using System.Collections.Immutable;
using RuleAndCompass.Bench;
using RuleAndCompass.Language.Diagnostics;
using RuleAndCompass.Making;

namespace RuleAndCompass.Tests.Making;

/// <summary>Carries scripts out for tests, and looks things up in what was made.</summary>
internal static class Layouts
{
    /// <summary>The layout of a script that has no error.</summary>
    public static Layout Make(string script, MakingOptions? options = null)
    {
        Outcome<Layout> outcome = Maker.Make("test.setout", script, options);
        outcome.Diagnostics.Where(finding => finding.Severity == Severity.Error).Select(finding => $"{finding.Code} {finding.Message}").ShouldBeEmpty(script);
        return outcome.Value.ShouldNotBeNull();
    }

    /// <summary>What is found wrong with a script.</summary>
    public static ImmutableArray<Diagnostic> Findings(string script, MakingOptions? options = null) => Maker.Make("test.setout", script, options).Diagnostics;

    /// <summary>The one thing found wrong with a script.</summary>
    public static Diagnostic Finding(string script, MakingOptions? options = null) => Findings(script, options).ShouldHaveSingleItem();

    public static Comparison Comparison(this Layout layout, string label) => layout.Comparisons.Where(comparison => comparison.Label == label).ShouldHaveSingleItem();

    /// <summary>What the construction gave, in millimetres, degrees or as a bare number.</summary>
    public static double Constructed(this Layout layout, string label) => layout.Comparison(label).Constructed.ToDouble();

    public static Mark Mark(this Layout layout, string name) => layout.Acts.Select(act => act.Makes).OfType<Mark>().Where(mark => mark.Name == name).ShouldHaveSingleItem();

    public static (double X, double Y) Place(this Layout layout, string name)
    {
        PointMark mark = (PointMark)layout.Mark(name);
        return (mark.Point.XMillimetres, mark.Point.YMillimetres);
    }

    public static void ShouldStand(this (double X, double Y) place, double x, double y)
    {
        // twelve digits of a length that fits on a sheet
        place.X.ShouldBe(x, 1e-9);
        place.Y.ShouldBe(y, 1e-9);
    }
}
