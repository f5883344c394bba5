using System.Collections.Immutable;
using RuleAndCompass.Making;
using RuleAndCompass.Plates.Scene;

namespace RuleAndCompass.Plates.Composition;

/// <summary>The strokes of all plates. The widths are steps of the ISO 128 series, dashes and chains in its proportions.</summary>
internal static class Pens
{
    public const double Finest = 0.13;
    public const double Fine = 0.18;
    public const double Medium = 0.25;
    public const double Plain = 0.35;
    public const double Heavy = 0.5;

    public static Pen Earlier { get; } = new(Ink.Grey, Fine);

    public static Pen Present { get; } = new(Ink.Black, Plain);

    public static Pen Now { get; } = new(Ink.Accent, Medium);

    public static Pen NowThin { get; } = new(Ink.Accent, Finest);

    public static Pen NowHeavy { get; } = new(Ink.Accent, Plain);

    public static Pen Rule { get; } = new(Ink.Black, Fine);

    public static Pen Thin { get; } = new(Ink.Black, Finest);

    public static Pen Frame { get; } = new(Ink.Grey, Medium);

    public static Pen Board { get; } = new(Ink.Grey, Fine, Dashes(Dash.Dashed, Fine));

    public static Pen Bar { get; } = new(Ink.Black, Plain);

    /// <summary>A kept piece on a step plate, where all that is kept stands out alike.</summary>
    public static Pen Standing(Dash dash) => new(Ink.Black, Heavy, Dashes(dash, Heavy));

    /// <summary>A kept piece on the finished face, in its own weight.</summary>
    public static Pen Kept(Weight weight, Dash dash)
    {
        double width = weight switch
        {
            Weight.Heavy => Heavy,
            Weight.Fine => Fine,
            _ => Plain,
        };
        return new Pen(Ink.Black, width, Dashes(dash, width));
    }

    // ISO 128-20: a dash of 12 widths, a long one of 24, gaps of 3, a dot of half a width.
    public static ImmutableArray<double> Dashes(Dash dash, double width) => dash switch
    {
        Dash.Dashed => [12 * width, 3 * width],
        Dash.Chain => [24 * width, 3 * width, 0.5 * width, 3 * width],
        _ => [],
    };
}
